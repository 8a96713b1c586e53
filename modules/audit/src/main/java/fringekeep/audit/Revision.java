package fringekeep.audit;

import fringekeep.archive.Prepared;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * The next revision of one record, worked out but not recorded.
 *
 * @param before the record that is outdated
 * @param label what people call it
 * @param after its next revision; empty when it falls away or cannot be computed
 * @param shifts how its estimates move
 * @param reasons why there is none
 */
public record Revision(Hash before, String label, Optional<Prepared> after, List<Shift> shifts, List<Problem> reasons) {
    /** Copies. */
    public Revision {
        shifts = List.copyOf(shifts);
        reasons = List.copyOf(reasons);
    }
}
