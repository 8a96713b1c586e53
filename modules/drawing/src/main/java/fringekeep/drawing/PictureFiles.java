package fringekeep.drawing;

import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.Locale;
import javax.imageio.ImageIO;

/** A picture as the bytes of a file. Equal pictures give equal bytes, whatever the locale and the time zone. */
public final class PictureFiles {
    /** Points in a millimetre (1 inch = 25.4 mm = 72 points). */
    static final double POINTS_PER_MILLIMETRE = 72 / 25.4;

    private PictureFiles() {}

    /** What can be written. */
    public enum Form {
        /** Scalable vector graphics, text as text with the letters used embedded. */
        SVG,
        /** One page of the picture's size. */
        PDF,
        /** Pixels at 300 to the inch. */
        PNG,
        /** The numbers that are plotted. */
        CSV;

        /** Ending of a file's name, without the dot. */
        public String ending() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /** Writes in any form, on paper. */
    public static byte[] write(Picture picture, Form form) {
        return switch (form) {
            case SVG -> SvgFile.write(picture, Theme.PAPER);
            case PDF -> PdfFile.write(picture, Theme.PAPER);
            case PNG -> png(picture, Theme.PAPER, 300);
            case CSV -> PlottedNumbers.csv(picture);
        };
    }

    /**
     * Pixels.
     *
     * @param dotsPerInch 300 for print
     */
    public static byte[] png(Picture picture, Theme theme, double dotsPerInch) {
        double scale = dotsPerInch / 72;
        double width = picture.widthMillimetres() * POINTS_PER_MILLIMETRE;
        double height = picture.heightMillimetres() * POINTS_PER_MILLIMETRE;
        BufferedImage image = new BufferedImage(
                (int) Math.ceil(width * scale), (int) Math.ceil(height * scale), BufferedImage.TYPE_INT_RGB);
        Graphics2D g = image.createGraphics();
        g.scale(scale, scale);
        new PicturePainter(g, theme, Measures.PAPER).paint(picture, width, height);
        g.dispose();
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try {
            ImageIO.setUseCache(false);
            ImageIO.write(image, "png", bytes);
        } catch (IOException e) {
            throw new UncheckedIOException("writing to memory", e);
        }
        return bytes.toByteArray();
    }

    /** Draws as on a screen of so many pixels, for small pictures in reports and for tests. */
    public static BufferedImage screen(Picture picture, Theme theme, int width, int height) {
        BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        Graphics2D g = image.createGraphics();
        new PicturePainter(g, theme, Measures.SCREEN).paint(picture, width, height);
        g.dispose();
        return image;
    }
}
