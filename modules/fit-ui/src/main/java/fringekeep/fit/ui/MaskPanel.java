package fringekeep.fit.ui;

import fringekeep.archive.judgement.Verdict;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.WordChoice;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.function.UnaryOperator;
import javax.swing.JComponent;

/** What is said of the points that are masked here, or used again although they were masked. */
@SuppressWarnings("serial")
final class MaskPanel extends Painted {
    private static final int HEAD = 24;
    private static final int INDENT = 64;

    private final WordChoice reason;
    private final WordChoice undoing;
    private final FieldRow words;
    private String heading = "";
    private boolean masks;

    /** Tells changes of the masks. */
    interface Ear {
        void change(UnaryOperator<FitPlan.Masks> how);
    }

    MaskPanel(Ear ear) {
        setName("fit.masks");
        reason = new WordChoice(
                "fit.mask.reason",
                text("mask.reason"),
                FitWords.reasons(Verdict.MASKED),
                "",
                INDENT,
                code -> ear.change(masks -> masks.because(code)));
        undoing = new WordChoice(
                "fit.mask.undoing",
                text("mask.undoing"),
                FitWords.reasons(Verdict.RESTORED),
                "",
                INDENT,
                code -> ear.change(masks -> masks.undoing(code)));
        words = FieldRow.any(
                "fit.mask.words", text("mask.words"), "", INDENT, written -> ear.change(masks -> masks.words(written)));
        add(reason);
        add(undoing);
        add(words);
    }

    private static String text(String key) {
        return FitWords.TEXTS.of(key);
    }

    void show(FitPlan.Masks now) {
        int masked = now.masked().size();
        int shown = now.shown().size();
        masks = masked > 0;
        heading = masked + shown == 0
                ? text("mask.none")
                : (masked > 0 ? FitWords.TEXTS.of("mask.masked", masked) : "")
                        + (masked > 0 && shown > 0 ? ", " : "")
                        + (shown > 0 ? FitWords.TEXTS.of("mask.shown", shown) : "");
        getAccessibleContext().setAccessibleName(heading);
        reason.show(now.reason());
        undoing.show(now.undoing());
        words.show(now.words());
        reason.setVisible(masked > 0);
        undoing.setVisible(shown > 0);
        words.setVisible(masked + shown > 0);
        revalidate();
        repaint();
    }

    WordChoice reason() {
        return reason;
    }

    WordChoice undoing() {
        return undoing;
    }

    FieldRow words() {
        return words;
    }

    String heading() {
        return heading;
    }

    private int lay(int width, boolean move) {
        int y = HEAD;
        for (JComponent row : new JComponent[] {reason, undoing, words}) {
            if (row.isVisible()) {
                int tall = row instanceof WordChoice choice ? choice.heightIn(width) : FieldRow.ROW;
                if (move) {
                    row.setBounds(0, y, width, tall);
                }
                y += tall;
            }
        }
        return y;
    }

    /** Height it needs in a width. */
    int heightIn(int width) {
        return lay(width, false);
    }

    @Override
    public void doLayout() {
        lay(getWidth(), true);
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(320, lay(320, false));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.text(text("mask"), Type.GROUP, Ink.INK, 0, 16);
            double x = 60;
            if (masks) {
                Mark.BAR.paint(pen.graphics(), x, 5, 12);
                x += 16;
            }
            pen.fitted(heading, Type.SMALL, Ink.INK2, x, 16, getWidth() - x);
            pen.level(Ink.RULE, 0, getWidth(), HEAD - 1.0);
        }
    }
}
