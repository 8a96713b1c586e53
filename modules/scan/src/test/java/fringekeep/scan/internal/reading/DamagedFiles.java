package fringekeep.scan.internal.reading;

import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/** Raw files in three dialects, damaged at random: cut off, bits turned, other encodings, huge numbers and fields, nesting. */
public final class DamagedFiles {
    /** Whole files, each readable by its profile. */
    public static final List<Dialect> DIALECTS = List.of(
            new Dialect(Profiles.TAB, "UTF-8", tab()),
            new Dialect(Profiles.SEMICOLON, "ISO-8859-1", semicolon()),
            new Dialect(Profiles.SECTIONS, "US-ASCII", sections()));

    private DamagedFiles() {}

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

    /**
     * A whole file and how it is read.
     *
     * @param profile content of the reading profile, as {@link Profiles} writes it
     */
    public record Dialect(String profile, String encoding, String text) {
        /** The file with one sort of damage. */
        public byte[] damaged(SplittableRandom random) {
            return DamagedFiles.damaged(this, random);
        }
    }

    private static byte[] damaged(Dialect dialect, SplittableRandom random) {
        String text = dialect.text();
        byte[] bytes = text.getBytes(Charset.forName(dialect.encoding()));
        int at = random.nextInt(bytes.length);
        return switch (random.nextInt(11)) {
            case 0 -> Arrays.copyOf(bytes, at);
            case 1 -> flipped(bytes, random, 1);
            case 2 -> flipped(bytes, random, 20);
            case 3 -> text.getBytes(random.nextBoolean() ? StandardCharsets.UTF_16 : StandardCharsets.UTF_8);
            case 4 -> inserted(text, at, "9".repeat(1 + random.nextInt(400)), dialect);
            case 5 -> inserted(text, at, "1e" + random.nextInt(100_000), dialect);
            case 6 -> inserted(text, at, "x".repeat(random.nextInt(300_000)), dialect);
            case 7 -> inserted(text, at, text.substring(0, at), dialect);
            case 8 -> inserted(text, at, ";,\t\"\n\0\u00ff-".substring(0, 1 + random.nextInt(7)), dialect);
            case 9 -> inserted(text, at, nested(random), dialect);
            default -> randomBytes(random);
        };
    }

    private static String nested(SplittableRandom random) {
        String open = List.of("[", "\"", "\"\n", "(\t", "[scan ", "[scan 1]\n").get(random.nextInt(6));
        return open.repeat(1 + random.nextInt(20_000));
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
