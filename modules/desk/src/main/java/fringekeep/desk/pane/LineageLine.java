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
import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;

/** The line at the foot of a record: raw file to figure, each knot a link; ← → and Enter follow it too. */
@SuppressWarnings("serial")
final class LineageLine extends Painted {
    private static final double GAP = 14;

    private final transient Consumer<List<Hash>> go;
    private transient List<Knot> knots = List.of();
    private int chosen;

    LineageLine(Consumer<List<Hash>> go) {
        this.go = go;
        setFocusable(true);
        setName("lineage line");
        setCursor(Cursor.getPredefinedCursor(Cursor.HAND_CURSOR));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                follow(at(event.getX()));
            }
        });
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent event) {
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                repaint();
            }
        });
        key("LEFT", () -> choose(chosen - 1));
        key("RIGHT", () -> choose(chosen + 1));
        key("ENTER", () -> follow(chosen));
    }

    private void key(String stroke, Runnable work) {
        getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void choose(int knot) {
        chosen = Math.max(0, Math.min(knots.size() - 1, knot));
        repaint();
    }

    private void follow(int knot) {
        if (knot >= 0 && knot < knots.size() && !knots.get(knot).records().isEmpty()) {
            go.accept(knots.get(knot).records());
        }
    }

    void show(List<Knot> next) {
        knots = List.copyOf(next);
        StringBuilder words = new StringBuilder();
        for (int i = 0; i < knots.size(); i++) {
            Knot knot = knots.get(i);
            words.append(knot.stop()).append(' ').append(knot.text()).append("; ");
            chosen = knot.here() ? i : chosen;
        }
        chosen = Math.min(chosen, Math.max(0, knots.size() - 1));
        getAccessibleContext().setAccessibleName(words.toString());
        repaint();
    }

    private static double needed(Knot knot) {
        double name = Lettering.width(knot.stop(), Type.SMALL) + (knot.mark().isPresent() ? 20 : 0);
        return Math.max(name, Lettering.width(knot.text(), knot.here() ? Type.GROUP : Type.BODY)) + GAP;
    }

    /** Where each knot begins: each has the room its words need, and what is left is shared out evenly. */
    private double[] places() {
        double sum = knots.stream().mapToDouble(LineageLine::needed).sum();
        double more = knots.isEmpty() ? 0 : (getWidth() - sum) / knots.size();
        double shrink = more < 0 ? getWidth() / sum : 1;
        double[] places = new double[knots.size() + 1];
        for (int i = 0; i < knots.size(); i++) {
            places[i + 1] = places[i] + (more < 0 ? needed(knots.get(i)) * shrink : needed(knots.get(i)) + more);
        }
        return places;
    }

    private int at(int x) {
        double[] places = places();
        for (int i = 0; i < knots.size(); i++) {
            if (x >= places[i] && x < places[i + 1]) {
                return i;
            }
        }
        return -1;
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
            double[] places = places();
            for (int i = 0; i < knots.size(); i++) {
                double room = places[i + 1] - places[i] - 4;
                knot(pen, knots.get(i), places[i], room);
                if (isFocusOwner() && i == chosen) {
                    pen.focus(places[i] - 3, 2, room + 4, 52);
                }
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
