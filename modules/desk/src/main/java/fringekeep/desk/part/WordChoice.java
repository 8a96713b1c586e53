package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import javax.accessibility.AccessibleRole;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;

/**
 * One choice among few, as words in a row behind its name: the chosen one is underlined, what is usual is said. Keys: arrows
 * left and right choose, Home the usual one. On a hairline like a row of facts.
 */
@SuppressWarnings("serial")
public final class WordChoice extends Painted {
    /** Height of one line. */
    public static final int ROW = 22;

    private static final Texts TEXTS = new Texts("fringekeep.desk.part.Texts", WordChoice.class);
    private static final int GAP = 14;

    private final String label;
    private final transient List<Word> words;
    private final String usual;
    private final transient Consumer<String> chosen;
    private final transient List<Rectangle2D> places = new ArrayList<>();
    private final int indent;
    private String code;

    /**
     * One of the words.
     *
     * @param code what the program calls it
     * @param text on screen
     */
    public record Word(String code, String text) {}

    /**
     * A choice.
     *
     * @param name for tests and keys, such as {@code fit.method}
     * @param label what is chosen
     * @param words the words in order
     * @param usual code of the usual one; empty for none
     * @param indent where the words begin; 0 for behind the label
     * @param chosen told the code of a word that a person chooses
     */
    public WordChoice(String name, String label, List<Word> words, String usual, int indent, Consumer<String> chosen) {
        this.label = label;
        this.words = List.copyOf(words);
        this.usual = usual;
        this.code = usual;
        this.indent = indent == 0 ? (int) Lettering.width(label, Type.BODY) + GAP : indent;
        this.chosen = chosen;
        setName(name);
        setFocusable(true);
        mouse();
        key("LEFT", () -> step(-1));
        key("RIGHT", () -> step(1));
        key("HOME", () -> choose(usual));
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent event) {
                scrollRectToVisible(new java.awt.Rectangle(0, 0, getWidth(), getHeight()));
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                repaint();
            }
        });
        say();
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.COMBO_BOX;
    }

    /** Code of the chosen word; empty for none. */
    public String chosen() {
        return code;
    }

    /** Shows a word as chosen without telling anybody. */
    public void show(String next) {
        code = next;
        say();
        repaint();
    }

    /** Chooses a word as a person does. */
    public void choose(String next) {
        if (isEnabled()
                && !next.equals(code)
                && words.stream().anyMatch(word -> word.code().equals(next))) {
            show(next);
            chosen.accept(next);
        }
    }

    private void step(int by) {
        int at = index();
        int next = Math.max(0, Math.min(words.size() - 1, at < 0 ? 0 : at + by));
        choose(words.get(next).code());
    }

    private int index() {
        for (int i = 0; i < words.size(); i++) {
            if (words.get(i).code().equals(code)) {
                return i;
            }
        }
        return -1;
    }

    private void say() {
        getAccessibleContext().setAccessibleName(label);
        String now = index() < 0 ? TEXTS.of("choice.none") : words.get(index()).text();
        StringBuilder all = new StringBuilder(now).append(" (");
        words.forEach(word -> all.append(word.text()).append(", "));
        all.setLength(all.length() - 2);
        getAccessibleContext().setAccessibleDescription(all.append(")").toString());
    }

    private void key(String stroke, Runnable work) {
        getInputMap(WHEN_FOCUSED).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private void mouse() {
        MouseAdapter mouse = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                int at = at(event);
                if (at >= 0) {
                    choose(words.get(at).code());
                }
            }

            @Override
            public void mouseMoved(MouseEvent event) {
                setCursor(Cursor.getPredefinedCursor(at(event) >= 0 ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        };
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
    }

    private int at(MouseEvent event) {
        for (int i = 0; i < places.size(); i++) {
            if (places.get(i).contains(event.getPoint())) {
                return i;
            }
        }
        return -1;
    }

    /** Height it needs in a width. */
    public int heightIn(int width) {
        return lay(width);
    }

    /** Finds places for the words and answers the height. */
    private int lay(int width) {
        places.clear();
        double x = indent;
        double y = 0;
        double right = width - noteWidth();
        for (Word word : words) {
            double wide = Lettering.width(word.text(), Type.BODY_MEDIUM);
            if (x > indent && x + wide > (y == 0 ? right : width)) {
                x = indent;
                y += ROW;
            }
            places.add(new Rectangle2D.Double(x - 4, y + 1, wide + 8, ROW - 2.0));
            x += wide + GAP;
        }
        return (int) y + ROW;
    }

    private double noteWidth() {
        return usual.isEmpty() ? 0 : Lettering.width(note(), Type.SMALL) + 8;
    }

    private String note() {
        if (usual.equals(code)) {
            return TEXTS.of("choice.usual");
        }
        String word = words.stream()
                .filter(each -> each.code().equals(usual))
                .map(Word::text)
                .findFirst()
                .orElse(usual);
        return TEXTS.of("choice.usually", word);
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(320, lay(getWidth() > 0 ? getWidth() : 320));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        int height = lay(getWidth());
        try (Pen pen = new Pen(graphics)) {
            pen.fitted(label, Type.BODY, Ink.INK2, 0, ROW - 7.0, indent - 6.0);
            for (int i = 0; i < words.size(); i++) {
                Rectangle2D place = places.get(i);
                boolean now = words.get(i).code().equals(code);
                Font font = now ? Type.BODY_MEDIUM : Type.BODY;
                Ink ink = !isEnabled() ? Ink.INK3 : now ? Ink.INK : Ink.INK2;
                double base = place.getY() + ROW - 8;
                double end = pen.text(words.get(i).text(), font, ink, place.getX() + 4, base);
                if (now) {
                    pen.fill(ink.color(), place.getX() + 4, base + 3, end - place.getX() - 4, 1.6);
                }
            }
            if (!usual.isEmpty()) {
                pen.textEndingAt(note(), Type.SMALL, Ink.INK3, getWidth(), ROW - 7.0);
            }
            pen.level(Ink.HAIR, 0, getWidth(), height - 1.0);
            if (isFocusOwner()) {
                pen.focus(-2, 0, getWidth() + 4.0, getHeight());
            }
        }
    }
}
