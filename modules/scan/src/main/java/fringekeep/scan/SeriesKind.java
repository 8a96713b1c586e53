package fringekeep.scan;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.FlatTable.FlatColumn;
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
import fringekeep.scan.internal.Rows;
import fringekeep.scan.internal.SeriesSteps;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** Series: what is varied from scan to scan, its steps and their pattern. Entered by people; may continue. */
public final class SeriesKind implements RecordKind {
    /** Name of the kind. */
    public static final KindName NAME = new KindName("series");

    private static final Projection TABLE = new Projection(
            "series",
            NAME,
            List.of(
                    Column.text("label", "series"),
                    Column.text("varied", "varied"),
                    Column.integer("steps", "steps"),
                    Column.text("pattern", "pattern")),
            List.of(List.of("label")));

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
        return SchemaResource.read(SeriesKind.class, "series-" + number + ".schema.json");
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
        return List.of(Role.of("setup", "setup", 0, 1));
    }

    @Override
    public boolean mayContinue() {
        return true;
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return SeriesSteps.examine(parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY));
    }

    @Override
    public List<Projection> projections() {
        return List.of(TABLE);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        return Stream.of(new Rows()
                .text("label", content.text("label"))
                .text("varied", content.text("varied"))
                .integer("steps", content.array("steps").items().size())
                .text("pattern", content.text("pattern"))
                .row());
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        String varied = content.text("varied").orElse("");
        int steps = content.array("steps").items().size();
        return new Title(content.text("label").orElse(varied), varied + ", " + steps + " steps");
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        List<List<Optional<Object>>> rows = new ArrayList<>();
        List<JsonObject> steps = record.content().array("steps").objects();
        for (int i = 0; i < steps.size(); i++) {
            Optional<JsonObject> quantity = steps.get(i).object("quantity");
            rows.add(List.of(
                    Optional.of((double) i),
                    steps.get(i).text("name").map(Object.class::cast),
                    quantity.flatMap(q -> q.text("text")).map(Object.class::cast),
                    quantity.flatMap(q -> q.text("unit")).map(Object.class::cast),
                    quantity.map(q -> q.number("si").orElseThrow())));
        }
        return List.of(new FlatTable(
                "series-steps",
                List.of(
                        new FlatColumn("step", "step", "1", "Number of the step, from 0."),
                        new FlatColumn("name", "name", "", "Word for the step."),
                        new FlatColumn("as_entered", "as entered", "", "Value as entered."),
                        new FlatColumn("unit", "unit", "", "UCUM unit of the value as entered."),
                        new FlatColumn("value_si", "SI", "", "Value in the coherent SI unit of the same sort.")),
                rows));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.concat(record.content().text("label").stream(), record.content().text("varied").stream());
    }
}
