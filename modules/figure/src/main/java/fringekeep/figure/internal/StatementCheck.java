package fringekeep.figure.internal;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Whether a printed number is the rounding of the value that the statement points to. */
public final class StatementCheck {
    private StatementCheck() {}

    /** What a statement points to, SI. */
    private record Value(double value, OptionalDouble combined, OptionalDouble statistical) {}

    /** All that is wrong with a statement about a record. */
    public static List<Problem> problems(JsonObject content, RecordView record) {
        String pointer = content.text("pointer").orElse("");
        Optional<Value> value = value(record.result(), pointer).or(() -> value(record.content(), pointer));
        if (value.isEmpty()) {
            return List.of(new Problem(
                    "statement.no-value",
                    "The record has no number at " + pointer + ".",
                    "/content/pointer",
                    "Point to a number, an estimate with value and u, or /estimates/NAME."));
        }
        Optional<Rounding.Printed> printed =
                Rounding.read(content.text("printed").orElse(""));
        if (printed.isEmpty()) {
            return List.of(new Problem(
                    "statement.not-a-number",
                    "\"" + content.text("printed").orElse("") + "\" is not a number as printed.",
                    "/content/printed",
                    "Write it as 101.3, 101.3(9), 101.3 \u00b1 0.9 or with \u00d7 10^n behind."));
        }
        try {
            return compare(content, value.get(), printed.get());
        } catch (ProblemException e) {
            return e.problems().stream()
                    .map(problem -> problem.at("/content/unit"))
                    .toList();
        }
    }

    private static List<Problem> compare(JsonObject content, Value value, Rounding.Printed printed)
            throws ProblemException {
        Unit unit = Units.parse(content.text("unit").orElse("1"));
        OptionalDouble si =
                switch (content.text("uncertainty").orElse("combined")) {
                    case "none" -> OptionalDouble.empty();
                    case "statistical" -> value.statistical();
                    default -> value.combined();
                };
        OptionalDouble deviation =
                si.isPresent() ? OptionalDouble.of(unit.differenceFromSi(si.getAsDouble())) : OptionalDouble.empty();
        Optional<Rounding.Printed> right =
                Rounding.round(content.object("rounding").orElseThrow(), unit.fromSi(value.value()), deviation);
        if (right.isEmpty()) {
            return List.of(new Problem(
                    "statement.no-uncertainty",
                    "The rule rounds by the uncertainty, but the value has none.",
                    "/content/rounding",
                    "Round to decimals or significant digits instead."));
        }
        boolean same = right.get().value().compareTo(printed.value()) == 0
                && (printed.deviation().isEmpty()
                        || (right.get().deviation().isPresent()
                                && right.get()
                                                .deviation()
                                                .get()
                                                .compareTo(printed.deviation().get())
                                        == 0));
        return same
                ? List.of()
                : List.of(new Problem(
                        "statement.not-rounded",
                        "What is printed is not the rounding of the value: by the rule it is "
                                + right.get().value().toPlainString()
                                + right.get()
                                        .deviation()
                                        .map(u -> " \u00b1 " + u.toPlainString())
                                        .orElse("") + ".",
                        "/content/printed",
                        "Print that, or state another rule."));
    }

    private static Optional<Value> value(JsonObject part, String pointer) {
        Json here = part;
        String[] steps = pointer.substring(pointer.isEmpty() ? 0 : 1).split("/");
        for (int i = 0; i < steps.length; i++) {
            if (steps[i].equals("estimates") && i == steps.length - 2 && here instanceof JsonObject list) {
                return listed(list, steps[i + 1]);
            }
            Optional<Json> next = step(here, steps[i]);
            if (next.isEmpty()) {
                return Optional.empty();
            }
            here = next.get();
        }
        return single(here);
    }

    private static Optional<Json> step(Json here, String step) {
        if (here instanceof JsonObject object) {
            return object.get(step.replace("~1", "/").replace("~0", "~"));
        }
        boolean index = here instanceof JsonArray && step.matches("[0-9]{1,6}");
        if (index
                && here instanceof JsonArray array
                && Integer.parseInt(step) < array.items().size()) {
            return Optional.of(array.items().get(Integer.parseInt(step)));
        }
        return Optional.empty();
    }

    private static Optional<Value> single(Json here) {
        if (here instanceof JsonNumber number) {
            return Optional.of(new Value(number.value(), OptionalDouble.empty(), OptionalDouble.empty()));
        }
        if (here instanceof JsonObject object && object.number("value").isPresent()) {
            return Optional.of(
                    new Value(object.number("value").getAsDouble(), object.number("u"), statistical(object)));
        }
        if (here instanceof JsonObject object && object.number("si").isPresent()) {
            OptionalDouble u =
                    object.object("uncertainty").map(sort -> sort.number("si")).orElse(OptionalDouble.empty());
            return Optional.of(new Value(object.number("si").getAsDouble(), u, u));
        }
        return Optional.empty();
    }

    private static OptionalDouble statistical(JsonObject estimate) {
        return estimate.number("statistical").isPresent() ? estimate.number("statistical") : estimate.number("u");
    }

    private static Optional<Value> listed(JsonObject list, String name) {
        JsonArray names = list.array("estimates");
        for (int i = 0; i < names.items().size(); i++) {
            if (names.items().get(i).equals(Json.of(name))) {
                double[] covariance = list.array("covariance").numbers();
                OptionalDouble u = OptionalDouble.of(Math.sqrt(covariance[i * (i + 1) / 2 + i]));
                return Optional.of(new Value(list.array("values").numbers()[i], u, u));
            }
        }
        return Optional.empty();
    }
}
