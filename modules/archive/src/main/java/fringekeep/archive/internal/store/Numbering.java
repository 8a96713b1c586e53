package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Head;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.HexFormat;

/** Writes numbers of things. */
final class Numbering {
    private Numbering() {}

    static void insert(Connection c, ArchiveId archive, Head head, long number, long n) throws SQLException {
        Sql.run(
                c,
                "insert into thing_number (archive, kind, number, thing, n) values (?, ?, ?, ?, ?)",
                HexFormat.of().parseHex(archive.hex()),
                head.kind().text(),
                number,
                HexFormat.of().parseHex(head.thing().hex()),
                n);
    }

    /** Remembers what another archive calls itself. */
    static void origin(Connection c, ArchiveId archive, String title) throws SQLException {
        byte[] id = HexFormat.of().parseHex(archive.hex());
        if (Sql.run(c, "update origin set title = ? where archive = ?", title, id) == 0) {
            Sql.run(c, "insert into origin (archive, title) values (?, ?)", id, title);
        }
    }
}
