package fringekeep.interferometry.fringe;

/**
 * How a detector is blind after a count.
 *
 * <p>Sources: G. F. Knoll, Radiation Detection and Measurement, chapter 4 (both models); J. W. M&uuml;ller, Nuclear
 * Instruments and Methods 112, 47 (1973) (variance of the counts).
 *
 * @param sort the model
 * @param seconds dead time (s), not negative
 */
public record DeadTime(Sort sort, double seconds) {
    /** No dead time. */
    public static final DeadTime NONE = new DeadTime(Sort.NONE, 0);

    /** The models. */
    public enum Sort {
        /** Every arrival is counted. */
        NONE,
        /** Arrivals while blind are lost and do not prolong the blindness. */
        NON_PARALYSABLE,
        /** Arrivals while blind are lost and prolong it. */
        PARALYSABLE
    }

    /** Refuses a negative or endless dead time. */
    public DeadTime {
        if (!(seconds >= 0) || seconds == Double.POSITIVE_INFINITY) {
            throw new IllegalArgumentException("dead time must be at least 0 s, is " + seconds + " s");
        }
    }

    /**
     * Expected recorded counts.
     *
     * @param arrivals expected arrivals during the exposure
     * @param liveSeconds length of the exposure (s)
     * @return expected counts
     */
    public double recorded(double arrivals, double liveSeconds) {
        double busy = arrivals * seconds / liveSeconds;
        return switch (sort) {
            case NONE -> arrivals;
            case NON_PARALYSABLE -> arrivals / (1 + busy);
            case PARALYSABLE -> arrivals * StrictMath.exp(-busy);
        };
    }

    /**
     * Derivative of the recorded counts by the arrivals.
     *
     * @param arrivals expected arrivals during the exposure
     * @param liveSeconds length of the exposure (s)
     * @return the slope; not positive where a paralysable detector is beyond its maximum
     */
    public double slope(double arrivals, double liveSeconds) {
        double busy = arrivals * seconds / liveSeconds;
        return switch (sort) {
            case NONE -> 1;
            case NON_PARALYSABLE -> 1 / ((1 + busy) * (1 + busy));
            case PARALYSABLE -> (1 - busy) * StrictMath.exp(-busy);
        };
    }

    /**
     * Variance of the recorded counts over their mean, for exposures long against the dead time.
     *
     * @param arrivals expected arrivals during the exposure
     * @param liveSeconds length of the exposure (s)
     * @return at most 1
     */
    public double varianceRatio(double arrivals, double liveSeconds) {
        double busy = arrivals * seconds / liveSeconds;
        return switch (sort) {
            case NONE -> 1;
            case NON_PARALYSABLE -> 1 / ((1 + busy) * (1 + busy));
            case PARALYSABLE -> Math.max(0, 1 - 2 * busy * StrictMath.exp(-busy));
        };
    }
}
