package fringekeep.desk.form;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Font;
import java.awt.Graphics;
import javax.swing.JButton;

/** Words that can be pressed: a letter underlined, or a bar below those that are chosen. */
@SuppressWarnings("serial")
final class WordLink extends JButton {
    private final String detail;
    private boolean chosen;

    /** Words to press, with further words behind them in a second ink. */
    WordLink(String words, String detail, char mnemonic) {
        super(words);
        this.detail = detail;
        setMnemonic(mnemonic);
        setBorderPainted(false);
        setContentAreaFilled(false);
        setFocusPainted(false);
        setCursor(Cursor.getPredefinedCursor(Cursor.HAND_CURSOR));
        getAccessibleContext().setAccessibleName((words + " " + detail).strip());
    }

    void choose(boolean now) {
        chosen = now;
        getAccessibleContext().setAccessibleDescription(now ? "chosen" : "");
        repaint();
    }

    boolean chosen() {
        return chosen;
    }

    private Font font() {
        return chosen ? Type.GROUP : Type.BODY;
    }

    @Override
    public Dimension getPreferredSize() {
        double more = detail.isEmpty() ? 0 : Lettering.width(" " + detail, Type.BODY);
        return new Dimension((int) Math.ceil(Lettering.width(getText(), Type.GROUP) + more) + 2, 30);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double end = pen.text(getText(), font(), isEnabled() ? Ink.INK : Ink.INK3, 0, 17);
            int at = getDisplayedMnemonicIndex();
            if (at >= 0) {
                double from = Lettering.width(getText().substring(0, at), font());
                double wide = Lettering.width(getText().substring(at, at + 1), font());
                pen.fill(Ink.INK.color(), from, 19.5, wide, 1);
            }
            if (!detail.isEmpty()) {
                end = pen.text(" " + detail, Type.BODY, Ink.INK2, end, 17);
            }
            if (chosen) {
                pen.fill(Ink.STRONG.color(), 0, 27, end, 3);
            }
            if (isFocusOwner()) {
                pen.focus(0, 1, end, 24);
            }
        }
    }
}
