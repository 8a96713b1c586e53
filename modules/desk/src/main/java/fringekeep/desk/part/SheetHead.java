package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.Optional;

/** Title of a sheet, a sentence of what it is about, and a sentence of how it stands. */
@SuppressWarnings("serial")
public final class SheetHead extends Painted {
    /** Its height. */
    public static final int HEIGHT = 76;

    private String title = "";
    private String about = "";
    private transient Optional<Mark> mark = Optional.empty();
    private String state = "";

    /** An empty head with a name of its own. */
    public SheetHead(String name) {
        setName(name);
    }

    /** Shows title, what it is about, and how it stands with its shape. */
    public void show(String heading, String sentence, Optional<Mark> shape, String stands) {
        title = heading;
        about = sentence;
        mark = shape;
        state = stands;
        getAccessibleContext().setAccessibleName(heading);
        getAccessibleContext().setAccessibleDescription(sentence + " " + stands);
        repaint();
    }

    /** How it stands. */
    public String state() {
        return state;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(600, HEIGHT);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fitted(title, Type.TITLE, Ink.INK, 0, 27, getWidth());
            pen.fitted(about, Type.BODY, Ink.INK, 0, 49, getWidth());
            double x = 0;
            if (mark.isPresent()) {
                mark.get().paint(pen.graphics(), 0, 57, 12);
                x = 17;
            }
            pen.fitted(state, Type.BODY, Ink.INK, x, 67, getWidth() - x);
        }
    }
}
