package fringekeep.scan.internal.reading;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** A thousand damaged files: each is read whole or refused with its place, the same way every time. */
class MutatedFilesTest {
    private static final int FILES = 1_000;
    private static final long SEED = 20310514L;

    private record Dialect(String profile, String encoding, String text) {}

    private static final List<Dialect> DIALECTS = List.of(
            new Dialect(Profiles.TAB, "UTF-8", tab()),
            new Dialect(Profiles.SEMICOLON, "ISO-8859-1", semicolon()),
            new Dialect(Profiles.SECTIONS, "US-ASCII", sections()));

    private static String tab() {
        StringBuilder text = new StringBuilder("# start: 2031-05-14T09:03:11+02:00\n");
        text.append("# dwell: 10 s\n# laser power: 7.300 W\n# operator: N. N.\nposition_nm\tcounts\n");
        for (int i = 0; i < 31; i++) {
            text.append(266 * i / 10).append(".5\t").append(700 + 37 * i % 211).append('\n');
        }
        return text.toString();
    }

    private static String semicolon() {
        StringBuilder text = new StringBuilder("Lange Bank\r\nBeginn = 14.05.2031 22:41:05\r\n");
        text.append("Messzeit / s = 2,5\r\nLaserleistung / W = 3,250\r\nQuelle / °C = 568,9\r\n");
        text.append("Daten\r\nPosition / µm;Zählung;Monitor / V;Dunkel\r\n");
        for (int i = 0; i < 24; i++) {
            text.append("0,").append(10000 + 2660 * i).append(';').append(40 + i % 7);
            text.append(";1,2500;").append(i % 2).append("\r\n");
        }
        return text.toString();
    }

    private static String sections() {
        StringBuilder text = new StringBuilder("pulsed bench; invented data\n");
        for (int scan = 1; scan <= 3; scan++) {
            text.append("[scan ")
                    .append(scan)
                    .append("]\nstart,2031-05-14T09:0")
                    .append(scan)
                    .append(":00Z\nshots,500\n");
            text.append("pulse energy 2 (mJ),1.200\nposition (nm),resonant,off-resonant\n");
            for (int i = 0; i < 12; i++) {
                text.append(26 * i).append(".00,").append(10 + i % 5).append(",1\n");
            }
        }
        return text.toString();
    }

    @Test
    @Timeout(value = 60, unit = TimeUnit.SECONDS, threadMode = Timeout.ThreadMode.SEPARATE_THREAD)
    void aThousandDamagedFilesAreReadWholeOrRefusedWithTheirPlace() throws ProblemException {
        SplittableRandom random = new SplittableRandom(SEED);
        int refused = 0;
        int read = 0;
        for (int i = 0; i < FILES; i++) {
            Dialect dialect = DIALECTS.get(i % DIALECTS.size());
            byte[] bytes = damaged(dialect, random);
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

    private static byte[] damaged(Dialect dialect, SplittableRandom random) {
        String text = dialect.text();
        byte[] bytes = text.getBytes(Charset.forName(dialect.encoding()));
        int at = random.nextInt(bytes.length);
        return switch (random.nextInt(10)) {
            case 0 -> Arrays.copyOf(bytes, at);
            case 1 -> flipped(bytes, random, 1);
            case 2 -> flipped(bytes, random, 20);
            case 3 -> text.getBytes(random.nextBoolean() ? StandardCharsets.UTF_16 : StandardCharsets.UTF_8);
            case 4 -> inserted(text, at, "9".repeat(1 + random.nextInt(400)), dialect);
            case 5 -> inserted(text, at, "1e" + random.nextInt(100_000), dialect);
            case 6 -> inserted(text, at, "x".repeat(random.nextInt(300_000)), dialect);
            case 7 -> inserted(text, at, text.substring(0, at), dialect);
            case 8 -> inserted(text, at, ";,\t\"\n\0\u00ff-".substring(0, 1 + random.nextInt(7)), dialect);
            default -> randomBytes(random);
        };
    }

    private static byte[] flipped(byte[] bytes, SplittableRandom random, int bits) {
        byte[] copy = bytes.clone();
        for (int i = 0; i < bits; i++) {
            copy[random.nextInt(copy.length)] ^= (byte) (1 << random.nextInt(8));
        }
        return copy;
    }

    private static byte[] inserted(String text, int at, String piece, Dialect dialect) {
        int place = Math.min(at, text.length());
        return (text.substring(0, place) + piece + text.substring(place)).getBytes(Charset.forName(dialect.encoding()));
    }

    private static byte[] randomBytes(SplittableRandom random) {
        byte[] bytes = new byte[random.nextInt(4_000)];
        random.nextBytes(bytes);
        return bytes;
    }
}
