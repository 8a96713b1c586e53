package fringekeep.desk.list;

import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.list.ListContent.Line;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import java.awt.BorderLayout;
import java.awt.Rectangle;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTable;
import javax.swing.KeyStroke;
import javax.swing.ListSelectionModel;
import javax.swing.ScrollPaneConstants;
import javax.swing.SwingUtilities;
import javax.swing.table.AbstractTableModel;

/** A list: heading and filter words, then rows with hairlines. Tells which record is in hand. */
@SuppressWarnings("serial")
public final class RecordList extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", RecordList.class);

    private transient ListContent content = ListContent.NOTHING;
    private final Rows model = new Rows();
    private final JTable table = new JTable(model);
    private final JScrollPane scroll = new JScrollPane(table);
    private final ListHead head;
    private final ListColumns columns;
    private boolean showing;

    /**
     * A list.
     *
     * @param select told which record is in hand
     * @param enter told that a person goes into it
     * @param ask told which list is wanted
     */
    public RecordList(Consumer<Hash> select, Runnable enter, Consumer<Question> ask) {
        super(new BorderLayout());
        head = new ListHead(ask);
        columns = new ListColumns(table);
        add(head, BorderLayout.NORTH);
        add(scroll, BorderLayout.CENTER);
        setOpaque(true);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        table.setSelectionMode(ListSelectionModel.SINGLE_SELECTION);
        table.setFillsViewportHeight(true);
        table.setRowHeight(22);
        table.setShowGrid(false);
        table.setIntercellSpacing(new java.awt.Dimension(0, 0));
        table.setAutoResizeMode(JTable.AUTO_RESIZE_OFF);
        table.setDefaultRenderer(Object.class, new RowPainter(() -> content));
        table.getTableHeader().setReorderingAllowed(false);
        table.getTableHeader().setDefaultRenderer(new HeadPainter(() -> content));
        table.getAccessibleContext().setAccessibleName(TEXTS.of("list"));
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        table.getSelectionModel().addListSelectionListener(event -> {
            if (!event.getValueIsAdjusting() && !showing) {
                selected().ifPresent(select);
            }
        });
        scroll.getVerticalScrollBar().addAdjustmentListener(event -> {
            boolean end = event.getValue() + scroll.getViewport().getHeight() >= table.getHeight() - 44;
            if (end && content.more() && !event.getValueIsAdjusting()) {
                head.askMore();
            }
        });
        keys(enter);
        updateColours();
    }

    private void keys(Runnable enter) {
        key("DOWN", () -> step(1));
        key("UP", () -> step(-1));
        key("ENTER", enter);
    }

    private void key(String stroke, Runnable work) {
        table.getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), "list " + stroke);
        table.getActionMap().put("list " + stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    /** Selects the next record above or below, passing over group heads. */
    private void step(int by) {
        int row = table.getSelectedRow();
        do {
            row += by;
        } while (row >= 0 && row < content.rows().size() && content.rows().get(row) instanceof Group);
        if (row >= 0 && row < content.rows().size()) {
            table.setRowSelectionInterval(row, row);
            table.scrollRectToVisible(table.getCellRect(row, 0, true));
        }
    }

    /** Shows a list and keeps a record in hand where it is listed. */
    public void show(ListContent next, Optional<Hash> inHand) {
        showing = true;
        content = next;
        head.show(next);
        model.fireTableStructureChanged();
        columns.lay(next, getWidth());
        for (int row = 0; row < next.rows().size(); row++) {
            table.setRowHeight(row, next.rows().get(row) instanceof Group ? 28 : 22);
        }
        inHand.ifPresent(this::mark);
        showing = false;
        repaint();
    }

    private void mark(Hash record) {
        for (int row = 0; row < content.rows().size(); row++) {
            if (content.rows().get(row) instanceof Entry entry && entry.record().equals(record)) {
                table.setRowSelectionInterval(row, row);
                Rectangle place = table.getCellRect(row, 0, true);
                SwingUtilities.invokeLater(() -> table.scrollRectToVisible(place));
                return;
            }
        }
    }

    /** All selected records in the list's order; the one in hand among them. */
    public List<Hash> marked() {
        List<Hash> marked = new ArrayList<>();
        for (int row : table.getSelectedRows()) {
            if (row < content.rows().size() && content.rows().get(row) instanceof Entry entry) {
                marked.add(entry.record());
            }
        }
        return marked;
    }

    /** The record in hand. */
    public Optional<Hash> selected() {
        int row = table.getSelectedRow();
        return row >= 0 && row < content.rows().size() && content.rows().get(row) instanceof Entry entry
                ? Optional.of(entry.record())
                : Optional.empty();
    }

    /** The first record of the list. */
    public Optional<Hash> first() {
        return content.rows().stream()
                .filter(Entry.class::isInstance)
                .map(row -> ((Entry) row).record())
                .findFirst();
    }

    /** Middle of the selected row in this component's coordinates; empty when nothing is selected. */
    public OptionalInt rowMiddle() {
        int row = table.getSelectedRow();
        if (row < 0) {
            return OptionalInt.empty();
        }
        Rectangle cell = table.getCellRect(row, 0, true);
        return OptionalInt.of(SwingUtilities.convertPoint(table, 0, (int) cell.getCenterY(), this).y);
    }

    /** Upper edge of the rows, in this component's coordinates. */
    public int rowsTop() {
        return scroll.getY() + scroll.getViewport().getY();
    }

    /** Called when rows are scrolled. */
    public void onScroll(Runnable listener) {
        scroll.getViewport().addChangeListener(event -> listener.run());
    }

    /** Gives the focus to the rows. */
    public void focusRows() {
        table.requestFocusInWindow();
    }

    /** The table of rows. */
    public JTable table() {
        return table;
    }

    @Override
    public void doLayout() {
        super.doLayout();
        columns.lay(content, getWidth());
    }

    @Override
    public void updateUI() {
        super.updateUI();
        if (head != null) {
            updateColours();
        }
    }

    private void updateColours() {
        setBackground(Ink.SHEET.color());
        table.setBackground(Ink.SHEET.color());
        scroll.getViewport().setBackground(Ink.SHEET.color());
        table.getTableHeader().setBackground(Ink.SHEET.color());
        table.getTableHeader().setDefaultRenderer(new HeadPainter(() -> content));
        table.setShowGrid(false);
    }

    private final class Rows extends AbstractTableModel {
        @Override
        public int getRowCount() {
            return content.rows().size();
        }

        @Override
        public int getColumnCount() {
            return content.heads().size() + 2;
        }

        @Override
        public String getColumnName(int column) {
            if (column == 0) {
                return TEXTS.of("number");
            }
            return column <= content.heads().size()
                    ? content.heads().get(column - 1).text()
                    : TEXTS.of("mark");
        }

        @Override
        public Object getValueAt(int row, int column) {
            Line line = content.rows().get(row);
            if (line instanceof Group group) {
                return column == 0 ? group.text() : "";
            }
            Entry entry = (Entry) line;
            if (column == 0) {
                return entry.number();
            }
            return column <= entry.cells().size()
                    ? entry.cells().get(column - 1)
                    : entry.state().map(fringekeep.desk.session.States::word).orElse("");
        }
    }
}
