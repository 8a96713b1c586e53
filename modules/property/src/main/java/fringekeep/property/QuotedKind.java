package fringekeep.property;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.Uncertainty;
import fringekeep.archive.quantity.Units;
import fringekeep.archive.quantity.ValueText;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A value from the literature or from a calculation elsewhere; it stands beside ours and cannot be recomputed here. */
public final class QuotedKind implements RecordKind {
    private static final KindName NAME = new KindName("quoted");
    private static final Projection QUOTED = new Projection(
            "quoted",
            NAME,
            List.of(
                    Column.text("what", "property"),
                    Column.text("of", "of"),
                    Column.text("value_as_quoted", "value"),
                    Column.text("how", "how"),
                    Column.text("source", "source")),
            List.of(List.of("what")));

    private static final Map<String, String> UNITS = Map.of(
            "polarizability-volume", "m3",
            "polarizability", "C.m2/V",
            "absorption-cross-section", "m2",
            "collision-cross-section", "m2",
            "dipole-moment", "C.m",
            "ionisation-energy", "J",
            "vapour-pressure", "Pa",
            "visibility", "1");

    private final JsonObject schema = SchemaResource.read(QuotedKind.class, "quoted-1.schema.json");

    @Override
    public KindName kind() {
        return NAME;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return schema;
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of();
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(Role.of("compound", "compound", 0, 1));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        JsonObject content = parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY);
        String wanted = UNITS.get(content.text("what").orElse(""));
        Optional<String> unit = content.object("quantity").flatMap(quantity -> quantity.text("unit"));
        if (wanted == null || unit.isEmpty()) {
            return List.of();
        }
        try {
            if (Units.parse(unit.get()).sameDimension(Units.parse(wanted))) {
                return List.of();
            }
            return List.of(new Problem(
                    "quoted.unit",
                    "A " + content.text("what").orElse("").replace('-', ' ') + " is not given in " + unit.get() + ".",
                    "/content/quantity",
                    "Give it in a unit that reduces to " + wanted + "."));
        } catch (ProblemException e) {
            return e.problems().stream()
                    .map(problem -> problem.at("/content/quantity/unit"))
                    .toList();
        }
    }

    @Override
    public <T> Optional<T> facet(Class<T> facet, RecordView record, Inputs inputs) {
        if (facet != Estimates.class) {
            return Optional.empty();
        }
        return quantity(record)
                .map(quantity -> facet.cast(new Estimates(
                        List.of(record.content().text("what").orElse("value")),
                        List.of(Units.of(quantity.unit()).siCode()),
                        new double[] {quantity.si()},
                        new double[] {variance(quantity)},
                        List.of())));
    }

    /** NaN says that the source states no uncertainty: it must never be read as zero. */
    private static double variance(Quantity quantity) {
        if (quantity.uncertainty() instanceof Uncertainty.Stated stated) {
            return stated.si() * stated.si();
        }
        return quantity.uncertainty() instanceof Uncertainty.Exact ? 0 : Double.NaN;
    }

    private static Optional<Quantity> quantity(RecordView record) {
        return record.content().object("quantity").map(QuantityJson::read);
    }

    @Override
    public List<Projection> projections() {
        return List.of(QUOTED);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        Map<String, Object> row = new HashMap<>();
        row.put("what", content.text("what").orElse("").replace('-', ' '));
        row.put("of", content.text("of").orElse(""));
        row.put("value_as_quoted", asQuoted(record));
        row.put("how", content.text("how").orElse(""));
        row.put("source", shortened(content.text("source").orElse("")));
        return Stream.of(new Row(row));
    }

    private static String asQuoted(RecordView record) {
        return quantity(record)
                .map(quantity -> shortened(ValueText.entered(quantity)))
                .orElse("");
    }

    private static String shortened(String text) {
        return text.length() <= 200 ? text : text.substring(0, 199) + "\u2026";
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        return new Title(
                content.text("what").orElse("").replace('-', ' ') + " of "
                        + content.text("of").orElse("") + ", "
                        + content.text("how").orElse(""),
                asQuoted(record));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.of(
                record.content().text("of").orElse(""),
                record.content().text("source").orElse(""));
    }
}
