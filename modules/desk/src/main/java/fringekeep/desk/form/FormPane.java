package fringekeep.desk.form;

import fringekeep.desk.form.FormReading.Line;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.WordButton;
import java.awt.BasicStroke;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.geom.Path2D;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;

/** What stands where in a form: earlier records, tie, head, rows, cautions, foot. */
@SuppressWarnings("serial")
final class FormPane extends Painted {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormPane.class);
    private static final int NARROW_LIST = 252;
    private static final int WIDE_LIST = 420;
    private static final int WIDE = 1700;
    private static final int MOST = 1500;
    private static final int GAP = 36;
    private static final int MARGIN = 16;
    private static final int FOOT = 82;
    private static final int LINE = 18;

    private final transient FormModel model;
    private final transient FormReading.Opened opened;
    private final EarlierPane earlier;
    private final FormHead head;
    private final FormTable table;
    private final JScrollPane rows;
    private final CautionLine caution;
    private final WordButton record;
    private final Optional<WordButton> compare;
    private String differs = "";
    private String effect = "";
    private String help = "";
    private boolean kept;
    private transient List<String> troubles = List.of();

    FormPane(FormSheet sheet, FormModel model, FormReading.Opened opened, FormTable table) {
        this.model = model;
        this.opened = opened;
        this.table = table;
        setName("form");
        setOpaque(true);
        earlier = new EarlierPane(opened.heading(), opened.earlier(), opened.drafts(), sheet::compare, sheet::resume);
        head = new FormHead(model, opened.title(), sheet::way, sheet::instant, sheet::discard);
        rows = table.scrolling();
        caution = new CautionLine(sheet::readCautions);
        record = WordButton.low(TEXTS.of("record", subject()), 'R', true);
        record.setName("record");
        record.addActionListener(event -> sheet.record());
        compare = other().map(line -> comparing(sheet, line));
        add(earlier);
        add(head);
        add(rows);
        add(caution);
        add(record);
        compare.ifPresent(this::add);
        key("ctrl ENTER", sheet::record);
        key("ctrl Z", sheet::undo);
        key("ctrl shift Z", sheet::redo);
        key("ctrl Y", sheet::redo);
        refresh();
    }

    private String subject() {
        return model.base()
                .map(FormModel.Before::label)
                .orElse(model.kind().words().kindWords());
    }

    /** The record before the one that is corrected or continued. */
    private Optional<Line> other() {
        return model.base()
                .flatMap(base -> opened.earlier().stream()
                        .dropWhile(line -> !line.record().equals(base.record()))
                        .skip(1)
                        .filter(line -> !line.struck())
                        .findFirst());
    }

    private WordButton comparing(FormSheet sheet, Line line) {
        WordButton button = WordButton.low(TEXTS.of("compare", line.number()), 'w', false);
        button.setName("compare");
        button.addActionListener(event -> sheet.compare(line));
        return button;
    }

    private void key(String stroke, Runnable work) {
        getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        getActionMap().put(stroke, new AbstractAction() {
            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    FormHead head() {
        return head;
    }

    CautionLine caution() {
        return caution;
    }

    void focusEarlier() {
        earlier.requestFocusInWindow();
    }

    void focusFoot() {
        if (caution.unread()) {
            caution.focusBox();
        } else {
            focusButtons();
        }
    }

    void focusButtons() {
        record.requestFocusInWindow();
    }

    /** Shows the state of the form outside its rows. */
    void refresh() {
        head.refresh();
        earlier.mark(model.compared().map(FormModel.Before::record));
        repaint();
    }

    void kept(boolean now) {
        kept = now;
        repaint();
    }

    void busy(boolean now) {
        record.setEnabled(!now);
    }

    /** Says how much differs and what follows. */
    void foot(String words, String follows) {
        differs = words;
        effect = follows;
        getAccessibleContext().setAccessibleDescription((words + " " + follows).strip());
        repaint();
    }

    /** Says one thing that is in the way. */
    void say(String words) {
        trouble(List.of(words));
    }

    /** Says what is wrong with the whole, where no field is concerned. */
    void trouble(List<String> words) {
        troubles = List.copyOf(words.subList(0, Math.min(3, words.size())));
        revalidate();
        repaint();
    }

    private int listWidth() {
        return getWidth() > WIDE ? WIDE_LIST : NARROW_LIST;
    }

    private int right() {
        return listWidth() + GAP;
    }

    /** As wide as lines of text are still followed by the eye. */
    private int room() {
        return Math.min(MOST, getWidth() - right() - MARGIN);
    }

    @Override
    public void doLayout() {
        int width = room();
        int warned = warned(width);
        int foot = FOOT + LINE * troubles.size();
        int top = head.getPreferredSize().height;
        earlier.setBounds(0, 0, listWidth(), getHeight());
        head.setBounds(right(), 0, width, top);
        int high = getHeight() - top - warned - foot;
        rows.setBounds(right(), top, width, high);
        caution.setBounds(right(), top + high, width, Math.max(0, warned - 14));
        Dimension main = record.getPreferredSize();
        int y = getHeight() - 44;
        record.setBounds(right() + width - main.width, y, main.width, main.height);
        compare.ifPresent(button -> {
            Dimension size = button.getPreferredSize();
            button.setBounds(record.getX() - size.width - 8, y, size.width, size.height);
        });
        head.columns(table.layoutOfRows());
    }

    private int warned(int width) {
        if (!caution.isVisible()) {
            return 0;
        }
        caution.setSize(width, Math.max(1, caution.getHeight()));
        return caution.getPreferredSize().height + 14;
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            pen.upright(Ink.HAIR, listWidth() + 14.0, 0, getHeight());
            tie(pen);
            double y = getHeight() - FOOT - LINE * (double) troubles.size() + 8;
            for (String trouble : troubles) {
                Mark.DIFFERENT.paint(pen.graphics(), right(), y - 4, 12);
                pen.fitted(trouble, Type.BODY, Ink.INK, right() + 18.0, y + 6, room() - 18.0);
                y += LINE;
            }
            pen.fitted(help, Type.SMALL, Ink.INK2, right(), getHeight() - 57.0, room());
            foot(pen);
        }
    }

    /** Says what the field in hand asks for and how it is typed. */
    void help(String words) {
        help = words;
        repaint(0, getHeight() - FOOT, getWidth(), FOOT);
    }

    private void foot(Pen pen) {
        double base = record.getY() + 18.0;
        double limit = compare.map(button -> button.getX()).orElse(record.getX()) - 16.0;
        double end = pen.fitted(differs, Type.BODY, Ink.INK, right(), base, limit - right());
        double x = differs.isEmpty() ? right() : end + 12;
        end = pen.fitted(effect, Type.BODY, Ink.INK2, x, base, limit - x);
        if (kept) {
            double at = effect.isEmpty() ? x : end + 12;
            pen.fitted(TEXTS.of("kept"), Type.BODY, Ink.INK3, at, base, limit - at);
        }
    }

    private void tie(Pen pen) {
        OptionalInt middle = earlier.markedMiddle();
        if (middle.isEmpty()) {
            return;
        }
        Path2D path = new Path2D.Double();
        path.moveTo(listWidth(), middle.getAsInt());
        path.lineTo(listWidth() + 14.5, middle.getAsInt());
        path.lineTo(listWidth() + 14.5, 22);
        path.lineTo(listWidth() + GAP - 6.0, 22);
        pen.graphics().setColor(Ink.STRONG.color());
        pen.graphics().setStroke(new BasicStroke(1.6f));
        pen.graphics().draw(path);
    }
}
