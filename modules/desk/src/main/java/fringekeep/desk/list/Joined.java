package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.desk.session.Register;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Rows of records linked with a record: its placement, its preferred or newest fit. Keeps what it has read. */
public final class Joined {
    private final Archive archive;
    private final Register register;
    private final Map<Hash, Row> rows = new HashMap<>();

    /** Reads from an archive at the register's watermark. */
    public Joined(Archive archive, Register register) {
        this.archive = archive;
        this.register = register;
    }

    /** The declared table of a kind that lists show. */
    public static Optional<Projection> table(Archive archive, String kind) {
        return archive.kinds().get(new KindName(kind)).map(RecordKind::projections).stream()
                .flatMap(List::stream)
                .findFirst();
    }

    /** A column of a kind's first table, if it declares it. */
    public static Optional<Column> column(Archive archive, String kind, String name) {
        return table(archive, kind).stream()
                .flatMap(table -> table.columns().stream())
                .filter(column -> column.name().equals(name))
                .findFirst();
    }

    /** The record of a kind that speaks of or was made from a record: preferred, else the newest that stands. */
    public Optional<Hash> linked(Hash record, String kind) {
        Graph graph = register.graph();
        Optional<Hash> best = Optional.empty();
        boolean preferred = false;
        for (Link link : graph.links(record)) {
            Hash other = link.from().equals(record) ? link.to() : link.from();
            boolean counts = link.sort() == LinkSort.INPUT || link.sort() == LinkSort.ABOUT;
            Set<StateName> states = graph.states(other);
            if (!counts
                    || !register.kind(other).orElse("").equals(kind)
                    || states.contains(StateName.CORRECTED)
                    || states.contains(StateName.WITHDRAWN)) {
                continue;
            }
            boolean better = states.contains(StateName.PREFERRED);
            if (best.isEmpty() || better || (!preferred && newer(other, best.get()))) {
                best = Optional.of(other);
                preferred = preferred || better;
            }
        }
        return best;
    }

    private boolean newer(Hash one, Hash other) {
        return archive.recorded(one).map(Archive.Recorded::n).orElse(0L)
                > archive.recorded(other).map(Archive.Recorded::n).orElse(0L);
    }

    /** First row of a record in its kind's first table. */
    public Row row(Hash record) {
        return rows.computeIfAbsent(record, this::read);
    }

    private Row read(Hash record) {
        Optional<RecordView> view = archive.record(record);
        if (view.isEmpty()) {
            return new Row(Map.of());
        }
        RecordView at = view.get();
        return archive.kinds()
                .get(at.head().kind())
                .flatMap(kind -> kind.projections().stream()
                        .findFirst()
                        .flatMap(table ->
                                kind.rows(table, at, archive.inputs(record)).findFirst()))
                .orElseGet(() -> new Row(Map.of()));
    }
}
