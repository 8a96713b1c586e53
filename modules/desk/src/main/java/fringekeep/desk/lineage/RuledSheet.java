package fringekeep.desk.lineage;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.session.States.Sentence;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Supplier;
import javax.swing.AbstractAction;
import javax.swing.BorderFactory;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;
import javax.swing.ScrollPaneConstants;

/** The lineage sheet: what a record rests on, row by row, to its raw counts. */
@SuppressWarnings("serial")
public final class RuledSheet extends Painted {
    private static final int HEAD = 58;

    private final SheetGrid grid;
    private final JScrollPane scroll;
    private final RawSide side = new RawSide();
    private final transient Supplier<int[]> edges;
    private final transient Consumer<Hash> select;
    private transient Optional<SheetRows> rows = Optional.empty();

    /**
     * A sheet.
     *
     * @param edges columns of the strip above
     * @param words what several records of each stop are called
     * @param select told which record is in hand
     * @param open told which record is to be opened
     * @param back told that a person goes back
     */
    public RuledSheet(
            Supplier<int[]> edges, List<String> words, Consumer<Hash> select, Consumer<Hash> open, Runnable back) {
        this.edges = edges;
        this.select = select;
        this.grid = new SheetGrid(edges, words);
        this.scroll = new JScrollPane(grid);
        setOpaque(true);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        scroll.setHorizontalScrollBarPolicy(ScrollPaneConstants.HORIZONTAL_SCROLLBAR_NEVER);
        add(scroll);
        add(side);
        key("LEFT", this::left);
        key("RIGHT", this::right);
        key("UP", () -> moved(() -> rows.ifPresent(now -> now.step(-1))));
        key("DOWN", () -> moved(() -> rows.ifPresent(now -> now.step(1))));
        key("ENTER", () -> rows.flatMap(SheetRows::selected).ifPresent(open));
        key("BACK_SPACE", back);
        key("ESCAPE", back);
        grid.addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                pressed(event, open);
            }
        });
    }

    private void key(String stroke, Runnable work) {
        grid.getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        grid.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void pressed(MouseEvent event, Consumer<Hash> open) {
        grid.requestFocusInWindow();
        grid.gatheredAt(event.getY()).ifPresent(gathered -> moved(() -> rows.ifPresent(now -> now.open(gathered))));
        grid.itemAt(event.getX(), event.getY()).ifPresent(item -> {
            moved(() -> rows.ifPresent(now -> now.select(item.record())));
            if (event.getClickCount() == 2) {
                open.accept(item.record());
            }
        });
    }

    /** Goes to what the record in hand was made from; closes an opened row where there is nothing. */
    public void left() {
        moved(() -> rows.ifPresent(now -> {
            if (!now.along(true)) {
                now.close();
            }
        }));
    }

    /** Opens a gathered row, or goes to what was made from the record in hand. */
    public void right() {
        moved(() -> rows.ifPresent(now -> now.gatheredSelection().ifPresentOrElse(now::open, () -> now.along(false))));
    }

    private void moved(Runnable step) {
        step.run();
        grid.changed();
        rows.flatMap(SheetRows::selected).ifPresent(select);
        repaint();
    }

    /** Shows a lineage. */
    public void show(Sheet sheet) {
        SheetRows next = new SheetRows(sheet);
        rows = Optional.of(next);
        grid.show(next);
        revalidate();
        repaint();
    }

    /** Shows raw counts at the side. */
    public void showRaw(Optional<RawCounts> raw) {
        side.show(raw);
    }

    /** The raw counts at the side. */
    public Optional<RawCounts> raw() {
        return side.shown();
    }

    /** The record in hand. */
    public Optional<Hash> selected() {
        return rows.flatMap(SheetRows::selected);
    }

    /** Gives the focus to the rows. */
    public void focusRows() {
        grid.requestFocusInWindow();
    }

    @Override
    public void doLayout() {
        int[] places = edges.get();
        int right = places[places.length - 1];
        scroll.setBounds(0, HEAD, right, Math.max(10, getHeight() - HEAD));
        side.setBounds(right, 0, getWidth() - right, getHeight());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            if (rows.isEmpty()) {
                return;
            }
            Sheet sheet = rows.get().sheet();
            double x = pen.text(sheet.label() + " " + sheet.summary(), Type.GROUP, Ink.INK, 16, 23);
            pen.text(" " + sheet.where(), Type.BODY, Ink.INK, x, 23);
            double y = 43;
            for (Sentence state :
                    sheet.states().subList(0, Math.min(1, sheet.states().size()))) {
                state.mark().paint(pen.graphics(), 16, y - 10, 12);
                pen.fitted(state.text(), Type.BODY, Ink.INK, 33, y, scroll.getWidth() - 50.0);
            }
            pen.level(Ink.RULE, 0, scroll.getWidth(), HEAD - 1.0);
        }
    }
}
