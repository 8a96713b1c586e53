package fringekeep.archive.quantity;

import java.util.OptionalDouble;

/** Uncertainty of an entered quantity, in one of four sorts. */
public sealed interface Uncertainty {
    /** One standard deviation, as typed in the quantity's unit and in SI. */
    record Stated(String text, double si) implements Uncertainty {}

    /** Known to be exact. */
    record Exact() implements Uncertainty {}

    /** The source states none. */
    record Unstated() implements Uncertainty {}

    /** Only bounds are known (SI), at least one. */
    record Bounds(OptionalDouble lower, OptionalDouble upper) implements Uncertainty {}
}
