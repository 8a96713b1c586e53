package fringekeep.desk.lab;

import fringekeep.archive.graph.Cause;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** A graph in memory over told links and states. */
final class InventedGraph implements Graph {
    final List<Link> all = new ArrayList<>();
    final Map<Hash, Set<StateName>> states = new HashMap<>();
    final Map<Hash, List<Cause>> causes = new HashMap<>();

    @Override
    public long watermark() {
        return all.size();
    }

    @Override
    public Set<StateName> states(Hash record) {
        return states.getOrDefault(record, Set.of());
    }

    @Override
    public List<Cause> causes(Hash record) {
        return causes.getOrDefault(record, List.of());
    }

    @Override
    public List<Hash> upstream(Hash record) {
        Set<Hash> seen = new LinkedHashSet<>();
        walk(record, true, seen);
        return List.copyOf(seen);
    }

    @Override
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

    @Override
    public List<Link> links(Hash record) {
        return all.stream()
                .filter(link -> link.from().equals(record) || link.to().equals(record))
                .toList();
    }

    @Override
    public Optional<Hash> current(Hash record) {
        return all.stream()
                .filter(link -> link.sort() == LinkSort.CORRECTS && link.to().equals(record))
                .map(Link::from)
                .findFirst()
                .or(() -> Optional.of(record));
    }

    @Override
    public List<Hash> records(ThingId thing) {
        return List.of();
    }

    @Override
    public Optional<Hash> at(ThingId thing, Instant instant) {
        return Optional.empty();
    }

    @Override
    public List<Hash> judgements(Hash record) {
        return speakingOf(record);
    }

    @Override
    public List<Hash> speakingOf(Hash record) {
        return all.stream()
                .filter(link -> link.sort() == LinkSort.ABOUT && link.to().equals(record))
                .map(Link::from)
                .toList();
    }
}
