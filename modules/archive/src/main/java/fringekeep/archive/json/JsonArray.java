package fringekeep.archive.json;

import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;

/** A JSON array; its order has meaning. */
public record JsonArray(List<Json> items) implements Json {
    /** Copies the list. */
    public JsonArray {
        items = List.copyOf(items);
    }

    /** An array of the given values. */
    public static JsonArray of(Json... items) {
        return new JsonArray(Arrays.asList(items));
    }

    /** An array of numbers. */
    public static JsonArray ofNumbers(double... numbers) {
        return new JsonArray(
                DoubleStream.of(numbers).<Json>mapToObj(JsonNumber::new).toList());
    }

    /** An array of texts. */
    public static JsonArray ofTexts(List<String> texts) {
        return new JsonArray(texts.stream().<Json>map(JsonText::new).toList());
    }

    /**
     * All items as numbers.
     *
     * @throws IllegalStateException if an item is not a number
     */
    public double[] numbers() {
        return items.stream()
                .mapToDouble(item -> {
                    if (item instanceof JsonNumber number) {
                        return number.value();
                    }
                    throw new IllegalStateException("not a number: " + item);
                })
                .toArray();
    }

    /**
     * All items as objects.
     *
     * @throws IllegalStateException if an item is not an object
     */
    public List<JsonObject> objects() {
        return items.stream()
                .map(item -> {
                    if (item instanceof JsonObject object) {
                        return object;
                    }
                    throw new IllegalStateException("not an object: " + item);
                })
                .toList();
    }

    /**
     * All items as texts.
     *
     * @throws IllegalStateException if an item is not a text
     */
    public List<String> texts() {
        return items.stream()
                .map(item -> {
                    if (item instanceof JsonText text) {
                        return text.value();
                    }
                    throw new IllegalStateException("not a text: " + item);
                })
                .toList();
    }
}
