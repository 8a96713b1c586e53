package fringekeep.scan.internal.reading;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.Arrays;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** A thousand damaged files: each is read whole or refused with its place, the same way every time. */
class MutatedFilesTest {
    private static final int FILES = 1_000;
    private static final long SEED = 20310514L;

    @Test
    @Timeout(value = 60, unit = TimeUnit.SECONDS, threadMode = Timeout.ThreadMode.SEPARATE_THREAD)
    void aThousandDamagedFilesAreReadWholeOrRefusedWithTheirPlace() throws ProblemException {
        SplittableRandom random = new SplittableRandom(SEED);
        int refused = 0;
        int read = 0;
        for (int i = 0; i < FILES; i++) {
            DamagedFiles.Dialect dialect = DamagedFiles.DIALECTS.get(i % DamagedFiles.DIALECTS.size());
            byte[] bytes = dialect.damaged(random);
            Profile profile = Profile.of(Profiles.any(dialect.profile()));
            String first = outcome(profile, bytes, "damaged-" + i);
            assertThat(outcome(profile, bytes, "damaged-" + i)).isEqualTo(first);
            refused += first.startsWith("refused") ? 1 : 0;
            read += first.startsWith("read") ? 1 : 0;
        }
        assertThat(refused).as("refused of " + FILES).isGreaterThan(300);
        assertThat(read).as("read of " + FILES).isGreaterThan(100);
        assertThat(refused + read).isEqualTo(FILES);
    }

    private static String outcome(Profile profile, byte[] bytes, String file) {
        try {
            FileReader reader = new FileReader(profile, bytes, file);
            StringBuilder all = new StringBuilder("read ");
            for (int section = 0; section < reader.sections(); section++) {
                all.append(whole(reader.read(section)));
            }
            return all.toString();
        } catch (ProblemException e) {
            assertThat(e.problems()).isNotEmpty().allSatisfy(problem -> complete(problem, file));
            return "refused " + e.problems();
        }
    }

    private static void complete(Problem problem, String file) {
        assertThat(problem.where()).startsWith(file);
        assertThat(problem.what()).isNotBlank();
        assertThat(problem.mend()).contains("Nothing was stored");
    }

    private static String whole(Reading reading) {
        int rows = reading.table().rows();
        assertThat(rows).isPositive();
        StringBuilder text = new StringBuilder();
        for (ScanTable.TableColumn column : reading.table().columns()) {
            assertThat(column.values()).hasSize(rows);
            for (double value : column.values()) {
                boolean mayLack = column.profile().role() == ProfileColumn.Role.CHANNEL;
                assertThat(Double.isFinite(value) || mayLack && Double.isNaN(value))
                        .as(column.name())
                        .isTrue();
            }
            text.append(Arrays.toString(column.values()));
        }
        assertThat(reading.exposure().perRow()).hasSize(rows);
        assertThat(Arrays.stream(reading.exposure().perRow()).allMatch(each -> each > 0 && Double.isFinite(each)))
                .isTrue();
        return text.append(reading.findings()).append(reading.header()).toString();
    }
}
