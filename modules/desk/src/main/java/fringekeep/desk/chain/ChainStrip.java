package fringekeep.desk.chain;

import fringekeep.archive.graph.StateName;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JTextField;
import javax.swing.KeyStroke;

/** The strip over every sheet: what is in view, ten stops with counts and the thread, find, and what is going on. */
@SuppressWarnings("serial")
public final class ChainStrip extends Painted {
    /** Width of the left cell. */
    public static final int LEFT = 152;

    private static final int HEIGHT = 88;
    private static final int TALL = 104;
    private static final int TICKS_FROM = 1600;
    private static final Texts TEXTS = new Texts("fringekeep.desk.chain.Texts", ChainStrip.class);

    private final List<StopCell> cells = new ArrayList<>();
    private final JTextField find = new JTextField();
    private final ViewCell viewCell;
    private transient ChainState state;
    private transient List<Going> going = List.of();
    private int open;

    /** A line about what is going on, with a shape before it where there is one. */
    public record Going(Optional<Mark> mark, String words) {}

    /** A strip that tells a listener what a person does. */
    public ChainStrip(ChainState first, ChainListener listener) {
        this.state = first;
        this.viewCell = new ViewCell(listener);
        setOpaque(true);
        setName("strip");
        add(viewCell);
        key(viewCell, "RIGHT", () -> cells.get(0).requestFocusInWindow());
        key(viewCell, "ENTER", listener::chooseView);
        key(viewCell, "SPACE", listener::chooseView);
        key(viewCell, "DOWN", listener::chooseView);
        for (int i = 0; i < first.stops().size(); i++) {
            StopCell cell = new StopCell(i, first.stops().get(i), listener);
            cells.add(cell);
            add(cell);
            keys(cell, i, listener);
        }
        find.putClientProperty("JTextField.placeholderText", TEXTS.of("find"));
        find.putClientProperty("JTextField.showClearButton", true);
        JLabel key = new JLabel(TEXTS.of("find.key"));
        key.setFont(Type.SMALL);
        key.setEnabled(false);
        find.putClientProperty("JTextField.trailingComponent", key);
        find.setFont(Type.BODY);
        find.getAccessibleContext().setAccessibleName(TEXTS.of("find.name"));
        find.addActionListener(event -> listener.find(find.getText()));
        add(find);
        getAccessibleContext().setAccessibleName(TEXTS.of("strip"));
        show(first, 0);
    }

    /** Shows counts, thread and the open stop. */
    public void show(ChainState next, int openStop) {
        state = next;
        open = openStop;
        for (int i = 0; i < cells.size(); i++) {
            cells.get(i).show(next.stops().get(i), i == openStop, i == 0);
        }
        viewCell.linked(next.selection());
        repaint();
    }

    /** Says what is in view: name and a line below. */
    public void inView(String name, String more) {
        viewCell.inView(name, more);
    }

    /** When records of each stop were made over the view's time, from 0 to 1; painted on wide windows only. */
    public void ticks(List<double[]> ticks) {
        for (int i = 0; i < cells.size() && i < ticks.size(); i++) {
            cells.get(i).ticks(ticks.get(i));
        }
    }

    /** Whether there is room for the row of ticks. */
    public boolean wide() {
        return getWidth() >= TICKS_FROM;
    }

    /** Puts the bar under the left cell: a sheet about what is in view stands below. */
    public void viewOpen(boolean opened) {
        viewCell.open(opened);
        if (opened) {
            for (int i = 0; i < cells.size(); i++) {
                cells.get(i).show(state.stops().get(i), false, i == 0);
            }
        } else {
            show(state, open);
        }
    }

    /** Gives the focus to what is in view. */
    public void focusView() {
        viewCell.requestFocusInWindow();
    }

    /** Says what is going on, at most two lines. */
    public void going(List<Going> lines) {
        going = List.copyOf(lines);
        repaint();
    }

    /** The field for words to find. */
    public JTextField findField() {
        return find;
    }

    /** Gives the focus to the open stop. */
    public void focusOpen() {
        cells.get(open).requestFocusInWindow();
    }

    /** Where the columns of the stops begin, and where the last ends; sheets align with them. */
    public int[] columns() {
        return columns(getWidth(), cells.size());
    }

    /** The same for a strip of a width: stages' sheets are as wide as the strip above them. */
    public static int[] columns(int width, int stops) {
        int[] edges = new int[stops + 1];
        int middle = width - left(width) - right(width);
        for (int i = 0; i <= stops; i++) {
            edges[i] = left(width) + middle * i / stops;
        }
        return edges;
    }

    private static int left(int width) {
        return width >= 1900 ? 232 : LEFT;
    }

    private static int right(int width) {
        return width >= 1900 ? 420 : 232;
    }

    private void keys(StopCell cell, int i, ChainListener listener) {
        key(cell, "LEFT", () -> (i == 0 ? viewCell : cells.get(i - 1)).requestFocusInWindow());
        key(cell, "RIGHT", () -> cells.get(Math.min(cells.size() - 1, i + 1)).requestFocusInWindow());
        key(cell, "ENTER", () -> listener.open(i));
        key(cell, "SPACE", () -> listener.open(i));
        key(cell, "DOWN", () -> listener.linked(i));
        key(cell, "O", () -> listener.filter(i, StateName.OUTDATED));
        key(cell, "W", () -> listener.filter(i, StateName.WITHDRAWN));
    }

    private static void key(JComponent component, String stroke, Runnable work) {
        component.getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        component.getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(1280, wide() ? TALL : HEIGHT);
    }

    @Override
    public void doLayout() {
        int[] edges = columns();
        viewCell.setBounds(0, 0, edges[0], getHeight());
        for (int i = 0; i < cells.size(); i++) {
            cells.get(i).setBounds(edges[i], 0, edges[i + 1] - edges[i], getHeight());
        }
        int x = edges[cells.size()] + 12;
        find.setBounds(x, 9, getWidth() - 16 - x, 25);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        int[] edges = columns();
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.GROUND.color(), 0, 0, getWidth(), getHeight());
            double x = edges[cells.size()];
            pen.upright(Ink.RULE, x, 10, getHeight() - 1.0);
            double y = 52;
            for (Going line : going) {
                double at = x + 12;
                if (line.mark().isPresent()) {
                    line.mark().get().paint(pen.graphics(), at, y - 10, 12);
                    at += 16;
                }
                pen.fitted(line.words(), Type.SMALL, Ink.INK2, at, y, getWidth() - 16 - at);
                y += 16;
            }
            pen.level(Ink.STRONG, 0, getWidth(), getHeight() - 1.0);
        }
    }
}
