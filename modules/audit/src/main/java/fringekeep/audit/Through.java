package fringekeep.audit;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.lineage.Recomputed.Verdict;
import fringekeep.archive.lineage.Recomputing;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * Recomputes a chain through (record format 1, section 10): what comes out of a link is fed into the next one, so that the
 * answer says whether a record's numbers follow from raw files and entered facts alone. Each link is compared with what was
 * recorded. Only results that come out different are held in memory.
 */
public final class Through {
    private final Archive archive;
    private final Set<Hash> targets;
    private final Map<Hash, RecordView> anew = new HashMap<>();
    private final Map<Hash, Recomputed> verdicts = new LinkedHashMap<>();
    private final Map<Hash, List<ValueVerdict>> values = new HashMap<>();

    private Through(Archive archive, Collection<Hash> targets) {
        this.archive = archive;
        this.targets = Set.copyOf(targets);
    }

    /**
     * What came out.
     *
     * @param verdicts every record of the chains, in the order of dependence, compared with what was recorded
     * @param answers one for each target, in the order asked
     */
    public record Answers(Recompute.Verdicts verdicts, List<Answer> answers) {
        /** Copies. */
        public Answers {
            answers = List.copyOf(answers);
        }
    }

    /**
     * Whether a record follows from raw files and entered facts alone.
     *
     * @param target the record asked about
     * @param follows the answer
     * @param beginnings where differences begin: records that come out different although nothing they rest on does
     * @param taken records upstream whose result could not be recomputed, so that the recorded one was fed on
     * @param values every value of the target with its own verdict; empty where it was not computed
     */
    public record Answer(
            Hash target, Follows follows, List<Hash> beginnings, List<Hash> taken, List<ValueVerdict> values) {
        /** Copies. */
        public Answer {
            beginnings = List.copyOf(beginnings);
            taken = List.copyOf(taken);
            values = List.copyOf(values);
        }
    }

    /** Whether numbers follow. */
    public enum Follows {
        /** All bits follow. */
        SAME_BITS("follows from raw files and entered facts, all bits the same"),
        /** All values follow within rounding. */
        WITHIN_ROUNDING("follows from raw files and entered facts within rounding"),
        /** Something upstream could not be recomputed; the rest agrees. */
        UNDECIDED("cannot be decided: something it rests on cannot be recomputed here"),
        /** Something comes out different. */
        NO("does not follow from raw files and entered facts"),
        /** People entered it. */
        ENTERED("was entered by people, not computed");

        private final String words;

        Follows(String words) {
            this.words = words;
        }

        /** Words for people. */
        public String words() {
            return words;
        }
    }

    /**
     * Recomputes the targets and everything they were made from, feeding results downstream.
     *
     * @throws StoppedException if the work was stopped; nothing is ever recorded
     */
    public static Answers upstreamOf(Archive archive, Collection<Hash> targets, Work work) throws StoppedException {
        Through through = new Through(archive, targets);
        List<Hash> order = Recompute.order(archive, targets);
        for (Hash record : order) {
            work.check();
            work.progress(through.verdicts.size(), order.size(), "recomputing through");
            through.link(record, work);
        }
        List<Answer> answers = new ArrayList<>();
        for (Hash target : targets) {
            answers.add(through.answer(target));
        }
        return new Answers(new Recompute.Verdicts(List.copyOf(through.verdicts.values())), answers);
    }

    private void link(Hash record, Work work) throws StoppedException {
        RecordView view = archive.record(record).orElse(null);
        if (view == null) {
            verdicts.put(record, new Recomputed(record, Verdict.NOT_COMPUTABLE, 0, List.of(), "input-missing"));
            return;
        }
        Inputs inputs = new FedInputs(archive.inputs(record), anew, archive.kinds());
        Recomputing.Attempt attempt = Recomputing.attempt(view, inputs, archive.kinds(), work);
        Verdict verdict = attempt.verdict().verdict();
        verdicts.put(record, attempt.verdict());
        if (verdict == Verdict.DIFFERS || verdict == Verdict.LAST_PLACES) {
            anew.put(record, new AnewView(view, attempt.outcome()));
        }
        if (targets.contains(record) && attempt.outcome().isPresent()) {
            try {
                values.put(record, ValueVerdict.of(view, attempt.outcome().get()));
            } catch (ProblemException e) {
                // a payload is not at hand: the verdict says so already, and there is nothing to compare with
                values.remove(record);
            }
        }
    }

    private Answer answer(Hash target) {
        List<Hash> chain = new ArrayList<>(archive.graph().upstream(target));
        List<Hash> taken =
                chain.stream().filter(each -> asRecorded(verdict(each))).toList();
        chain.add(target);
        List<Hash> beginnings = chain.stream().filter(this::begins).toList();
        return new Answer(
                target, follows(verdict(target), taken), beginnings, taken, values.getOrDefault(target, List.of()));
    }

    private Recomputed verdict(Hash record) {
        Recomputed verdict = verdicts.get(record);
        if (verdict == null) {
            throw new IllegalStateException("no verdict on " + record);
        }
        return verdict;
    }

    private static boolean asRecorded(Recomputed each) {
        return each.verdict() == Verdict.NOT_COMPUTABLE && !each.reason().equals("entered");
    }

    private boolean begins(Hash record) {
        return anew.containsKey(record)
                && archive.graph().upstream(record).stream().noneMatch(anew::containsKey);
    }

    private static Follows follows(Recomputed target, List<Hash> taken) {
        if (target.reason().equals("entered")) {
            return Follows.ENTERED;
        }
        return switch (target.verdict()) {
            case DIFFERS -> Follows.NO;
            case NOT_COMPUTABLE -> Follows.UNDECIDED;
            case LAST_PLACES -> taken.isEmpty() ? Follows.WITHIN_ROUNDING : Follows.UNDECIDED;
            case SAME_BITS -> taken.isEmpty() ? Follows.SAME_BITS : Follows.UNDECIDED;
        };
    }
}
