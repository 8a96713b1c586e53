package fringekeep.archive.entry;

import fringekeep.archive.NewRecord;
import fringekeep.archive.problem.Problem;
import java.util.List;

/**
 * What an entry document asks to be recorded.
 *
 * @param record the new record; without result when its kind is computed
 * @param questions values that are unusual; they do not stand in the way
 */
public record Entered(NewRecord record, List<Problem> questions) {
    /** Copies. */
    public Entered {
        questions = List.copyOf(questions);
    }
}
