package fringekeep.drawing;

import java.util.OptionalDouble;

/**
 * An axis: what it measures, in which unit, and over which range.
 *
 * @param label quantity in words, such as "position of grating 3"
 * @param unit unit as printed behind the quantity ("nm", "W"), empty for a pure number
 * @param logarithmic whether equal lengths are equal ratios
 * @param from lower end, absent = taken from the data
 * @param to upper end, absent = taken from the data
 */
public record Axis(String label, String unit, boolean logarithmic, OptionalDouble from, OptionalDouble to) {
    /** A linear axis whose range is taken from the data. */
    public static Axis linear(String label, String unit) {
        return new Axis(label, unit, false, OptionalDouble.empty(), OptionalDouble.empty());
    }
}
