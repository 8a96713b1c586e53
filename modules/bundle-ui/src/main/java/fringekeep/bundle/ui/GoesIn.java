package fringekeep.bundle.ui;

import fringekeep.bundle.ExportBundle.KindShare;
import fringekeep.desk.chain.ChainStrip;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.session.Stops;
import fringekeep.drawing.Lettering;
import fringekeep.drawing.NumberText;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import javax.accessibility.AccessibleRole;

/** What goes into a dataset, by the columns of the strip above: records, raw files, their length, outdated ones. */
@SuppressWarnings("serial")
final class GoesIn extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", GoesIn.class);
    private static final int ROW = 28;
    private static final double MEGA = 1e6;

    private final transient Stops stops;
    private transient SortedMap<String, KindShare> shares = new TreeMap<>();
    private boolean read;

    GoesIn(Stops stops) {
        this.stops = stops;
        setName("goes in");
        getAccessibleContext().setAccessibleName(TEXTS.of("export.columns"));
    }

    /** Shows shares by kind. */
    void show(SortedMap<String, KindShare> next) {
        shares = new TreeMap<>((Map<String, KindShare>) next);
        read = true;
        StringBuilder said = new StringBuilder();
        shares.forEach((kind, share) -> said.append(share.records())
                .append(' ')
                .append(Stops.label(kind))
                .append(", "));
        getAccessibleContext().setAccessibleDescription(said.toString());
        repaint();
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.TABLE;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(1000, 4 * ROW + 6);
    }

    /** The sum over the kinds of a stop. */
    KindShare of(int stop) {
        KindShare sum = new KindShare(0, 0, 0, 0);
        for (String kind : stops.all().get(stop).kinds()) {
            sum = plus(sum, shares.getOrDefault(kind, new KindShare(0, 0, 0, 0)));
        }
        return sum;
    }

    /** The sum over all kinds, also those that stand under no stop. */
    KindShare all() {
        return shares.values().stream().reduce(new KindShare(0, 0, 0, 0), GoesIn::plus);
    }

    private static KindShare plus(KindShare a, KindShare b) {
        return new KindShare(
                a.records() + b.records(),
                a.rawFiles() + b.rawFiles(),
                a.rawBytes() + b.rawBytes(),
                a.outdated() + b.outdated());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            int count = stops.all().size();
            int[] edges = ChainStrip.columns(getWidth(), count);
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            List<String> heads = List.of("export.records", "export.raw", "export.megabytes", "export.outdated");
            for (int row = 0; row < heads.size(); row++) {
                double base = 6 + row * ROW + 18;
                pen.text(TEXTS.of(heads.get(row)), Type.BODY_MEDIUM, Ink.INK, 16, base);
                for (int stop = 0; stop < count; stop++) {
                    cell(pen, row, of(stop), edges[stop + 1] - 14, base, Type.BODY);
                }
                cell(pen, row, all(), getWidth() - 16, base, Type.GROUP);
                if (row == 0) {
                    pen.text(TEXTS.of("export.all"), Type.BODY, Ink.INK2, edges[count] + 11, base);
                }
                pen.level(row == 3 ? Ink.RULE : Ink.HAIR, 0, getWidth(), 6 + (row + 1) * ROW - 1);
            }
            uprights(pen, edges);
        }
    }

    private void uprights(Pen pen, int[] edges) {
        for (int stop = 0; stop < edges.length; stop++) {
            boolean opens = stop == 0
                    || stop == edges.length - 1
                    || stops.all().get(stop).opens();
            if (opens) {
                pen.upright(Ink.RULE, edges[stop], 0, getHeight() - 1.0);
            }
        }
    }

    private void cell(Pen pen, int row, KindShare share, double right, double base, Font font) {
        double value =
                switch (row) {
                    case 0 -> share.records();
                    case 1 -> share.rawFiles();
                    case 2 -> share.rawBytes() / MEGA;
                    default -> share.outdated();
                };
        String text = !read || value == 0
                ? "\u2013"
                : row == 2 ? NumberText.significant(value, 3) : NumberText.count((long) value);
        pen.textEndingAt(text, font, value == 0 ? Ink.INK3 : Ink.INK, right, base);
        if (row == 3 && value > 0) {
            Mark.RING.paint(pen.graphics(), right - Lettering.width(text, font) - 18, base - 10, 11);
        }
    }
}
