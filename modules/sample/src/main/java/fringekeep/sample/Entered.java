package fringekeep.sample;

import fringekeep.archive.json.JsonObject;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * An entered quantity as computations take it: its SI value and its standard uncertainty, where that is known.
 *
 * @param si value (SI)
 * @param deviation standard uncertainty (SI); 0 when exact; empty when not stated or bounded on one side only
 */
public record Entered(double si, OptionalDouble deviation) {
    /** Reads a member that holds a quantity; empty when absent or not of the form of a quantity. */
    public static Optional<Entered> of(JsonObject holder, String name) {
        return holder.object(name).flatMap(Entered::of);
    }

    /** Reads a quantity. */
    public static Optional<Entered> of(JsonObject quantity) {
        OptionalDouble si = quantity.number("si");
        if (si.isEmpty()) {
            return Optional.empty();
        }
        JsonObject uncertainty = quantity.object("uncertainty").orElse(JsonObject.EMPTY);
        return Optional.of(new Entered(si.getAsDouble(), deviation(uncertainty)));
    }

    /** The standard uncertainty, 0 where it is not known. */
    public double deviationOrZero() {
        return deviation.orElse(0);
    }

    /**
     * Standard uncertainty of one of the four sorts.
     *
     * <p>Source: bounds are read as a rectangular distribution, JCGM 100:2008 (GUM), 4.3.7, equation (7).
     */
    private static OptionalDouble deviation(JsonObject uncertainty) {
        return switch (uncertainty.text("sort").orElse("")) {
            case "stated" -> uncertainty.number("si");
            case "exact" -> OptionalDouble.of(0);
            case "bounds" -> bounds(uncertainty.number("lower"), uncertainty.number("upper"));
            default -> OptionalDouble.empty();
        };
    }

    private static OptionalDouble bounds(OptionalDouble lower, OptionalDouble upper) {
        return lower.isPresent() && upper.isPresent()
                ? OptionalDouble.of(Math.abs(upper.getAsDouble() - lower.getAsDouble()) / Math.sqrt(12))
                : OptionalDouble.empty();
    }
}
