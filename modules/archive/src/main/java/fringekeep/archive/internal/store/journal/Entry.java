package fringekeep.archive.internal.store.journal;

import fringekeep.archive.record.ArchiveId;
import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.Optional;

/**
 * A journal entry.
 *
 * @param archive whose journal
 * @param n 1, 2, 3 … without gaps
 * @param at the writer's clock
 * @param act what was done
 * @param previous hash of entry n - 1; absent in entry 1
 */
public record Entry(ArchiveId archive, long n, Instant at, Act act, Optional<Hash> previous) {}
