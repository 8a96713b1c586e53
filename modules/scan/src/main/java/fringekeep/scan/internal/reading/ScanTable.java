package fringekeep.scan.internal.reading;

import java.util.List;
import java.util.Optional;

/**
 * The table of one section in SI: columns in the order axes, channels, exposures, shots.
 *
 * @param columns all of the same length
 */
public record ScanTable(List<TableColumn> columns) {
    /** Copies. */
    public ScanTable {
        columns = List.copyOf(columns);
    }

    /** Number of rows. */
    public int rows() {
        return columns.get(0).values().length;
    }

    List<TableColumn> role(ProfileColumn.Role role) {
        return columns.stream()
                .filter(column -> column.profile().role() == role)
                .toList();
    }

    /** The exposure column of one channel, or of all when {@code of} is empty. */
    Optional<TableColumn> exposureOf(String of) {
        return role(ProfileColumn.Role.EXPOSURE).stream()
                .filter(column -> column.profile().of().equals(of))
                .findFirst();
    }

    /**
     * One column.
     *
     * @param profile how the profile describes it
     * @param name name in the table
     * @param values SI, NaN where absent
     */
    public record TableColumn(ProfileColumn profile, String name, double[] values) {
        /** Copies. */
        public TableColumn {
            values = values.clone();
        }
    }
}
