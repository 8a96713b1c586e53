package fringekeep.fit.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.SheetHead;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.run.Job;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.fit.ui.FitEach.Stage;
import java.awt.Graphics;
import java.awt.event.ActionEvent;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;
import javax.swing.Timer;

/** Fitting many scans with the same choices: choices once, then how far it is, a stop, and what failed with the reason. */
final class EachSheet implements DeskSheet, ChoicesPanel.Hand {
    private static final int TICK = 250;
    private static final int SECONDS_SHOWN = 90;

    private final DeskHand desk;
    private final FitEach each;
    private final boolean unfitted;
    private final SheetHead head = new SheetHead("each.head");
    private final FailurePanel failed = new FailurePanel();
    private final WordButton start = WordButton.low(FitWords.TEXTS.of("each.start", "0"), 'F', true);
    private final WordButton stop = WordButton.low(FitWords.TEXTS.of("each.stop"), 'S', false);
    private final JScrollPane scroll = new JScrollPane();
    private final JScrollPane list = new JScrollPane(failed);
    private final Room room = new Room();
    private final Timer ticker = new Timer(TICK, event -> changed());
    private Optional<ChoicesPanel> choices = Optional.empty();

    private EachSheet(DeskHand desk, boolean unfitted) {
        this.desk = desk;
        this.unfitted = unfitted;
        this.each = new FitEach(
                desk.archive(),
                new Jobs() {
                    @Override
                    public <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> trouble) {
                        desk.run(place, job, done, trouble);
                    }
                },
                System::nanoTime,
                this::changed);
        scroll.setBorder(null);
        scroll.setHorizontalScrollBarPolicy(JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        list.setBorder(null);
        list.setHorizontalScrollBarPolicy(JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        start.setName("each.start");
        stop.setName("each.stop");
        start.addActionListener(event -> begin());
        stop.addActionListener(event -> desk.stop(FitEach.RUN));
        key("ctrl ENTER", this::begin);
    }

    /** Of the selected scans. */
    static EachSheet of(DeskHand desk, List<Hash> scans) {
        EachSheet sheet = new EachSheet(desk, false);
        sheet.each.take(scans);
        return sheet;
    }

    /** Of all scans that have no fit. */
    static EachSheet ofUnfitted(DeskHand desk) {
        EachSheet sheet = new EachSheet(desk, true);
        sheet.each.takeUnfitted(desk::say);
        return sheet;
    }

    private void key(String stroke, Runnable work) {
        room.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        room.getActionMap().put(stroke, new AbstractAction() {
            private static final long serialVersionUID = 1L;

            @Override
            public void actionPerformed(ActionEvent event) {
                work.run();
            }
        });
    }

    FitEach each() {
        return each;
    }

    String state() {
        return head.state();
    }

    @Override
    public FitPlan plan() {
        return each.plan();
    }

    @Override
    public void change(UnaryOperator<FitPlan> how) {
        each.plan(how.apply(each.plan()));
    }

    @Override
    public void scans(String role, String written, FieldRow row) {
        FoundScans.of(
                desk,
                role,
                written,
                row,
                found -> change(plan -> role.equals("references") ? plan.references(found) : plan.backgrounds(found)));
    }

    /** Makes the fits once a person is known. */
    void begin() {
        if (each.stage() == Stage.READY && !each.scans().isEmpty()) {
            desk.person(person -> each.start(person, desk::say));
        }
    }

    private void changed() {
        if (room == null) {
            return;
        }
        if (choices.isEmpty() && each.stage() == Stage.READY) {
            ChoicesPanel panel = new ChoicesPanel(this, List.of("counts"), List.of(), false);
            choices = Optional.of(panel);
            scroll.setViewportView(panel);
        }
        choices.ifPresent(ChoicesPanel::refresh);
        int n = each.scans().size();
        head.show(
                FitWords.TEXTS.of(unfitted ? "each.title.unfitted" : "each.title", n),
                FitWords.TEXTS.of("each.about"),
                each.failures().isEmpty() ? Optional.empty() : Optional.of(Mark.DASHES),
                words());
        failed.show(each.failures());
        start.setText(FitWords.TEXTS.of("each.start", n));
        start.setEnabled(each.stage() == Stage.READY && n > 0);
        stop.setVisible(each.stage() == Stage.RUNNING);
        boolean running = each.stage() == Stage.RUNNING;
        if (running != ticker.isRunning()) {
            if (running) {
                ticker.start();
            } else {
                ticker.stop();
            }
        }
        room.revalidate();
        room.repaint();
    }

    private String words() {
        return switch (each.stage()) {
            case READING -> FitWords.TEXTS.of("waiting");
            case READY -> each.scans().isEmpty() ? FitWords.TEXTS.of("each.none") : FitWords.TEXTS.of("each.ready");
            case RUNNING -> running();
            case DONE ->
                each.untried() == 0
                        ? FitWords.TEXTS.of(
                                "each.done", each.recorded(), each.failures().size())
                        : FitWords.TEXTS.of(
                                "each.stopped", each.recorded(), each.failures().size(), each.untried());
        };
    }

    private String running() {
        FitEach.Count count = each.count();
        int failures = each.failures().size();
        return each.left()
                .map(left -> FitWords.TEXTS.of("each.left", count.done(), count.total(), failures, time(left)))
                .orElseGet(() -> FitWords.TEXTS.of("each.running", count.done(), count.total(), failures));
    }

    private static String time(double seconds) {
        long whole = (long) Math.ceil(seconds);
        return whole < SECONDS_SHOWN
                ? FitWords.TEXTS.of("each.seconds", whole)
                : FitWords.TEXTS.of("each.minutes", (whole + 59) / 60);
    }

    @Override
    public String name() {
        return "fit-each";
    }

    @Override
    public JComponent component() {
        return room;
    }

    @Override
    public void focusFirst() {
        choices.flatMap(ChoicesPanel::first)
                .ifPresentOrElse(JComponent::requestFocusInWindow, start::requestFocusInWindow);
    }

    @Override
    public List<String> hints() {
        return List.of(FitWords.TEXTS.of("each.about"));
    }

    @Override
    public void left() {
        ticker.stop();
    }

    /** Head, choices at the left, failures at the right, buttons at the foot. */
    private final class Room extends JComponent {
        private static final long serialVersionUID = 1L;
        private static final int MARGIN = 16;
        private static final int BUTTON = 26;

        Room() {
            setName("fit-each");
            setFocusCycleRoot(true);
            setFocusTraversalPolicy(new javax.swing.LayoutFocusTraversalPolicy());
            add(head);
            add(scroll);
            add(list);
            add(stop);
            add(start);
        }

        @Override
        public void doLayout() {
            int width = getWidth() - 2 * MARGIN;
            int column = Math.min(480, width / 2);
            int top = SheetHead.HEIGHT + 8;
            int foot = getHeight() - MARGIN - BUTTON;
            head.setBounds(MARGIN, 0, width, SheetHead.HEIGHT);
            scroll.setBounds(MARGIN, top, column, foot - top - 10);
            list.setBounds(MARGIN + column + 24, top, Math.min(900, width - column - 24), foot - top - 10);
            int at = getWidth() - MARGIN - start.getPreferredSize().width;
            start.setBounds(at, foot, start.getPreferredSize().width, BUTTON);
            int wide = stop.getPreferredSize().width;
            stop.setBounds(at - wide - 12, foot, wide, BUTTON);
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            graphics.setColor(Ink.SHEET.color());
            graphics.fillRect(0, 0, getWidth(), getHeight());
            if (each.stage() == Stage.RUNNING) {
                FitEach.Count count = each.count();
                int wide = getWidth() - 2 * MARGIN;
                graphics.setColor(Ink.RULE.color());
                graphics.fillRect(MARGIN, SheetHead.HEIGHT + 2, wide, 1);
                graphics.setColor(Ink.SELRULE.color());
                int share = count.total() == 0 ? 0 : (int) (wide * count.done() / count.total());
                graphics.fillRect(MARGIN, SheetHead.HEIGHT, share, 4);
            }
        }
    }
}
