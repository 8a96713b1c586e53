package fringekeep.fit.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;

/** Scans that have no fit, each with what is wrong and what to do. */
@SuppressWarnings("serial")
final class FailurePanel extends Painted {
    private static final int ROW = 40;
    private static final int HEAD = 24;
    private static final int LABEL = 96;

    private transient List<FitEach.Failure> failures = List.of();

    FailurePanel() {
        setName("each.failed");
    }

    void show(List<FitEach.Failure> next) {
        failures = List.copyOf(next);
        StringBuilder words = new StringBuilder();
        next.forEach(each -> words.append(each.scan())
                .append(": ")
                .append(each.problem().what())
                .append("; "));
        getAccessibleContext().setAccessibleName(FitWords.TEXTS.of("each.failed"));
        getAccessibleContext().setAccessibleDescription(words.toString());
        revalidate();
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(300, HEAD + ROW * Math.max(1, failures.size()));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.text(FitWords.TEXTS.of("each.failed"), Type.GROUP, Ink.INK, 0, 16);
            pen.level(Ink.RULE, 0, getWidth(), HEAD - 1.0);
            if (failures.isEmpty()) {
                pen.text(FitWords.TEXTS.of("each.failed.none"), Type.BODY, Ink.INK3, 0, HEAD + 16.0);
            }
            double y = HEAD;
            for (FitEach.Failure failure : failures) {
                Mark.DASHES.paint(pen.graphics(), 0, y + 5, 12);
                pen.fitted(failure.scan(), Type.BODY_MEDIUM, Ink.INK, 18, y + 15, LABEL - 20);
                pen.fitted(failure.problem().what(), Type.BODY, Ink.INK, LABEL, y + 15, getWidth() - LABEL);
                pen.fitted(failure.problem().mend(), Type.SMALL, Ink.INK2, LABEL, y + 32, getWidth() - LABEL);
                pen.level(Ink.HAIR, 0, getWidth(), y + ROW - 1);
                y += ROW;
            }
        }
    }
}
