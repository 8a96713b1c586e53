package fringekeep.archive.listing;

import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Optional;

/**
 * Rows that answer a {@link Listing}.
 *
 * @param rows in the asked order
 * @param last key to go on from; empty when there are no more
 * @param watermark last journal entry the answer knows
 */
public record Page(List<Line> rows, Optional<Key> last, long watermark) {
    /** Copies. */
    public Page {
        rows = List.copyOf(rows);
    }

    /**
     * One row and the record it belongs to.
     *
     * @param record fingerprint
     * @param n journal entry
     * @param label such as {@code scan 0412} or {@code scan 0412 b}
     * @param row values
     */
    public record Line(Hash record, long n, String label, Row row) {}

    /** Where a page ended. */
    public record Key(Optional<Object> value, long n, int seq) {}
}
