package fringekeep.property.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PersonId;
import fringekeep.property.ChooseFits;
import fringekeep.property.GatherProperty;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;

/**
 * A property that a person derives: which fits, which choices, what came out. The list is resolved after every change of the
 * rule; the property is computed when asked, for it takes a while. Lives on the window thread.
 */
final class PropertyByHand {
    static final String GATHER = "property.fits";
    static final String COMPUTE = "property.compute";
    private static final String KEEP = "property.record";
    private static final PersonId NOBODY = new PersonId("0".repeat(32));

    private final Archive archive;
    private final Jobs jobs;
    private final Runnable changed;
    private final Deque<PropertyPlan> before = new ArrayDeque<>();
    private final Deque<PropertyPlan> after = new ArrayDeque<>();
    private PropertyPlan plan;
    private Optional<Gathered> gathered = Optional.empty();
    private List<Problem> listProblems = List.of();
    private Optional<Answer> answer = Optional.empty();
    private Optional<PropertyPlan> answered = Optional.empty();
    private List<Problem> problems = List.of();
    private String recordedAs = "";
    private boolean computing;

    PropertyByHand(Archive archive, Jobs jobs, PropertyPlan first, Runnable changed) {
        this.archive = archive;
        this.jobs = jobs;
        this.plan = first;
        this.changed = changed;
    }

    /** The plan of a recorded selection, read from the archive. */
    static PropertyPlan ofSelection(Archive archive, Hash selection) {
        Hash current = archive.graph().current(selection).orElse(selection);
        ChooseFits.Choice choice = new ChooseFits(archive).recorded(current);
        java.util.Map<String, PropertyPlan.Bounds> bounds = new java.util.LinkedHashMap<>();
        choice.conditions()
                .forEach(condition -> bounds.put(
                        condition.column(),
                        new PropertyPlan.Bounds(
                                condition.is(), condition.from(), condition.below(), written(condition))));
        return new PropertyPlan(
                Optional.of(current),
                Optional.empty(),
                choice.label(),
                choice.rule(),
                bounds,
                choice.picked(),
                choice.byHand(),
                JsonObject.EMPTY,
                List.of());
    }

    private static String written(fringekeep.property.SelectFits.Condition condition) {
        String from = condition.from().isPresent() ? "from " + condition.from().getAsDouble() : "";
        String below =
                condition.below().isPresent() ? " below " + condition.below().getAsDouble() : "";
        return condition.is().orElse((from + below).strip());
    }

    /** The plan of a property anew: its selection as it stands, its choices, its quoted values. */
    static PropertyPlan ofProperty(Archive archive, Hash property) throws ProblemException {
        RecordView view = archive.record(property).orElseThrow();
        List<Hash> selections = pinned(view, "selection");
        if (selections.size() != 1) {
            throw new ProblemException(new Problem(
                    "property.selections",
                    archive.label(property) + " rests on " + selections.size() + " selections.",
                    archive.label(property),
                    "Begin from one of the selections instead."));
        }
        return ofSelection(archive, selections.get(0))
                .choices(view.choices())
                .quoted(pinned(view, "quoted"))
                .revising(archive.graph().current(property).orElse(property));
    }

    private static List<Hash> pinned(RecordView view, String role) {
        List<Hash> found = new ArrayList<>();
        for (InputReference input : view.head().inputs()) {
            if (input instanceof InputReference.OfRecord of && of.role().equals(role)) {
                found.add(of.record());
            }
        }
        return found;
    }

    PropertyPlan plan() {
        return plan;
    }

    Optional<Gathered> gathered() {
        return gathered;
    }

    /** Why there is no list, or no answer. */
    List<Problem> problems() {
        return listProblems.isEmpty() ? problems : listProblems;
    }

    Optional<Answer> answer() {
        return answer;
    }

    /** Whether the answer is one to the plan as it is. */
    boolean current() {
        return answered.equals(Optional.of(plan));
    }

    boolean computing() {
        return computing;
    }

    /** What the answer was recorded as; empty when it was not, or the plan was changed since. */
    String recordedAs() {
        return current() ? recordedAs : "";
    }

    /** Changes the plan. */
    void change(UnaryOperator<PropertyPlan> how) {
        PropertyPlan next = how.apply(plan);
        if (!next.equals(plan)) {
            before.push(plan);
            after.clear();
            go(next);
        }
    }

    boolean undo() {
        return step(before, after);
    }

    boolean redo() {
        return step(after, before);
    }

    private boolean step(Deque<PropertyPlan> from, Deque<PropertyPlan> to) {
        if (from.isEmpty()) {
            return false;
        }
        to.push(plan);
        go(from.pop());
        return true;
    }

    private void go(PropertyPlan next) {
        boolean same = gathered.isPresent()
                && next.choice().equals(plan.choice())
                && next.selection().equals(plan.selection());
        plan = next;
        if (same) {
            changed.run();
        } else {
            gather();
        }
    }

    /** Resolves the list. */
    void gather() {
        PropertyPlan asked = plan;
        changed.run();
        jobs.run(
                GATHER,
                work -> Gathered.read(archive, asked),
                found -> {
                    gathered = Optional.of(found);
                    listProblems = List.of();
                    changed.run();
                },
                trouble -> {
                    listProblems = List.copyOf(trouble);
                    changed.run();
                });
    }

    /** Computes both descriptions; takes a while. */
    void compute() {
        PropertyPlan asked = plan;
        computing = true;
        problems = List.of();
        changed.run();
        jobs.run(
                COMPUTE,
                work -> {
                    Made made = make(asked, NOBODY, work);
                    return Answer.of(archive, made.view(), former(asked));
                },
                found -> {
                    computing = false;
                    answer = Optional.of(found);
                    answered = Optional.of(asked);
                    recordedAs = "";
                    changed.run();
                },
                trouble -> {
                    computing = false;
                    problems = List.copyOf(trouble);
                    changed.run();
                });
    }

    /** The job was asked to stop. */
    void stopped() {
        computing = false;
        changed.run();
    }

    private static Optional<Hash> former(PropertyPlan plan) {
        return plan.revises();
    }

    /** Records list and property in one transaction. */
    void record(PersonId person, Consumer<String> done, Consumer<List<Problem>> failed) {
        PropertyPlan asked = plan;
        computing = true;
        changed.run();
        jobs.run(
                KEEP,
                work -> keep(asked, person, work),
                kept -> {
                    computing = false;
                    recordedAs = kept.label();
                    plan = kept.plan();
                    answered = Optional.of(plan);
                    before.clear();
                    after.clear();
                    changed.run();
                    done.accept(kept.label());
                },
                trouble -> {
                    computing = false;
                    changed.run();
                    failed.accept(trouble);
                });
    }

    private record Kept(String label, PropertyPlan plan) {}

    private Kept keep(PropertyPlan asked, PersonId person, Work work) throws ProblemException, StoppedException {
        Made made = make(asked, person, work);
        archive.record(made.all());
        Hash property = made.view().fingerprint();
        return new Kept(archive.label(property), ofProperty(archive, property).choices(asked.choices()));
    }

    /** A list and a property, prepared. */
    private record Made(List<Prepared> all, RecordView view) {}

    private Made make(PropertyPlan asked, PersonId person, Work work) throws ProblemException, StoppedException {
        List<Prepared> all = new ArrayList<>();
        GatherProperty gather = new GatherProperty(archive);
        NewRecord request;
        Optional<PersonId> who = Optional.of(person);
        if (asked.selection().isPresent()) {
            request = gather.request(asked.selection().get(), asked.choices(), asked.quoted(), who);
        } else {
            ChooseFits choose = new ChooseFits(archive);
            Prepared selection = archive.prepare(choose.request(asked.choice(), person), all);
            all.add(selection);
            request = gather.request(
                    selection.fingerprint(),
                    choose.resolve(asked.choice()).taken(),
                    asked.choices(),
                    asked.quoted(),
                    who);
        }
        NewRecord computed = archive.compute(correcting(request, asked.revises()), all, work);
        Prepared property = archive.prepare(computed, all);
        all.add(property);
        return new Made(all, new ComputedView(property, computed));
    }

    private static NewRecord correcting(NewRecord request, Optional<Hash> former) {
        return new NewRecord(
                request.kind(),
                request.inputs(),
                request.about(),
                request.parts(),
                request.payloads(),
                former,
                request.after(),
                request.person());
    }
}
