package fringekeep.desk.form;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Font;
import java.awt.Graphics;
import java.awt.Rectangle;

/** Paints the rows of a form. */
final class FormPainter {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormPainter.class);

    private final FormLayout layout;

    FormPainter(FormLayout layout) {
        this.layout = layout;
    }

    /** Paints the rows in the clip; the row in hand is framed where it has no field of its own. */
    void paint(Graphics graphics, int inHand, boolean focused, boolean typing) {
        Rectangle clip = graphics.getClipBounds();
        try (Pen pen = new Pen(graphics)) {
            for (int i = 0; i < layout.rows().size(); i++) {
                Rectangle bounds = layout.bounds(i);
                if (bounds.y + bounds.height >= clip.y && bounds.y <= clip.y + clip.height) {
                    row(pen, i, bounds, i == inHand && typing);
                    if (i == inHand && !typing && focused) {
                        pen.focus(0, bounds.y, bounds.width, bounds.height);
                    }
                }
            }
        }
    }

    private void row(Pen pen, int index, Rectangle bounds, boolean typing) {
        FormRow row = layout.rows().get(index);
        double base = bounds.y + 15.0;
        switch (row.sort()) {
            case HEAD -> head(pen, row, bounds);
            case FIELD -> field(pen, row, base, typing);
            case ITEM -> item(pen, row, base);
            case ADD, MORE -> more(pen, row, base, typing);
            case PROBLEM -> problem(pen, row, base);
            case QUESTION -> question(pen, index, row, base);
        }
        boolean follows =
                index + 1 < layout.rows().size() && belongs(layout.rows().get(index + 1));
        if (row.sort() != FormRow.Sort.HEAD && !follows) {
            pen.level(Ink.HAIR, 0, layout.end(), bounds.y + bounds.height - 1.0);
        }
        if (bar(index)) {
            pen.fill(Ink.STRONG.color(), 0, bounds.y, 3, bounds.height);
        }
    }

    private static boolean belongs(FormRow row) {
        return row.sort() == FormRow.Sort.QUESTION || row.sort() == FormRow.Sort.PROBLEM;
    }

    /** Changed rows have a bar, and what is said about them too. */
    private boolean bar(int index) {
        int i = index;
        while (i > 0 && belongs(layout.rows().get(i))) {
            i--;
        }
        return layout.rows().get(i).changed();
    }

    private void head(Pen pen, FormRow row, Rectangle bounds) {
        double base = bounds.y + bounds.height - 9.0;
        double end = pen.text(row.label(), Type.GROUP, Ink.INK, layout.label(row), base);
        if (!row.words().isEmpty()) {
            pen.fitted(row.words(), Type.SMALL, Ink.INK2, Math.max(end + 12, layout.now()), base, layout.end() - end);
        }
        pen.level(Ink.RULE, layout.label(row) - 12, layout.end(), bounds.y + bounds.height - 1.0);
    }

    private void field(Pen pen, FormRow row, double base, boolean typing) {
        Font label = row.changed() ? Type.GROUP : Type.BODY;
        pen.fitted(row.label(), label, Ink.INK, layout.label(row), base, layout.now() - 14 - layout.label(row));
        boolean reference =
                row.leaf().filter(leaf -> leaf.sort() == Asked.Sort.RECORD).isPresent();
        double si = row.si().isEmpty() ? layout.before() - 16 : layout.siEnd() - Lettering.width(row.si(), Type.BODY);
        if (!typing) {
            now(pen, row, base, (reference || row.si().isEmpty() ? layout.before() - 16 : si - 8) - layout.now());
        }
        if (reference && !row.si().isEmpty()) {
            double after = Math.max(
                    layout.now() + 226, typing ? 0 : layout.now() + Lettering.width(row.shown(), Type.MONO) + 20);
            pen.fitted(row.si(), Type.BODY, Ink.INK2, after, base, layout.before() - 16 - after);
        } else if (!row.si().isEmpty()) {
            pen.text(row.si(), Type.BODY, Ink.INK, si, base);
            pen.fitted(row.siUnit(), Type.BODY, Ink.INK2, layout.unit(), base, layout.before() - layout.unit() - 4);
        }
        compared(pen, row, base);
    }

    private void now(Pen pen, FormRow row, double base, double room) {
        if (FormLayout.tall(row)) {
            double y = base;
            for (String line : row.shown().split("\n", 3)) {
                pen.fitted(line.replace('\n', ' '), Type.MONO, Ink.INK, layout.now(), y, layout.end() - layout.now());
                y += 18;
            }
        } else {
            pen.fitted(row.shown(), Type.MONO, row.changed() ? Ink.INK : Ink.INK2, layout.now(), base, room);
        }
    }

    private void compared(Pen pen, FormRow row, double base) {
        if (!layout.compares()) {
            return;
        }
        double changeAt = layout.end() - (row.change().isEmpty() ? 0 : Lettering.width(row.change(), Type.BODY) + 18);
        pen.fitted(row.before(), Type.MONO, Ink.INK2, layout.before(), base, changeAt - layout.before() - 8);
        pen.textEndingAt(row.change(), Type.BODY, Ink.INK, layout.end(), base);
    }

    private void item(Pen pen, FormRow row, double base) {
        Font label = row.changed() ? Type.GROUP : Type.BODY;
        pen.text(row.label(), label, Ink.INK, layout.label(row), base);
        boolean open = row.words().equals(TEXTS.of("fold"));
        double room = layout.before() - 16 - layout.now();
        if (open) {
            pen.text(row.words(), Type.SMALL, Ink.INK3, layout.now(), base);
        } else {
            pen.fitted(row.shown(), Type.MONO, row.changed() ? Ink.INK : Ink.INK2, layout.now(), base, room);
        }
        compared(pen, row, base);
    }

    private void more(Pen pen, FormRow row, double base, boolean typing) {
        double x = layout.label(row);
        double end = pen.fitted(row.label(), Type.BODY, Ink.INK2, x, base, layout.now() - 14 - x);
        pen.fill(Ink.RULE.color(), x, base + 2.5, end - x, 1);
        if (!typing) {
            pen.fitted(row.words(), Type.BODY, Ink.INK3, layout.now(), base, layout.end() - layout.now());
        } else {
            pen.fitted(
                    row.words(), Type.SMALL, Ink.INK3, layout.siEnd() - 90, base, layout.end() - layout.siEnd() + 90);
        }
    }

    private void problem(Pen pen, FormRow row, double base) {
        Mark.DIFFERENT.paint(pen.graphics(), layout.now(), base - 10, 12);
        double x = layout.now() + 18;
        pen.fitted(row.words(), Type.BODY, Ink.INK, x, base, layout.end() - x);
    }

    private void question(Pen pen, int index, FormRow row, double base) {
        Mark.QUESTION.paint(pen.graphics(), layout.now(), base - 10.5, 12);
        pen.text(row.words(), Type.BODY, Ink.INK, layout.now() + 16, base);
        double[] places = layout.answers(index);
        for (int i = 0; i < row.answers().size(); i++) {
            pen.text(row.answers().get(i), Type.BODY, Ink.INK, places[2 * i], base);
            pen.fill(Ink.INK.color(), places[2 * i], base + 2.5, places[2 * i + 1] - places[2 * i], 1);
        }
    }
}
