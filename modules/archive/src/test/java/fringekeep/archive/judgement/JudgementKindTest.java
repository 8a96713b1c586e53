package fringekeep.archive.judgement;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.NewRecord;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.Role;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.making.DemoKind;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.AboutReference.Reach;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class JudgementKindTest {
    private final DetachedRecords records = new DetachedRecords(
            new JudgementKind(),
            new NoteKind(),
            DemoKind.open("scan", List.of(), List.of()),
            DemoKind.open("fit", List.of(), List.of(Role.anyKind("of", 0, 1))));
    private Hash scan;
    private Hash other;
    private Hash fit;

    @BeforeEach
    void record() throws Exception {
        scan = records.enter("scan", JsonObject.EMPTY);
        other = records.enter("scan", JsonObject.EMPTY);
        fit = records.enter("fit", JsonObject.EMPTY);
    }

    private static JsonObject content(String verdict, String reason) {
        return JsonObject.EMPTY.with("verdict", verdict).with("reason", reason);
    }

    private static AboutReference about(String role, Hash record, Reach reach) {
        return new AboutReference(role, record, reach);
    }

    /** The mask of the golden vectors (record format 1, section 17). */
    @Test
    void theGoldenMaskIsAccepted() throws Exception {
        JsonObject content = PartCodec.read(RecordVectors.bytes(
                        new Hash("5dc330842c0acfba47b7c906dbcb93a93521d67b8768d7ff428fbe63b5ee9f03")))
                .value();
        JsonObject remark = JsonObject.EMPTY.with("text", "laser jumped");
        Hash mask = judge(content, Optional.of(remark), about("target", scan, Reach.RECORD));

        assertThat(new JudgementKind()
                        .title(records.view(mask), records.inputs(mask))
                        .text())
                .isEqualTo("masked: mode hop");
        assertThat(new JudgementKind()
                        .title(records.view(mask), records.inputs(mask))
                        .detail())
                .isEqualTo("channel counts, rows 3, laser jumped");
        assertThat(new JudgementKind().words(records.view(mask))).contains("laser jumped", "mode hop");
    }

    private Hash judge(JsonObject content, Optional<JsonObject> remark, AboutReference... about)
            throws ProblemException {
        Map<PartName, JsonObject> parts = remark.isPresent()
                ? Map.of(PartName.CONTENT, content, PartName.REMARK, remark.get())
                : Map.of(PartName.CONTENT, content);
        return records.record(new NewRecord(
                new KindName("judgement"),
                List.of(),
                List.of(about),
                parts,
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty()));
    }

    @Test
    void eachVerdictHasItsRolesAndReach() {
        JsonObject withdrawn = content("withdrawn", "truncated");
        JsonObject masked = content("masked", "spike").with("channel", "counts");
        JsonObject preferred = content("preferred", "agreed");

        assertThat(codes(() -> records.enter("judgement", withdrawn))).containsExactly("judgement.nothing");
        assertThat(codes(() -> records.enter("judgement", withdrawn, about("chosen", scan, Reach.RECORD))))
                .containsExactly("judgement.role", "judgement.nothing");
        assertThat(codes(() -> records.enter("judgement", masked, about("target", scan, Reach.THING))))
                .containsExactly("judgement.reach");
        assertThat(codes(() -> records.enter("judgement", preferred, about("chosen", scan, Reach.RECORD))))
                .containsExactly("judgement.nothing");
        assertThat(codes(() -> records.enter(
                        "judgement", preferred, about("chosen", scan, Reach.RECORD), about("over", fit, Reach.RECORD))))
                .containsExactly("judgement.kinds");
        assertThat(codes(() -> records.enter(
                        "judgement",
                        preferred,
                        about("chosen", scan, Reach.RECORD),
                        about("over", scan, Reach.RECORD))))
                .containsExactly("judgement.itself");
        assertThat(codes(() -> records.enter(
                        "judgement", content("restored", "cause-mended"), about("undoes", scan, Reach.RECORD))))
                .containsExactly("record.role-kind");
    }

    @Test
    void aJudgementCanBePreferredWithdrawnAndRestored() throws Exception {
        Hash preferred = records.enter(
                "judgement",
                content("preferred", "agreed"),
                about("chosen", scan, Reach.RECORD),
                about("over", other, Reach.RECORD));
        Hash restored = records.enter(
                "judgement", content("restored", "judged-in-error"), about("undoes", preferred, Reach.RECORD));

        assertThat(records.view(restored).content().text("verdict")).contains("restored");
    }

    @Test
    void masksSayWhatTheyMask() {
        AboutReference target = about("target", scan, Reach.RECORD);
        JsonObject bare = content("masked", "spike");

        assertThat(codes(() -> records.enter("judgement", bare, target))).containsExactly("judgement.mask");
        assertThat(codes(() -> records.enter("judgement", bare.with("points", ranges(5, 4)), target)))
                .containsExactly("judgement.points");
        assertThat(codes(() -> records.enter("judgement", bare.with("points", ranges(1, 4, 4, 6)), target)))
                .containsExactly("judgement.points");
        assertThat(codes(() ->
                        records.enter("judgement", content("doubted", "drift").with("channel", "counts"), target)))
                .containsExactly("judgement.no-mask");
        assertThat(codes(() -> records.enter("judgement", bare.with("points", ranges(-1, 4)), target)))
                .containsExactly("schema.minimum");
    }

    private static JsonArray ranges(double... ends) {
        List<Json> ranges = new ArrayList<>();
        for (int i = 0; i < ends.length; i += 2) {
            ranges.add(JsonArray.ofNumbers(ends[i], ends[i + 1]));
        }
        return new JsonArray(ranges);
    }

    @Test
    void reasonsComeFromTheListOfTheVerdictAndOtherNeedsWords() {
        AboutReference target = about("target", scan, Reach.RECORD);

        assertThat(codes(() -> records.enter("judgement", content("doubted", "truncated"), target)))
                .contains("schema.enum");
        assertThat(codes(() -> records.enter("judgement", content("doubted", "other"), target)))
                .containsExactly("judgement.other");
    }

    @Test
    void rowsHoldValuesOfTheirColumnsOnly() throws Exception {
        Hash judgement =
                records.enter("judgement", content("withdrawn", "truncated"), about("target", scan, Reach.THING));
        Hash note = records.enter(
                "note", JsonObject.EMPTY.with("heading", "lamp changed"), about("subject", scan, Reach.THING));

        for (Projection projection : new JudgementKind().projections()) {
            assertRows(
                    projection,
                    new JudgementKind()
                            .rows(projection, records.view(judgement), records.inputs(judgement))
                            .toList());
        }
        for (Projection projection : new NoteKind().projections()) {
            assertRows(
                    projection,
                    new NoteKind()
                            .rows(projection, records.view(note), records.inputs(note))
                            .toList());
        }
    }

    private static void assertRows(Projection projection, List<Row> rows) {
        assertThat(rows).hasSize(1);
        assertThat(projection.columns().stream().map(Column::name).toList())
                .containsAll(rows.get(0).values().keySet());
    }

    @Test
    void notesDescribeTheirAttachments() throws Exception {
        InputReference file = records.raw("attachment", new byte[] {1, 2});
        JsonObject heading = JsonObject.EMPTY.with("heading", "photo of the oven");
        JsonObject described = heading.with("attachments", JsonArray.of(JsonObject.EMPTY.with("name", "oven.png")));

        assertThat(records.inputs(note(described, file)).all()).hasSize(1);
        assertThat(codes(() -> note(described))).containsExactly("note.attachments");
    }

    private Hash note(JsonObject content, InputReference... files) throws ProblemException {
        return records.record(new NewRecord(
                new KindName("note"),
                List.of(files),
                List.of(),
                Map.of(PartName.CONTENT, content),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty()));
    }

    @Test
    void bothKindsAreAnnounced() {
        assertThat(Kinds.announced(JudgementKindTest.class.getClassLoader()).all())
                .extracting(kind -> kind.kind().text())
                .contains("judgement", "note");
    }

    private static List<String> codes(ThrowingCallable call) {
        List<String> codes = new ArrayList<>();
        assertThatThrownBy(call)
                .isInstanceOfSatisfying(
                        ProblemException.class, e -> e.problems().forEach(problem -> codes.add(problem.code())));
        return codes;
    }
}
