package fringekeep.desk.form;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;

/** Counts the fields in which two documents as typed differ. */
final class Differences {
    private static final Set<String> ASIDE = Set.of("remark", "after", "acknowledged");

    private Differences() {}

    static int count(Json now, Json before) {
        if (now.equals(before)) {
            return 0;
        }
        if (now instanceof JsonObject here && before instanceof JsonObject there) {
            Set<String> names = new TreeSet<>(here.members().keySet());
            names.addAll(there.members().keySet());
            names.removeAll(ASIDE);
            return names.stream()
                    .mapToInt(name -> count(member(here, there, name), member(there, here, name)))
                    .sum();
        }
        if (now instanceof JsonArray here && before instanceof JsonArray there) {
            int count = 0;
            for (int i = 0; i < Math.max(here.items().size(), there.items().size()); i++) {
                count += count(item(here, there, i), item(there, here, i));
            }
            return count;
        }
        return 1;
    }

    /** A member, or something of the other's form that holds nothing. */
    private static Json member(JsonObject object, JsonObject other, String name) {
        return object.get(name).orElseGet(() -> empty(other.get(name).orElse(Json.of(""))));
    }

    private static Json item(JsonArray array, JsonArray other, int index) {
        return index < array.items().size()
                ? array.items().get(index)
                : empty(other.items().get(index));
    }

    private static Json empty(Json like) {
        return like instanceof JsonObject
                ? JsonObject.EMPTY
                : like instanceof JsonArray ? new JsonArray(List.of()) : Json.of("");
    }
}
