package fringekeep.desk.list;

import fringekeep.archive.record.Hash;
import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.list.ListContent.Line;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.LazyRecords;
import java.awt.BorderLayout;
import java.awt.Rectangle;
import java.awt.event.ActionEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;
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

/** A list: heading and filter words, then rows with hairlines. Tells which record is in hand and which are marked. */
@SuppressWarnings("serial")
public final class RecordList extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", RecordList.class);

    private final transient ListEar ear;
    private transient ListContent content = ListContent.NOTHING;
    private final Rows model = new Rows();
    private final JTable table = new JTable(model);
    private final JScrollPane scroll = new JScrollPane(table);
    private final ListHead head;
    private final ListColumns columns;
    private final BitSet marks = new BitSet();
    private transient Optional<List<Hash>> marked = Optional.empty();
    private int pageOnItsWay = -1;
    private boolean showing;

    /** A list that tells a listener what a person does. */
    public RecordList(ListEar ear) {
        super(new BorderLayout());
        this.ear = ear;
        head = new ListHead(ear::ask, this::chooseColumns);
        columns = new ListColumns(table);
        add(head, BorderLayout.NORTH);
        add(scroll, BorderLayout.CENTER);
        setOpaque(true);
        setName("list");
        table.setName("list rows");
        scroll.setBorder(BorderFactory.createEmptyBorder());
        table.setSelectionMode(ListSelectionModel.MULTIPLE_INTERVAL_SELECTION);
        table.setFillsViewportHeight(true);
        table.setRowHeight(22);
        table.setShowGrid(false);
        table.setIntercellSpacing(new java.awt.Dimension(0, 0));
        table.setAutoResizeMode(JTable.AUTO_RESIZE_OFF);
        table.setDefaultRenderer(Object.class, new RowPainter(() -> content, marks::get));
        table.getTableHeader().setReorderingAllowed(false);
        table.getTableHeader().setDefaultRenderer(new HeadPainter(() -> content));
        table.getAccessibleContext().setAccessibleName(TEXTS.of("list"));
        getAccessibleContext().setAccessibleName(TEXTS.of("list"));
        scroll.setColumnHeaderView(table.getTableHeader());
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        table.getSelectionModel().addListSelectionListener(event -> {
            marked = Optional.empty();
            if (!event.getValueIsAdjusting() && !showing) {
                selected().ifPresent(ear::select);
                ear.marked();
            }
        });
        table.getTableHeader().addMouseListener(new MouseAdapter() {
            @Override
            public void mouseClicked(MouseEvent event) {
                sortBy(table.columnAtPoint(event.getPoint()) - 1);
            }
        });
        keys();
        updateColours();
    }

    private void keys() {
        key("DOWN", () -> step(1, false));
        key("UP", () -> step(-1, false));
        key("shift DOWN", () -> step(1, true));
        key("shift UP", () -> step(-1, true));
        key("ENTER", ear::enter);
        key("SPACE", this::toggleMark);
        key("ctrl A", this::markAll);
        key("ctrl C", () -> ear.copy(content, marked()));
        for (String desks : new String[] {"ctrl LEFT", "ctrl RIGHT"}) {
            table.getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(desks), "none");
        }
        key("F3", this::chooseColumns);
        key("F4", () -> head.turn(1));
        key("shift F4", () -> head.turn(-1));
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

    private int lead() {
        int lead = table.getSelectionModel().getLeadSelectionIndex();
        return lead >= 0 && table.isRowSelected(lead) ? lead : table.getSelectedRow();
    }

    private boolean isGroup(int row) {
        return content.rows().group(row);
    }

    /** Selects the next record above or below, passing over group heads. */
    private void step(int by, boolean further) {
        int row = lead();
        do {
            row += by;
        } while (row >= 0 && row < content.rows().size() && isGroup(row));
        if (row >= 0 && row < content.rows().size()) {
            if (further) {
                table.changeSelection(row, 0, false, true);
            } else {
                table.setRowSelectionInterval(row, row);
            }
            Rectangle place = table.getCellRect(row, 0, true);
            if (row > 0 && isGroup(row - 1)) {
                place.add(table.getCellRect(row - 1, 0, true));
            }
            table.scrollRectToVisible(place);
        }
    }

    /** Marks the record in hand, or takes the mark away, and goes on to the next. */
    private void toggleMark() {
        int row = lead();
        if (row >= 0 && !isGroup(row)) {
            marks.flip(row);
            marked = Optional.empty();
            ear.marked();
            repaint();
            step(1, false);
        }
    }

    private void markAll() {
        marks.clear();
        if (!content.rows().isEmpty()) {
            marks.set(0, content.rows().size());
        }
        for (int group : content.rows().groups()) {
            marks.clear(group);
        }
        marked = Optional.empty();
        ear.marked();
        repaint();
    }

    /** Takes all marks away. */
    public boolean clearMarks() {
        boolean any = !marks.isEmpty();
        marks.clear();
        marked = Optional.empty();
        if (any) {
            ear.marked();
            repaint();
        }
        return any;
    }

    private void sortBy(int column) {
        if (column >= 0 && column < content.heads().size()) {
            String name = content.heads().get(column).column();
            content.question().ifPresent(question -> ear.ask(question.turned(name)));
        }
    }

    /** Opens the choice of columns and of the order. */
    public void chooseColumns() {
        content.question().ifPresent(question -> new ColumnChoice(ear, content, question).show(this, table));
    }

    /** Shows a list and keeps a record in hand where it is listed. */
    public void show(ListContent next, Optional<Hash> inHand) {
        boolean same = next.question().equals(content.question());
        Rectangle sight = table.getVisibleRect();
        showing = true;
        content = next;
        pageOnItsWay = -1;
        marks.clear();
        marked = Optional.empty();
        if (next.rows() instanceof PagedRows paged) {
            paged.onWanted(page -> wanted(paged, page));
        }
        head.show(next);
        model.fireTableStructureChanged();
        columns.lay(next, room());
        for (int row : next.rows().groups()) {
            table.setRowHeight(row, 28);
        }
        inHand.ifPresent(record -> mark(record, same ? Optional.of(sight) : Optional.empty()));
        showing = false;
        ear.marked();
        repaint();
    }

    /** Shows other filter words for the same rows. */
    public void words(ListContent next) {
        if (next.rows().equals(content.rows())) {
            content = next;
            head.show(next);
            revalidate();
        }
    }

    private void wanted(PagedRows rows, int page) {
        if (pageOnItsWay < 0) {
            pageOnItsWay = page;
            ear.page(rows, page);
        }
    }

    /** A page was read; empty when that failed. */
    public void arrived(PagedRows rows, int page, List<Line> lines) {
        if (rows.equals(content.rows())) {
            pageOnItsWay = -1;
            if (!lines.isEmpty()) {
                rows.arrived(page, lines);
                table.repaint();
            }
        }
    }

    private void mark(Hash record, Optional<Rectangle> sight) {
        int row = content.rows().rowOf(record);
        if (row >= 0) {
            table.setRowSelectionInterval(row, row);
            Rectangle place = table.getCellRect(row, 0, true);
            if (row > 0 && isGroup(row - 1)) {
                place.add(table.getCellRect(row - 1, 0, true));
            }
            SwingUtilities.invokeLater(() -> {
                sight.filter(seen -> seen.y > 0).ifPresent(table::scrollRectToVisible);
                table.scrollRectToVisible(place);
            });
        }
    }

    /** All selected records in the list's order: those marked, else the selected rows. */
    public List<Hash> marked() {
        if (marked.isEmpty()) {
            ListRows rows = content.rows();
            BitSet chosen = new BitSet();
            if (marks.isEmpty()) {
                IntStream.of(table.getSelectedRows())
                        .filter(row -> row < rows.size() && !isGroup(row))
                        .forEach(chosen::set);
            } else {
                chosen.or(marks);
            }
            int[] places = chosen.stream().toArray();
            marked = Optional.of(
                    new LazyRecords(places.length, i -> rows.record(places[i]).orElseThrow()));
        }
        return marked.get();
    }

    /** How many records are marked or selected; makes no list of them. */
    public int markedCount() {
        return marks.isEmpty() ? table.getSelectedRowCount() : marks.cardinality();
    }

    /** The record in hand. */
    public Optional<Hash> selected() {
        int row = lead();
        return row >= 0 && row < content.rows().size() ? content.rows().record(row) : Optional.empty();
    }

    /** The first record of the list. */
    public Optional<Hash> first() {
        for (int row = 0; row < content.rows().size(); row++) {
            Optional<Hash> record = content.rows().record(row);
            if (record.isPresent()) {
                return record;
            }
        }
        return Optional.empty();
    }

    /** What is shown. */
    public ListContent content() {
        return content;
    }

    /** Middle of the selected row in this component's coordinates; empty when nothing is selected. */
    public OptionalInt rowMiddle() {
        int row = lead();
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

    /** Width of the rows: what the scroll bar leaves. */
    private int room() {
        int width = scroll.getViewport().getWidth();
        return width > 0 ? width : getWidth();
    }

    @Override
    public void doLayout() {
        super.doLayout();
        scroll.doLayout();
        columns.lay(content, room());
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
        scroll.setBorder(BorderFactory.createEmptyBorder());
        if (scroll.getColumnHeader() != null) {
            scroll.getColumnHeader().setBackground(Ink.SHEET.color());
        }
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
                return content.question()
                        .map(question -> TEXTS.orElse("number." + question.kind(), TEXTS.of("number")))
                        .orElse(TEXTS.of("number"));
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
            if (!(line instanceof Entry entry)) {
                return "";
            }
            if (column == 0) {
                return entry.number();
            }
            return column <= entry.cells().size()
                    ? entry.cells().get(column - 1)
                    : entry.mark().map(ListContent.RowMark::word).orElse("");
        }
    }
}
