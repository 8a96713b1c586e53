package fringekeep.figure;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
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
import fringekeep.archive.quantity.Units;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.drawing.Picture;
import fringekeep.figure.internal.FigureComputation;
import fringekeep.figure.internal.FigurePicture;
import fringekeep.figure.internal.FigureTable;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** A figure: a table of numbers taken from what it pins, and how to draw them. */
public final class FigureKind implements RecordKind {
    private static final KindName NAME = new KindName("figure");
    private static final Projection FIGURES = new Projection(
            "figure",
            NAME,
            List.of(
                    Column.text("title", "figure"),
                    Column.integer("panels", "panels"),
                    Column.integer("series", "series"),
                    Column.integer("numbers", "numbers")),
            List.of());

    private final JsonObject schema = SchemaResource.read(FigureKind.class, "figure-1.schema.json");
    private final Computation computation = new FigureComputation();

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
        return List.of(
                Role.anyKind("series", 0, 1000),
                Role.anyKind("value", 0, 1000),
                Role.anyKind("notwithstanding", 0, 1000));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of();
    }

    @Override
    public Optional<Computation> computation() {
        return Optional.of(computation);
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        List<Problem> problems = new ArrayList<>();
        JsonObject choices = parts.get(PartName.CHOICES).orElse(JsonObject.EMPTY);
        Set<String> names = new HashSet<>();
        List<JsonObject> panels = choices.array("panels").objects();
        for (int i = 0; i < panels.size(); i++) {
            String name = panels.get(i).text("name").orElse("");
            if (!names.add(name)) {
                problems.add(new Problem(
                        "figure.panel-twice",
                        "Two panels are called " + name + ".",
                        "/choices/panels/" + i + "/name",
                        "Give each panel a name of its own."));
            }
            axis(panels.get(i), "x", "/choices/panels/" + i, problems);
            axis(panels.get(i), "y", "/choices/panels/" + i, problems);
        }
        return problems;
    }

    private static void axis(JsonObject panel, String axis, String pointer, List<Problem> problems) {
        JsonObject object = panel.object(axis).orElse(JsonObject.EMPTY);
        try {
            Units.parse(object.text("unit").orElse("1"));
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at(pointer + "/" + axis + "/unit")));
        }
        boolean empty = object.number("from").isPresent()
                && object.number("to").isPresent()
                && object.number("from").getAsDouble() >= object.number("to").getAsDouble();
        if (empty) {
            problems.add(new Problem(
                    "figure.empty-axis",
                    "The " + axis + " axis ends before it begins.",
                    pointer + "/" + axis,
                    "Let from be less than to."));
        }
    }

    @Override
    public List<Projection> projections() {
        return List.of(FIGURES);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        Map<String, Object> row = new HashMap<>();
        row.put("title", heading(record));
        row.put("panels", (long) record.choices().array("panels").items().size());
        List<JsonObject> series = record.result().array("series").objects();
        row.put("series", (long) series.size());
        row.put(
                "numbers",
                series.stream()
                        .mapToLong(each -> each.integer("rows").orElse(0))
                        .sum());
        return Stream.of(new Row(row));
    }

    private static String heading(RecordView record) {
        String title = record.choices().text("title").orElse("");
        String words = title.isBlank() ? record.choices().text("caption").orElse("figure") : title;
        return words.length() <= 120 ? words : words.substring(0, 119) + "\u2026";
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        int panels = record.choices().array("panels").items().size();
        return new Title(heading(record), panels + (panels == 1 ? " panel" : " panels"));
    }

    @Override
    public List<Picture> drawings(RecordView record, Inputs inputs) {
        if (record.part(PartName.RESULT).isEmpty()) {
            return List.of();
        }
        try {
            FigureTable table = FigureTable.read(record.payload(FigureTable.NAME));
            return List.of(FigurePicture.of(record.choices(), record.result(), table));
        } catch (ProblemException e) {
            // the payload was purged or is missing: check names it; a picture of half the numbers would lie
            return List.of();
        }
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.of(
                record.choices().text("title").orElse(""),
                record.choices().text("caption").orElse(""));
    }
}
