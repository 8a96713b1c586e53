package fringekeep.interferometry.statistics;

/**
 * A value with its standard uncertainty, both in the same SI unit.
 *
 * @param value the estimate
 * @param standardUncertainty one standard deviation, not negative
 */
public record Estimate(double value, double standardUncertainty) {
    /** Refuses what is not a number. */
    public Estimate {
        if (Double.isNaN(value) || Double.isNaN(standardUncertainty) || standardUncertainty < 0) {
            throw new IllegalArgumentException("not an estimate: " + value + " with u = " + standardUncertainty);
        }
    }
}
