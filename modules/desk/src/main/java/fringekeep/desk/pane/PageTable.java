package fringekeep.desk.pane;

import java.util.List;

/**
 * A table of a record.
 *
 * @param heading what it is
 * @param heads one per column, units in them
 * @param right whether a column's cells end at the right
 * @param rows cells as shown
 * @param late whether it comes after the facts, or beside everything on wide windows
 */
public record PageTable(
        String heading, List<String> heads, List<Boolean> right, List<List<String>> rows, boolean late) {
    /** Copies. */
    public PageTable {
        heads = List.copyOf(heads);
        right = List.copyOf(right);
        rows = rows.stream().map(List::copyOf).toList();
    }
}
