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
 * @param value only those with this value in a column
 * @param sort order of the rows; empty = as recorded, grouped
 */
public record Question(
        String kind,
        Optional<StateName> state,
        Optional<Hash> linkedWith,
        String words,
        Optional<Among> among,
        Optional<Value> value,
        Optional<Sort> sort) {
    /** Records picked by something else than the list, and in which words: {@code taken in now}. */
    public record Among(Set<Hash> records, String words) {
        /** Copies. */
        public Among {
            records = Set.copyOf(records);
        }
    }

    /**
     * A value that rows are narrowed to.
     *
     * @param column name, or {@code kind:column} of a linked record
     * @param text the value; empty = those without
     */
    public record Value(String column, String text) {}

    /** Order by a column: name, or {@code kind:column}. */
    public record Sort(String column, boolean descending) {}

    /** All records of a kind. */
    public static Question all(String kind) {
        return new Question(
                kind, Optional.empty(), Optional.empty(), "", Optional.empty(), Optional.empty(), Optional.empty());
    }

    /** All records of a kind in a state. */
    public static Question in(String kind, StateName state) {
        return new Question(
                kind, Optional.of(state), Optional.empty(), "", Optional.empty(), Optional.empty(), Optional.empty());
    }

    /** All records of a kind linked with a record. */
    public static Question linkedWith(String kind, Optional<Hash> record) {
        return new Question(kind, Optional.empty(), record, "", Optional.empty(), Optional.empty(), Optional.empty());
    }

    /** All records of a kind with a value in a column. */
    public static Question with(String kind, Value value) {
        return new Question(
                kind, Optional.empty(), Optional.empty(), "", Optional.empty(), Optional.of(value), Optional.empty());
    }

    /** The same in another order. */
    public Question sorted(Optional<Sort> by) {
        return new Question(kind, state, linkedWith, words, among, value, by);
    }

    /** By a column upwards, if it is already sorted so downwards, and then as recorded again. */
    public Question turned(String column) {
        Optional<Sort> before = sort.filter(by -> by.column().equals(column));
        return sorted(
                before.isEmpty()
                        ? Optional.of(new Sort(column, false))
                        : before.filter(by -> !by.descending()).map(by -> new Sort(column, true)));
    }

    /** Whether all records are shown. */
    public boolean whole() {
        return state.isEmpty() && linkedWith.isEmpty() && words.isEmpty() && among.isEmpty() && value.isEmpty();
    }
}
