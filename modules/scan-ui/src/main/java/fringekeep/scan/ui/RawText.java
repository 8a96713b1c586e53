package fringekeep.scan.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import fringekeep.scan.FilePlace;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import javax.swing.Scrollable;

/** A raw file's text with its line numbers; what is in the way stands on the caution ground. */
@SuppressWarnings("serial")
final class RawText extends Painted implements Scrollable {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", RawText.class);
    private static final int LINE = 15;
    private static final int TEXT = 62;

    private transient List<String> lines = List.of();
    private transient Map<Integer, Integer> faults = Map.of();

    RawText() {
        setName("raw text");
        setFocusable(true);
    }

    /** Shows a file and goes to its first fault. */
    void show(List<String> next, List<FilePlace> places) {
        lines = List.copyOf(next);
        Map<Integer, Integer> columns = new TreeMap<>();
        places.forEach(place -> columns.putIfAbsent(place.line(), place.column()));
        faults = columns;
        getAccessibleContext()
                .setAccessibleName(
                        TEXTS.of("raw.spoken", lines.size(), faults.keySet().toString()));
        revalidate();
        repaint();
        int first = columns.keySet().stream().findFirst().orElse(1);
        scrollRectToVisible(new Rectangle(0, Math.max(0, first - 4) * LINE, 10, 8 * LINE));
    }

    /** Lines that are marked, for tests. */
    List<Integer> marked() {
        return List.copyOf(faults.keySet());
    }

    private static double advance() {
        return Lettering.width("0000000000", Type.MONO) / 10;
    }

    /** Tabs as they stand in a terminal: up to the next multiple of eight. */
    private static String spread(String line) {
        StringBuilder text = new StringBuilder();
        for (int i = 0; i < line.length(); i++) {
            char letter = line.charAt(i);
            if (letter == '\t') {
                text.append(" ".repeat(8 - text.length() % 8));
            } else {
                text.append(Character.isISOControl(letter) ? '\u00B7' : letter);
            }
        }
        return text.toString();
    }

    private int height() {
        return Math.max(
                                lines.size(),
                                faults.keySet().stream().max(Integer::compare).orElse(0))
                        * LINE
                + 8;
    }

    @Override
    public Dimension getPreferredSize() {
        int longest = lines.stream().mapToInt(String::length).max().orElse(0);
        return new Dimension(TEXT + (int) (Math.min(longest + 2, 2000) * advance()), height());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        Rectangle clip = graphics.getClipBounds();
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), clip.x, clip.y, clip.width, clip.height);
            int from = Math.max(1, clip.y / LINE);
            int to = (clip.y + clip.height) / LINE + 2;
            for (int number = from; number <= to; number++) {
                line(pen, number);
            }
        }
    }

    private void line(Pen pen, int number) {
        int base = number * LINE;
        Integer column = faults.get(number);
        if (column != null) {
            pen.fill(Ink.CAUTION.color(), 16, base - 11, getWidth(), LINE);
            pen.fill(Ink.CAUTIONRULE.color(), 16, base - 11, 3, LINE);
        }
        if (number > lines.size() && column == null) {
            return;
        }
        String text = number <= lines.size() ? lines.get(number - 1) : "";
        pen.textEndingAt(Integer.toString(number), Type.SMALL, Ink.INK3, TEXT - 12, base);
        pen.text(spread(text), Type.MONO, column != null ? Ink.INK : Ink.INK2, TEXT, base);
        if (column != null) {
            int before = spread(text.substring(0, Math.min(text.length(), column - 1)))
                    .length();
            double x = TEXT + before * advance();
            pen.fill(Ink.CAUTIONRULE.color(), x, base + 2, Math.max(1, width(text, column)) * advance(), 2);
        }
    }

    /** Letters of the field that begins at a column. */
    private static int width(String text, int column) {
        int end = column - 1;
        while (end < text.length() && ",;\t ".indexOf(text.charAt(end)) < 0) {
            end++;
        }
        return end - (column - 1);
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return new Dimension(500, 220);
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return LINE;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(LINE, visible.height - LINE);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return getParent() != null && getParent().getWidth() > getPreferredSize().width;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > getPreferredSize().height;
    }
}
