package fringekeep.desk.lineage;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.desk.lineage.Sheet.Item;
import fringekeep.desk.lineage.SheetRows.Gathered;
import fringekeep.desk.lineage.SheetRows.Heading;
import fringekeep.desk.lineage.SheetRows.Single;
import fringekeep.desk.lineage.SheetRows.Visible;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.session.States;
import fringekeep.drawing.NumberText;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import javax.swing.Scrollable;

/** The rows of the ruled sheet, painted: columns of the strip, hairlines, weights as bars. Paints only what is in sight. */
@SuppressWarnings("serial")
final class SheetGrid extends Painted implements Scrollable {
    /** Height of a row. */
    static final int ROW = 23;

    private static final Texts TEXTS = new Texts("fringekeep.desk.lineage.Texts", SheetGrid.class);

    private final transient Supplier<int[]> edges;
    private final transient List<String> words;
    private transient Optional<SheetRows> rows = Optional.empty();
    private transient Set<Hash> thread = Set.of();
    private double most = 1;

    SheetGrid(Supplier<int[]> edges, List<String> words) {
        this.edges = edges;
        this.words = List.copyOf(words);
        setFocusable(true);
        setOpaque(true);
        getAccessibleContext().setAccessibleName(TEXTS.of("sheet"));
    }

    void show(SheetRows next) {
        rows = Optional.of(next);
        changed();
    }

    /** After a step: new thread, new place in sight. */
    void changed() {
        rows.ifPresent(now -> {
            thread = now.thread();
            most = Math.max(
                    1, now.rows().stream().mapToDouble(SheetGrid::counts).max().orElse(1));
            now.selected().ifPresent(record -> {
                int at = now.rowOf(record);
                scrollRectToVisible(new Rectangle(0, at * ROW - ROW, 10, 3 * ROW));
                getAccessibleContext().setAccessibleDescription(words(now, record));
            });
        });
        revalidate();
        repaint();
    }

    private static String words(SheetRows now, Hash record) {
        return now.item(record)
                .map(item -> item.number() + " " + item.title()
                        + item.state().map(state -> ", " + States.word(state)).orElse(""))
                .orElse("");
    }

    private static double counts(Visible visible) {
        if (visible instanceof Gathered gathered) {
            return gathered.counts();
        }
        return visible instanceof Single single
                ? single.row().items().stream().mapToDouble(Item::counts).sum()
                : 0;
    }

    /** The row and column at a point. */
    Optional<Item> itemAt(int x, int y) {
        List<Visible> all = rows.map(SheetRows::rows).orElse(List.of());
        int at = y / ROW;
        if (at < 0 || at >= all.size() || !(all.get(at) instanceof Single single)) {
            return Optional.empty();
        }
        int column = column(x);
        return single.row().items().stream()
                .filter(item -> item.column() == column)
                .findFirst()
                .or(() -> single.row().items().stream().findFirst());
    }

    /** The gathered row at a point. */
    Optional<Gathered> gatheredAt(int y) {
        List<Visible> all = rows.map(SheetRows::rows).orElse(List.of());
        int at = y / ROW;
        return at >= 0 && at < all.size() && all.get(at) instanceof Gathered gathered
                ? Optional.of(gathered)
                : Optional.empty();
    }

    private int column(int x) {
        int[] places = edges.get();
        for (int i = 0; i + 1 < places.length; i++) {
            if (x >= places[i] && x < places[i + 1]) {
                return i;
            }
        }
        return -1;
    }

    @Override
    public Dimension getPreferredSize() {
        int count = rows.map(now -> now.rows().size()).orElse(0);
        return new Dimension(400, count * ROW);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        Rectangle clip = graphics.getClipBounds();
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), clip.x, clip.y, clip.width, clip.height);
            int[] places = edges.get();
            List<Visible> all = rows.map(SheetRows::rows).orElse(List.of());
            int first = Math.max(0, clip.y / ROW);
            int last = Math.min(all.size() - 1, (clip.y + clip.height) / ROW);
            for (int i = first; i <= last; i++) {
                row(pen, all.get(i), i * ROW, places);
            }
            for (int i = 0; i < places.length - 1; i++) {
                boolean group = i == 0 || i == 2 || i == 4 || i >= 6;
                if (group) {
                    pen.upright(Ink.RULE, places[i], clip.y, clip.y + (double) clip.height);
                }
            }
            if (isFocusOwner()) {
                pen.fill(Ink.SELRULE.color(), 0, clip.y, 2, clip.height);
            }
        }
    }

    private void row(Pen pen, Visible visible, int y, int[] places) {
        double foot = y + ROW - 1.0;
        if (visible instanceof Heading heading) {
            pen.text(heading.text(), Type.GROUP, Ink.INK, 16, y + 16);
            pen.level(Ink.RULE, 0, getWidth(), foot);
            return;
        }
        if (visible instanceof Gathered gathered) {
            gathered(pen, gathered, y, places);
        } else if (visible instanceof Single single) {
            single(pen, single, y, places);
        }
        pen.level(Ink.HAIR, 0, getWidth(), foot);
    }

    private void gathered(Pen pen, Gathered gathered, int y, int[] places) {
        boolean chosen = rows.flatMap(SheetRows::gatheredSelection)
                .filter(one -> one.key().equals(gathered.key()))
                .isPresent();
        if (chosen) {
            pen.fill(Ink.SEL.color(), 0, y, getWidth(), ROW);
        }
        double base = y + 16.0;
        pen.fitted(gathered.time(), Type.BODY, Ink.INK2, 16, base, places[0] - 20.0);
        int taken = gathered.rows().get(0).items().get(0).column();
        words(pen, gathered.words() + ", " + amount(gathered.counts()), base, places, taken);
        for (int column = 0; column + 1 < places.length; column++) {
            long count = gathered.count(column);
            if (count > 0) {
                pen.fitted(
                        TEXTS.of("gathered", count, words.get(column)),
                        Type.BODY,
                        Ink.INK,
                        places[column] + 10.0,
                        base,
                        places[column + 1] - places[column] - 30.0);
                pen.textEndingAt("+", Type.BODY, Ink.INK2, places[column + 1] - 8.0, base);
            }
        }
        bar(pen, gathered.counts(), places[taken], places[taken + 1], y);
    }

    private void bar(Pen pen, double counts, int from, int to, int y) {
        if (counts > 0) {
            double length = Math.max(2, counts / most * (to - from - 20.0));
            pen.fill(Ink.RULE.color(), from + 10.0, y + ROW - 4.0, length, 3);
        }
    }

    private void words(Pen pen, String text, double base, int[] places, int until) {
        int first = until == 0 ? 1 : 0;
        if (first < until || until == 0) {
            double end = until == 0 ? places[places.length - 1] : places[until];
            pen.fitted(text, Type.SMALL, Ink.INK2, places[first] + 10.0, base - 0.5, end - places[first] - 16.0);
        }
    }

    private static String amount(double counts) {
        return counts >= 1e5
                ? TEXTS.of("thousand", NumberText.count(Math.round(counts / 1000)))
                : TEXTS.of("counts", NumberText.count(Math.round(counts)));
    }

    private void single(Pen pen, Single single, int y, int[] places) {
        Optional<Hash> hand = rows.flatMap(SheetRows::selected);
        boolean chosen = single.row().items().stream().anyMatch(item -> hand.equals(Optional.of(item.record())));
        if (chosen) {
            pen.fill(Ink.SEL.color(), 0, y, getWidth(), ROW);
        }
        double base = y + 16.0;
        pen.fitted(single.row().time(), Type.BODY, Ink.INK2, 16, base, places[0] - 20.0);
        Item first = single.row().items().get(0);
        String text = first.counts() > 0
                ? single.row().words() + ", " + amount(first.counts())
                : single.row().words();
        words(pen, text, base, places, first.column());
        for (Item item : single.row().items()) {
            item(pen, item, y, places, hand.equals(Optional.of(item.record())));
        }
    }

    private void item(Pen pen, Item item, int y, int[] places, boolean inHand) {
        int from = places[item.column()];
        int to = places[item.column() + 1];
        boolean onThread = thread.contains(item.record());
        boolean struck = item.state().filter(StateName.WITHDRAWN::equals).isPresent();
        Font font = onThread && !struck ? Type.GROUP : Type.BODY;
        Ink ink = struck ? Ink.INK3 : Ink.INK;
        bar(pen, item.counts(), from, to, y);
        String shown = Pen.shortened(item.number(), font, to - from - 32.0);
        double end = pen.text(shown, font, ink, from + 10.0, y + 16.0);
        if (struck) {
            pen.strike(shown, font, ink, from + 10.0, y + 16.0);
        }
        item.state().ifPresent(state -> States.mark(state).paint(pen.graphics(), end + 8, y + 5.5, 12));
        if (onThread && !struck) {
            pen.fill(Ink.STRONG.color(), from, y + ROW - 2.0, to - from - 1.0, 2);
        }
        if (inHand) {
            pen.focus(from + 2.0, y + 1.0, to - from - 4.0, ROW - 3.0);
        }
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return ROW;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(ROW, visible.height - 2 * ROW);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > getPreferredSize().height;
    }
}
