package fringekeep.bundle.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** Whether the tables are as Data Package 2 describes them: there, with the stated hash, columns, types and keys. */
final class TableFaults {
    private final Path data;
    private final List<Problem> faults = new ArrayList<>();
    private final Map<String, List<Map<String, String>>> tables = new HashMap<>();

    private TableFaults(Path data) {
        this.data = data;
    }

    static List<Problem> of(Path data, JsonObject description) throws IOException {
        TableFaults check = new TableFaults(data);
        List<JsonObject> resources = description.array("resources").objects();
        if (resources.isEmpty()) {
            check.fault("table.none", "The description names no table.", "datapackage.json");
        }
        for (JsonObject resource : resources) {
            check.resource(resource);
        }
        resources.forEach(check::keys);
        return List.copyOf(check.faults);
    }

    private void fault(String code, String what, String where) {
        faults.add(new Problem(code, what, where, "Get the bundle again from where it came, or export it anew."));
    }

    private void resource(JsonObject resource) throws IOException {
        String name = resource.text("name").orElse("");
        String path = resource.text("path").orElse("");
        Path file = data.resolve(path);
        if (path.isEmpty() || Zip.unsafe(path) || !Files.isRegularFile(file)) {
            fault("table.no-file", "The table " + name + " is not there.", "datapackage.json " + name);
            return;
        }
        String sum = "sha256:" + Bag.checksums(file).get("sha256");
        if (!resource.text("hash").equals(Optional.of(sum))
                || resource.integer("bytes").orElse(-1) != Files.size(file)) {
            fault("table.changed", "Length or hash of the table differ from its description.", path);
        }
        List<List<String>> rows = Csv.read(Files.readString(file, StandardCharsets.UTF_8));
        List<JsonObject> fields = resource.object("schema")
                .orElse(JsonObject.EMPTY)
                .array("fields")
                .objects();
        List<String> names =
                fields.stream().map(field -> field.text("name").orElse("")).toList();
        if (rows.isEmpty() || !rows.get(0).equals(names)) {
            fault("table.columns", "The head of the table differs from its description.", path + ", line 1");
            return;
        }
        rows(name, path, fields, rows);
    }

    private void rows(String name, String path, List<JsonObject> fields, List<List<String>> rows) {
        List<Map<String, String>> kept = new ArrayList<>();
        for (int i = 1; i < rows.size(); i++) {
            List<String> row = rows.get(i);
            if (row.size() != fields.size()) {
                fault(
                        "table.row",
                        "A row has " + row.size() + " cells instead of " + fields.size() + ".",
                        path + ", row " + i);
                continue;
            }
            Map<String, String> cells = new HashMap<>();
            for (int j = 0; j < row.size(); j++) {
                cells.put(fields.get(j).text("name").orElse(""), row.get(j));
                if (!isOf(fields.get(j).text("type").orElse(""), row.get(j))) {
                    fault(
                            "table.cell",
                            "\"" + row.get(j) + "\" is no "
                                    + fields.get(j).text("type").orElse("") + ".",
                            path + ", row " + i + ", "
                                    + fields.get(j).text("name").orElse(""));
                }
            }
            kept.add(cells);
        }
        tables.put(name, kept);
    }

    private static boolean isOf(String type, String cell) {
        if (cell.isEmpty()) {
            return true;
        }
        try {
            switch (type) {
                case "number" -> Double.parseDouble(cell);
                case "integer" -> Long.parseLong(cell);
                case "datetime" -> Instant.parse(cell);
                case "boolean" -> {
                    return cell.equals("true") || cell.equals("false");
                }
                default -> {
                    return type.equals("string");
                }
            }
            return true;
        } catch (NumberFormatException | DateTimeException e) {
            return false;
        }
    }

    private void keys(JsonObject resource) {
        String name = resource.text("name").orElse("");
        JsonObject schema = resource.object("schema").orElse(JsonObject.EMPTY);
        List<String> key = schema.array("primaryKey").texts();
        Set<List<String>> seen = new HashSet<>();
        for (Map<String, String> row : tables.getOrDefault(name, List.of())) {
            List<String> value =
                    key.stream().map(column -> row.getOrDefault(column, "")).toList();
            if (!seen.add(value)) {
                fault("table.key-twice", "Two rows have the key " + value + ".", "datapackage.json " + name);
            }
        }
        for (JsonObject link : schema.array("foreignKeys").objects()) {
            foreignKey(name, link);
        }
    }

    private void foreignKey(String name, JsonObject link) {
        String column = link.array("fields").texts().get(0);
        JsonObject reference = link.object("reference").orElse(JsonObject.EMPTY);
        String target = reference.text("resource").orElse("");
        String field = reference.array("fields").texts().get(0);
        Set<String> there = new HashSet<>();
        tables.getOrDefault(target, List.of()).forEach(row -> there.add(row.getOrDefault(field, "")));
        for (Map<String, String> row : tables.getOrDefault(name, List.of())) {
            String value = row.getOrDefault(column, "");
            if (!value.isEmpty() && !there.contains(value)) {
                fault(
                        "table.foreign-key",
                        column + " " + value + " is not in the table " + target + ".",
                        "tables/" + name + ".csv");
            }
        }
    }
}
