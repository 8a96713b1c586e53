package fringekeep.desk.look;

import fringekeep.drawing.Lettering;
import java.awt.Font;
import java.awt.FontFormatException;
import java.awt.GraphicsEnvironment;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;

/** Sizes and weights of text. Nothing is smaller than 11. */
public final class Type {
    /** Record title. */
    public static final Font TITLE = Lettering.medium(20);

    /** Counts in the strip. */
    public static final Font COUNT = Lettering.regular(21);

    /** Count of the open stop. */
    public static final Font COUNT_OPEN = Lettering.medium(21);

    /** What is in view, emphasis. */
    public static final Font VIEW = Lettering.medium(15);

    /** Body, tables, forms. */
    public static final Font BODY = Lettering.regular(13);

    /** Emphasis in the body. */
    public static final Font BODY_MEDIUM = Lettering.medium(13);

    /** Group heads. */
    public static final Font GROUP = Lettering.bold(13);

    /** Column heads, marks, status. */
    public static final Font SMALL = Lettering.regular(11.5);

    /** Column heads. */
    public static final Font HEAD = Lettering.medium(11.5);

    /** Fingerprints, text as entered. */
    public static final Font MONO = mono(12);

    /** The sentence of the first start. */
    public static final Font SENTENCE = Lettering.regular(25);

    private Type() {}

    /** Makes the faces known to the window toolkit. */
    public static void register() {
        Lettering.register();
        GraphicsEnvironment.getLocalGraphicsEnvironment().registerFont(MONO);
    }

    private static Font mono(float size) {
        String file = "com/formdev/flatlaf/fonts/jetbrains_mono/JetBrainsMono-Regular.ttf";
        try (InputStream stream = Type.class.getClassLoader().getResourceAsStream(file)) {
            if (stream == null) {
                throw new IllegalStateException("the font jar is missing: " + file);
            }
            return Font.createFont(Font.TRUETYPE_FONT, stream).deriveFont(size);
        } catch (IOException e) {
            throw new UncheckedIOException("reading the shipped font " + file, e);
        } catch (FontFormatException e) {
            throw new IllegalStateException("the shipped font " + file + " is damaged", e);
        }
    }
}
