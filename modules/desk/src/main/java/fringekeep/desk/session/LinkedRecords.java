package fringekeep.desk.session;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.LinkedHashSet;
import java.util.Set;

/**
 * What hangs together with one record: what it was made from and what was made from it, what its direct users needed beside
 * it, and what all these speak of (a scan's run over its placement, a run's batch).
 */
public final class LinkedRecords {
    private final Register register;
    private final Graph graph;

    private LinkedRecords(Register register) {
        this.register = register;
        this.graph = register.graph();
    }

    /** All linked records, the record itself first. */
    public static Set<Hash> of(Register register, Hash record) {
        return new LinkedRecords(register).all(record);
    }

    private Set<Hash> all(Hash record) {
        Set<Hash> made = new LinkedHashSet<>();
        made.add(record);
        made.addAll(graph.upstream(record));
        String kind = register.kind(record).orElse("");
        for (Link link : graph.links(record)) {
            if (link.sort() == LinkSort.INPUT && link.to().equals(record)) {
                graph.upstream(link.from()).stream()
                        .filter(other -> !register.kind(other).orElse("").equals(kind))
                        .forEach(made::add);
            }
        }
        graph.speakingOf(record).stream().filter(this::current).forEach(made::add);
        Set<Hash> linked = withSubjects(made, record, kind);
        graph.downstream(record).stream().filter(this::current).forEach(linked::add);
        return linked;
    }

    /** Adds what records speak of, and what those speak of: current records only, none of the first record's kind. */
    private Set<Hash> withSubjects(Set<Hash> made, Hash first, String kind) {
        Set<Hash> linked = new LinkedHashSet<>(made);
        Deque<Hash> open = new ArrayDeque<>(made);
        while (!open.isEmpty()) {
            Hash record = open.removeFirst();
            for (Link link : graph.links(record)) {
                if (link.sort() == LinkSort.ABOUT && link.from().equals(record)) {
                    Hash subject = graph.current(link.to()).orElse(link.to());
                    boolean other = !register.kind(subject).orElse("").equals(kind) || subject.equals(first);
                    if (other && register.kind(subject).isPresent() && linked.add(subject)) {
                        open.add(subject);
                    }
                }
            }
        }
        return linked;
    }

    private boolean current(Hash record) {
        return !graph.states(record).contains(StateName.CORRECTED);
    }
}
