package fringekeep.figure.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
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

    /** All that is wrong with a statement about a record. */
    public static List<Problem> problems(JsonObject content, RecordView record, Input input) {
        String pointer = content.text("pointer").orElse("");
        Optional<PointedValue> value = PointedValue.find(record, input, pointer);
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

    /** A printed 17 mm for a volume is no rounding of anything. */
    private static Optional<Problem> unit(Unit printed, String code, PointedValue value) throws ProblemException {
        if (value.unit().isEmpty() || Units.parse(value.unit().get()).sameDimension(printed)) {
            return Optional.empty();
        }
        return Optional.of(new Problem(
                "statement.unit",
                "The value is in " + value.unit().get() + ", which " + code + " does not measure.",
                "/content/unit",
                "Give the unit that is printed, of the dimension of "
                        + value.unit().get() + "."));
    }

    private static List<Problem> compare(JsonObject content, PointedValue value, Rounding.Printed printed)
            throws ProblemException {
        String code = content.text("unit").orElse("1");
        Unit unit = Units.parse(code);
        Optional<Problem> dimension = unit(unit, code, value);
        if (dimension.isPresent()) {
            return List.of(dimension.get());
        }
        String which = content.text("uncertainty").orElse("combined");
        OptionalDouble si = value.deviation(which);
        OptionalDouble deviation =
                si.isPresent() ? OptionalDouble.of(unit.differenceFromSi(si.getAsDouble())) : OptionalDouble.empty();
        Optional<Rounding.Printed> right =
                Rounding.round(content.object("rounding").orElseThrow(), unit.fromSi(value.value()), deviation);
        if (right.isEmpty()) {
            return List.of(new Problem(
                    "statement.no-uncertainty",
                    "The rule rounds by the uncertainty, but the value has no " + which + " uncertainty.",
                    "/content/rounding",
                    "Round to decimals or significant digits instead, or name an uncertainty the value has."));
        }
        if (printed.deviation().isPresent() && right.get().deviation().isEmpty()) {
            return List.of(new Problem(
                    "statement.no-uncertainty",
                    which.equals("none")
                            ? "An uncertainty is printed although none is said to be."
                            : "An uncertainty is printed, but the value has no " + which + " uncertainty.",
                    "/content/uncertainty",
                    "Say which uncertainty of the value is printed: combined, statistical or shared."));
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
}
