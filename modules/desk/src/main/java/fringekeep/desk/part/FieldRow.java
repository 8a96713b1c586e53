package fringekeep.desk.part;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.util.function.Consumer;
import java.util.function.Function;
import javax.swing.BorderFactory;
import javax.swing.JTextField;

/** A name, a text field and a word behind it, on a hairline like a row of facts. What is wrong is said at its foot. */
@SuppressWarnings("serial")
public final class FieldRow extends Painted {
    /** Height of one line. */
    public static final int ROW = 24;

    private final String label;
    private final int indent;
    private final JTextField field = new JTextField();
    private final transient Function<String, String> entered;
    private String note = "";
    private String fault = "";
    private String last = "";

    /**
     * A row.
     *
     * @param name for tests and keys
     * @param label what is asked
     * @param note words behind the field, such as a unit or what is usual
     * @param indent where the field begins
     * @param entered told what was typed once it is complete (Enter, or the focus leaves); answers what is wrong with it,
     *     empty for nothing
     */
    public FieldRow(String name, String label, String note, int indent, Function<String, String> entered) {
        this.label = label;
        this.note = note;
        this.indent = indent;
        this.entered = entered;
        setName(name + ".row");
        field.setName(name);
        field.setFont(Type.MONO);
        field.setBorder(BorderFactory.createEmptyBorder(0, 4, 0, 4));
        field.getAccessibleContext().setAccessibleName(label);
        field.getAccessibleContext().setAccessibleDescription(note);
        field.addActionListener(event -> take());
        field.addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent event) {
                scrollRectToVisible(new java.awt.Rectangle(0, 0, getWidth(), getHeight()));
                repaint();
            }

            @Override
            public void focusLost(FocusEvent event) {
                take();
                repaint();
            }
        });
        add(field);
    }

    /** A row whose every text is good. */
    public static FieldRow any(String name, String label, String note, int indent, Consumer<String> entered) {
        return new FieldRow(name, label, note, indent, text -> {
            entered.accept(text);
            return "";
        });
    }

    /** The field. */
    public JTextField field() {
        return field;
    }

    /** Enters a text as a person does. */
    public void enter(String text) {
        field.setText(text);
        take();
    }

    /** Shows a text without telling anybody; not while a person types in it. */
    public void show(String text) {
        if (!field.isFocusOwner() || fault.isEmpty() && field.getText().equals(last)) {
            field.setText(text);
            last = text;
            fault("");
        }
    }

    /** Shows other words behind the field. */
    public void note(String words) {
        note = words;
        field.getAccessibleContext().setAccessibleDescription(words);
        repaint();
    }

    /** Says what is wrong; empty for nothing. */
    public void fault(String words) {
        if (!fault.equals(words)) {
            fault = words;
            field.getAccessibleContext().setAccessibleDescription(words.isEmpty() ? note : words);
            revalidate();
            repaint();
        }
    }

    /** What is wrong now. */
    public String fault() {
        return fault;
    }

    private void take() {
        String text = field.getText().strip();
        if (!text.equals(last)) {
            last = text;
            fault("");
            String wrong = entered.apply(text);
            if (!wrong.isEmpty()) {
                fault(wrong);
            }
        }
    }

    /** Height it needs. */
    public int height() {
        return fault.isEmpty() ? ROW : ROW + 16;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(320, height());
    }

    @Override
    public void doLayout() {
        double beside = note.isEmpty() ? 0 : Lettering.width(note, Type.SMALL) + 14;
        int width = Math.max(72, Math.min(180, (int) (getWidth() - indent - beside)));
        field.setBounds(indent - 4, 1, width, ROW - 3);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fitted(label, Type.BODY, Ink.INK2, 0, ROW - 8.0, indent - 8.0);
            double at = field.getX() + field.getWidth() + 8.0;
            pen.fitted(note, Type.SMALL, Ink.INK3, at, ROW - 8.0, getWidth() - at);
            if (!fault.isEmpty()) {
                pen.fitted(fault, Type.SMALL, Ink.MARK, 0, ROW + 10.0, getWidth());
            }
            Ink line = !fault.isEmpty() ? Ink.MARK : field.isFocusOwner() ? Ink.SELRULE : Ink.RULE;
            pen.level(line, field.getX(), field.getX() + (double) field.getWidth(), ROW - 1.0);
            pen.level(Ink.HAIR, 0, getWidth(), getHeight() - 1.0);
        }
    }
}
