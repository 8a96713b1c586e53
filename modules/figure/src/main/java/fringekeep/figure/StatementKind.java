package fringekeep.figure;

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
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.figure.internal.StatementCheck;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;

/** A number as printed: which value it was rounded from, and by which rule. */
public final class StatementKind implements RecordKind {
    private static final KindName NAME = new KindName("statement");
    private static final Projection STATEMENTS = new Projection(
            "statement",
            NAME,
            List.of(
                    Column.text("printed", "as printed"),
                    Column.text("unit", "unit"),
                    Column.text("place", "where"),
                    Column.text("pointer", "value")),
            List.of());

    private final JsonObject schema = SchemaResource.read(StatementKind.class, "statement-1.schema.json");

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
        return List.of(Role.anyKind("of", 1, 1));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        JsonObject content = parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY);
        return inputs.role("of").stream()
                .findFirst()
                .flatMap(input -> input.record().map(record -> StatementCheck.problems(content, record, input)))
                .orElse(List.of());
    }

    @Override
    public List<Projection> projections() {
        return List.of(STATEMENTS);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        return Stream.of(new Row(Map.of(
                "printed", content.text("printed").orElse(""),
                "unit", content.text("unit").orElse(""),
                "place", shortened(content.text("where").orElse("")),
                "pointer", shortened(content.text("pointer").orElse("")))));
    }

    private static String shortened(String text) {
        return text.length() <= 200 ? text : text.substring(0, 199) + "\u2026";
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        String unit = content.text("unit").orElse("1");
        return new Title(
                content.text("printed").orElse("") + (unit.equals("1") ? "" : " " + unit),
                content.text("where").orElse(""));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.of(
                record.content().text("printed").orElse(""),
                record.content().text("where").orElse(""));
    }
}
