package fringekeep.archive.internal.store;

import static fringekeep.archive.internal.store.Filled.correcting;
import static fringekeep.archive.internal.store.Filled.following;
import static fringekeep.archive.internal.store.Filled.labelled;
import static fringekeep.archive.internal.store.Filled.madeFrom;
import static fringekeep.archive.internal.store.Filled.only;
import static fringekeep.archive.internal.store.Filled.thing;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.Archive.Recorded;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;

/** Rules of record format 1, sections 7, 11 and 15, that need the archive. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class RecordingRulesTest {
    @TempDir
    private static Path folder;

    private Archive archive;

    @BeforeAll
    void found() throws Exception {
        archive = Filled.found(folder.resolve("archive"), new Script());
    }

    @AfterAll
    void close() throws Exception {
        assertThat(archive.check(Work.QUIET)).isEmpty();
        archive.close();
    }

    private static List<String> codes(ThrowingCallable work) {
        List<String> codes = new ArrayList<>();
        assertThatThrownBy(work)
                .isInstanceOfSatisfying(
                        ProblemException.class, e -> e.problems().forEach(problem -> codes.add(problem.code())));
        return codes;
    }

    @Test
    void numbersCountThingsOfAKindAndLettersCountCorrections() throws Exception {
        Recorded first = archive.record(labelled("note", "one"));
        Recorded second = archive.record(labelled("note", "two"));
        Recorded corrected = archive.record(correcting(labelled("note", "one, mended"), first.fingerprint()));
        Recorded again = archive.record(correcting(labelled("note", "one, mended twice"), corrected.fingerprint()));

        String number = first.label().substring("note ".length());
        assertThat(Integer.parseInt(second.label().substring("note ".length())))
                .isEqualTo(Integer.parseInt(number) + 1);
        assertThat(corrected.label()).isEqualTo(first.label() + " b");
        assertThat(again.label()).isEqualTo(first.label() + " c");
        assertThat(archive.find(first.label())).isEqualTo(again.fingerprint());
        assertThat(archive.find(first.label() + " b")).isEqualTo(corrected.fingerprint());
        assertThat(archive.find("NOTE-" + number + "c")).isEqualTo(again.fingerprint());
        assertThat(archive.find(first.label() + " a")).isEqualTo(first.fingerprint());
    }

    @Test
    void onlyWhatIsCurrentCanBeCorrectedAndTheNewerOneIsNamed() throws Exception {
        Recorded old = archive.record(labelled("setup", "short bench"));
        Recorded now = archive.record(correcting(labelled("setup", "shorter bench"), old.fingerprint()));

        assertThatThrownBy(() -> archive.record(correcting(labelled("setup", "other bench"), old.fingerprint())))
                .isInstanceOfSatisfying(ProblemException.class, e -> {
                    Problem problem = e.problems().get(0);
                    assertThat(problem.code()).isEqualTo("record.not-current");
                    assertThat(problem.what()).contains(now.label());
                });
    }

    @Test
    void continuationsHaveTheNumberOfTheirThingAndDifferentBegins() throws Exception {
        Recorded first = archive.record(labelled("setup", "bench"));
        NewRecord next =
                following(labelled("setup", "bench, new grating"), first.fingerprint(), "2031-06-01T08:00:00Z");
        Recorded second = archive.record(next);

        assertThat(second.label()).isEqualTo(first.label() + " from 2031-06-01T08:00:00Z");
        assertThat(archive.find(first.label())).isEqualTo(second.fingerprint());
        assertThat(archive.find(second.label())).isEqualTo(second.fingerprint());
        assertThat(archive.find(first.label() + " a")).isEqualTo(first.fingerprint());
        assertThat(codes(() -> archive.record(
                        following(labelled("setup", "bench again"), first.fingerprint(), "2031-06-01T08:00:00Z"))))
                .containsExactly("record.equal-begin");
        assertThat(codes(() -> archive.record(
                        following(labelled("setup", "bench earlier"), second.fingerprint(), "2031-05-01T08:00:00Z"))))
                .isNotEmpty();
        assertThat(codes(() -> archive.record(correcting(labelled("setup", "no begin"), second.fingerprint()))))
                .isNotEmpty();
    }

    @Test
    void aScanIsPlacedOnceAndThenCorrected() throws Exception {
        Recorded scan = archive.record(labelled("scan", "a scan"));
        Recorded placed = archive.record(labelled("placement", "signal", thing("scan", scan.fingerprint())));

        assertThat(codes(() -> archive.record(labelled("placement", "again", thing("scan", scan.fingerprint())))))
                .containsExactly("placement.second");
        Recorded corrected = archive.record(
                correcting(labelled("placement", "test", thing("scan", scan.fingerprint())), placed.fingerprint()));
        assertThat(corrected.label()).endsWith(" b");
    }

    @Test
    void twoPlacementsOfOneScanInOneActAreRefusedWhole() throws Exception {
        Recorded scan = archive.record(labelled("scan", "another scan"));
        Prepared one = archive.prepare(labelled("placement", "one", thing("scan", scan.fingerprint())), List.of());
        Prepared two = archive.prepare(labelled("placement", "two", thing("scan", scan.fingerprint())), List.of());
        long before = archive.facts().watermark();

        assertThat(codes(() -> archive.record(List.of(one, two)))).containsExactly("placement.second");
        assertThat(archive.facts().watermark()).isEqualTo(before);
        assertThat(archive.record(one.fingerprint())).isEmpty();
    }

    @Test
    void aJudgementThatWasUndoneIsNotCorrected() throws Exception {
        Recorded scan = archive.record(labelled("scan", "doubtful"));
        NewRecord withdrawing = Filled.content(
                "judgement",
                JsonObject.EMPTY.with("verdict", "withdrawn").with("reason", "mode-hop"),
                only("target", scan.fingerprint()));
        Recorded withdrawn = archive.record(withdrawing);
        archive.record(Filled.content(
                "judgement",
                JsonObject.EMPTY.with("verdict", "restored").with("reason", "mistaken"),
                only("undoes", withdrawn.fingerprint())));

        assertThat(codes(() -> archive.record(correcting(withdrawing, withdrawn.fingerprint()))))
                .containsExactly("judgement.not-live");
    }

    @Test
    void aRawFileMustBeTakenInWithItsTrueLength() throws Exception {
        byte[] bytes = "0 12\n1 15\n".getBytes(StandardCharsets.UTF_8);
        Hash raw = Hash.of(bytes);

        assertThat(codes(() -> archive.record(
                        madeFrom(labelled("scan", "early"), new InputReference.OfRaw("raw", raw, bytes.length)))))
                .isNotEmpty();
        assertThat(archive.takeIn(bytes).known()).isFalse();
        assertThat(codes(() ->
                        archive.record(madeFrom(labelled("scan", "short"), new InputReference.OfRaw("raw", raw, 3)))))
                .isNotEmpty();
        Recorded scan =
                archive.record(madeFrom(labelled("scan", "whole"), new InputReference.OfRaw("raw", raw, bytes.length)));
        assertThat(archive.takeIn(bytes).known()).isTrue();
        assertThat(archive.inputs(scan.fingerprint()).all().get(0).rawBytes()).hasValue(bytes);
    }

    @Test
    void aRecordThatRefersToNothingIsRefused() {
        assertThat(codes(() -> archive.record(labelled("batch", "B", thing("compound", OpenKind.nowhere())))))
                .isNotEmpty();
    }

    @Test
    void noMoreThanAHundredRecordsAtOnceAndNotNone() throws Exception {
        List<Prepared> many = new ArrayList<>();
        for (int i = 0; i <= Recording.MOST; i++) {
            many.add(archive.prepare(labelled("note", "many " + i), List.of()));
        }

        assertThat(codes(() -> archive.record(many))).containsExactly("record.count");
        assertThat(codes(() -> archive.record(List.<Prepared>of()))).containsExactly("record.count");
        assertThat(archive.record(many.subList(0, Recording.MOST))).hasSize(Recording.MOST);
    }

    @Test
    void theSamePreparedRecordIsRecordedOnce() throws Exception {
        Prepared note = archive.prepare(labelled("note", "once"), List.of());
        archive.record(List.of(note));

        assertThat(codes(() -> archive.record(List.of(note)))).contains("record.known");
    }

    @Test
    void recordingRemovesTheDraftItWasEnteredIn() throws Exception {
        String id = "0f".repeat(16);
        archive.drafts().save(id, JsonObject.EMPTY.with("kind", "note").with("text", "half a thought"));
        assertThat(archive.drafts().get(id).orElseThrow().text("text")).contains("half a thought");

        archive.record(List.of(archive.prepare(labelled("note", "a thought"), List.of())), Set.of(id));

        assertThat(archive.drafts().get(id)).isEmpty();
        assertThat(archive.drafts().all()).doesNotContainKey(id);
    }

    @Test
    void whatIsNotThereIsSaidSo() {
        assertThat(codes(() -> archive.find("scan 9999"))).containsExactly("reference.unknown");
        assertThat(codes(() -> archive.find("what is this?"))).containsExactly("reference.unknown");
        assertThat(codes(() -> archive.find(OpenKind.nowhere().hex()))).containsExactly("reference.unknown");
    }
}
