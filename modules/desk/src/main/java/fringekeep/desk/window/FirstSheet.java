package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.Graphics;

/** What stands in the window while no archive is open: what the program is for, and the ways in. */
@SuppressWarnings("serial")
final class FirstSheet extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", FirstSheet.class);

    private final FirstPicture picture = new FirstPicture();
    private final WordButton open;
    private final WordButton found;

    FirstSheet(Runnable openArchive, Runnable foundArchive) {
        open = new WordButton(TEXTS.of("first.open"), 'O', true);
        found = new WordButton(TEXTS.of("first.found"), 'F', false);
        open.addActionListener(event -> openArchive.run());
        found.addActionListener(event -> foundArchive.run());
        setOpaque(true);
        add(picture);
        add(open);
        add(found);
    }

    void focusFirst() {
        open.requestFocusInWindow();
    }

    private int left() {
        return Math.max(40, Math.min(112, getWidth() / 11));
    }

    @Override
    public void doLayout() {
        int left = left();
        picture.setBounds(left, 248, Math.min(1500, getWidth() - 2 * left), 216);
        int y = 526;
        open.setBounds(left, y, open.getPreferredSize().width, 38);
        found.setBounds(left + open.getWidth() + 16, y, found.getPreferredSize().width, 38);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.level(Ink.STRONG, 0, getWidth(), 0);
            int left = left();
            pen.text(TEXTS.of("first.sentence.1"), Type.SENTENCE, Ink.INK, left, 113);
            pen.text(TEXTS.of("first.sentence.2"), Type.SENTENCE, Ink.INK, left, 147);
            pen.text(TEXTS.of("first.hint.1"), Type.BODY, Ink.INK2, left, 589);
            pen.text(TEXTS.of("first.hint.2"), Type.BODY, Ink.INK2, left, 607);
        }
    }
}
