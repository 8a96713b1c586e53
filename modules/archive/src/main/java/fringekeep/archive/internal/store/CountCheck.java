package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.tables.Tally;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.ArchiveId;
import java.util.HexFormat;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;

/** Counts the rows that are otherwise never counted, and compares them with the counts kept. */
final class CountCheck {
    private final Snapshot at;
    private final Faults faults;

    CountCheck(Snapshot at, Faults faults) {
        this.at = at;
        this.faults = faults;
    }

    void check(Work work) throws StoppedException {
        work.check();
        Map<String, Tally> kept = at.store().database().<Map<String, Tally>, RuntimeException>readCommitted(Tally::all);
        if (at.store().state().watermark() != at.watermark()) {
            return; // something was recorded meanwhile; the counts kept are ahead of this check
        }
        Map<String, Tally> counted = counted();
        TreeSet<String> kinds = new TreeSet<>(kept.keySet());
        kinds.addAll(counted.keySet());
        for (String kind : kinds) {
            Tally one = kept.getOrDefault(kind, Tally.NONE);
            Tally other = counted.getOrDefault(kind, Tally.NONE);
            if (!one.equals(other)) {
                faults.add(
                        "count.differs",
                        "The counts kept are " + one + ", the rows give " + other + ".",
                        "kind " + kind,
                        "Restore the archive from a plain copy: counts are made anew then.");
            }
        }
        if (!kept.equals(at.state().tallies())) {
            faults.damaged("count.table", "The counts in the table are not those in use.", "table tally");
        }
    }

    private Map<String, Tally> counted() {
        ArchiveId own = at.state().archive();
        Map<String, Long> records =
                counts("select kind, count(*) from record where n <= ? group by kind", at.watermark());
        Map<String, Long> replaced = counts(
                "select r.kind, count(*) from record r where r.n <= ? and exists"
                        + " (select 1 from edge e where e.dst = r.node and e.link = 'c') group by r.kind",
                at.watermark());
        Map<String, Long> numbers = counts(
                "select kind, max(number) from thing_number where archive = ? group by kind",
                HexFormat.of().parseHex(own.hex()));
        Map<String, Tally> counted = new TreeMap<>();
        records.forEach((kind, count) ->
                counted.put(kind, new Tally(count, replaced.getOrDefault(kind, 0L), numbers.getOrDefault(kind, 0L))));
        return counted;
    }

    private Map<String, Long> counts(String question, Object... values) {
        Map<String, Long> counts = new TreeMap<>();
        at.read(c -> Sql.list(c, question, row -> counts.put(row.getString(1), row.getLong(2)), values));
        return counts;
    }
}
