package fringekeep.desk.pane;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.pane.RecordPage.Attached;
import fringekeep.desk.pane.RecordPage.Note;
import fringekeep.drawing.Lettering;
import java.awt.Cursor;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Point;
import java.awt.Rectangle;
import java.awt.event.ActionEvent;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.ArrayList;
import java.util.List;
import javax.swing.AbstractAction;
import javax.swing.KeyStroke;

/** Judgements and notes that speak of the record, with their files: open or save, by mouse or with ↑ ↓, Enter and S. */
@SuppressWarnings("serial")
final class NotesPanel extends Painted implements FactColumn {
    private static final Texts TEXTS = new Texts("fringekeep.desk.pane.Texts", NotesPanel.class);
    private static final int LINE = 16;
    private static final int MOST = 4;

    private final transient List<Note> notes;
    private final transient PaneEar ear;
    private final transient List<Word> words = new ArrayList<>();
    private int chosen;

    private record Word(Rectangle place, Runnable work) {}

    NotesPanel(List<Note> notes, PaneEar ear) {
        this.notes = List.copyOf(notes);
        this.ear = ear;
        setName("notes");
        setFocusable(true);
        StringBuilder spoken = new StringBuilder();
        notes.forEach(note ->
                spoken.append(note.text()).append(", ").append(note.small()).append("; "));
        getAccessibleContext().setAccessibleName(TEXTS.of("notes"));
        getAccessibleContext().setAccessibleDescription(spoken.toString());
        MouseAdapter mouse = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                requestFocusInWindow();
                pressed(event.getPoint());
            }

            @Override
            public void mouseMoved(MouseEvent event) {
                boolean over = words.stream().anyMatch(word -> word.place().contains(event.getPoint()));
                setCursor(Cursor.getPredefinedCursor(over ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        };
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
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
        key("DOWN", () -> choose(chosen + 1));
        key("UP", () -> choose(chosen - 1));
        key("ENTER", () -> files().stream().skip(chosen).findFirst().ifPresent(ear::open));
        key("S", () -> files().stream().skip(chosen).findFirst().ifPresent(ear::save));
    }

    private void key(String stroke, Runnable work) {
        getInputMap().put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    private List<Attached> files() {
        return notes.stream().flatMap(note -> note.files().stream()).toList();
    }

    private void choose(int file) {
        chosen = Math.max(0, Math.min(files().size() - 1, file));
        repaint();
    }

    private void pressed(Point at) {
        words.stream()
                .filter(word -> word.place().contains(at))
                .findFirst()
                .ifPresent(word -> word.work().run());
    }

    private static List<String> small(Note note, int width) {
        return Lines.of(note.small(), Type.SMALL, width, MOST);
    }

    @Override
    public int heightIn(int width) {
        int height = 24;
        for (Note note : notes) {
            height += 22
                    + LINE * small(note, width).size()
                    + 6
                    + 20 * note.files().size();
        }
        return height + 12;
    }

    @Override
    public boolean wide() {
        return false;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(224, heightIn(Math.max(200, getWidth())));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        words.clear();
        int width = getWidth();
        try (Pen pen = new Pen(graphics)) {
            pen.text(TEXTS.of("notes"), Type.HEAD, Ink.INK, 0, 16);
            pen.level(Ink.RULE, 0, width, 23);
            int y = 24;
            int file = 0;
            for (Note note : notes) {
                y = note(pen, note, y, width);
                for (Attached one : note.files()) {
                    file(pen, one, y, width, isFocusOwner() && file == chosen);
                    y += 20;
                    file++;
                }
                pen.level(Ink.HAIR, 0, width, y + 3.0);
                y += 6;
            }
        }
    }

    private int note(Pen pen, Note note, int top, int width) {
        double x = 0;
        if (note.mark().isPresent()) {
            note.mark().get().paint(pen.graphics(), 0, top + 5, 12);
            x = 16;
        }
        double end = pen.fitted(note.text(), Type.BODY, Ink.INK, x, top + 15.0, width - x);
        Hash record = note.record();
        words.add(new Word(new Rectangle(0, top, (int) end, 20), () -> ear.follow(List.of(record))));
        int y = top + 22;
        for (String line : small(note, width)) {
            pen.text(line, Type.SMALL, Ink.INK2, 0, y + 11.0);
            y += LINE;
        }
        return y;
    }

    private void file(Pen pen, Attached file, int y, int width, boolean focused) {
        String save = TEXTS.of("file.save");
        String open = TEXTS.of("file.open");
        double saveAt = width - Lettering.width(save, Type.SMALL);
        double openAt = saveAt - 12 - Lettering.width(open, Type.SMALL);
        pen.fitted(file.name(), Type.MONO, Ink.INK, 0, y + 14.0, openAt - 8);
        word(pen, open, openAt, y, () -> ear.open(file));
        word(pen, save, saveAt, y, () -> ear.save(file));
        if (focused) {
            pen.focus(-1, y, width + 2.0, 20);
        }
    }

    private void word(Pen pen, String text, double x, int y, Runnable work) {
        double end = pen.text(text, Type.SMALL, Ink.INK, x, y + 14.0);
        pen.level(Ink.INK2, x, end, y + 16.0);
        words.add(new Word(new Rectangle((int) x - 3, y, (int) (end - x) + 6, 20), work));
    }
}
