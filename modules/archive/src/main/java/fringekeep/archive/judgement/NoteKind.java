package fringekeep.archive.judgement;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.Moment;
import fringekeep.archive.record.PartName;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/** Words about records or about nothing in particular, with attached files. */
public final class NoteKind implements RecordKind {
    private static final KindName KIND = new KindName("note");
    private static final int MOST = 10_000;
    private static final String ATTACHMENT = "attachment";
    private static final Projection NOTES = new Projection(
            "note",
            KIND,
            List.of(
                    Column.text("heading", "heading"),
                    Column.instant("at", "at"),
                    Column.integer("subjects", "records"),
                    Column.integer("attachments", "files"),
                    Column.text("words", "words")),
            List.of(List.of("at")));

    @Override
    public KindName kind() {
        return KIND;
    }

    @Override
    public int schema() {
        return 1;
    }

    @Override
    public JsonObject jsonSchema(int number) {
        return Schemas.numbered("note", number, schema());
    }

    @Override
    public Set<PartName> sealedParts() {
        return Set.of(PartName.WHO, PartName.REMARK);
    }

    @Override
    public List<Role> inputRoles() {
        return List.of(Role.ofRaw(ATTACHMENT, 0, MOST));
    }

    @Override
    public List<Role> aboutRoles() {
        return List.of(Role.anyKind("subject", 0, MOST));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        JsonObject content = parts.get(PartName.CONTENT).orElse(JsonObject.EMPTY);
        int described = content.array("attachments").items().size();
        int attached = inputs.role(ATTACHMENT).size();
        boolean match = content.get("attachments").isEmpty() || described == attached;
        return match
                ? List.of()
                : List.of(new Problem(
                        "note.attachments",
                        described + " attachments are described, " + attached + " files are attached.",
                        "/content/attachments",
                        "Describe each attached file, in order. Nothing has been stored."));
    }

    @Override
    public List<Projection> projections() {
        return List.of(NOTES);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        Map<String, Object> values = new HashMap<>();
        record.content().text("heading").ifPresent(heading -> values.put("heading", JudgementKind.cell(heading)));
        moment(record).ifPresent(moment -> values.put("at", moment.at()));
        values.put("subjects", (long) inputs.about().size());
        values.put("attachments", (long) inputs.all().size());
        JudgementKind.words(record, PartName.REMARK).ifPresent(words -> values.put("words", JudgementKind.cell(words)));
        return Stream.of(new Row(values));
    }

    private static Optional<Moment> moment(RecordView record) {
        return record.content().object("at").map(QuantityJson::moment);
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        String heading = record.content().text("heading").orElse("note");
        return new Title(
                heading,
                JudgementKind.words(record, PartName.REMARK)
                        .map(JudgementKind::cell)
                        .orElse(""));
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        List<FlatTable.FlatColumn> columns = List.of(
                Schemas.textColumn("heading", "heading", "What the note is about."),
                Schemas.textColumn("at", "at", "Moment the note speaks of (UTC)."),
                Schemas.textColumn("text", "text", "The words; empty where withheld."));
        return List.of(new FlatTable(
                "note",
                columns,
                List.of(List.of(
                        record.content().text("heading").map(Object.class::cast),
                        moment(record).map(moment -> moment.at().toString()),
                        JudgementKind.words(record, PartName.REMARK).map(Object.class::cast)))));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.of(record.content().text("heading"), JudgementKind.words(record, PartName.REMARK))
                .flatMap(Optional::stream);
    }
}
