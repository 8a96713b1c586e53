package fringekeep.scan.internal.reading;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.scan.internal.reading.ProfileColumn.Role;
import fringekeep.scan.internal.reading.ScanTable.TableColumn;
import java.util.Optional;
import java.util.function.Function;

/** Describes the columns of a table as the result part does. */
public final class ResultColumns {
    private ResultColumns() {}

    /** Members {@code axes} and {@code channels}. */
    public static JsonObject of(ScanTable table) {
        return JsonObject.EMPTY
                .with("axes", array(table, Role.AXIS, ResultColumns::axis))
                .with("channels", array(table, Role.CHANNEL, column -> channel(table, column)));
    }

    private static Json array(ScanTable table, Role role, Function<TableColumn, Json> json) {
        return new JsonArray(table.role(role).stream().map(json).toList());
    }

    private static JsonObject axis(TableColumn column) {
        return named(column).with("positions", column.profile().positions().map(Json::of));
    }

    private static JsonObject channel(ScanTable table, TableColumn column) {
        String means = column.profile().means();
        Optional<Json> other = means.equals("counts") ? Optional.empty() : Optional.of(Json.of(means));
        Optional<Json> own =
                table.exposureOf(column.profile().name()).map(TableColumn::name).map(Json::of);
        return named(column).with("means", other).with("exposureColumn", own);
    }

    private static JsonObject named(TableColumn column) {
        return JsonObject.EMPTY
                .with("column", column.name())
                .with("name", column.profile().name())
                .with("unit", column.profile().unit().siCode());
    }
}
