package fringekeep.property.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import java.awt.Graphics;
import java.util.Optional;

/** Below the plot: the stated values with both sorts of uncertainty, what moved, and what the data say. */
@SuppressWarnings("serial")
final class AnswerPanel extends Painted {
    private static final int ROW = 22;
    private static final int HEAD = 24;
    private static final double[] RIGHTS = {0.46, 0.57, 0.67};
    private static final double UNIT = 0.69;
    private static final double HOW = 0.82;

    private static final String SAME = PropertyWords.TEXTS.of("how.same");

    private transient Optional<Answer> answer = Optional.empty();
    private boolean dim;

    AnswerPanel() {
        setName("property.answer");
    }

    void show(Optional<Answer> next, boolean old) {
        answer = next;
        dim = old;
        StringBuilder words = new StringBuilder();
        next.ifPresent(now -> {
            now.quantities()
                    .forEach(row -> words.append(row.name())
                            .append(' ')
                            .append(row.value())
                            .append(' ')
                            .append(row.unit())
                            .append("; "));
            words.append(now.say().words());
        });
        getAccessibleContext().setAccessibleName(PropertyWords.TEXTS.of("answer"));
        getAccessibleContext().setAccessibleDescription(words.toString());
        repaint();
    }

    /** Height it needs. */
    int height() {
        int rows = answer.map(now -> now.quantities().size()).orElse(3);
        return HEAD + ROW * rows + 84;
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double width = getWidth();
            String[] heads = {"value", "statistical", "shared"};
            pen.text(PropertyWords.TEXTS.of("head.quantity"), Type.HEAD, Ink.INK, 0, 16);
            for (int i = 0; i < heads.length; i++) {
                pen.textEndingAt(PropertyWords.TEXTS.of("head." + heads[i]), Type.HEAD, Ink.INK, width * RIGHTS[i], 16);
            }
            pen.text(PropertyWords.TEXTS.of("head.unit"), Type.HEAD, Ink.INK, width * UNIT, 16);
            boolean again = answer.map(now -> !now.moved().isEmpty()).orElse(false);
            pen.text(PropertyWords.TEXTS.of(again ? "head.moved" : "head.how"), Type.HEAD, Ink.INK, width * HOW, 16);
            pen.level(Ink.RULE, 0, width, HEAD - 1.0);
            if (answer.isEmpty()) {
                pen.text(PropertyWords.TEXTS.of("answer.none"), Type.BODY, Ink.INK3, 0, HEAD + 15.0);
                return;
            }
            double y = HEAD;
            for (Answer.Quantity row : answer.get().quantities()) {
                quantity(pen, row, y, width);
                y += ROW;
            }
            say(pen, y + 12, width);
        }
    }

    private void quantity(Pen pen, Answer.Quantity row, double y, double width) {
        Ink ink = dim ? Ink.INK3 : Ink.INK;
        boolean first = y == HEAD;
        pen.fitted(row.name(), Type.BODY, Ink.INK2, 0, y + 15, width * 0.36);
        pen.textEndingAt(row.value(), first ? Type.GROUP : Type.BODY, ink, width * RIGHTS[0], y + 15);
        pen.textEndingAt(row.statistical(), Type.BODY, ink, width * RIGHTS[1], y + 15);
        pen.textEndingAt(row.shared(), Type.BODY, ink, width * RIGHTS[2], y + 15);
        pen.fitted(row.unit(), Type.BODY, Ink.INK2, width * UNIT, y + 15, width * (HOW - UNIT) - 6);
        pen.fitted(last(row), Type.BODY, Ink.INK2, width * HOW, y + 15, width * (1 - HOW));
        pen.level(Ink.HAIR, 0, width, y + ROW - 1);
    }

    /** How it came about, or what it was before and how far it moved. */
    private String last(Answer.Quantity row) {
        return answer.orElseThrow().moved().stream()
                .filter(moved -> moved.name().equals(row.name()) && !row.how().startsWith(SAME))
                .map(moved -> PropertyWords.TEXTS.of("moved", moved.before(), moved.sigma()))
                .findFirst()
                .orElse(row.how());
    }

    private void say(Pen pen, double top, double width) {
        Answer.Say say = answer.orElseThrow().say();
        double from = Math.min(220, width * 0.25);
        double room = width - from - 8;
        pen.text(PropertyWords.TEXTS.of("say"), Type.GROUP, Ink.INK, 0, top + 14);
        pen.text(PropertyWords.TEXTS.of("say.ratio"), Type.SMALL, Ink.INK2, 0, top + 32);
        SayScale scale = new SayScale(say, from, room);
        pen.text(PropertyWords.TEXTS.of("say.classical"), Type.SMALL, Ink.INK2, from, top + 12);
        pen.textEndingAt(PropertyWords.TEXTS.of("say.quantum"), Type.SMALL, Ink.INK2, from + room, top + 12);
        double middle = scale.place(0);
        String cannot = PropertyWords.TEXTS.of("say.cannot");
        double half = fringekeep.drawing.Lettering.width(cannot, Type.SMALL) / 2;
        pen.text(cannot, Type.SMALL, Ink.INK2, middle - half, top + 12);
        double y = top + 27;
        pen.level(Ink.RULE, from, from + room, y);
        scale.paint(pen, y);
        pen.fitted(say.words(), Type.BODY, dim ? Ink.INK3 : Ink.INK, 0, top + 60, width);
    }
}
