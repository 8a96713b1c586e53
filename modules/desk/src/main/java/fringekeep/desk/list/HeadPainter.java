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
import java.awt.geom.Path2D;
import java.util.Optional;
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
            Optional<Question.Sort> sort = column == 0
                    ? Optional.empty()
                    : now.question()
                            .flatMap(Question::sort)
                            .filter(by -> by.column()
                                    .equals(now.heads().get(column - 1).column()));
            int arrow = sort.isPresent() ? 9 : 0;
            String shown = Pen.shortened(text, Type.HEAD, room - 9.0 - arrow);
            double x = right ? room - 5 - arrow - Lettering.width(shown, Type.HEAD) : column == 0 ? 22 : 5;
            double end = pen.text(shown, Type.HEAD, Ink.INK, x, 16);
            sort.ifPresent(by -> arrow(pen, end + 3, by.descending()));
            if (plot != null) {
                scale(pen, plot, room, width);
            }
        }
    }

    /** A small triangle: larger values further down, or further up. */
    private static void arrow(Pen pen, double x, boolean descending) {
        Path2D path = new Path2D.Double();
        path.moveTo(x, descending ? 9 : 15);
        path.lineTo(x + 6, descending ? 9 : 15);
        path.lineTo(x + 3, descending ? 15 : 9);
        path.closePath();
        pen.graphics().setColor(Ink.INK.color());
        pen.graphics().fill(path);
    }

    private static void scale(Pen pen, ListContent.Plot plot, double from, double to) {
        double first = from + 8;
        double length = to - from - 20;
        double widest = Lettering.width(label(plot, plot.to()), Type.SMALL) + 6;
        double every = Math.max(1, Math.ceil(widest / (plot.step() / plot.to() * length)));
        for (double k = 0; k * plot.step() <= plot.to() + plot.step() / 2; k += every) {
            String label = label(plot, k * plot.step());
            double x = first + k * plot.step() / plot.to() * length;
            pen.text(label, Type.SMALL, Ink.INK2, x - Lettering.width(label, Type.SMALL) / 2, 16);
        }
    }

    private static String label(ListContent.Plot plot, double at) {
        return NumberText.significant(Math.rint(at / plot.step()) * plot.step(), 3);
    }
}
