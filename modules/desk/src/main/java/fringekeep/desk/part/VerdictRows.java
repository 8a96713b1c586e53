package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.VerdictTable.Group;
import fringekeep.desk.part.VerdictTable.Line;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Consumer;
import javax.accessibility.AccessibleRole;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;
import javax.swing.Scrollable;

/** The rows of a verdict table; one is selected. */
@SuppressWarnings("serial")
final class VerdictRows extends Painted implements Scrollable {
    private static final int ROW = 22;
    private static final int GROUP = 30;

    private final transient List<String> heads;
    private final transient Consumer<Line> told;
    private final transient Consumer<Line> enter;
    private final Head head = new Head();
    private transient List<Group> groups = List.of();
    private transient List<Line> lines = List.of();
    private int selected = -1;

    VerdictRows(List<String> heads, Consumer<Line> told, Consumer<Line> enter) {
        this.heads = List.copyOf(heads);
        this.told = told;
        this.enter = enter;
        setFocusable(true);
        setName("verdicts");
        key("DOWN", () -> select(selected + 1));
        key("UP", () -> select(selected - 1));
        key("HOME", () -> select(0));
        key("END", () -> select(lines.size() - 1));
        key("PAGE_DOWN", () -> select(Math.min(lines.size() - 1, selected + 15)));
        key("PAGE_UP", () -> select(Math.max(0, selected - 15)));
        key("ENTER", () -> selected().ifPresent(enter));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                at(event.getY()).ifPresent(VerdictRows.this::select);
                if (event.getClickCount() == 2) {
                    selected().ifPresent(VerdictRows.this.enter);
                }
            }
        });
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
    }

    private void key(String stroke, Runnable work) {
        getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.TABLE;
    }

    List<String> heads() {
        return heads;
    }

    List<Group> groups() {
        return groups;
    }

    Painted head() {
        return head;
    }

    void show(List<Group> next) {
        groups = List.copyOf(next);
        List<Line> all = new ArrayList<>();
        next.forEach(group -> all.addAll(group.lines()));
        lines = List.copyOf(all);
        selected = -1;
        revalidate();
        repaint();
        int first = 0;
        for (int i = lines.size() - 1; i >= 0; i--) {
            if (lines.get(i).mark() == Mark.DIFFERENT) {
                first = i;
            }
        }
        select(first);
    }

    private void select(int row) {
        if (row < 0 || row >= lines.size()) {
            return;
        }
        selected = row;
        Line line = lines.get(row);
        getAccessibleContext().setAccessibleName(line.record() + ", " + line.what() + ": " + line.verdict());
        scrollRectToVisible(new Rectangle(0, top(row) - (row == 0 ? GROUP : 0), getWidth(), ROW + GROUP));
        repaint();
        told.accept(line);
    }

    Optional<Line> selected() {
        return selected >= 0 && selected < lines.size() ? Optional.of(lines.get(selected)) : Optional.empty();
    }

    OptionalInt selectedMiddle() {
        if (selected < 0) {
            return OptionalInt.empty();
        }
        int middle = top(selected) + ROW / 2;
        return getVisibleRect().contains(0, middle) ? OptionalInt.of(middle) : OptionalInt.empty();
    }

    /** Upper edge of a row: rows before it and the heads of groups up to its own. */
    private int top(int row) {
        int y = 0;
        int left = row;
        for (Group group : groups) {
            y += GROUP;
            if (left < group.lines().size()) {
                return y + left * ROW;
            }
            left -= group.lines().size();
            y += group.lines().size() * ROW + 6;
        }
        return y;
    }

    private Optional<Integer> at(int y) {
        for (int row = 0; row < lines.size(); row++) {
            int top = top(row);
            if (y >= top && y < top + ROW) {
                return Optional.of(row);
            }
        }
        return Optional.empty();
    }

    private int height() {
        return groups.size() * (GROUP + 6) + lines.size() * ROW;
    }

    /** Left edges: record, what; right edges: kept, now, change; left edge: verdict. */
    private double[] columns() {
        double width = getWidth();
        double verdict = Math.max(width * 0.74, width - 230);
        double each = Math.min(110, (verdict - width * 0.42) / 3);
        double change = verdict - 30;
        return new double[] {6, Math.min(190, width * 0.23), change - 2 * each, change - each, change, verdict};
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, height());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        Rectangle clip = graphics.getClipBounds();
        try (Pen pen = new Pen(graphics)) {
            int y = 0;
            int row = 0;
            for (Group group : groups) {
                pen.text(group.head(), Type.GROUP, Ink.INK, 6, y + 20.0);
                pen.level(Ink.RULE, 0, getWidth(), y + GROUP - 1.0);
                y += GROUP;
                for (Line line : group.lines()) {
                    if (y + ROW >= clip.y && y <= clip.y + clip.height) {
                        line(pen, line, y, row == selected);
                    }
                    y += ROW;
                    row++;
                }
                y += 6;
            }
        }
    }

    private void line(Pen pen, Line line, int y, boolean on) {
        if (on) {
            pen.fill(Ink.SEL.color(), 0, y, getWidth(), ROW);
        }
        double[] at = columns();
        double base = y + 15.0;
        pen.fitted(line.record(), on ? Type.BODY_MEDIUM : Type.BODY, Ink.INK, at[0], base, at[1] - 14);
        // words take the room of numbers that are not there
        double what = line.kept().isEmpty() ? line.now().isEmpty() ? at[4] - 50 : at[3] - 70 : at[2] - 70;
        pen.fitted(line.what(), Type.BODY, Ink.INK2, at[1], base, what - at[1]);
        pen.textEndingAt(line.kept(), Type.BODY, Ink.INK, at[2], base);
        pen.textEndingAt(line.now(), Type.BODY, Ink.INK, at[3], base);
        pen.textEndingAt(line.change(), Type.BODY, Ink.INK, at[4], base);
        line.mark().paint(pen.graphics(), at[5], y + 5.0, 12);
        pen.fitted(line.verdict(), Type.BODY, Ink.INK, at[5] + 19, base, getWidth() - at[5] - 22);
        pen.level(Ink.HAIR, 0, getWidth(), y + ROW - 1.0);
        if (on && isFocusOwner()) {
            pen.focus(0, y, getWidth(), ROW);
        }
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return new Dimension(400, 300);
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return ROW;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(ROW, visible.height - ROW);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > height();
    }

    /** Words over the columns; stay while rows scroll. */
    private final class Head extends Painted {
        @Override
        public Dimension getPreferredSize() {
            return new Dimension(400, 28);
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                double[] at = columns();
                for (int i = 0; i < at.length; i++) {
                    if (i >= 2 && i <= 4) {
                        pen.textEndingAt(heads.get(i), Type.HEAD, Ink.INK2, at[i], 17);
                    } else {
                        pen.text(heads.get(i), Type.HEAD, Ink.INK2, at[i], 17);
                    }
                }
                pen.level(Ink.RULE, 0, getWidth(), 27);
            }
        }
    }
}
