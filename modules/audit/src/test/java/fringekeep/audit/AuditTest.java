package fringekeep.audit;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.lineage.Lineage;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Questions about lineage, asked of a real archive; each test enters readings of its own. */
class AuditTest {
    @TempDir
    private static Path folder;

    private static SmallArchive small;

    @BeforeAll
    static void found() throws Exception {
        small = SmallArchive.found(folder.resolve("archive"));
    }

    @AfterAll
    static void close() {
        small.archive().close();
    }

    private static Hash reading(double number) throws Exception {
        return small.reading(number, Optional.empty());
    }

    private static Hash total(Hash... terms) throws Exception {
        return small.total(List.of(terms).stream().map(SmallArchive::term).toList());
    }

    private static List<Revision> next(Hash target, Supposed supposed) throws Exception {
        return NextRevision.prepare(
                small.archive(), List.of(target), supposed, Map.of(), Optional.of(SmallArchive.PERSON), Work.QUIET);
    }

    @Test
    void aTraceHoldsEveryRecord() throws Exception {
        Hash one = reading(1);
        Hash two = reading(2);
        Hash sum = total(one, two);
        Hash top = total(sum, one);
        Archive archive = small.archive();
        Lineage lineage = Lineage.of(
                Lineage.source(archive::record, archive::inputs, archive::label),
                archive.kinds(),
                List.of(top),
                Lineage.Reach.MADE_FROM);

        String text = TraceText.of(lineage, archive.graph(), true);
        JsonObject json = TraceJson.of(lineage, archive.graph());

        assertThat(lineage.records()).hasSize(4);
        for (Hash hash : List.of(one, two, sum, top)) {
            assertThat(text).contains(archive.label(hash) + "  ");
        }
        assertThat(text).contains("(above)", "4 records, 2 of them computed");
        assertThat(json.array("records").items())
                .map(item -> ((JsonObject) item).text("record").orElseThrow())
                .containsExactlyInAnyOrder(one.hex(), two.hex(), sum.hex(), top.hex());
    }

    @Test
    void everythingUpstreamComesOutWithTheSameBits() throws Exception {
        Hash sum = total(reading(0.1), reading(0.2));
        Hash top = total(sum, reading(0.3));

        Recompute.Verdicts verdicts = Recompute.upstreamOf(small.archive(), List.of(top), Work.QUIET);

        assertThat(verdicts.worst()).isEqualTo(Recomputed.Verdict.SAME_BITS);
        assertThat(verdicts.counts()).containsEntry("same bits", 2).containsEntry("not computable (entered)", 3);
    }

    @Test
    void aCorrectionIsFollowedWithoutRecordingUntilAsked() throws Exception {
        Hash wrong = reading(10);
        Hash sum = total(wrong, reading(5));
        Hash top = total(sum);
        small.reading(11, Optional.of(wrong));
        Hash before = small.archive().journalHead();
        assertThat(small.archive().graph().states(top)).contains(StateName.OUTDATED);

        List<Revision> revisions = next(top, Supposed.NOTHING);

        assertThat(small.archive().journalHead()).isEqualTo(before);
        assertThat(revisions).map(Revision::before).containsExactly(sum, top);
        assertThat(revisions.get(0).shifts()).containsExactly(new Shift("/sum", 15, 16, 0.5 * Math.sqrt(2)));
        assertThat(revisions.get(1).shifts()).containsExactly(new Shift("/sum", 15, 16, 0.5));

        NextRevision.record(small.archive(), revisions);
        Hash now = small.archive().graph().current(top).orElseThrow();
        assertThat(now).isNotEqualTo(top);
        assertThat(small.archive().graph().states(now)).doesNotContain(StateName.OUTDATED);
        assertThat(next(now, Supposed.NOTHING)).isEmpty();
        assertThat(next(top, Supposed.NOTHING)).isEmpty();
    }

    @Test
    void whatLostItsOnlyInputFallsAway() throws Exception {
        Hash only = reading(3);
        Hash sum = total(only);
        small.withdraw(only);

        List<Revision> revisions = next(sum, Supposed.NOTHING);

        assertThat(revisions).hasSize(1);
        assertThat(revisions.get(0).after()).isEmpty();
        assertThat(revisions.get(0).reasons()).map(reason -> reason.code()).containsExactly(NextRevision.FALLS_AWAY);
    }

    @Test
    void aSupposedWithdrawalIsWorkedOutAndNotRecorded() throws Exception {
        Hash one = reading(1);
        Hash sum = total(one, reading(7));
        Hash before = small.archive().journalHead();

        List<Revision> revisions = next(sum, new Supposed(Set.of(one), Map.of()));

        assertThat(revisions).hasSize(1);
        assertThat(revisions.get(0).shifts()).containsExactly(new Shift("/sum", 8, 7, 0.5 * Math.sqrt(2)));
        assertThat(small.archive().journalHead()).isEqualTo(before);
        assertThat(next(sum, Supposed.NOTHING)).isEmpty();
    }
}
