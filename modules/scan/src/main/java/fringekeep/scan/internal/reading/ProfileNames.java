package fringekeep.scan.internal.reading;

import fringekeep.archive.json.JsonObject;
import java.util.Optional;

/** Names that columns get in the table. */
public final class ProfileNames {
    private ProfileNames() {}

    /** Name of the table's column for a column of a profile; empty for an unused one. */
    public static Optional<String> tableName(JsonObject column) {
        ProfileColumn read = ProfileColumn.of(column);
        return read.role() == ProfileColumn.Role.UNUSED ? Optional.empty() : Optional.of(read.tableName());
    }
}
