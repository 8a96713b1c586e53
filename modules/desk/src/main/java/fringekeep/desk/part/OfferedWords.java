package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.function.IntConsumer;
import javax.accessibility.AccessibleRole;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;

/**
 * One of a few words that change while the sheet is shown (what an archive offers), side by side, the chosen one underlined;
 * ← → or a click choose. Breaks into lines where room is short. Fixed choices with a usual one are {@link WordChoice}s.
 */
@SuppressWarnings("serial")
public final class OfferedWords extends Painted {
    private static final int LINE = 24;
    private static final int GAP = 20;

    private final transient IntConsumer listener;
    private final String spoken;
    private transient List<String> words;
    private int chosen;

    /**
     * A choice.
     *
     * @param name for tests
     * @param spoken what is chosen, for those who read the screen out
     * @param chosen which word is chosen at first, from 0; -1 for none
     * @param listener called when a person chooses
     */
    public OfferedWords(String name, String spoken, List<String> words, int chosen, IntConsumer listener) {
        this.listener = listener;
        this.spoken = spoken;
        this.words = List.copyOf(words);
        this.chosen = chosen;
        setName(name);
        setFocusable(true);
        setCursor(Cursor.getPredefinedCursor(Cursor.HAND_CURSOR));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                at(event.getX(), event.getY());
            }
        });
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent event) {
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                repaint();
            }
        });
        key("LEFT", -1);
        key("RIGHT", 1);
        say();
    }

    private void key(String stroke, int by) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                choose(Math.max(0, Math.min(words.size() - 1, chosen + by)));
            }
        });
    }

    /** Offers other words; {@code -1} chooses none of them. */
    public void offer(List<String> next, int now) {
        words = List.copyOf(next);
        chosen = now;
        say();
        revalidate();
        repaint();
    }

    /** The words offered. */
    public List<String> words() {
        return words;
    }

    /** Which word is chosen, from 0; -1 for none. */
    public int chosen() {
        return chosen;
    }

    /** Chooses as a person would. */
    public void choose(int next) {
        if (isEnabled() && next != chosen && next >= 0 && next < words.size()) {
            chosen = next;
            say();
            repaint();
            listener.accept(next);
        }
    }

    private void say() {
        String now = chosen >= 0 && chosen < words.size() ? words.get(chosen) : "";
        getAccessibleContext().setAccessibleName(spoken + ": " + now);
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.RADIO_BUTTON;
    }

    @Override
    public Dimension getPreferredSize() {
        double width = 0;
        for (String word : words) {
            width += Lettering.width(word, Type.BODY_MEDIUM) + GAP;
        }
        int room = getWidth() > 0 ? getWidth() : 600;
        return new Dimension((int) Math.min(width, room), lines(room) * LINE);
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(60, getPreferredSize().height);
    }

    private int lines(int room) {
        int lines = 1;
        double x = 0;
        for (String word : words) {
            double width = Lettering.width(word, Type.BODY_MEDIUM);
            if (x > 0 && x + width > room) {
                lines++;
                x = 0;
            }
            x += width + GAP;
        }
        return lines;
    }

    private interface Placed {
        void word(int number, double x, double y, double width);
    }

    private void walk(Placed placed) {
        double x = 2;
        double y = 0;
        for (int i = 0; i < words.size(); i++) {
            double wide = Lettering.width(words.get(i), Type.BODY_MEDIUM);
            if (x > 2 && x + wide > getWidth()) {
                x = 2;
                y += LINE;
            }
            placed.word(i, x, y, Lettering.width(words.get(i), i == chosen ? Type.BODY_MEDIUM : Type.BODY));
            x += wide + GAP;
        }
    }

    private void at(int px, int py) {
        int[] hit = {-1};
        walk((i, x, y, width) -> hit[0] = py >= y && py < y + LINE && px >= x - 4 && px <= x + width + 4 ? i : hit[0]);
        choose(hit[0]);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            walk((i, x, y, width) -> {
                boolean on = i == chosen;
                Ink ink = !isEnabled() ? Ink.INK3 : on ? Ink.INK : Ink.INK2;
                pen.text(words.get(i), on ? Type.BODY_MEDIUM : Type.BODY, ink, x, y + 16);
                if (on) {
                    pen.fill(ink.color(), x, y + 19, width, 2);
                }
            });
            if (isFocusOwner()) {
                pen.focus(-2, 0, getWidth() + 4.0, getHeight());
            }
        }
    }
}
