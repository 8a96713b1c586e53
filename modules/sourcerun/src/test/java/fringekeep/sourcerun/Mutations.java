package fringekeep.sourcerun;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Changes JSON documents at random: members lost, doubled, of another sort, huge, tiny, empty. */
final class Mutations {
    private static final double[] NUMBERS = {
        0, -1, 1, 0.5, 1e308, -1e308, 5e-324, 1e15, 9007199254740991.0, 2.5, 1e-30, 401, 1e7
    };
    private static final String[] TEXTS = {
        "", " ", "C60", "C", "((", "[13C", "C6H5O-", "0", "-1", "nm", "é\u0000", "Xx9"
    };

    private final Random random;

    Mutations(long seed) {
        random = new Random(seed);
    }

    /** The document with one to three changes. */
    JsonObject of(JsonObject document) {
        JsonObject changed = document;
        for (int i = random.nextInt(3); i >= 0; i--) {
            changed = (JsonObject) changed(changed, 0);
        }
        return changed;
    }

    private Json changed(Json value, int depth) {
        if (value instanceof JsonObject object
                && !object.members().isEmpty()
                && (depth == 0 || random.nextInt(4) > 0)) {
            List<String> names = new ArrayList<>(object.members().keySet());
            String name = names.get(random.nextInt(names.size()));
            return random.nextInt(6) == 0
                    ? object.without(name)
                    : object.with(name, changed(object.get(name).orElseThrow(), depth + 1));
        }
        if (value instanceof JsonArray array && !array.items().isEmpty() && random.nextInt(4) > 0) {
            List<Json> items = new ArrayList<>(array.items());
            int at = random.nextInt(items.size());
            if (random.nextInt(4) == 0) {
                items.remove(at);
            } else if (random.nextInt(3) == 0) {
                items.add(items.get(at));
            } else {
                items.set(at, changed(items.get(at), depth + 1));
            }
            return new JsonArray(items);
        }
        return depth == 0 ? value : other();
    }

    private Json other() {
        return switch (random.nextInt(6)) {
            case 0 -> new JsonArray(List.of());
            case 1 -> JsonObject.EMPTY;
            case 2 -> new JsonBoolean(random.nextBoolean());
            case 3 -> new JsonText(TEXTS[random.nextInt(TEXTS.length)]);
            default -> new JsonNumber(NUMBERS[random.nextInt(NUMBERS.length)]);
        };
    }
}
