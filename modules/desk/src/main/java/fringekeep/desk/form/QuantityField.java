package fringekeep.desk.form;

import fringekeep.archive.quantity.Quantity;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.util.Optional;
import javax.swing.JTextField;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;

/**
 * One text field for value, uncertainty and unit as typed, such as {@code 10,50(5) mm}; beside it, while typing, its value in
 * SI, or below it what cannot be read. A previous value may stand behind, with the change from it.
 */
@SuppressWarnings("serial")
public final class QuantityField extends Painted {
    private static final int FIELD = 196;
    private static final int ROW = 24;

    private final JTextField text = new JTextField();
    private final transient Optional<String> siUnit;
    private final transient Runnable changed;
    private transient QuantityReading reading = QuantityReading.of("", Optional.empty());
    private transient Optional<QuantityReading> before = Optional.empty();

    /**
     * An empty field.
     *
     * @param name accessible name, the quantity in words
     * @param siUnit UCUM code of the SI unit it must reduce to; empty = any
     * @param changed called on the window thread with every letter
     */
    public QuantityField(String name, Optional<String> siUnit, Runnable changed) {
        this.siUnit = siUnit;
        this.changed = changed;
        setName("quantity " + name);
        text.setName(name);
        text.setFont(Type.MONO);
        text.setBorder(new FieldFrame());
        text.getAccessibleContext().setAccessibleName(name);
        text.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent event) {
                read();
            }

            @Override
            public void removeUpdate(DocumentEvent event) {
                read();
            }

            @Override
            public void changedUpdate(DocumentEvent event) {}
        });
        add(text);
    }

    private void read() {
        reading = QuantityReading.of(text.getText(), siUnit);
        String words = reading.problems().isEmpty()
                ? reading.si() + " " + reading.siUnit(siUnit)
                : reading.problems().get(0).what();
        text.getAccessibleContext().setAccessibleDescription(words);
        revalidate();
        repaint();
        changed.run();
    }

    /** Puts a text into the field. */
    public void text(String typed) {
        text.setText(typed);
    }

    /** As typed. */
    public String text() {
        return text.getText();
    }

    /** Shows what stood before, as typed. */
    public void before(String typed) {
        before = Optional.of(QuantityReading.of(typed, Optional.empty()));
        repaint();
    }

    /** What is typed, read. */
    public QuantityReading reading() {
        return reading;
    }

    /** The quantity; empty while there is none or it cannot be read. */
    public Optional<Quantity> quantity() {
        return reading.quantity();
    }

    /** Gives the text the focus. */
    public void focusText() {
        text.requestFocusInWindow();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(FIELD + 380, reading.problems().isEmpty() ? ROW : 2 * ROW - 2);
    }

    @Override
    public void doLayout() {
        text.setBounds(0, 0, Math.min(FIELD, getWidth()), ROW);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double x = FIELD + 12;
            if (!reading.problems().isEmpty()) {
                Mark.DIFFERENT.paint(pen.graphics(), 0, ROW + 5, 12);
                String words = reading.problems().get(0).what() + " "
                        + reading.problems().get(0).mend();
                pen.fitted(words, Type.BODY, Ink.INK, 18, ROW + 15.0, getWidth() - 18.0);
                return;
            }
            x = pen.text(reading.si(), Type.BODY, Ink.INK, x, 16) + 8;
            x = pen.text(reading.siUnit(siUnit), Type.BODY, Ink.INK2, x, 16) + 24;
            if (before.isPresent()) {
                x = pen.text(before.get().text(), Type.MONO, Ink.INK2, x, 16) + 16;
                String change = reading.change(before.get());
                if (x + Lettering.width(change, Type.BODY) < getWidth()) {
                    pen.textEndingAt(change, Type.BODY, Ink.INK, getWidth(), 16);
                }
            }
        }
    }
}
