package fringekeep.desk.list;

import fringekeep.desk.list.ListContent.Word;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Point;
import java.awt.Rectangle;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;

/** Heading of a list, its filter words and the word for columns; the chosen word is underlined. Takes the lines it needs. */
@SuppressWarnings("serial")
final class ListHead extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.list.Texts", ListHead.class);
    private static final int LINE = 20;
    private static final int GAP = 10;

    private final transient Consumer<Question> ask;
    private final transient Runnable columns;
    private transient ListContent content = ListContent.NOTHING;

    ListHead(Consumer<Question> ask, Runnable columns) {
        this.ask = ask;
        this.columns = columns;
        MouseAdapter mouse = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                pressed(event.getPoint());
            }

            @Override
            public void mouseMoved(MouseEvent event) {
                boolean over = places().stream().anyMatch(place -> place.contains(event.getPoint()));
                setCursor(Cursor.getPredefinedCursor(over ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        };
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
    }

    private void pressed(Point at) {
        List<Rectangle> places = places();
        for (int i = 0; i < places.size(); i++) {
            if (places.get(i).contains(at)) {
                if (i == content.words().size()) {
                    columns.run();
                } else {
                    ask.accept(content.words().get(i).question());
                }
                return;
            }
        }
    }

    void show(ListContent next) {
        content = next;
        StringBuilder words = new StringBuilder(next.heading());
        next.words().forEach(word -> words.append(", ").append(text(word)));
        getAccessibleContext().setAccessibleName(words.toString());
        revalidate();
        repaint();
    }

    /** The next filter word or the one before. */
    void turn(int by) {
        List<Word> words = content.words();
        for (int i = 0; i < words.size(); i++) {
            if (words.get(i).chosen()) {
                ask.accept(words.get(Math.floorMod(i + by, words.size())).question());
                return;
            }
        }
    }

    private static String text(Word word) {
        return word.count() < 0 ? word.text() : word.text() + " " + word.count();
    }

    private static double width(Word word) {
        return Lettering.width(text(word), word.chosen() ? Type.HEAD : Type.SMALL);
    }

    /** Where each word stands, the word for columns last; words that do not fit beside the heading stand below it. */
    private List<Rectangle> places() {
        List<Rectangle> places = new ArrayList<>();
        if (content.question().isEmpty()) {
            return places;
        }
        double width = Math.max(200, getWidth());
        double columnsWidth = Lettering.width(TEXTS.of("columns.word"), Type.SMALL);
        double heading = 16 + Lettering.width(content.heading(), Type.GROUP) + 14;
        double total = columnsWidth + GAP;
        for (Word word : content.words()) {
            total += width(word) + GAP;
        }
        boolean beside = heading + total <= width;
        double x = beside ? width - total + GAP : 16;
        int y = beside ? 6 : 6 + LINE;
        for (Word word : content.words()) {
            if (x + width(word) > width && x > 16) {
                x = 16;
                y += LINE;
            }
            places.add(new Rectangle((int) x - 4, y, (int) width(word) + 8, LINE));
            x += width(word) + GAP;
        }
        double last = width - columnsWidth;
        places.add(new Rectangle((int) last - 4, 6, (int) columnsWidth + 8, LINE));
        return places;
    }

    @Override
    public Dimension getPreferredSize() {
        int bottom = places().stream()
                .mapToInt(place -> place.y + place.height)
                .max()
                .orElse(26);
        return new Dimension(200, bottom + 10);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        List<Rectangle> places = places();
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.text(content.heading(), Type.GROUP, Ink.INK, 16, 23);
            for (int i = 0; i < places.size(); i++) {
                Rectangle place = places.get(i);
                if (i == content.words().size()) {
                    String word = TEXTS.of("columns.word");
                    double end = pen.text(word, Type.SMALL, Ink.INK2, place.x + 4.0, place.y + 16.0);
                    pen.level(Ink.INK2, place.x + 4.0, end, place.y + 18.0);
                } else {
                    word(pen, content.words().get(i), place);
                }
            }
        }
    }

    private static void word(Pen pen, Word word, Rectangle place) {
        double x = place.x + 4.0;
        boolean chosen = word.chosen();
        double end =
                pen.text(text(word), chosen ? Type.HEAD : Type.SMALL, chosen ? Ink.INK : Ink.INK2, x, place.y + 16.0);
        if (chosen) {
            pen.fill(Ink.STRONG.color(), x, place.y + 20.0, end - x, 2);
        }
    }
}
