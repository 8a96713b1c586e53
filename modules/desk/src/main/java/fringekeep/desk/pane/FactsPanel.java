package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;

/** Ruled facts under a heading: name, as entered, SI value, unit. */
@SuppressWarnings("serial")
final class FactsPanel extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", FactsPanel.class);
    private static final int ROW = 22;
    private static final int HEAD = 24;

    private final transient FactGroup group;

    FactsPanel(FactGroup group) {
        this.group = group;
        getAccessibleContext().setAccessibleName(group.heading());
        StringBuilder words = new StringBuilder();
        for (Fact fact : group.facts()) {
            words.append(fact.name())
                    .append(' ')
                    .append(fact.value())
                    .append(' ')
                    .append(fact.unit())
                    .append("; ");
        }
        getAccessibleContext().setAccessibleDescription(words.toString());
    }

    /** Whether it wants the room of two columns. */
    boolean wide() {
        return group.entered()
                || group.facts().stream()
                        .anyMatch(fact -> Lettering.width(fact.name() + fact.value() + fact.unit(), Type.BODY) > 210);
    }

    int height() {
        return HEAD + ROW * group.facts().size() + 12;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(224, height());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            int width = getWidth();
            boolean entered = group.entered();
            double unitAt = width - unitRoom();
            double enteredAt = width * 0.36;
            pen.fitted(group.heading(), Type.HEAD, Ink.INK, 0, 16, entered ? enteredAt - 8 : width);
            if (entered) {
                pen.text(TEXTS.of("fact.entered"), Type.HEAD, Ink.INK, enteredAt, 16);
                pen.textEndingAt(TEXTS.of("fact.si"), Type.HEAD, Ink.INK, unitAt - 10, 16);
            }
            pen.level(Ink.RULE, 0, width, HEAD - 1.0);
            double y = HEAD;
            for (Fact fact : group.facts()) {
                row(pen, fact, y, width, unitAt, entered ? enteredAt : -1);
                y += ROW;
            }
        }
    }

    private double unitRoom() {
        double widest = 0;
        for (Fact fact : group.facts()) {
            widest = Math.max(widest, Lettering.width(fact.unit(), Type.BODY));
        }
        return widest == 0 ? -10 : widest + 2;
    }

    private static void row(Pen pen, Fact fact, double y, int width, double unitAt, double enteredAt) {
        double base = y + ROW - 7;
        String value = Pen.shortened(fact.value(), Type.BODY, enteredAt < 0 ? unitAt - 50 : unitAt - enteredAt - 20);
        double valueAt = unitAt - 10 - Lettering.width(value, Type.BODY);
        double nameRoom = (enteredAt < 0 ? valueAt : enteredAt) - 8;
        pen.fitted(fact.name(), Type.BODY, Ink.INK2, 0, base, nameRoom);
        if (enteredAt >= 0 && !fact.entered().isEmpty()) {
            pen.fitted(fact.entered(), Type.MONO, Ink.INK2, enteredAt, base, valueAt - enteredAt - 6);
        }
        pen.text(value, Type.BODY, Ink.INK, valueAt, base);
        pen.text(fact.unit(), Type.BODY, Ink.INK2, unitAt, base);
        pen.level(Ink.HAIR, 0, width, y + ROW - 1);
    }
}
