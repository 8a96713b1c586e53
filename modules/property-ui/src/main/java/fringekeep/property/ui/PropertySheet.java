package fringekeep.property.ui;

import fringekeep.archive.listing.Column;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.part.SheetHead;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordChoice;
import fringekeep.desk.part.WordChoice.Word;
import fringekeep.desk.run.Job;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureView;
import fringekeep.property.ChooseFits;
import java.awt.Toolkit;
import java.awt.event.ActionEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.function.Consumer;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;

/** A property: at the left rule, fits and choices; at the right both models with bands, values, and what the data say. */
final class PropertySheet implements DeskSheet {
    private static final String FITS = "fits";
    private static final String RULE = "rule";
    private static final String CHOICES = "choices";
    private static final String TAKEN = "taken";

    private final DeskHand desk;
    private final PropertyByHand property;
    private final SheetHead head = new SheetHead("property.head");
    private final FitsPanel fits = new FitsPanel(this::rowMoved);
    private final RulePanel rule;
    private final PropertyChoices choices;
    private final WordChoice pane;
    private final WordChoice leave;
    private final SidePanel side = new SidePanel();
    private final AnswerPanel answer = new AnswerPanel();
    private final JScrollPane left = new JScrollPane();
    private final WordButton compute = WordButton.low(PropertyWords.TEXTS.of("compute"), 'C', false);
    private final WordButton stop = WordButton.low(PropertyWords.TEXTS.of("stop"), 'S', false);
    private final WordButton record = WordButton.low(PropertyWords.TEXTS.of("record"), 'R', true);
    private final PropertyRoom room;
    private Optional<PictureView> plot = Optional.empty();
    private Optional<Gathered> pointsOf = Optional.empty();
    private Optional<Picture> points = Optional.empty();

    PropertySheet(DeskHand desk, PropertyPlan first) {
        this.desk = desk;
        this.property = new PropertyByHand(desk.archive(), jobs(desk), first, this::changed);
        List<Column> columns = Gathered.columns(desk.archive());
        this.rule = new RulePanel(property::plan, property::change, columns);
        this.choices = new PropertyChoices(property::plan, property::change, this::offered);
        this.pane = new WordChoice(
                "property.pane",
                "",
                List.of(word("pane." + FITS, FITS), word("pane." + RULE, RULE), word("pane." + CHOICES, CHOICES)),
                "",
                1,
                this::pane);
        this.leave = new WordChoice("property.leave", PropertyWords.TEXTS.of("leave"), reasons(), "", 76, this::leave);
        for (JScrollPane each : List.of(left)) {
            each.setBorder(null);
            each.setHorizontalScrollBarPolicy(JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        }
        compute.setName("property.compute");
        stop.setName("property.stop");
        record.setName("property.record");
        compute.addActionListener(event -> compute());
        stop.addActionListener(event -> stop());
        record.addActionListener(event -> record());
        room = new PropertyRoom(head, pane, left, leave, side, answer, List.of(compute, stop, record));
        key("ctrl Z", property::undo);
        key("ctrl Y", property::redo);
        key("ctrl SPACE", () -> {
            compute();
            return true;
        });
        key("ctrl ENTER", () -> {
            record();
            return true;
        });
        boolean byRule = !first.conditions().isEmpty() && first.selection().isEmpty();
        pane.show(byRule ? RULE : FITS);
        pane(byRule ? RULE : FITS);
        property.gather();
    }

    private static Jobs jobs(DeskHand desk) {
        return new Jobs() {
            @Override
            public <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed) {
                desk.run(place, job, done, failed);
            }
        };
    }

    private static Word word(String key, String code) {
        return new Word(code, PropertyWords.TEXTS.of(key));
    }

    private static List<Word> reasons() {
        List<Word> words = new ArrayList<>(List.of(word("fits.taken", TAKEN)));
        ChooseFits.REASONS.forEach(code -> words.add(new Word(code, PropertyWords.reason(code))));
        return words;
    }

    private void key(String stroke, BooleanSupplier work) {
        room.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        room.getActionMap().put(stroke, new AbstractAction() {
            private static final long serialVersionUID = 1L;

            @Override
            public void actionPerformed(ActionEvent event) {
                if (!work.getAsBoolean()) {
                    Toolkit.getDefaultToolkit().beep();
                }
            }
        });
    }

    private List<Hash> offered() {
        return property.gathered()
                .map(found ->
                        found.quoted().stream().map(Gathered.Quoted::record).toList())
                .orElse(List.of());
    }

    PropertyByHand property() {
        return property;
    }

    RulePanel rule() {
        return rule;
    }

    PropertyChoices choices() {
        return choices;
    }

    FitsPanel fits() {
        return fits;
    }

    WordChoice leaving() {
        return leave;
    }

    SidePanel side() {
        return side;
    }

    String state() {
        return head.state();
    }

    /** Shows fits, rule or choices at the left. */
    void pane(String code) {
        JComponent shown = code.equals(FITS) ? fits : code.equals(RULE) ? rule : choices;
        left.setViewportView(shown);
        left.getViewport().setBackground(Ink.SHEET.color());
        leave.setVisible(code.equals(FITS));
        room.revalidate();
        room.repaint();
    }

    private void rowMoved() {
        if (leave != null) {
            leave.show(fits.current()
                    .map(line -> line.reason().isEmpty() ? TAKEN : line.reason())
                    .orElse(""));
        }
    }

    private void leave(String code) {
        fits.current()
                .ifPresent(line -> property.change(
                        plan -> code.equals(TAKEN) ? plan.take(line.fit()) : plan.leave(line.fit(), code)));
    }

    private void changed() {
        if (room == null) {
            return;
        }
        rule.refresh();
        choices.refresh();
        property.gathered()
                .ifPresent(
                        found -> fits.show(found.lines(), !property.problems().isEmpty()));
        rowMoved();
        property.answer()
                .map(Answer::picture)
                .or(() -> property.gathered().map(this::points))
                .ifPresent(this::plot);
        side.show(property.answer(), property.gathered().map(Gathered::quoted).orElse(List.of()));
        answer.show(property.answer(), !property.current());
        head.show(title(), about(), mark(), words());
        compute.setEnabled(!property.computing() && taken() > 0);
        stop.setVisible(property.computing());
        boolean ready = property.current() && property.recordedAs().isEmpty();
        record.setEnabled(ready && !property.computing() && property.answer().isPresent());
        room.revalidate();
        room.repaint();
    }

    /** Made once for a list, so that the plot keeps its zoom. */
    private Picture points(Gathered found) {
        if (!pointsOf.equals(Optional.of(found))) {
            pointsOf = Optional.of(found);
            points = Optional.of(found.picture());
        }
        return points.orElseThrow();
    }

    private void plot(Picture picture) {
        if (plot.isEmpty()) {
            PictureView view = new PictureView(picture, Ink::theme, desk::save);
            view.setName("property.plot");
            plot = Optional.of(view);
            room.plot(view);
        } else if (!plot.get().picture().equals(picture)) {
            plot.get().show(picture);
        }
    }

    private int taken() {
        return property.gathered().map(Gathered::taken).orElse(0);
    }

    private String title() {
        return property.plan().revises().isPresent()
                ? PropertyWords.TEXTS.of("title.again")
                : PropertyWords.TEXTS.of("title");
    }

    private String about() {
        Optional<Gathered> found = property.gathered();
        if (found.isEmpty()) {
            return PropertyWords.TEXTS.of("gathering");
        }
        int left = found.get().lines().size() - found.get().taken();
        String list = PropertyWords.TEXTS.of(
                "about",
                property.plan().choice().rule().replaceAll("\\.$", ""),
                found.get().taken(),
                left);
        return found.get().difference().isEmpty()
                ? list
                : list + "; " + found.get().difference();
    }

    private Optional<Mark> mark() {
        if (!property.problems().isEmpty()) {
            return Optional.of(Mark.DASHES);
        }
        boolean tells = property.answer()
                .map(found -> !found.say().verdict().equals("cannot-tell"))
                .orElse(true);
        return property.computing()
                        || property.answer().isPresent()
                                && property.recordedAs().isEmpty()
                ? Optional.of(tells ? Mark.DASHED_RING : Mark.CANNOT_TELL)
                : Optional.empty();
    }

    private String words() {
        if (!property.problems().isEmpty()) {
            Problem problem = property.problems().get(0);
            return problem.what() + " " + problem.mend();
        }
        if (property.computing()) {
            return PropertyWords.TEXTS.of("computing");
        }
        if (property.answer().isEmpty()) {
            return PropertyWords.TEXTS.of(taken() == 0 ? "empty" : "ready");
        }
        if (!property.recordedAs().isEmpty()) {
            return PropertyWords.TEXTS.of("recorded.as", property.recordedAs());
        }
        return PropertyWords.TEXTS.of(property.current() ? "provisional" : "old");
    }

    /** Computes both models. */
    void compute() {
        if (compute.isEnabled()) {
            property.compute();
        }
    }

    private void stop() {
        desk.stop(PropertyByHand.COMPUTE);
        property.stopped();
    }

    /** Records list and property. */
    void record() {
        if (record.isEnabled()) {
            desk.person(person ->
                    property.record(person, label -> desk.done(PropertyWords.TEXTS.of("recorded", label)), desk::say));
        }
    }

    @Override
    public String name() {
        return "property";
    }

    @Override
    public JComponent component() {
        return room;
    }

    @Override
    public void focusFirst() {
        if (pane.chosen().equals(FITS)) {
            fits.requestFocusInWindow();
        } else {
            pane.requestFocusInWindow();
        }
    }

    @Override
    public List<Runnable> panes() {
        return List.of(
                this::focusFirst, pane::requestFocusInWindow, () -> plot.ifPresent(PictureView::requestFocusInWindow));
    }

    @Override
    public List<String> hints() {
        return List.of(PropertyWords.TEXTS.of("hint.compute"), PropertyWords.TEXTS.of("hint.record"));
    }

    @Override
    public void left() {
        desk.stop(PropertyByHand.COMPUTE);
    }
}
