package fringekeep.interferometry.statistics;

/**
 * A confidence interval.
 *
 * @param level the confidence level, between 0 and 1
 * @param low lower end
 * @param high upper end, not below the lower
 */
public record Interval(double level, double low, double high) {
    /** Refuses ends in the wrong order. */
    public Interval {
        if (!(low <= high)) {
            throw new IllegalArgumentException("interval from " + low + " to " + high + " has no inside");
        }
    }

    /**
     * Tells whether a value lies in the interval, ends included.
     *
     * @param value any number
     * @return true if it does
     */
    public boolean contains(double value) {
        return low <= value && value <= high;
    }
}
