package fringekeep.drawing;

import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.List;

/** Draws a picture on any two-dimensional surface; the same for files and screen. */
final class PicturePainter {
    private final Graphics2D g;
    private final Theme theme;
    private final Measures measures;

    PicturePainter(Graphics2D g, Theme theme, Measures measures) {
        this.g = g;
        this.theme = theme;
        this.measures = measures;
    }

    /** Draws all and tells where the panels lie. */
    List<Frame> paint(Picture picture, double width, double height) {
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
        g.setColor(theme.ground());
        g.fill(new Rectangle2D.Double(0, 0, width, height));
        if (!picture.title().isEmpty()) {
            g.setColor(theme.color(Tone.INK));
            g.setFont(measures.textFont());
            Lettering.draw(g, picture.title(), g.getFont(), measures.gap() / 2, measures.text());
        }
        List<Frame> frames = PageLayout.of(picture, measures, width, height);
        frames.forEach(this::panel);
        return frames;
    }

    private void panel(Frame frame) {
        words(frame);
        grid(frame);
        java.awt.Shape before = g.getClip();
        Rectangle2D plot = frame.plot();
        double spill = measures.radius();
        g.clip(new Rectangle2D.Double(
                plot.getX() - spill, plot.getY() - spill, plot.getWidth() + 2 * spill, plot.getHeight() + 2 * spill));
        LayerPainter painter = new LayerPainter(g, theme, measures, frame);
        frame.panel().layers().forEach(painter::paint);
        g.setClip(before);
        axes(frame);
    }

    private void words(Frame frame) {
        g.setFont(measures.smallFont());
        g.setColor(theme.color(Tone.INK_SECOND));
        double y = frame.top() + measures.small();
        y = line(Words.heading(frame.panel()), frame.left(), y);
        for (List<Layer> layers : frame.legend()) {
            double x = frame.left();
            for (Layer layer : layers) {
                sample(layer, x, y - 0.35 * measures.small());
                g.setColor(theme.color(Tone.INK_SECOND));
                g.setFont(measures.smallFont());
                Lettering.draw(g, layer.name(), g.getFont(), x + 5 * measures.gap(), y);
                x += Words.legendWidth(layer, measures);
            }
            y += measures.smallLine();
        }
        line(Words.ordinate(frame.panel(), frame.yTicks().exponent()), frame.left(), y);
    }

    private double line(String text, double x, double y) {
        if (text.isEmpty()) {
            return y;
        }
        Lettering.draw(g, text, g.getFont(), x, y);
        return y + measures.smallLine();
    }

    private void sample(Layer layer, double x, double y) {
        double width = 4 * measures.gap();
        g.setColor(theme.color(layer.tone()));
        if (layer instanceof Layer.Points points) {
            PointShapes.draw(g, points.shape(), x + width / 2, y, measures.radius(), theme.ground());
        } else if (layer instanceof Layer.Sticks) {
            PointShapes.draw(g, Shape.DOT, x + width / 2, y, 0.6 * measures.radius(), theme.ground());
        } else if (layer instanceof Layer.Band) {
            g.setColor(theme.band(layer.tone()));
            g.fill(new Rectangle2D.Double(x, y - measures.small() / 3, width, measures.small() / 1.5));
        } else {
            Stroke stroke = layer instanceof Layer.Curve curve
                    ? curve.stroke()
                    : layer instanceof Layer.Ruler ruler ? ruler.stroke() : Stroke.SOLID;
            g.setStroke(measures.stroke(stroke, measures.line()));
            g.draw(new Line2D.Double(x, y, x + width, y));
        }
    }

    private void grid(Frame frame) {
        g.setColor(theme.hair());
        g.setStroke(measures.stroke(Stroke.SOLID, measures.hair()));
        for (double value : frame.yTicks().values()) {
            double y = snap(frame.y().place(value));
            g.draw(new Line2D.Double(frame.plot().getMinX(), y, frame.plot().getMaxX(), y));
        }
    }

    private void axes(Frame frame) {
        Rectangle2D plot = frame.plot();
        double left = snap(plot.getMinX());
        double foot = snap(plot.getMaxY());
        g.setColor(theme.rule());
        g.setStroke(measures.stroke(Stroke.SOLID, measures.hair()));
        g.draw(new Line2D.Double(left, plot.getMinY(), left, foot));
        if (frame.ownsX()) {
            g.draw(new Line2D.Double(left, foot, plot.getMaxX(), foot));
            for (double value : frame.xTicks().values()) {
                double x = snap(frame.x().place(value));
                g.draw(new Line2D.Double(x, foot, x, foot + 0.6 * measures.gap()));
            }
        }
        tickLabels(frame, foot);
    }

    private void tickLabels(Frame frame, double foot) {
        g.setFont(measures.smallFont());
        g.setColor(theme.color(Tone.INK_SECOND));
        for (int i = 0; i < frame.yTicks().values().length; i++) {
            String label = frame.yTicks().labels().get(i);
            double right = frame.plot().getMinX() - measures.gap();
            double y = frame.y().place(frame.yTicks().values()[i]) + 0.35 * measures.small();
            Lettering.draw(g, label, g.getFont(), right - Lettering.width(label, g.getFont()), y);
        }
        if (!frame.ownsX()) {
            return;
        }
        double base = foot + measures.gap() + measures.small();
        for (int i = 0; i < frame.xTicks().values().length; i++) {
            String label = frame.xTicks().labels().get(i);
            double x = frame.x().place(frame.xTicks().values()[i]);
            double half = Lettering.width(label, g.getFont()) / 2;
            double middle = Math.min(x, frame.plot().getMaxX() + 2 * measures.gap() - half);
            Lettering.draw(g, label, g.getFont(), middle - half, base);
        }
        String label = Words.abscissa(frame.panel(), frame.xTicks().exponent());
        double x = frame.plot().getMaxX() - Lettering.width(label, g.getFont());
        Lettering.draw(g, label, g.getFont(), x, base + measures.smallLine());
    }

    /** On a screen of whole pixels a hairline lies in the middle of one. */
    private double snap(double place) {
        return measures.hair() == 1 ? Math.floor(place) + 0.5 : place;
    }
}
