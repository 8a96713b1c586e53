package fringekeep.archive;

/**
 * How many records of one kind there are in a {@link Scope}.
 *
 * @param current current ones: no record corrects them
 * @param corrected those that were corrected
 * @param outdated current ones that are outdated
 * @param withdrawn current ones that are withdrawn
 * @param disputed current ones that are disputed
 */
public record KindCount(long current, long corrected, long outdated, long withdrawn, long disputed) {}
