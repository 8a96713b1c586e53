package fringekeep.archive.lineage;

import fringekeep.archive.kind.ValueComparison;
import fringekeep.archive.record.Hash;
import java.util.List;

/**
 * What recomputing one record gave (record format 1, section 10).
 *
 * @param record the record
 * @param verdict its worst value
 * @param units largest distance of two numbers in units in the last place; 0 when all bits are the same
 * @param differences values that are not the same, at most a hundred
 * @param reason why it could not be computed: entered, kind-unknown, method-retired, input-missing, raw-missing,
 *     payload-missing, part-withheld, or the words of the computation; empty otherwise
 */
public record Recomputed(
        Hash record, Verdict verdict, long units, List<ValueComparison.Difference> differences, String reason) {
    /** Copies. */
    public Recomputed {
        differences = List.copyOf(differences);
    }

    /** From best to worst. */
    public enum Verdict {
        /** All bytes of result and payloads are the same. */
        SAME_BITS("same bits"),
        /** Numbers differ by at most 1,024 units in the last place. */
        LAST_PLACES("same within rounding"),
        /** Entered by people, or something it needs is not at hand. */
        NOT_COMPUTABLE("not computable"),
        /** Something is different. */
        DIFFERS("different");

        private final String words;

        Verdict(String words) {
            this.words = words;
        }

        /** Words for people. */
        public String words() {
            return words;
        }
    }
}
