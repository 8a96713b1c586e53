package fringekeep.desk.session;

import fringekeep.archive.record.Hash;
import java.time.LocalDate;

/** What is in view: strip, lists and thread show only that. */
public sealed interface View {
    /** All records. */
    record All() implements View {}

    /** A measurement day: from the archive's day boundary to the next. */
    record Day(LocalDate day) implements View {}

    /** Measurement days, both ends included. */
    record Span(LocalDate from, LocalDate to) implements View {
        /** Turns ends that were given the wrong way round. */
        public Span {
            if (to.isBefore(from)) {
                LocalDate first = to;
                to = from;
                from = first;
            }
        }

        /** How many days. */
        public long days() {
            return to.toEpochDay() - from.toEpochDay() + 1;
        }
    }

    /** What stands upstream of a record, such as a figure, and what that speaks of. */
    record Upstream(Hash record) implements View {}

    /** Records found by words. */
    record Found(String words) implements View {}

    /** The view to begin with. */
    View ALL = new All();
}
