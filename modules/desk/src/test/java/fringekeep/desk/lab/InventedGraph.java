package fringekeep.desk.lab;

import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.lang.reflect.Proxy;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** A graph in memory over told links and states; public for the proxy, which calls its methods by name. */
public final class InventedGraph {
    final List<Link> all = new ArrayList<>();
    final Map<Hash, Set<StateName>> states = new HashMap<>();
    final Map<Hash, List<Cause>> causes = new HashMap<>();

    /** As windows see it: what they do not ask is a mistake in code. */
    Graph asGraph() {
        return (Graph) Proxy.newProxyInstance(
                InventedGraph.class.getClassLoader(),
                new Class<?>[] {Graph.class},
                (proxy, method, arguments) -> InventedGraph.class
                        .getMethod(method.getName(), method.getParameterTypes())
                        .invoke(this, arguments));
    }

    public long watermark() {
        return all.size();
    }

    public Set<StateName> states(Hash record) {
        return states.getOrDefault(record, Set.of());
    }

    public Set<Hash> outdated() {
        Set<Hash> outdated = new LinkedHashSet<>();
        states.forEach((record, of) -> {
            if (of.contains(StateName.OUTDATED)) {
                outdated.add(record);
            }
        });
        return outdated;
    }

    public List<Hash> rivals(Hash record) {
        return List.of();
    }

    public List<Cause> causes(Hash record) {
        return causes.getOrDefault(record, List.of());
    }

    public List<Hash> upstream(Hash record) {
        Set<Hash> seen = new LinkedHashSet<>();
        walk(record, true, seen);
        return List.copyOf(seen);
    }

    public List<Hash> downstream(Hash record) {
        Set<Hash> seen = new LinkedHashSet<>();
        walk(record, false, seen);
        return List.copyOf(seen);
    }

    private void walk(Hash record, boolean up, Set<Hash> seen) {
        for (Link link : all) {
            Hash here = up ? link.from() : link.to();
            Hash other = up ? link.to() : link.from();
            if (link.sort() == LinkSort.INPUT && here.equals(record) && seen.add(other)) {
                walk(other, up, seen);
            }
        }
    }

    public List<Link> links(Hash record) {
        return all.stream()
                .filter(link -> link.from().equals(record) || link.to().equals(record))
                .toList();
    }

    public Optional<Hash> current(Hash record) {
        return all.stream()
                .filter(link -> link.sort() == LinkSort.CORRECTS && link.to().equals(record))
                .map(Link::from)
                .findFirst()
                .or(() -> Optional.of(record));
    }

    public List<Hash> records(ThingId thing) {
        return List.of();
    }

    public Optional<Hash> at(ThingId thing, Instant instant) {
        return Optional.empty();
    }

    public List<Hash> judgements(Hash record) {
        return speakingOf(record);
    }

    public List<Hash> speakingOf(Hash record) {
        return all.stream()
                .filter(link -> link.sort() == LinkSort.ABOUT && link.to().equals(record))
                .map(Link::from)
                .toList();
    }
}
