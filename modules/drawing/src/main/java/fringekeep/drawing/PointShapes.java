package fringekeep.drawing;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;

/** Draws the shape of a measured point. */
final class PointShapes {
    private PointShapes() {}

    static void draw(Graphics2D g, Shape shape, double x, double y, double r, Color ground) {
        g.setStroke(new BasicStroke((float) (r * 0.45)));
        switch (shape) {
            case DOT -> g.fill(new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r));
            case CIRCLE -> open(g, new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r), ground);
            case SQUARE -> g.fill(new Rectangle2D.Double(x - 0.9 * r, y - 0.9 * r, 1.8 * r, 1.8 * r));
            case TRIANGLE -> g.fill(polygon(x, y - 1.2 * r, x + 1.1 * r, y + 0.8 * r, x - 1.1 * r, y + 0.8 * r));
            case CROSS -> {
                g.draw(polyline(x - r, y - r, x + r, y + r));
                g.draw(polyline(x - r, y + r, x + r, y - r));
            }
            case LOZENGE -> g.fill(polygon(x - 1.2 * r, y, x, y - 1.2 * r, x + 1.2 * r, y, x, y + 1.2 * r));
            case BAR -> g.fill(new Rectangle2D.Double(x - 0.5 * r, y - 1.9 * r, r, 3.8 * r));
            case STRUCK -> {
                open(g, new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r), ground);
                g.draw(polyline(x - 1.4 * r, y + 1.4 * r, x + 1.4 * r, y - 1.4 * r));
            }
        }
    }

    private static void open(Graphics2D g, java.awt.Shape outline, Color ground) {
        Color ink = g.getColor();
        g.setColor(ground);
        g.fill(outline);
        g.setColor(ink);
        g.draw(outline);
    }

    private static Path2D polygon(double... xy) {
        Path2D path = polyline(xy);
        path.closePath();
        return path;
    }

    private static Path2D polyline(double... xy) {
        Path2D path = new Path2D.Double();
        path.moveTo(xy[0], xy[1]);
        for (int i = 2; i < xy.length; i += 2) {
            path.lineTo(xy[i], xy[i + 1]);
        }
        return path;
    }
}
