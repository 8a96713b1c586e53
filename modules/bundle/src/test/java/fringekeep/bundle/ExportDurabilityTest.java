package fringekeep.bundle;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.testsupport.OtherProgram;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What a killed export leaves behind: whole bundles under final names, and an archive without a fault. */
class ExportDurabilityTest {
    @TempDir
    private Path folder;

    @Test
    void whatStandsUnderAFinalNameIsWhole() throws Exception {
        int found = 0;
        for (int round = 0; round < OtherProgram.kills(); round++) {
            Path place = Files.createDirectory(folder.resolve("round-" + round));
            Path out = Files.createDirectory(place.resolve("out"));
            List<String> lines =
                    OtherProgram.runUntilHalted(HaltedExport.class, place.toString(), Integer.toString(round));
            for (Path bundle : finalNames(out)) {
                BundleReport report = CheckBundle.check(bundle, SmallArchive.kinds(), Level.RECOMPUTED, Work.QUIET);
                assertThat(report.level())
                        .as("round %d: %s %s", round, bundle, report.allFaults())
                        .isEqualTo(Level.RECOMPUTED);
                found++;
            }
            archiveIsWhole(place.resolve("archive"), lines, round);
        }
        assertThat(found).isPositive();
    }

    private static void archiveIsWhole(Path place, List<String> lines, int round) throws Exception {
        List<Hash> recorded = lines.stream()
                .filter(line -> line.matches("done [0-9a-f]{64}"))
                .map(line -> new Hash(line.substring(5)))
                .toList();
        assertThat(recorded).as("round %d", round).hasSize(1);
        try (Archive archive = Archives.open(place, SmallArchive.kinds(), Circumstances.real("1.0.0"))) {
            assertThat(archive.record(recorded.get(0))).isPresent();
            assertThat(archive.check(Work.QUIET).stream().map(Problem::code))
                    .as("round %d", round)
                    .allMatch(code -> code.startsWith("orphan."));
        }
    }

    private static List<Path> finalNames(Path out) throws Exception {
        try (Stream<Path> all = Files.list(out)) {
            return all.filter(path -> !path.getFileName().toString().startsWith("."))
                    .toList();
        }
    }
}
