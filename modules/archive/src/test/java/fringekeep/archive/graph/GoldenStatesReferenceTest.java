package fringekeep.archive.graph;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.RecordVectors;
import fringekeep.archive.internal.records.HeadCodec;
import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** States expected after entry 11 of the golden vectors (record format 1, end of section 17). */
class GoldenStatesReferenceTest {
    private static final List<Hash> IN_JOURNAL_ORDER = List.of(
            RecordVectors.COMPOUND,
            RecordVectors.BATCH,
            RecordVectors.SETUP,
            RecordVectors.RUN,
            RecordVectors.PROFILE,
            RecordVectors.SCAN,
            RecordVectors.PLACEMENT,
            RecordVectors.FIT,
            RecordVectors.MASK,
            RecordVectors.SETUP2);

    private static Head head(Hash hash) {
        try {
            return HeadCodec.read(RecordVectors.bytes(hash));
        } catch (ProblemException e) {
            throw new IllegalStateException(e);
        }
    }

    private static Graph graph(int records) throws ProblemException {
        GraphBuilder builder = new GraphBuilder(hash -> Optional.of(head(hash)));
        for (int i = 0; i < records; i++) {
            Hash hash = IN_JOURNAL_ORDER.get(i);
            builder.add(i + 2, head(hash), hash, content(head(hash)), Optional.empty());
        }
        return builder.snapshot();
    }

    private static Optional<JsonObject> content(Head head) throws ProblemException {
        Hash part = head.parts().get("content");
        return part == null
                ? Optional.empty()
                : Optional.of(PartCodec.read(RecordVectors.bytes(part)).value());
    }

    @Test
    void beforeTheMaskNothingIsOutdated() throws Exception {
        Graph graph = graph(8);

        assertThat(IN_JOURNAL_ORDER)
                .allSatisfy(hash -> assertThat(graph.states(hash)).isEmpty());
        assertThat(graph.outdated()).isEmpty();
        assertThat(graph.watermark()).isEqualTo(9);
    }

    @Test
    void afterEntryElevenTheFitAloneIsOutdated() throws Exception {
        Graph graph = graph(10);

        assertThat(graph.causes(RecordVectors.FIT))
                .containsExactly(
                        new Cause(Cause.Sort.CORRECTED, RecordVectors.SETUP, RecordVectors.SETUP2),
                        new Cause(Cause.Sort.JUDGED, RecordVectors.SCAN, RecordVectors.MASK));
        assertThat(graph.outdated()).containsExactly(RecordVectors.FIT);
        assertThat(graph.states(RecordVectors.FIT)).containsExactly(StateName.OUTDATED);
        assertThat(graph.states(RecordVectors.SETUP)).containsExactly(StateName.CORRECTED);
        assertThat(graph.states(RecordVectors.SCAN)).containsExactly(StateName.MASKED);
        assertThat(List.of(RecordVectors.RUN, RecordVectors.PLACEMENT, RecordVectors.SETUP2, RecordVectors.COMPOUND))
                .allSatisfy(hash -> assertThat(graph.states(hash)).isEmpty());
    }

    @Test
    void theSecondSetupHoldsAtAnyTime() throws Exception {
        Graph graph = graph(10);

        assertThat(graph.at(head(RecordVectors.SETUP).thing(), Instant.parse("1900-01-01T00:00:00Z")))
                .contains(RecordVectors.SETUP2);
        assertThat(graph.at(head(RecordVectors.SETUP).thing(), Instant.parse("2100-01-01T00:00:00Z")))
                .contains(RecordVectors.SETUP2);
        assertThat(graph.current(RecordVectors.SETUP)).contains(RecordVectors.SETUP2);
        assertThat(graph.records(head(RecordVectors.SETUP).thing()))
                .containsExactly(RecordVectors.SETUP, RecordVectors.SETUP2);
    }

    @Test
    void linksAreFollowedBothWays() throws Exception {
        Graph graph = graph(10);

        assertThat(graph.upstream(RecordVectors.FIT))
                .containsExactlyInAnyOrder(
                        RecordVectors.PROFILE,
                        RecordVectors.SCAN,
                        RecordVectors.PLACEMENT,
                        RecordVectors.SETUP,
                        RecordVectors.RUN,
                        RecordVectors.BATCH,
                        RecordVectors.COMPOUND);
        assertThat(graph.downstream(RecordVectors.PROFILE)).containsExactly(RecordVectors.SCAN, RecordVectors.FIT);
        assertThat(graph.speakingOf(RecordVectors.SCAN)).containsExactly(RecordVectors.PLACEMENT, RecordVectors.MASK);
        assertThat(graph.judgements(RecordVectors.SCAN)).containsExactly(RecordVectors.MASK);
        assertThat(graph.links(RecordVectors.PROFILE))
                .containsExactly(
                        new Graph.Link(RecordVectors.SCAN, RecordVectors.PROFILE, Graph.LinkSort.INPUT, "profile"));
    }
}
