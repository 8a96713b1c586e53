package fringekeep.archive.internal.store.projection;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.listing.Column;
import fringekeep.archive.listing.Projection;
import fringekeep.archive.record.Hash;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/**
 * A declaration as statements. Names are checked here, once, and quoted in every statement.
 *
 * @param projection the declaration
 * @param kind the kind that fills it
 */
record Declared(Projection projection, RecordKind kind) {
    private static final Pattern NAME = Pattern.compile("[a-z][a-z0-9_]{0,39}");
    private static final Set<String> OWN_COLUMNS = Set.of("n", "seq");

    /** Refuses names that cannot be tables and columns; a kind that declares such is a mistake in code. */
    Declared {
        requireName(projection.name());
        Set<String> names = new HashSet<>(OWN_COLUMNS);
        for (Column column : projection.columns()) {
            requireName(column.name());
            if (!names.add(column.name())) {
                throw new IllegalArgumentException(
                        "projection " + projection.name() + " has column " + column.name() + " twice");
            }
        }
        for (List<String> index : projection.indexes()) {
            if (index.isEmpty() || !names.containsAll(index)) {
                throw new IllegalArgumentException("projection " + projection.name() + " has no columns " + index);
            }
        }
    }

    private static void requireName(String name) {
        if (!NAME.matcher(name).matches()) {
            throw new IllegalArgumentException("not a name for a table or column: " + name);
        }
    }

    /** What the stored rows depend on; when it changes they are made anew. */
    Hash hash() {
        List<Json> columns = new ArrayList<>();
        for (Column column : projection.columns()) {
            columns.add(JsonObject.EMPTY
                    .with("name", column.name())
                    .with("sort", column.sort().name())
                    .with("unit", column.unit()));
        }
        List<Json> indexes = new ArrayList<>();
        projection.indexes().forEach(index -> indexes.add(JsonArray.ofTexts(index)));
        return Hash.of(CanonicalJson.write(JsonObject.EMPTY
                .with("name", projection.name())
                .with("kind", projection.kind().text())
                .with("schema", kind.schema())
                .with("columns", new JsonArray(columns))
                .with("indexes", new JsonArray(indexes))));
    }

    String table() {
        return quoted("p_" + projection.name());
    }

    /** Where rows are gathered while the table is made anew. */
    String newTable() {
        return quoted("p_" + projection.name() + "__new");
    }

    static String quoted(String name) {
        return '"' + name.toUpperCase(Locale.ROOT) + '"';
    }

    List<String> create(String table, String generation) {
        StringBuilder columns = new StringBuilder();
        for (Column column : projection.columns()) {
            columns.append(quoted(column.name()))
                    .append(' ')
                    .append(Cells.type(column.sort()))
                    .append(", ");
        }
        List<String> statements = new ArrayList<>();
        statements.add("create table " + table + " (n bigint not null, seq int not null, " + columns
                + "primary key (n, seq))");
        statements.add("create index " + index(generation, "n_down") + " on " + table + " (n desc, seq desc)");
        for (int i = 0; i < projection.indexes().size(); i++) {
            List<String> names = projection.indexes().get(i);
            statements.add("create index " + index(generation, "up_" + i) + " on " + table + " (" + list(names, "")
                    + ", n, seq)");
            statements.add("create index " + index(generation, "down_" + i) + " on " + table + " ("
                    + list(names, " desc") + ", n desc, seq desc)");
        }
        return statements;
    }

    private static String list(List<String> names, String suffix) {
        return String.join(
                ", ", names.stream().map(name -> quoted(name) + suffix).toList());
    }

    /** Name of an index; the generation keeps an old and a new table's apart. */
    String index(String generation, String use) {
        return quoted("p_" + projection.name() + "_" + generation + "_" + use);
    }

    /** Which declared index begins with a column. */
    Optional<Integer> indexOn(String column) {
        for (int i = 0; i < projection.indexes().size(); i++) {
            if (projection.indexes().get(i).get(0).equals(column)) {
                return Optional.of(i);
            }
        }
        return Optional.empty();
    }

    String insert(String table) {
        String names = list(projection.columns().stream().map(Column::name).toList(), "");
        return "insert into " + table + " (n, seq, " + names + ") values (?, ?"
                + ", ?".repeat(projection.columns().size()) + ")";
    }

    String columnList() {
        return list(projection.columns().stream().map(Column::name).toList(), "");
    }

    Optional<Column> column(String name) {
        return projection.columns().stream()
                .filter(column -> column.name().equals(name))
                .findFirst();
    }
}
