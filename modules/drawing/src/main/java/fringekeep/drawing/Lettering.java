package fringekeep.drawing;

import java.awt.Font;
import java.awt.FontFormatException;
import java.awt.Graphics2D;
import java.awt.GraphicsEnvironment;
import java.awt.font.FontRenderContext;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;

/**
 * The one sans of the house, taken from the font jar that is shipped with the program, so that text has the same width on
 * every machine. Thread-safe.
 */
public final class Lettering {
    /** Metrics that no screen or printer changes: no hinting, fractions of a unit. */
    private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);

    private static final Font REGULAR = read("Roboto-Regular.ttf");
    private static final Font MEDIUM = read("Roboto-Medium.ttf");
    private static final Font BOLD = read("Roboto-Bold.ttf");

    private Lettering() {}

    /** Weight 400. */
    public static Font regular(double size) {
        return REGULAR.deriveFont((float) size);
    }

    /** Weight 500. */
    public static Font medium(double size) {
        return MEDIUM.deriveFont((float) size);
    }

    /** Weight 700. */
    public static Font bold(double size) {
        return BOLD.deriveFont((float) size);
    }

    /** Makes the faces known to the window toolkit by their family names {@code Roboto} and {@code Roboto Medium}. */
    public static void register() {
        GraphicsEnvironment environment = GraphicsEnvironment.getLocalGraphicsEnvironment();
        environment.registerFont(REGULAR);
        environment.registerFont(MEDIUM);
        environment.registerFont(BOLD);
    }

    /** Advance width of a text as {@link #draw} draws it (units of the font's size). */
    public static double width(String text, Font font) {
        double width = 0;
        for (Run run : Run.of(text)) {
            width += plainWidth(run.text(), run.font(font));
        }
        return width;
    }

    /**
     * Draws a text at a baseline. Raised and lowered digits and signs, which the face has only in part, are drawn as small
     * plain ones.
     */
    public static void draw(Graphics2D g, String text, Font font, double x, double y) {
        double at = x;
        for (Run run : Run.of(text)) {
            Font face = run.font(font);
            g.setFont(face);
            g.drawString(run.text(), (float) at, (float) (y + run.shift() * font.getSize2D()));
            at += plainWidth(run.text(), face);
        }
        g.setFont(font);
    }

    private static double plainWidth(String text, Font font) {
        return text.isEmpty() ? 0 : font.getStringBounds(text, METRICS).getWidth();
    }

    /** The bytes of the regular face, for embedding. */
    static InputStream regularFace() {
        return open("Roboto-Regular.ttf");
    }

    private static Font read(String file) {
        try (InputStream stream = open(file)) {
            return Font.createFont(Font.TRUETYPE_FONT, stream);
        } catch (IOException e) {
            throw new UncheckedIOException("reading the shipped font " + file, e);
        } catch (FontFormatException e) {
            throw new IllegalStateException("the shipped font " + file + " is damaged", e);
        }
    }

    private static InputStream open(String file) {
        InputStream stream =
                Lettering.class.getClassLoader().getResourceAsStream("com/formdev/flatlaf/fonts/roboto/" + file);
        if (stream == null) {
            throw new IllegalStateException("the font jar is missing: " + file);
        }
        return stream;
    }
}
