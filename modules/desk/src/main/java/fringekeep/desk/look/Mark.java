package fringekeep.desk.look;

import java.awt.BasicStroke;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;

/** Small shapes with a meaning, drawn from paths on a square of twelve units; never alone, always beside a word or number. */
public enum Mark {
    /** Outdated: something upstream was corrected or judged. */
    RING(Ink.MARK),
    /** Withdrawn. */
    SLASH(Ink.INK),
    /** Masked points or channel. */
    BAR(Ink.PURPLE),
    /** Doubted. */
    WAVE(Ink.INK2),
    /** Same bits. */
    SAME(Ink.INK),
    /** Same within rounding. */
    NEAR(Ink.QUANTUM),
    /** Different. */
    DIFFERENT(Ink.MARK),
    /** Not computable, or waits. */
    DASHES(Ink.INK3),
    /** Preferred. */
    PREFERRED(Ink.INK),
    /** Unplaced. */
    CORNER(Ink.MARK),
    /** Growing or provisional. */
    DASHED_RING(Ink.INK2),
    /** The record in hand. */
    HERE(Ink.INK),
    /** Records linked with it. */
    LINKED(Ink.INK),
    /** A question to answer. */
    QUESTION(Ink.CAUTIONRULE),
    /** These data cannot tell. */
    CANNOT_TELL(Ink.INK),
    /** Withheld. */
    WITHHELD(Ink.INK3),
    /** Corrected: a newer record of the same thing stands. */
    CORRECTED(Ink.INK3),
    /** Two records claim the same place. */
    DISPUTED(Ink.MARK);

    private final Ink ink;

    Mark(Ink ink) {
        this.ink = ink;
    }

    /** Its colour. */
    public Ink ink() {
        return ink;
    }

    /** Paints the shape into a square of {@code size} with its upper left corner at a place. */
    public void paint(Graphics2D graphics, double x, double y, double size) {
        Graphics2D g = (Graphics2D) graphics.create();
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g.translate(x, y);
        g.scale(size / 12, size / 12);
        g.setColor(ink.color());
        g.setStroke(stroke());
        if (filled()) {
            g.fill(path());
        } else {
            g.draw(path());
        }
        g.dispose();
    }

    private boolean filled() {
        return this == BAR || this == HERE || this == LINKED;
    }

    private BasicStroke stroke() {
        return switch (this) {
            case DASHED_RING ->
                new BasicStroke(2, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10, new float[] {2, 2}, 0);
            case DASHES ->
                new BasicStroke(2, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10, new float[] {2.4f, 1.6f}, 0);
            case WITHHELD -> new BasicStroke(1);
            case RING,
                    SLASH,
                    BAR,
                    WAVE,
                    SAME,
                    NEAR,
                    DIFFERENT,
                    PREFERRED,
                    CORNER,
                    HERE,
                    LINKED,
                    QUESTION,
                    CANNOT_TELL,
                    CORRECTED,
                    DISPUTED -> new BasicStroke(2);
        };
    }

    private Path2D path() {
        return switch (this) {
            case RING, DASHED_RING -> new Path2D.Double(new Ellipse2D.Double(1.8, 1.8, 8.4, 8.4));
            case SLASH -> lines(3, 10, 9, 2);
            case BAR -> box(4.5, 1, 3, 10);
            case WAVE -> wave(6);
            case SAME -> lines(1.5, 4, 10.5, 4).add(1.5, 8, 10.5, 8);
            case PREFERRED -> lines(1, 7, 11, 7).add(1, 10.4, 11, 10.4);
            case NEAR -> wave(4).append(wave(8));
            case DIFFERENT -> lines(1.5, 4, 10.5, 4).add(1.5, 8, 10.5, 8).add(3.5, 11, 8.5, 1);
            case DASHES -> lines(0.5, 6, 11.5, 6);
            case CORNER -> lines(2, 1.5, 2, 10, 10.5, 10);
            case HERE -> box(1.5, 1.5, 9, 9);
            case LINKED -> box(4.9, 1, 2.2, 10);
            case QUESTION -> closed(6, 2.4, 10.6, 10.5, 1.4, 10.5);
            case CANNOT_TELL -> closed(2, 2, 10, 2, 10, 10, 2, 10);
            case WITHHELD ->
                closed(1.5, 1.5, 10.5, 1.5, 10.5, 10.5, 1.5, 10.5)
                        .add(1.5, 6, 6, 1.5)
                        .add(1.5, 10.5, 10.5, 1.5)
                        .add(6, 10.5, 10.5, 6);
            case CORRECTED -> lines(2, 6, 9, 6).add(6, 3, 9.4, 6, 6, 9);
            case DISPUTED -> lines(6, 1, 6, 5, 2, 10.5).add(6, 5, 10, 10.5);
        };
    }

    private static Lines lines(double... xy) {
        return new Lines().add(xy);
    }

    private static Path2D box(double x, double y, double width, double height) {
        return closed(x, y, x + width, y, x + width, y + height, x, y + height);
    }

    private static Lines closed(double... xy) {
        Lines lines = lines(xy);
        lines.closePath();
        return lines;
    }

    private static Lines wave(double y) {
        Lines lines = new Lines();
        lines.moveTo(1, y + 1);
        lines.curveTo(2.7, y - 2.5, 4.3, y - 2.5, 6, y);
        lines.curveTo(7.7, y + 2.5, 9.3, y + 2.5, 11, y - 1);
        return lines;
    }

    /** A path of several polylines. */
    private static final class Lines extends Path2D.Double {
        private static final long serialVersionUID = 1L;

        Lines add(double... xy) {
            moveTo(xy[0], xy[1]);
            for (int i = 2; i < xy.length; i += 2) {
                lineTo(xy[i], xy[i + 1]);
            }
            return this;
        }

        Lines append(Path2D other) {
            append(other, false);
            return this;
        }
    }
}
