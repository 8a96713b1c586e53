package fringekeep.desk.form;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Pen;
import java.awt.Component;
import java.awt.Graphics;
import java.awt.Insets;
import javax.swing.border.AbstractBorder;

/** The frame of a text field: thin, or 2 px where it has the focus. */
final class FieldFrame extends AbstractBorder {
    private static final long serialVersionUID = 1L;

    @Override
    public void paintBorder(Component component, Graphics graphics, int x, int y, int width, int height) {
        try (Pen pen = new Pen(graphics)) {
            if (component.isFocusOwner()) {
                pen.focus(x, y, width, height);
            } else {
                pen.graphics().setColor(Ink.RULE.color());
                pen.graphics().draw(new java.awt.geom.Rectangle2D.Double(x + 0.5, y + 0.5, width - 1.0, height - 1.0));
            }
        }
    }

    @Override
    public Insets getBorderInsets(Component component, Insets insets) {
        insets.set(2, 6, 2, 4);
        return insets;
    }
}
