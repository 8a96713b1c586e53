package fringekeep.archive.internal.store;

import fringekeep.archive.KindCount;
import fringekeep.archive.Scope;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/** Counts by kind within a scope. */
final class Counting {
    private static final int STEP = 1_000;
    private final Store store;
    private final Knowing knowing;

    Counting(Store store, Knowing knowing) {
        this.store = store;
        this.knowing = knowing;
    }

    Map<String, KindCount> counts(Scope scope) {
        Graph graph = knowing.graph();
        Map<String, KindCount> counts = new TreeMap<>();
        for (Located record : records(scope)) {
            counts.merge(record.kind().text(), one(graph, record.fingerprint()), Counting::sum);
        }
        return counts;
    }

    /** Asks for the single states that are counted: all states of a record cost a search for causes. */
    private static KindCount one(Graph graph, Hash record) {
        boolean disputed = !graph.rivals(record).isEmpty();
        boolean current = disputed || graph.current(record).equals(Optional.of(record));
        if (!current) {
            return new KindCount(0, 1, 0, 0, 0);
        }
        boolean withdrawn =
                !graph.judgements(record).isEmpty() && graph.states(record).contains(StateName.WITHDRAWN);
        return new KindCount(1, 0, graph.outdated().contains(record) ? 1 : 0, withdrawn ? 1 : 0, disputed ? 1 : 0);
    }

    private static KindCount sum(KindCount one, KindCount other) {
        return new KindCount(
                one.current() + other.current(),
                one.corrected() + other.corrected(),
                one.outdated() + other.outdated(),
                one.withdrawn() + other.withdrawn(),
                one.disputed() + other.disputed());
    }

    private Collection<Located> records(Scope scope) {
        long watermark = store.state().watermark();
        if (scope instanceof Scope.Everything) {
            return entries(1, watermark);
        } else if (scope instanceof Scope.Entries entries) {
            return entries(entries.from(), Math.min(entries.to(), watermark));
        } else if (scope instanceof Scope.Times times) {
            List<Long> ns = knowing.times().between(times.from(), times.to());
            return store.<Map<Long, Located>, RuntimeException>read(c -> Records.byEntry(c, ns))
                    .values();
        } else if (scope instanceof Scope.Records records) {
            return some(records.records(), watermark);
        } else if (scope instanceof Scope.LinkedWith linked) {
            return linked(linked.record(), watermark);
        }
        throw new AssertionError(scope);
    }

    private List<Located> entries(long from, long to) {
        List<Located> records = new ArrayList<>();
        for (long step = Math.max(1, from); step <= to; step += STEP) {
            long first = step;
            long last = Math.min(to, step + STEP - 1);
            records.addAll(store.<List<Located>, RuntimeException>read(c -> Records.between(c, first, last)));
        }
        return records;
    }

    private List<Located> some(List<Hash> hashes, long watermark) {
        return store.<List<Located>, RuntimeException>read(c -> {
            List<Located> records = new ArrayList<>();
            for (Hash hash : hashes) {
                Records.find(c, hash, watermark).ifPresent(records::add);
            }
            return records;
        });
    }

    private Collection<Located> linked(Hash hash, long watermark) {
        return store.<Collection<Located>, RuntimeException>read(c -> {
            Optional<Located> record = Records.find(c, hash, watermark);
            return record.isPresent()
                    ? Records.byNode(c, new Linked(c, watermark).of(record.get()), watermark)
                            .values()
                    : List.of();
        });
    }
}
