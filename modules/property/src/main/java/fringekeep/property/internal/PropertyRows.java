package fringekeep.property.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.FlatTable.FlatColumn;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.KindName;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** How properties stand in lists and tables. */
public final class PropertyRows {
    private static final Column VOLUME = Column.real("volume_m3", "volume", "m3", "Ao3");
    private static final Column SECTION = Column.real("cross_section_m2", "absorption", "m2", "m2");

    /** The list of properties. */
    public static final Projection PROPERTIES = new Projection(
            "property",
            new KindName("property"),
            List.of(
                    Column.text("property", "property"),
                    Column.text("compound", "compound"),
                    VOLUME,
                    Column.deviation("volume_u_m3", VOLUME),
                    SECTION,
                    Column.deviation("cross_section_u_m2", SECTION),
                    Column.text("verdict", "these data say"),
                    Column.real("log_likelihood_ratio", "ln L ratio", "1", "1"),
                    Column.integer("points", "points")),
            List.of(List.of("verdict")));

    private static final List<Stated> STATED = List.of(
            new Stated("polarizabilityVolume", "polarizability volume \u03b1/(4\u03c0\u03b5\u2080)", "m3", "Ao3"),
            new Stated("polarizability", "polarizability \u03b1", "C.m2/V", "C.m2/V"),
            new Stated("polarizabilityAtomic", "polarizability \u03b1 in atomic units", "1", "1"),
            new Stated("absorptionCrossSection", "absorption cross section", "m2", "m2"),
            new Stated("visibilityFactor", "remaining visibility factor", "1", "1"));

    private record Stated(String member, String words, String unit, String shown) {}

    private PropertyRows() {}

    /** One row a record. */
    public static Row row(RecordView record, Inputs inputs) {
        JsonObject result = record.result();
        Map<String, Object> row = new HashMap<>();
        row.put("property", "polarizability");
        row.put("compound", compound(inputs));
        put(row, result, "polarizabilityVolume", "volume_m3", "volume_u_m3");
        put(row, result, "absorptionCrossSection", "cross_section_m2", "cross_section_u_m2");
        row.put("verdict", words(result));
        result.number("logLikelihoodRatio").ifPresent(ratio -> row.put("log_likelihood_ratio", ratio));
        row.put("points", result.integer("points").orElse(0));
        return new Row(row);
    }

    private static void put(Map<String, Object> row, JsonObject result, String member, String value, String u) {
        result.object(member).ifPresent(stated -> {
            stated.number("value").ifPresent(number -> row.put(value, number));
            stated.number("u").ifPresent(number -> row.put(u, number));
        });
    }

    private static String words(JsonObject result) {
        return result.text("verdict").orElse("").replace('-', ' ');
    }

    private static String compound(Inputs inputs) {
        return inputs.role("compound").stream()
                .map(Input::record)
                .flatMap(Optional::stream)
                .map(PropertyRows::compoundName)
                .findFirst()
                .orElse("");
    }

    private static String compoundName(RecordView compound) {
        String formula = compound.choices()
                .object("composition")
                .flatMap(composition -> composition.text("formula"))
                .orElse("");
        return compound.part(fringekeep.archive.record.PartName.IDENTITY)
                .map(identity -> identity.array("names").texts())
                .filter(names -> !names.isEmpty())
                .map(names -> names.get(0))
                .orElse(formula);
    }

    /** What the property is called. */
    public static Title title(RecordView record, Inputs inputs) {
        JsonObject result = record.result();
        String value = result.object("polarizabilityVolume")
                .map(stated -> ValueText.estimate(
                                stated.number("value").orElse(Double.NaN),
                                stated.number("u").orElse(Double.NaN),
                                Units.of("Ao3"))
                        + " " + Units.of("Ao3").shown())
                .orElse("no result");
        String of = compound(inputs);
        return new Title(
                "polarizability" + (of.isEmpty() ? "" : " of " + of) + ": " + value,
                result.integer("points").orElse(0) + " points; these data say: " + words(result));
    }

    /** The stated values, with statistical and shared uncertainty apart, and what is shared. */
    public static List<FlatTable> tables(RecordView record) {
        JsonObject result = record.result();
        List<List<Optional<Object>>> values = new ArrayList<>();
        for (Stated stated : STATED) {
            result.object(stated.member())
                    .ifPresent(object -> values.add(List.of(
                            Optional.of(stated.words()),
                            shown(object, "value", stated),
                            shown(object, "statistical", stated),
                            shown(object, "shared", stated),
                            shown(object, "u", stated),
                            Optional.of(Units.of(stated.shown()).shown()))));
        }
        List<List<Optional<Object>>> shared = new ArrayList<>();
        for (JsonObject each : result.array("sensitivities").objects()) {
            double part = each.array("derivatives").numbers()[0]
                    * each.number("deviation").orElse(0);
            shared.add(List.of(
                    Optional.of(each.text("parameter").orElse("")),
                    Optional.of(each.text("source").orElse("")),
                    Optional.of(Math.abs(Units.of("Ao3").differenceFromSi(part)))));
        }
        return List.of(
                new FlatTable(
                        "values",
                        List.of(
                                new FlatColumn("quantity", "quantity", "", "Which quantity."),
                                new FlatColumn("value", "value", "", "In the unit of the row."),
                                new FlatColumn("statistical_u", "statistical u", "", "From counts alone."),
                                new FlatColumn("shared_u", "shared u", "", "From what the points share."),
                                new FlatColumn("combined_u", "u", "", "Combined standard uncertainty."),
                                new FlatColumn("unit", "unit", "", "Unit of the row.")),
                        values),
                new FlatTable(
                        "shared",
                        List.of(
                                new FlatColumn("parameter", "shared between scans", "", "Parameter."),
                                new FlatColumn("source", "record", "", "The record that states it."),
                                new FlatColumn(
                                        "part_ao3", "part of u", "Ao3", "Its part of the polarizability volume's u.")),
                        shared));
    }

    private static Optional<Object> shown(JsonObject object, String member, Stated stated) {
        return object.number(member).isPresent()
                ? Optional.of(
                        Units.of(stated.shown()).fromSi(object.number(member).getAsDouble()))
                : Optional.empty();
    }
}
