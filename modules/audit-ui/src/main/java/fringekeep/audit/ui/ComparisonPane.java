package fringekeep.audit.ui;

import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.VerdictTable;
import fringekeep.desk.part.WordButton;
import fringekeep.drawing.Lettering;
import java.awt.BasicStroke;
import java.awt.Cursor;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Consumer;

/** Title, words that do something, sentences, four counts, the table, and beside it the record of the selected row. */
@SuppressWarnings("serial")
final class ComparisonPane extends Painted {
    private static final int MARGIN = 16;

    private final VerdictTable table;
    private final BesidePane beside = new BesidePane();
    private final WordButton press;
    private final transient List<Word> words;
    private final transient List<Rectangle> places = new ArrayList<>();
    private transient Optional<VerdictView> view = Optional.empty();
    private String title = "";
    private String waiting = "";

    /** A word at the right of the title. */
    record Word(String text, char mnemonic, boolean chosen, Runnable work) {}

    /** A pane. */
    ComparisonPane(List<Word> words, WordButton press, Consumer<Hash> open) {
        this.words = List.copyOf(words);
        this.press = press;
        this.table = new VerdictTable(
                List.of(
                        AuditStage.TEXTS.of("head.record"), AuditStage.TEXTS.of("head.what"),
                        AuditStage.TEXTS.of("kept"), AuditStage.TEXTS.of("now"),
                        AuditStage.TEXTS.of("head.change"), AuditStage.TEXTS.of("head.verdict")),
                this::selected,
                line -> line.records().stream().findFirst().ifPresent(open));
        setOpaque(true);
        add(table.countsLine());
        add(table);
        add(beside);
        add(press);
        table.onScroll(this::repaint);
        MouseAdapter mouse = new MouseAdapter() {
            @Override
            public void mousePressed(MouseEvent event) {
                wordAt(event).ifPresent(word -> word.work().run());
            }

            @Override
            public void mouseMoved(MouseEvent event) {
                boolean over = wordAt(event).isPresent();
                setCursor(Cursor.getPredefinedCursor(over ? Cursor.HAND_CURSOR : Cursor.DEFAULT_CURSOR));
            }
        };
        addMouseListener(mouse);
        addMouseMotionListener(mouse);
    }

    private Optional<Word> wordAt(MouseEvent event) {
        for (int i = 0; i < places.size() && i < words.size(); i++) {
            if (places.get(i).contains(event.getPoint())) {
                return Optional.of(words.get(i));
            }
        }
        return Optional.empty();
    }

    private void selected(VerdictTable.Line line) {
        beside.show(line.records().stream()
                .findFirst()
                .flatMap(record -> view.map(now -> now.beside().get(record))));
        repaint();
    }

    void title(String words) {
        title = words;
        getAccessibleContext().setAccessibleName(words);
        repaint();
    }

    /** Says that something is being worked out; what stood here stays, dimmed. */
    void waiting(String sentence) {
        waiting = sentence;
        repaint();
    }

    void show(VerdictView next) {
        view = Optional.of(next);
        waiting = "";
        table.show(next.counts(), next.groups());
        StringBuilder said = new StringBuilder(title);
        next.answers().forEach(answer -> said.append("; ").append(answer.words()));
        getAccessibleContext().setAccessibleDescription(said.toString());
        revalidate();
        repaint();
    }

    /** What is shown. */
    Optional<VerdictView> view() {
        return view;
    }

    VerdictTable table() {
        return table;
    }

    private int top() {
        return 50 + 20 * view.map(now -> now.answers().size()).orElse(0);
    }

    @Override
    public void doLayout() {
        int width = getWidth() - 2 * MARGIN;
        int y = top();
        table.countsLine().setBounds(MARGIN, y, width, 66);
        int side = Math.max(300, Math.min(460, width / 3));
        int left = width - side - 36;
        table.setBounds(MARGIN, y + 76, left, Math.max(60, getHeight() - y - 84));
        int tall = beside.getPreferredSize().height;
        int room = getHeight() - y - 76 - 60;
        beside.setBounds(MARGIN + left + 36, y + 76, side, Math.min(tall, Math.max(60, room)));
        java.awt.Dimension size = press.getPreferredSize();
        press.setBounds(MARGIN + left + 36, y + 76 + Math.min(tall, room) + 8, Math.min(side, size.width), size.height);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        try (Pen pen = new Pen(graphics)) {
            pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
            words(pen);
            double room = (places.isEmpty() ? getWidth() : places.get(0).x) - 40.0;
            double end = pen.fitted(title, Type.TITLE, Ink.INK, MARGIN, 29, room * 0.7);
            String small = waiting.isEmpty() ? view.map(VerdictView::subtitle).orElse("") : waiting;
            pen.fitted(small, Type.BODY, Ink.INK2, end + 14, 29, room - end);
            double y = 54;
            for (VerdictView.Answer answer : view.map(VerdictView::answers).orElse(List.of())) {
                Mark mark = answer.mark();
                mark.paint(pen.graphics(), MARGIN, y - 10, 12);
                pen.fitted(answer.words(), Type.BODY, Ink.INK, MARGIN + 18.0, y, getWidth() - 2.0 * MARGIN - 18);
                y += 20;
            }
            tie(pen);
        }
    }

    private void words(Pen pen) {
        places.clear();
        double x = getWidth() - MARGIN;
        for (int i = words.size() - 1; i >= 0; i--) {
            Word word = words.get(i);
            java.awt.Font font = word.chosen() ? Type.BODY_MEDIUM : Type.BODY;
            double width = Lettering.width(word.text(), font);
            x -= width;
            pen.text(word.text(), font, Ink.INK, x, 27);
            if (word.chosen()) {
                pen.fill(Ink.STRONG.color(), x, 31, width, 2);
            }
            int at = Math.max(0, word.text().indexOf(word.mnemonic()));
            double before = Lettering.width(word.text().substring(0, at), font);
            double under = Lettering.width(word.text().substring(at, at + 1), font);
            pen.fill(Ink.INK.color(), x + before, 29, under, 1);
            places.add(0, new Rectangle((int) x - 4, 10, (int) width + 8, 26));
            x -= 20;
        }
    }

    /** The line from the selected row to the record beside. */
    private void tie(Pen pen) {
        double x = table.getX() + table.getWidth() + 14.5;
        pen.upright(Ink.HAIR, x, table.getY(), getHeight());
        OptionalInt row = table.rowMiddle();
        if (row.isEmpty() || view.isEmpty()) {
            return;
        }
        double y = table.getY() + row.getAsInt();
        Path2D path = new Path2D.Double();
        path.moveTo(x - 14, y);
        path.lineTo(x, y);
        path.lineTo(x, table.getY() + 15.0);
        path.lineTo(x + 14, table.getY() + 15.0);
        pen.graphics().setColor(Ink.STRONG.color());
        pen.graphics().setStroke(new BasicStroke(1.6f));
        pen.graphics().draw(path);
    }
}
