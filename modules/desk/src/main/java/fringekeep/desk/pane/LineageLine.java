package fringekeep.desk.pane;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.pane.RecordPage.Knot;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.function.Consumer;

/** The line at the foot of a record: raw file to figure, each knot a link. */
@SuppressWarnings("serial")
final class LineageLine extends Painted {
    private transient List<Knot> knots = List.of();

    LineageLine(Consumer<List<Hash>> go) {
        setCursor(Cursor.getPredefinedCursor(Cursor.HAND_CURSOR));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                int i = knots.isEmpty() ? -1 : event.getX() * knots.size() / Math.max(1, getWidth());
                if (i >= 0 && i < knots.size() && !knots.get(i).records().isEmpty()) {
                    go.accept(knots.get(i).records());
                }
            }
        });
    }

    void show(List<Knot> next) {
        knots = List.copyOf(next);
        StringBuilder words = new StringBuilder();
        knots.forEach(knot ->
                words.append(knot.stop()).append(' ').append(knot.text()).append("; "));
        getAccessibleContext().setAccessibleName(words.toString());
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, 60);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            if (knots.isEmpty()) {
                return;
            }
            pen.level(Ink.RULE, 0, getWidth(), 12);
            double room = (double) getWidth() / knots.size();
            for (int i = 0; i < knots.size(); i++) {
                knot(pen, knots.get(i), i * room, room - 8);
            }
        }
    }

    private static void knot(Pen pen, Knot knot, double x, double room) {
        if (knot.here()) {
            Mark.HERE.paint(pen.graphics(), x - 1.5, 6.5, 12);
        } else {
            pen.fill(Ink.STRONG.color(), x, 7, 1.5, 11);
        }
        double nameRoom = knot.mark().isPresent() ? room - 18 : room;
        pen.fitted(knot.stop(), Type.SMALL, Ink.INK2, x, 32, nameRoom);
        double after = x + Lettering.width(Pen.shortened(knot.stop(), Type.SMALL, nameRoom), Type.SMALL) + 8;
        knot.mark().ifPresent(mark -> mark.paint(pen.graphics(), after, 22, 11));
        pen.fitted(knot.text(), knot.here() ? Type.GROUP : Type.BODY, Ink.INK, x, 47, room);
    }
}
