package fringekeep.archive.json;

import java.util.OptionalLong;

/** A JSON number: a finite double; -0 is held as 0. */
public record JsonNumber(double value) implements Json {
    /** Largest magnitude of an integer, 2^53-1 (RFC 7493). */
    public static final long LARGEST_INTEGER = (1L << 53) - 1;

    /** Refuses NaN and infinities; turns -0 into 0. */
    public JsonNumber {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("a JSON number must be finite: " + value);
        }
        value = value + 0.0;
    }

    /** The value as an integer when it is one with magnitude at most 2^53-1. */
    public OptionalLong asInteger() {
        return value == Math.rint(value) && Math.abs(value) <= LARGEST_INTEGER
                ? OptionalLong.of((long) value)
                : OptionalLong.empty();
    }
}
