package fringekeep.drawing;

/**
 * Maps the values of one axis onto a length.
 *
 * @param from value at the beginning
 * @param to value at the end, &gt; {@code from}
 * @param logarithmic whether equal lengths are equal ratios; then both ends are positive
 * @param start place of {@code from} (units of the page)
 * @param end place of {@code to}; less than {@code start} for an upright axis
 */
record Scale(double from, double to, boolean logarithmic, double start, double end) {
    /** Checks the range. */
    Scale {
        if (!(to > from) || (logarithmic && !(from > 0))) {
            throw new IllegalArgumentException("axis from " + from + " to " + to);
        }
    }

    double place(double value) {
        double share = logarithmic
                ? (StrictMath.log10(value) - StrictMath.log10(from)) / (StrictMath.log10(to) - StrictMath.log10(from))
                : (value - from) / (to - from);
        return start + share * (end - start);
    }

    double value(double place) {
        double share = (place - start) / (end - start);
        return logarithmic ? from * StrictMath.pow(to / from, share) : from + share * (to - from);
    }

    boolean holds(double value) {
        return value >= from && value <= to;
    }

    /** The place, kept close to the axis so that far points never make huge coordinates. */
    double placeNear(double value) {
        if (logarithmic && !(value > 0)) {
            return start + (start - end);
        }
        double reach = Math.abs(end - start);
        double low = Math.min(start, end) - reach;
        double high = Math.max(start, end) + reach;
        return Math.max(low, Math.min(high, place(value)));
    }
}
