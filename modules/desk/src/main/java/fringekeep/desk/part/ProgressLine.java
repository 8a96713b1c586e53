package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.run.Progress;
import fringekeep.drawing.Lettering;
import fringekeep.drawing.NumberText;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.LongSupplier;

/**
 * One bar on a hairline with a sentence: what, how much of how much, how long still; and one word that stops it. Takes no room
 * while nothing runs.
 */
@SuppressWarnings("serial")
public final class ProgressLine extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.part.Texts", ProgressLine.class);
    private static final long SAYS_LEFT_AFTER = 2_000_000_000L;

    private final transient Consumer<Progress> stop;
    private transient Optional<Progress> now = Optional.empty();
    private final transient LongSupplier clock;
    private transient long began;
    private int stopFrom;

    /**
     * An empty line.
     *
     * @param stop told that what runs is to stop; what it has recorded by then stays
     */
    public ProgressLine(Consumer<Progress> stop) {
        this(stop, System::nanoTime);
    }

    ProgressLine(Consumer<Progress> stop, LongSupplier clock) {
        this.stop = stop;
        this.clock = clock;
        setName("progress");
        MouseAdapter mouse = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                if (event.getX() >= stopFrom) {
                    askToStop();
                }
            }

            @Override
            public void mouseMoved(MouseEvent event) {
                boolean over = event.getX() >= stopFrom;
                setCursor(Cursor.getPredefinedCursor(over ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        };
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
    }

    /** Asks what runs to stop, if anything does. */
    public void askToStop() {
        now.ifPresent(stop);
    }

    /** Shows how far it is; empty: nothing runs. */
    public void show(Optional<Progress> next) {
        boolean other = now.isEmpty()
                || next.isEmpty()
                || !now.get().place().equals(next.get().place())
                || next.get().done() < now.get().done();
        if (other) {
            began = clock.getAsLong();
        }
        now = next;
        getAccessibleContext().setAccessibleName(next.map(this::words).orElse(""));
        revalidate();
        repaint();
    }

    /** The sentence. */
    String words(Progress progress) {
        if (progress.total() <= 0) {
            return progress.done() > 0
                    ? TEXTS.of("progress.open", progress.what(), NumberText.count(progress.done()))
                    : progress.what();
        }
        String done = NumberText.count(progress.done());
        String total = NumberText.count(progress.total());
        long spent = clock.getAsLong() - began;
        if (spent < SAYS_LEFT_AFTER || progress.done() <= 0) {
            return TEXTS.of("progress", progress.what(), done, total);
        }
        double left = spent / 1e9 * (progress.total() - progress.done()) / progress.done();
        return TEXTS.of("progress.left", progress.what(), done, total, time(left));
    }

    private static String time(double seconds) {
        long whole = (long) Math.ceil(seconds);
        return whole < 90 ? TEXTS.of("seconds", whole) : TEXTS.of("minutes", (whole + 59) / 60);
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
            String word = TEXTS.of("stop.keeps");
            double width = Lettering.width(word, Type.SMALL);
            double x = getWidth() - 16 - width;
            stopFrom = (int) x - 6;
            pen.text(word, Type.SMALL, Ink.INK, x, 20);
            pen.fill(Ink.INK.color(), x, 22, Lettering.width(TEXTS.of("stop"), Type.SMALL), 1);
            pen.fitted(words(progress), Type.SMALL, Ink.INK2, 16, 20, x - 40);
        }
    }
}
