package fringekeep.archive.internal.store.tables;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.ThingId;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.Collection;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/** Questions to tables node and record. */
public final class Records {
    private Records() {}

    /** A record by fingerprint. */
    public static Optional<Located> find(Connection c, Hash fingerprint, long watermark) throws SQLException {
        return Sql.first(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n node x, record r"
                        + " where r.node = x.id and x.sha = ? and r.n <= ?",
                Located::of,
                fingerprint.bytes(),
                watermark);
    }

    /** Exact bytes of a head. */
    public static Optional<byte[]> head(Connection c, Hash fingerprint, long watermark) throws SQLException {
        return Sql.first(
                c,
                "select r.head from --DERBY-PROPERTIES joinOrder=FIXED\n node x, record r"
                        + " where r.node = x.id and x.sha = ? and r.n <= ?",
                row -> row.getBytes(1),
                fingerprint.bytes(),
                watermark);
    }

    /** Heads of entries {@code from} to {@code to}, by entry; entries without a record are left out. */
    public static List<HeadRow> heads(Connection c, long from, long to) throws SQLException {
        return Sql.list(
                c,
                "select " + Located.COLUMNS + ", r.head from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.n >= ? and r.n <= ? order by r.n",
                row -> new HeadRow(Located.of(row), row.getBytes(6)),
                from,
                to);
    }

    /** Records of entries {@code from} to {@code to}, in order. */
    public static List<Located> between(Connection c, long from, long to) throws SQLException {
        return Sql.list(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.n >= ? and r.n <= ? order by r.n",
                Located::of,
                from,
                to);
    }

    /** Records by node. */
    public static Map<Long, Located> byNode(Connection c, Collection<Long> nodes, long watermark) throws SQLException {
        Map<Long, Located> found = new TreeMap<>();
        for (Located record : Sql.in(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.node in (" + Sql.MARKS + ") and r.n <= ?",
                nodes,
                Located::of,
                watermark)) {
            found.put(record.node(), record);
        }
        return found;
    }

    /** Records by journal entry. */
    public static Map<Long, Located> byEntry(Connection c, Collection<Long> entries) throws SQLException {
        Map<Long, Located> found = new TreeMap<>();
        for (Located record : Sql.in(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.n in (" + Sql.MARKS + ")",
                entries,
                Located::of)) {
            found.put(record.n(), record);
        }
        return found;
    }

    /** All records of a thing in journal order. */
    public static List<Located> ofThing(Connection c, ThingId thing, long watermark) throws SQLException {
        return Sql.list(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.thing = ? and r.n <= ? order by r.n",
                Located::of,
                HexFormat.of().parseHex(thing.hex()),
                watermark);
    }

    /** Nodes of all records of many things. */
    public static List<Located> ofThings(Connection c, Collection<ThingId> things, long watermark) throws SQLException {
        return Sql.in(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.thing in (" + Sql.MARKS + ") and r.n <= ?",
                things.stream()
                        .map(thing -> HexFormat.of().parseHex(thing.hex()))
                        .toList(),
                Located::of,
                watermark);
    }

    /** Records of a kind from an entry on, in journal order. */
    public static List<Located> ofKind(Connection c, String kind, long from, long watermark, int limit)
            throws SQLException {
        return Sql.list(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n record r, node x"
                        + " where x.id = r.node and r.kind = ? and r.n >= ? and r.n <= ? order by r.n"
                        + " fetch first ? rows only",
                Located::of,
                kind,
                from,
                watermark,
                limit);
    }

    /** Records whose fingerprints lie between two hashes, both included; at most 100. */
    public static List<Located> between(Connection c, Hash from, Hash to, long watermark) throws SQLException {
        return Sql.list(
                c,
                "select " + Located.COLUMNS + " from --DERBY-PROPERTIES joinOrder=FIXED\n node x, record r"
                        + " where r.node = x.id and x.sha >= ? and x.sha <= ? and r.n <= ? order by x.sha"
                        + " fetch first 100 rows only",
                Located::of,
                from.bytes(),
                to.bytes(),
                watermark);
    }

    /** Number of a hash in the graph. */
    public static Optional<Long> node(Connection c, Hash hash) throws SQLException {
        return Sql.first(c, "select id from node where sha = ?", row -> row.getLong(1), hash.bytes());
    }

    /** Hashes of nodes. */
    public static Map<Long, Hash> hashes(Connection c, Collection<Long> nodes) throws SQLException {
        Map<Long, Hash> found = new TreeMap<>();
        Sql.in(
                c,
                "select id, sha from node where id in (" + Sql.MARKS + ")",
                nodes,
                row -> found.put(row.getLong(1), Hash.fromBytes(row.getBytes(2))));
        return found;
    }

    /**
     * A record's row.
     *
     * @param record without its head
     * @param head exact bytes of the head
     */
    public record HeadRow(Located record, byte[] head) {}
}
