package fringekeep.scan;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.scan.internal.reading.DamagedFiles;
import fringekeep.scan.internal.reading.Profiles;
import fringekeep.testsupport.OtherProgram;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** Damaged files come to a real archive: each is taken in with all its scans or refused whole, and the others go on. */
class TakeInDamagedFilesTest {
    private static final int FEW = 150;
    private static final int MANY = 1_000;

    @TempDir
    private Path folder;

    @Test
    @Timeout(value = 300, unit = TimeUnit.SECONDS, threadMode = Timeout.ThreadMode.SEPARATE_THREAD)
    void eachIsTakenInWithAllItsScansOrRefusedWhole() throws Exception {
        SplittableRandom random = new SplittableRandom(20310514L);
        int files = OtherProgram.thorough() ? MANY : FEW;
        int scans = 0;
        int refused = 0;
        try (TemporaryArchive lab = new TemporaryArchive(folder)) {
            for (DamagedFiles.Dialect dialect : DamagedFiles.DIALECTS) {
                Hash profile = lab.enter("reading-profile", Profiles.content(dialect.profile()));
                for (TakeInFiles.FileOutcome outcome : takeIn(lab, profile, files(dialect, files / 3, random))) {
                    boolean taken = outcome.state() == TakeInFiles.State.TAKEN_IN;
                    assertThat(taken || outcome.state() == TakeInFiles.State.REFUSED)
                            .as("%s", outcome)
                            .isTrue();
                    assertThat(outcome.scans().isEmpty()).isEqualTo(!taken);
                    assertThat(outcome.problems().isEmpty()).as("%s", outcome).isEqualTo(taken);
                    scans += outcome.scans().size();
                    refused += taken ? 0 : 1;
                }
            }
            assertThat(refused).isBetween(files / 4, files - files / 10);
            List<Hash> recorded = lab.archive.records("scan", 1, 100_000);
            assertThat(recorded).hasSize(scans);
            for (Hash scan : recorded) {
                assertThat(lab.archive.record(scan).orElseThrow().part(PartName.RESULT))
                        .isPresent();
            }
            assertThat(lab.archive.check(Work.QUIET).stream().map(Problem::code).distinct())
                    .allMatch(code -> code.startsWith("orphan."));
        }
    }

    private List<Path> files(DamagedFiles.Dialect dialect, int count, SplittableRandom random) throws Exception {
        Path arriving = Files.createTempDirectory(folder, "arriving");
        List<Path> files = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            // bytes seen before would count as known
            byte[] bytes = dialect.damaged(random);
            if (files.stream().noneMatch(file -> sameBytes(file, bytes))) {
                files.add(Files.write(arriving.resolve("damaged-" + i + ".txt"), bytes));
            }
        }
        return files;
    }

    private static boolean sameBytes(Path file, byte[] bytes) {
        try {
            return Files.size(file) == bytes.length && java.util.Arrays.equals(Files.readAllBytes(file), bytes);
        } catch (java.io.IOException e) {
            throw new java.io.UncheckedIOException(e);
        }
    }

    private static List<TakeInFiles.FileOutcome> takeIn(TemporaryArchive lab, Hash profile, List<Path> files)
            throws Exception {
        TakeInFiles.Request request =
                new TakeInFiles.Request(files, Optional.of(profile), false, Optional.of(TemporaryArchive.PERSON));
        return new TakeInFiles(lab.archive).takeIn(request, Work.QUIET);
    }
}
