package fringekeep.archive.listing;

import fringekeep.archive.record.KindName;
import java.util.List;

/**
 * A declared table over the records of one kind. The archive makes, fills, rebuilds and queries it.
 *
 * @param name lower-case words with underscores, unique over all kinds, at most 40 characters
 * @param kind whose records fill it
 * @param columns at least one
 * @param indexes lists of column names to be indexed
 */
public record Projection(String name, KindName kind, List<Column> columns, List<List<String>> indexes) {
    /** Copies. */
    public Projection {
        columns = List.copyOf(columns);
        indexes = indexes.stream().map(List::copyOf).toList();
    }
}
