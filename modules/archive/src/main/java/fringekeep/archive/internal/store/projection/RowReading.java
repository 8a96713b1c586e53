package fringekeep.archive.internal.store.projection;

import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Row;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Reads declared columns. */
final class RowReading {
    private RowReading() {}

    static Row row(ResultSet row, int first, List<Column> columns) throws SQLException {
        Map<String, Object> values = new TreeMap<>();
        for (int i = 0; i < columns.size(); i++) {
            String name = columns.get(i).name();
            Cells.read(row, first + i, columns.get(i)).ifPresent(value -> values.put(name, value));
        }
        return new Row(values);
    }
}
