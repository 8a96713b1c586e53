package fringekeep.desk.list;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.Graph.Link;
import fringekeep.archive.graph.Graph.LinkSort;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.desk.session.Register;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Rows of records linked with a record: its placement, its preferred or newest fit. Keeps what it has read. */
public final class Joined {
    private final Archive archive;
    private final Register register;
    private static final int PAGE = 10_000;
    private static final int MOST = 50_000;
    private final Map<Hash, Row> rows = new HashMap<>();
    private final Set<String> loaded = new HashSet<>();

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
            boolean counts = link.sort() == LinkSort.ABOUT || (link.sort() == LinkSort.INPUT && asItself(link));
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

    /** Whether the input plays the role of its own kind: a scan that is fitted, not one taken as reference. */
    private boolean asItself(Link link) {
        return link.role().equals(register.kind(link.to()).orElse(""));
    }

    private boolean newer(Hash one, Hash other) {
        return register.place(one) > register.place(other);
    }

    /** First row of a record in its kind's first table; the whole table is read at the first asking. */
    public Row row(Hash record) {
        register.kind(record).filter(loaded::add).ifPresent(this::load);
        return rows.computeIfAbsent(record, this::read);
    }

    private void load(String kind) {
        Optional<Projection> table = table(archive, kind);
        if (table.isEmpty()) {
            return;
        }
        Optional<Page.Key> after = Optional.empty();
        try {
            do {
                Page page = archive.list(new Listing(
                        table.get().name(), List.of(), true, List.of(), Optional.empty(), "n", false, after, PAGE));
                page.rows().forEach(line -> rows.putIfAbsent(line.record(), line.row()));
                after = page.last();
            } while (after.isPresent() && rows.size() < MOST);
        } catch (ProblemException e) {
            throw new IllegalStateException(
                    "a declared table cannot be read: " + table.get().name(), e);
        }
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
