package fringekeep.archive;

import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.Optional;

/**
 * A journal entry in short.
 *
 * @param n its number
 * @param at the writer's clock
 * @param act founded, settings, recorded, received, supplied, purged or person-erased
 * @param record the record it is about, if it is about one
 */
public record JournalLine(long n, Instant at, String act, Optional<Hash> record) {}
