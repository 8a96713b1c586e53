package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Component;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.BorderFactory;
import javax.swing.JScrollPane;
import javax.swing.JTable;
import javax.swing.ScrollPaneConstants;
import javax.swing.table.AbstractTableModel;
import javax.swing.table.TableCellRenderer;

/** A ruled table of the house for a sheet's own rows: hairlines, marks beside words, one column that takes the rest. */
@SuppressWarnings("serial")
public final class RuledTable extends JTable {
    private static final int MARGIN = 16;

    private final transient List<Col> columns;
    private transient List<List<Cell>> rows = List.of();
    private String whenEmpty = "";

    /**
     * A column.
     *
     * @param head words above it, with the unit
     * @param width in units of 1/96 inch; of a growing column the least
     * @param right whether its texts end at the right
     * @param grows whether it takes what room is left
     */
    public record Col(String head, int width, boolean right, boolean grows) {}

    /**
     * A cell.
     *
     * @param mark shape before the text
     * @param text words
     * @param ink colour of the text
     * @param mono whether it is text as it stands in a file
     */
    public record Cell(Optional<Mark> mark, String text, Ink ink, boolean mono) {
        /** Plain words. */
        public static Cell of(String text) {
            return new Cell(Optional.empty(), text, Ink.INK, false);
        }

        /** Words of another colour. */
        public static Cell of(String text, Ink ink) {
            return new Cell(Optional.empty(), text, ink, false);
        }

        /** Words behind a shape. */
        public static Cell of(Mark mark, String text) {
            return new Cell(Optional.of(mark), text, Ink.INK, false);
        }
    }

    /** An empty table; {@code name} for tests, {@code spoken} for those who read the screen out. */
    public RuledTable(String name, String spoken, List<Col> columns) {
        this.columns = List.copyOf(columns);
        setName(name);
        getAccessibleContext().setAccessibleName(spoken);
        setModel(new Rows());
        setRowHeight(22);
        setShowGrid(false);
        setIntercellSpacing(new Dimension(0, 0));
        setFillsViewportHeight(true);
        setDefaultRenderer(Object.class, new CellPainter());
        getTableHeader().setReorderingAllowed(false);
        getTableHeader().setResizingAllowed(false);
        getTableHeader().setDefaultRenderer(new HeadPainter());
        updateColours();
    }

    /** Shows rows; what is selected stays selected by its place. */
    public void show(List<List<Cell>> next) {
        boolean samePlaces = next.size() == rows.size();
        int[] selected = getSelectedRows();
        rows = new ArrayList<>(next);
        if (samePlaces) {
            repaint();
            return;
        }
        ((AbstractTableModel) getModel()).fireTableDataChanged();
        for (int row : selected) {
            if (row < rows.size()) {
                addRowSelectionInterval(row, row);
            }
        }
        revalidate();
    }

    /** Says what would stand here, in the first row, while there is none. */
    public void whenEmpty(String words) {
        whenEmpty = words;
        repaint();
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        super.paintComponent(graphics);
        if (rows.isEmpty() && !whenEmpty.isEmpty()) {
            try (Pen pen = new Pen(graphics)) {
                pen.fitted(whenEmpty, Type.BODY, Ink.INK2, MARGIN + 6.0, 15, getWidth() - 2.0 * MARGIN);
                pen.level(Ink.HAIR, MARGIN, getWidth() - (double) MARGIN, 21);
            }
        }
    }

    /** Shows one row anew. */
    public void show(int row, List<Cell> cells) {
        rows.set(row, List.copyOf(cells));
        Rectangle place = getCellRect(row, 0, true);
        repaint(0, place.y, getWidth(), place.height);
    }

    /** The table below its heads, scrolled where it is longer than its room. */
    public JScrollPane inScroll() {
        JScrollPane scroll = new JScrollPane(this);
        scroll.setColumnHeaderView(getTableHeader());
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        scroll.setOpaque(false);
        scroll.getViewport().setOpaque(false);
        return scroll;
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public void doLayout() {
        int fixed = columns.stream()
                .filter(col -> !col.grows())
                .mapToInt(Col::width)
                .sum();
        for (int i = 0; i < columns.size(); i++) {
            Col col = columns.get(i);
            int width = col.grows() ? Math.max(col.width(), getWidth() - fixed) : col.width();
            getColumnModel().getColumn(i).setWidth(width);
        }
    }

    @Override
    public void updateUI() {
        super.updateUI();
        if (columns != null) {
            updateColours();
            getTableHeader().setDefaultRenderer(new HeadPainter());
        }
    }

    private void updateColours() {
        setBackground(Ink.SHEET.color());
        getTableHeader().setBackground(Ink.SHEET.color());
    }

    @Override
    public boolean isCellEditable(int row, int column) {
        return false;
    }

    private double left(int column) {
        return column == 0 ? MARGIN : 8;
    }

    private double right(int column, int width) {
        return width - (column == columns.size() - 1 ? MARGIN : 8);
    }

    private final class Rows extends AbstractTableModel {
        @Override
        public int getRowCount() {
            return rows.size();
        }

        @Override
        public int getColumnCount() {
            return columns.size();
        }

        @Override
        public String getColumnName(int column) {
            return columns.get(column).head();
        }

        @Override
        public Object getValueAt(int row, int column) {
            return column < rows.get(row).size() ? rows.get(row).get(column).text() : "";
        }
    }

    private final class HeadPainter extends Painted implements TableCellRenderer {
        private int column;

        @Override
        public Component getTableCellRendererComponent(
                JTable table, Object value, boolean isSelected, boolean hasFocus, int row, int at) {
            column = at;
            return this;
        }

        @Override
        public Dimension getPreferredSize() {
            return new Dimension(40, 24);
        }

        @Override
        public void paint(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
                Col col = columns.get(column);
                boolean last = column == columns.size() - 1;
                pen.level(Ink.RULE, column == 0 ? MARGIN : 0, last ? getWidth() - MARGIN : getWidth(), 23);
                double x =
                        col.right() ? right(column, getWidth()) - Lettering.width(col.head(), Type.HEAD) : left(column);
                pen.text(col.head(), Type.HEAD, Ink.INK2, x, 16);
            }
        }
    }

    private final class CellPainter extends Painted implements TableCellRenderer {
        private int row;
        private int column;
        private boolean selected;

        @Override
        public Component getTableCellRendererComponent(
                JTable table, Object value, boolean isSelected, boolean hasFocus, int at, int columnAt) {
            row = at;
            column = columnAt;
            selected = isSelected;
            getAccessibleContext().setAccessibleName(String.valueOf(value));
            return this;
        }

        @Override
        public void paint(Graphics graphics) {
            List<Cell> cells = rows.get(row);
            if (column >= cells.size()) {
                return;
            }
            try (Pen pen = new Pen(graphics)) {
                int width = getWidth();
                boolean last = column == columns.size() - 1;
                double from = column == 0 ? MARGIN : 0;
                double to = last ? width - MARGIN : width;
                pen.fill(Ink.SHEET.color(), 0, 0, width, getHeight());
                if (selected) {
                    pen.fill(Ink.SEL.color(), from, 0, to - from, getHeight());
                    if (column == 0 && isFocusInTable()) {
                        pen.fill(Ink.SELRULE.color(), from, 0, 3, getHeight());
                    }
                }
                pen.level(Ink.HAIR, from, to, getHeight() - 1.0);
                cell(pen, cells.get(column), width);
            }
        }

        private boolean isFocusInTable() {
            return RuledTable.this.isFocusOwner();
        }

        private void cell(Pen pen, Cell cell, int width) {
            Font font = cell.mono() ? Type.MONO : Type.BODY;
            double x = left(column) + (column == 0 ? 6 : 0);
            if (cell.mark().isPresent()) {
                cell.mark().get().paint(pen.graphics(), x, 5, 11);
                x += 17;
            }
            double room = right(column, width) - x;
            String shown = Pen.shortened(cell.text(), font, room);
            double at = columns.get(column).right() ? right(column, width) - Lettering.width(shown, font) : x;
            pen.text(shown, font, cell.ink(), at, 15);
        }
    }
}
