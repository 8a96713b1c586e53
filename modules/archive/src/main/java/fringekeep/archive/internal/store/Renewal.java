package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.projection.ProjectedRow;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.record.Head;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;
import java.util.Set;

/**
 * Words and rows of a stored record, worked out anew because a part came or went.
 *
 * @param record its row
 * @param words words now
 * @param rows rows now
 */
record Renewal(Located record, Set<String> words, List<ProjectedRow> rows) {
    static Renewal of(Located record, Head head, Arriving arriving) {
        return new Renewal(
                record, arriving.words(record.fingerprint(), head), arriving.rows(record.fingerprint(), head));
    }

    void write(Connection c, Projections projections) throws SQLException {
        WordFilling.replace(c, record.n(), words);
        projections.delete(c, record.n(), record.kind());
        projections.insert(c, record.n(), rows);
    }
}
