package fringekeep.archive.listing;

import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * A question to a projection: which rows, in which order, from where on.
 *
 * @param projection name of the declared table
 * @param filters all must hold
 * @param currentOnly leaves out records that were corrected
 * @param words words that records must be found by (prefixes), all of them; empty = none asked
 * @param linkedWith only records linked with this one over inputs or about, up or down
 * @param orderBy column, or {@code n} for the order of the journal
 * @param descending newest or largest first
 * @param after key of the last row seen (see {@link Page#last()})
 * @param limit rows at most, 1 to 10,000
 */
public record Listing(
        String projection,
        List<Filter> filters,
        boolean currentOnly,
        List<String> words,
        Optional<Hash> linkedWith,
        String orderBy,
        boolean descending,
        Optional<Page.Key> after,
        int limit) {
    /** Copies. */
    public Listing {
        filters = List.copyOf(filters);
        words = List.copyOf(words);
    }

    /** All current rows of a projection, newest first. */
    public static Listing newest(String projection, int limit) {
        return new Listing(
                projection, List.of(), true, List.of(), Optional.empty(), "n", true, Optional.empty(), limit);
    }

    /** Compares a column with a value of its class; {@code ABSENT} and {@code PRESENT} ignore the value. */
    public record Filter(String column, Comparison comparison, Object value) {}

    /** How a column is compared. */
    public enum Comparison {
        /** Equal. */
        IS,
        /** Not equal, or absent. */
        IS_NOT,
        /** At least. */
        AT_LEAST,
        /** Less than. */
        BELOW,
        /** Has no value. */
        ABSENT,
        /** Has a value. */
        PRESENT
    }
}
