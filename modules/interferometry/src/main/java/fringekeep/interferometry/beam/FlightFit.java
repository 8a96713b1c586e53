package fringekeep.interferometry.beam;

import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Arrays;

/**
 * A velocity law fitted to a time-of-flight trace.
 *
 * @param values F (signal counts per opening and cycle over all bins), v<sub>0</sub> (m/s), w (m/s), b (background counts
 *     per bin and cycle)
 * @param covariance lower triangle by rows, in the units of the values
 * @param deviance Poisson deviance of the raw counts
 * @param degreesOfFreedom bins less 4
 * @param pValue probability of a larger deviance if the model holds
 * @param expected expected counts of each bin
 * @param wrapAround for a pseudo-random chopper, how many standard errors the bins around the end of the cycle lie above
 *     the lowest; 0 for a single slot
 * @param lengthOverVelocity sensitivity of the mean velocity to the flight length, mean / length (1/s)
 * @param timeZeroSlope sensitivity of the mean velocity to the time zero, mean of v&sup2; / length (m/s&sup2;)
 */
public record FlightFit(
        double[] values,
        double[] covariance,
        double deviance,
        int degreesOfFreedom,
        double pValue,
        double[] expected,
        double wrapAround,
        double lengthOverVelocity,
        double timeZeroSlope)
        implements FlightOutcome {
    /** Copies the arrays. */
    public FlightFit {
        values = values.clone();
        covariance = covariance.clone();
        expected = expected.clone();
    }

    @Override
    public double[] values() {
        return values.clone();
    }

    @Override
    public double[] covariance() {
        return covariance.clone();
    }

    @Override
    public double[] expected() {
        return expected.clone();
    }

    private Estimate estimate(int at) {
        return new Estimate(values[at], Math.sqrt(covariance[SymmetricMatrix.at(at, at)]));
    }

    /**
     * Signal counts F per opening and cycle.
     *
     * @return F
     */
    public Estimate signal() {
        return estimate(0);
    }

    /**
     * Centre v<sub>0</sub> of the shifted flux law.
     *
     * @return (m/s)
     */
    public Estimate centre() {
        return estimate(1);
    }

    /**
     * 1/e half width w.
     *
     * @return (m/s)
     */
    public Estimate width() {
        return estimate(2);
    }

    /**
     * Background counts per bin and cycle.
     *
     * @return b
     */
    public Estimate background() {
        return estimate(3);
    }

    /**
     * The law of the beam's flux, v&sup3; exp(&minus;(v &minus; v<sub>0</sub>)&sup2; / w&sup2;).
     *
     * @return the law
     */
    public VelocityLaw law() {
        return new VelocityLaw(3, values[1], values[2]);
    }

    /**
     * Mean velocity of the flux with its statistical uncertainty.
     *
     * @return (m/s)
     */
    public Estimate meanVelocity() {
        VelocityLaw law = law();
        double[] slopes = law.meanSlopes();
        double variance = SymmetricMatrix.form(covariance, new double[] {0, slopes[0], slopes[1], 0});
        return new Estimate(law.mean(), Math.sqrt(variance));
    }

    /**
     * The distribution for models to average over: flux-weighted, statistical uncertainty of its mean; add those of length
     * and time zero by the sensitivities.
     *
     * @return 96 nodes
     */
    public VelocityDistribution distribution() {
        VelocityDistribution nodes = law().nodes(4);
        return new VelocityDistribution(
                nodes.nodes(), nodes.weights(), nodes.mean(), meanVelocity().standardUncertainty(), nodes.spread());
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof FlightFit that
                && Arrays.equals(values, that.values)
                && Arrays.equals(covariance, that.covariance)
                && Double.compare(deviance, that.deviance) == 0
                && Arrays.equals(expected, that.expected);
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(values) + Arrays.hashCode(covariance);
    }

    @Override
    public String toString() {
        return "F, v0, w, b = " + Arrays.toString(values) + ", deviance " + deviance + " for " + degreesOfFreedom;
    }
}
