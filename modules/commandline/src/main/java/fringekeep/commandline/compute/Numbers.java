package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.JsonText;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.archive.quantity.Uncertainty;
import fringekeep.archive.quantity.Unit;
import fringekeep.archive.quantity.Units;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Numbers with units, as a document gives them: {@code "266.0(1) nm"}, {@code {"value": 266.0, "u": 0.1, "unit": "nm"}}, a
 * row of the former, the latter with rows in it, or bare numbers where there is no unit.
 */
final class Numbers {
    private static final Set<String> MEMBERS = Set.of("value", "u", "unit");

    private Numbers() {}

    static Inputs.Given.Numbers read(Field field, Json value) throws ProblemException {
        if (value instanceof JsonObject object) {
            return measured(field, object);
        }
        List<Json> items = value instanceof JsonArray array ? array.items() : List.of(value);
        double[] values = new double[items.size()];
        double[] uncertainties = new double[values.length];
        for (int k = 0; k < values.length; k++) {
            Inputs.Given.Numbers one = one(field, items.get(k));
            values[k] = one.values()[0];
            uncertainties[k] = one.uncertainties()[0];
        }
        return new Inputs.Given.Numbers(values, uncertainties);
    }

    private static Inputs.Given.Numbers one(Field field, Json value) throws ProblemException {
        if (value instanceof JsonText text) {
            return typed(field, QuantityText.parse(text.value()));
        }
        if (value instanceof JsonNumber number) {
            if (!field.unit().equals("1")) {
                throw problem(
                        "no-unit", "The number in " + field.name() + " has no unit.", "Write it" + how(field) + ".");
            }
            return new Inputs.Given.Numbers(new double[] {number.value()}, new double[] {Double.NaN});
        }
        if (value instanceof JsonObject object) {
            Inputs.Given.Numbers numbers = measured(field, object);
            if (numbers.values().length == 1) {
                return numbers;
            }
        }
        throw problem("form", field.name() + " cannot be read as a quantity.", "Write it" + how(field) + ".");
    }

    private static Inputs.Given.Numbers typed(Field field, Quantity quantity) throws ProblemException {
        checked(field, Units.parse(quantity.unit()));
        double u = quantity.uncertainty() instanceof Uncertainty.Stated stated ? stated.si() : Double.NaN;
        return new Inputs.Given.Numbers(new double[] {quantity.si()}, new double[] {u});
    }

    private static Inputs.Given.Numbers measured(Field field, JsonObject object) throws ProblemException {
        for (String name : object.members().keySet()) {
            if (!MEMBERS.contains(name)) {
                throw problem(
                        "unknown-field",
                        "A quantity has no \"" + name + "\".",
                        "A quantity has value, unit, and u for its standard uncertainty.");
            }
        }
        String code = object.text("unit").orElse(field.unit().equals("1") ? "1" : "");
        if (code.isEmpty()) {
            throw problem("no-unit", field.name() + " has no unit.", "Write it" + how(field) + ".");
        }
        Unit unit = checked(field, Units.parse(code));
        double[] entered = plain(field, object.get("value"));
        double[] values = new double[entered.length];
        for (int k = 0; k < values.length; k++) {
            values[k] = unit.toSi(new BigDecimal(Double.toString(entered[k])));
        }
        return new Inputs.Given.Numbers(values, uncertainties(field, object, unit, values.length));
    }

    private static double[] uncertainties(Field field, JsonObject object, Unit unit, int size) throws ProblemException {
        double[] uncertainties = new double[size];
        Arrays.fill(uncertainties, Double.NaN);
        if (object.get("u").isEmpty()) {
            return uncertainties;
        }
        double[] entered = plain(field, object.get("u"));
        if (entered.length != 1 && entered.length != size) {
            throw problem(
                    "length",
                    field.name() + " has " + size + " values and " + entered.length + " uncertainties.",
                    "Give one uncertainty for all, or one for each value.");
        }
        for (int k = 0; k < size; k++) {
            double u = entered[entered.length == 1 ? 0 : k];
            uncertainties[k] = unit.differenceToSi(new BigDecimal(Double.toString(u)));
        }
        return uncertainties;
    }

    private static double[] plain(Field field, Optional<Json> value) throws ProblemException {
        List<Json> items = value.isPresent() && value.orElseThrow() instanceof JsonArray array
                ? array.items()
                : value.map(List::of).orElse(List.of());
        List<Double> numbers = new ArrayList<>();
        for (Json item : items) {
            if (!(item instanceof JsonNumber number)) {
                throw problem(
                        "form", field.name() + " holds something that is no number.", "Write it" + how(field) + ".");
            }
            numbers.add(number.value());
        }
        if (numbers.isEmpty()) {
            throw problem("form", field.name() + " holds no number.", "Write it" + how(field) + ".");
        }
        return numbers.stream().mapToDouble(Double::doubleValue).toArray();
    }

    private static Unit checked(Field field, Unit unit) throws ProblemException {
        if (!unit.sameDimension(Units.of(field.unit()))) {
            throw problem(
                    "unit",
                    field.name() + " is given in " + unit.code() + ", which does not reduce to " + field.unit() + ".",
                    "Give it in a unit that reduces to " + field.unit() + ".");
        }
        return unit;
    }

    /** How to write it, to be put after a name or "Write it". */
    static String how(Field field) {
        String unit = field.unit().isEmpty() ? "1" : field.unit();
        return switch (field.sort()) {
            case QUANTITY ->
                field.unit().equals("1")
                        ? ": 0.25 or \"0.250(5)\""
                        : ": {\"value\": 1.5, \"unit\": \"" + unit + "\"} or \"1.50(2) " + unit + "\"";
            case WHOLE -> ": 3";
            case LIST -> ": {\"value\": [1.5, 2.5], \"u\": 0.1, \"unit\": \"" + unit + "\"}";
            case GRID -> ": {\"value\": [[1, 2], [3, 4]], \"unit\": \"" + unit + "\"}";
            case CHOICE -> ": one of " + String.join(", ", field.among());
            case TEXT -> ": \"words\"";
            case FLAG -> ": true";
            case GROUP -> ": {…} or [{…}, …]";
        };
    }

    private static ProblemException problem(String code, String what, String mend) {
        return new ProblemException(new Problem("compute." + code, what, "", mend));
    }
}
