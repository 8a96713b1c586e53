package fringekeep.archive.internal.records;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * Walks a value along its schema and finds the places where the schema asks for a quantity or a moment. Branches of a choice that the
 * value contradicts by a constant are left aside.
 */
public final class SchemaWalk {
    private static final String QUANTITY = "common-1.schema.json#/$defs/quantity";
    private static final String MOMENT = "common-1.schema.json#/$defs/moment";
    private static final int DEEPEST = 100;
    private final JsonObject root;
    private final String definition;
    private final Map<String, Place> places = new LinkedHashMap<>();
    private final Set<String> integers = new HashSet<>();

    private SchemaWalk(JsonObject root, String definition) {
        this.root = root;
        this.definition = definition;
    }

    /** The places in a value where the schema asks for a quantity, whatever stands there. */
    public static List<Place> quantities(JsonObject schema, Json value) {
        return places(schema, value, QUANTITY);
    }

    /** The places in a value where the schema asks for a moment. */
    public static List<Place> moments(JsonObject schema, Json value) {
        return places(schema, value, MOMENT);
    }

    /** Pointers to the values that the schema calls integers. */
    public static Set<String> integers(JsonObject schema, Json value) {
        SchemaWalk walk = new SchemaWalk(schema, QUANTITY);
        walk.visit(schema, value, "", 0);
        return Set.copyOf(walk.integers);
    }

    private static List<Place> places(JsonObject schema, Json value, String definition) {
        SchemaWalk walk = new SchemaWalk(schema, definition);
        walk.visit(schema, value, "", 0);
        return List.copyOf(walk.places.values());
    }

    private void visit(JsonObject schema, Json value, String pointer, int depth) {
        if (depth > DEEPEST) {
            return;
        }
        if (schema.text("type").equals(Optional.of("integer"))) {
            integers.add(pointer);
        }
        Optional<String> reference = schema.text("$ref");
        if (reference.isPresent() && reference.get().endsWith(definition)) {
            places.merge(
                    pointer, Place.of(schema, pointer), (a, b) -> a.siUnit().isPresent() ? a : b);
        } else {
            reference.flatMap(this::local).ifPresent(target -> visit(target, value, pointer, depth + 1));
        }
        if (value instanceof JsonObject object) {
            members(schema, object, pointer, depth);
        } else if (value instanceof JsonArray array) {
            items(schema, array, pointer, depth);
        }
        for (JsonObject branch : branches(schema)) {
            if (!contradicts(branch, value)) {
                visit(branch, value, pointer, depth + 1);
            }
        }
    }

    private Optional<JsonObject> local(String reference) {
        return reference.startsWith("#")
                ? JsonPointer.resolve(root, reference.substring(1))
                        .filter(JsonObject.class::isInstance)
                        .map(JsonObject.class::cast)
                : Optional.empty();
    }

    private void members(JsonObject schema, JsonObject value, String pointer, int depth) {
        JsonObject properties = schema.object("properties").orElse(JsonObject.EMPTY);
        value.members()
                .forEach((name, member) -> properties
                        .object(name)
                        .ifPresent(below -> visit(below, member, JsonPointer.child(pointer, name), depth + 1)));
    }

    private void items(JsonObject schema, JsonArray value, String pointer, int depth) {
        List<Json> first = schema.array("prefixItems").items();
        for (int i = 0; i < value.items().size(); i++) {
            Optional<JsonObject> below = i < first.size()
                    ? Optional.of(first.get(i))
                            .filter(JsonObject.class::isInstance)
                            .map(JsonObject.class::cast)
                    : schema.object("items");
            String here = JsonPointer.child(pointer, i);
            Json item = value.items().get(i);
            below.ifPresent(found -> visit(found, item, here, depth + 1));
        }
    }

    private static List<JsonObject> branches(JsonObject schema) {
        List<JsonObject> branches = new ArrayList<>();
        for (String word : List.of("allOf", "anyOf", "oneOf")) {
            schema.array(word).items().stream()
                    .filter(JsonObject.class::isInstance)
                    .map(JsonObject.class::cast)
                    .forEach(branches::add);
        }
        schema.object("then").ifPresent(branches::add);
        schema.object("else").ifPresent(branches::add);
        return branches;
    }

    private boolean contradicts(JsonObject branch, Json value) {
        if (branch.text("$ref")
                .flatMap(this::local)
                .filter(target -> contradicts(target, value))
                .isPresent()) {
            return true;
        }
        if (!(value instanceof JsonObject object)) {
            return false;
        }
        JsonObject properties = branch.object("properties").orElse(JsonObject.EMPTY);
        return object.members().entrySet().stream()
                .anyMatch(member -> properties
                        .object(member.getKey())
                        .filter(rule -> forbids(rule, member.getValue()))
                        .isPresent());
    }

    private static boolean forbids(JsonObject rule, Json value) {
        if (!(value instanceof JsonText)) {
            return false;
        }
        List<Json> allowed =
                rule.get("const").map(List::of).orElse(rule.array("enum").items());
        return !allowed.isEmpty() && !allowed.contains(value);
    }

    /**
     * A place where one of the shared definitions is asked for; unit and range are for quantities.
     *
     * @param pointer into the value
     * @param siUnit unit it must reduce to; empty = any
     * @param usualFrom lower end of what is usual (SI)
     * @param usualTo upper end of what is usual (SI)
     */
    public record Place(String pointer, Optional<String> siUnit, OptionalDouble usualFrom, OptionalDouble usualTo) {
        static Place of(JsonObject schema, String pointer) {
            JsonObject usual = schema.object("usual").orElse(JsonObject.EMPTY);
            return new Place(pointer, schema.text("siUnit"), usual.number("from"), usual.number("to"));
        }
    }
}
