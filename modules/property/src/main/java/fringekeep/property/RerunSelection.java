package fringekeep.property;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Runs the rule of a selection again on the archive as it now is and tells the difference (record format 1, section 6). A list
 * picked by hand has no rule to run: what it took and left out is then judged anew by what became of it. Records nothing.
 */
public final class RerunSelection {
    private static final String RECORDED_SINCE = "recorded-since";
    private static final Set<String> BY_RULE = Set.of("withdrawn", "outdated", "other-choice");

    private final Archive archive;
    private final Graph graph;
    private final SelectFits fits;

    /** Runs rules on an archive as it is now. */
    public RerunSelection(Archive archive) {
        this.archive = archive;
        this.graph = archive.graph();
        this.fits = new SelectFits(archive);
    }

    /**
     * What the rule gives now beside what was recorded.
     *
     * @param selection the selection
     * @param byHand whether it states no conditions, so that only what it names was looked at
     * @param still fits taken then and now
     * @param nowChosen fits the rule would take now and did not then
     * @param noLonger fits that were taken and the rule would not take now
     * @param stillLeft fits left out then and now
     */
    public record Difference(
            Hash selection,
            boolean byHand,
            List<Hash> still,
            List<Change> nowChosen,
            List<Change> noLonger,
            List<Change> stillLeft) {
        /** Copies. */
        public Difference {
            still = List.copyOf(still);
            nowChosen = List.copyOf(nowChosen);
            noLonger = List.copyOf(noLonger);
            stillLeft = List.copyOf(stillLeft);
        }

        /** Whether the rule gives the recorded list. */
        public boolean none() {
            return nowChosen.isEmpty() && noLonger.isEmpty();
        }
    }

    /**
     * A fit and why.
     *
     * @param fit the fit
     * @param reason recorded-since, corrects, was-left-out (now chosen); corrected, withdrawn, outdated, other-choice,
     *     answers-no-more (no longer); the selection's own code (still left)
     * @param by the judgement, or the record that it corrects or is corrected by
     */
    public record Change(Hash fit, String reason, Optional<Hash> by) {}

    /** The selection itself, or those a record was made from, in order of dependence. */
    public List<Hash> selectionsOf(Hash record) {
        List<Hash> chain = new ArrayList<>(graph.upstream(record));
        chain.add(record);
        return chain.stream().filter(this::isSelection).toList();
    }

    private boolean isSelection(Hash record) {
        return archive.record(record)
                .map(view -> view.head().kind().text().equals("selection"))
                .orElse(false);
    }

    /**
     * The difference.
     *
     * @throws ProblemException if the record is no selection at hand, or several fits of one question answer now and none is
     *     preferred
     */
    public Difference difference(Hash selection) throws ProblemException {
        RecordView view = archive.record(selection)
                .filter(each ->
                        isSelection(selection) && !each.content().members().isEmpty())
                .orElseThrow(() -> new ProblemException(new Problem(
                        "selection.not-one",
                        archive.label(selection) + " is no selection whose content is at hand.",
                        archive.label(selection),
                        "Name a selection, or a record made from one.")));
        List<SelectFits.Condition> conditions = view.content().array("conditions").objects().stream()
                .map(SelectFits.Condition::of)
                .toList();
        Then then = Then.of(view);
        List<Hash> candidates = conditions.isEmpty() ? currentEnds(then.all()) : fits.answering(conditions);
        SelectFits.Resolved now = fits.resolve(withoutChoices(candidates, then));
        return compared(selection, conditions.isEmpty(), then, now);
    }

    /** What a person left out for a reason of their own is no matter of the rule. */
    private static List<Hash> withoutChoices(List<Hash> candidates, Then then) {
        return candidates.stream().filter(fit -> !then.leftByPerson(fit)).toList();
    }

    private List<Hash> currentEnds(Set<Hash> named) {
        Set<Hash> ends = new LinkedHashSet<>();
        for (Hash fit : named) {
            graph.current(fit).ifPresent(ends::add);
        }
        return List.copyOf(ends);
    }

    private Difference compared(Hash selection, boolean byHand, Then then, SelectFits.Resolved now) {
        List<Hash> still = new ArrayList<>();
        List<Change> nowChosen = new ArrayList<>();
        for (Hash fit : now.taken()) {
            if (then.taken().contains(fit)) {
                still.add(fit);
            } else {
                nowChosen.add(came(fit, then));
            }
        }
        List<Change> noLonger = new ArrayList<>();
        for (Hash fit : then.taken()) {
            if (!now.taken().contains(fit)) {
                noLonger.add(went(fit, now));
            }
        }
        List<Change> stillLeft = new ArrayList<>();
        then.left().forEach((fit, left) -> {
            if (!now.taken().contains(fit)) {
                stillLeft.add(new Change(fit, left.reason(), left.because()));
            }
        });
        return new Difference(selection, byHand, still, nowChosen, noLonger, stillLeft);
    }

    private Change came(Hash fit, Then then) {
        if (then.left().containsKey(fit)) {
            return new Change(fit, "was-left-out", then.left().get(fit).because());
        }
        Optional<Hash> corrected = then.taken().stream()
                .filter(old -> graph.current(old).equals(Optional.of(fit)))
                .findFirst();
        return corrected.isPresent()
                ? new Change(fit, "corrects", corrected)
                : new Change(fit, RECORDED_SINCE, Optional.empty());
    }

    private Change went(Hash fit, SelectFits.Resolved now) {
        SelectFits.Left left = now.left().get(fit);
        if (left != null) {
            return new Change(fit, left.reason(), left.because());
        }
        Optional<Hash> current = graph.current(fit);
        if (!current.equals(Optional.of(fit))) {
            return new Change(fit, "corrected", current);
        }
        return fits.reason(fit)
                .map(each -> new Change(fit, each.reason(), each.because()))
                .orElse(new Change(fit, "answers-no-more", Optional.empty()));
    }

    /** What the selection says. */
    private record Then(List<Hash> taken, Map<Hash, SelectFits.Left> left) {
        static Then of(RecordView view) {
            List<InputReference> inputs = view.head().inputs();
            List<Hash> taken = new ArrayList<>();
            for (InputReference input : inputs) {
                if (input.role().equals(SelectionKind.TAKEN) && input instanceof InputReference.OfRecord of) {
                    taken.add(of.record());
                }
            }
            Map<Hash, SelectFits.Left> left = new LinkedHashMap<>();
            for (JsonObject each : view.content().array("left").objects()) {
                Optional<Hash> because = each.integer("because").isEmpty()
                        ? Optional.empty()
                        : target(inputs.get((int) each.integer("because").getAsLong()));
                left.put(
                        view.head()
                                .about()
                                .get((int) each.integer("about").orElseThrow())
                                .record(),
                        new SelectFits.Left(each.text("reason").orElseThrow(), because));
            }
            return new Then(taken, left);
        }

        private static Optional<Hash> target(InputReference input) {
            return input instanceof InputReference.OfRecord of ? Optional.of(of.record()) : Optional.empty();
        }

        Set<Hash> all() {
            Set<Hash> all = new LinkedHashSet<>(taken);
            all.addAll(left.keySet());
            return all;
        }

        boolean leftByPerson(Hash fit) {
            SelectFits.Left reason = left.get(fit);
            return reason != null && !BY_RULE.contains(reason.reason());
        }
    }
}
