package fringekeep.archive.internal.store;

import fringekeep.archive.problem.Problem;
import java.util.ArrayList;
import java.util.List;

/** Collects what a check finds. */
final class Faults {
    private static final String RESTORE =
            "Keep the archive as it is, and restore it from a plain copy that is whole; what was recorded since can be"
                    + " received from this one.";
    private final List<Problem> problems = new ArrayList<>();

    /** Something recorded is not what was recorded. */
    void damaged(String code, String what, String where) {
        problems.add(new Problem(code, what, where, RESTORE));
    }

    /** With a mend of its own. */
    void add(String code, String what, String where, String mend) {
        problems.add(new Problem(code, what, where, mend));
    }

    /** Left over by an interruption; does no harm. */
    void orphan(String code, String what, String where) {
        problems.add(new Problem(
                code,
                what,
                where,
                "It does no harm: taking the same bytes in again uses it. It may be deleted while no program has the"
                        + " archive open."));
    }

    List<Problem> all() {
        return List.copyOf(problems);
    }
}
