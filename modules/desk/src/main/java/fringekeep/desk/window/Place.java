package fringekeep.desk.window;

import fringekeep.archive.record.Hash;
import fringekeep.desk.list.Question;
import java.util.Optional;

/**
 * Where a person is: what the list shows, which record is in hand, which sheet stands below the strip.
 *
 * @param stop open stop, from 0
 * @param question what the list shows
 * @param inHand the record in hand
 * @param sheet which sheet
 * @param root whose lineage is shown
 */
record Place(int stop, Question question, Optional<Hash> inHand, Sheet sheet, Optional<Hash> root) {
    /** Sheets below the strip. */
    enum Sheet {
        /** List and record. */
        RECORDS,
        /** Lineage. */
        LINEAGE
    }

    /** The same with another record in hand. */
    Place holding(Hash record) {
        return new Place(stop, question, Optional.of(record), sheet, root);
    }

    /** Another stop and another list, in the sheet of records; nothing in hand yet that is not listed there. */
    Place at(int next, Question asked) {
        return new Place(next, asked, inHand, Sheet.RECORDS, Optional.empty());
    }

    /** The same with another sheet. */
    Place on(Sheet next, Optional<Hash> of) {
        return new Place(stop, question, inHand, next, of);
    }
}
