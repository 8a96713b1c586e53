package fringekeep.archive.judgement;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.FlatTable;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.kind.Title;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.StringJoiner;
import java.util.stream.Stream;

/** What people judge of records: withdrawn, masked, doubted, restored, preferred. */
public final class JudgementKind implements RecordKind {
    private static final KindName KIND = new KindName("judgement");
    private static final int MOST = 10_000;
    private static final int LONGEST_CELL = 200;
    private static final Projection JUDGEMENTS = new Projection(
            "judgement",
            KIND,
            List.of(
                    Column.text("verdict", "verdict"),
                    Column.text("reason", "reason"),
                    Column.text("channel", "channel"),
                    Column.text("points", "rows"),
                    Column.integer("subjects", "records"),
                    Column.text("subject_kind", "of"),
                    Column.text("words", "words")),
            List.of(List.of("verdict")));
    private static final Projection SUBJECTS = new Projection(
            "judgement_subject",
            KIND,
            List.of(
                    Column.text("verdict", "verdict"),
                    Column.text("subject_role", "role"),
                    Column.hash("subject", "record"),
                    Column.text("reach", "reach")),
            List.of(List.of("subject")));

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
        return Schemas.numbered("judgement", number, schema());
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
        return List.of(
                Role.anyKind("target", 0, MOST),
                Role.of("undoes", KIND.text(), 0, MOST),
                Role.anyKind("chosen", 0, 1),
                Role.anyKind("over", 0, MOST));
    }

    @Override
    public List<Problem> examine(Parts parts, Inputs inputs) {
        return JudgementRules.examine(parts, inputs);
    }

    @Override
    public List<Projection> projections() {
        return List.of(JUDGEMENTS, SUBJECTS);
    }

    @Override
    public Stream<Row> rows(Projection projection, RecordView record, Inputs inputs) {
        return projection.name().equals(SUBJECTS.name())
                ? inputs.about().stream().map(subject -> subjectRow(record, subject))
                : Stream.of(row(record, inputs));
    }

    private static Row subjectRow(RecordView record, Subject subject) {
        Map<String, Object> values = new HashMap<>();
        record.content().text("verdict").ifPresent(verdict -> values.put("verdict", verdict));
        values.put("subject_role", subject.role());
        values.put("subject", subject.target());
        values.put("reach", subject.reach().name().toLowerCase(Locale.ROOT));
        return new Row(values);
    }

    private static Row row(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        Map<String, Object> values = new HashMap<>();
        content.text("verdict").ifPresent(verdict -> values.put("verdict", verdict));
        content.text("reason").ifPresent(reason -> values.put("reason", Verdict.words(reason)));
        content.text("channel").ifPresent(channel -> values.put("channel", cell(channel)));
        if (content.get("points").isPresent()) {
            values.put("points", cell(points(content)));
        }
        values.put("subjects", (long) inputs.about().size());
        inputs.about().stream()
                .flatMap(subject -> subject.record().stream())
                .findFirst()
                .ifPresent(
                        first -> values.put("subject_kind", first.head().kind().text()));
        words(record, PartName.REMARK).ifPresent(words -> values.put("words", cell(words)));
        return new Row(values);
    }

    static Optional<String> words(RecordView record, PartName part) {
        return record.part(part).flatMap(remark -> remark.text("text"));
    }

    static String cell(String text) {
        String line = text.replace('\n', ' ');
        return line.length() <= LONGEST_CELL ? line : line.substring(0, LONGEST_CELL - 1) + "…";
    }

    private static String points(JsonObject content) {
        StringJoiner ranges = new StringJoiner(", ");
        for (Json range : content.array("points").items()) {
            double[] ends = ((JsonArray) range).numbers();
            ranges.add(ends[0] == ends[1] ? whole(ends[0]) : whole(ends[0]) + "–" + whole(ends[1]));
        }
        return ranges.toString();
    }

    private static String whole(double number) {
        return Long.toString((long) number);
    }

    @Override
    public Title title(RecordView record, Inputs inputs) {
        JsonObject content = record.content();
        if (content.text("verdict").isEmpty()) {
            return new Title("judgement, withheld", "");
        }
        String text = content.text("verdict").orElse("") + ": "
                + Verdict.words(content.text("reason").orElse(""));
        StringJoiner detail = new StringJoiner(", ");
        content.text("channel").ifPresent(channel -> detail.add("channel " + channel));
        if (content.get("points").isPresent()) {
            detail.add("rows " + points(content));
        }
        words(record, PartName.REMARK).ifPresent(words -> detail.add(cell(words)));
        return new Title(text, detail.toString());
    }

    @Override
    public List<FlatTable> tables(RecordView record, Inputs inputs) {
        List<FlatTable.FlatColumn> columns = List.of(
                Schemas.textColumn("verdict", "verdict", "What is judged."),
                Schemas.textColumn("reason", "reason", "Code of the reason."),
                Schemas.textColumn("channel", "channel", "Channel that is masked; empty for all."),
                Schemas.textColumn("rows", "rows", "Rows that are masked, counted from 0; empty for all."),
                Schemas.textColumn("subject_role", "role", "Part the judged record plays."),
                Schemas.textColumn("subject", "record", "Fingerprint of the judged record."));
        List<List<Optional<Object>>> rows = new ArrayList<>();
        JsonObject content = record.content();
        for (Subject subject : inputs.about()) {
            rows.add(List.of(
                    content.text("verdict").map(Object.class::cast),
                    content.text("reason").map(Object.class::cast),
                    content.text("channel").map(Object.class::cast),
                    content.get("points").map(points -> points(content)),
                    Optional.of(subject.role()),
                    Optional.of(subject.target().hex())));
        }
        return List.of(new FlatTable("judgement", columns, rows));
    }

    @Override
    public Stream<String> words(RecordView record) {
        return Stream.of(
                        words(record, PartName.REMARK),
                        record.content().text("verdict"),
                        record.content().text("reason").map(Verdict::words))
                .flatMap(Optional::stream);
    }
}
