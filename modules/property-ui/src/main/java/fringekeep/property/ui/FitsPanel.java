package fringekeep.property.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.ActionEvent;
import java.awt.event.FocusEvent;
import java.awt.event.FocusListener;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Optional;
import javax.accessibility.AccessibleRole;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;
import javax.swing.Scrollable;

/** The resolved list: fits taken, then those left out with the reason. The row in hand is the one that may be left out. */
@SuppressWarnings("serial")
final class FitsPanel extends Painted implements Scrollable {
    private static final int ROW = 22;
    private static final int HEAD = 24;

    private transient List<Gathered.Line> lines = List.of();
    private final transient Runnable moved;
    private int at;
    private boolean dim;

    /** A list that tells when another row is in hand. */
    FitsPanel(Runnable moved) {
        this.moved = moved;
        setName("property.fits");
        setFocusable(true);
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                go((event.getY() - HEAD) / ROW);
            }
        });
        addFocusListener(new FocusListener() {
            @Override
            public void focusGained(FocusEvent event) {
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                repaint();
            }
        });
        key("UP", () -> go(at - 1));
        key("DOWN", () -> go(at + 1));
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.LIST;
    }

    private void key(String stroke, Runnable work) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    void go(int row) {
        at = Math.max(0, Math.min(lines.size() - 1, row));
        scrollRectToVisible(new Rectangle(0, HEAD + at * ROW, 1, ROW));
        say();
        moved.run();
        repaint();
    }

    /** The row in hand. */
    Optional<Gathered.Line> current() {
        return at < lines.size() ? Optional.of(lines.get(at)) : Optional.empty();
    }

    List<Gathered.Line> lines() {
        return lines;
    }

    void show(List<Gathered.Line> next, boolean old) {
        dim = old;
        if (!next.equals(lines)) {
            Optional<Gathered.Line> before = current();
            lines = List.copyOf(next);
            at = Math.max(0, Math.min(at, lines.size() - 1));
            for (int i = 0; i < lines.size(); i++) {
                if (before.isPresent() && lines.get(i).fit().equals(before.get().fit())) {
                    at = i;
                }
            }
            say();
            revalidate();
        }
        repaint();
    }

    private void say() {
        getAccessibleContext().setAccessibleName(PropertyWords.TEXTS.of("fits"));
        getAccessibleContext()
                .setAccessibleDescription(current()
                        .map(line -> line.label() + ", " + line.power() + " W, " + line.visibility() + ", "
                                + (line.reason().isEmpty()
                                        ? PropertyWords.TEXTS.of("fits.taken")
                                        : PropertyWords.reason(line.reason())))
                        .orElse(PropertyWords.TEXTS.of("fits.none")));
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(340, HEAD + ROW * Math.max(1, lines.size()));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            int width = getWidth() - 6;
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.text(PropertyWords.TEXTS.of("fits.fit"), Type.HEAD, Ink.INK2, 2, 16);
            pen.textEndingAt("P / W", Type.HEAD, Ink.INK2, width * 0.42, 16);
            pen.textEndingAt(PropertyWords.TEXTS.of("fits.visibility"), Type.HEAD, Ink.INK2, width * 0.64, 16);
            pen.level(Ink.RULE, 2, width, HEAD - 1.0);
            if (lines.isEmpty()) {
                pen.fitted(PropertyWords.TEXTS.of("fits.none"), Type.BODY, Ink.INK3, 2, HEAD + 15.0, width);
            }
            Rectangle clip = graphics.getClipBounds();
            int first = clip == null ? 0 : Math.max(0, (clip.y - HEAD) / ROW);
            int last = clip == null ? lines.size() : Math.min(lines.size(), (clip.y + clip.height - HEAD) / ROW + 1);
            for (int i = first; i < last; i++) {
                row(pen, lines.get(i), i, width);
            }
            if (isFocusOwner()) {
                pen.focus(0, HEAD - 1.0 + (double) at * ROW, width + 4.0, ROW + 1.0);
            }
        }
    }

    private void row(Pen pen, Gathered.Line line, int i, double width) {
        double y = HEAD + (double) i * ROW;
        double base = y + 15;
        boolean left = !line.reason().isEmpty();
        Ink ink = dim || left ? Ink.INK3 : Ink.INK;
        if (i == at) {
            pen.fill(Ink.SEL.color(), 0, y, width + 4, ROW - 1.0);
        }
        pen.text(line.label(), Type.BODY, ink, 4, base);
        pen.textEndingAt(line.power(), Type.BODY, ink, width * 0.42, base);
        pen.textEndingAt(line.visibility(), Type.BODY, ink, width * 0.64, base);
        if (left) {
            double x = width * 0.64 + 10;
            Mark mark = line.reason().equals("outdated") ? Mark.RING : Mark.SLASH;
            mark.paint(pen.graphics(), x, y + 4, 12);
            pen.fitted(PropertyWords.reason(line.reason()), Type.SMALL, Ink.INK2, x + 16, base, width - x - 16);
        }
        pen.level(Ink.HAIR, 2, width, y + ROW - 1);
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return ROW;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(ROW, visible.height - 2 * ROW);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > getPreferredSize().height;
    }
}
