package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.pane.RecordPage.Note;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.List;

/** Judgements and notes that speak of the record. */
@SuppressWarnings("serial")
final class NotesPanel extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", NotesPanel.class);

    private final transient List<Note> notes;

    NotesPanel(List<Note> notes) {
        this.notes = List.copyOf(notes);
        getAccessibleContext().setAccessibleName(TEXTS.of("notes"));
    }

    int height() {
        return 36 + 44 * notes.size();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(224, height());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.text(TEXTS.of("notes"), Type.HEAD, Ink.INK, 0, 16);
            pen.level(Ink.RULE, 0, getWidth(), 23);
            double y = 24;
            for (Note note : notes) {
                double x = 0;
                if (note.mark().isPresent()) {
                    note.mark().get().paint(pen.graphics(), 0, y + 5, 12);
                    x = 16;
                }
                pen.fitted(note.text(), Type.BODY, Ink.INK, x, y + 15, getWidth() - x);
                pen.level(Ink.HAIR, 0, getWidth(), y + 21);
                pen.fitted(note.small(), Type.SMALL, Ink.INK2, 0, y + 37, getWidth());
                pen.level(Ink.HAIR, 0, getWidth(), y + 43);
                y += 44;
            }
        }
    }
}
