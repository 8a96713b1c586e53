package fringekeep.archive.internal.store.tables;

import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.ThingId;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.HexFormat;

/**
 * A record's row without its head.
 *
 * @param fingerprint SHA-256 of the head
 * @param n journal entry
 * @param node number in the graph
 * @param kind kind
 * @param thing thing
 */
public record Located(Hash fingerprint, long n, long node, KindName kind, ThingId thing) {
    static final String COLUMNS = "x.sha, r.n, r.node, r.kind, r.thing";

    static Located of(ResultSet row) throws SQLException {
        return new Located(
                Hash.fromBytes(row.getBytes(1)),
                row.getLong(2),
                row.getLong(3),
                new KindName(row.getString(4)),
                thing(row.getBytes(5)));
    }

    static ThingId thing(byte[] bytes) {
        return new ThingId(HexFormat.of().formatHex(bytes));
    }
}
