package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;
import java.util.regex.Pattern;

/** Ruled facts under a heading: name, as entered, SI value, unit. */
@SuppressWarnings("serial")
final class FactsPanel extends Painted implements FactColumn {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", FactsPanel.class);
    private static final int ROW = 22;
    private static final int HEAD = 24;
    private static final int MORE = 18;
    private static final Pattern WORDS = Pattern.compile("[a-z]{2}");

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

    @Override
    public boolean wide() {
        return group.entered()
                || group.facts().stream()
                        .anyMatch(fact -> !fact.unit().isEmpty()
                                && Lettering.width(fact.name() + fact.value() + fact.unit(), Type.BODY) > 200);
    }

    @Override
    public int heightIn(int width) {
        int height = HEAD + 12;
        for (Fact fact : group.facts()) {
            height += rowHeight(fact, width);
        }
        return height;
    }

    private int rowHeight(Fact fact, int width) {
        int lines = lines(fact, width).size();
        return ROW + MORE * (fact.name().isEmpty() ? Math.max(0, lines - 1) : lines);
    }

    /** A text that has no room behind its name stands below it, in as many lines as it takes. */
    private List<String> lines(Fact fact, int width) {
        boolean behind =
                Lettering.width(fact.name(), Type.BODY) + Lettering.width(fact.value(), Type.BODY) + 14 <= width;
        return behind || !fact.unit().isEmpty() || !fact.entered().isEmpty()
                ? List.of()
                : Lines.of(fact.value(), Type.BODY, width - (fact.name().isEmpty() ? 0.0 : 12.0), 12);
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(224, heightIn(Math.max(224, getWidth())));
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
                List<String> lines = lines(fact, width);
                if (lines.isEmpty()) {
                    row(pen, fact, y, width, unitAt, entered ? enteredAt : -1);
                } else {
                    below(pen, fact, lines, y, width);
                }
                y += rowHeight(fact, width);
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

    private static void below(Pen pen, Fact fact, List<String> lines, double y, int width) {
        double base = y + ROW - 7;
        boolean named = !fact.name().isEmpty();
        pen.fitted(fact.name(), Type.BODY, Ink.INK2, 0, base, width);
        base += named ? MORE : 0;
        for (String line : lines) {
            pen.text(line, Type.BODY, Ink.INK, named ? 12 : 0, base);
            base += MORE;
        }
        pen.level(Ink.HAIR, 0, width, base - MORE + 6);
    }

    private static void row(Pen pen, Fact fact, double y, int width, double unitAt, double enteredAt) {
        double base = y + ROW - 7;
        if (fact.unit().isEmpty()
                && fact.entered().isEmpty()
                && WORDS.matcher(fact.value()).find()) {
            double at = width - Lettering.width(fact.value(), Type.BODY);
            pen.fitted(fact.name(), Type.BODY, Ink.INK2, 0, base, at - 8);
            pen.text(fact.value(), Type.BODY, Ink.INK, at, base);
            pen.level(Ink.HAIR, 0, width, y + ROW - 1);
            return;
        }
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
