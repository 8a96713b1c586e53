package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonBoolean;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads the inputs of a method from a document and names everything that is wrong with them. */
final class Reading {
    private final JsonDocument document;
    private final List<Problem> problems = new ArrayList<>();

    Reading(JsonDocument document) {
        this.document = document;
    }

    Inputs read(Method method) throws ProblemException {
        Inputs inputs = object(method.fields(), document.value(), "");
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return inputs;
    }

    private Inputs object(List<Field> fields, Json value, String pointer) {
        Map<String, Inputs.Given> given = new LinkedHashMap<>();
        if (!(value instanceof JsonObject object)) {
            wrong("form", "An object with inputs by name is expected here.", pointer, "Write { \"name\": value, … }.");
            return new Inputs(given);
        }
        List<String> names = fields.stream().map(Field::name).toList();
        object.members().keySet().stream()
                .filter(name -> !names.contains(name))
                .forEach(name -> unknown(name, names, pointer));
        for (Field field : fields) {
            String place = pointer + "/" + field.name();
            Optional<Json> entered = object.get(field.name());
            if (entered.isPresent()) {
                given(field, entered.orElseThrow(), place).ifPresent(read -> given.put(field.name(), read));
            } else if (field.required()) {
                wrong(
                        "missing",
                        "The input " + field.name() + " is missing: " + field.words() + ".",
                        place,
                        "Add \"" + field.name() + "\"" + Numbers.how(field) + ".");
            }
        }
        return new Inputs(given);
    }

    private void unknown(String name, List<String> names, String pointer) {
        List<String> nearest = Nearest.to(name, names);
        wrong(
                "unknown-field",
                "There is no input \"" + name + "\" here.",
                pointer + "/" + name,
                nearest.isEmpty()
                        ? "The inputs are " + String.join(", ", names) + "."
                        : "Perhaps " + String.join(" or ", nearest) + "?");
    }

    private Optional<Inputs.Given> given(Field field, Json value, String place) {
        return switch (field.sort()) {
            case QUANTITY, WHOLE -> numbers(field, value, place, true);
            case LIST -> numbers(field, value, place, false);
            case GRID -> rows(field, value, place);
            case CHOICE -> choice(field, value, place);
            case TEXT ->
                value instanceof JsonText text
                        ? Optional.of(new Inputs.Given.Word(text.value()))
                        : refused("form", field.name() + " is words.", place, "Write words in quotation marks.");
            case FLAG ->
                value instanceof JsonBoolean flag
                        ? Optional.of(new Inputs.Given.Flag(flag.value()))
                        : refused("form", field.name() + " is true or false.", place, "Write true or false.");
            case GROUP -> group(field, value, place);
        };
    }

    private Optional<Inputs.Given> numbers(Field field, Json value, String place, boolean single) {
        try {
            Inputs.Given.Numbers numbers = Numbers.read(field, value);
            if (single && numbers.values().length != 1) {
                return refused(
                        "form",
                        field.name() + " is one quantity, not " + numbers.values().length + ".",
                        place,
                        "Write \"" + field.name() + "\"" + Numbers.how(field) + ".");
            }
            double only = single ? numbers.values()[0] : 0;
            if (field.sort() == Field.Sort.WHOLE && (only != Math.rint(only) || Math.abs(only) > 1e9)) {
                return refused("whole", field.name() + " is a whole number.", place, "Write a whole number.");
            }
            if (field.sort() == Field.Sort.WHOLE && numbers.uncertainties()[0] > 0) {
                return refused("whole", field.name() + " is counted and has no uncertainty.", place, "Leave u away.");
            }
            return Optional.of(numbers);
        } catch (ProblemException e) {
            e.problems().forEach(problem -> problems.add(problem.at(at(place))));
            return Optional.empty();
        }
    }

    private Optional<Inputs.Given> rows(Field field, Json value, String place) {
        Json inner = value instanceof JsonObject object ? object.get("value").orElse(JsonArray.of()) : value;
        String unit = value instanceof JsonObject object ? object.text("unit").orElse("1") : "1";
        List<double[]> rows = new ArrayList<>();
        if (inner instanceof JsonArray array) {
            for (Json row : array.items()) {
                numbers(field, JsonObject.EMPTY.with("value", row).with("unit", unit), place, false)
                        .ifPresent(read -> rows.add(((Inputs.Given.Numbers) read).values()));
            }
        }
        if (rows.isEmpty()) {
            return refused("form", field.name() + " is rows of numbers.", place, "Write [[1, 2], [3, 4]].");
        }
        return Optional.of(new Inputs.Given.Rows(rows.toArray(new double[0][])));
    }

    private Optional<Inputs.Given> choice(Field field, Json value, String place) {
        if (value instanceof JsonText text && field.among().contains(text.value())) {
            return Optional.of(new Inputs.Given.Word(text.value()));
        }
        return refused(
                "choice",
                field.name() + " is none of the words it may be.",
                place,
                "Write one of " + String.join(", ", field.among()) + ".");
    }

    private Optional<Inputs.Given> group(Field field, Json value, String place) {
        List<Inputs> members = new ArrayList<>();
        if (value instanceof JsonArray array) {
            for (int k = 0; k < array.items().size(); k++) {
                members.add(object(field.parts(), array.items().get(k), place + "/" + k));
            }
        } else {
            members.add(object(field.parts(), value, place));
        }
        if (members.isEmpty()) {
            return refused("form", field.name() + " is empty.", place, "Give at least one object.");
        }
        return Optional.of(new Inputs.Given.Groups(members));
    }

    private Optional<Inputs.Given> refused(String code, String what, String place, String mend) {
        wrong(code, what, place, mend);
        return Optional.empty();
    }

    private void wrong(String code, String what, String place, String mend) {
        problems.add(new Problem("compute." + code, what, at(place), mend));
    }

    private String at(String place) {
        return document.place(place) + (place.isEmpty() ? "" : ", field " + place);
    }
}
