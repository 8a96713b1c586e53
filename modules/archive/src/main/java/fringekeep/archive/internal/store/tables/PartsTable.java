package fringekeep.archive.internal.store.tables;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.record.Hash;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;
import java.util.Optional;

/** Questions to tables part, record_part, payload, record_payload and raw_file. */
public final class PartsTable {
    private PartsTable() {}

    /** Exact bytes of a part. */
    public static Optional<byte[]> part(Connection c, Hash part, long watermark) throws SQLException {
        return Sql.first(
                c, "select bytes from part where sha = ? and n <= ?", row -> row.getBytes(1), part.bytes(), watermark);
    }

    /** Parts that entry {@code n} brought, with the names under which its record knows them. */
    public static List<Brought> broughtBy(Connection c, long n) throws SQLException {
        return Sql.list(
                c,
                "select q.name, q.sha, p.bytes from --DERBY-PROPERTIES joinOrder=FIXED\n record_part q, part p"
                        + " where q.n = ? and p.sha = q.sha and p.n = q.n order by q.name",
                row -> new Brought(row.getString(1), Hash.fromBytes(row.getBytes(2)), row.getBytes(3)),
                n);
    }

    /** Records (entries) that have a part. */
    public static List<Long> usersOfPart(Connection c, Hash part) throws SQLException {
        return Sql.list(c, "select n from record_part where sha = ? order by n", row -> row.getLong(1), part.bytes());
    }

    /** Records (entries) that carry a payload. */
    public static List<Long> usersOfPayload(Connection c, Hash payload) throws SQLException {
        return Sql.list(
                c, "select n from record_payload where sha = ? order by n", row -> row.getLong(1), payload.bytes());
    }

    /** What is known of a payload. */
    public static Optional<Payload> payload(Connection c, Hash payload, long watermark) throws SQLException {
        return Sql.first(
                c,
                "select size, bytes from payload where sha = ? and n <= ?",
                row -> new Payload(row.getLong(1), Optional.ofNullable(row.getBytes(2))),
                payload.bytes(),
                watermark);
    }

    /** Payloads or raw files, a page by hash. */
    public static List<Listed> page(Connection c, boolean raw, byte[] after, long watermark) throws SQLException {
        String text = raw
                ? "select sha, n, size from raw_file where sha > ? and n <= ? order by sha fetch first 500 rows only"
                : "select sha, n, size from payload where sha > ? and n <= ? order by sha fetch first 500 rows only";
        return Sql.list(
                c,
                text,
                row -> new Listed(Hash.fromBytes(row.getBytes(1)), row.getLong(2), row.getLong(3)),
                after,
                watermark);
    }

    /** Length of a raw file that some record names, if its bytes were never purged. */
    public static Optional<Long> rawSize(Connection c, Hash raw) throws SQLException {
        return Sql.first(c, "select size from raw_file where sha = ?", row -> row.getLong(1), raw.bytes());
    }

    /** A part and what brought it. */
    public record Brought(String name, Hash sha256, byte[] bytes) {}

    /** A payload's length, and its bytes if they lie in the table. */
    public record Payload(long size, Optional<byte[]> bytes) {}

    /** A file's row. */
    public record Listed(Hash sha256, long n, long size) {}
}
