package fringekeep.desk.list;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import java.util.Optional;
import java.util.Set;

/**
 * What a list shows.
 *
 * @param kind whose records
 * @param state only those in this state
 * @param linkedWith only those linked with this record
 * @param words only those found by these words; empty = all
 * @param among only these records
 * @param most rows at most
 */
public record Question(
        String kind,
        Optional<StateName> state,
        Optional<Hash> linkedWith,
        String words,
        Optional<Among> among,
        int most) {
    /** Records picked by something else than the list, and in which words: {@code taken in now}. */
    public record Among(Set<Hash> records, String words) {
        /** Copies. */
        public Among {
            records = Set.copyOf(records);
        }
    }

    /** Without picked records. */
    public Question(String kind, Optional<StateName> state, Optional<Hash> linkedWith, String words, int most) {
        this(kind, state, linkedWith, words, Optional.empty(), most);
    }

    /** All records of a kind. */
    public static Question all(String kind) {
        return new Question(kind, Optional.empty(), Optional.empty(), "", 500);
    }

    /** The same with more rows. */
    public Question more() {
        return new Question(kind, state, linkedWith, words, among, most * 4);
    }
}
