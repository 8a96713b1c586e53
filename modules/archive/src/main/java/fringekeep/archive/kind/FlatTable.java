package fringekeep.archive.kind;

import java.util.List;
import java.util.Optional;

/**
 * A table for people, spreadsheets and bundles.
 *
 * @param name file-name-like, {@code [a-z][a-z0-9-]*}
 * @param columns at least one
 * @param rows each as long as the columns; a cell is a text or a number, or absent
 */
public record FlatTable(String name, List<FlatColumn> columns, List<List<Optional<Object>>> rows) {
    /** Copies. */
    public FlatTable {
        columns = List.copyOf(columns);
        rows = rows.stream().map(List::copyOf).toList();
    }

    /**
     * A column.
     *
     * @param name {@code [a-z][a-z0-9_]*} with a unit suffix
     * @param label words for people
     * @param unit UCUM code; {@code 1} for pure numbers, empty for texts
     * @param description one sentence
     */
    public record FlatColumn(String name, String label, String unit, String description) {}
}
