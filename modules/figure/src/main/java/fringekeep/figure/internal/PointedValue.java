package fringekeep.figure.internal;

import fringekeep.archive.facet.Estimates;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonNumber;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.property.StatedUnits;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * What a statement points to, SI.
 *
 * @param value the value
 * @param combined combined standard uncertainty; absent where the record does not say all of it
 * @param statistical its part from counts alone
 * @param shared its part from what results share
 * @param unit UCUM code of a unit of its dimension; absent where the record does not say
 */
record PointedValue(
        double value,
        OptionalDouble combined,
        OptionalDouble statistical,
        OptionalDouble shared,
        Optional<String> unit) {
    private static final String ESTIMATES = "estimates";

    /** The uncertainty that words name: combined, statistical, shared or none. */
    OptionalDouble deviation(String which) {
        return switch (which) {
            case "none" -> OptionalDouble.empty();
            case "statistical" -> statistical;
            case "shared" -> shared;
            default -> combined;
        };
    }

    /** The value at a pointer into result or content. */
    static Optional<PointedValue> find(RecordView record, Input input, String pointer) {
        return at(record.result(), input, pointer).or(() -> at(record.content(), input, pointer));
    }

    private static Optional<PointedValue> at(JsonObject part, Input input, String pointer) {
        Json here = part;
        String[] steps = pointer.substring(pointer.isEmpty() ? 0 : 1).split("/");
        for (int i = 0; i < steps.length; i++) {
            if (steps[i].equals(ESTIMATES) && i == steps.length - 2 && here instanceof JsonObject list) {
                return listed(list, steps[i + 1], input.facet(Estimates.class));
            }
            Optional<Json> next = step(here, steps[i]);
            if (next.isEmpty()) {
                return Optional.empty();
            }
            here = next.get();
        }
        return single(here, unit(steps[steps.length - 1], input));
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

    private static Optional<String> unit(String name, Input input) {
        Optional<String> stated = input.facet(StatedUnits.class).flatMap(units -> units.of(name));
        return stated.or(() -> input.facet(Estimates.class)
                .filter(estimates -> estimates.position(name).isPresent())
                .map(estimates -> estimates.units().get(estimates.position(name).getAsInt())));
    }

    private static Optional<PointedValue> single(Json here, Optional<String> unit) {
        OptionalDouble none = OptionalDouble.empty();
        if (here instanceof JsonNumber number) {
            return Optional.of(new PointedValue(number.value(), none, none, none, unit));
        }
        if (here instanceof JsonObject object && object.number("value").isPresent()) {
            OptionalDouble statistical =
                    object.number("statistical").isPresent() ? object.number("statistical") : object.number("u");
            return Optional.of(new PointedValue(
                    object.number("value").getAsDouble(),
                    object.number("u"),
                    statistical,
                    object.number("shared"),
                    unit));
        }
        if (here instanceof JsonObject object && object.number("si").isPresent()) {
            OptionalDouble u =
                    object.object("uncertainty").map(sort -> sort.number("si")).orElse(none);
            return Optional.of(new PointedValue(
                    object.number("si").getAsDouble(),
                    u,
                    u,
                    none,
                    object.text("unit").or(() -> unit)));
        }
        return Optional.empty();
    }

    /**
     * An estimate of a list. Its covariance is statistical; what it shares is what the record's facet lists for the estimate of
     * this name and value. A list of other values (another description, say) has no shared part that anybody stated.
     */
    private static Optional<PointedValue> listed(JsonObject list, String name, Optional<Estimates> offered) {
        int at = list.array(ESTIMATES).texts().indexOf(name);
        if (at < 0) {
            return Optional.empty();
        }
        double value = list.array("values").numbers()[at];
        double variance = list.array("covariance").numbers()[at * (at + 1) / 2 + at];
        OptionalDouble statistical = deviation(variance);
        Optional<String> unit = offered.filter(each -> each.position(name).isPresent())
                .map(each -> each.units().get(each.position(name).getAsInt()));
        OptionalDouble sharedVariance = sharedVariance(offered, name, value);
        if (sharedVariance.isEmpty()) {
            return Optional.of(new PointedValue(
                    value,
                    unit.isEmpty() ? statistical : OptionalDouble.empty(),
                    statistical,
                    OptionalDouble.empty(),
                    unit));
        }
        double shared = sharedVariance.getAsDouble();
        return Optional.of(new PointedValue(value, deviation(variance + shared), statistical, deviation(shared), unit));
    }

    private static OptionalDouble deviation(double variance) {
        return variance >= 0 ? OptionalDouble.of(Math.sqrt(variance)) : OptionalDouble.empty();
    }

    private static OptionalDouble sharedVariance(Optional<Estimates> offered, String name, double value) {
        OptionalInt at = offered.map(each -> each.position(name)).orElse(OptionalInt.empty());
        boolean same = at.isPresent() && offered.orElseThrow().values()[at.getAsInt()] == value;
        if (!same) {
            return OptionalDouble.empty();
        }
        double variance = 0;
        for (Sensitivity each : offered.orElseThrow().sensitivities()) {
            double part = each.derivatives()[at.getAsInt()] * each.deviation();
            variance += part * part;
        }
        return OptionalDouble.of(variance);
    }
}
