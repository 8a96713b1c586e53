package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.run.Progress;
import fringekeep.drawing.NumberText;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.Optional;

/** One bar on a hairline with a sentence; takes no room while nothing runs. */
@SuppressWarnings("serial")
public final class ProgressLine extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.part.Texts", ProgressLine.class);

    private transient Optional<Progress> now = Optional.empty();

    /** Shows how far it is; empty: nothing runs. */
    public void show(Optional<Progress> next) {
        now = next;
        getAccessibleContext().setAccessibleName(next.map(ProgressLine::words).orElse(""));
        revalidate();
        repaint();
    }

    private static String words(Progress progress) {
        return progress.total() > 0
                ? TEXTS.of(
                        "progress",
                        progress.what(),
                        NumberText.count(progress.done()),
                        NumberText.count(progress.total()))
                : TEXTS.of("progress.open", progress.what(), NumberText.count(progress.done()));
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, now.isPresent() ? 26 : 0);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        if (now.isEmpty()) {
            return;
        }
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.level(Ink.RULE, 16, getWidth() - 16.0, 5);
            Progress progress = now.get();
            if (progress.total() > 0) {
                double share = Math.min(1, (double) progress.done() / progress.total());
                pen.fill(Ink.SELRULE.color(), 16, 3, (getWidth() - 32.0) * share, 4);
            }
            pen.fitted(words(progress), Type.SMALL, Ink.INK2, 16, 20, getWidth() - 32.0);
        }
    }
}
