package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.record.ThingId;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * Records linked with one, for lists and counts: everything upstream and everything downstream of its thing, over inputs and
 * about. A placement belongs to the scan it places: downstream of a run, a setup or a batch come the scans placed in it;
 * upstream of a scan come the run, setup and batch of its placement.
 */
final class Linked {
    private static final String PLACEMENT = "placement";
    private static final String SCAN = "scan";
    private final Connection c;
    private final long watermark;

    Linked(Connection c, long watermark) {
        this.c = c;
        this.watermark = watermark;
    }

    /** Nodes of all linked records, the record itself included. */
    Set<Long> of(Located record) throws SQLException {
        Set<Long> start = ofThings(Set.of(record.thing()));
        Set<Long> linked = walk(start, true);
        linked.addAll(walk(start, false));
        return linked;
    }

    private Set<Long> walk(Set<Long> start, boolean up) throws SQLException {
        Set<Long> seen = new HashSet<>(start);
        Set<Long> front = start;
        while (!front.isEmpty()) {
            Set<Long> next = up ? above(front) : below(front);
            next.removeAll(seen);
            seen.addAll(next);
            front = next;
        }
        return seen;
    }

    private Set<Long> above(Set<Long> front) throws SQLException {
        Set<Long> next = new HashSet<>();
        Set<Long> byThing = new HashSet<>();
        Set<Long> placements = placementsOf(front);
        for (Edge edge : Edges.from(c, union(front, placements), watermark)) {
            boolean placed = placements.contains(edge.src()) && edge.role().equals(SCAN);
            if (edge.link().equals(Edges.INPUT)) {
                next.add(edge.dst());
            } else if (edge.link().equals(Edges.ABOUT) && !placed) {
                (edge.reach().equals(java.util.Optional.of(Edges.THING)) ? byThing : next).add(edge.dst());
            }
        }
        next.addAll(placements);
        next.addAll(ofThings(things(byThing)));
        next.addAll(byThing);
        return next;
    }

    private Set<Long> below(Set<Long> front) throws SQLException {
        Set<Long> next = new HashSet<>();
        Set<Long> speakers = new HashSet<>();
        for (Edge edge : Edges.to(c, front, watermark)) {
            if (edge.link().equals(Edges.INPUT)) {
                next.add(edge.src());
            } else if (edge.link().equals(Edges.ABOUT)) {
                speakers.add(edge.src());
            }
        }
        next.addAll(speakers);
        next.addAll(scansOf(placements(speakers)));
        return ofThings(things(next));
    }

    private Set<Long> placementsOf(Set<Long> front) throws SQLException {
        Set<Long> speakers = new HashSet<>();
        for (Edge edge : Edges.to(c, front, Edges.ABOUT, watermark)) {
            if (edge.role().equals(SCAN)) {
                speakers.add(edge.src());
            }
        }
        return placements(speakers);
    }

    private Set<Long> placements(Set<Long> speakers) throws SQLException {
        Set<Long> placements = new HashSet<>();
        for (Located record : Records.byNode(c, speakers, watermark).values()) {
            if (record.kind().text().equals(PLACEMENT)) {
                placements.add(record.node());
            }
        }
        return placements;
    }

    private Set<Long> scansOf(Set<Long> placements) throws SQLException {
        Set<Long> scans = new HashSet<>();
        for (Edge edge : Edges.from(c, placements, Edges.ABOUT, watermark)) {
            if (edge.role().equals(SCAN)) {
                scans.add(edge.dst());
            }
        }
        return scans;
    }

    private Set<ThingId> things(Collection<Long> nodes) throws SQLException {
        Set<ThingId> things = new HashSet<>();
        Records.byNode(c, nodes, watermark).values().forEach(record -> things.add(record.thing()));
        return things;
    }

    private Set<Long> ofThings(Set<ThingId> things) throws SQLException {
        List<Located> records = new ArrayList<>(Records.ofThings(c, things, watermark));
        Set<Long> nodes = new HashSet<>();
        records.forEach(record -> nodes.add(record.node()));
        return nodes;
    }

    private static Set<Long> union(Set<Long> one, Set<Long> other) {
        Set<Long> both = new HashSet<>(one);
        both.addAll(other);
        return both;
    }
}
