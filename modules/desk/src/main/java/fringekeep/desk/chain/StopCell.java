package fringekeep.desk.chain;

import fringekeep.archive.graph.StateName;
import fringekeep.desk.chain.ChainState.StopState;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.NumberText;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import javax.accessibility.AccessibleRole;

/** One stop of the strip: word, count, ring and slash counts, and its part of the thread. */
@SuppressWarnings("serial")
final class StopCell extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.chain.Texts", StopCell.class);
    private static final int INSET = 10;

    private final int position;
    private transient StopState state;
    private boolean open;
    private boolean threadStarts;
    private transient double[] ticks = new double[0];
    private transient double ringFrom = -1;
    private transient double slashFrom = -1;

    StopCell(int position, StopState state, ChainListener listener) {
        this.position = position;
        this.state = state;
        setFocusable(true);
        setName("stop " + state.label());
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
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                pressed(event.getX(), event.getY(), listener);
            }
        });
    }

    void show(StopState next, boolean isOpen, boolean first) {
        state = next;
        open = isOpen;
        threadStarts = first;
        getAccessibleContext().setAccessibleName(words());
        setToolTipText(words());
        repaint();
    }

    void ticks(double[] next) {
        ticks = next.clone();
        repaint();
    }

    /** Height of the thread, a fixed room above the foot. */
    private int thread() {
        return getHeight() - 17;
    }

    private String words() {
        String linked = state.linked() < 0 ? "" : TEXTS.of("stop.linked", state.linked());
        String outdated = state.outdated() == 0 ? "" : TEXTS.of("stop.outdated", state.outdated());
        String withdrawn = state.withdrawn() == 0 ? "" : TEXTS.of("stop.withdrawn", state.withdrawn());
        return TEXTS.of("stop", state.label(), state.count()) + outdated + withdrawn + linked;
    }

    private void pressed(int x, int y, ChainListener listener) {
        requestFocusInWindow();
        if (y >= thread() - 10 && y <= thread() + 10 && state.linked() > 0) {
            listener.linked(position);
        } else if (ringFrom >= 0 && x >= ringFrom && (slashFrom < 0 || x < slashFrom) && y > 30) {
            listener.filter(position, StateName.OUTDATED);
        } else if (slashFrom >= 0 && x >= slashFrom && y > 30) {
            listener.filter(position, StateName.WITHDRAWN);
        } else {
            listener.open(position);
        }
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.GROUND.color(), 0, 0, getWidth(), getHeight());
            if (state.opens() || threadStarts) {
                pen.upright(Ink.RULE, 0, 10, getHeight() - 1.0);
            }
            pen.fitted(
                    state.label(),
                    open ? Type.GROUP : Type.BODY,
                    open ? Ink.INK : Ink.INK2,
                    INSET,
                    22,
                    getWidth() - 12.0);
            counts(pen);
            if (getHeight() > 96) {
                ticks(pen);
            }
            thread(pen);
            pen.level(Ink.STRONG, 0, getWidth(), getHeight() - 1.0);
            if (open) {
                pen.fill(Ink.STRONG.color(), 0, getHeight() - 4.0, getWidth(), 4);
            }
            if (isFocusOwner()) {
                pen.focus(2, 6, getWidth() - 4.0, getHeight() - 12.0);
            }
        }
    }

    private void counts(Pen pen) {
        Font font = open ? Type.COUNT_OPEN : Type.COUNT;
        double x = pen.text(NumberText.count(state.count()), font, state.count() == 0 ? Ink.INK3 : Ink.INK, INSET, 48);
        ringFrom = state.outdated() == 0 ? -1 : x + 6;
        if (state.outdated() > 0) {
            x = counted(pen, Mark.RING, state.outdated(), x);
        }
        slashFrom = state.withdrawn() == 0 ? -1 : x + 6;
        if (state.withdrawn() > 0) {
            counted(pen, Mark.SLASH, state.withdrawn(), x);
        }
    }

    private static double counted(Pen pen, Mark mark, int count, double x) {
        mark.paint(pen.graphics(), x + 7, 35.5, 12);
        return pen.text(Integer.toString(count), Type.SMALL, Ink.INK2, x + 22, 46);
    }

    /** A short upright line for each record, over the view's time. */
    private void ticks(Pen pen) {
        double room = getWidth() - 2.0 * INSET - 8;
        for (double at : ticks) {
            pen.fill(Ink.INK2.color(), Math.rint(INSET + at * room), 58, 1, 6);
        }
    }

    private void thread(Pen pen) {
        int from = threadStarts ? INSET : 0;
        if (state.linked() < 0 || (state.linked() == 0 && state.here().isEmpty())) {
            dots(pen, from);
            return;
        }
        double end;
        if (state.here().isEmpty()) {
            pen.fill(Ink.STRONG.color(), INSET + 3.0, thread() - 4.0, 2, 8);
            end = pen.text(NumberText.count(state.linked()), Type.SMALL, Ink.INK2, INSET + 14.0, thread() + 4.0);
        } else {
            Mark.HERE.paint(pen.graphics(), INSET - 2.0, thread() - 6.0, 12);
            String here = Pen.shortened(state.here(), Type.HEAD, getWidth() - 34.0);
            end = pen.text(here, Type.HEAD, Ink.INK, INSET + 14.0, thread() + 4.0);
        }
        if (!threadStarts) {
            pen.level(Ink.STRONG, 0, INSET - 4.0, thread());
        }
        pen.level(Ink.STRONG, end + 8, getWidth(), thread());
    }

    private void dots(Pen pen, int from) {
        for (int x = from + 2; x < getWidth() - 2; x += 6) {
            pen.fill(Ink.RULE.color(), x, thread(), 1, 1);
        }
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.PAGE_TAB;
    }
}
