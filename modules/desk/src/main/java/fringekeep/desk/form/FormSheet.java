package fringekeep.desk.form;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.form.FormState.Way;
import fringekeep.desk.look.Texts;
import fringekeep.desk.stage.DeskHand;
import fringekeep.desk.stage.DeskSheet;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import javax.swing.JComponent;
import javax.swing.Timer;

/** A form below the strip. Lives on the window thread; whatever asks the archive goes through the hand. */
final class FormSheet implements DeskSheet, FormTable.Ear {
    private static final Texts TEXTS = new Texts("fringekeep.desk.form.Texts", FormSheet.class);
    private static final String ACKNOWLEDGED = "/content/acknowledged";
    private static final int PAUSE = 300;
    private static final int KEEP = 700;

    private final DeskHand hand;
    private final Archive archive;
    private final FormModel model;
    private final Consumer<Hash> then;
    private final DraftKeeper keeper;
    private final ChoiceReading offers;
    private final FormTable table;
    private final FormPane pane;
    private final Map<String, List<ChoiceList.Option>> candidates = new HashMap<>();
    private final Timer checking = new Timer(PAUSE, event -> check());
    private final Timer keeping = new Timer(KEEP, event -> keep());
    private List<Caution> cautions = List.of();
    private Optional<Archive.Recorded> recorded = Optional.empty();
    private boolean attempted;
    private boolean recording;
    private boolean shown = true;
    private String effect = "";

    FormSheet(DeskHand hand, FormReading.Opened opened, Consumer<Hash> then) {
        this.hand = hand;
        this.archive = hand.archive();
        this.model = opened.model();
        this.then = then;
        this.keeper = new DraftKeeper(hand, model, opened.title(), opened.draft());
        this.offers = new ChoiceReading(hand, model.kind());
        this.table = new FormTable(model, this);
        this.pane = new FormPane(this, model, opened, table);
        checking.setRepeats(false);
        keeping.setRepeats(false);
        pane.caution().tick(yes(model.text(ACKNOWLEDGED)) && opened.draft().isPresent());
        if (opened.draft().isEmpty()) {
            model.notAcknowledged(ACKNOWLEDGED);
            table.refresh();
        }
        check();
        effects();
        said();
    }

    private static boolean yes(String text) {
        return text.equals(LeafText.YES);
    }

    FormTable table() {
        return table;
    }

    FormModel model() {
        return model;
    }

    FormPane pane() {
        return pane;
    }

    // ---- the sheet

    @Override
    public String name() {
        return "form";
    }

    @Override
    public JComponent component() {
        return pane;
    }

    @Override
    public void focusFirst() {
        table.focusFirst();
    }

    @Override
    public List<Runnable> panes() {
        return List.of(table::focusFirst, pane::focusEarlier, pane::focusButtons);
    }

    @Override
    public List<String> hints() {
        return List.of(TEXTS.of("hint.enter"), TEXTS.of("hint.change"), TEXTS.of("hint.undo"), TEXTS.of("hint.record"));
    }

    @Override
    public void left() {
        shown = false;
        checking.stop();
        keeping.stop();
        if (!recording && recorded.isEmpty()) {
            table.settle();
            keeper.keep(() -> {});
        }
    }

    @Override
    public void recorded() {
        recorded.ifPresent(this::openRecorded);
    }

    // ---- what happens in the table

    @Override
    public void changed() {
        pane.refresh();
        said();
        if (pane.isShowing()) {
            checking.restart();
            keeping.restart();
        }
    }

    @Override
    public void moved(FormRow row) {
        pane.help(FormHelp.of(row));
        said();
    }

    @Override
    public void asked(FormRow row) {
        Optional<List<ChoiceList.Option>> codes = offers.codes(row);
        if (codes.isPresent()) {
            table.offer(codes.get());
            return;
        }
        List<ChoiceList.Option> known = candidates.get(FormKind.path(row.pointer()));
        if (known != null) {
            table.offer(known);
            return;
        }
        offers.records(row, found -> {
            candidates.put(FormKind.path(row.pointer()), found);
            if (table.row().filter(now -> now.pointer().equals(row.pointer())).isPresent()) {
                table.offer(found);
            }
        });
    }

    @Override
    public void file(FormRow row) {
        for (Path file : hand.chooseFiles(TEXTS.of("choose.file", row.label()))) {
            model.type(row.pointer(), file.toString());
        }
        table.refresh();
        changed();
    }

    @Override
    public void left(boolean downwards) {
        if (downwards) {
            pane.focusFoot();
        } else {
            pane.head().focusWay();
        }
    }

    // ---- choices above and below the table

    void way(Way way) {
        model.way(way);
        pane.refresh();
        table.refresh();
        changed();
        effects();
    }

    void instant() {
        changed();
        effects();
    }

    void compare(FormReading.Line line) {
        if (model.base().isEmpty()) {
            if (!model.touched()) {
                Forms.like(hand, model.kind().name(), line.record());
            } else {
                fillLike(line);
            }
            return;
        }
        var register = hand.register();
        hand.run("form before", work -> new FormReading(archive, register).before(line.record(), model), before -> {
            model.compare(before);
            pane.refresh();
            table.refresh();
            said();
        });
    }

    /** Fills what is still empty with what another record says; one step of undo. */
    private void fillLike(FormReading.Line line) {
        var register = hand.register();
        hand.run("form before", work -> new FormReading(archive, register).like(line.record()), document -> {
            model.fill(document);
            table.refresh();
            changed();
        });
    }

    void resume(FormReading.Kept kept) {
        Forms.resume(hand, kept);
    }

    void undo() {
        if (model.undo()) {
            stepped();
        }
    }

    void redo() {
        if (model.redo()) {
            stepped();
        }
    }

    private void stepped() {
        table.refresh();
        pane.caution().tick(yes(model.text(ACKNOWLEDGED)));
        changed();
        effects();
    }

    void discard() {
        keeper.discard(() -> {
            hand.back();
            hand.done(TEXTS.of("discarded"));
        });
    }

    void readCautions() {
        boolean read = pane.caution().read();
        model.acknowledge(ACKNOWLEDGED, read);
        if (read && hand.personName().isEmpty()) {
            hand.person(person -> showCautions());
        }
        table.refresh();
        changed();
    }

    // ---- away from the window thread

    private void keep() {
        keeper.keep(() -> pane.kept(true));
    }

    /** Examines the document while nobody types. */
    void check() {
        EntryFilling.Filled filled = model.document();
        List<String> references = model.references();
        FormState asked = model.state();
        hand.run(
                "form check",
                work -> new FormCheck(archive, model.kind()).check(filled.document(), references),
                checked -> {
                    if (shown && asked.equals(model.state())) {
                        checked(checked, filled.problems());
                    }
                });
    }

    private void checked(FormCheck.Checked checked, List<Problem> unread) {
        model.titles(checked.titles());
        boolean whole = checked.problems().isEmpty() && unread.isEmpty();
        model.found(checked.problems().stream()
                .filter(problem -> attempted || !lacking(problem))
                .filter(problem -> !unread.isEmpty() ? !lacking(problem) : true)
                .toList());
        if (whole) {
            cautions = checked.cautions();
        }
        showCautions();
        table.refresh();
        said();
    }

    private static boolean lacking(Problem problem) {
        return problem.code().equals(FieldOfProblem.MISSING) || problem.code().equals(FieldOfProblem.ROLES);
    }

    private void showCautions() {
        boolean asked = model.kind().at(ACKNOWLEDGED).isPresent();
        String behind =
                asked ? TEXTS.of("caution.recorded", model.kind().words().kindWords()) : "";
        pane.caution().show(cautions, hand.personName().orElse(TEXTS.of("caution.nobody")), behind);
        if (yes(model.text(ACKNOWLEDGED)) && !pane.caution().read()) {
            model.acknowledge(ACKNOWLEDGED, false);
        }
        pane.revalidate();
    }

    /** Works out what keeps the record before and what becomes outdated. */
    private void effects() {
        Optional<FormModel.Before> base = model.base();
        if (base.isEmpty()) {
            return;
        }
        Way way = model.state().way();
        Optional<Instant> from = from();
        var graph = hand.register().graph();
        hand.run(
                "form effects",
                work -> new Effects(archive, graph, work).said(base.get().record(), way, from),
                said -> {
                    pane.head().keeps(said.keeps());
                    effect = said.outdates();
                    said();
                });
    }

    private Optional<Instant> from() {
        try {
            if (model.state().way() != Way.AFTER) {
                return Optional.empty();
            }
            Instant at = model.moments().read(model.state().from()).toInstant();
            pane.head().trouble("");
            return Optional.of(at);
        } catch (ProblemException e) {
            Problem problem = e.problems().get(0);
            pane.head().trouble(problem.what() + " " + problem.mend().replace(" Nothing has been stored.", ""));
            return Optional.empty();
        }
    }

    // ---- recording

    /** Records what the form says, or shows what is in the way. */
    void record() {
        table.settle();
        attempted = true;
        EntryFilling.Filled filled = model.document();
        if (!filled.problems().isEmpty()) {
            refused(filled.problems());
        } else if (pane.caution().unread()) {
            pane.say(TEXTS.of("caution.first"));
            pane.caution().focusBox();
        } else if (!recording) {
            hand.person(person -> record(filled.document(), person));
        }
    }

    private void record(JsonObject document, PersonId person) {
        recording = true;
        pane.busy(true);
        Set<String> drafts = keeper.ids();
        hand.run(
                "form record",
                work -> new FormCheck(archive, model.kind()).record(document, person, drafts, work),
                this::done,
                problems -> {
                    recording = false;
                    pane.busy(false);
                    refused(problems);
                });
    }

    private void done(Archive.Recorded now) {
        keeper.recorded();
        recorded = Optional.of(now);
        openRecorded(now);
    }

    /** Opens the record as soon as the desk has read of it. */
    private void openRecorded(Archive.Recorded now) {
        if (shown && hand.register().kind(now.fingerprint()).isPresent()) {
            shown = false;
            hand.open(now.fingerprint());
            hand.done(TEXTS.of("recorded", now.label()));
            then.accept(now.fingerprint());
        }
    }

    private void refused(List<Problem> problems) {
        model.found(problems);
        table.refresh();
        said();
        List<String> homeless = new ArrayList<>();
        Optional<String> first = Optional.empty();
        for (Problem problem : problems) {
            boolean placed = !problem.where().isEmpty() && hasRow(problem.where());
            if (placed && first.isEmpty()) {
                first = Optional.of(problem.where());
            } else if (!placed) {
                homeless.add(problem.what() + " " + problem.mend());
            }
        }
        pane.trouble(homeless);
        first.ifPresent(pointer -> {
            if (pointer.equals("/from")) {
                pane.head().focusWay();
            } else if (!table.go(pointer)) {
                table.nextChange();
            }
        });
    }

    private boolean hasRow(String pointer) {
        return pointer.equals("/from")
                || table.rows().stream()
                        .anyMatch(row -> row.pointer().equals(pointer)
                                || row.pointer().startsWith(pointer + "/") && pointer.contains("/+"));
    }

    /** What stands at the foot: how much differs, what is open, what becomes outdated. */
    private void said() {
        long questions = table.rows().stream()
                .filter(row -> row.sort() == FormRow.Sort.QUESTION)
                .count();
        List<String> words = new ArrayList<>();
        model.compared()
                .ifPresent(before ->
                        words.add(differs(Differences.count(model.state().typed(), before.typed()), before)));
        if (questions > 0) {
            words.add(TEXTS.of(questions == 1 ? "question.open" : "questions.open", questions));
        }
        pane.foot(String.join(", ", words) + (words.isEmpty() ? "" : "."), effect);
        pane.head().columns(table.layoutOfRows());
    }

    private static String differs(int count, FormModel.Before before) {
        return count == 0
                ? TEXTS.of("differs.none", before.label())
                : TEXTS.of(count == 1 ? "differs.one" : "differs", count, before.label());
    }
}
