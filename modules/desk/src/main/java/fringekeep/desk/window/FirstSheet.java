package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.Graphics;
import java.util.List;

/** What stands in the window while no archive is open: what the program is for, and the ways in. */
@SuppressWarnings("serial")
final class FirstSheet extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", FirstSheet.class);

    private final FirstPicture picture = new FirstPicture();
    private final WordButton attempt = new WordButton(TEXTS.of("first.try"), 'T', true);
    private final WordButton found = new WordButton(TEXTS.of("first.found"), 'F', false);
    private final WordButton open = new WordButton(TEXTS.of("first.open"), 'O', false);

    FirstSheet(Runnable tryInvented, Runnable openArchive, Runnable foundArchive) {
        attempt.addActionListener(event -> tryInvented.run());
        open.addActionListener(event -> openArchive.run());
        found.addActionListener(event -> foundArchive.run());
        setOpaque(true);
        setName("first");
        add(picture);
        for (WordButton button : List.of(attempt, found, open)) {
            button.setName("first " + button.getText());
            add(button);
        }
        getAccessibleContext().setAccessibleName(TEXTS.of("first.sentence.1") + " " + TEXTS.of("first.sentence.2"));
    }

    void focusFirst() {
        attempt.requestFocusInWindow();
    }

    private int left() {
        return Math.max(40, Math.min(112, getWidth() / 11));
    }

    @Override
    public void doLayout() {
        int left = left();
        picture.setBounds(left, 248, Math.min(1500, getWidth() - 2 * left), 216);
        int x = left;
        for (WordButton button : List.of(attempt, found, open)) {
            button.setBounds(x, 526, button.getPreferredSize().width, 38);
            x += button.getWidth() + 16;
        }
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
