package fringekeep.archive.record;

import java.time.Instant;

/**
 * Says that things changed: this record holds from an instant on, after another of the same thing.
 *
 * @param record the record that held before
 * @param from the instant of change
 */
public record After(Hash record, Instant from) {}
