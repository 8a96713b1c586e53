package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;

/** A ruled table of a record; takes the width its columns need, at most what there is. */
@SuppressWarnings("serial")
final class TablePanel extends Painted {
    private static final int ROW = 22;
    private static final int HEAD = 24;
    private static final int GAP = 18;

    private final transient PageTable table;

    TablePanel(PageTable table) {
        this.table = table;
        setName("table " + table.heading());
        getAccessibleContext().setAccessibleName(table.heading());
        StringBuilder words = new StringBuilder();
        table.rows().forEach(row -> words.append(String.join(" ", row)).append("; "));
        getAccessibleContext().setAccessibleDescription(words.toString());
    }

    int height() {
        return HEAD + ROW * table.rows().size() + 14;
    }

    private double needed(int column) {
        double widest = Lettering.width(table.heads().get(column), Type.HEAD);
        for (var row : table.rows()) {
            widest = Math.max(widest, Lettering.width(row.get(column), Type.BODY));
        }
        return widest + GAP;
    }

    /** Whether it stands after the facts, or beside all. */
    boolean late() {
        return table.late();
    }

    /** Width that all columns need. */
    int neededWidth() {
        double sum = 0;
        for (int column = 0; column < table.heads().size(); column++) {
            sum += needed(column);
        }
        return (int) Math.ceil(sum);
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(neededWidth(), height());
    }

    /** Left edges of the columns and the right end; the first takes what is left over, or gives what lacks. */
    private double[] edges(int width) {
        int columns = table.heads().size();
        double[] edges = new double[columns + 1];
        double rest = width;
        for (int column = 1; column < columns; column++) {
            rest -= needed(column);
        }
        double first = Math.max(80, Math.min(rest, Math.max(needed(0), rest)));
        edges[1] = first;
        for (int column = 1; column < columns; column++) {
            edges[column + 1] = Math.min(width, edges[column] + needed(column));
        }
        return edges;
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        int width = getWidth();
        double[] edges = edges(width);
        try (Pen pen = new Pen(graphics)) {
            for (int column = 0; column < table.heads().size(); column++) {
                boolean right = table.right().get(column);
                cell(pen, table.heads().get(column), true, right, edges, column, 16);
            }
            pen.level(Ink.RULE, 0, width, HEAD - 1.0);
            double y = HEAD;
            for (var row : table.rows()) {
                for (int column = 0; column < row.size(); column++) {
                    cell(pen, row.get(column), false, table.right().get(column), edges, column, y + ROW - 7);
                }
                pen.level(Ink.HAIR, 0, width, y + ROW - 1);
                y += ROW;
            }
        }
    }

    private static void cell(
            Pen pen, String text, boolean head, boolean right, double[] edges, int column, double base) {
        var font = head ? Type.HEAD : Type.BODY;
        Ink ink = head || column > 0 ? Ink.INK : Ink.INK2;
        double from = column == 0 ? 0 : edges[column] + GAP / 2.0;
        double to = edges[column + 1] - (right ? GAP / 2.0 : 4);
        String shown = Pen.shortened(text, font, Math.max(10, to - from));
        if (right) {
            pen.textEndingAt(shown, font, ink, to, base);
        } else {
            pen.text(shown, font, ink, from, base);
        }
    }
}
