package fringekeep.desk.form;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Locale;
import java.util.function.Consumer;

/** What may be chosen in a field, below it; narrowed by what is typed. */
@SuppressWarnings("serial")
final class ChoiceList extends Painted {
    private static final int MOST = 12;
    private static final int ROW = FormLayout.ROW;

    /**
     * Something to choose.
     *
     * @param words what is typed by choosing it
     * @param detail further words; may be empty
     */
    record Option(String words, String detail) {}

    private final transient Consumer<Option> taken;
    private transient List<Option> all = List.of();
    private transient List<Option> shown = List.of();
    private int chosen = -1;
    private int first;

    ChoiceList(Consumer<Option> taken) {
        this.taken = taken;
        setVisible(false);
        setName("choices");
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                int index = first + event.getY() / ROW;
                if (index < shown.size()) {
                    taken.accept(shown.get(index));
                }
            }
        });
    }

    void offer(List<Option> options, String now) {
        all = List.copyOf(options);
        shown = all;
        chosen = -1;
        first = 0;
        for (int i = 0; i < shown.size(); i++) {
            if (shown.get(i).words().equals(now)) {
                chosen = i;
            }
        }
        reveal();
        setVisible(!shown.isEmpty());
        tell();
    }

    /** Shows only what contains a text. */
    void narrow(String text) {
        String plain = text.toLowerCase(Locale.ROOT);
        shown = all.stream()
                .filter(option -> (option.words() + " " + option.detail())
                        .toLowerCase(Locale.ROOT)
                        .contains(plain))
                .toList();
        chosen = plain.isEmpty() || shown.isEmpty() ? -1 : 0;
        first = 0;
        setVisible(!shown.isEmpty() && !all.isEmpty());
        tell();
        repaint();
    }

    boolean isOpen() {
        return isVisible();
    }

    List<Option> shown() {
        return shown;
    }

    void close() {
        setVisible(false);
    }

    void move(int by) {
        if (!shown.isEmpty()) {
            chosen = Math.floorMod(Math.max(chosen, by > 0 ? -1 : 0) + by, shown.size());
            reveal();
            tell();
            repaint();
        }
    }

    private void reveal() {
        if (chosen >= 0) {
            first = Math.max(Math.min(first, chosen), chosen - MOST + 1);
        }
    }

    /** Takes what is chosen; answers whether anything was. */
    boolean takeChosen() {
        if (chosen < 0 || chosen >= shown.size()) {
            return false;
        }
        Option option = shown.get(chosen);
        taken.accept(option);
        return true;
    }

    private void tell() {
        String now = chosen >= 0 && chosen < shown.size() ? shown.get(chosen).words() : "";
        getAccessibleContext().setAccessibleName(now);
    }

    /** Stands below a field, or above it where there is no room. */
    void place(Rectangle field, int height) {
        if (!isVisible()) {
            return;
        }
        double wide = field.width;
        for (Option option : shown) {
            wide = Math.max(wide, 30 + width(option));
        }
        int high = ROW * Math.min(MOST, shown.size()) + 2;
        boolean below = field.y + field.height + high <= height || field.y < high;
        setBounds(field.x, below ? field.y + field.height : field.y - high, (int) Math.min(560, wide), high);
    }

    private static double width(Option option) {
        return Lettering.width(option.words(), Type.BODY) + Lettering.width("   " + option.detail(), Type.SMALL);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            for (int i = first; i < Math.min(shown.size(), first + MOST); i++) {
                double y = 1 + (i - first) * (double) ROW;
                if (i == chosen) {
                    pen.fill(Ink.SEL.color(), 1, y, getWidth() - 2.0, ROW);
                }
                Option option = shown.get(i);
                double end = pen.fitted(option.words(), Type.BODY, Ink.INK, 6, y + 15, getWidth() - 12.0);
                pen.fitted(option.detail(), Type.SMALL, Ink.INK2, end + 12, y + 15, getWidth() - end - 18);
            }
            pen.graphics().setColor(Ink.STRONG.color());
            pen.graphics().drawRect(0, 0, getWidth() - 1, getHeight() - 1);
        }
    }
}
