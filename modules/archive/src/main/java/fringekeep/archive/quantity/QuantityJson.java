package fringekeep.archive.quantity;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Moment;
import java.math.BigDecimal;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Quantities, moments and estimates as JSON values of record format 1, section 1. */
public final class QuantityJson {
    private QuantityJson() {}

    /** A quantity as JSON. */
    public static JsonObject write(Quantity quantity) {
        return JsonObject.EMPTY
                .with("text", quantity.text())
                .with("unit", quantity.unit())
                .with("si", quantity.si())
                .with("uncertainty", write(quantity.uncertainty()));
    }

    private static JsonObject write(Uncertainty uncertainty) {
        if (uncertainty instanceof Uncertainty.Stated stated) {
            return sort("stated").with("text", stated.text()).with("si", stated.si());
        }
        if (uncertainty instanceof Uncertainty.Exact) {
            return sort("exact");
        }
        if (uncertainty instanceof Uncertainty.Unstated) {
            return sort("unstated");
        }
        if (uncertainty instanceof Uncertainty.Bounds bounds) {
            return sort("bounds").with("lower", json(bounds.lower())).with("upper", json(bounds.upper()));
        }
        throw new AssertionError(uncertainty);
    }

    private static JsonObject sort(String sort) {
        return JsonObject.EMPTY.with("sort", sort);
    }

    private static Optional<Json> json(OptionalDouble number) {
        return number.isPresent() ? Optional.of(Json.of(number.getAsDouble())) : Optional.empty();
    }

    /**
     * The quantity of a JSON value that keeps to the shared schema.
     *
     * @throws IllegalArgumentException if it does not
     */
    public static Quantity read(JsonObject json) {
        return new Quantity(
                text(json, "text"),
                text(json, "unit"),
                json.number("si").orElseThrow(() -> missing("si")),
                uncertainty(json.object("uncertainty").orElseThrow(() -> missing("uncertainty"))));
    }

    private static Uncertainty uncertainty(JsonObject json) {
        return switch (text(json, "sort")) {
            case "stated" ->
                new Uncertainty.Stated(text(json, "text"), json.number("si").orElseThrow(() -> missing("si")));
            case "exact" -> new Uncertainty.Exact();
            case "unstated" -> new Uncertainty.Unstated();
            case "bounds" -> new Uncertainty.Bounds(json.number("lower"), json.number("upper"));
            default -> throw new IllegalArgumentException("no sort of uncertainty: " + text(json, "sort"));
        };
    }

    private static String text(JsonObject json, String name) {
        return json.text(name).orElseThrow(() -> missing(name));
    }

    private static IllegalArgumentException missing(String name) {
        return new IllegalArgumentException("member " + name + " is missing");
    }

    /** The quantity member of an object, if there is one. */
    public static Optional<Quantity> member(JsonObject object, String name) {
        return object.object(name).map(QuantityJson::read);
    }

    /** SI value of a quantity member, if there is one. */
    public static OptionalDouble si(JsonObject object, String name) {
        return object.object(name).map(quantity -> quantity.number("si")).orElse(OptionalDouble.empty());
    }

    /** Standard uncertainty (SI) of a quantity: 0 when exact, NaN when not stated or only bounds are known. */
    public static double deviation(Quantity quantity) {
        if (quantity.uncertainty() instanceof Uncertainty.Stated stated) {
            return stated.si();
        }
        return quantity.uncertainty() instanceof Uncertainty.Exact ? 0 : Double.NaN;
    }

    /**
     * What is wrong with a quantity: an unknown unit, another dimension than asked, SI values that are not the exact product
     * rounded once.
     *
     * @param siUnit UCUM code of the SI unit it must reduce to; empty = any
     */
    public static List<Problem> examine(Quantity quantity, Optional<String> siUnit, String pointer) {
        Unit unit;
        try {
            unit = Units.parse(quantity.unit());
        } catch (ProblemException e) {
            return List.of(e.problems().get(0).at(JsonPointer.child(pointer, "unit")));
        }
        List<Problem> problems = new ArrayList<>();
        if (siUnit.isPresent() && !unit.sameDimension(Units.of(siUnit.get()))) {
            problems.add(new Problem(
                    "quantity.dimension",
                    "The unit " + quantity.unit() + " is not one for this quantity, which is measured in "
                            + siUnit.get() + ".",
                    JsonPointer.child(pointer, "unit"),
                    "Give it in " + siUnit.get() + " or a multiple of it; nothing has been stored."));
        }
        number(quantity.text(), quantity.si(), unit, false, pointer).ifPresent(problems::add);
        if (quantity.uncertainty() instanceof Uncertainty.Stated stated) {
            number(stated.text(), stated.si(), unit, true, JsonPointer.child(pointer, "uncertainty"))
                    .ifPresent(problems::add);
        }
        if (quantity.uncertainty() instanceof Uncertainty.Bounds bounds) {
            bounds(quantity.si(), bounds, pointer).ifPresent(problems::add);
        }
        return problems;
    }

    private static Optional<Problem> number(String text, double si, Unit unit, boolean difference, String pointer) {
        double exact;
        try {
            BigDecimal decimal = new BigDecimal(text);
            exact = difference ? unit.differenceToSi(decimal) : unit.toSi(decimal);
        } catch (NumberFormatException e) {
            return Optional.of(new Problem(
                    "quantity.form",
                    "\"" + text + "\" is not a decimal.",
                    JsonPointer.child(pointer, "text"),
                    "Write digits with a point as decimal sign; nothing has been stored."));
        }
        if (exact == si) {
            return Optional.empty();
        }
        return Optional.of(new Problem(
                "quantity.si",
                "The SI value " + si + " is not " + text + " " + unit.code() + ", which is " + exact + ".",
                JsonPointer.child(pointer, "si"),
                "Give the quantity as one text and let the program convert it; nothing has been stored."));
    }

    private static Optional<Problem> bounds(double si, Uncertainty.Bounds bounds, String pointer) {
        boolean fits = si >= bounds.lower().orElse(si) && si <= bounds.upper().orElse(si);
        return fits
                ? Optional.empty()
                : Optional.of(new Problem(
                        "quantity.bounds",
                        "The value does not lie between its bounds.",
                        JsonPointer.child(pointer, "uncertainty"),
                        "Mend the value or the bounds; nothing has been stored."));
    }

    /** A moment as JSON. */
    public static JsonObject write(Moment moment) {
        return JsonObject.EMPTY
                .with("at", moment.at().toString())
                .with("offset", moment.offset())
                .with("zone", moment.zone().map(Json::of));
    }

    /**
     * The moment of a JSON value that keeps to the shared schema; further members (as {@code known}) are left aside.
     *
     * @throws IllegalArgumentException if it does not
     */
    public static Moment moment(JsonObject json) {
        try {
            return new Moment(Instant.parse(text(json, "at")), text(json, "offset"), json.text("zone"));
        } catch (DateTimeException e) {
            throw new IllegalArgumentException(
                    "not an instant: " + json.text("at").orElse(""), e);
        }
    }

    /** An estimate as JSON. */
    public static JsonObject estimate(double value, double deviation) {
        return JsonObject.EMPTY.with("value", value).with("u", deviation);
    }
}
