package fringekeep.archive.problem;

import java.util.Objects;

/**
 * Expected trouble: what happened, where, and how to mend it.
 *
 * @param code stable code for tests and scripts, such as {@code json.duplicate-name}
 * @param what what happened, one sentence
 * @param where file, line, column, record or field (a JSON pointer within an entered document); empty if there is none
 * @param mend what the user can do, and whether anything was stored
 */
public record Problem(String code, String what, String where, String mend) {
    /** Refuses missing texts. */
    public Problem {
        Objects.requireNonNull(code);
        Objects.requireNonNull(what);
        Objects.requireNonNull(where);
        Objects.requireNonNull(mend);
    }

    /** The same problem, seen at another place. */
    public Problem at(String place) {
        return new Problem(code, what, place, mend);
    }
}
