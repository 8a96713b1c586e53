package fringekeep.figure.ui;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import java.awt.Component;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.DefaultCellEditor;
import javax.swing.JComboBox;
import javax.swing.JScrollPane;
import javax.swing.JTable;
import javax.swing.JTextField;
import javax.swing.KeyStroke;
import javax.swing.ListSelectionModel;
import javax.swing.ScrollPaneConstants;
import javax.swing.table.AbstractTableModel;
import javax.swing.table.TableCellEditor;
import javax.swing.table.TableCellRenderer;

/** The choices of a figure as ruled lines, typed in place. */
@SuppressWarnings("serial")
final class FigureOutline extends JScrollPane {
    private static final Texts TEXTS = new Texts("fringekeep.figure.ui.Texts", FigureOutline.class);

    private final transient FigureDraft draft;
    private final transient Runnable changed;
    private final transient Consumer<String> wrong;
    private final Model model = new Model();
    private final JTable table = new Lines(model);
    private transient List<FigureField> lines;
    private transient Set<String> faulty = Set.of();

    FigureOutline(FigureDraft draft, Runnable changed, Consumer<String> wrong) {
        this.draft = draft;
        this.changed = changed;
        this.wrong = wrong;
        this.lines = FigureField.of(draft);
        setViewportView(table);
        setBorder(BorderFactory.createEmptyBorder());
        setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        getVerticalScrollBar().setUnitIncrement(22);
        setColumnHeaderView(null);
        getViewport().setBackground(Ink.SHEET.color());
        heights();
    }

    /** Shows the draft as it is now. */
    void again() {
        int row = table.getSelectedRow();
        lines = FigureField.of(draft);
        model.fireTableDataChanged();
        heights();
        if (row >= 0 && row < lines.size()) {
            table.setRowSelectionInterval(row, row);
        }
    }

    private void heights() {
        for (int i = 0; i < lines.size(); i++) {
            table.setRowHeight(i, lines.get(i).sort() == FigureField.Sort.HEAD ? 30 : 22);
        }
    }

    /** Marks the lines that a computation found fault with. */
    void faults(Set<String> pointers) {
        faulty = Set.copyOf(pointers);
        table.repaint();
    }

    /** The line the person is at. */
    Optional<FigureField> selected() {
        int row = table.getSelectedRow();
        return row >= 0 && row < lines.size() ? Optional.of(lines.get(row)) : Optional.empty();
    }

    void focusLines() {
        if (table.getSelectedRow() < 0 && table.getRowCount() > 1) {
            table.changeSelection(1, 1, false, false);
        }
        table.requestFocusInWindow();
    }

    /** Goes to the next head of a panel or series. */
    void nextHead() {
        int from = table.getSelectedRow();
        for (int i = 1; i <= lines.size(); i++) {
            int row = Math.floorMod(from + i, lines.size());
            if (lines.get(row).head()) {
                table.changeSelection(row, 1, false, false);
                return;
            }
        }
    }

    JTable table() {
        return table;
    }

    private final class Model extends AbstractTableModel {
        @Override
        public int getRowCount() {
            return lines == null ? 0 : lines.size();
        }

        @Override
        public int getColumnCount() {
            return 2;
        }

        @Override
        public Object getValueAt(int row, int column) {
            FigureField line = lines.get(row);
            return column == 0 ? line.words() : line.value(draft);
        }

        @Override
        public boolean isCellEditable(int row, int column) {
            return column == 1 && !lines.get(row).head();
        }

        @Override
        public void setValueAt(Object value, int row, int column) {
            FigureField line = lines.get(row);
            try {
                draft.set(line.pointer(), line.typed(String.valueOf(value)));
                wrong.accept("");
                fireTableRowsUpdated(row, row);
                changed.run();
            } catch (IllegalArgumentException e) {
                wrong.accept(line.words() + ": " + e.getMessage());
            }
        }
    }

    /** Two columns, the first for words; typing begins at once. */
    private final class Lines extends JTable {
        Lines(Model model) {
            super(model);
            setName("figure lines");
            getAccessibleContext().setAccessibleName(TEXTS.of("outline"));
            setTableHeader(null);
            setShowGrid(false);
            setIntercellSpacing(new Dimension(0, 0));
            setRowHeight(22);
            setFillsViewportHeight(true);
            setBackground(Ink.SHEET.color());
            setSelectionMode(ListSelectionModel.SINGLE_SELECTION);
            setSurrendersFocusOnKeystroke(true);
            putClientProperty("terminateEditOnFocusLost", true);
            getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke("ENTER"), "type");
            getActionMap().put("type", new AbstractAction() {
                @Override
                public void actionPerformed(ActionEvent event) {
                    typeOrNext();
                }
            });
            getColumnModel().getColumn(0).setMaxWidth(190);
            getColumnModel().getColumn(0).setPreferredWidth(190);
        }

        /** Begins to type in the line; ends typing and goes to the next line that takes words. */
        private void typeOrNext() {
            int row = getSelectedRow();
            if (isEditing()) {
                getCellEditor().stopCellEditing();
                for (int next = row + 1; next < lines.size(); next++) {
                    if (!lines.get(next).head()) {
                        changeSelection(next, 1, false, false);
                        return;
                    }
                }
            } else if (row >= 0 && editCellAt(row, 1)) {
                getEditorComponent().requestFocusInWindow();
            }
        }

        @Override
        public TableCellRenderer getCellRenderer(int row, int column) {
            return (table, value, selected, focus, at, col) ->
                    new Line(lines.get(at), String.valueOf(value), selected, focus, col);
        }

        @Override
        public TableCellEditor getCellEditor(int row, int column) {
            FigureField line = lines.get(row);
            if (!line.head() && !line.options().isEmpty()) {
                JComboBox<String> box = new JComboBox<>(line.options().toArray(String[]::new));
                box.setFont(Type.BODY);
                return new DefaultCellEditor(box);
            }
            JTextField field = new JTextField();
            field.setFont(Type.MONO);
            field.setBorder(BorderFactory.createLineBorder(Ink.SELRULE.color(), 2));
            DefaultCellEditor editor = new DefaultCellEditor(field);
            editor.setClickCountToStart(1);
            return editor;
        }

        @Override
        public Component prepareEditor(TableCellEditor editor, int row, int column) {
            Component component = super.prepareEditor(editor, row, column);
            if (component instanceof JTextField field) {
                field.selectAll();
            }
            return component;
        }
    }

    private final class Line extends Painted {
        private final transient FigureField line;
        private final String value;
        private final boolean selected;
        private final boolean focus;
        private final int column;

        Line(FigureField line, String value, boolean selected, boolean focus, int column) {
            this.line = line;
            this.value = value;
            this.selected = selected;
            this.focus = focus;
            this.column = column;
            getAccessibleContext().setAccessibleName(line.words() + " " + value);
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                pen.fill((selected ? Ink.SEL : Ink.SHEET).color(), 0, 0, getWidth(), getHeight());
                double base = getHeight() - 7.0;
                boolean head = line.sort() == FigureField.Sort.HEAD;
                if (column == 0) {
                    double indent = line.sort() == FigureField.Sort.SERIES ? 12 : head ? 0 : 24;
                    pen.fitted(
                            value,
                            head ? Type.GROUP : Type.BODY,
                            line.head() ? Ink.INK : Ink.INK2,
                            indent,
                            base,
                            getWidth() - indent - 6);
                } else if (faulty.contains(line.pointer())) {
                    fringekeep.desk.look.Mark.QUESTION.paint(pen.graphics(), getWidth() - 16.0, base - 11, 12);
                    pen.fitted(value, Type.MONO, Ink.INK, 4, base, getWidth() - 24.0);
                } else if (line.head()) {
                    pen.fitted(value, Type.BODY, Ink.INK2, 4, base, getWidth() - 8.0);
                } else {
                    pen.fitted(value, Type.MONO, Ink.INK, 4, base, getWidth() - 8.0);
                }
                pen.level(head ? Ink.RULE : Ink.HAIR, 0, getWidth(), getHeight() - 1.0);
                if (focus && !line.head()) {
                    pen.focus(0, 0, getWidth(), getHeight());
                }
            }
        }
    }
}
