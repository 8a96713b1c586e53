package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.stage.KeyLine;
import java.awt.Graphics;
import java.util.ArrayList;
import java.util.List;

/** What F1 shows: every key of the program. */
@SuppressWarnings("serial")
final class KeysSheet extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", KeysSheet.class);

    private final transient List<String[]> rows = new ArrayList<>();

    KeysSheet() {
        setFocusable(true);
        for (int i = 1; !TEXTS.orElse("keys." + i, "").isEmpty(); i++) {
            rows.add(TEXTS.of("keys." + i).split("\\|", 2));
        }
        add(List.of());
    }

    /** Adds the keys of stages. */
    void add(List<KeyLine> lines) {
        for (KeyLine line : lines) {
            rows.add(line.key().isEmpty() ? new String[] {line.words()} : new String[] {line.key(), line.words()});
        }
        StringBuilder words = new StringBuilder();
        for (String[] row : rows) {
            words.append(row[0].strip())
                    .append(": ")
                    .append(row[row.length - 1].strip())
                    .append("; ");
        }
        getAccessibleContext().setAccessibleName(TEXTS.of("keys"));
        getAccessibleContext().setAccessibleDescription(words.toString());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.text(TEXTS.of("keys"), Type.TITLE, Ink.INK, 16, 32);
            pen.text(TEXTS.of("keys.back"), Type.SMALL, Ink.INK2, 16, 52);
            int columns = getWidth() > 1000 ? 2 : 1;
            int each = (rows.size() + columns - 1) / columns;
            double width = Math.min(560, (getWidth() - 16.0 * (columns + 1)) / columns);
            for (int i = 0; i < rows.size(); i++) {
                double x = 16 + i / each * (width + 32);
                double y = 70 + i % each * 23.0;
                String[] row = rows.get(i);
                if (row.length == 1) {
                    pen.text(row[0].strip(), Type.GROUP, Ink.INK, x, y + 16);
                    pen.level(Ink.RULE, x, x + width, y + 22);
                } else {
                    pen.fitted(row[0].strip(), Type.MONO, Ink.INK, x, y + 16, 170);
                    pen.fitted(row[1].strip(), Type.BODY, Ink.INK2, x + 180, y + 16, width - 180);
                    pen.level(Ink.HAIR, x, x + width, y + 22);
                }
            }
        }
    }
}
