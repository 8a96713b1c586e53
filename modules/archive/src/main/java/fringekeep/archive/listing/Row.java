package fringekeep.archive.listing;

import java.util.Map;

/**
 * One row of a projection: values by column name, absent = left out. Value classes by sort: String, Double, Long,
 * java.time.Instant, Boolean, fringekeep.archive.record.Hash.
 */
public record Row(Map<String, Object> values) {
    /** Copies. */
    public Row {
        values = Map.copyOf(values);
    }
}
