package fringekeep.desk.part;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import java.awt.BorderLayout;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Consumer;
import javax.swing.BorderFactory;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.ScrollPaneConstants;

/**
 * What was kept beside what comes out now: four equal columns with a count and a word, then rows grouped by kind, gathered where
 * they are alike.
 */
@SuppressWarnings("serial")
public final class VerdictTable extends JPanel {
    private final VerdictCounts counts = new VerdictCounts();
    private final VerdictRows rows;
    private final JScrollPane scroll;

    /**
     * One of the four columns.
     *
     * @param mark its shape
     * @param rule colour of the rule above
     * @param count how many
     * @param words what they are
     */
    public record Count(Mark mark, Ink rule, long count, String words) {}

    /**
     * A row.
     *
     * @param record number or numbers
     * @param what which value, with its unit
     * @param kept what was kept
     * @param now what comes out
     * @param change how far apart
     * @param mark shape of the verdict
     * @param verdict its words
     * @param records what the row stands for
     */
    public record Line(
            String record,
            String what,
            String kept,
            String now,
            String change,
            Mark mark,
            String verdict,
            List<Hash> records) {
        /** Copies. */
        public Line {
            records = List.copyOf(records);
        }
    }

    /** Rows under one head. */
    public record Group(String head, List<Line> lines) {
        /** Copies. */
        public Group {
            lines = List.copyOf(lines);
        }
    }

    /**
     * An empty table.
     *
     * @param heads words over the six columns: record, what, kept, now, change, verdict
     * @param selected told which row is selected
     * @param enter told that a person goes into a row
     */
    public VerdictTable(List<String> heads, Consumer<Line> selected, Consumer<Line> enter) {
        super(new BorderLayout());
        rows = new VerdictRows(heads, selected, enter);
        scroll = new JScrollPane(rows);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        scroll.getVerticalScrollBar().setUnitIncrement(22);
        scroll.setColumnHeaderView(rows.head());
        setOpaque(false);
        scroll.setOpaque(false);
        scroll.getViewport().setOpaque(false);
        scroll.getColumnHeader().setOpaque(false);
        add(scroll, BorderLayout.CENTER);
    }

    /** The four columns, for the sheet to put where it has room. */
    public VerdictCounts countsLine() {
        return counts;
    }

    /** Shows a comparison; selects its first row that is not the same, or the first. */
    public void show(List<Count> columns, List<Group> groups) {
        counts.show(columns);
        rows.show(groups);
        scroll.getVerticalScrollBar().setValue(0);
    }

    /** The selected row. */
    public Optional<Line> selected() {
        return rows.selected();
    }

    /** Middle of the selected row in this table's coordinates, while it is in sight. */
    public OptionalInt rowMiddle() {
        return rows.selectedMiddle().isEmpty()
                ? OptionalInt.empty()
                : OptionalInt.of(
                        rows.selectedMiddle().getAsInt() + javax.swing.SwingUtilities.convertPoint(rows, 0, 0, this).y);
    }

    /** Called when rows are scrolled. */
    public void onScroll(Runnable listener) {
        scroll.getViewport().addChangeListener(event -> listener.run());
    }

    /** Gives the focus to the rows. */
    public void focusRows() {
        rows.requestFocusInWindow();
    }

    /** All rows as a table that a spreadsheet takes. */
    public String asTable() {
        List<String> lines = new ArrayList<>();
        lines.add(String.join("\t", rows.heads()));
        for (Group group : rows.groups()) {
            for (Line line : group.lines()) {
                lines.add(String.join(
                        "\t",
                        group.head() + ": " + line.record(),
                        line.what(),
                        line.kept(),
                        line.now(),
                        line.change(),
                        line.verdict()));
            }
        }
        return String.join("\n", lines) + "\n";
    }
}
