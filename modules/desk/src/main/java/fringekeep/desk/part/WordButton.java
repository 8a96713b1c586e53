package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.geom.RoundRectangle2D;
import javax.swing.JButton;

/** A button of the house: ink on the sheet with a hairline frame, or the one main button in reverse. */
@SuppressWarnings("serial")
public final class WordButton extends JButton {
    private final boolean main;
    private final boolean small;

    /** A button with a word; the main one of a sheet stands in reverse. */
    public WordButton(String text, char mnemonic, boolean main) {
        this(text, mnemonic, main, false);
    }

    private WordButton(String text, char mnemonic, boolean main, boolean small) {
        super(text);
        this.main = main;
        this.small = small;
        setMnemonic(mnemonic);
        setBorderPainted(false);
        setContentAreaFilled(false);
        setFocusPainted(false);
    }

    /** A button as high as a row of a form, for sheets full of rows. */
    public static WordButton low(String text, char mnemonic, boolean main) {
        return new WordButton(text, mnemonic, main, true);
    }

    private Font face() {
        return small ? main ? Type.BODY_MEDIUM : Type.BODY : Type.VIEW;
    }

    @Override
    public Dimension getPreferredSize() {
        int width = (int) Lettering.width(getText(), face());
        return small ? new Dimension(width + 26, 26) : new Dimension(width + 46, 38);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            RoundRectangle2D frame = new RoundRectangle2D.Double(0.5, 0.5, getWidth() - 1.0, getHeight() - 1.0, 3, 3);
            pen.graphics().setColor((main ? Ink.PRESS : Ink.SHEET).color());
            pen.graphics().fill(frame);
            pen.graphics().setColor((isFocusOwner() ? Ink.SELRULE : main ? Ink.PRESS : Ink.RULE).color());
            pen.graphics().draw(frame);
            Ink ink = !isEnabled() ? Ink.INK3 : main ? Ink.ONPRESS : Ink.INK;
            double x = (getWidth() - Lettering.width(getText(), face())) / 2;
            double y = getHeight() / 2.0 + 5;
            pen.text(getText(), face(), ink, x, y);
            int at = getDisplayedMnemonicIndex();
            if (at >= 0) {
                double from = x + Lettering.width(getText().substring(0, at), face());
                double under = Lettering.width(getText().substring(at, at + 1), face());
                pen.fill(ink.color(), from, y + 2.5, under, 1);
            }
            if (isFocusOwner()) {
                pen.focus(2, 2, getWidth() - 4.0, getHeight() - 4.0);
            }
        }
    }
}
