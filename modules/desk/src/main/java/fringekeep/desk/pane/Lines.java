package fringekeep.desk.pane;

import fringekeep.desk.look.Pen;
import fringekeep.drawing.Lettering;
import java.awt.Font;
import java.util.ArrayList;
import java.util.List;

/** Breaks text into lines. */
final class Lines {
    private Lines() {}

    /** Lines no wider than a room; the last of the most allowed is shortened. */
    static List<String> of(String text, Font font, double room, int most) {
        List<String> lines = new ArrayList<>();
        String rest = text.strip();
        while (!rest.isEmpty() && lines.size() < most) {
            int end = lines.size() == most - 1 ? rest.length() : fitting(rest, font, room);
            lines.add(Pen.shortened(rest.substring(0, end).strip(), font, room));
            rest = rest.substring(end).strip();
        }
        return lines;
    }

    /** How many letters of a text fit, up to a gap between words where there is one. */
    private static int fitting(String text, Font font, double room) {
        if (Lettering.width(text, font) <= room) {
            return text.length();
        }
        int end = 1;
        while (end < text.length() && Lettering.width(text.substring(0, end + 1), font) <= room) {
            end++;
        }
        int gap = text.lastIndexOf(' ', end);
        return gap > 0 ? gap : end;
    }
}
