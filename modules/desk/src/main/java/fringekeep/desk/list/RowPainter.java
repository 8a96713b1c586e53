package fringekeep.desk.list;

import fringekeep.desk.list.ListContent.Entry;
import fringekeep.desk.list.ListContent.Group;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Component;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.geom.Path2D;
import java.util.function.IntPredicate;
import java.util.function.Supplier;
import javax.swing.JTable;
import javax.swing.table.TableCellRenderer;

/** Paints cells of a list: hairline, text, shape and lozenge. Group heads run over all columns. */
@SuppressWarnings("serial")
final class RowPainter extends Painted implements TableCellRenderer {
    private final transient Supplier<ListContent> content;
    private final transient IntPredicate marks;
    private boolean marked;
    private transient ListContent.Line line = new Group("", "");
    private int column;
    private boolean selected;
    private boolean focused;
    private int left;
    private int whole;

    RowPainter(Supplier<ListContent> content, IntPredicate marks) {
        this.content = content;
        this.marks = marks;
    }

    @Override
    public Component getTableCellRendererComponent(
            JTable table, Object value, boolean isSelected, boolean hasFocus, int row, int at) {
        line = content.get().rows().get(row);
        column = at;
        marked = marks.test(row);
        selected = isSelected;
        focused = hasFocus;
        left = table.getCellRect(row, at, true).x;
        whole = table.getWidth();
        return this;
    }

    @Override
    public void paint(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            int width = getWidth();
            int height = getHeight();
            pen.fill(Ink.SHEET.color(), 0, 0, width, height);
            if (selected || marked) {
                pen.fill(Ink.SEL.color(), Math.max(0, 16 - left), 0, width, height);
            }
            if (line instanceof Group group) {
                pen.text(group.text(), Type.GROUP, Ink.INK, 22.0 - left, height - 8.0);
                double end = whole - 5.0 - left;
                double at = end - Lettering.width(group.right(), Type.SMALL);
                if (at > 30.0 - left + Lettering.width(group.text(), Type.GROUP)) {
                    pen.text(group.right(), Type.SMALL, Ink.INK2, at, height - 8.0);
                }
                pen.level(Ink.RULE, Math.max(0, 16 - left), end(width), height - 1.0);
                return;
            }
            if (line instanceof Entry entry) {
                entry(pen, entry, width, height);
            } else if (column == 0) {
                pen.text("\u2026", Type.BODY, Ink.INK3, 22, height - 7.0);
            }
            pen.level(Ink.HAIR, Math.max(0, 16 - left), end(width), height - 1.0);
        }
    }

    private double end(int width) {
        return Math.min(width, whole - 0.0 - left);
    }

    private void entry(Pen pen, Entry entry, int width, int height) {
        double base = height - 7.0;
        if (column == 0) {
            Font font = selected ? Type.BODY_MEDIUM : Type.BODY;
            Ink ink = entry.struck() ? Ink.INK3 : Ink.INK;
            pen.fitted(entry.number(), font, ink, 22, base, width - 22.0);
            if (entry.struck()) {
                pen.strike(entry.number(), font, ink, 22, base);
            }
            if (focused) {
                pen.fill(Ink.SELRULE.color(), 16, 0, 2, height);
            }
            if (marked) {
                pen.fill(Ink.INK.color(), 8, height / 2.0 - 3.5, 6, 6);
            }
        } else if (column <= entry.cells().size()) {
            cell(pen, entry, width, height, base);
        } else {
            entry.mark().ifPresent(mark -> {
                mark.mark().paint(pen.graphics(), 4, height / 2.0 - 6.5, 12);
                pen.fitted(mark.word(), Type.SMALL, Ink.INK, 20, base, width - 20.0);
            });
        }
    }

    private void cell(Pen pen, Entry entry, int width, int height, double base) {
        ListContent.Plot plot =
                content.get().plot().filter(one -> one.column() == column - 1).orElse(null);
        int room = plot == null ? width : width - ListColumns.PLOT;
        if (room < 24) {
            return;
        }
        String text = entry.cells().get(column - 1);
        Ink ink = entry.struck() ? Ink.INK3 : column == 1 ? Ink.INK2 : Ink.INK;
        String shown = Pen.shortened(text, Type.BODY, room - 9.0);
        boolean right = content.get().heads().get(column - 1).right();
        double x = right ? room - 5 - Lettering.width(shown, Type.BODY) : 5;
        pen.text(shown, Type.BODY, ink, x, base);
        if (entry.struck() && right) {
            pen.strike(shown, Type.BODY, ink, x, base);
        }
        if (plot != null) {
            lozenge(pen, entry, plot, room, width, height);
        }
    }

    private static void lozenge(Pen pen, Entry entry, ListContent.Plot plot, double from, double to, int height) {
        double first = from + 8;
        double length = to - from - 20;
        for (double at = 0; at <= plot.to() + plot.step() / 2; at += plot.step()) {
            pen.upright(Ink.HAIR, first + at / plot.to() * length, 0, height);
        }
        if (!Double.isFinite(entry.value())) {
            return;
        }
        double x = first + Math.max(0, Math.min(1, entry.value() / plot.to())) * length;
        double half = Double.isFinite(entry.deviation()) ? entry.deviation() / plot.to() * length : 0;
        double wide = Math.max(3, Math.min(half, length / 4));
        double y = height / 2.0 - 0.5;
        if (entry.struck()) {
            Mark.SLASH.paint(pen.graphics(), x - 6, y - 6, 12);
            return;
        }
        Path2D path = new Path2D.Double();
        path.moveTo(x - wide, y);
        path.lineTo(x, y - 3.5);
        path.lineTo(x + wide, y);
        path.lineTo(x, y + 3.5);
        path.closePath();
        pen.graphics().setColor(Ink.INK.color());
        pen.graphics().fill(path);
    }
}
