package fringekeep.benchmarks;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.lineage.Lineage;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.testsupport.OtherProgram;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Start-up, trace and outdated of real archives on disk at several sizes; what counts is how times grow. The property
 * {@code sizes} lists other numbers of scans, smallest first; making 400,000 scans takes long.
 */
class ArchiveBenchmarkTest {
    private static final int ROUNDS = 7;
    private static final int WALKS = 200;

    @TempDir
    private static Path folder;

    /** An archive on disk. */
    private record Made(int scans, long records, Path place) {}

    private static List<Made> archives() throws ProblemException {
        List<Made> made = new ArrayList<>();
        for (String size : System.getProperty("sizes", "200,4000,40000").split(",")) {
            int scans = Integer.parseInt(size);
            Path place = folder.resolve("scans-" + scans);
            long begin = System.nanoTime();
            long records = ManyRecords.make(place, scans);
            double seconds = (System.nanoTime() - begin) * 1e-9;
            Bench.print(
                    "%7d scans: %d records recorded a hundred a transaction in %.0f s, %.0f records a second",
                    scans, records, seconds, records / seconds);
            made.add(new Made(scans, records, place));
        }
        return made;
    }

    @Test
    void startUpTraceAndOutdatedGrowLessThanTheArchive() throws Exception {
        List<Made> archives = archives();
        startUp(archives);
        double[] before = new double[0];
        for (Made made : archives) {
            before = lineage(made, before);
        }
    }

    /** Cold processes, all sizes in turn. */
    private static void startUp(List<Made> archives) throws IOException, InterruptedException {
        double[][][] times = new double[archives.size()][5][ROUNDS];
        for (int round = 0; round < ROUNDS; round++) {
            for (int i = 0; i < archives.size(); i++) {
                double[] one = opened(archives.get(i));
                for (int k = 0; k < one.length; k++) {
                    times[i][k][round] = one[k];
                }
            }
        }
        for (int i = 0; i < archives.size(); i++) {
            double[] ratios = ratios(times[i][4], times[0][4]);
            Bench.print(
                    "%7d records: open %.0f ms, first page %.0f ms later, together x%.2f (%.2f to %.2f) of the smallest;"
                            + " graph with outdated after %.0f ms, whole process %.0f ms",
                    archives.get(i).records(),
                    Bench.median(times[i][0]),
                    Bench.median(times[i][1]),
                    Bench.median(ratios),
                    ratios[0],
                    ratios[ROUNDS - 1],
                    Bench.median(times[i][2]),
                    Bench.median(times[i][3]));
        }
    }

    private static double[] ratios(double[] ours, double[] smallest) {
        return IntStream.range(0, ROUNDS)
                .mapToDouble(round -> ours[round] / smallest[round])
                .sorted()
                .toArray();
    }

    /** Milliseconds to open, to the first page after it, to the graph from the begin, of the whole process, and to the page. */
    private static double[] opened(Made made) throws IOException, InterruptedException {
        long begin = System.nanoTime();
        Process process = OtherProgram.start(OpeningProgram.class, made.place().toString());
        List<String> lines = OtherProgram.lines(process);
        assertThat(process.waitFor()).as(String.join("\n", lines)).isZero();
        double whole = 1e-6 * (System.nanoTime() - begin);
        String[] said = lines.get(lines.size() - 1).split(" ");
        assertThat(said[3]).isEqualTo("50");
        int corrected = Math.min(ManyRecords.CORRECTED, made.scans() / ManyRecords.BLOCK);
        assertThat(said[4]).isEqualTo(Integer.toString(corrected * (ManyRecords.BLOCK + 1)));
        double open = Double.parseDouble(said[0]);
        double page = Double.parseDouble(said[1]);
        return new double[] {open, page, Double.parseDouble(said[2]), whole, open + page};
    }

    /** Prints the times and how they compare with those of the size before. */
    private static double[] lineage(Made made, double[] before) throws Exception {
        try (Archive archive = Archives.open(made.place(), PlainKind.all(), Circumstances.real("benchmark"))) {
            Graph graph = archive.graph();
            Hash property = archive.find("property " + made.scans() / ManyRecords.BLOCK / 2);
            Hash setup = archive.records("setup", 1, 1).get(0);
            assertThat(graph.upstream(property)).hasSize(2 * ManyRecords.BLOCK + 1);
            assertThat(graph.downstream(setup)).hasSize(ManyRecords.BLOCK + 1);
            double[] now = {
                median(() -> walk(() -> archive.graph().upstream(property).size())) / WALKS,
                median(() -> walk(() -> archive.graph().downstream(setup).size())) / WALKS,
                median(() -> assertThat(archive.graph().outdated()).isNotEmpty()),
                median(() -> assertThat(traced(archive, property)).isEqualTo(2 * ManyRecords.BLOCK + 2)),
                median(() -> page(archive))
            };
            Bench.print(
                    "%7d scans, archive on disk: trace up %.1f us, down %.1f us, outdated %.1f us, trace with all records read"
                            + " %.0f us, newest page %.0f us%s",
                    made.scans(),
                    1e6 * now[0],
                    1e6 * now[1],
                    1e6 * now[2],
                    1e6 * now[3],
                    1e6 * now[4],
                    growth(now, before));
            return now;
        }
    }

    private static String growth(double[] now, double[] before) {
        return before.length == 0
                ? ""
                : "; times those of the size before: "
                        + Arrays.toString(IntStream.range(0, now.length)
                                .mapToDouble(i -> Math.rint(100 * now[i] / before[i]) / 100)
                                .toArray());
    }

    private static int traced(Archive archive, Hash property) {
        Lineage.Source source = Lineage.source(archive::record, archive::inputs, archive::label);
        return Lineage.of(source, archive.kinds(), List.of(property), Lineage.Reach.MADE_FROM)
                .records()
                .size();
    }

    private static void page(Archive archive) {
        try {
            assertThat(archive.list(Listing.newest("scan_list", 50)).rows()).hasSize(50);
        } catch (ProblemException e) {
            throw new IllegalStateException(e);
        }
    }

    /** Something that has a size. */
    @FunctionalInterface
    private interface Sized {
        int size();
    }

    private static void walk(Sized walk) {
        for (int i = 0; i < WALKS; i++) {
            assertThat(walk.size()).isPositive();
        }
    }

    /** Median CPU seconds of {@link #ROUNDS} after as many to warm up. */
    private static double median(Runnable work) {
        double[] times = new double[ROUNDS];
        for (int round = -ROUNDS; round < ROUNDS; round++) {
            double time = Bench.cpu(work);
            if (round >= 0) {
                times[round] = time;
            }
        }
        return Bench.median(times);
    }
}
