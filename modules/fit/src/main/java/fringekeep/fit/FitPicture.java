package fringekeep.fit;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.PayloadReference;
import fringekeep.drawing.Axis;
import fringekeep.drawing.Layer;
import fringekeep.drawing.Panel;
import fringekeep.drawing.Picture;
import fringekeep.drawing.Shape;
import fringekeep.drawing.Stroke;
import fringekeep.drawing.Tone;
import fringekeep.fit.internal.FittedCurve;
import fringekeep.fit.internal.ResidualTable;
import fringekeep.fit.internal.ResidualTable.Row;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Predicate;
import java.util.function.ToDoubleFunction;

/** Draws counts with the fitted curve and its band, and the residuals below; masked rows as bars. */
final class FitPicture {
    private static final double WIDTH = 120;
    private static final double HEIGHT = 90;
    private static final double RESIDUAL_SHARE = 0.3;
    private static final double LEAST_RESIDUAL = 3;
    private static final double NANOMETRES = 1e9;
    private static final int CURVE_POINTS = 400;

    private FitPicture() {}

    /** The picture; empty where the payload is not at hand. */
    static Optional<Picture> of(RecordView record, Inputs inputs) {
        List<Row> rows = rows(record);
        return rows.isEmpty()
                ? Optional.empty()
                : Optional.of(of(record.choices(), record.result(), rows, Look.recorded(), List.of()));
    }

    /**
     * How a fit is drawn that may not be recorded yet.
     *
     * @param stroke of the curve
     * @param outside whether a row that is not used lies outside the range instead of being masked
     */
    record Look(Stroke stroke, Predicate<Row> outside) {
        static Look recorded() {
            return new Look(Stroke.SOLID, row -> false);
        }
    }

    /**
     * The picture of choices and result.
     *
     * @param behind layers drawn behind the counts, such as the curve of another fit
     */
    static Picture of(JsonObject choices, JsonObject result, List<Row> rows, Look look, List<Layer> behind) {
        double exposure = exposure(result);
        List<Layer> layers = new ArrayList<>();
        if (!choices.text("combine").orElse("").equals("joint")) {
            curve(choices, result, rows, exposure, look.stroke(), layers);
        } else {
            layers.add(points(
                    "expected", Tone.QUANTUM, Shape.CIRCLE, rows, Row::used, row -> even(row, row.fitted(), exposure)));
        }
        layers.addAll(behind);
        layers.addAll(counts(rows, exposure, look));
        Panel fringe = panel(heading(result, exposure), layers);
        return new Picture("", WIDTH, HEIGHT, 1, List.of(fringe, residuals(rows, look)));
    }

    /** Counts without a curve, for fits that failed. */
    static Picture counts(List<Row> rows, JsonObject exposure, Look look) {
        double si = exposure.number("si").orElse(1);
        JsonObject result = JsonObject.EMPTY.with("exposure", exposure);
        return new Picture("", WIDTH, HEIGHT, 1, List.of(panel(words(result, si), counts(rows, si, look))));
    }

    static double exposure(JsonObject result) {
        return result.object("exposure")
                .map(each -> each.number("si").orElse(1))
                .orElse(1.0);
    }

    /** The curve of a fit brought to another exposure. */
    static Layer.Curve curve(RecordView record, double exposure, String name) {
        double own = exposure(record.result());
        FittedCurve curve = FittedCurve.of(record.choices(), record.result(), rows(record), own, CURVE_POINTS);
        double[] values = curve.values();
        for (int i = 0; i < values.length && own != exposure; i++) {
            values[i] *= exposure / own;
        }
        return new Layer.Curve(name, Tone.SERIES_THREE, Stroke.DASHED, scaled(curve.positions()), values);
    }

    /** Rows of the residual payload; empty where it is not at hand. */
    static List<Row> rows(RecordView record) {
        String name = record.result().text("residuals").orElse("");
        String form = record.head().payloads().stream()
                .filter(payload -> payload.name().equals(name))
                .map(PayloadReference::form)
                .findFirst()
                .orElse(CsvPayload.FORM);
        try {
            return name.isEmpty() ? List.of() : ResidualTable.read(record.payload(name), form);
        } catch (ProblemException e) {
            return List.of();
        }
    }

    private static Panel panel(String heading, List<Layer> layers) {
        return new Panel("", heading, Axis.linear("position", "nm"), Axis.linear("counts", ""), layers, 1, false);
    }

    private static String heading(JsonObject result, double exposure) {
        return words(result, exposure) + "; below, residuals / \u03c3";
    }

    private static String words(JsonObject result, double exposure) {
        String sort =
                result.object("exposure").flatMap(each -> each.text("sort")).orElse("time");
        String per = ValueText.number(exposure) + (sort.equals("shots") ? " shots" : " s");
        return "counts in " + per + " against position / nm";
    }

    private static void curve(
            JsonObject choices, JsonObject result, List<Row> rows, double exposure, Stroke stroke, List<Layer> layers) {
        FittedCurve curve = FittedCurve.of(choices, result, rows, exposure, CURVE_POINTS);
        double[] x = scaled(curve.positions());
        layers.add(new Layer.Band("", Tone.QUANTUM, x, curve.lower(), curve.upper()));
        layers.add(new Layer.Ruler("mean", Tone.QUIET, Stroke.DOTTED, true, curve.mean()));
        layers.add(new Layer.Curve("fit", Tone.QUANTUM, stroke, x, curve.values()));
    }

    private static double[] scaled(double[] positions) {
        double[] scaled = positions.clone();
        for (int i = 0; i < scaled.length; i++) {
            scaled[i] *= NANOMETRES;
        }
        return scaled;
    }

    /** Counts brought to the exposure of the panel, so that rows of unequal exposure lie on one curve. */
    private static double even(Row row, double counts, double exposure) {
        return row.exposure() == exposure ? counts : counts * exposure / row.exposure();
    }

    private static List<Layer> counts(List<Row> rows, double exposure, Look look) {
        List<Layer> layers = new ArrayList<>();
        layers.add(counts(
                "counts", Tone.INK, Shape.DOT, rows.stream().filter(Row::used).toList(), exposure));
        List<Row> left = rows.stream().filter(row -> !row.used()).toList();
        List<Row> outside = left.stream().filter(look.outside()).toList();
        List<Row> masked = left.stream().filter(look.outside().negate()).toList();
        if (!outside.isEmpty()) {
            layers.add(counts("outside the range", Tone.INK_SECOND, Shape.CIRCLE, outside, exposure));
        }
        if (!masked.isEmpty()) {
            layers.add(counts("masked", Tone.MASKED, Shape.BAR, masked, exposure));
        }
        return layers;
    }

    private static Layer counts(String name, Tone tone, Shape shape, List<Row> shown, double exposure) {
        double[] x =
                shown.stream().mapToDouble(row -> row.position() * NANOMETRES).toArray();
        double[] y = shown.stream()
                .mapToDouble(row -> even(row, row.counts(), exposure))
                .toArray();
        double[] deviations = shown.stream()
                .mapToDouble(row -> even(row, Math.sqrt(row.counts()), exposure))
                .toArray();
        return new Layer.Points(name, tone, shape, x, y, deviations);
    }

    private static Layer points(
            String name, Tone tone, Shape shape, List<Row> rows, Predicate<Row> which, ToDoubleFunction<Row> value) {
        List<Row> shown = rows.stream().filter(which).toList();
        return new Layer.Points(
                name,
                tone,
                shape,
                shown.stream().mapToDouble(row -> row.position() * NANOMETRES).toArray(),
                shown.stream().mapToDouble(value).toArray(),
                new double[0]);
    }

    private static Panel residuals(List<Row> rows, Look look) {
        List<Row> used = rows.stream().filter(Row::used).toList();
        double[] x =
                used.stream().mapToDouble(row -> row.position() * NANOMETRES).toArray();
        double[] y = used.stream().mapToDouble(Row::residual).toArray();
        double most = LEAST_RESIDUAL;
        for (double residual : y) {
            most = Math.max(most, Math.abs(residual) * 1.1);
        }
        List<Layer> layers = new ArrayList<>(List.of(
                new Layer.Ruler("", Tone.QUIET, Stroke.SOLID, true, 0),
                new Layer.Sticks("residuals", Tone.INK, x, y),
                new Layer.Points("", Tone.INK, Shape.DOT, x, y, new double[0])));
        Predicate<Row> masked = row -> !row.used() && !look.outside().test(row);
        if (rows.stream().anyMatch(masked)) {
            double floor = -most;
            layers.add(points("", Tone.MASKED, Shape.BAR, rows, masked, row -> floor));
        }
        Axis residual = new Axis("residual", "\u03c3", false, OptionalDouble.of(-most), OptionalDouble.of(most));
        return new Panel("", "", Axis.linear("position", "nm"), residual, layers, RESIDUAL_SHARE, false);
    }
}
