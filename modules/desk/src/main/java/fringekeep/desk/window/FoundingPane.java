package fringekeep.desk.window;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.Component;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Function;
import java.util.stream.Stream;
import javax.swing.AbstractAction;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JTextField;
import javax.swing.KeyStroke;
import javax.swing.SwingUtilities;

/** Asks what a lab says when it founds its archive; each answer is checked where it stands. */
@SuppressWarnings("serial")
final class FoundingPane extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", FoundingPane.class);
    private static final int ROW = 62;
    private static final int TOP = 108;

    private final transient List<Row> rows = new ArrayList<>();
    private final JTextField title = new JTextField();
    private final JTextField person = new JTextField();
    private final JTextField boundary = new JTextField("06:00");
    private final JComboBox<String> zone =
            new JComboBox<>(ZoneId.getAvailableZoneIds().stream().sorted().toArray(String[]::new));
    private final JTextField folder = new JTextField();
    private final WordButton choose = WordButton.low(TEXTS.of("found.choose"), 'C', false);
    private final WordButton found = new WordButton(TEXTS.of("found.do"), 'F', true);
    private final WordButton cancel = new WordButton(TEXTS.of("cancel"), 'B', false);
    private final transient Consumer<Answers> then;

    /** What was asked. */
    record Answers(String title, String person, String dayBoundary, String zone, Path folder) {}

    /** One question: its words, its field, why an answer will not do, and a hint where it will. */
    private record Row(String words, JComponent field, Function<String, String> fault, String hint) {}

    FoundingPane(Consumer<Answers> then, Function<String, Optional<Path>> chooser, Runnable back) {
        this.then = then;
        setOpaque(true);
        setName("founding");
        zone.setEditable(true);
        zone.setSelectedItem(ZoneId.systemDefault().getId());
        row("title", title, FoundingPane::emptyFault);
        row("person", person, FoundingPane::emptyFault);
        row("boundary", boundary, FoundingPane::boundaryFault);
        row("zone", zone, FoundingPane::zoneFault);
        row("folder", folder, FoundingPane::folderFault);
        choose.addActionListener(event ->
                chooser.apply(TEXTS.of("found.folder.title")).ifPresent(path -> folder.setText(path.toString())));
        found.addActionListener(event -> tryIt());
        cancel.addActionListener(event -> back.run());
        add(choose);
        add(found);
        add(cancel);
        key("ENTER", this::nextOrFound);
        key("ctrl ENTER", this::tryIt);
        key("ESCAPE", back);
    }

    private void row(String key, JComponent field, Function<String, String> fault) {
        field.setFont(Type.BODY);
        field.setName("found " + key);
        field.getAccessibleContext().setAccessibleName(TEXTS.of("found." + key));
        rows.add(new Row(TEXTS.of("found." + key), field, fault, TEXTS.of("found." + key + ".hint")));
        add(field);
        if (field instanceof JTextField text) {
            text.getDocument().addDocumentListener((Typed) this::repaint);
        }
    }

    private void key(String stroke, Runnable work) {
        getInputMap(WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    void focusFirst() {
        title.requestFocusInWindow();
    }

    private void nextOrFound() {
        Component focus =
                java.awt.KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner();
        if (focus == null || SwingUtilities.isDescendingFrom(focus, folder)) {
            tryIt();
        } else {
            focus.transferFocus();
        }
    }

    private static String text(JComponent field) {
        return field instanceof JTextField text
                ? text.getText().strip()
                : String.valueOf(((JComboBox<?>) field).getEditor().getItem()).strip();
    }

    private void tryIt() {
        for (Row row : rows) {
            if (!row.fault().apply(text(row.field())).isEmpty()) {
                asked = true;
                repaint();
                row.field().requestFocusInWindow();
                return;
            }
        }
        then.accept(new Answers(text(title), text(person), text(boundary), text(zone), Path.of(text(folder))));
    }

    private boolean asked;

    private static String emptyFault(String text) {
        return text.isEmpty() ? TEXTS.of("found.empty") : "";
    }

    private static String boundaryFault(String text) {
        return text.matches("([01]\\d|2[0-3]):[0-5]\\d") ? "" : TEXTS.of("found.boundary.fault");
    }

    private static String zoneFault(String text) {
        return ZoneId.getAvailableZoneIds().contains(text) ? "" : TEXTS.of("found.zone.fault");
    }

    private static String folderFault(String text) {
        if (text.isEmpty()) {
            return TEXTS.of("found.empty");
        }
        try {
            return Path.of(text).isAbsolute() ? "" : TEXTS.of("found.folder.fault");
        } catch (InvalidPathException e) {
            return TEXTS.of("found.folder.fault");
        }
    }

    /** Whether a folder may become an archive: it is not there yet, or holds nothing. Asks the disk. */
    static boolean free(Path folder) {
        if (!Files.exists(folder)) {
            return true;
        }
        try (Stream<Path> inside = Files.list(folder)) {
            return inside.findAny().isEmpty();
        } catch (IOException e) {
            throw new UncheckedIOException("looking into " + folder, e);
        }
    }

    private int left() {
        return Math.max(40, Math.min(112, getWidth() / 11));
    }

    @Override
    public void doLayout() {
        int left = left();
        int y = TOP;
        for (Row row : rows) {
            boolean wide = row.field() == title || row.field() == folder;
            row.field().setBounds(left + 210, y, wide ? 420 : 240, 28);
            y += ROW;
        }
        choose.setBounds(left + 210 + 430, y - ROW, choose.getPreferredSize().width, 28);
        found.setBounds(left + 210, y + 4, found.getPreferredSize().width, 38);
        cancel.setBounds(left + 226 + found.getWidth(), y + 4, cancel.getPreferredSize().width, 38);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.level(Ink.STRONG, 0, getWidth(), 0);
            int left = left();
            pen.text(TEXTS.of("found.heading"), Type.TITLE, Ink.INK, left, 48);
            pen.text(TEXTS.of("found.sentence"), Type.BODY, Ink.INK2, left, 74);
            int y = TOP;
            for (Row row : rows) {
                pen.text(row.words(), Type.BODY, Ink.INK, left, y + 19.0);
                String fault = row.fault().apply(text(row.field()));
                boolean wrong = !fault.isEmpty() && (asked || !text(row.field()).isEmpty());
                if (wrong) {
                    fringekeep.desk.look.Mark.QUESTION.paint(pen.graphics(), left + 210.0, y + 33.0, 11);
                }
                pen.text(
                        wrong ? fault : row.hint(),
                        Type.SMALL,
                        wrong ? Ink.INK : Ink.INK2,
                        left + (wrong ? 226.0 : 210.0),
                        y + 43.0);
                y += ROW;
            }
        }
    }

    /** Any change of what is typed. */
    private interface Typed extends javax.swing.event.DocumentListener {
        void typed();

        @Override
        default void insertUpdate(javax.swing.event.DocumentEvent event) {
            typed();
        }

        @Override
        default void removeUpdate(javax.swing.event.DocumentEvent event) {
            typed();
        }

        @Override
        default void changedUpdate(javax.swing.event.DocumentEvent event) {
            typed();
        }
    }
}
