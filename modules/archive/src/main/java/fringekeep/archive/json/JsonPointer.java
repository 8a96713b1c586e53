package fringekeep.archive.json;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** JSON pointers (RFC 6901). */
public final class JsonPointer {
    private JsonPointer() {}

    /** The pointer to a member of what another pointer points to. */
    public static String child(String pointer, String name) {
        return pointer + "/" + name.replace("~", "~0").replace("/", "~1");
    }

    /** The pointer to an item of the array another pointer points to. */
    public static String child(String pointer, int index) {
        return pointer + "/" + index;
    }

    /** The unescaped steps of a pointer; none for the empty pointer. */
    public static List<String> steps(String pointer) {
        if (pointer.isEmpty()) {
            return List.of();
        }
        if (pointer.charAt(0) != '/') {
            throw new IllegalArgumentException("a JSON pointer begins with a slash: " + pointer);
        }
        List<String> steps = new ArrayList<>();
        for (String step : pointer.substring(1).split("/", -1)) {
            steps.add(step.replace("~1", "/").replace("~0", "~"));
        }
        return steps;
    }

    /** What a pointer points to. */
    public static Optional<Json> resolve(Json root, String pointer) {
        Optional<Json> here = Optional.of(root);
        for (String step : steps(pointer)) {
            here = here.flatMap(value -> step(value, step));
        }
        return here;
    }

    private static Optional<Json> step(Json value, String step) {
        if (value instanceof JsonObject object) {
            return object.get(step);
        }
        if (value instanceof JsonArray array && step.matches("0|[1-9][0-9]{0,8}")) {
            int index = Integer.parseInt(step);
            return index < array.items().size() ? Optional.of(array.items().get(index)) : Optional.empty();
        }
        return Optional.empty();
    }

    /** The root with the value a pointer points to replaced; a last step that names no member adds it. */
    public static Json replace(Json root, String pointer, Json value) {
        return replace(root, steps(pointer), value);
    }

    private static Json replace(Json here, List<String> steps, Json value) {
        if (steps.isEmpty()) {
            return value;
        }
        String first = steps.get(0);
        List<String> rest = steps.subList(1, steps.size());
        if (here instanceof JsonObject object
                && (rest.isEmpty() || object.get(first).isPresent())) {
            return object.with(first, replace(object.get(first).orElse(value), rest, value));
        }
        Json below = step(here, first).orElseThrow(() -> new IllegalArgumentException("nothing at /" + first));
        List<Json> items = new ArrayList<>(((JsonArray) here).items());
        items.set(Integer.parseInt(first), replace(below, rest, value));
        return new JsonArray(items);
    }
}
