package fringekeep.desk.chain;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import java.awt.Cursor;
import java.awt.Graphics;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import javax.accessibility.AccessibleRole;

/** The left cell of the strip: what is in view; opens the choice of it. */
@SuppressWarnings("serial")
final class ViewCell extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.chain.Texts", ViewCell.class);

    private String name = "";
    private String detail = "";
    private String selection = "";
    private boolean open;

    ViewCell(ChainListener listener) {
        setFocusable(true);
        setName("in view");
        setCursor(Cursor.getPredefinedCursor(Cursor.HAND_CURSOR));
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                listener.chooseView();
            }
        });
        addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent event) {
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                repaint();
            }
        });
        words();
    }

    void inView(String what, String more) {
        name = what;
        detail = more;
        words();
    }

    void linked(String number) {
        selection = number;
        words();
    }

    void open(boolean opened) {
        open = opened;
        repaint();
    }

    private void words() {
        getAccessibleContext().setAccessibleName(TEXTS.of("view.name", name, detail));
        setToolTipText(name + ", " + detail);
        repaint();
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double room = getWidth() - 20.0;
            int foot = getHeight();
            pen.fill(Ink.GROUND.color(), 0, 0, getWidth(), foot);
            double end = pen.text(TEXTS.of("view"), Type.SMALL, Ink.INK2, 16, 22);
            opens(pen, end + 5);
            pen.fitted(name, Type.VIEW, Ink.INK, 16, 41, room);
            pen.fitted(detail, Type.SMALL, Ink.INK2, 16, 56, room);
            String linked = selection.isEmpty() ? TEXTS.of("linked.none") : TEXTS.of("linked", selection);
            pen.fitted(linked, Type.SMALL, Ink.INK2, 16, foot - 13.0, room);
            pen.level(Ink.STRONG, 0, getWidth(), foot - 1.0);
            if (open) {
                pen.fill(Ink.STRONG.color(), 0, foot - 4.0, getWidth(), 4);
            }
            if (isFocusOwner()) {
                pen.focus(8, 6, getWidth() - 12.0, foot - 12.0);
            }
        }
    }

    private static void opens(Pen pen, double x) {
        pen.line(Ink.INK2, 1, x, 16, x + 3, 19);
        pen.line(Ink.INK2, 1, x + 3, 19, x + 6, 16);
    }

    @Override
    protected AccessibleRole role() {
        return AccessibleRole.PUSH_BUTTON;
    }
}
