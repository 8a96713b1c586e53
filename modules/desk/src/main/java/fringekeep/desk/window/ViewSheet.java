package fringekeep.desk.window;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.RuledTable;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.session.Clock;
import fringekeep.desk.session.Names;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.View;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.NumberText;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;
import javax.swing.ListSelectionModel;

/** The choice of what is in view: a day, a span of days, what a figure rests on, what words find, all. */
final class ViewSheet implements DeskSheet {
    private static final Texts TEXTS = new Texts("fringekeep.desk.window.Texts", ViewSheet.class);
    private static final int INDENT = 90;

    private final Desk desk;
    private final RuledTable days = new RuledTable(
            "view days",
            TEXTS.of("view.day.heading"),
            List.of(
                    new RuledTable.Col(TEXTS.of("view.day.head"), 160, false, true),
                    new RuledTable.Col(TEXTS.of("view.day.entries"), 90, true, false)));
    private final RuledTable rooted = new RuledTable(
            "view figures",
            TEXTS.of("view.upstream.heading"),
            List.of(
                    new RuledTable.Col(TEXTS.of("view.upstream.head"), 130, false, false),
                    new RuledTable.Col("", 160, false, true)));
    private final FieldRow day = field("view.day.field", this::day);
    private final FieldRow from = field("view.span.from", text -> wrong(text));
    private final FieldRow to = field("view.span.to", text -> wrong(text));
    private final FieldRow words = field("view.words", this::words);
    private final WordButton span = new WordButton(TEXTS.of("view.span.show"), 'S', false);
    private final WordButton all = new WordButton(TEXTS.of("view.all"), 'A', false);
    private final List<LocalDate> dayOf = new ArrayList<>();
    private final List<Hash> recordOf = new ArrayList<>();
    private final Room room = new Room();

    ViewSheet(Desk desk, DeskHand hand) {
        this.desk = desk;
        Archive archive = hand.archive();
        Register register = hand.register();
        desk.views().ifPresent(views -> {
            hand.run("view days", work -> views.days(), this::showDays);
            hand.run("view figures", work -> figures(archive, register, work), this::showFigures);
        });
        span.setName("view span");
        all.setName("view all");
        span.addActionListener(event -> span());
        all.addActionListener(event -> desk.view(View.ALL));
        chosen(days, row -> desk.view(new View.Day(dayOf.get(row))));
        chosen(rooted, row -> desk.view(new View.Upstream(recordOf.get(row))));
        desk.strip().viewOpen(true);
    }

    private static FieldRow field(String name, java.util.function.Function<String, String> entered) {
        return new FieldRow(name, TEXTS.of(name), TEXTS.orElse(name + ".note", ""), INDENT, entered);
    }

    /** Enter or a double click on a row. */
    private static void chosen(RuledTable table, Consumer<Integer> what) {
        table.setSelectionMode(ListSelectionModel.SINGLE_SELECTION);
        table.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke("ENTER"), "show");
        table.getActionMap().put("show", new AbstractAction() {
            private static final long serialVersionUID = 1L;

            @Override
            public void actionPerformed(ActionEvent event) {
                if (table.getSelectedRow() >= 0) {
                    what.accept(table.getSelectedRow());
                }
            }
        });
        table.addMouseListener(new MouseAdapter() {
            @Override
            public void mouseClicked(MouseEvent event) {
                if (event.getClickCount() == 2 && table.getSelectedRow() >= 0) {
                    what.accept(table.getSelectedRow());
                }
            }
        });
    }

    private void showDays(Map<LocalDate, Integer> found) {
        dayOf.clear();
        dayOf.addAll(found.keySet());
        days.show(found.entrySet().stream()
                .map(entry -> List.of(
                        RuledTable.Cell.of(Clock.words(entry.getKey())),
                        RuledTable.Cell.of(NumberText.count(entry.getValue()))))
                .toList());
        int at = desk.view() instanceof View.Day now ? Math.max(0, dayOf.indexOf(now.day())) : 0;
        if (!dayOf.isEmpty()) {
            days.setRowSelectionInterval(at, at);
        }
    }

    private record Root(Hash record, String label, String words) {}

    private List<Root> figures(Archive archive, Register register, Work work) throws ProblemException {
        List<Root> found = new ArrayList<>();
        Clock clock = new Clock(archive.facts());
        for (String kind : desk.stops().entry("view", "upstream")) {
            List<Hash> records = register.current(kind);
            for (Hash record : records.subList(Math.max(0, records.size() - 200), records.size())) {
                String title = archive.record(record)
                        .map(view -> Names.title(archive, view).text())
                        .orElse("");
                found.add(new Root(record, Names.shortLabel(archive.label(record), clock), title));
            }
            work.progress(found.size(), 0, kind);
        }
        return found;
    }

    private void showFigures(List<Root> found) {
        recordOf.clear();
        found.forEach(one -> recordOf.add(one.record()));
        rooted.show(found.stream()
                .map(one -> List.of(RuledTable.Cell.of(one.label()), RuledTable.Cell.of(one.words(), Ink.INK2)))
                .toList());
    }

    private static Optional<LocalDate> date(String text) {
        try {
            return Optional.of(LocalDate.parse(text.strip()));
        } catch (DateTimeException e) {
            return Optional.empty(); // said at the field
        }
    }

    private static String wrong(String text) {
        return text.isBlank() || date(text).isPresent() ? "" : TEXTS.of("view.date.wrong");
    }

    private String day(String text) {
        date(text).ifPresent(one -> desk.view(new View.Day(one)));
        return wrong(text);
    }

    private String words(String text) {
        if (!text.isBlank()) {
            desk.view(new View.Found(text.strip()));
        }
        return "";
    }

    private void span() {
        Optional<LocalDate> first = date(from.field().getText());
        Optional<LocalDate> last = date(to.field().getText());
        if (first.isPresent() && last.isPresent()) {
            desk.view(new View.Span(first.get(), last.get()));
        } else {
            from.fault(first.isPresent() ? "" : TEXTS.of("view.date.wrong"));
            to.fault(last.isPresent() ? "" : TEXTS.of("view.date.wrong"));
        }
    }

    @Override
    public String name() {
        return "view";
    }

    @Override
    public JComponent component() {
        return room;
    }

    @Override
    public void focusFirst() {
        days.requestFocusInWindow();
    }

    @Override
    public List<Runnable> panes() {
        return List.of(
                days::requestFocusInWindow,
                () -> from.field().requestFocusInWindow(),
                () -> words.field().requestFocusInWindow(),
                rooted::requestFocusInWindow);
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("view.hint"));
    }

    @Override
    public void left() {
        desk.strip().viewOpen(false);
    }

    /** What is shown, for tests. */
    RuledTable days() {
        return days;
    }

    @SuppressWarnings("serial")
    private final class Room extends Painted {
        private final JScrollPane dayScroll = days.inScroll();
        private final JScrollPane rootScroll = rooted.inScroll();

        Room() {
            setOpaque(true);
            setName("view");
            getAccessibleContext().setAccessibleName(TEXTS.of("view.sheet"));
            for (JComponent part : List.of(day, dayScroll, from, to, span, words, all, rootScroll)) {
                add(part);
            }
        }

        private int column() {
            return Math.min(420, (getWidth() - 32 - 48) / 3);
        }

        @Override
        public void doLayout() {
            int width = column();
            int second = 16 + width + 24;
            int third = second + width + 24;
            int foot = getHeight() - 16;
            day.setBounds(16, 76, width, day.getPreferredSize().height);
            dayScroll.setBounds(0, 112, width + 32, Math.max(60, foot - 112));
            from.setBounds(second, 76, width, from.getPreferredSize().height);
            to.setBounds(second, 108, width, to.getPreferredSize().height);
            span.setBounds(second, 146, span.getPreferredSize().width, 30);
            words.setBounds(second, 236, width, words.getPreferredSize().height);
            all.setBounds(second, 320, all.getPreferredSize().width, 30);
            rootScroll.setBounds(third - 16, 72, width + 32, Math.max(60, foot - 72));
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            int width = column();
            int second = 16 + width + 24;
            int third = second + width + 24;
            try (Pen pen = new Pen(graphics)) {
                pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
                pen.text(TEXTS.of("view.sheet"), Type.TITLE, Ink.INK, 16, 32);
                head(pen, "view.day.heading", 16, 64, width);
                head(pen, "view.span.heading", second, 64, width);
                head(pen, "view.words.heading", second, 224, width);
                head(pen, "view.all.heading", second, 308, width);
                head(pen, "view.upstream.heading", third, 64, width);
            }
        }

        private void head(Pen pen, String text, int x, int y, int width) {
            pen.text(TEXTS.of(text), Type.GROUP, Ink.INK, x, y);
            pen.level(Ink.RULE, x, x + width, y + 8.0);
        }
    }
}
