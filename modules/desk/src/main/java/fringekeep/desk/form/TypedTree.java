package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.json.JsonText;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Changes to a document as typed, by JSON pointer; whatever is missing on the way is made. */
final class TypedTree {
    private TypedTree() {}

    /** The text of a field; empty where nothing was typed. */
    static String text(Json root, String pointer) {
        return JsonPointer.resolve(root, pointer)
                .map(value -> value instanceof JsonText text ? text.value() : "")
                .orElse("");
    }

    /** How many rows a list has. */
    static int size(Json root, String pointer) {
        return JsonPointer.resolve(root, pointer)
                .map(value -> value instanceof JsonArray array ? array.items().size() : 0)
                .orElse(0);
    }

    /** Sets a value; an empty text takes the member away. */
    static JsonObject put(JsonObject root, String pointer, String text) {
        return (JsonObject) put(root, JsonPointer.steps(pointer), text.isEmpty() ? Optional.empty() : of(text));
    }

    /** Sets a value of any form. */
    static JsonObject put(JsonObject root, String pointer, Json value) {
        return (JsonObject) put(root, JsonPointer.steps(pointer), Optional.of(value));
    }

    private static Optional<Json> of(String text) {
        return Optional.of(Json.of(text));
    }

    private static Json put(Json here, List<String> steps, Optional<Json> value) {
        String step = steps.get(0);
        List<String> rest = steps.subList(1, steps.size());
        if (here instanceof JsonArray array) {
            List<Json> items = new ArrayList<>(array.items());
            int index = Integer.parseInt(step);
            Json next = rest.isEmpty() ? value.orElse(Json.of("")) : put(items.get(index), rest, value);
            items.set(index, next);
            return new JsonArray(items);
        }
        JsonObject object = here instanceof JsonObject known ? known : JsonObject.EMPTY;
        if (!rest.isEmpty()) {
            Json below = put(object.get(step).orElse(JsonObject.EMPTY), rest, value);
            boolean gone = below instanceof JsonObject empty && empty.members().isEmpty() && value.isEmpty();
            return gone ? object.without(step) : object.with(step, below);
        }
        return value.isPresent() ? object.with(step, value.get()) : object.without(step);
    }

    /** Adds a row at the end of a list. */
    static JsonObject add(JsonObject root, String list, Json item) {
        List<Json> items = new ArrayList<>(items(root, list));
        items.add(item);
        return put(root, list, new JsonArray(items));
    }

    /** Takes a row out of a list; a list that is not asked for goes with its last row. */
    static JsonObject remove(JsonObject root, String list, int index, boolean keepEmpty) {
        List<Json> items = new ArrayList<>(items(root, list));
        items.remove(index);
        return items.isEmpty() && !keepEmpty ? put(root, list, "") : put(root, list, new JsonArray(items));
    }

    static List<Json> items(JsonObject root, String list) {
        return JsonPointer.resolve(root, list)
                .map(value -> value instanceof JsonArray array ? array.items() : List.<Json>of())
                .orElse(List.of());
    }
}
