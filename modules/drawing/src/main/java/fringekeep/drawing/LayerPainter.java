package fringekeep.drawing;

import java.awt.Graphics2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;

/** Draws what lies between the axes of one panel; the caller has set the clip. */
final class LayerPainter {
    private final Graphics2D g;
    private final Theme theme;
    private final Measures measures;
    private final Frame frame;

    LayerPainter(Graphics2D g, Theme theme, Measures measures, Frame frame) {
        this.g = g;
        this.theme = theme;
        this.measures = measures;
        this.frame = frame;
    }

    void paint(Layer layer) {
        g.setColor(theme.color(layer.tone()));
        if (layer instanceof Layer.Points points) {
            points(points);
        } else if (layer instanceof Layer.Curve curve) {
            g.setStroke(measures.stroke(curve.stroke(), measures.line()));
            g.draw(path(curve.x(), curve.y()));
        } else if (layer instanceof Layer.Band band) {
            band(band);
        } else if (layer instanceof Layer.Sticks sticks) {
            sticks(sticks);
        } else if (layer instanceof Layer.Ruler ruler) {
            ruler(ruler);
        } else if (layer instanceof Layer.Words words) {
            words(words);
        } else {
            throw new AssertionError(layer);
        }
    }

    private void points(Layer.Points points) {
        for (int i = 0; i < points.x().length; i++) {
            double x = points.x()[i];
            double y = points.y()[i];
            if (!Double.isFinite(x) || !Double.isFinite(y) || !frame.x().holds(x)) {
                continue;
            }
            if (points.deviations().length > 0 && points.deviations()[i] > 0) {
                bar(x, y - points.deviations()[i], y + points.deviations()[i]);
            }
            PointShapes.draw(
                    g, points.shape(), frame.x().place(x), frame.y().placeNear(y), measures.radius(), theme.ground());
        }
    }

    private void bar(double x, double low, double high) {
        double at = frame.x().place(x);
        g.setStroke(measures.stroke(Stroke.SOLID, 1.2 * measures.hair()));
        g.draw(new Line2D.Double(at, frame.y().placeNear(low), at, frame.y().placeNear(high)));
    }

    private void band(Layer.Band band) {
        g.setColor(theme.band(band.tone()));
        int first = 0;
        while (first < band.x().length) {
            int end = first;
            while (end < band.x().length && whole(band, end)) {
                end++;
            }
            if (end - first > 1) {
                g.fill(area(band, first, end));
            }
            first = end + 1;
        }
    }

    private static boolean whole(Layer.Band band, int i) {
        return Double.isFinite(band.x()[i]) && Double.isFinite(band.lower()[i]) && Double.isFinite(band.upper()[i]);
    }

    private Path2D area(Layer.Band band, int first, int end) {
        double[] xs = band.x();
        double[] upper = band.upper();
        double[] lower = band.lower();
        Path2D area = new Path2D.Double();
        area.moveTo(frame.x().placeNear(xs[first]), frame.y().placeNear(upper[first]));
        for (int i = first + 1; i < end; i++) {
            area.lineTo(frame.x().placeNear(xs[i]), frame.y().placeNear(upper[i]));
        }
        for (int i = end - 1; i >= first; i--) {
            area.lineTo(frame.x().placeNear(xs[i]), frame.y().placeNear(lower[i]));
        }
        area.closePath();
        return area;
    }

    private void sticks(Layer.Sticks sticks) {
        double[] xs = sticks.x();
        double[] ys = sticks.y();
        double zero = frame.y().placeNear(0);
        for (int i = 0; i < xs.length; i++) {
            if (Double.isFinite(xs[i]) && Double.isFinite(ys[i]) && frame.x().holds(xs[i])) {
                double at = frame.x().place(xs[i]);
                double end = frame.y().placeNear(ys[i]);
                g.setStroke(measures.stroke(Stroke.SOLID, 1.2 * measures.hair()));
                g.draw(new Line2D.Double(at, zero, at, end));
                PointShapes.draw(g, Shape.DOT, at, end, 0.6 * measures.radius(), theme.ground());
            }
        }
    }

    private void ruler(Layer.Ruler ruler) {
        g.setStroke(measures.stroke(ruler.stroke(), 1.2 * measures.hair()));
        Scale scale = ruler.level() ? frame.y() : frame.x();
        if (!scale.holds(ruler.at())) {
            return;
        }
        double at = scale.place(ruler.at());
        g.draw(
                ruler.level()
                        ? new Line2D.Double(
                                frame.plot().getMinX(), at, frame.plot().getMaxX(), at)
                        : new Line2D.Double(
                                at, frame.plot().getMinY(), at, frame.plot().getMaxY()));
    }

    private void words(Layer.Words words) {
        g.setFont(measures.smallFont());
        double y = frame.y().placeNear(words.y());
        for (String line : words.lines()) {
            Lettering.draw(g, line, g.getFont(), frame.x().placeNear(words.x()), y);
            y += measures.smallLine();
        }
    }

    private Path2D path(double[] xs, double[] ys) {
        Path2D path = new Path2D.Double();
        boolean pen = false;
        for (int i = 0; i < xs.length; i++) {
            if (!Double.isFinite(xs[i]) || !Double.isFinite(ys[i])) {
                pen = false;
                continue;
            }
            double x = frame.x().placeNear(xs[i]);
            double y = frame.y().placeNear(ys[i]);
            if (pen) {
                path.lineTo(x, y);
            } else {
                path.moveTo(x, y);
                pen = true;
            }
        }
        return path;
    }
}
