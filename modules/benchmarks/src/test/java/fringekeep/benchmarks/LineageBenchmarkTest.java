package fringekeep.benchmarks;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.GraphBuilder;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.ThingId;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

/** Tracing and what is outdated on the graph in memory at three sizes; what counts is how times grow. */
class LineageBenchmarkTest {
    private static final int SCANS_OF_A_PROPERTY = 100;
    private static final int CORRECTED_SETUPS = 10;

    /** A graph: a setup, 100 scans, 100 fits and a property a block; ten setups are corrected at the end. */
    private static final class Lab {
        private final Map<Hash, Head> heads = new HashMap<>();
        private final GraphBuilder builder = new GraphBuilder(hash -> Optional.ofNullable(heads.get(hash)));
        private final List<Hash> setups = new ArrayList<>();
        private final List<Hash> properties = new ArrayList<>();
        private long entries;

        Lab(int scans) {
            for (int block = 0; block < scans / SCANS_OF_A_PROPERTY; block++) {
                Hash setup = add("setup", List.of(), Optional.empty());
                setups.add(setup);
                List<InputReference> fits = new ArrayList<>();
                for (int k = 0; k < SCANS_OF_A_PROPERTY; k++) {
                    Hash scan = add("scan", List.of(), Optional.empty());
                    Hash fit = add("fit", List.of(input("scan", scan), input("setup", setup)), Optional.empty());
                    fits.add(input("fit", fit));
                }
                properties.add(add("property", fits, Optional.empty()));
            }
            for (int k = 0; k < CORRECTED_SETUPS; k++) {
                add("setup", List.of(), Optional.of(setups.get(k * setups.size() / CORRECTED_SETUPS)));
            }
        }

        private static InputReference input(String role, Hash record) {
            return new InputReference.OfRecord(role, record);
        }

        private Hash add(String kind, List<InputReference> inputs, Optional<Hash> corrects) {
            entries++;
            Hash hash = Hash.of((kind + entries).getBytes(StandardCharsets.UTF_8));
            ThingId thing = corrects.map(this::thing)
                    .orElseGet(() -> new ThingId(HexFormat.of().formatHex(hash.bytes(), 0, 16)));
            Head head = new Head(
                    new KindName(kind),
                    1,
                    thing,
                    inputs,
                    List.of(),
                    List.of(),
                    new TreeMap<>(Map.of("content", hash, "made", hash)),
                    new TreeMap<>(),
                    corrects,
                    Optional.empty());
            if (kind.equals("setup")) {
                heads.put(hash, head);
            }
            builder.add(entries, head, hash, Optional.empty(), Optional.empty());
            return hash;
        }

        private ThingId thing(Hash setup) {
            return Optional.ofNullable(heads.get(setup)).orElseThrow().thing();
        }
    }

    private record Times(double build, double upstream, double downstream, double outdated) {}

    private static Times measure(int scans) {
        Lab[] lab = new Lab[1];
        double build = Bench.cpu(() -> lab[0] = new Lab(scans));
        Graph graph = lab[0].builder.snapshot();
        Hash property = lab[0].properties.get(lab[0].properties.size() / 2);
        Hash setup = lab[0].setups.get(lab[0].setups.size() / CORRECTED_SETUPS);
        assertThat(graph.upstream(property)).hasSize(2 * SCANS_OF_A_PROPERTY + 1);
        assertThat(graph.downstream(setup)).hasSize(SCANS_OF_A_PROPERTY + 1);
        assertThat(graph.outdated()).hasSize(CORRECTED_SETUPS * (SCANS_OF_A_PROPERTY + 1));
        double[] up = new double[9];
        double[] down = new double[9];
        double[] outdated = new double[9];
        for (int round = 0; round < up.length; round++) {
            up[round] = Bench.cpu(() -> walk(graph, property, true)) / 200;
            down[round] = Bench.cpu(() -> walk(graph, setup, false)) / 200;
            outdated[round] = Bench.cpu(() -> {
                        for (int k = 0; k < 20; k++) {
                            assertThat(lab[0].builder.snapshot().outdated()).isNotEmpty();
                        }
                    })
                    / 20;
        }
        return new Times(build, Bench.median(up), Bench.median(down), Bench.median(outdated));
    }

    private static void walk(Graph graph, Hash record, boolean up) {
        for (int k = 0; k < 200; k++) {
            assertThat((up ? graph.upstream(record) : graph.downstream(record)).isEmpty())
                    .isFalse();
        }
    }

    @Test
    void traceAndOutdatedGrowLessThanTheArchive() {
        measure(4_000);
        measure(40_000);
        Times small = measure(4_000);
        for (int scans : new int[] {4_000, 40_000, 400_000}) {
            Times times = measure(scans);
            Bench.print(
                    "%7d scans: trace up %9.1f us (x%.2f), down %9.1f us (x%.2f), outdated %9.1f us (x%.2f), built in"
                            + " %.2f s",
                    scans,
                    1e6 * times.upstream,
                    times.upstream / small.upstream,
                    1e6 * times.downstream,
                    times.downstream / small.downstream,
                    1e6 * times.outdated,
                    times.outdated / small.outdated,
                    times.build);
        }
    }
}
