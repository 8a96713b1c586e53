package fringekeep.archive.lineage;

import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Title;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.function.Function;

/**
 * Records with everything they rest on.
 *
 * @param roots what was asked for
 * @param records every record of the set, each after all it was made from and speaks of
 * @param rawFiles raw files that the records were made from, with their length (bytes)
 * @param absent records that a head names but that are not at hand
 */
public record Lineage(
        List<Hash> roots, List<LineageRecord> records, SortedMap<Hash, Long> rawFiles, SortedSet<Hash> absent) {
    /** Copies. */
    public Lineage {
        roots = List.copyOf(roots);
        records = List.copyOf(records);
        rawFiles = java.util.Collections.unmodifiableSortedMap(new TreeMap<>((Map<Hash, Long>) rawFiles));
        absent = java.util.Collections.unmodifiableSortedSet(new TreeSet<>((Collection<Hash>) absent));
    }

    /** How far a lineage goes beyond what was made from. */
    public enum Reach {
        /** Inputs only: what the numbers rest on. */
        MADE_FROM,
        /** Also what records speak of, and what they corrected or followed. */
        SPOKEN_OF
    }

    /** Where a lineage is read from. */
    public interface Source {
        /** A record at hand. */
        Optional<RecordView> record(Hash fingerprint);

        /** Its inputs, resolved. */
        Inputs inputs(Hash fingerprint);

        /** What people call it. */
        String label(Hash fingerprint);
    }

    /**
     * Follows heads from the roots.
     *
     * @param kinds kinds that can give titles
     */
    public static Lineage of(Source source, Kinds kinds, Collection<Hash> roots, Reach reach) {
        Walk walk = new Walk(source, reach);
        for (Hash root : roots) {
            walk.visit(root);
        }
        List<LineageRecord> records = new ArrayList<>();
        for (RecordView view : walk.order.values()) {
            Inputs inputs = source.inputs(view.fingerprint());
            records.add(new LineageRecord(view, inputs, source.label(view.fingerprint()), title(kinds, view, inputs)));
        }
        return new Lineage(List.copyOf(roots), records, walk.raw, walk.absent);
    }

    private static Title title(Kinds kinds, RecordView view, Inputs inputs) {
        return kinds.get(view.head().kind())
                .map(kind -> kind.title(view, inputs))
                .orElseGet(() ->
                        new Title(view.head().kind() + " " + view.fingerprint().shortForm(), ""));
    }

    /** The record of that fingerprint. */
    public Optional<LineageRecord> record(Hash fingerprint) {
        return records.stream()
                .filter(record -> record.fingerprint().equals(fingerprint))
                .findFirst();
    }

    /** What a head leads to, in its own order. */
    static List<Hash> targets(Head head, Reach reach) {
        List<Hash> targets = new ArrayList<>();
        for (InputReference input : head.inputs()) {
            if (input instanceof InputReference.OfRecord record) {
                targets.add(record.record());
            }
        }
        if (reach == Reach.SPOKEN_OF) {
            for (AboutReference about : head.about()) {
                targets.add(about.record());
            }
            head.corrects().ifPresent(targets::add);
            head.after().ifPresent(after -> targets.add(after.record()));
        }
        return targets;
    }

    /** Depth first without recursion: a lineage may be deeper than a thread's stack. */
    private static final class Walk {
        private final Source source;
        private final Reach reach;
        private final Map<Hash, RecordView> order = new LinkedHashMap<>();
        private final SortedMap<Hash, Long> raw = new TreeMap<>();
        private final SortedSet<Hash> absent = new TreeSet<>();
        private final Map<Hash, Boolean> open = new HashMap<>();

        Walk(Source source, Reach reach) {
            this.source = source;
            this.reach = reach;
        }

        void visit(Hash root) {
            Deque<Hash> stack = new ArrayDeque<>();
            stack.push(root);
            while (!stack.isEmpty()) {
                Hash here = stack.peek();
                if (order.containsKey(here) || absent.contains(here)) {
                    stack.pop();
                } else if (open.putIfAbsent(here, true) == null) {
                    source.record(here).ifPresentOrElse(view -> enter(view, stack), () -> absent.add(here));
                } else {
                    stack.pop();
                    source.record(here).ifPresent(view -> order.put(here, view));
                }
            }
        }

        private void enter(RecordView view, Deque<Hash> stack) {
            for (InputReference input : view.head().inputs()) {
                if (input instanceof InputReference.OfRaw file) {
                    raw.put(file.raw(), file.bytes());
                }
            }
            List<Hash> targets = targets(view.head(), reach);
            for (int i = targets.size() - 1; i >= 0; i--) {
                if (!order.containsKey(targets.get(i)) && !open.containsKey(targets.get(i))) {
                    stack.push(targets.get(i));
                }
            }
        }
    }

    /** A source from three functions. */
    public static Source source(
            Function<Hash, Optional<RecordView>> records,
            Function<Hash, Inputs> inputs,
            Function<Hash, String> labels) {
        return new Source() {
            @Override
            public Optional<RecordView> record(Hash fingerprint) {
                return records.apply(fingerprint);
            }

            @Override
            public Inputs inputs(Hash fingerprint) {
                return inputs.apply(fingerprint);
            }

            @Override
            public String label(Hash fingerprint) {
                return labels.apply(fingerprint);
            }
        };
    }
}
