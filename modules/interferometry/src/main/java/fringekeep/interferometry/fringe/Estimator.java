package fringekeep.interferometry.fringe;

/** How the parameters are found. */
public enum Estimator {
    /** Least squares on the counts, every point with the same weight. */
    UNWEIGHTED,
    /** Least squares with the variances the fitted model predicts, repeated until they agree. */
    WEIGHTED,
    /** Maximum of the Poisson likelihood. */
    POISSON_LIKELIHOOD,
    /**
     * Least squares with 1 / max(counts, 1) as weights. Biased low by about one count a point (Neyman); kept only to
     * compare with programs that use it, never a default.
     */
    WEIGHTED_BY_COUNTS
}
