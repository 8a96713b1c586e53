package fringekeep.archive.internal.store.projection;

import fringekeep.archive.listing.Row;

/**
 * A row on its way into a projection.
 *
 * @param projection name of the declared table
 * @param seq place among the record's rows, from 0
 * @param row values
 */
public record ProjectedRow(String projection, int seq, Row row) {}
