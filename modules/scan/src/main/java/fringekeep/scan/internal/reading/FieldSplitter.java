package fringekeep.scan.internal.reading;

import java.util.ArrayList;
import java.util.List;

/** Splits lines into fields. A field may stand in double quotes, doubled inside (RFC 4180); it does not span lines. */
final class FieldSplitter {
    private final boolean whiteSpace;
    private final char delimiter;

    FieldSplitter(String delimiter) {
        this.whiteSpace = delimiter.equals(Profile.WHITE_SPACE);
        this.delimiter = delimiter.charAt(0);
    }

    List<Field> split(String line) {
        List<Field> fields = new ArrayList<>();
        int at = whiteSpace ? skipBlanks(line, 0) : 0;
        boolean more = at < line.length() || !whiteSpace;
        while (more) {
            int end = endOfField(line, at);
            fields.add(field(line, at, end));
            more = end < line.length();
            at = whiteSpace ? skipBlanks(line, end) : end + 1;
            more &= !whiteSpace || at < line.length();
        }
        return fields;
    }

    private int endOfField(String line, int begin) {
        int at = begin;
        boolean quoted = false;
        while (at < line.length() && (quoted || !parts(line.charAt(at)))) {
            quoted ^= line.charAt(at) == '"';
            at++;
        }
        return at;
    }

    private boolean parts(char c) {
        return whiteSpace ? c == ' ' || c == '\t' : c == delimiter;
    }

    private int skipBlanks(String line, int begin) {
        int at = begin;
        while (at < line.length() && parts(line.charAt(at))) {
            at++;
        }
        return at;
    }

    private static Field field(String line, int begin, int end) {
        int from = begin;
        int to = end;
        while (from < to && blank(line.charAt(from))) {
            from++;
        }
        while (to > from && blank(line.charAt(to - 1))) {
            to--;
        }
        String text = line.substring(from, to);
        if (text.length() >= 2 && text.charAt(0) == '"' && text.charAt(text.length() - 1) == '"') {
            text = text.substring(1, text.length() - 1).replace("\"\"", "\"").strip();
        }
        return new Field(text, from + 1);
    }

    private static boolean blank(char c) {
        return c == ' ' || c == '\t' || c == '\u00a0';
    }
}
