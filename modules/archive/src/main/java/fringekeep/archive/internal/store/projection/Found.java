package fringekeep.archive.internal.store.projection;

import fringekeep.archive.listing.Page;
import fringekeep.archive.listing.Row;
import java.util.Optional;

/**
 * A row found.
 *
 * @param n entry of its record
 * @param seq place among the record's rows
 * @param order value of the column it is ordered by; absent for the order of the journal and where it has none
 * @param row values
 */
public record Found(long n, int seq, Optional<Object> order, Row row) {
    /** Where to go on from after this row. */
    public Page.Key key() {
        return new Page.Key(order, n, seq);
    }
}
