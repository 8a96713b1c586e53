package fringekeep.desk.list;

import fringekeep.desk.list.ListContent.Word;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** Heading of a list and its filter words; the chosen word is underlined. */
@SuppressWarnings("serial")
final class ListHead extends Painted {
    private final transient Consumer<Question> ask;
    private transient ListContent content = ListContent.NOTHING;
    private final transient List<Rectangle> places = new ArrayList<>();

    ListHead(Consumer<Question> ask) {
        this.ask = ask;
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                wordAt(event.getX(), event.getY()).ifPresent(word -> ask.accept(word.question()));
            }
        });
        addMouseMotionListener(new MouseAdapter() {
            @Override
            public void mouseMoved(MouseEvent event) {
                boolean over = wordAt(event.getX(), event.getY()).isPresent();
                setCursor(Cursor.getPredefinedCursor(over ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        });
    }

    void show(ListContent next) {
        content = next;
        StringBuilder words = new StringBuilder(next.heading());
        next.words().forEach(word -> words.append(", ").append(text(word)));
        getAccessibleContext().setAccessibleName(words.toString());
        repaint();
    }

    void askMore() {
        content.words().stream()
                .filter(Word::chosen)
                .findFirst()
                .ifPresent(word -> ask.accept(word.question().more()));
    }

    private Optional<Word> wordAt(int x, int y) {
        for (int i = 0; i < places.size(); i++) {
            if (places.get(i).contains(x, y)) {
                return Optional.of(content.words().get(i));
            }
        }
        return Optional.empty();
    }

    private static String text(Word word) {
        return word.count() < 0 ? word.text() : word.text() + " " + word.count();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(200, 36);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        places.clear();
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            double headingEnd = pen.text(content.heading(), Type.GROUP, Ink.INK, 16, 23);
            double total = -10;
            for (Word word : content.words()) {
                total += Lettering.width(text(word), word.chosen() ? Type.HEAD : Type.SMALL) + 10;
            }
            double x = Math.max(headingEnd + 14, getWidth() - total);
            for (Word word : content.words()) {
                double width = Lettering.width(text(word), word.chosen() ? Type.HEAD : Type.SMALL);
                if (x + width > getWidth() + 1) {
                    places.add(new Rectangle());
                    continue;
                }
                x = word(pen, word, x) + 10;
            }
        }
    }

    private double word(Pen pen, Word word, double x) {
        double end =
                pen.text(text(word), word.chosen() ? Type.HEAD : Type.SMALL, word.chosen() ? Ink.INK : Ink.INK2, x, 22);
        places.add(new Rectangle((int) x - 4, 6, (int) (end - x) + 8, 26));
        if (word.chosen()) {
            pen.fill(Ink.STRONG.color(), x, 27, end - x, 2);
        }
        return end;
    }
}
