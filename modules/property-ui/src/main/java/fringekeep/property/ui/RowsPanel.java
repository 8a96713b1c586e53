package fringekeep.property.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.WordChoice;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import javax.swing.JComponent;
import javax.swing.Scrollable;

/** Rows of words and fields under heads, one below the other. */
@SuppressWarnings("serial")
class RowsPanel extends Painted implements Scrollable {
    private static final int HEAD = 30;

    private final transient List<Entry> entries = new ArrayList<>();
    private final transient Map<String, Integer> heads = new LinkedHashMap<>();

    private record Entry(String head, JComponent row, BooleanSupplier seen, Runnable refresh) {}

    /** Adds a row; {@code seen} says whether it has a meaning now, {@code refresh} shows what is chosen. */
    final void add(String head, JComponent row, BooleanSupplier seen, Runnable refresh) {
        entries.add(new Entry(head, row, seen, refresh));
        add(row);
    }

    /** Shows all as it is now. */
    final void refresh() {
        for (Entry entry : entries) {
            entry.refresh().run();
            entry.row().setVisible(entry.seen().getAsBoolean());
        }
        revalidate();
        repaint();
    }

    /** The row of that name. */
    final Optional<JComponent> row(String name) {
        return entries.stream()
                .map(Entry::row)
                .filter(row -> name.equals(row.getName()) || (name + ".row").equals(row.getName()))
                .findFirst();
    }

    private int lay(int width, boolean move) {
        String head = "";
        int y = -8;
        heads.clear();
        for (Entry entry : entries) {
            if (!entry.row().isVisible()) {
                continue;
            }
            if (!entry.head().equals(head)) {
                head = entry.head();
                heads.put(head, y);
                y += HEAD;
            }
            int tall = entry.row() instanceof WordChoice choice
                    ? choice.heightIn(width)
                    : entry.row() instanceof FieldRow field
                            ? field.height()
                            : entry.row().getPreferredSize().height;
            if (move) {
                entry.row().setBounds(2, y, width, tall);
            }
            y += tall;
        }
        return y + 8;
    }

    @Override
    public void doLayout() {
        lay(getWidth() - 6, true);
    }

    @Override
    public Dimension getPreferredSize() {
        int width = getParent() == null ? 360 : Math.max(200, getParent().getWidth());
        return new Dimension(width, lay(width - 6, false));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            heads.forEach((head, y) -> {
                pen.text(PropertyWords.TEXTS.of("head." + head), Type.GROUP, Ink.INK, 2, y + 22.0);
                pen.level(Ink.RULE, 2, getWidth() - 4.0, y + HEAD - 1.0);
            });
        }
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return 22;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(22, visible.height - 44);
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
