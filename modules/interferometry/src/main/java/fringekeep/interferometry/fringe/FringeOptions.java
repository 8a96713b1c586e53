package fringekeep.interferometry.fringe;

/**
 * What is fitted and how. Immutable; start with {@link #atPeriod} and change with the methods named after the members.
 *
 * @param period fringe period (m), positive; the start value where it is free
 * @param periodFree whether the period is fitted too
 * @param estimator how the parameters are found
 * @param covariance where the variances come from
 * @param background treatment of the background
 * @param driftOrder order 0 to 3 of the drift of the signal: N (1 + b<sub>1</sub> P<sub>1</sub> + &hellip;) with
 *     P<sub>1</sub> = t, P<sub>2</sub> = t&sup2; &minus; 1/12, P<sub>3</sub> = t&sup3; &minus; 3 t / 20 and t the time from
 *     &minus;1/2 at the first to 1/2 at the last point; each has mean 0
 * @param secondHarmonic whether cos and sin of twice the phase are fitted too
 * @param phaseDrift whether the phase may change linearly, by the fitted value over the scan
 * @param scaleByDispersion whether the covariance is multiplied by &chi;&sup2; over degrees of freedom where that exceeds
 *     1, as for pulsed sources that scatter more than Poisson
 */
public record FringeOptions(
        double period,
        boolean periodFree,
        Estimator estimator,
        CovarianceSort covariance,
        Background background,
        int driftOrder,
        boolean secondHarmonic,
        boolean phaseDrift,
        boolean scaleByDispersion) {
    /** Refuses what cannot be meant. */
    public FringeOptions {
        if (!(period > 0) || period == Double.POSITIVE_INFINITY) {
            throw new IllegalArgumentException("period must be positive, is " + period + " m");
        }
        if (driftOrder < 0 || driftOrder > 3) {
            throw new IllegalArgumentException("drift order must be 0 to 3, is " + driftOrder);
        }
        if (covariance == CovarianceSort.RESIDUAL_SCATTER && estimator == Estimator.POISSON_LIKELIHOOD) {
            throw new IllegalArgumentException("covariance from the residuals' scatter belongs to least squares");
        }
    }

    /**
     * Poisson likelihood at a fixed period, no background, no drift, expected covariance.
     *
     * @param period fringe period (m)
     * @return the options
     */
    public static FringeOptions atPeriod(double period) {
        return new FringeOptions(
                period,
                false,
                Estimator.POISSON_LIKELIHOOD,
                CovarianceSort.EXPECTED,
                Background.NONE,
                0,
                false,
                false,
                false);
    }

    /**
     * The same with another estimator.
     *
     * @param value estimator
     * @return the options
     */
    public FringeOptions estimator(Estimator value) {
        return new FringeOptions(
                period,
                periodFree,
                value,
                covariance,
                background,
                driftOrder,
                secondHarmonic,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with another covariance.
     *
     * @param value its sort
     * @return the options
     */
    public FringeOptions covariance(CovarianceSort value) {
        return new FringeOptions(
                period,
                periodFree,
                estimator,
                value,
                background,
                driftOrder,
                secondHarmonic,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with another background.
     *
     * @param value its treatment
     * @return the options
     */
    public FringeOptions background(Background value) {
        return new FringeOptions(
                period,
                periodFree,
                estimator,
                covariance,
                value,
                driftOrder,
                secondHarmonic,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with another drift order.
     *
     * @param value 0 to 3
     * @return the options
     */
    public FringeOptions driftOrder(int value) {
        return new FringeOptions(
                period,
                periodFree,
                estimator,
                covariance,
                background,
                value,
                secondHarmonic,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with the period free or fixed.
     *
     * @param value true if free
     * @return the options
     */
    public FringeOptions periodFree(boolean value) {
        return new FringeOptions(
                period,
                value,
                estimator,
                covariance,
                background,
                driftOrder,
                secondHarmonic,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with another period, or start value of it.
     *
     * @param value period (m)
     * @return the options
     */
    public FringeOptions period(double value) {
        return new FringeOptions(
                value,
                periodFree,
                estimator,
                covariance,
                background,
                driftOrder,
                secondHarmonic,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with or without the second harmonic.
     *
     * @param value true with
     * @return the options
     */
    public FringeOptions secondHarmonic(boolean value) {
        return new FringeOptions(
                period,
                periodFree,
                estimator,
                covariance,
                background,
                driftOrder,
                value,
                phaseDrift,
                scaleByDispersion);
    }

    /**
     * The same with or without a linear drift of the phase.
     *
     * @param value true with
     * @return the options
     */
    public FringeOptions phaseDrift(boolean value) {
        return new FringeOptions(
                period,
                periodFree,
                estimator,
                covariance,
                background,
                driftOrder,
                secondHarmonic,
                value,
                scaleByDispersion);
    }

    /**
     * The same with or without scaling of the covariance by the dispersion.
     *
     * @param value true with
     * @return the options
     */
    public FringeOptions scaleByDispersion(boolean value) {
        return new FringeOptions(
                period, periodFree, estimator, covariance, background, driftOrder, secondHarmonic, phaseDrift, value);
    }
}
