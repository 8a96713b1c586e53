package fringekeep.archive.internal.store.projection;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.listing.Row;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.Predicate;

/**
 * The declared tables of an archive: which there are, which are filled, and writing their rows. Statements run on the
 * connection given; which tables are ready is known to all threads.
 */
public final class Projections {
    private static final List<String> GENERATIONS = List.of("a", "b");
    private final Map<String, Declared> declared = new TreeMap<>();
    private final Map<String, String> ready = new ConcurrentHashMap<>();

    /** All that the kinds declare. */
    public Projections(Kinds kinds) {
        for (RecordKind kind : kinds.all()) {
            for (Projection projection : kind.projections()) {
                Declared before = declared.put(projection.name(), new Declared(projection, kind));
                if (before != null || !projection.kind().equals(kind.kind())) {
                    throw new IllegalArgumentException("projection " + projection.name() + " of " + kind.kind()
                            + " is declared twice or for another kind");
                }
            }
        }
    }

    /** Names of all declared tables, in order. */
    public List<String> names() {
        return List.copyOf(declared.keySet());
    }

    /** Kind whose records fill a table. */
    public KindName kind(String name) {
        return one(name).projection().kind();
    }

    Optional<Declared> find(String name) {
        return Optional.ofNullable(declared.get(name));
    }

    private Declared one(String name) {
        return find(name).orElseThrow(() -> new IllegalArgumentException("no projection " + name));
    }

    /** Generation of the table's indexes, if it can be asked. */
    Optional<String> generation(String name) {
        return Optional.ofNullable(ready.get(name));
    }

    /** Whether a table can be asked now. */
    public boolean isReady(String name) {
        return ready.containsKey(name);
    }

    /**
     * Finds out which tables are as declared and makes those empty ones that have no records yet.
     *
     * @param hasRecords whether a kind has records
     * @return tables that must be filled
     */
    public List<String> prepare(Connection c, Predicate<KindName> hasRecords, long watermark) throws SQLException {
        Map<String, Hash> kept = new TreeMap<>();
        Sql.list(
                c,
                "select name, declaration from projection order by name",
                row -> kept.put(row.getString(1), Hash.fromBytes(row.getBytes(2))));
        List<String> unfilled = new ArrayList<>();
        for (Declared one : declared.values()) {
            String name = one.projection().name();
            if (one.hash().equals(kept.get(name)) && existing(c, one).isPresent()) {
                ready.put(name, existing(c, one).get());
            } else if (!hasRecords.test(one.projection().kind())) {
                begin(c, name);
                finish(c, name, watermark);
                ready.put(name, pending(c, name));
            } else {
                // From now on its rows are not kept up, so a program that declares it as it was must not take it as
                // whole.
                Sql.run(c, "delete from projection where name = ?", name);
                unfilled.add(name);
            }
        }
        for (String name : kept.keySet()) {
            if (!declared.containsKey(name)) {
                Sql.run(c, "delete from projection where name = ?", name);
            }
        }
        return unfilled;
    }

    /** Which generation of indexes the table has, if there is a table. */
    private static Optional<String> existing(Connection c, Declared one) throws SQLException {
        for (String generation : GENERATIONS) {
            String index = unquoted(one.index(generation, "n_down"));
            Optional<String> table = Sql.first(
                    c,
                    "select t.tablename from sys.sysconglomerates g, sys.systables t"
                            + " where g.conglomeratename = ? and t.tableid = g.tableid",
                    row -> row.getString(1),
                    index);
            if (table.isPresent() && table.get().equals(unquoted(one.table()))) {
                return Optional.of(generation);
            }
        }
        return Optional.empty();
    }

    private static String unquoted(String name) {
        return name.substring(1, name.length() - 1);
    }

    private static boolean tableExists(Connection c, String quoted) throws SQLException {
        return Sql.first(
                        c,
                        "select tablename from sys.systables where tablename = ?",
                        row -> row.getString(1),
                        unquoted(quoted))
                .isPresent();
    }

    /** Makes the empty table in which rows are gathered; one that an interrupted filling left is thrown away. */
    public void begin(Connection c, String name) throws SQLException {
        Declared one = one(name);
        if (tableExists(c, one.newTable())) {
            execute(c, "drop table " + one.newTable());
        }
        String generation = existing(c, one).orElse("b").equals("a") ? "b" : "a";
        for (String statement : one.create(one.newTable(), generation)) {
            execute(c, statement);
        }
    }

    /** Puts the gathered rows in place of the old ones; within one transaction. The caller marks it ready after commit. */
    public void finish(Connection c, String name, long filledTo) throws SQLException {
        Declared one = one(name);
        if (tableExists(c, one.table())) {
            execute(c, "drop table " + one.table());
        }
        execute(c, "rename table " + one.newTable() + " to " + one.table());
        Sql.run(c, "delete from projection where name = ?", name);
        Sql.run(
                c,
                "insert into projection (name, kind, declaration, filled_to) values (?, ?, ?, ?)",
                name,
                one.projection().kind().text(),
                one.hash().bytes(),
                filledTo);
    }

    /** Generation that {@link #finish} has put in place. */
    public String pending(Connection c, String name) throws SQLException {
        return existing(c, one(name)).orElseThrow(() -> new IllegalStateException("no table for " + name));
    }

    /** From now on the table can be asked. */
    public void markReady(String name, String generation) {
        ready.put(name, generation);
    }

    /** Rows of a kind arrived that this program cannot project: the tables are not whole any more. */
    public void forget(Connection c, KindName kind) throws SQLException {
        Sql.run(c, "delete from projection where kind = ?", kind.text());
    }

    /** Writes a record's rows into the tables in use; tables not ready get theirs when they are filled. */
    public void insert(Connection c, long n, Collection<ProjectedRow> rows) throws SQLException {
        for (ProjectedRow row : rows) {
            if (ready.containsKey(row.projection())) {
                insert(c, one(row.projection()), one(row.projection()).table(), n, row);
            }
        }
    }

    /** Writes rows into the table that is being filled. */
    public void gather(Connection c, long n, Collection<ProjectedRow> rows) throws SQLException {
        for (ProjectedRow row : rows) {
            Declared one = one(row.projection());
            insert(c, one, one.newTable(), n, row);
        }
    }

    private static void insert(Connection c, Declared one, String table, long n, ProjectedRow row) throws SQLException {
        List<Object> values = new ArrayList<>();
        values.add(n);
        values.add(row.seq());
        for (Column column : one.projection().columns()) {
            Object value = row.row().values().get(column.name());
            values.add(
                    value == null || !Cells.holdable(value)
                            ? Cells.nothing(column.sort())
                            : Cells.stored(column, value));
        }
        Sql.run(c, one.insert(table), values.toArray());
    }

    /** Takes a record's rows away: before they are made anew, or because what they show was purged. */
    public void delete(Connection c, long n, KindName kind) throws SQLException {
        for (Declared one : declared.values()) {
            if (one.projection().kind().equals(kind)
                    && ready.containsKey(one.projection().name())) {
                Sql.run(c, "delete from " + one.table() + " where n = ?", n);
            }
        }
    }

    /** Names, as the engine has them, of all tables of a kind. */
    public List<String> tables(KindName kind) {
        return declared.values().stream()
                .filter(one -> one.projection().kind().equals(kind))
                .map(one -> unquoted(one.table()))
                .toList();
    }

    /** Stored rows of a record in one table, for comparing. */
    public List<Row> stored(Connection c, String name, long n) throws SQLException {
        Declared one = one(name);
        return Sql.list(
                c,
                "select " + one.columnList() + " from " + one.table() + " where n = ? order by seq",
                row -> RowReading.row(row, 1, one.projection().columns()),
                n);
    }

    /** What a row looks like once stored. */
    public Row asStored(String name, Row row) {
        Map<String, Object> values = new TreeMap<>();
        for (Column column : one(name).projection().columns()) {
            Object value = row.values().get(column.name());
            if (value != null && Cells.holdable(value)) {
                values.put(column.name(), Cells.kept(column, value));
            }
        }
        return new Row(values);
    }

    /** How many rows a table has, and how many of them belong to records; for checking only. */
    public long rowsWithoutRecord(Connection c, String name) throws SQLException {
        Declared one = one(name);
        return Sql.first(
                        c,
                        "select count(*) from " + one.table()
                                + " p where not exists (select 1 from record r where r.n = p.n and r.kind = ?)",
                        row -> row.getLong(1),
                        one.projection().kind().text())
                .orElse(0L);
    }

    private static void execute(Connection c, String text) throws SQLException {
        try (Statement statement = c.createStatement()) {
            statement.executeUpdate(text);
        }
    }
}
