package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.SqlWork;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;

/**
 * The archive as a check sees it: all that was committed up to one entry.
 *
 * @param store the archive
 * @param state at the beginning of the check
 */
record Snapshot(Store store, State state) {
    private static final long STEP = 200;

    long watermark() {
        return state.watermark();
    }

    <T> T read(SqlWork<T, RuntimeException> work) {
        return store.<T, RuntimeException>read(work);
    }

    /** Does something for ranges of entries, up to the watermark. */
    void eachRange(Work work, String what, Range range) throws StoppedException {
        for (long from = 1; from <= watermark(); from += STEP) {
            work.check();
            work.progress(from, watermark(), what);
            range.check(from, Math.min(watermark(), from + STEP - 1));
        }
    }

    /** Does something for the rows of a table, a page by key. */
    <T> void eachPage(Work work, String what, byte[] start, Page<T> page, Key<T> key, Use<T> use)
            throws StoppedException {
        byte[] after = start;
        long done = 0;
        while (true) {
            byte[] from = after;
            List<T> rows = read(c -> page.after(c, from));
            if (rows.isEmpty()) {
                return;
            }
            for (T row : rows) {
                use.check(row);
            }
            work.check();
            work.progress(done += rows.size(), 0, what);
            after = key.of(rows.get(rows.size() - 1));
        }
    }

    /** Whether bytes were purged, now or since the check began. */
    boolean purged(fringekeep.archive.record.Hash hash) {
        return store.state().purged().contains(hash);
    }

    /** One number. */
    long count(String text, Object... values) {
        return read(c -> Sql.first(c, text, row -> row.getLong(1), values).orElse(0L));
    }

    @FunctionalInterface
    interface Range {
        void check(long from, long to);
    }

    @FunctionalInterface
    interface Page<T> {
        List<T> after(Connection c, byte[] key) throws SQLException;
    }

    @FunctionalInterface
    interface Key<T> {
        byte[] of(T row);
    }

    @FunctionalInterface
    interface Use<T> {
        void check(T row);
    }
}
