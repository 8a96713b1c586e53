package fringekeep.desk.form;

import fringekeep.desk.form.FormState.Way;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.drawing.Lettering;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.util.Optional;
import java.util.function.Consumer;
import javax.swing.JTextField;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;

/** Title of a form, how it stands to the record before, what keeps that one, and the heads of the columns. */
@SuppressWarnings("serial")
final class FormHead extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormHead.class);

    private final transient FormModel model;
    private final String title;
    private final WordLink discard = new WordLink(TEXTS.of("discard"), "", 'D');
    private final Optional<WordLink> corrects;
    private final Optional<WordLink> after;
    private final JTextField from = new JTextField();
    private final transient Consumer<Way> chosen;
    private final transient Runnable typed;
    private String keeps = "";
    private String trouble = "";
    private boolean filling;
    private transient Optional<FormLayout> columns = Optional.empty();

    FormHead(FormModel model, String title, Consumer<Way> chosen, Runnable typed, Runnable discarded) {
        this.model = model;
        this.title = title;
        this.chosen = chosen;
        this.typed = typed;
        setName("form head");
        discard.setName("discard draft");
        discard.addActionListener(event -> discarded.run());
        add(discard);
        String number = model.base().map(base -> last(base.label())).orElse("");
        corrects = model.base().map(base -> way("corrects", number, 'C', Way.CORRECTS));
        after = model.base()
                .filter(base -> model.kind().kind().mayContinue())
                .map(base -> way("after", number, 'a', Way.AFTER));
        from.setName("form from");
        from.setFont(Type.MONO);
        from.setBorder(new FieldFrame());
        from.getAccessibleContext().setAccessibleName(TEXTS.of("after.detail"));
        from.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent event) {
                retyped();
            }

            @Override
            public void removeUpdate(DocumentEvent event) {
                retyped();
            }

            @Override
            public void changedUpdate(DocumentEvent event) {}
        });
        from.addFocusListener(new FocusAdapter() {
            @Override
            public void focusLost(FocusEvent event) {
                model.settle();
                repaint();
            }
        });
        add(from);
        refresh();
    }

    /** {@code 13} of {@code setup 13}, {@code 13 b} of {@code setup 13 b}. */
    private static String last(String label) {
        java.util.regex.Matcher matcher =
                java.util.regex.Pattern.compile("[0-9]+( [a-z]+)?$").matcher(label);
        return matcher.find() ? matcher.group() : label;
    }

    private WordLink way(String key, String number, char mnemonic, Way way) {
        WordLink link = new WordLink(TEXTS.of(key, number), TEXTS.of(key + ".detail"), mnemonic);
        link.setName("way " + key);
        link.addActionListener(event -> chosen.accept(way));
        add(link);
        return link;
    }

    private void retyped() {
        if (!filling) {
            model.type("/from", from.getText());
            typed.run();
        }
    }

    /** Shows the state of the form. */
    void refresh() {
        Way way = model.state().way();
        corrects.ifPresent(link -> link.choose(way == Way.CORRECTS));
        after.ifPresent(link -> link.choose(way == Way.AFTER));
        from.setVisible(way == Way.AFTER);
        if (!from.getText().equals(model.state().from())) {
            filling = true;
            from.setText(model.state().from());
            filling = false;
        }
        revalidate();
        repaint();
    }

    /** Says what keeps the record before. */
    void keeps(String words) {
        keeps = words;
        repaint();
    }

    /** Says what is wrong with the instant of change; empty for nothing. */
    void trouble(String words) {
        trouble = words;
        repaint();
    }

    void columns(FormLayout layout) {
        columns = Optional.of(layout);
        repaint();
    }

    /** Gives the instant of change the focus, or the choice before it. */
    void focusWay() {
        if (from.isVisible()) {
            from.requestFocusInWindow();
        } else {
            corrects.ifPresentOrElse(WordLink::requestFocusInWindow, discard::requestFocusInWindow);
        }
    }

    private boolean two() {
        return corrects.isPresent();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(560, two() ? 114 : 80);
    }

    @Override
    public void doLayout() {
        Dimension word = discard.getPreferredSize();
        discard.setBounds(getWidth() - word.width + 1, 10, word.width, word.height);
        int x = 0;
        for (Optional<WordLink> link : java.util.List.of(corrects, after)) {
            if (link.isPresent()) {
                Dimension size = link.get().getPreferredSize();
                link.get().setBounds(x, 42, size.width, size.height);
                x += size.width + 26;
            }
        }
        from.setBounds(x, 46, 150, 24);
    }

    private String subtitle() {
        if (model.base().isEmpty()) {
            return TEXTS.of("draft.new", model.kind().words().purpose());
        }
        boolean corrected = model.state().way() == Way.CORRECTS;
        return TEXTS.of(
                corrected ? "draft.corrects" : "draft.after", model.base().get().label());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            double end = pen.text(title, Type.TITLE, Ink.INK, 0, 28);
            pen.fitted(subtitle(), Type.BODY, Ink.INK2, end + 12, 28, discard.getX() - end - 24);
            if (two()) {
                double x = from.isVisible() ? from.getX() + from.getWidth() + 28.0 : from.getX() + 2.0;
                pen.fitted(trouble.isEmpty() ? keeps : trouble, Type.BODY, Ink.INK2, x, 59, getWidth() - x);
            }
            columns.ifPresent(layout -> heads(pen, layout));
        }
    }

    private void heads(Pen pen, FormLayout layout) {
        double y = getHeight() - 9.0;
        pen.text(TEXTS.of("head.field"), Type.HEAD, Ink.INK2, 12, y);
        pen.text(TEXTS.of("head.now"), Type.HEAD, Ink.INK2, layout.now(), y);
        pen.textEndingAt(TEXTS.of("head.si"), Type.HEAD, Ink.INK2, layout.siEnd(), y);
        model.compared().ifPresent(before -> {
            pen.text(before.label(), Type.HEAD, Ink.INK2, layout.before(), y);
            pen.text(TEXTS.of("head.change"), Type.HEAD, Ink.INK2, right(layout), y);
        });
        pen.level(Ink.RULE, 0, layout.end(), getHeight() - 1.0);
    }

    private static double right(FormLayout layout) {
        return layout.end() - Lettering.width(TEXTS.of("head.change"), Type.HEAD);
    }
}
