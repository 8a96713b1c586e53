package fringekeep.archive.internal.store.tables;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.record.Hash;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;
import java.util.Optional;

/** Questions to table journal. */
public final class JournalTable {
    private JournalTable() {}

    /** Entries from {@code from} to {@code to}, in order. */
    public static List<EntryRow> entries(Connection c, long from, long to) throws SQLException {
        return Sql.list(
                c,
                "select n, sha, act, bytes from journal where n >= ? and n <= ? order by n",
                row -> new EntryRow(row.getLong(1), Hash.fromBytes(row.getBytes(2)), row.getString(3), row.getBytes(4)),
                from,
                to);
    }

    /** Entries of one act, in order. */
    public static List<EntryRow> ofAct(Connection c, String act, long watermark) throws SQLException {
        return Sql.list(
                c,
                "select n, sha, act, bytes from journal where act = ? and n <= ? order by n",
                row -> new EntryRow(row.getLong(1), Hash.fromBytes(row.getBytes(2)), row.getString(3), row.getBytes(4)),
                act,
                watermark);
    }

    /** The last entry, if there is one. */
    public static Optional<EntryRow> last(Connection c) throws SQLException {
        Optional<Long> n = Sql.first(c, "select max(n) from journal", row -> row.getLong(1));
        return n.isEmpty() || n.get() == 0
                ? Optional.empty()
                : entries(c, n.get(), n.get()).stream().findFirst();
    }

    /** An entry's row. */
    public record EntryRow(long n, Hash sha256, String act, byte[] bytes) {}
}
