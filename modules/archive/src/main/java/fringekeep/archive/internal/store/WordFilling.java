package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Head;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * Works out the words of every record anew and mends the table where it says something else, so a stop leaves it usable at
 * any moment. Records of kinds this program cannot read keep the words they have.
 */
final class WordFilling {
    private static final int STEP = 100;
    private final Store store;
    private final Arriving arriving;

    WordFilling(Store store, Arriving arriving) {
        this.store = store;
        this.arriving = arriving;
    }

    /** Records that come meanwhile bring their words with them. */
    void rebuild(Work work) throws StoppedException {
        long watermark = store.state().watermark();
        for (long from = 1; from <= watermark; from += STEP) {
            work.check();
            work.progress(from - 1, watermark, "words");
            mend(from, Math.min(watermark, from + STEP - 1));
        }
        work.progress(watermark, watermark, "");
        store.<Integer, RuntimeException>write((c, progress) -> Sql.run(
                c,
                "delete from word where n <= ? and not exists (select 1 from record r where r.n = word.n)",
                watermark));
    }

    private void mend(long from, long to) {
        List<Records.HeadRow> heads =
                store.<List<Records.HeadRow>, RuntimeException>read(c -> Records.heads(c, from, to));
        Map<Long, Set<String>> now = new TreeMap<>();
        for (Records.HeadRow row : heads) {
            Head head = HeadReading.head(row);
            if (arriving.known(head).isPresent()) {
                now.put(row.record().n(), arriving.words(row.record().fingerprint(), head));
            }
        }
        store.<Boolean, RuntimeException>write((c, progress) -> {
            for (Map.Entry<Long, Set<String>> one : now.entrySet()) {
                if (!stored(c, one.getKey()).equals(one.getValue())) {
                    replace(c, one.getKey(), one.getValue());
                }
            }
            return true;
        });
    }

    /** Writes a record's words in place of those it has. */
    static void replace(Connection c, long n, Set<String> now) throws SQLException {
        Sql.run(c, "delete from word where n = ?", n);
        for (String word : now) {
            Sql.run(c, "insert into word (word, n) values (?, ?)", word, n);
        }
    }

    /** Words of a record in the table. */
    static Set<String> stored(Connection c, long n) throws SQLException {
        return new TreeSet<>(Sql.list(c, "select word from word where n = ?", row -> row.getString(1), n));
    }
}
