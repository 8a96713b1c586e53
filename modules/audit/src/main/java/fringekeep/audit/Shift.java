package fringekeep.audit;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * How one estimate moved between two results.
 *
 * @param pointer JSON pointer of the estimate in the result, or its name where the result lists estimates
 * @param before old value (SI)
 * @param after new value (SI)
 * @param deviation standard uncertainty of the old value (SI), &ge; 0
 */
public record Shift(String pointer, double before, double after, double deviation) {
    /** (new - old)/u; empty where the old value had no uncertainty. */
    public OptionalDouble inDeviations() {
        return deviation > 0 ? OptionalDouble.of((after - before) / deviation) : OptionalDouble.empty();
    }

    /**
     * All estimates that two results share: members {@code {"value","u"}} at the same pointer, and lists {@code estimates},
     * {@code values}, {@code covariance}.
     */
    public static List<Shift> between(JsonObject before, JsonObject after) {
        List<Shift> shifts = new ArrayList<>();
        walk("", before, after, shifts);
        return List.copyOf(shifts);
    }

    private static void walk(String pointer, Json before, Json after, List<Shift> shifts) {
        if (before instanceof JsonObject old && after instanceof JsonObject now) {
            object(pointer, old, now, shifts);
        } else if (before instanceof JsonArray old && after instanceof JsonArray now) {
            for (int i = 0; i < Math.min(old.items().size(), now.items().size()); i++) {
                walk(pointer + "/" + i, old.items().get(i), now.items().get(i), shifts);
            }
        }
    }

    private static void object(String pointer, JsonObject old, JsonObject now, List<Shift> shifts) {
        OptionalDouble value = old.number("value");
        OptionalDouble moved = now.number("value");
        OptionalDouble u = old.number("u");
        if (value.isPresent() && moved.isPresent() && u.isPresent()) {
            shifts.add(new Shift(pointer, value.getAsDouble(), moved.getAsDouble(), u.getAsDouble()));
            return;
        }
        if (isList(old) && isList(now)) {
            list(pointer, old, now, shifts);
        }
        for (Map.Entry<String, Json> member : old.members().entrySet()) {
            now.get(member.getKey())
                    .ifPresent(other -> walk(pointer + "/" + member.getKey(), member.getValue(), other, shifts));
        }
    }

    private static boolean isList(JsonObject object) {
        int n = object.array("estimates").items().size();
        return n > 0
                && object.array("values").items().size() == n
                && object.array("covariance").items().size() == n * (n + 1) / 2
                && object.array("values").items().stream().allMatch(JsonNumber.class::isInstance);
    }

    private static void list(String pointer, JsonObject old, JsonObject now, List<Shift> shifts) {
        List<String> names = old.array("estimates").texts();
        List<String> others = now.array("estimates").texts();
        double[] covariance = old.array("covariance").numbers();
        for (int i = 0; i < names.size(); i++) {
            int at = others.indexOf(names.get(i));
            if (at >= 0) {
                shifts.add(new Shift(
                        pointer + "/" + names.get(i),
                        old.array("values").numbers()[i],
                        now.array("values").numbers()[at],
                        Math.sqrt(Math.max(0, covariance[i * (i + 1) / 2 + i]))));
            }
        }
    }
}
