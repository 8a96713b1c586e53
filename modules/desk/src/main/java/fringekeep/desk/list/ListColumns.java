package fringekeep.desk.list;

import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import javax.swing.JTable;
import javax.swing.table.TableColumn;
import javax.swing.table.TableColumnModel;

/** Gives columns the width their texts need; those that have no room are narrowed to nothing from the right. */
final class ListColumns {
    /** Width of the plot column at most. */
    static final int PLOT = 88;

    private static final int MARK = 80;
    private static final int SAMPLE = 300;

    private final JTable table;

    ListColumns(JTable table) {
        this.table = table;
    }

    void lay(ListContent content, int width) {
        TableColumnModel columns = table.getColumnModel();
        int count = columns.getColumnCount();
        if (count != content.heads().size() + 2 || width <= 0) {
            return;
        }
        boolean marks = content.marks();
        int free = width - (marks ? MARK : 0);
        int plot = content.plot().map(ListContent.Plot::column).orElse(-1);
        int reserved = plot < 0 ? 0 : needed(content, plot + 1) + PLOT;
        free -= reserved;
        for (int i = 0; i <= content.heads().size(); i++) {
            boolean plotted = plot >= 0 && i == plot + 1;
            int needed = plotted ? reserved : needed(content, i);
            int given =
                    plotted ? reserved : needed <= free ? needed : free >= 60 && i > 0 && !right(content, i) ? free : 0;
            free = !plotted && given == 0 ? 0 : free - (plotted ? 0 : given);
            set(columns.getColumn(i), given);
        }
        int taken = 0;
        for (int i = 0; i < count - 1; i++) {
            taken += columns.getColumn(i).getWidth();
        }
        int last = Math.max(0, width - taken);
        set(columns.getColumn(count - 1), last);
    }

    private static boolean right(ListContent content, int column) {
        return content.heads().get(column - 1).right();
    }

    private int needed(ListContent content, int column) {
        double widest = Math.min(104, Lettering.width(table.getModel().getColumnName(column), Type.HEAD));
        int seen = 0;
        for (ListContent.Line line : content.rows().sample()) {
            if (line instanceof Entry entry && seen++ < SAMPLE) {
                String text = column == 0 ? entry.number() : entry.cells().get(column - 1);
                widest = Math.max(widest, Lettering.width(text, column == 0 ? Type.BODY_MEDIUM : Type.BODY));
            }
        }
        return (int) Math.ceil(Math.min(widest, 190)) + 13 + (column == 0 ? 20 : 0);
    }

    private static void set(TableColumn column, int width) {
        column.setMinWidth(0);
        column.setMaxWidth(Integer.MAX_VALUE);
        column.setPreferredWidth(width);
        column.setWidth(width);
    }
}
