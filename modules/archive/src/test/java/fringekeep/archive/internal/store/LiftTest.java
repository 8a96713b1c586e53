package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.lineage.Recomputing;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Records of an earlier schema number are lifted in memory by a later program and never rewritten; an earlier program carries
 * records of a later number whole (record format 1, section 14).
 */
class LiftTest {
    @TempDir
    private Path folder;

    private final Script script = new Script();
    private Path place;
    private Hash reading;
    private Hash share;

    @BeforeEach
    void recordWithTheFirstSchema() throws Exception {
        place = folder.resolve("archive");
        try (Archive archive = Archives.found(place, Filled.founding(), LiftedKind.of(1), script.circumstances())) {
            reading = archive.record(Filled.content("reading", JsonObject.EMPTY.with("millimetres", 250)))
                    .fingerprint();
            share = record(archive, JsonObject.EMPTY.with("percent", 50));
        }
    }

    private Hash record(Archive archive, JsonObject choices) throws Exception {
        NewRecord request = new NewRecord(
                new KindName("share"),
                List.of(new InputReference.OfRecord("reading", reading)),
                List.of(),
                Map.of(PartName.CHOICES, choices),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
        return archive.record(archive.compute(request, List.of(), Work.QUIET)).fingerprint();
    }

    private Archive open(int schema) throws Exception {
        return Archives.open(place, LiftedKind.of(schema), script.circumstances());
    }

    private static byte[] bytes(Archive archive, Hash record, PartName part) {
        RecordView view = archive.record(record).orElseThrow();
        return archive.stored(Objects.requireNonNull(view.head().parts().get(part.text())))
                .orElseThrow();
    }

    private static List<Map<String, Object>> rows(Archive archive, String list) throws Exception {
        return archive.list(Listing.newest(list, 10)).rows().stream()
                .map(found -> found.row().values())
                .toList();
    }

    @Test
    void anOldRecordIsReadInItsNewestFormAndItsBytesStay() throws Exception {
        byte[] head;
        byte[] content;
        try (Archive older = open(1)) {
            head = older.stored(reading).orElseThrow();
            content = bytes(older, reading, PartName.CONTENT);
        }
        try (Archive newer = open(2)) {
            RecordView view = newer.record(reading).orElseThrow();
            assertThat(view.head().schema()).isEqualTo(1);
            assertThat(view.content()).isEqualTo(JsonObject.EMPTY.with("metres", 0.25));
            assertThat(newer.record(share).orElseThrow().result()).isEqualTo(JsonObject.EMPTY.with("share", 0.125));
            assertThat(newer.stored(reading)).hasValue(head);
            assertThat(bytes(newer, reading, PartName.CONTENT)).isEqualTo(content);
        }
    }

    @Test
    void listsAndWordsAreMadeAnewFromTheLiftedRecord() throws Exception {
        try (Archive older = open(1)) {
            assertThat(rows(older, "reading_list")).containsExactly(Map.of());
            assertThat(older.check(Work.QUIET)).isEmpty();
        }
        try (Archive newer = open(2)) {
            awaitLists(newer);
            assertThat(rows(newer, "reading_list")).containsExactly(Map.of("length_m", 0.25));
            assertThat(rows(newer, "share_list")).containsExactly(Map.of("share", 0.125));
            assertThat(withWord(newer, "metres")).hasSize(1);
            assertThat(withWord(newer, "millimetres")).isEmpty();
            assertThat(newer.check(Work.QUIET)).isEmpty();
        }
        try (Archive older = open(1)) {
            awaitLists(older);
            assertThat(rows(older, "reading_list")).containsExactly(Map.of());
            assertThat(older.check(Work.QUIET)).isEmpty();
        }
    }

    /** What opening found unfilled is filled on a thread of its own. */
    private static void awaitLists(Archive archive) {
        ((DerbyArchive) archive).awaitLists();
    }

    private static List<Row> withWord(Archive archive, String word) throws Exception {
        Listing listing = new Listing(
                "reading_list", List.of(), true, List.of(word), Optional.empty(), "n", true, Optional.empty(), 10);
        return archive.list(listing).rows().stream().map(found -> found.row()).toList();
    }

    @Test
    void anOldRecordIsRecomputedFromItsLiftedChoicesAndInputs() throws Exception {
        try (Archive newer = open(2)) {
            Recomputed recomputed = Recomputing.recompute(
                    newer.record(share).orElseThrow(), newer.inputs(share), newer.kinds(), Work.QUIET);
            assertThat(recomputed.verdict()).isEqualTo(Recomputed.Verdict.SAME_BITS);

            Hash again = record(newer, JsonObject.EMPTY.with("fraction", 0.2));
            assertThat(newer.record(again).orElseThrow().head().schema()).isEqualTo(2);
            assertThat(newer.record(again).orElseThrow().result()).isEqualTo(JsonObject.EMPTY.with("share", 0.05));
        }
    }

    @Test
    void aNewerSchemaIsCarriedCopiedAndChecked() throws Exception {
        Hash later;
        Hash made;
        byte[] content;
        try (Archive newer = open(2)) {
            later = newer.record(Filled.content("reading", JsonObject.EMPTY.with("metres", 0.5)))
                    .fingerprint();
            made = record(newer, JsonObject.EMPTY.with("fraction", 0.25));
            content = bytes(newer, later, PartName.CONTENT);
        }
        Path copy = folder.resolve("copy");
        try (Archive older = open(1)) {
            awaitLists(older);
            assertThat(older.record(later).orElseThrow().head().schema()).isEqualTo(2);
            assertThat(rows(older, "reading_list")).hasSize(1);
            assertThat(Recomputing.recompute(
                                    older.record(made).orElseThrow(), older.inputs(made), older.kinds(), Work.QUIET)
                            .reason())
                    .isEqualTo("kind-unknown");
            assertThat(older.check(Work.QUIET)).isEmpty();
            older.copyTo(copy, Work.QUIET);
        }
        try (Archive restored = Archives.restore(
                copy, folder.resolve("restored"), LiftedKind.of(1), script.circumstances(), Work.QUIET)) {
            assertThat(restored.check(Work.QUIET)).isEmpty();
        }
        try (Archive other =
                Archives.found(folder.resolve("other"), Filled.founding(), LiftedKind.of(1), script.circumstances())) {
            assertThat(other.receive(copy, false, Work.QUIET).records()).isEqualTo(4);
            assertThat(other.check(Work.QUIET)).isEmpty();
        }
        try (Archive other = Archives.open(folder.resolve("other"), LiftedKind.of(2), script.circumstances())) {
            awaitLists(other);
            assertThat(bytes(other, later, PartName.CONTENT)).isEqualTo(content);
            assertThat(rows(other, "reading_list")).containsExactly(Map.of("length_m", 0.5), Map.of("length_m", 0.25));
            assertThat(other.check(Work.QUIET)).isEmpty();
        }
    }
}
