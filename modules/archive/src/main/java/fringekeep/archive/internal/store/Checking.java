package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.util.List;

/**
 * Checks an archive at a watermark: everything that has a hash is hashed again, the journal's chain is followed, and all that
 * the tables say beside that is worked out anew and compared. Any one byte changed in the journal, a head, part, payload, raw
 * file, edge, number, count, word or row is found and named. Persons and drafts are protected by no hash.
 */
final class Checking {
    private final Store store;
    private final Projections projections;
    private final Arriving arriving;
    private final Faults faults = new Faults();

    Checking(Store store, Projections projections, Arriving arriving) {
        this.store = store;
        this.projections = projections;
        this.arriving = arriving;
    }

    /** One subject of a check. */
    @FunctionalInterface
    private interface Step {
        void run(Work work) throws StoppedException;
    }

    List<Problem> check(Work work) throws StoppedException {
        Snapshot at = new Snapshot(store, store.state());
        step("journal", new JournalCheck(at, faults)::check, work);
        step("records", new RecordCheck(at, faults)::check, work);
        step("parts", new PartCheck(at, faults)::check, work);
        step("files", new FileCheck(at, faults)::check, work);
        step("counts", new CountCheck(at, faults)::check, work);
        step("lists", new ListCheck(at, faults, projections, arriving)::check, work);
        return faults.all();
    }

    /** Where the database itself cannot read on, that is a fault too, and the other subjects are still checked. */
    private void step(String subject, Step step, Work work) throws StoppedException {
        try {
            step.run(work);
        } catch (StoreFailure | IllegalStateException e) {
            faults.damaged(
                    "check.unreadable", "Checking " + subject + " could not go on: " + e.getMessage() + ".", subject);
        }
    }
}
