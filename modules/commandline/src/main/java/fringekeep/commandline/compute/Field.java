package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * One input of a method.
 *
 * @param name member name in the document
 * @param sort what stands there
 * @param unit UCUM code of the SI unit it reduces to; empty for words, flags and groups
 * @param words what it is, for people
 * @param required whether it must be given
 * @param example a value that works, empty if the worked example leaves it out
 * @param among the words to choose from
 * @param parts inputs of each member of a group
 */
public record Field(
        String name,
        Sort sort,
        String unit,
        String words,
        boolean required,
        Optional<Json> example,
        List<String> among,
        List<Field> parts) {
    /** What may stand in an input. */
    public enum Sort {
        /** One quantity. */
        QUANTITY,
        /** One whole number without unit. */
        WHOLE,
        /** Quantities of one kind in a row. */
        LIST,
        /** Rows of equally many quantities of one kind. */
        GRID,
        /** One of a few words. */
        CHOICE,
        /** Any words. */
        TEXT,
        /** True or false. */
        FLAG,
        /** One object, or several in a row, with inputs of their own. */
        GROUP
    }

    static Field quantity(String name, String unit, String example, String words) {
        return new Field(name, Sort.QUANTITY, unit, words, true, shown(example), List.of(), List.of());
    }

    static Field number(String name, double example, String words) {
        return new Field(name, Sort.QUANTITY, "1", words, true, Optional.of(Json.of(example)), List.of(), List.of());
    }

    static Field whole(String name, int example, String words) {
        return new Field(name, Sort.WHOLE, "1", words, true, Optional.of(Json.of(example)), List.of(), List.of());
    }

    static Field list(String name, String unit, String shownUnit, String words, double... example) {
        Optional<Json> shown = example.length == 0
                ? Optional.empty()
                : Optional.of(JsonObject.EMPTY
                        .with("value", JsonArray.ofNumbers(example))
                        .with("unit", shownUnit));
        return new Field(name, Sort.LIST, unit, words, true, shown, List.of(), List.of());
    }

    static Field measured(
            String name, String unit, String shownUnit, String words, double[] example, double[] uncertainties) {
        JsonObject shown = JsonObject.EMPTY
                .with("value", JsonArray.ofNumbers(example))
                .with("u", JsonArray.ofNumbers(uncertainties))
                .with("unit", shownUnit);
        return new Field(name, Sort.LIST, unit, words, true, Optional.of(shown), List.of(), List.of());
    }

    static Field grid(String name, String unit, String words, double[][] example) {
        JsonArray rows = new JsonArray(
                Arrays.stream(example).<Json>map(JsonArray::ofNumbers).toList());
        return new Field(
                name,
                Sort.GRID,
                unit,
                words,
                true,
                Optional.of(JsonObject.EMPTY.with("value", rows).with("unit", unit)),
                List.of(),
                List.of());
    }

    static <E extends Enum<E>> Field choice(String name, Class<E> words, String what) {
        return choice(
                name,
                what,
                Arrays.stream(words.getEnumConstants()).map(Field::word).toArray(String[]::new));
    }

    static Field choice(String name, String words, String... among) {
        return new Field(name, Sort.CHOICE, "", words, false, Optional.empty(), List.of(among), List.of());
    }

    static Field text(String name, String example, String words) {
        return new Field(name, Sort.TEXT, "", words, true, shown(example), List.of(), List.of());
    }

    static Field flag(String name, String words) {
        return new Field(name, Sort.FLAG, "", words, false, Optional.empty(), List.of(), List.of());
    }

    static Field group(String name, String words, List<Field> parts, JsonObject... example) {
        Optional<Json> shown =
                switch (example.length) {
                    case 0 -> Optional.empty();
                    case 1 -> Optional.of(example[0]);
                    default -> Optional.of(new JsonArray(List.<Json>of(example)));
                };
        return new Field(name, Sort.GROUP, "", words, true, shown, List.of(), List.copyOf(parts));
    }

    /** The same, but it may be left out; its example stays in the worked example. */
    Field orNothing() {
        return new Field(name, sort, unit, words, false, example, among, parts);
    }

    /** The same, but it may be left out, and is in the worked example. */
    Field seldom() {
        return new Field(name, sort, unit, words, false, Optional.empty(), among, parts);
    }

    /** The same with another example. */
    Field shownAs(Json other) {
        return new Field(name, sort, unit, words, required, Optional.of(other), among, parts);
    }

    static String word(Enum<?> value) {
        return value.name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    private static Optional<Json> shown(String example) {
        return example.isEmpty() ? Optional.empty() : Optional.of(Json.of(example));
    }
}
