package fringekeep.archive.internal.store.tables;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.ThingId;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Collection;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Questions to tables thing_number and origin. */
public final class Numbers {
    private Numbers() {}

    /** Numbers of things. */
    public static Map<ThingId, ThingNumber> of(Connection c, Collection<ThingId> things, long watermark)
            throws SQLException {
        Map<ThingId, ThingNumber> found = new TreeMap<>();
        for (ThingNumber number : Sql.in(
                c,
                "select archive, kind, number, thing from thing_number where thing in (" + Sql.MARKS + ") and n <= ?",
                things.stream()
                        .map(thing -> HexFormat.of().parseHex(thing.hex()))
                        .toList(),
                Numbers::number,
                watermark)) {
            found.put(number.thing(), number);
        }
        return found;
    }

    /** Things of a kind with a number, in this or any archive. */
    public static List<ThingNumber> find(Connection c, ArchiveId archive, String kind, long number, long watermark)
            throws SQLException {
        return Sql.list(
                c,
                "select archive, kind, number, thing from thing_number"
                        + " where archive = ? and kind = ? and number = ? and n <= ?",
                Numbers::number,
                HexFormat.of().parseHex(archive.hex()),
                kind,
                number,
                watermark);
    }

    /** Titles of other archives whose numbers are known here. */
    public static Map<ArchiveId, String> origins(Connection c) throws SQLException {
        Map<ArchiveId, String> titles = new TreeMap<>();
        Sql.list(
                c,
                "select archive, title from origin order by archive",
                row -> titles.put(archive(row.getBytes(1)), row.getString(2)));
        return titles;
    }

    private static ThingNumber number(ResultSet row) throws SQLException {
        return new ThingNumber(
                archive(row.getBytes(1)), row.getString(2), row.getLong(3), Located.thing(row.getBytes(4)));
    }

    private static ArchiveId archive(byte[] bytes) {
        return new ArchiveId(HexFormat.of().formatHex(bytes));
    }

    /**
     * A number and whose it is.
     *
     * @param archive the archive that gave it
     * @param kind kind
     * @param number 1, 2, 3 …
     * @param thing thing
     */
    public record ThingNumber(ArchiveId archive, String kind, long number, ThingId thing) {}
}
