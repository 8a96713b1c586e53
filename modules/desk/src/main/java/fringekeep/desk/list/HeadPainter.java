package fringekeep.desk.list;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import fringekeep.drawing.NumberText;
import java.awt.Component;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.function.Supplier;
import javax.swing.JTable;
import javax.swing.table.TableCellRenderer;

/** Paints heads of columns, and the scale of the plot column. */
@SuppressWarnings("serial")
final class HeadPainter extends Painted implements TableCellRenderer {
    private final transient Supplier<ListContent> content;
    private String text = "";
    private int column;

    HeadPainter(Supplier<ListContent> content) {
        this.content = content;
    }

    @Override
    public Component getTableCellRendererComponent(
            JTable table, Object value, boolean isSelected, boolean hasFocus, int row, int at) {
        text = String.valueOf(value);
        column = at;
        return this;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(60, 24);
    }

    @Override
    public void paint(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            int width = getWidth();
            pen.fill(Ink.SHEET.color(), 0, 0, width, getHeight());
            pen.level(Ink.RULE, column == 0 ? 16 : 0, width, getHeight() - 1.0);
            ListContent now = content.get();
            boolean last = column > now.heads().size();
            ListContent.Plot plot =
                    now.plot().filter(one -> one.column() == column - 1).orElse(null);
            int room = plot == null ? width : width - ListColumns.PLOT;
            if (room < 24 || last) {
                return;
            }
            boolean right = column > 0 && now.heads().get(column - 1).right();
            String shown = Pen.shortened(text, Type.HEAD, room - 10.0);
            double x = right ? room - 6 - Lettering.width(shown, Type.HEAD) : column == 0 ? 22 : 6;
            pen.text(shown, Type.HEAD, Ink.INK, x, 16);
            if (plot != null) {
                scale(pen, plot, room, width);
            }
        }
    }

    private static void scale(Pen pen, ListContent.Plot plot, double from, double to) {
        double first = from + 8;
        double length = to - from - 20;
        double free = first - 6;
        for (double at = 0; at <= plot.to() + plot.step() / 2; at += plot.step()) {
            String label = NumberText.significant(Math.rint(at / plot.step() * 1e6) / 1e6 * plot.step(), 3);
            double width = Lettering.width(label, Type.SMALL);
            double x = first + at / plot.to() * length - width / 2;
            if (x > free) {
                pen.text(label, Type.SMALL, Ink.INK2, x, 16);
                free = x + width + 4;
            }
        }
    }
}
