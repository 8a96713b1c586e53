package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.NumberText;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;

/** Equal columns with a rule, a shape, a count and a word; no lengths, the counts differ too much. */
@SuppressWarnings("serial")
public final class VerdictCounts extends Painted {
    private transient List<VerdictTable.Count> columns = List.of();

    VerdictCounts() {}

    void show(List<VerdictTable.Count> next) {
        columns = List.copyOf(next);
        StringBuilder words = new StringBuilder();
        next.forEach(
                one -> words.append(one.count()).append(' ').append(one.words()).append("; "));
        getAccessibleContext().setAccessibleName(words.toString());
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, 66);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double width = (getWidth() - 25.0 * (columns.size() - 1)) / Math.max(1, columns.size());
            for (int i = 0; i < columns.size(); i++) {
                VerdictTable.Count one = columns.get(i);
                double x = i * (width + 25);
                pen.fill((one.count() == 0 ? Ink.HAIR : one.rule()).color(), x, 0, width, 4);
                one.mark().paint(pen.graphics(), x, 19, 12);
                pen.text(NumberText.count(one.count()), Type.VIEW, Ink.INK, x + 20, 30);
                pen.fitted(one.words(), Type.BODY, Ink.INK2, x, 50, width);
            }
        }
    }
}
