package fringekeep.drawing;

import java.awt.BasicStroke;
import java.awt.Font;

/**
 * Sizes of text and lines for one medium, in its units.
 *
 * @param text size of headings and labels
 * @param small size of tick labels and legends
 * @param hair width of hairlines
 * @param line width of curves
 * @param radius half the size of a measured point
 * @param gap usual distance
 */
record Measures(double text, double small, double hair, double line, double radius, double gap) {
    /** Paper, in points. */
    static final Measures PAPER = new Measures(8.5, 7.5, 0.5, 1.1, 1.7, 4);

    /** Screen at scale 1, in pixels. */
    static final Measures SCREEN = new Measures(13, 11.5, 1, 1.8, 3, 6);

    Font textFont() {
        return Lettering.regular(text);
    }

    Font smallFont() {
        return Lettering.regular(small);
    }

    double textLine() {
        return text * 1.4;
    }

    double smallLine() {
        return small * 1.4;
    }

    BasicStroke stroke(Stroke stroke, double width) {
        float unit = (float) (line / 1.8);
        float[] dash =
                switch (stroke) {
                    case SOLID -> null;
                    case DASHED -> new float[] {7 * unit, 4 * unit};
                    case DOTTED -> new float[] {1.2f * unit, 3 * unit};
                };
        float thick = (float) width;
        return dash == null
                ? new BasicStroke(thick, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND)
                : new BasicStroke(thick, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, dash, 0);
    }
}
