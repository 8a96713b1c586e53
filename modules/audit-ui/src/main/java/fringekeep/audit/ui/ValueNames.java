package fringekeep.audit.ui;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.drawing.NumberText;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Words for places in a result, and numbers short enough for a row. */
final class ValueNames {
    private ValueNames() {}

    /** {@code /estimates/0/value} of a result that names its estimates becomes {@code polarizability volume}. */
    static String words(JsonObject result, String pointer) {
        if (!pointer.startsWith("/")) {
            return pointer;
        }
        List<String> steps = JsonPointer.steps(pointer);
        StringBuilder words = new StringBuilder();
        Json at = result;
        for (String step : steps) {
            Optional<Json> next = step(at, step);
            String word = next.flatMap(ValueNames::name).orElseGet(() -> step.matches("\\d+") ? "" : spaced(step));
            boolean plain = step.equals("value") || word.isEmpty();
            if (!plain) {
                words.append(words.isEmpty() ? "" : ", ").append(word);
            }
            at = next.orElse(Json.of(""));
        }
        return words.isEmpty() ? pointer : words.toString();
    }

    private static Optional<Json> step(Json at, String step) {
        if (at instanceof JsonObject object) {
            return object.get(step);
        }
        if (at instanceof JsonArray array && step.matches("\\d{1,7}")) {
            int index = Integer.parseInt(step);
            return index < array.items().size() ? Optional.of(array.items().get(index)) : Optional.empty();
        }
        return Optional.empty();
    }

    private static Optional<String> name(Json value) {
        return value instanceof JsonObject object ? object.text("name").map(ValueNames::spaced) : Optional.empty();
    }

    /** {@code airPolarizability} as {@code air polarizability}. */
    static String spaced(String name) {
        return name.replaceAll("([a-z0-9])([A-Z])", "$1 $2").replace('-', ' ').toLowerCase(Locale.ROOT);
    }

    /** A number as written with six digits; other words shortened. */
    static String brief(String written) {
        try {
            return NumberText.significant(Double.parseDouble(written), 6);
        } catch (NumberFormatException e) {
            return written.length() <= 14 ? written : written.substring(0, 13) + "\u2026";
        }
    }

    /** How many numbers a result holds. */
    static long numbers(Json value) {
        long count = value instanceof JsonNumber ? 1 : 0;
        if (value instanceof JsonObject object) {
            for (Json member : object.members().values()) {
                count += numbers(member);
            }
        } else if (value instanceof JsonArray array) {
            for (Json item : array.items()) {
                count += numbers(item);
            }
        }
        return count;
    }
}
