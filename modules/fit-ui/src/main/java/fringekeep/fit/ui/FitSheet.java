package fringekeep.fit.ui;

import fringekeep.archive.judgement.Verdict;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.desk.look.Mark;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.SheetHead;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordChoice;
import fringekeep.desk.part.WordChoice.Word;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import fringekeep.drawing.PictureView;
import fringekeep.fit.Trial;
import java.awt.event.ActionEvent;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import javax.swing.AbstractAction;
import javax.swing.JComponent;
import javax.swing.JScrollPane;
import javax.swing.KeyStroke;

/** Fitting by hand: the fringe large, its numbers beside it, all choices at the right, recorded fits below. */
final class FitSheet implements DeskSheet, ChoicesPanel.Hand {
    private final DeskHand desk;
    private final FitByHand fit;
    private final SheetHead head = new SheetHead("fit.head");
    private final ResultPanel result = new ResultPanel();
    private final FitsPanel others;
    private final MaskPanel masks;
    private final WordChoice prefer;
    private final WordButton record = WordButton.low(FitWords.TEXTS.of("record"), 'R', true);
    private final FitRoom room;
    private final JScrollPane scroll = new JScrollPane();
    private Optional<FringeView> fringe = Optional.empty();
    private Optional<ChoicesPanel> choices = Optional.empty();
    private boolean builtWithRivals;
    private boolean plotWanted;

    FitSheet(DeskHand desk, List<Hash> scans) {
        this.desk = desk;
        Jobs jobs = new Jobs() {
            @Override
            public <T> void run(
                    String place,
                    fringekeep.desk.run.Job<T> job,
                    java.util.function.Consumer<T> done,
                    java.util.function.Consumer<List<Problem>> failed) {
                desk.run(place, job, done, failed);
            }
        };
        this.fit = new FitByHand(desk.archive(), jobs, scans, this::changed);
        this.others = new FitsPanel(fit::compare);
        this.masks = new MaskPanel(how -> fit.change(plan -> plan.masks(how.apply(plan.masks()))));
        this.prefer = new WordChoice("fit.prefer", FitWords.TEXTS.of("prefer"), preferences(), "", 64, this::preferred);
        scroll.setBorder(null);
        scroll.setHorizontalScrollBarPolicy(JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        record.setName("fit.record");
        record.addActionListener(event -> record());
        room = new FitRoom(head, result, masks, others, prefer, scroll, record);
        key("ctrl Z", fit::undo);
        key("ctrl Y", fit::redo);
        key("ctrl ENTER", () -> {
            record();
            return true;
        });
        changed();
        fit.open(desk::say);
    }

    private static List<Word> preferences() {
        return FitWords.reasons(Verdict.PREFERRED).stream()
                .filter(word -> !word.code().equals("other"))
                .toList();
    }

    private void key(String stroke, java.util.function.BooleanSupplier work) {
        room.getInputMap(JComponent.WHEN_ANCESTOR_OF_FOCUSED_COMPONENT).put(KeyStroke.getKeyStroke(stroke), stroke);
        room.getActionMap().put(stroke, new AbstractAction() {
            private static final long serialVersionUID = 1L;

            @Override
            public void actionPerformed(ActionEvent event) {
                if (!work.getAsBoolean()) {
                    java.awt.Toolkit.getDefaultToolkit().beep();
                }
            }
        });
    }

    FitByHand fit() {
        return fit;
    }

    Optional<ChoicesPanel> choices() {
        return choices;
    }

    Optional<FringeView> fringe() {
        return fringe;
    }

    ResultPanel result() {
        return result;
    }

    MaskPanel masks() {
        return masks;
    }

    FitsPanel others() {
        return others;
    }

    String state() {
        return head.state();
    }

    @Override
    public FitPlan plan() {
        return fit.plan();
    }

    @Override
    public void change(UnaryOperator<FitPlan> how) {
        fit.change(how);
    }

    @Override
    public void scans(String role, String written, FieldRow row) {
        FoundScans.of(
                desk,
                role,
                written,
                row,
                found -> fit.change(
                        plan -> role.equals("references") ? plan.references(found) : plan.backgrounds(found)));
    }

    /** Shows all as it is now. */
    private void changed() {
        if (room == null) {
            return;
        }
        fit.facts().ifPresent(this::build);
        choices.ifPresent(ChoicesPanel::refresh);
        masks.show(fit.plan().masks());
        fit.facts().ifPresent(facts -> others.show(facts.fits(), fit.compared()));
        boolean several = fit.facts()
                .map(facts -> facts.fits().stream().filter(FitLine::rival).count() > 1)
                .orElse(false);
        prefer.setVisible(several);
        prefer.show("");
        fit.trial().ifPresent(this::show);
        head.show(title(), about(), stateMark(), stateWords());
        record.setEnabled(fit.settled() && fit.wanting().isEmpty() && !fit.recording());
        room.revalidate();
        room.repaint();
    }

    private void build(ScanFacts facts) {
        boolean rivals = facts.fits().stream().anyMatch(FitLine::rival);
        if (choices.isEmpty() || rivals != builtWithRivals) {
            ChoicesPanel panel = new ChoicesPanel(this, facts.channels(), facts.axes(), rivals);
            builtWithRivals = rivals;
            choices = Optional.of(panel);
            scroll.setViewportView(panel);
        }
    }

    private void show(Trial trial) {
        if (fringe.isEmpty()) {
            FringeView view = new FringeView(fit, trial.picture(), desk::save);
            fringe = Optional.of(view);
            room.fringe(view.view());
            if (plotWanted) {
                view.view().requestFocusInWindow();
            }
        } else if (!fringe.get().view().picture().equals(trial.picture())) {
            fringe.get().view().show(trial.picture());
        }
        boolean kept = !fit.recordedAs().isEmpty();
        String word = FitWords.TEXTS.of(trial.result().isEmpty() ? "state.none" : kept ? "state.kept" : "state.trial");
        result.show(
                kept ? fit.recordedAs() : FitWords.TEXTS.of("this"),
                kept ? Optional.empty() : Optional.of(trial.result().isEmpty() ? Mark.DASHES : Mark.DASHED_RING),
                word,
                trial.result()
                        .map(found -> ResultFacts.of(trial.choices(), found))
                        .orElse(List.of()),
                !fit.settled());
    }

    private String title() {
        List<String> labels = fit.facts().map(ScanFacts::labels).orElse(List.of());
        return labels.isEmpty()
                ? FitWords.TEXTS.of("title.open")
                : labels.size() == 1
                        ? FitWords.TEXTS.of("title.one", labels.get(0))
                        : FitWords.TEXTS.of("title.many", labels.size());
    }

    private String about() {
        List<String> labels = fit.facts().map(ScanFacts::labels).orElse(List.of());
        String together = labels.size() > 1 ? String.join(", ", labels) + "; " : "";
        return together + FitWords.TEXTS.of("about." + fit.plan().combine());
    }

    private Optional<Mark> stateMark() {
        return fit.trial()
                .filter(trial -> trial.result().isEmpty())
                .map(trial -> Mark.DASHES)
                .or(() -> fit.plan().masks().unsaid() ? Optional.of(Mark.QUESTION) : Optional.empty());
    }

    private String stateWords() {
        if (fit.recording()) {
            return FitWords.TEXTS.of("recording");
        }
        Optional<Trial> trial = fit.trial();
        if (trial.isEmpty()) {
            return FitWords.TEXTS.of("waiting");
        }
        if (trial.get().result().isEmpty()) {
            Problem problem = trial.get().problems().get(0);
            return problem.what() + " " + problem.mend();
        }
        for (String wanting : fit.wanting()) {
            return FitWords.TEXTS.of("wanting." + wanting, fit.recordedAs());
        }
        return FitWords.TEXTS.of("provisional");
    }

    /** Records, once nothing is wanting. */
    void record() {
        if (!record.isEnabled()) {
            return;
        }
        desk.person(person ->
                fit.record(person, kept -> desk.done(FitWords.TEXTS.of("recorded", fit.recordedAs())), desk::say));
    }

    private void preferred(String reason) {
        others.current()
                .filter(FitLine::rival)
                .ifPresent(line -> desk.person(person -> fit.prefer(line.fit(), reason, "", person, desk::say)));
    }

    @Override
    public String name() {
        return "fit-by-hand";
    }

    @Override
    public JComponent component() {
        return room;
    }

    @Override
    public void focusFirst() {
        plotWanted = true;
        fringe.map(FringeView::view).ifPresentOrElse(PictureView::requestFocusInWindow, head::requestFocusInWindow);
    }

    @Override
    public List<Runnable> panes() {
        return List.of(
                this::focusFirst,
                this::focusReason,
                () -> choices.flatMap(ChoicesPanel::first).ifPresent(JComponent::requestFocusInWindow),
                others::requestFocusInWindow);
    }

    /** The reason that is wanted; the fits where none is. */
    private void focusReason() {
        if (masks.reason().isVisible()) {
            masks.reason().requestFocusInWindow();
        } else if (masks.undoing().isVisible()) {
            masks.undoing().requestFocusInWindow();
        } else {
            others.requestFocusInWindow();
        }
    }

    @Override
    public List<String> hints() {
        return List.of(
                FitWords.TEXTS.of("hint.points"), FitWords.TEXTS.of("hint.range"), FitWords.TEXTS.of("hint.keep"));
    }

    @Override
    public void recorded() {
        fit.reread();
    }

    @Override
    public void left() {
        desk.stop(FitByHand.TRY);
    }
}
