package fringekeep.interferometry.fringe;

/** Where the variances of the covariance matrix come from. */
public enum CovarianceSort {
    /** Counts scatter as the fitted model expects: expected (Fisher) information. */
    EXPECTED,
    /** Counts scatter as they were observed: observed information, or the counts as their own variances. */
    OBSERVED,
    /** Counts scatter as the residuals do, alike at all points; least squares only. */
    RESIDUAL_SCATTER
}
