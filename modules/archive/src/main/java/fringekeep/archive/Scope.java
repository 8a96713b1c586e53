package fringekeep.archive;

import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.List;

/** Which records are counted. */
public sealed interface Scope {
    /** All of them. */
    record Everything() implements Scope {}

    /** Those that came with journal entries {@code from} to {@code to}, both included. */
    record Entries(long from, long to) implements Scope {}

    /** Those whose journal entry was written at or after {@code from} and before {@code to}, such as a measurement day. */
    record Times(Instant from, Instant to) implements Scope {}

    /** Exactly these. */
    record Records(List<Hash> records) implements Scope {
        /** Copies. */
        public Records {
            records = List.copyOf(records);
        }
    }

    /** Everything linked with a record, up and down, over inputs and about, by way of placements; itself included. */
    record LinkedWith(Hash record) implements Scope {}
}
