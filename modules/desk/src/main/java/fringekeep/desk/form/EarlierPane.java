package fringekeep.desk.form;

import fringekeep.archive.record.Hash;
import fringekeep.desk.form.FormReading.Kept;
import fringekeep.desk.form.FormReading.Line;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Graphics;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.KeyAdapter;
import java.awt.event.KeyEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Consumer;

/** Earlier records of the same thing, or others of the kind, and drafts that are kept. */
@SuppressWarnings("serial")
final class EarlierPane extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", EarlierPane.class);
    private static final int ROW = FormLayout.ROW;
    private static final int TOP = 60;

    private final String heading;
    private final transient List<Line> lines;
    private final transient List<Kept> drafts;
    private final transient Consumer<Line> taken;
    private final transient Consumer<Kept> resumed;
    private transient Optional<Hash> marked = Optional.empty();
    private int at;

    EarlierPane(String heading, List<Line> lines, List<Kept> drafts, Consumer<Line> taken, Consumer<Kept> resumed) {
        this.heading = heading;
        this.lines = List.copyOf(lines);
        this.drafts = List.copyOf(drafts);
        this.taken = taken;
        this.resumed = resumed;
        setName("earlier records");
        setFocusable(true);
        getAccessibleContext().setAccessibleName(heading);
        tell();
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                for (int i = 0; i < count(); i++) {
                    if (event.getY() >= top(i) && event.getY() < top(i) + ROW) {
                        at = i;
                        take();
                    }
                }
            }
        });
        addKeyListener(new KeyAdapter() {
            @Override
            public void keyPressed(KeyEvent event) {
                pressed(event);
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
    }

    private int count() {
        return lines.size() + drafts.size();
    }

    private int top(int index) {
        return TOP + ROW * index + (index >= lines.size() ? 44 + (lines.isEmpty() ? ROW : 0) : 0);
    }

    private void pressed(KeyEvent event) {
        int by = event.getKeyCode() == KeyEvent.VK_DOWN ? 1 : event.getKeyCode() == KeyEvent.VK_UP ? -1 : 0;
        if (by != 0 && count() > 0) {
            at = Math.max(0, Math.min(count() - 1, at + by));
            tell();
            repaint();
            event.consume();
        } else if (event.getKeyCode() == KeyEvent.VK_ENTER && count() > 0) {
            take();
            event.consume();
        }
    }

    private void tell() {
        String now = at < lines.size()
                ? words(lines.get(at))
                : at < count() ? drafts.get(at - lines.size()).words() : "";
        getAccessibleContext().setAccessibleDescription(now);
    }

    private static String words(Line line) {
        return line.number() + " " + line.when() + " " + line.words();
    }

    private void take() {
        if (at < lines.size()) {
            taken.accept(lines.get(at));
        } else {
            resumed.accept(drafts.get(at - lines.size()));
        }
    }

    /** Where the column of numbers ends and that of instants begins. */
    private double numberEnd() {
        double widest = 28;
        for (Line line : lines) {
            widest = Math.max(widest, Lettering.width(line.number(), Type.GROUP));
        }
        return 22 + widest + 10;
    }

    /** Marks the record that stands beside the form. */
    void mark(Optional<Hash> record) {
        marked = record;
        repaint();
    }

    /** The middle of the marked row. */
    OptionalInt markedMiddle() {
        for (int i = 0; i < lines.size(); i++) {
            if (marked.equals(Optional.of(lines.get(i).record()))) {
                return OptionalInt.of(top(i) + ROW / 2);
            }
        }
        return OptionalInt.empty();
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double end = getWidth();
            pen.fitted(heading, Type.GROUP, Ink.INK, 16, 23, end - 16);
            pen.text(TEXTS.of("list.number"), Type.HEAD, Ink.INK2, 22, 53);
            pen.text(TEXTS.of("list.when"), Type.HEAD, Ink.INK2, numberEnd(), 53);
            pen.level(Ink.RULE, 16, end, TOP - 1.0);
            if (lines.isEmpty()) {
                pen.fitted(TEXTS.of("list.none"), Type.BODY, Ink.INK2, 22, TOP + 15, end - 22);
            }
            for (int i = 0; i < lines.size(); i++) {
                line(pen, lines.get(i), i, end);
            }
            if (!drafts.isEmpty()) {
                double y = top(lines.size());
                pen.text(TEXTS.of("list.drafts"), Type.GROUP, Ink.INK, 16, y - 9);
                pen.level(Ink.RULE, 16, end, y - 1);
            }
            for (int i = 0; i < drafts.size(); i++) {
                double y = top(lines.size() + i);
                pen.fitted(drafts.get(i).words(), Type.BODY, Ink.INK, 22, y + 15, end - 22);
                pen.level(Ink.HAIR, 16, end, y + ROW - 1);
                focus(pen, lines.size() + i, end);
            }
        }
    }

    private void line(Pen pen, Line line, int index, double end) {
        double y = top(index);
        boolean here = marked.equals(Optional.of(line.record()));
        if (here) {
            pen.fill(Ink.SEL.color(), 16, y, end - 16, ROW - 1.0);
        }
        Ink ink = line.struck() ? Ink.INK3 : Ink.INK;
        pen.fitted(line.number(), here ? Type.GROUP : Type.BODY, ink, 22, y + 15, numberEnd() - 24);
        pen.fitted(line.when(), Type.BODY, ink, numberEnd(), y + 15, 98);
        Ink second = line.struck() ? Ink.INK3 : Ink.INK2;
        String words = Pen.shortened(line.words(), Type.BODY, end - numberEnd() - 108);
        pen.text(words, Type.BODY, second, numberEnd() + 104, y + 15);
        if (line.struck()) {
            pen.strike(words, Type.BODY, Ink.INK3, numberEnd() + 104, y + 15);
        }
        pen.level(Ink.HAIR, 16, end, y + ROW - 1);
        focus(pen, index, end);
    }

    private void focus(Pen pen, int index, double end) {
        if (isFocusOwner() && at == index) {
            pen.focus(16, top(index), end - 16, ROW);
        }
    }
}
