package fringekeep.audit.ui;

import fringekeep.audit.ui.VerdictView.Beside;
import fringekeep.audit.ui.VerdictView.Interval;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import fringekeep.drawing.NumberText;
import java.awt.BasicStroke;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.geom.Ellipse2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What stands beside the selected row: whose it is, why, how it was made, and the values that moved as intervals. */
@SuppressWarnings("serial")
final class BesidePane extends Painted {
    private static final double LABEL = 52;

    private transient Optional<Beside> shown = Optional.empty();

    void show(Optional<Beside> next) {
        shown = next;
        getAccessibleContext()
                .setAccessibleName(
                        next.map(one -> one.title() + ": " + one.sentence()).orElse(""));
        revalidate();
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        int rows = shown.map(one -> one.facts().size() * 22 + one.intervals().size() * 96)
                .orElse(0);
        return new Dimension(300, 140 + rows);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        if (shown.isEmpty()) {
            return;
        }
        Beside one = shown.get();
        try (Pen pen = new Pen(graphics)) {
            double width = getWidth();
            double end = pen.fitted(one.title(), Type.VIEW, Ink.INK, 0, 20, width - 90);
            pen.text(one.fingerprint(), Type.MONO, Ink.INK3, end + 14, 20);
            one.mark().paint(pen.graphics(), 0, 34, 12);
            double y = 44;
            double x = 18;
            for (String line : wrapped(one.sentence(), width - 18)) {
                pen.text(line, Type.BODY, Ink.INK, x, y);
                y += 18;
                x = 0;
            }
            y = facts(pen, one.facts(), y + 8, width);
            for (Interval interval : one.intervals()) {
                y = interval(pen, interval, y + 10, width);
            }
        }
    }

    private static double facts(Pen pen, List<List<String>> facts, double top, double width) {
        double y = top;
        for (List<String> fact : facts) {
            pen.text(fact.get(0), Type.BODY, Ink.INK2, 0, y + 15);
            pen.fitted(fact.get(1), Type.BODY, Ink.INK, 110, y + 15, width - 110);
            pen.level(Ink.HAIR, 0, width, y + 21);
            y += 22;
        }
        return y;
    }

    /** Two intervals on one scale: what was kept as a ring, what comes out now as a dot. */
    private static double interval(Pen pen, Interval one, double top, double width) {
        double reach = Math.max(Math.abs(one.now() - one.kept()), 1.2 * one.deviation()) * 1.25;
        double room = width - LABEL - 16;
        double scale = room / 2 / Math.max(reach + Math.abs(one.now() - one.kept()) / 2, Double.MIN_NORMAL);
        double middle = (one.kept() + one.now()) / 2;
        double centre = 8 + room / 2;
        bar(pen, one.kept(), one.deviation(), top + 12, middle, scale, centre, false);
        bar(pen, one.now(), one.deviation(), top + 38, middle, scale, centre, true);
        pen.textEndingAt(AuditStage.TEXTS.of("kept"), Type.SMALL, Ink.INK2, width, top + 16);
        pen.textEndingAt(AuditStage.TEXTS.of("now"), Type.SMALL, Ink.INK2, width, top + 42);
        pen.level(Ink.RULE, 8, 8 + room, top + 54);
        for (double value : List.of(one.kept() - one.deviation(), one.kept() + one.deviation())) {
            double x = centre + (value - middle) * scale;
            pen.upright(Ink.RULE, x, top + 54, top + 58);
            String words = NumberText.significant(value, 4);
            pen.text(words, Type.SMALL, Ink.INK2, x - Lettering.width(words, Type.SMALL) / 2, top + 71);
        }
        pen.fitted(one.what(), Type.SMALL, Ink.INK2, 0, top + 88, width);
        return top + 92;
    }

    private static void bar(
            Pen pen,
            double value,
            double deviation,
            double y,
            double middle,
            double scale,
            double centre,
            boolean filled) {
        double x = centre + (value - middle) * scale;
        double half = deviation * scale;
        pen.line(Ink.INK, 1.2, x - half, y, x + half, y);
        pen.line(Ink.INK, 1.2, x - half, y - 4, x - half, y + 4);
        pen.line(Ink.INK, 1.2, x + half, y - 4, x + half, y + 4);
        Ellipse2D dot = new Ellipse2D.Double(x - 4, y - 4, 8, 8);
        pen.graphics().setColor((filled ? Ink.INK : Ink.SHEET).color());
        pen.graphics().fill(dot);
        pen.graphics().setColor(Ink.INK.color());
        pen.graphics().setStroke(new BasicStroke(1.4f));
        pen.graphics().draw(dot);
    }

    /** Words in lines of a width; the first line is 18 shorter. */
    static List<String> wrapped(String text, double width) {
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder();
        for (String word : text.split(" ")) {
            String longer = line.isEmpty() ? word : line + " " + word;
            if (!line.isEmpty() && Lettering.width(longer, Type.BODY) > width) {
                lines.add(line.toString());
                line = new StringBuilder(word);
            } else {
                line = new StringBuilder(longer);
            }
        }
        lines.add(line.toString());
        return lines;
    }
}
