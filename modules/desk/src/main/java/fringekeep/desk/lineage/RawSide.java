package fringekeep.desk.lineage;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.NumberText;
import java.awt.Graphics;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.util.Optional;

/** Raw counts of the record in hand: a small fringe, then position, counts and a bar for each row. */
@SuppressWarnings("serial")
final class RawSide extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.lineage.Texts", RawSide.class);

    private transient Optional<RawCounts> raw = Optional.empty();

    RawSide() {
        setOpaque(true);
        getAccessibleContext().setAccessibleName(TEXTS.of("none"));
    }

    void show(Optional<RawCounts> next) {
        raw = next;
        getAccessibleContext()
                .setAccessibleName(next.map(one -> TEXTS.of("raw", one.label())).orElse(TEXTS.of("none")));
        repaint();
    }

    Optional<RawCounts> shown() {
        return raw;
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.upright(Ink.RULE, 0, 0, getHeight());
            if (raw.isEmpty()) {
                pen.fitted(TEXTS.of("none"), Type.SMALL, Ink.INK3, 12, 22, getWidth() - 20.0);
                return;
            }
            RawCounts now = raw.get();
            double room = getWidth() - 28.0;
            pen.fitted(TEXTS.of("raw", now.label()), Type.GROUP, Ink.INK, 12, 22, room);
            pen.fitted(now.title(), Type.SMALL, Ink.INK2, 12, 39, room);
            fringe(pen, now, 12, 56, room, 84);
            table(pen, now, 158, room);
        }
    }

    private static void fringe(Pen pen, RawCounts raw, double x, double y, double width, double height) {
        double[] counts = raw.counts();
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double count : counts) {
            if (Double.isFinite(count)) {
                low = Math.min(low, count);
                high = Math.max(high, count);
            }
        }
        if (!(high > low)) {
            return;
        }
        Path2D line = new Path2D.Double();
        pen.graphics().setColor(Ink.QUANTUM.color());
        for (int i = 0; i < counts.length; i++) {
            double px = x + width * i / Math.max(1, counts.length - 1);
            double py = y + height * (high - counts[i]) / (high - low);
            if (!Double.isFinite(py)) {
                continue;
            }
            if (line.getCurrentPoint() == null) {
                line.moveTo(px, py);
            } else {
                line.lineTo(px, py);
            }
        }
        pen.graphics().setStroke(new java.awt.BasicStroke(1));
        pen.graphics().draw(line);
        pen.graphics().setColor(Ink.INK.color());
        for (int i = 0; i < counts.length; i++) {
            double px = x + width * i / Math.max(1, counts.length - 1);
            double py = y + height * (high - counts[i]) / (high - low);
            pen.graphics().fill(new Ellipse2D.Double(px - 1.6, py - 1.6, 3.2, 3.2));
        }
    }

    private void table(Pen pen, RawCounts raw, double top, double room) {
        Optional<Unit> unit = shownUnit(raw);
        String head = raw.axis() + unit.map(one -> " / " + one.shown()).orElse("");
        pen.textEndingAt(head, Type.HEAD, Ink.INK, 12 + room * 0.38, top);
        pen.textEndingAt(raw.channel(), Type.HEAD, Ink.INK, 12 + room * 0.62, top);
        pen.level(Ink.RULE, 12, 12 + room, top + 7);
        double most = 1;
        for (double count : raw.counts()) {
            most = Double.isFinite(count) ? Math.max(most, count) : most;
        }
        double y = top + 8;
        for (int i = 0; i < raw.counts().length && y + 15 < getHeight(); i++) {
            double position = raw.positions()[i];
            double shown = unit.map(one -> one.fromSi(position)).orElse(position);
            double count = raw.counts()[i];
            pen.textEndingAt(NumberText.fixed(shown, 1), Type.SMALL, Ink.INK, 12 + room * 0.38, y + 12);
            pen.textEndingAt(NumberText.significant(count, 6), Type.SMALL, Ink.INK, 12 + room * 0.62, y + 12);
            if (Double.isFinite(count)) {
                pen.fill(Ink.RULE.color(), 12 + room * 0.68, y + 6, room * 0.32 * count / most, 4);
            }
            y += 15;
        }
    }

    /** Lengths are read in nanometres where they are small; other axes in SI. */
    private static Optional<Unit> shownUnit(RawCounts raw) {
        double most = 0;
        for (double position : raw.positions()) {
            most = Math.max(most, Math.abs(position));
        }
        String code = raw.unit().equals("m") && most < 1e-3 ? "nm" : raw.unit();
        try {
            return code.isEmpty() || code.equals("1") ? Optional.empty() : Optional.of(Units.parse(code));
        } catch (ProblemException e) {
            return Optional.empty(); // a unit of a newer kind: the number is shown in SI
        }
    }
}
