package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.BasicStroke;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;

/** The chain in seven small drawings, from compound to printed number, with the way back below. */
@SuppressWarnings("serial")
final class FirstPicture extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", FirstPicture.class);
    private static final int STAGES = 7;

    FirstPicture() {
        getAccessibleContext().setAccessibleName(TEXTS.of("first.chain"));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            Graphics2D g = pen.graphics();
            double room = (double) getWidth() / STAGES;
            pen.level(Ink.RULE, 0, getWidth(), 122);
            for (int i = 0; i < STAGES; i++) {
                double x = (i + 0.5) * room;
                pen.fill(Ink.STRONG.color(), x - 0.75, 117, 1.5, 11);
                centred(pen, TEXTS.of("first." + (i + 1)), Type.VIEW, Ink.INK, x, 150);
                centred(pen, TEXTS.of("first." + (i + 1) + ".detail"), Type.BODY, Ink.INK2, x, 169);
                stage(g, i, x);
            }
            wayBack(pen, g, 0.5 * room, (STAGES - 0.5) * room);
        }
    }

    private static void centred(Pen pen, String text, java.awt.Font font, Ink ink, double x, double y) {
        pen.text(text, font, ink, x - Lettering.width(text, font) / 2, y);
    }

    private static void stage(Graphics2D g, int i, double x) {
        switch (i) {
            case 0 -> molecule(g, x, 52);
            case 1 -> gratings(g, x);
            case 2 -> source(g, x);
            case 3 -> bars(g, x);
            case 4 -> fringe(g, x);
            case 5 -> models(g, x);
            default -> printed(g, x);
        }
    }

    private static void ink(Graphics2D g, Ink ink, double width) {
        g.setColor(ink.color());
        g.setStroke(new BasicStroke((float) width));
    }

    private static void molecule(Graphics2D g, double x, double y) {
        ink(g, Ink.INK, 1.3);
        double r = 26;
        for (int i = 0; i < 6; i++) {
            double a = Math.PI / 3 * i + Math.PI / 6;
            double b = a + Math.PI / 3;
            g.draw(new Line2D.Double(
                    x + r * Math.cos(a), y + r * Math.sin(a), x + r * Math.cos(b), y + r * Math.sin(b)));
        }
        for (int i = 0; i < 3; i++) {
            double a = Math.PI * 2 / 3 * i - Math.PI / 2;
            g.draw(new Line2D.Double(
                    x + r * Math.cos(a), y + r * Math.sin(a), x + 44 * Math.cos(a), y + 44 * Math.sin(a)));
        }
        for (int i = 0; i < 6; i++) {
            double a = Math.PI / 3 * i + Math.PI / 6;
            Ellipse2D atom = new Ellipse2D.Double(x + r * Math.cos(a) - 4, y + r * Math.sin(a) - 4, 8, 8);
            g.setColor(Ink.SHEET.color());
            g.fill(atom);
            ink(g, Ink.INK, 1.3);
            g.draw(atom);
        }
    }

    private static void gratings(Graphics2D g, double x) {
        g.setColor(Ink.INK.color());
        g.setStroke(new BasicStroke(3, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10, new float[] {7, 3}, 0));
        g.draw(new Line2D.Double(x - 42, 0, x - 42, 102));
        g.draw(new Line2D.Double(x + 42, 0, x + 42, 102));
        ink(g, Ink.QUANTUM, 1.8);
        Path2D wave = new Path2D.Double();
        wave.moveTo(x, 0);
        for (int y = 1; y <= 98; y++) {
            wave.lineTo(x + 3.5 * Math.sin(y / 4.0), y);
        }
        g.draw(wave);
    }

    private static void source(Graphics2D g, double x) {
        ink(g, Ink.INK, 1.3);
        Path2D oven = new Path2D.Double();
        double[][] corners = {{-46, 26}, {-12, 26}, {-12, 46}, {-4, 46}, {-4, 58}, {-12, 58}, {-12, 78}, {-46, 78}};
        oven.moveTo(x + corners[0][0], corners[0][1]);
        for (double[] corner : corners) {
            oven.lineTo(x + corner[0], corner[1]);
        }
        oven.closePath();
        g.draw(oven);
        double[] heights = {52, 50, 53, 49, 53, 55, 48};
        for (int i = 0; i < heights.length; i++) {
            g.fill(new Ellipse2D.Double(x + 2 + 7.5 * i, heights[i] - 2, 4.4, 4.4));
        }
    }

    private static void bars(Graphics2D g, double x) {
        g.setColor(Ink.INK.color());
        for (int i = 0; i < 19; i++) {
            double height = 66 + 34 * Math.cos((i - 6) * Math.PI / 4.5) - (i < 3 ? 6 : 0);
            g.fill(new Rectangle2D.Double(x - 51 + 5.6 * i, 108 - height, 2.6, height));
        }
    }

    private static void fringe(Graphics2D g, double x) {
        ink(g, Ink.QUANTUM, 1.6);
        Path2D line = new Path2D.Double();
        line.moveTo(x - 50, 60);
        for (int i = 0; i <= 100; i++) {
            line.lineTo(x - 50 + i, 46 + 25 * Math.sin((i - 8) / 8.2 + Math.PI));
        }
        g.draw(line);
        g.setColor(Ink.INK.color());
        for (int i = 0; i <= 100; i += 6) {
            double y = 46 + 25 * Math.sin((i - 8) / 8.2 + Math.PI) + 5 * Math.sin(i * 7.0);
            g.fill(new Ellipse2D.Double(x - 52.4 + i, y - 2.4, 4.8, 4.8));
        }
    }

    private static void models(Graphics2D g, double x) {
        curve(g, x, 88, Ink.QUANTUM, false);
        curve(g, x, 44, Ink.CLASSICAL, true);
    }

    private static void curve(Graphics2D g, double x, double period, Ink ink, boolean dashed) {
        g.setColor(ink.color());
        g.setStroke(
                dashed
                        ? new BasicStroke(1.6f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, new float[] {5, 3}, 0)
                        : new BasicStroke(1.6f));
        Path2D path = new Path2D.Double();
        path.moveTo(x - 50, 108);
        for (int i = 0; i <= 100; i++) {
            double decay = 1 - i / 160.0;
            path.lineTo(x - 50 + i, 108 - 90 * decay * Math.abs(Math.sin(i * Math.PI / period)));
        }
        g.draw(path);
    }

    private static void printed(Graphics2D g, double x) {
        ink(g, Ink.INK, 1.3);
        g.draw(new Rectangle2D.Double(x - 48, 4, 96, 96));
        double[][] points = {{-30, 68}, {0, 38}, {30, 54}};
        for (double[] point : points) {
            g.fill(new Ellipse2D.Double(x + point[0] - 3.5, point[1] - 3.5, 7, 7));
            g.draw(new Line2D.Double(x + point[0], point[1] - 9, x + point[0], point[1] + 9));
        }
    }

    private static void wayBack(Pen pen, Graphics2D g, double left, double right) {
        String words = TEXTS.of("first.back");
        double middle = (left + right) / 2;
        double half = Lettering.width(words, Type.BODY) / 2 + 28;
        ink(g, Ink.QUANTUM, 1.6);
        g.draw(new Line2D.Double(left, 206, middle - half, 206));
        g.draw(new Line2D.Double(middle + half, 206, right, 206));
        g.draw(new Line2D.Double(right, 206, right, 194));
        g.draw(new Line2D.Double(left, 206, left + 9, 201));
        g.draw(new Line2D.Double(left, 206, left + 9, 211));
        centred(pen, words, Type.BODY, Ink.INK, middle, 210);
    }
}
