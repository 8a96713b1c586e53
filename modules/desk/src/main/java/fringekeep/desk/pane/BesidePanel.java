package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.pane.RecordPage.Beside;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;

/** Facts of the record whose drawing stands at the left: its label, its mark, its numbers. */
@SuppressWarnings("serial")
final class BesidePanel extends Painted {
    /** Width. */
    static final int WIDTH = 196;

    private final transient Beside beside;

    BesidePanel(Beside beside, Runnable follow) {
        this.beside = beside;
        setName("beside " + beside.label());
        setCursor(Cursor.getPredefinedCursor(Cursor.HAND_CURSOR));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                if (event.getY() < 24) {
                    follow.run();
                }
            }
        });
        getAccessibleContext().setAccessibleName(beside.label());
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(WIDTH, 26 + 22 * beside.facts().size());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double x = pen.text(beside.label(), Type.GROUP, Ink.INK, 0, 15) + 6;
            if (beside.mark().isPresent()) {
                beside.mark().get().paint(pen.graphics(), x, 4, 12);
                pen.text(beside.word(), Type.SMALL, Ink.INK2, x + 16, 15);
            }
            pen.level(Ink.RULE, 0, getWidth(), 23);
            double y = 24;
            for (Fact fact : beside.facts()) {
                String name = fact.unit().isEmpty() ? fact.name() : fact.name() + " / " + fact.unit();
                String value = Pen.shortened(fact.value(), Type.BODY, getWidth() - 50.0);
                double width = Lettering.width(value, Type.BODY);
                pen.fitted(name, Type.BODY, Ink.INK2, 0, y + 15, getWidth() - width - 8);
                pen.textEndingAt(value, Type.BODY, Ink.INK, getWidth(), y + 15);
                pen.level(Ink.HAIR, 0, getWidth(), y + 21);
                y += 22;
            }
        }
    }
}
