package fringekeep.desk.look;

import fringekeep.drawing.Lettering;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;

/** Draws text, rules and bars in the way of the house: hairlines on whole device pixels, text with raised digits. */
public final class Pen implements AutoCloseable {
    private final Graphics2D g;

    /** A pen on a copy of the graphics; close it after use. */
    public Pen(Graphics graphics) {
        g = (Graphics2D) graphics.create();
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
    }

    /** The graphics below. */
    public Graphics2D graphics() {
        return g;
    }

    /** Fills a rectangle. */
    public void fill(Color color, double x, double y, double width, double height) {
        g.setColor(color);
        g.fill(new Rectangle2D.Double(x, y, width, height));
    }

    /** A level hairline, one device pixel thick and snapped to one. */
    public void level(Ink ink, double x1, double x2, double y) {
        AffineTransform now = g.getTransform();
        double scale = now.getScaleY() == 0 ? 1 : now.getScaleY();
        double device = Math.floor(y * scale + now.getTranslateY());
        double snapped = (device - now.getTranslateY()) / scale;
        fill(ink.color(), x1, snapped, x2 - x1, Math.max(1, Math.rint(scale)) / scale);
    }

    /** An upright hairline, snapped likewise. */
    public void upright(Ink ink, double x, double y1, double y2) {
        AffineTransform now = g.getTransform();
        double scale = now.getScaleX() == 0 ? 1 : now.getScaleX();
        double device = Math.floor(x * scale + now.getTranslateX());
        double snapped = (device - now.getTranslateX()) / scale;
        fill(ink.color(), snapped, y1, Math.max(1, Math.rint(scale)) / scale, y2 - y1);
    }

    /** A line of any direction. */
    public void line(Ink ink, double width, double x1, double y1, double x2, double y2) {
        g.setColor(ink.color());
        g.setStroke(new BasicStroke((float) width));
        g.draw(new Line2D.Double(x1, y1, x2, y2));
    }

    /** Text at a baseline; answers where it ends. */
    public double text(String text, Font font, Ink ink, double x, double y) {
        g.setColor(ink.color());
        Lettering.draw(g, text, font, x, y);
        return x + Lettering.width(text, font);
    }

    /** Text that ends at a place. */
    public void textEndingAt(String text, Font font, Ink ink, double right, double y) {
        text(text, font, ink, right - Lettering.width(text, font), y);
    }

    /** Text shortened with three dots to a room. */
    public double fitted(String text, Font font, Ink ink, double x, double y, double room) {
        return text(shortened(text, font, room), font, ink, x, y);
    }

    /** The text, or as much of it as has room, with three dots. */
    public static String shortened(String text, Font font, double room) {
        if (Lettering.width(text, font) <= room) {
            return text;
        }
        int keep = text.length();
        while (keep > 0 && Lettering.width(text.substring(0, keep) + "\u2026", font) > room) {
            keep--;
        }
        return keep == 0 ? "" : text.substring(0, keep).stripTrailing() + "\u2026";
    }

    /** Strikes through a text drawn at a place. */
    public void strike(String text, Font font, Ink ink, double x, double y) {
        double height = y - 0.32 * font.getSize2D();
        line(ink, 1, x, height, x + Lettering.width(text, font), height);
    }

    /** The frame around what has the focus. */
    public void focus(double x, double y, double width, double height) {
        g.setColor(Ink.SELRULE.color());
        g.setStroke(new BasicStroke(2));
        g.draw(new Rectangle2D.Double(x + 1, y + 1, width - 2, height - 2));
    }

    @Override
    public void close() {
        g.dispose();
    }
}
