package fringekeep.desk.list;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import java.util.Optional;

/**
 * What a list shows.
 *
 * @param kind whose records
 * @param state only those in this state
 * @param linkedWith only those linked with this record
 * @param words only those found by these words; empty = all
 * @param most rows at most
 */
public record Question(String kind, Optional<StateName> state, Optional<Hash> linkedWith, String words, int most) {
    /** All records of a kind. */
    public static Question all(String kind) {
        return new Question(kind, Optional.empty(), Optional.empty(), "", 500);
    }

    /** The same with more rows. */
    public Question more() {
        return new Question(kind, state, linkedWith, words, most * 4);
    }
}
