package fringekeep.property.internal;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.facet.Plottable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** What a property offers to those who take it as input. */
public final class PropertyFacets {
    private static final Map<String, String> UNITS =
            Map.of("polarizabilityVolume", "m3", "absorptionCrossSection", "m2", "visibilityFactor", "1");

    private PropertyFacets() {}

    /** Unit of every stated value by its member, those in other units included. */
    public static Map<String, String> units() {
        Map<String, String> units = new HashMap<>(UNITS);
        units.put("polarizability", "C.m2/V");
        units.put("polarizabilityAtomic", "1");
        return Map.copyOf(units);
    }

    private static JsonObject stated(RecordView record) {
        return record.result()
                .object(record.choices().text("description").orElse("quantum"))
                .orElseThrow();
    }

    /** Estimates of the stated description, with sensitivities to what they share with other results. */
    public static Estimates estimates(RecordView record) {
        JsonObject fit = stated(record);
        List<String> names = fit.array("estimates").texts();
        List<Sensitivity> sensitivities = record.result().array("sensitivities").objects().stream()
                .map(each -> new Sensitivity(
                        new Hash(each.text("source").orElseThrow()),
                        each.text("parameter").orElseThrow(),
                        each.number("deviation").orElseThrow(),
                        each.array("derivatives").numbers()))
                .toList();
        return new Estimates(
                names,
                names.stream().map(name -> UNITS.getOrDefault(name, "1")).toList(),
                fit.array("values").numbers(),
                fit.array("covariance").numbers(),
                sensitivities);
    }

    /** Points, both curves and their bands against power. */
    public static Plottable plottable(RecordView record) throws ProblemException {
        CsvPayload.Table points = CsvPayload.read(record.payload(PowerCurves.POINTS));
        CsvPayload.Table curves = CsvPayload.read(record.payload(PowerCurves.CURVES));
        List<Plottable.Series> series = new ArrayList<>();
        for (String name : List.of("classical", "quantum")) {
            if (hasNumbers(curves, name)) {
                series.add(band(curves, name));
                series.add(curve(curves, name));
            }
        }
        series.add(points(points));
        return new Plottable(series);
    }

    private static boolean hasNumbers(CsvPayload.Table table, String name) {
        return table.rows() > 0
                && table.numbers(name).map(values -> !Double.isNaN(values[0])).orElse(false);
    }

    private static double[] column(CsvPayload.Table table, String name) {
        return table.numbers(name).orElseThrow(() -> new IllegalStateException("no column " + name));
    }

    private static Plottable.Series curve(CsvPayload.Table curves, String name) {
        return series(name, name, Plottable.Sort.CURVE, curves, column(curves, name), new double[0], List.of());
    }

    private static Plottable.Series band(CsvPayload.Table curves, String name) {
        return series(
                name + "-band",
                "",
                Plottable.Sort.BAND,
                curves,
                column(curves, name + "_lower"),
                column(curves, name + "_upper"),
                List.of());
    }

    private static Plottable.Series points(CsvPayload.Table points) {
        List<Hash> sources = points
                .column("fit")
                .filter(CsvPayload.Texts.class::isInstance)
                .map(column -> ((CsvPayload.Texts) column).values())
                .orElse(List.of())
                .stream()
                .flatMap(Optional::stream)
                .map(Hash::new)
                .toList();
        return series(
                "points",
                "measured",
                Plottable.Sort.POINTS,
                points,
                column(points, "visibility"),
                column(points, "visibility_u"),
                sources);
    }

    private static Plottable.Series series(
            String name,
            String label,
            Plottable.Sort sort,
            CsvPayload.Table table,
            double[] y,
            double[] other,
            List<Hash> sources) {
        return new Plottable.Series(
                name, label, sort, "laser power", "W", "visibility", "1", column(table, "power_w"), y, other, sources);
    }
}
