package fringekeep.fit.ui;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PersonId;
import fringekeep.fit.Trial;
import fringekeep.fit.TrialFits;
import fringekeep.fit.TrialFits.Kept;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;

/**
 * A fit that a person makes: the plan, what came out of it last, what it was before. Changes are tried at once, one at a time;
 * while one is being computed only the newest of those that follow is kept. Lives on the window thread.
 */
final class FitByHand {
    static final String TRY = "fit-by-hand";
    private static final String KEEP = "fit-by-hand.record";
    private static final int MOST_UNDONE = 200;

    private final Archive archive;
    private final Jobs jobs;
    private final TrialFits trials;
    private final Runnable changed;
    private final Deque<FitPlan> before = new ArrayDeque<>();
    private final Deque<FitPlan> after = new ArrayDeque<>();
    private FitPlan plan;
    private Optional<ScanFacts> facts = Optional.empty();
    private Optional<Trial> trial = Optional.empty();
    private Optional<Hash> compared = Optional.empty();
    private Optional<FitPlan> recorded = Optional.empty();
    private String recordedAs = "";
    private FitPlan saved;
    private boolean trying;
    private boolean stale;
    private boolean recording;
    private boolean dragging;

    /**
     * A plan for scans with nothing chosen.
     *
     * @param scans at least one
     * @param changed told after every change of what is to be shown
     */
    FitByHand(Archive archive, Jobs jobs, List<Hash> scans, Runnable changed) {
        this.archive = archive;
        this.jobs = jobs;
        this.trials = new TrialFits(archive);
        this.changed = changed;
        this.plan = FitPlan.usual(scans, "counts");
        this.saved = plan;
    }

    /** Reads what is known of the scans, takes up a draft, and tries. */
    void open(Consumer<List<Problem>> failed) {
        jobs.run(
                TRY + ".facts",
                work -> ScanFacts.read(archive, plan.scans()),
                read -> {
                    facts = Optional.of(read);
                    plan = read.draft()
                            .map(draft -> PlanDraft.read(draft, plan.scans()))
                            .orElse(FitPlan.usual(plan.scans(), read.channels().get(0)));
                    saved = plan;
                    attempt();
                },
                failed);
    }

    /** Reads the recorded fits again: something was recorded. */
    void reread() {
        jobs.run(
                TRY + ".facts",
                work -> ScanFacts.read(archive, plan.scans()),
                read -> {
                    facts = Optional.of(read);
                    changed.run();
                },
                problems -> changed.run());
    }

    FitPlan plan() {
        return plan;
    }

    Optional<ScanFacts> facts() {
        return facts;
    }

    /** What came out last; empty before the first answer. */
    Optional<Trial> trial() {
        return trial;
    }

    /** Whether the last answer is one to the plan as it is. */
    boolean settled() {
        return !trying && !stale;
    }

    /** The recorded fit whose curve is drawn behind. */
    Optional<Hash> compared() {
        return compared;
    }

    /** What the plan was recorded as; empty when it was not, or was changed since. */
    String recordedAs() {
        return recorded.equals(Optional.of(plan)) ? recordedAs : "";
    }

    boolean recording() {
        return recording;
    }

    /** One change, to be undone as one. */
    void change(UnaryOperator<FitPlan> how) {
        FitPlan next = how.apply(plan);
        if (next.equals(plan)) {
            return;
        }
        remember();
        plan = next;
        attempt();
    }

    /** A change while the mouse is down: all of them until {@link #release} are undone as one. */
    void drag(UnaryOperator<FitPlan> how) {
        FitPlan next = how.apply(plan);
        if (next.equals(plan)) {
            return;
        }
        if (!dragging) {
            dragging = true;
            remember();
        }
        plan = next;
        attempt();
    }

    /** The mouse is up. */
    void release() {
        dragging = false;
        if (settled()) {
            keep();
        }
    }

    private void remember() {
        before.push(plan);
        after.clear();
        if (before.size() > MOST_UNDONE) {
            before.removeLast();
        }
    }

    /** Takes the last change back; whether there was one. */
    boolean undo() {
        return step(before, after);
    }

    /** Makes the change again that was taken back last. */
    boolean redo() {
        return step(after, before);
    }

    private boolean step(Deque<FitPlan> from, Deque<FitPlan> to) {
        if (from.isEmpty()) {
            return false;
        }
        to.push(plan);
        plan = from.pop();
        attempt();
        return true;
    }

    /** Masks a point that is used, or uses one that is masked; in a sum the row of every scan. */
    void turn(Trial.Point point) {
        if (point.use() == Trial.Use.OUTSIDE) {
            return;
        }
        boolean used = point.use() == Trial.Use.USED;
        List<Hash> scans = plan.combine().equals("sum") ? plan.scans() : List.of(point.scan());
        change(now -> {
            FitPlan.Masks masks = now.masks();
            for (Hash scan : scans) {
                masks = masks.turned(new FitPlan.Place(scan, point.row()), used);
            }
            return now.masks(masks);
        });
    }

    /** Draws the curve of a recorded fit behind; empty draws none. */
    void compare(Optional<Hash> fit) {
        compared = fit;
        attempt();
    }

    private void attempt() {
        stale = true;
        changed.run();
        if (!trying) {
            trying = true;
            next();
        }
    }

    private void next() {
        stale = false;
        FitPlan asked = plan;
        Optional<Hash> other = compared;
        jobs.run(TRY, work -> trials.attempt(asked.draft(), other, work), this::answered, problems -> {
            trying = false;
            changed.run();
        });
    }

    private void answered(Trial answer) {
        trial = Optional.of(answer);
        trying = false;
        if (stale) {
            trying = true;
            next();
        } else if (!dragging) {
            keep();
        }
        changed.run();
    }

    /** Keeps what was chosen as a draft. */
    private void keep() {
        FitPlan kept = plan;
        if (!kept.equals(saved) && recordedAs().isEmpty()) {
            saved = kept;
            jobs.run(
                    TRY + ".draft",
                    work -> {
                        archive.drafts().save(PlanDraft.id(kept.scans()), PlanDraft.write(kept));
                        return kept;
                    },
                    done -> {},
                    problems -> {});
        }
    }

    /**
     * Records masks, fit and preference.
     *
     * @param done told what was recorded, in words
     */
    void record(PersonId person, Consumer<Kept> done, Consumer<List<Problem>> failed) {
        FitPlan asked = plan;
        recording = true;
        changed.run();
        Optional<String> preferred = Optional.of(asked.end().preferred()).filter(reason -> !reason.isEmpty());
        jobs.run(
                KEEP,
                work -> {
                    Kept kept = new TrialFits(archive).record(asked.draft(), preferred, person, work);
                    archive.drafts().remove(PlanDraft.id(asked.scans()));
                    return new Named(kept, archive.label(kept.fit()));
                },
                named -> {
                    recording = false;
                    FitPlan rest = asked.masks(FitPlan.Masks.NONE).end(FitPlan.End.USUAL);
                    plan = plan.equals(asked) ? rest : plan;
                    recorded = Optional.of(rest);
                    recordedAs = named.label();
                    before.clear();
                    after.clear();
                    done.accept(named.kept());
                    reread();
                },
                problems -> {
                    recording = false;
                    changed.run();
                    failed.accept(problems);
                });
    }

    private record Named(Kept kept, String label) {}

    /** Records that a fit is preferred to the others of its question. */
    void prefer(Hash fit, String reason, String words, PersonId person, Consumer<List<Problem>> failed) {
        jobs.run(
                KEEP, work -> new TrialFits(archive).prefer(fit, reason, words, person), judgement -> reread(), failed);
    }

    /** Why the plan cannot be recorded as it is; empty when it can. */
    List<String> wanting() {
        List<String> wanting = new ArrayList<>();
        if (trial.isEmpty() || trial.get().result().isEmpty()) {
            wanting.add("no-fit");
        }
        if (plan.masks().unsaid()) {
            wanting.add("reason");
        } else if (plan.masks().wordless()) {
            wanting.add("words");
        }
        if (!recordedAs().isEmpty()) {
            wanting.add("recorded");
        }
        return wanting;
    }
}
