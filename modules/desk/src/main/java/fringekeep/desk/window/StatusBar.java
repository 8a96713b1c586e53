package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;

/** The line at the foot of the window. */
@SuppressWarnings("serial")
final class StatusBar extends Painted {
    private transient List<String> left = List.of();
    private transient List<String> right = List.of();

    void show(List<String> first, List<String> last) {
        left = List.copyOf(first);
        right = List.copyOf(last);
        getAccessibleContext().setAccessibleName(String.join(", ", left) + "; " + String.join(", ", right));
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(400, 24);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.GROUND.color(), 0, 0, getWidth(), getHeight());
            pen.level(Ink.HAIR, 0, getWidth(), 0);
            double x = getWidth() - 16.0;
            for (int i = right.size() - 1; i >= 0; i--) {
                x -= Lettering.width(right.get(i), Type.SMALL);
                pen.text(right.get(i), Type.SMALL, Ink.INK2, x, 16);
                x -= 18;
            }
            double end = x;
            double at = 16;
            for (String text : left) {
                at = pen.fitted(text, Type.SMALL, Ink.INK2, at, 16, end - at) + 18;
            }
        }
    }
}
