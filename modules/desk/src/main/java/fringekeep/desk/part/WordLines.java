package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.accessibility.AccessibleRole;

/** A few sentences, broken into lines where the room is short. */
@SuppressWarnings("serial")
public final class WordLines extends Painted {
    private static final int LINE = 18;

    private transient List<Sentence> sentences = List.of();

    /**
     * A sentence.
     *
     * @param mark shape before it
     * @param text words
     * @param font face
     * @param ink colour
     */
    public record Sentence(Optional<Mark> mark, String text, Font font, Ink ink) {
        /** Body text. */
        public static Sentence of(String text) {
            return new Sentence(Optional.empty(), text, Type.BODY, Ink.INK);
        }

        /** Secondary text. */
        public static Sentence second(String text) {
            return new Sentence(Optional.empty(), text, Type.BODY, Ink.INK2);
        }

        /** Text behind a shape. */
        public static Sentence marked(Mark mark, String text) {
            return new Sentence(Optional.of(mark), text, Type.BODY_MEDIUM, Ink.INK);
        }
    }

    private record Line(Optional<Mark> mark, String text, Font font, Ink ink, int indent) {}

    /** No words yet; {@code name} for tests. */
    public WordLines(String name) {
        setName(name);
    }

    /** Shows sentences, each beginning a line. */
    public void show(List<Sentence> next) {
        sentences = List.copyOf(next);
        getAccessibleContext()
                .setAccessibleName(
                        String.join(" ", next.stream().map(Sentence::text).toList()));
        revalidate();
        repaint();
    }

    /** All that is said, for tests and screen readers. */
    public String words() {
        return getAccessibleContext().getAccessibleName();
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.LABEL;
    }

    @Override
    public Dimension getPreferredSize() {
        int room = getWidth() > 0 ? getWidth() : 600;
        return new Dimension(200, lines(room).size() * LINE + 2);
    }

    @Override
    public void setBounds(int x, int y, int width, int height) {
        boolean other = width != getWidth();
        super.setBounds(x, y, width, height);
        if (other) {
            revalidate();
        }
    }

    private List<Line> lines(int room) {
        List<Line> lines = new ArrayList<>();
        for (Sentence sentence : sentences) {
            breakUp(sentence, room, lines);
        }
        return lines;
    }

    private static void breakUp(Sentence sentence, int room, List<Line> lines) {
        int indent = sentence.mark().isPresent() ? 17 : 0;
        Optional<Mark> mark = sentence.mark();
        StringBuilder line = new StringBuilder();
        for (String word : sentence.text().split(" ", -1)) {
            String longer = line.length() == 0 ? word : line + " " + word;
            if (line.length() > 0 && Lettering.width(longer, sentence.font()) > room - indent) {
                lines.add(new Line(mark, line.toString(), sentence.font(), sentence.ink(), indent));
                mark = Optional.empty();
                line.setLength(0);
                line.append(word);
            } else {
                line.setLength(0);
                line.append(longer);
            }
        }
        lines.add(new Line(mark, line.toString(), sentence.font(), sentence.ink(), indent));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            int y = 0;
            for (Line line : lines(getWidth())) {
                int top = y;
                line.mark().ifPresent(mark -> mark.paint(pen.graphics(), 0, top + 3, 11));
                pen.fitted(line.text(), line.font(), line.ink(), line.indent(), y + 13, getWidth() - line.indent());
                y += LINE;
            }
        }
    }
}
