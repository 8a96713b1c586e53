package fringekeep.audit;

import fringekeep.archive.Archive;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.lineage.Recomputed;
import fringekeep.archive.lineage.Recomputing;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;

/** Recomputes records and everything upstream of them, each link by itself; {@link Through} feeds results on. */
public final class Recompute {
    private Recompute() {}

    /**
     * What came out.
     *
     * @param records one entry a record, in the order of dependence
     */
    public record Verdicts(List<Recomputed> records) {
        /** Copies. */
        public Verdicts {
            records = List.copyOf(records);
        }

        /** The worst verdict; what people entered does not count against the rest. */
        public Recomputed.Verdict worst() {
            return records.stream()
                    .filter(each -> !each.reason().equals("entered"))
                    .map(Recomputed::verdict)
                    .max(Recomputed.Verdict::compareTo)
                    .orElse(Recomputed.Verdict.SAME_BITS);
        }

        /** How many records have each verdict, by its words. */
        public SortedMap<String, Integer> counts() {
            SortedMap<String, Integer> counts = new TreeMap<>();
            for (Recomputed each : records) {
                String words = each.verdict().words() + (each.reason().isEmpty() ? "" : " (" + each.reason() + ")");
                counts.merge(words, 1, Integer::sum);
            }
            return counts;
        }
    }

    /** Recomputes the targets and all records they were made from. */
    public static Verdicts upstreamOf(Archive archive, Collection<Hash> targets, Work work) throws StoppedException {
        List<Hash> order = order(archive, targets);
        List<Recomputed> verdicts = new ArrayList<>();
        for (Hash record : order) {
            work.check();
            work.progress(verdicts.size(), order.size(), "recomputing");
            Optional<RecordView> view = archive.record(record);
            verdicts.add(
                    view.isPresent()
                            ? Recomputing.recompute(view.get(), archive.inputs(record), archive.kinds(), work)
                            : new Recomputed(record, Recomputed.Verdict.NOT_COMPUTABLE, 0, List.of(), "input-missing"));
        }
        return new Verdicts(verdicts);
    }

    /** The targets and all they rest on, each once, what others rest on first. */
    static List<Hash> order(Archive archive, Collection<Hash> targets) {
        Set<Hash> order = new LinkedHashSet<>();
        for (Hash target : targets) {
            order.addAll(archive.graph().upstream(target));
            order.add(target);
        }
        return List.copyOf(order);
    }
}
