package fringekeep.bundle.internal;

import java.util.ArrayList;
import java.util.List;

/** Reads tables of RFC 4180: commas, quotes doubled within quotes, CRLF or LF behind each row. */
final class Csv {
    private Csv() {}

    static List<List<String>> read(String text) {
        List<List<String>> rows = new ArrayList<>();
        List<String> row = new ArrayList<>();
        StringBuilder cell = new StringBuilder();
        boolean quoted = false;
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (quoted) {
                boolean doubled = c == '"' && i + 1 < text.length() && text.charAt(i + 1) == '"';
                if (doubled || c != '"') {
                    cell.append(c);
                    i += doubled ? 1 : 0;
                } else {
                    quoted = false;
                }
            } else if (c == '"') {
                quoted = true;
            } else if (c == ',' || c == '\n') {
                row.add(cell.toString());
                cell.setLength(0);
                if (c == '\n') {
                    rows.add(List.copyOf(row));
                    row.clear();
                }
            } else if (c != '\r') {
                cell.append(c);
            }
        }
        if (cell.length() > 0 || !row.isEmpty()) {
            row.add(cell.toString());
            rows.add(List.copyOf(row));
        }
        return List.copyOf(rows);
    }
}
