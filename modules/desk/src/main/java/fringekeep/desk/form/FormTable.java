package fringekeep.desk.form;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Texts;
import java.awt.Container;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.awt.event.KeyAdapter;
import java.awt.event.KeyEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.util.List;
import java.util.Optional;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.JTextArea;
import javax.swing.JTextField;
import javax.swing.Scrollable;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;
import javax.swing.text.JTextComponent;

/**
 * The rows of a form: field, now, SI, before, change. One row is in hand; its field is a text field, all others are painted.
 * Values that are chosen or refer to records are taken over when the field is left, others with every letter.
 */
@SuppressWarnings("serial")
final class FormTable extends Painted implements Scrollable {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormTable.class);

    /** Who is told of what happens in the table. */
    interface Ear {
        /** Something was typed or chosen. */
        void changed();

        /** Another row is in hand. */
        void moved(FormRow row);

        /** What may be chosen in a row is asked for. */
        void asked(FormRow row);

        /** A file is asked for. */
        void file(FormRow row);

        /** The last row was left downwards, or the first one upwards. */
        void left(boolean downwards);
    }

    private final transient FormModel model;
    private final transient Ear ear;
    private final JTextField line = new JTextField();
    private final JTextArea words = new JTextArea();
    private final ChoiceList choices = new ChoiceList(this::take);
    private transient List<FormRow> rows;
    private transient FormLayout layout;
    private int at = -1;
    private boolean filling;
    private boolean late;

    FormTable(FormModel model, Ear ear) {
        this.model = model;
        this.ear = ear;
        this.rows = model.rows();
        this.layout = new FormLayout(rows, 1000, model.compared().isPresent());
        setName("form rows");
        setFocusable(true);
        setOpaque(true);
        editor(line, "form field");
        editor(words, "form words");
        words.setLineWrap(true);
        words.setWrapStyleWord(true);
        add(choices);
        add(line);
        add(words);
        keys(this);
        addMouseListener(new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                press(event.getX(), event.getY());
            }
        });
        refresh();
    }

    private void editor(JTextComponent field, String name) {
        field.setName(name);
        field.setVisible(false);
        field.setFocusTraversalKeysEnabled(false);
        field.setBorder(new FieldFrame());
        field.setFont(fringekeep.desk.look.Type.MONO);
        field.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent event) {
                typed(field);
            }

            @Override
            public void removeUpdate(DocumentEvent event) {
                typed(field);
            }

            @Override
            public void changedUpdate(DocumentEvent event) {}
        });
        field.addFocusListener(new FocusAdapter() {
            @Override
            public void focusLost(FocusEvent event) {
                if (!event.isTemporary()) {
                    settle();
                }
            }
        });
        keys(field);
    }

    // ---- rows

    List<FormRow> rows() {
        return rows;
    }

    /** The row in hand. */
    Optional<FormRow> row() {
        return at >= 0 && at < rows.size() ? Optional.of(rows.get(at)) : Optional.empty();
    }

    FormLayout layoutOfRows() {
        return layout;
    }

    /** Lays the rows out anew; the row in hand stays in hand where it still is. */
    void refresh() {
        Optional<FormRow> held = row();
        rows = model.rows();
        relay();
        int next = held.map(row -> find(row.sort(), row.pointer())).orElse(-1);
        at = next >= 0 ? next : Math.min(at, rows.size() - 1);
        showField(false);
    }

    private void relay() {
        layout =
                new FormLayout(rows, Math.max(560, getWidth()), model.compared().isPresent());
        revalidate();
        repaint();
    }

    private int find(FormRow.Sort sort, String pointer) {
        for (int i = 0; i < rows.size(); i++) {
            if (rows.get(i).sort() == sort && rows.get(i).pointer().equals(pointer)) {
                return i;
            }
        }
        return -1;
    }

    @Override
    @SuppressWarnings("deprecation") // the one place that is told of every new width, whoever sets it
    public void reshape(int x, int y, int width, int height) {
        boolean other = width != getWidth();
        super.reshape(x, y, width, height);
        if (other) {
            relay();
            place();
        }
    }

    // ---- going about

    /** Takes the first row that is typed into in hand. */
    void focusFirst() {
        go(Math.max(0, next(-1, 1)));
    }

    /** Takes a field in hand by its pointer; answers whether there is one. */
    boolean go(String pointer) {
        for (int i = 0; i < rows.size(); i++) {
            FormRow row = rows.get(i);
            if (row.stops() && row.pointer().equals(pointer) && row.sort() != FormRow.Sort.QUESTION) {
                go(i);
                return true;
            }
        }
        return false;
    }

    /** The next row that a person may have to look at: changed, questioned or wrong. */
    void nextChange() {
        settle();
        for (int step = 1; step <= rows.size(); step++) {
            int i = Math.floorMod(at + step, rows.size());
            FormRow row = rows.get(i);
            boolean asks = row.sort() == FormRow.Sort.QUESTION;
            boolean wrong = row.sort() == FormRow.Sort.PROBLEM;
            if (asks || wrong || row.changed() && row.stops()) {
                go(wrong ? Math.max(0, next(i, -1)) : i);
                return;
            }
        }
    }

    private int next(int from, int by) {
        int i = from + by;
        while (i >= 0 && i < rows.size()) {
            if (rows.get(i).stops()) {
                return i;
            }
            i += by;
        }
        return -1;
    }

    private void step(int by) {
        String pointer = row().map(FormRow::pointer).orElse("");
        boolean grew = settle();
        int from = grew && by > 0 && pointer.contains("/+") ? find(FormRow.Sort.FIELD, pointer) - 1 : at;
        int i = next(Math.max(-1, from), by);
        if (i < 0) {
            ear.left(by > 0);
        } else {
            go(i);
        }
    }

    private void go(int index) {
        if (index != at) {
            settle();
        }
        at = Math.min(index, rows.size() - 1);
        showField(true);
        row().ifPresent(row -> {
            scrollRectToVisible(layout.bounds(at));
            ear.moved(row);
        });
    }

    /** Puts the field where the row in hand is. */
    private void showField(boolean focus) {
        Optional<FormRow> typedRow = row().filter(FormRow::typed);
        boolean area = typedRow.filter(FormLayout::tall).isPresent();
        JTextComponent field = area ? words : line;
        line.setVisible(typedRow.isPresent() && !area);
        words.setVisible(area);
        typedRow.ifPresent(row -> {
            if (focus || !late) {
                fill(field, late(row) ? row.shown() : row.text());
            }
            field.getAccessibleContext().setAccessibleName(row.label());
            field.getAccessibleContext().setAccessibleDescription(row.words());
            field.setToolTipText(row.words().isEmpty() ? null : row.words());
        });
        if (focus) {
            choices.close();
            late = false;
            place();
            if (typedRow.isPresent()) {
                field.requestFocusInWindow();
                field.selectAll();
            } else {
                requestFocusInWindow();
            }
        } else {
            place();
        }
        repaint();
    }

    private void fill(JTextComponent field, String text) {
        if (!field.getText().equals(text)) {
            filling = true;
            field.setText(text);
            filling = false;
        }
    }

    private void place() {
        row().filter(FormRow::typed).ifPresent(row -> {
            Rectangle bounds = layout.field(at);
            line.setBounds(bounds);
            words.setBounds(bounds);
            choices.place(bounds, getHeight());
        });
    }

    /** Whether a value is taken over only when its field is left. */
    private static boolean late(FormRow row) {
        return row.sort() == FormRow.Sort.ADD
                || row.leaf()
                        .filter(leaf -> switch (leaf.sort()) {
                            case CHOICE, CHOICES, RECORD, FILE -> true;
                            case TEXT,
                                    WORDS,
                                    QUANTITY,
                                    NUMBER,
                                    INTEGER,
                                    FLAG,
                                    MARKED,
                                    MOMENT,
                                    INSTANT,
                                    NUMBERS,
                                    RANGES -> false;
                        })
                        .isPresent();
    }

    // ---- typing

    private void typed(JTextComponent field) {
        if (filling || row().isEmpty()) {
            return;
        }
        FormRow row = row().get();
        if (late(row)) {
            late = true;
            ear.asked(row);
            choices.narrow(lastWord(field.getText()));
        } else {
            model.type(row.pointer(), field.getText());
            refresh();
            ear.changed();
        }
    }

    private String lastWord(String text) {
        boolean many = row().flatMap(FormRow::leaf)
                .filter(leaf -> leaf.sort() == Asked.Sort.CHOICES)
                .isPresent();
        return many ? text.substring(text.lastIndexOf(',') + 1).strip() : text.strip();
    }

    /** Takes over what was typed into the row in hand; answers whether that changed the form. */
    boolean settle() {
        boolean changed = false;
        if (late && row().isPresent()) {
            late = false;
            changed = over(row().get(), line.getText());
        }
        choices.close();
        model.settle();
        return changed;
    }

    private boolean over(FormRow row, String text) {
        FormState before = model.state();
        if (row.sort() == FormRow.Sort.ADD) {
            named(row, text.strip());
        } else if (row.pointer().equals("/part")) {
            new CodeText(model.kind().words(), row).part(text).ifPresent(model::main);
        } else {
            model.type(row.pointer(), new CodeText(model.kind().words(), row).code(text));
        }
        boolean changed = !before.equals(model.state());
        if (changed) {
            refresh();
            ear.changed();
        }
        return changed;
    }

    /** A named row: the name was typed, its value comes next. */
    private void named(FormRow row, String name) {
        String key = model.kind()
                .words()
                .text(FormKind.path(row.pointer()) + ".named")
                .orElse("");
        if (!name.isEmpty() && !key.isEmpty()) {
            String added = model.addRow(row.pointer(), fringekeep.archive.json.JsonObject.EMPTY.with(key, name));
            refresh();
            for (int i = 0; i < rows.size(); i++) {
                if (rows.get(i).pointer().startsWith(added + "/") && rows.get(i).typed()) {
                    at = i - 1;
                    return;
                }
            }
        }
    }

    /** What may be chosen in the row in hand. */
    void offer(List<ChoiceList.Option> options) {
        choices.offer(options, row().map(FormRow::shown).orElse(""));
        if (late) {
            choices.narrow(lastWord(line.getText()));
        }
        place();
    }

    ChoiceList choices() {
        return choices;
    }

    /** The text field in hand, for the keys of tests. */
    JTextComponent field() {
        return words.isVisible() ? words : line;
    }

    private void take(ChoiceList.Option option) {
        row().ifPresent(row -> {
            boolean many =
                    row.leaf().filter(leaf -> leaf.sort() == Asked.Sort.CHOICES).isPresent();
            String text = many ? CodeText.toggled(line.getText(), option.words()) : option.words();
            filling = true;
            line.setText(text);
            filling = false;
            late = true;
            if (!many) {
                settle();
            }
            line.requestFocusInWindow();
        });
    }

    // ---- keys and mouse

    private void keys(JComponent component) {
        component.addKeyListener(new KeyAdapter() {
            @Override
            public void keyPressed(KeyEvent event) {
                if (new FormKeys(FormTable.this).pressed(event)) {
                    event.consume();
                }
            }

            @Override
            public void keyTyped(KeyEvent event) {
                if (event.getSource() == FormTable.this) {
                    event.consume(); // letters are no commands while a row is in hand
                }
            }
        });
    }

    void forward() {
        step(1);
    }

    void backward() {
        step(-1);
    }

    /** Opens what may be chosen, or asks for a file. */
    void ask() {
        row().ifPresent(row -> {
            boolean file =
                    row.leaf().filter(leaf -> leaf.sort() == Asked.Sort.FILE).isPresent();
            if (file) {
                ear.file(row);
            } else if (row.typed()) {
                ear.asked(row);
            }
        });
    }

    /** Opens or folds a row, adds one, answers a question with its first answer. */
    void act() {
        row().ifPresent(row -> act(row, 0));
    }

    /** Answers a question. */
    void answer(int which) {
        row().filter(row -> row.sort() == FormRow.Sort.QUESTION).ifPresent(row -> act(row, which));
    }

    private void act(FormRow row, int answer) {
        switch (row.sort()) {
            case ITEM, MORE -> {
                if (!row.words().equals(TEXTS.of("gone"))) {
                    model.toggle(row.pointer());
                    refresh();
                }
            }
            case ADD -> {
                String added = model.addRow(row.pointer());
                refresh();
                ear.changed();
                enter(added);
            }
            case QUESTION -> answered(row, answer);
            case FIELD, HEAD, PROBLEM -> {}
        }
    }

    private void enter(String added) {
        for (int i = 0; i < rows.size(); i++) {
            if (rows.get(i).typed() && (rows.get(i).pointer() + "/").startsWith(added + "/")) {
                go(i);
                return;
            }
        }
    }

    private void answered(FormRow question, int answer) {
        int field = Math.max(0, next(find(FormRow.Sort.QUESTION, question.pointer()), -1));
        if (answer == 0) {
            model.mean(question.pointer());
        } else {
            String words = question.answers().get(1);
            String make = TEXTS.of("answer.make", "");
            if (words.startsWith(make)) {
                model.type(question.pointer(), words.substring(make.length()));
                model.settle();
            }
        }
        refresh();
        ear.changed();
        go(Math.min(field, rows.size() - 1));
    }

    /** Takes the row in hand out of its list. */
    void remove() {
        row().ifPresent(row -> {
            Optional<String> item = FormLayout.item(row, model);
            if (item.isPresent()) {
                late = false;
                model.remove(item.get());
                refresh();
                ear.changed();
                go(Math.max(0, next(Math.min(at, rows.size()), -1)));
            }
        });
    }

    private void press(int x, int y) {
        int index = layout.at(y);
        if (index < 0) {
            return;
        }
        FormRow row = rows.get(index);
        if (row.sort() == FormRow.Sort.QUESTION) {
            layout.answer(index, x).ifPresent(answer -> act(row, answer));
        } else if (row.stops()) {
            go(index);
            if (row.typed()) {
                boolean chosen = row.leaf()
                        .filter(leaf -> leaf.sort() == Asked.Sort.CHOICE || leaf.sort() == Asked.Sort.FLAG)
                        .isPresent();
                if (chosen) {
                    ask();
                }
            } else {
                act(row, 0);
            }
        }
    }

    // ---- painting and scrolling

    @Override
    protected void paintComponent(Graphics graphics) {
        graphics.setColor(Ink.SHEET.color());
        Rectangle clip = graphics.getClipBounds();
        graphics.fillRect(clip.x, clip.y, clip.width, clip.height);
        boolean here = isFocusOwner() || line.isFocusOwner() || words.isFocusOwner();
        new FormPainter(layout)
                .paint(graphics, at, here, row().filter(FormRow::typed).isPresent());
    }

    @Override
    public boolean isOptimizedDrawingEnabled() {
        return false;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(560, layout.height());
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return FormLayout.ROW;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(FormLayout.ROW, visible.height - 2 * FormLayout.ROW);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        Container parent = getParent();
        return parent != null && parent.getHeight() > layout.height();
    }

    /** In a pane that scrolls without a frame. */
    JScrollPane scrolling() {
        JScrollPane pane = new JScrollPane(this);
        pane.setHorizontalScrollBarPolicy(JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        pane.setBorder(null);
        pane.getViewport().setBackground(Ink.SHEET.color());
        return pane;
    }
}
