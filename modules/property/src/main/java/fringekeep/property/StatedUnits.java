package fringekeep.property;

import java.util.Map;
import java.util.Optional;

/**
 * Facet: the SI units of values that a record's result states by member name, beside those of its estimates.
 *
 * @param units UCUM code of the SI unit by member name
 */
public record StatedUnits(Map<String, String> units) {
    /** Copies. */
    public StatedUnits {
        units = Map.copyOf(units);
    }

    /** Unit of a member, if it is stated. */
    public Optional<String> of(String member) {
        return Optional.ofNullable(units.get(member));
    }
}
