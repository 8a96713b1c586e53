package fringekeep.drawing;

import java.awt.Font;
import java.util.ArrayList;
import java.util.List;

/**
 * A stretch of text on one level.
 *
 * @param text plain characters
 * @param level 1 raised, 0 on the line, -1 lowered
 */
record Run(String text, int level) {
    private static final String RAISED = "\u2070\u00B9\u00B2\u00B3\u2074\u2075\u2076\u2077\u2078\u2079\u207B\u207A";
    private static final String LOWERED = "\u2080\u2081\u2082\u2083\u2084\u2085\u2086\u2087\u2088\u2089";
    private static final String PLAIN = "0123456789\u2212+";

    static List<Run> of(String text) {
        List<Run> runs = new ArrayList<>();
        StringBuilder now = new StringBuilder();
        int level = 0;
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            int next = RAISED.indexOf(c) >= 0 ? 1 : LOWERED.indexOf(c) >= 0 ? -1 : 0;
            if (next != level && now.length() > 0) {
                runs.add(new Run(now.toString(), level));
                now.setLength(0);
            }
            level = next;
            now.append(plain(c, next));
        }
        if (now.length() > 0) {
            runs.add(new Run(now.toString(), level));
        }
        return runs;
    }

    private static char plain(char c, int level) {
        return switch (level) {
            case 1 -> PLAIN.charAt(RAISED.indexOf(c));
            case -1 -> PLAIN.charAt(LOWERED.indexOf(c));
            default -> c;
        };
    }

    Font font(Font whole) {
        return level == 0 ? whole : whole.deriveFont(whole.getSize2D() * 0.72f);
    }

    /** How far below the line, as a share of the size. */
    double shift() {
        return level == 1 ? -0.36 : level == -1 ? 0.16 : 0;
    }
}
