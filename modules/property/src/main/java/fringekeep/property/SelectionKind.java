package fringekeep.property;

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
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Stream;

/** A selection: the rule, the list it gave, and what was left out and why. Entered, so that its list never changes. */
public final class SelectionKind implements RecordKind {
    /** Role of the fits that were taken, in order. */
    public static final String TAKEN = "taken";

    /** Role of the judgements that decided what was left out. */
    public static final String BECAUSE = "because";

    /** Role, among what is spoken of, of the fits or scans that were left out. */
    public static final String LEFT_OUT = "left-out";

    private static final KindName NAME = new KindName("selection");
    private static final Projection SELECTIONS = new Projection(
            "selection",
            NAME,
            List.of(
                    Column.text("label", "selection"),
                    Column.text("rule", "rule"),
                    Column.integer("taken", "taken"),
                    Column.integer("left_out", "left out")),
            List.of());

    private final JsonObject schema = SchemaResource.read(SelectionKind.class, "selection-1.schema.json");

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
        return List.of(Role.of(TAKEN, "fit", 1, 10_000), Role.of(BECAUSE, "judgement", 0, 10_000));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(Role.anyKind(LEFT_OUT, 0, 10_000));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        List<Problem> problems = new ArrayList<>();
        JsonObject content = parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY);
        List<JsonObject> left = content.array("left").objects();
        for (int i = 0; i < left.size(); i++) {
            String pointer = "/content/left/" + i;
            OptionalLong about = left.get(i).integer("about");
            if (about.isPresent() && !isRole(inputs.about().size(), about.getAsLong())) {
                problems.add(new Problem(
                        "selection.no-subject",
                        "Left out is record " + about.getAsLong() + " of those spoken of; there are "
                                + inputs.about().size() + ".",
                        pointer + "/about",
                        "Name a position from 0."));
            }
            OptionalLong because = left.get(i).integer("because");
            boolean wrong = because.isPresent()
                    && (!isRole(inputs.all().size(), because.getAsLong())
                            || !inputs.all()
                                    .get((int) because.getAsLong())
                                    .role()
                                    .equals(BECAUSE));
            if (wrong) {
                problems.add(new Problem(
                        "selection.no-judgement",
                        "Input " + because.getAsLong() + " is no judgement under role because.",
                        pointer + "/because",
                        "Name the position of the judgement that decided."));
            }
        }
        if (left.size() != inputs.about(LEFT_OUT).size()) {
            problems.add(new Problem(
                    "selection.left-out",
                    left.size() + " reasons for " + inputs.about(LEFT_OUT).size() + " records left out.",
                    "/content/left",
                    "Give one reason for each record left out."));
        }
        return problems;
    }

    private static boolean isRole(int size, long position) {
        return position >= 0 && position < size;
    }

    @Override
    public List<Projection> projections() {
        return List.of(SELECTIONS);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        return Stream.of(new Row(Map.of(
                "label",
                shortened(content.text("label").orElse("")),
                "rule",
                shortened(content.text("rule").orElse("")),
                "taken",
                (long) inputs.role(TAKEN).size(),
                "left_out",
                (long) inputs.about(LEFT_OUT).size())));
    }

    private static String shortened(String text) {
        return text.length() <= 200 ? text : text.substring(0, 199) + "\u2026";
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        String rule = content.text("rule").orElse("");
        return new Title(
                content.text("label").orElse(shortened(rule)),
                inputs.role(TAKEN).size() + " fits, " + inputs.about(LEFT_OUT).size() + " left out");
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.of(
                record.content().text("label").orElse(""),
                record.content().text("rule").orElse(""));
    }
}
