package fringekeep.bundle.internal;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonObject;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A table of a bundle: RFC 4180 with CRLF, and its description by Data Package 2.
 *
 * @param name lower-case words joined by hyphens; the file is {@code tables/<name>.csv}
 * @param title words for people
 * @param fields its columns
 * @param key columns that tell rows apart
 * @param links columns that point to another table
 * @param rows cells as text, absent = empty
 */
record Table(
        String name,
        String title,
        List<Field> fields,
        List<String> key,
        List<ForeignKey> links,
        List<List<Optional<String>>> rows) {
    Table {
        fields = List.copyOf(fields);
        key = List.copyOf(key);
        links = List.copyOf(links);
        rows = List.copyOf(rows);
    }

    /**
     * A column.
     *
     * @param name lower-case words with underscores
     * @param type Table Schema type: string, number, integer, boolean, datetime
     * @param unit UCUM code, empty for texts
     * @param title words for people
     */
    record Field(String name, String type, String unit, String title) {}

    /** A column that holds a key of another table. */
    record ForeignKey(String field, String table, String target) {}

    String path() {
        return Layout.TABLES + "/" + name + ".csv";
    }

    /** The file's bytes. */
    byte[] csv() {
        StringBuilder text = new StringBuilder();
        line(text, fields.stream().map(field -> Optional.of(field.name())).toList());
        rows.forEach(row -> line(text, row));
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }

    private static void line(StringBuilder text, List<Optional<String>> cells) {
        for (int i = 0; i < cells.size(); i++) {
            text.append(i == 0 ? "" : ",")
                    .append(cells.get(i).map(Table::quoted).orElse(""));
        }
        text.append("\r\n");
    }

    private static String quoted(String cell) {
        boolean plain = cell.chars().noneMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r') && !cell.isEmpty();
        return plain ? cell : '"' + cell.replace("\"", "\"\"") + '"';
    }

    /** Shortest text of a number that reads back as the same double. */
    static String number(double value) {
        return new String(CanonicalJson.write(Json.of(value)), StandardCharsets.UTF_8);
    }

    /** The resource of the Data Package that describes the file. */
    JsonObject resource(byte[] csv, String sha256) {
        List<Json> columns = new ArrayList<>();
        for (Field field : fields) {
            columns.add(field(field));
        }
        JsonObject schema = JsonObject.EMPTY
                .with("fields", new JsonArray(columns))
                .with("missingValues", JsonArray.of(Json.of("")))
                .with("primaryKey", JsonArray.ofTexts(key));
        if (!links.isEmpty()) {
            schema = schema.with(
                    "foreignKeys",
                    new JsonArray(links.stream().map(Table::foreignKey).toList()));
        }
        return JsonObject.EMPTY
                .with("name", name)
                .with("title", title)
                .with("type", "table")
                .with("path", path())
                .with("format", "csv")
                .with("mediatype", "text/csv")
                .with("encoding", "utf-8")
                .with("bytes", csv.length)
                .with("hash", "sha256:" + sha256)
                .with("schema", schema);
    }

    private JsonObject field(Field field) {
        JsonObject description = JsonObject.EMPTY
                .with("name", field.name())
                .with("type", field.type())
                .with("title", field.title());
        if (!field.unit().isEmpty()) {
            description = description.with("unitCode", field.unit());
        }
        if (key.size() == 1 && key.contains(field.name())) {
            description = description.with(
                    "constraints",
                    JsonObject.EMPTY.with("required", new JsonBoolean(true)).with("unique", new JsonBoolean(true)));
        }
        return description;
    }

    private static Json foreignKey(ForeignKey link) {
        return JsonObject.EMPTY
                .with("fields", JsonArray.of(Json.of(link.field())))
                .with(
                        "reference",
                        JsonObject.EMPTY
                                .with("resource", link.table())
                                .with("fields", JsonArray.of(Json.of(link.target()))));
    }
}
