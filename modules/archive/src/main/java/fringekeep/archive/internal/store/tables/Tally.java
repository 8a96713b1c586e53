package fringekeep.archive.internal.store.tables;

import fringekeep.archive.internal.store.db.Sql;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.Map;
import java.util.TreeMap;

/**
 * Counts of one kind, kept up in every transaction so that nobody counts rows.
 *
 * @param records all of them
 * @param replaced how many of them some record corrects
 * @param numbered last number given here
 */
public record Tally(long records, long replaced, long numbered) {
    /** Nothing yet. */
    public static final Tally NONE = new Tally(0, 0, 0);

    /** All counts by kind. */
    public static Map<String, Tally> all(Connection c) throws SQLException {
        Map<String, Tally> found = new TreeMap<>();
        Sql.list(
                c,
                "select kind, records, replaced, numbered from tally order by kind",
                row -> found.put(row.getString(1), new Tally(row.getLong(2), row.getLong(3), row.getLong(4))));
        return found;
    }

    /** Writes the counts of one kind. */
    public static void save(Connection c, String kind, Tally tally) throws SQLException {
        int changed = Sql.run(
                c,
                "update tally set records = ?, replaced = ?, numbered = ? where kind = ?",
                tally.records,
                tally.replaced,
                tally.numbered,
                kind);
        if (changed == 0) {
            Sql.run(
                    c,
                    "insert into tally (kind, records, replaced, numbered) values (?, ?, ?, ?)",
                    kind,
                    tally.records,
                    tally.replaced,
                    tally.numbered);
        }
    }
}
