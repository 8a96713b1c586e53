package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.projection.Found;
import fringekeep.archive.internal.store.projection.ProjectionQuery;
import fringekeep.archive.internal.store.tables.Edges;
import fringekeep.archive.internal.store.tables.Edges.Edge;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;

/** Answers a listing: rows from their table, what the archive adds, key of the last row. */
final class ListingAnswer {
    private static final int STEP = 256;
    private final Connection c;
    private final State state;
    private final ProjectionQuery query;
    private final Listing listing;

    /** The asked for rows, with their records. */
    private record Lines(List<Found> rows, Map<Long, Located> records) {}

    ListingAnswer(Connection c, State state, ProjectionQuery query, Listing listing) {
        this.c = c;
        this.state = state;
        this.query = query;
        this.listing = listing;
    }

    /** The page. */
    Page page() throws SQLException, ProblemException {
        Lines lines = lines();
        Map<Long, String> labels = new Labels(c, state.archive(), state.watermark())
                .of(lines.records().values());
        List<Page.Line> page = new ArrayList<>();
        for (Found row :
                lines.rows().subList(0, Math.min(listing.limit(), lines.rows().size()))) {
            Located record = Objects.requireNonNull(lines.records().get(row.n()));
            page.add(new Page.Line(
                    record.fingerprint(), row.n(), Objects.requireNonNull(labels.get(record.node())), row.row()));
        }
        boolean more = lines.rows().size() > listing.limit();
        Optional<Page.Key> last =
                more ? Optional.of(lines.rows().get(listing.limit() - 1).key()) : Optional.empty();
        return new Page(page, last, state.watermark());
    }

    /** One row more than asked for, if there is one. */
    private Lines lines() throws SQLException, ProblemException {
        Optional<Set<Long>> candidates = candidates();
        return candidates.isPresent() ? among(candidates.get()) : all();
    }

    private Lines all() throws SQLException {
        List<Found> rows = new ArrayList<>();
        Map<Long, Located> records = new HashMap<>();
        Optional<Page.Key> key = listing.after();
        while (rows.size() <= listing.limit()) {
            List<Found> step = query.next(c, key, Math.max(STEP, listing.limit() + 1));
            if (step.isEmpty()) {
                break;
            }
            key = Optional.of(step.get(step.size() - 1).key());
            keep(step, rows, records);
        }
        return new Lines(rows, records);
    }

    private Lines among(Set<Long> entries) throws SQLException {
        List<Found> rows = new ArrayList<>();
        Map<Long, Located> records = new HashMap<>();
        keep(query.among(c, entries), rows, records);
        return new Lines(rows, records);
    }

    private void keep(List<Found> step, List<Found> rows, Map<Long, Located> records) throws SQLException {
        Map<Long, Located> found =
                Records.byEntry(c, new TreeSet<>(step.stream().map(Found::n).toList()));
        Set<Long> replaced = listing.currentOnly() ? replaced(found) : Set.of();
        for (Found row : step) {
            Located record = found.get(row.n());
            if (record != null && !replaced.contains(record.node())) {
                rows.add(row);
                records.put(row.n(), record);
            }
        }
    }

    private Set<Long> replaced(Map<Long, Located> records) throws SQLException {
        List<Long> nodes = records.values().stream().map(Located::node).toList();
        Set<Long> replaced = new HashSet<>();
        for (Edge edge : Edges.to(c, nodes, Edges.CORRECTS, state.watermark())) {
            replaced.add(edge.dst());
        }
        return replaced;
    }

    /** Entries that words and links leave; empty when neither is asked. */
    private Optional<Set<Long>> candidates() throws SQLException, ProblemException {
        Optional<Set<Long>> entries = Optional.empty();
        for (String word : Words.of(listing.words().stream())) {
            entries = Optional.of(common(entries, withWord(word)));
        }
        if (listing.linkedWith().isPresent()) {
            entries = Optional.of(common(entries, linked(listing.linkedWith().get())));
        }
        return entries;
    }

    private static Set<Long> common(Optional<Set<Long>> before, Set<Long> found) {
        before.ifPresent(found::retainAll);
        return found;
    }

    private Set<Long> withWord(String beginning) throws SQLException {
        return new HashSet<>(Sql.list(
                c,
                "select n from word where word >= ? and word < ? and n <= ?",
                row -> row.getLong(1),
                beginning,
                beginning + Character.MAX_VALUE,
                state.watermark()));
    }

    private Set<Long> linked(Hash with) throws SQLException, ProblemException {
        Located record = Records.find(c, with, state.watermark())
                .orElseThrow(() -> new ProblemException(new Problem(
                        "record.absent",
                        "The record " + with.shortForm() + " is not in this archive.",
                        listing.projection(),
                        "Name a record that is here.")));
        Set<Long> nodes = new Linked(c, state.watermark()).of(record);
        Stream<Long> entries =
                Records.byNode(c, nodes, state.watermark()).values().stream().map(Located::n);
        return new HashSet<>(entries.toList());
    }
}
