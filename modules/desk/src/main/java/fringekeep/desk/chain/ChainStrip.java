package fringekeep.desk.chain;

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
    private static final Texts TEXTS = new Texts("fringekeep.desk.chain.Texts", ChainStrip.class);

    private final List<StopCell> cells = new ArrayList<>();
    private final JTextField find = new JTextField();
    private transient ChainState state;
    private String view = "";
    private String detail = "";
    private transient List<Going> going = List.of();
    private int open;

    /** A line about what is going on, with a shape before it where there is one. */
    public record Going(Optional<Mark> mark, String words) {}

    /** A strip that tells a listener what a person does. */
    public ChainStrip(ChainState first, ChainListener listener) {
        this.state = first;
        setOpaque(true);
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
        repaint();
    }

    /** Says what is in view: name and a line below. */
    public void inView(String name, String more) {
        view = name;
        detail = more;
        repaint();
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
        int[] edges = new int[cells.size() + 1];
        int width = getWidth() - LEFT - right();
        for (int i = 0; i <= cells.size(); i++) {
            edges[i] = LEFT + width * i / cells.size();
        }
        return edges;
    }

    private int right() {
        return getWidth() >= 1900 ? 420 : 232;
    }

    private void keys(StopCell cell, int i, ChainListener listener) {
        key(cell, "LEFT", () -> cells.get(Math.max(0, i - 1)).requestFocusInWindow());
        key(cell, "RIGHT", () -> cells.get(Math.min(cells.size() - 1, i + 1)).requestFocusInWindow());
        key(cell, "ENTER", () -> listener.open(i));
        key(cell, "SPACE", () -> listener.open(i));
        key(cell, "DOWN", () -> listener.linked(i));
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
        return new Dimension(1280, HEIGHT);
    }

    @Override
    public void doLayout() {
        int[] edges = columns();
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
            pen.text(TEXTS.of("view"), Type.SMALL, Ink.INK2, 16, 22);
            pen.fitted(view, Type.VIEW, Ink.INK, 16, 41, LEFT - 20.0);
            pen.fitted(detail, Type.SMALL, Ink.INK2, 16, 56, LEFT - 20.0);
            String linked =
                    state.selection().isEmpty() ? TEXTS.of("linked.none") : TEXTS.of("linked", state.selection());
            pen.fitted(linked, Type.SMALL, Ink.INK2, 16, 75, LEFT - 20.0);
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
