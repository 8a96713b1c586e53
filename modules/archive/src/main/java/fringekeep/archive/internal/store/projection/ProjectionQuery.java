package fringekeep.archive.internal.store.projection;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Listing.Filter;
import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Rows of one projection in an order, from a key on. Paging is by key: each step is a range of an index, so a page far down
 * costs what the first costs. Absent values come last either way.
 */
public final class ProjectionQuery {
    private static final String BY_ENTRY = "n";
    private final Declared declared;
    private final String generation;
    private final Listing listing;
    private final Optional<Column> order;
    private final String filterText;
    private final List<Object> filterValues = new ArrayList<>();
    private final long watermark;

    /**
     * Examines the question.
     *
     * @throws ProblemException if it names no known table or column, or the table is being made anew
     */
    public ProjectionQuery(Projections projections, Listing listing, long watermark) throws ProblemException {
        this.listing = listing;
        this.watermark = watermark;
        this.declared = projections
                .find(listing.projection())
                .orElseThrow(() -> problem(
                        "listing.projection",
                        "There is no list \"" + listing.projection() + "\".",
                        "Lists are: " + String.join(", ", projections.names()) + "."));
        this.generation = projections
                .generation(listing.projection())
                .orElseThrow(() -> problem(
                        "listing.rebuilding",
                        "The list \"" + listing.projection() + "\" is being made anew.",
                        "Ask again in a while, or rebuild the lists if that was stopped."));
        this.order = listing.orderBy().equals(BY_ENTRY) ? Optional.empty() : Optional.of(column(listing.orderBy()));
        this.filterText = filters();
        if (listing.limit() < 1 || listing.limit() > 10_000) {
            throw problem("listing.limit", "A page has 1 to 10,000 rows, not " + listing.limit() + ".", "");
        }
    }

    private Column column(String name) throws ProblemException {
        return declared.column(name)
                .orElseThrow(() -> problem(
                        "listing.column",
                        "The list \"" + listing.projection() + "\" has no column \"" + name + "\".",
                        "Columns are: n, "
                                + String.join(
                                        ", ",
                                        declared.projection().columns().stream()
                                                .map(Column::name)
                                                .toList())
                                + "."));
    }

    private ProblemException problem(String code, String what, String mend) {
        return new ProblemException(new Problem(code, what, listing.projection(), mend));
    }

    private String filters() throws ProblemException {
        StringBuilder text = new StringBuilder();
        for (Filter filter : listing.filters()) {
            Column column = column(filter.column());
            text.append(" and ").append(condition(filter, Declared.quoted(column.name())));
            if (filter.comparison() != Listing.Comparison.ABSENT && filter.comparison() != Listing.Comparison.PRESENT) {
                filterValues.add(value(column, filter.value()));
            }
        }
        return text.toString();
    }

    private Object value(Column column, Object value) throws ProblemException {
        try {
            return Cells.stored(column, value);
        } catch (IllegalArgumentException e) {
            throw problem(
                    "listing.value",
                    "Column \"" + column.name() + "\" holds " + column.sort() + ", not \"" + value + "\".",
                    "Give a value of that sort.");
        }
    }

    private static String condition(Filter filter, String column) {
        return switch (filter.comparison()) {
            case IS -> column + " = ?";
            case IS_NOT -> "(" + column + " <> ? or " + column + " is null)";
            case AT_LEAST -> column + " >= ?";
            case BELOW -> column + " < ?";
            case ABSENT -> column + " is null";
            case PRESENT -> column + " is not null";
        };
    }

    /** Up to {@code size} rows after a key. */
    public List<Found> next(Connection c, Optional<Page.Key> after, int size) throws SQLException {
        List<Found> rows = new ArrayList<>();
        for (Range range : ranges(after)) {
            if (rows.size() < size) {
                rows.addAll(range(c, range, size - rows.size()));
            }
        }
        return rows;
    }

    /** A stretch of the order: condition, its values, order. */
    private record Range(String condition, List<Object> values, String order) {}

    private List<Range> ranges(Optional<Page.Key> after) {
        List<Range> ranges = new ArrayList<>();
        String down = listing.descending() ? " desc" : "";
        String beyond = listing.descending() ? " < ?" : " > ?";
        String byEntry = "n" + down + ", seq" + down;
        if (order.isEmpty()) {
            after.ifPresent(
                    key -> ranges.add(new Range("n = ? and seq" + beyond, List.of(key.n(), key.seq()), byEntry)));
            ranges.add(after.map(key -> new Range("n" + beyond, List.of(key.n()), byEntry))
                    .orElseGet(() -> new Range("1 = 1", List.of(), byEntry)));
            return ranges;
        }
        String column = Declared.quoted(order.get().name());
        String byColumn = column + down + ", " + byEntry;
        if (after.isEmpty()) {
            ranges.add(new Range(column + " is not null", List.of(), byColumn));
            ranges.add(new Range(column + " is null", List.of(), byEntry));
        } else if (after.get().value().isEmpty()) {
            sameValue(ranges, column + " is null", List.of(), after.get(), beyond, byEntry);
        } else {
            Object value = Cells.stored(order.get(), after.get().value().get());
            sameValue(ranges, column + " = ?", List.of(value), after.get(), beyond, byEntry);
            ranges.add(new Range(column + beyond, List.of(value), byColumn));
            ranges.add(new Range(column + " is null", List.of(), byEntry));
        }
        return ranges;
    }

    private static void sameValue(
            List<Range> ranges, String same, List<Object> values, Page.Key key, String beyond, String byEntry) {
        List<Object> sameEntry = new ArrayList<>(values);
        sameEntry.add(key.n());
        sameEntry.add(key.seq());
        ranges.add(new Range(same + " and n = ? and seq" + beyond, sameEntry, byEntry));
        List<Object> later = new ArrayList<>(values);
        later.add(key.n());
        ranges.add(new Range(same + " and n" + beyond, later, byEntry));
    }

    private List<Found> range(Connection c, Range range, int size) throws SQLException {
        List<Object> values = new ArrayList<>(range.values());
        values.addAll(filterValues);
        values.add(watermark);
        values.add(size);
        String text = "select n, seq, " + declared.columnList() + " from " + declared.table() + hint()
                + " where " + range.condition() + filterText + " and n <= ? order by " + range.order()
                + " fetch first ? rows only";
        return Sql.list(c, text, this::found, values.toArray());
    }

    /** Names the index whose order is asked, so that no page ever sorts the table. */
    private String hint() {
        String way = listing.descending() ? "down_" : "up_";
        Optional<String> index = order.isPresent()
                ? declared.indexOn(order.get().name()).map(i -> declared.index(generation, way + i))
                : equalIndex().map(i -> declared.index(generation, way + i)).or(this::entryIndex);
        return index.map(name -> " --DERBY-PROPERTIES index=" + name + "\n").orElse("");
    }

    private Optional<Integer> equalIndex() {
        return listing.filters().stream()
                .filter(filter -> filter.comparison() == Listing.Comparison.IS)
                .map(filter -> declared.indexOn(filter.column()))
                .flatMap(Optional::stream)
                .filter(i -> declared.projection().indexes().get(i).size() == 1)
                .findFirst();
    }

    private Optional<String> entryIndex() {
        return listing.descending() ? Optional.of(declared.index(generation, "n_down")) : Optional.empty();
    }

    /** Rows that belong to some entries, in the asked order, after the key. */
    public List<Found> among(Connection c, Collection<Long> entries) throws SQLException {
        List<Object> values = new ArrayList<>(filterValues);
        values.add(watermark);
        String text = "select n, seq, " + declared.columnList() + " from " + declared.table() + " where n in ("
                + Sql.MARKS + ")" + filterText + " and n <= ?";
        List<Found> rows = new ArrayList<>(Sql.in(c, text, entries, this::found, values.toArray()));
        rows.sort(comparator());
        return listing.after()
                .map(key -> rows.stream()
                        .filter(row -> comparator().compare(atKey(key), row) < 0)
                        .toList())
                .orElse(rows);
    }

    private static Found atKey(Page.Key key) {
        return new Found(key.n(), key.seq(), key.value(), new Row(Map.of()));
    }

    private Comparator<Found> comparator() {
        Comparator<Found> byEntry = Comparator.comparingLong(Found::n).thenComparingInt(Found::seq);
        Comparator<Found> directed = listing.descending() ? byEntry.reversed() : byEntry;
        if (order.isEmpty()) {
            return directed;
        }
        Comparator<Object> values = ProjectionQuery::compare;
        Comparator<Object> directedValues = listing.descending() ? values.reversed() : values;
        return Comparator.<Found, Boolean>comparing(row -> row.order().isEmpty())
                .thenComparing(
                        (one, other) -> one.order().isEmpty() || other.order().isEmpty()
                                ? 0
                                : directedValues.compare(
                                        one.order().get(), other.order().get()))
                .thenComparing(directed);
    }

    @SuppressWarnings("unchecked") // values of one column are of one class, which compares with itself
    private static int compare(Object one, Object other) {
        return ((Comparable<Object>) one).compareTo(other);
    }

    private Found found(ResultSet result) throws SQLException {
        Row row = RowReading.row(result, 3, declared.projection().columns());
        Optional<Object> value = order.map(column -> row.values().get(column.name()));
        return new Found(result.getLong(1), result.getInt(2), value, row);
    }
}
