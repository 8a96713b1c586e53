package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.internal.store.copy.CopyContents;
import fringekeep.archive.internal.store.copy.CopyFolder;
import fringekeep.archive.internal.store.db.Migration;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.testsupport.OtherProgram;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A program that works on an archive is ended at random moments. Afterwards the archive opens, everything acknowledged is
 * there, and a check finds nothing but named leftovers that do no harm.
 */
class KillDurabilityTest {
    @TempDir
    private Path folder;

    private Path place;
    private final List<Hash> acknowledged = new ArrayList<>();

    @BeforeEach
    void found() throws Exception {
        place = folder.resolve("archive");
        Filled.golden(place).close();
        acknowledged.addAll(Filled.GOLDEN);
    }

    private List<String> kill(String what, int round) throws Exception {
        List<String> lines =
                OtherProgram.runUntilHalted(KilledProgram.class, what, place.toString(), Integer.toString(round));
        lines.stream()
                .filter(line -> line.matches("done [0-9a-f]{64}"))
                .map(line -> new Hash(line.substring(5)))
                .forEach(acknowledged::add);
        return lines;
    }

    private void verify(List<Migration> steps, int round) throws Exception {
        try (Archive archive = new Opening(place, OpenKind.all(), Circumstances.real("1.0.0"), steps).open()) {
            for (Hash record : acknowledged) {
                assertThat(archive.recorded(record))
                        .as("round %d, record %s", round, record)
                        .isPresent();
            }
            assertThat(archive.check(Work.QUIET).stream().map(Problem::code).distinct())
                    .as("round %d", round)
                    .allMatch(code -> code.startsWith("orphan."));
        }
    }

    @Test
    void whatWasAcknowledgedWhileTakingInAndRecordingIsThere() throws Exception {
        for (int round = 0; round < OtherProgram.kills(); round++) {
            kill("record", round);
            verify(Migration.all(), round);
        }
        assertThat(acknowledged.size()).isGreaterThan(Filled.GOLDEN.size());
    }

    @Test
    void aMigrationIsAppliedWholeOrNotAtAll() throws Exception {
        for (int round = 0; round < OtherProgram.kills(); round++) {
            kill("migrate", round);
            verify(KilledProgram.steps(round), round);
        }
    }

    @Test
    void rebuildingListsCanStopAnywhere() throws Exception {
        for (int round = 0; round < OtherProgram.kills(); round++) {
            kill("rebuild", round);
            verify(Migration.all(), round);
        }
    }

    @Test
    void aCopyHoldsWhatItPromises() throws Exception {
        CopyFolder copy = new CopyFolder(folder.resolve("copy"));
        long promised = 0;
        for (int round = 0; round < OtherProgram.kills(); round++) {
            List<String> lines = kill("copy", round);
            promised = Math.max(
                    promised,
                    lines.stream()
                            .filter(line -> line.matches("copied \\d+"))
                            .mapToLong(line -> Long.parseLong(line.substring(7)))
                            .max()
                            .orElse(0));
            if (Files.exists(copy.hint())) {
                CopyContents contents = CopyContents.read(copy.root(), Work.QUIET);
                assertThat(contents.hint().n()).isGreaterThanOrEqualTo(promised);
            }
        }
        try (Archive archive = Archives.open(place, OpenKind.all(), new Script().circumstances())) {
            archive.copyTo(copy.root(), Work.QUIET);
        }
        try (Archive restored = Archives.restore(
                copy.root(), folder.resolve("restored"), OpenKind.all(), new Script().circumstances(), Work.QUIET)) {
            for (Hash record : acknowledged) {
                assertThat(restored.recorded(record)).isPresent();
            }
            assertThat(restored.check(Work.QUIET)).isEmpty();
        }
    }
}
