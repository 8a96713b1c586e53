package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.projection.ProjectedRow;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.listing.Row;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Head;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Works out words and rows of every record anew and compares them with the tables. */
final class ListCheck {
    private static final String REBUILD = "Rebuild the lists.";
    private final Snapshot at;
    private final Faults faults;
    private final Projections projections;
    private final Arriving arriving;

    ListCheck(Snapshot at, Faults faults, Projections projections, Arriving arriving) {
        this.at = at;
        this.faults = faults;
        this.projections = projections;
        this.arriving = arriving;
    }

    void check(Work work) throws StoppedException {
        at.eachRange(work, "lists", this::range);
        for (String name : projections.names()) {
            if (projections.isReady(name) && at.read(c -> projections.rowsWithoutRecord(c, name)) > 0) {
                faults.add("list.surplus", "The list has rows of no record.", "list " + name, REBUILD);
            }
        }
        if (at.count(
                        "select count(*) from word w where w.n <= ? and not exists (select 1 from record r where r.n = w.n)",
                        at.watermark())
                > 0) {
            faults.add("word.surplus", "Words belong to no record.", "table word", REBUILD);
        }
    }

    private void range(long from, long to) {
        for (Records.HeadRow row : at.read(c -> Records.heads(c, from, to))) {
            try {
                Head head = HeadReading.head(row);
                words(row, head);
                rows(row, head);
            } catch (RuntimeException e) {
                faults.damaged(
                        "list.unreadable",
                        "What the lists say of a record cannot be worked out: " + e.getMessage() + ".",
                        where(row));
            }
        }
    }

    private static String where(Records.HeadRow row) {
        return "journal entry " + row.record().n() + ", record " + row.record().fingerprint();
    }

    private void words(Records.HeadRow row, Head head) {
        if (arriving.known(head).isEmpty()) {
            return;
        }
        Set<String> stored = at.read(c -> WordFilling.stored(c, row.record().n()));
        Set<String> now = arriving.words(row.record().fingerprint(), head);
        if (!stored.equals(now)) {
            faults.add(
                    "word.differs",
                    "The words to find it by are " + stored + ", not " + now + ".",
                    where(row),
                    REBUILD);
        }
    }

    private void rows(Records.HeadRow row, Head head) {
        Map<String, List<Row>> now = new HashMap<>();
        for (ProjectedRow one : arriving.rows(row.record().fingerprint(), head)) {
            now.computeIfAbsent(one.projection(), name -> new ArrayList<>())
                    .add(projections.asStored(one.projection(), one.row()));
        }
        for (String name : projections.names()) {
            if (projections.kind(name).equals(head.kind()) && projections.isReady(name)) {
                List<Row> stored =
                        at.read(c -> projections.stored(c, name, row.record().n()));
                if (!stored.equals(now.getOrDefault(name, List.of()))) {
                    faults.add(
                            "list.differs",
                            "The list says " + stored + ", the record " + now.getOrDefault(name, List.of()) + ".",
                            "list " + name + ", " + where(row),
                            REBUILD);
                }
            }
        }
    }
}
