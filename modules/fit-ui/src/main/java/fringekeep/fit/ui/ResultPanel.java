package fringekeep.fit.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;
import java.util.Optional;

/** Numbers of the fit in hand beside its plot: name with unit, value with uncertainty. */
@SuppressWarnings("serial")
final class ResultPanel extends Painted {
    static final int WIDTH = 200;
    private static final int ROW = 22;

    private transient List<ResultFacts.Row> rows = List.of();
    private transient Optional<Mark> mark = Optional.empty();
    private String title = "";
    private String word = "";
    private boolean dim;

    ResultPanel() {
        setName("fit.result");
    }

    /**
     * Shows rows.
     *
     * @param heading over them
     * @param state shape and word behind the heading
     * @param old whether they answer an older plan
     */
    void show(String heading, Optional<Mark> state, String stateWord, List<ResultFacts.Row> next, boolean old) {
        title = heading;
        mark = state;
        word = stateWord;
        rows = List.copyOf(next);
        dim = old;
        StringBuilder words = new StringBuilder();
        next.forEach(
                row -> words.append(row.name()).append(' ').append(row.value()).append("; "));
        getAccessibleContext().setAccessibleName(heading + " " + stateWord);
        getAccessibleContext().setAccessibleDescription(words.toString());
        revalidate();
        repaint();
    }

    /** Rows as shown. */
    List<ResultFacts.Row> rows() {
        return rows;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(WIDTH, 26 + ROW * rows.size());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double x = pen.text(title, Type.GROUP, Ink.INK, 0, 15) + 8;
            if (mark.isPresent()) {
                mark.get().paint(pen.graphics(), x, 4, 12);
                x += 16;
            }
            pen.fitted(word, Type.SMALL, Ink.INK2, x, 15, getWidth() - x);
            pen.level(Ink.RULE, 0, getWidth(), 23);
            double y = 24;
            Ink value = dim ? Ink.INK3 : Ink.INK;
            for (ResultFacts.Row row : rows) {
                double width = Lettering.width(row.value(), Type.BODY);
                pen.fitted(
                        row.name(), row.strong() ? Type.GROUP : Type.BODY, Ink.INK2, 0, y + 15, getWidth() - width - 8);
                pen.textEndingAt(row.value(), row.strong() ? Type.GROUP : Type.BODY, value, getWidth(), y + 15);
                pen.level(Ink.HAIR, 0, getWidth(), y + ROW - 1);
                y += ROW;
            }
        }
    }
}
