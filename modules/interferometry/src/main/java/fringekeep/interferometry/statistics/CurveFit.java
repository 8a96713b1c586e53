package fringekeep.interferometry.statistics;

import java.util.Arrays;

/**
 * A fitted curve.
 *
 * @param values the p parameters
 * @param covariance lower triangle by rows, (J<sup>T</sup> W J)<sup>&minus;1</sup>: the covariance if the weights are true;
 *     multiply by {@link #residualVariance} where only their ratios are known
 * @param objective sum of weighted squares, or Poisson deviance
 * @param degreesOfFreedom points less parameters
 * @param expected the fitted curve at the points
 * @param steps steps taken
 */
public record CurveFit(
        double[] values, double[] covariance, double objective, int degreesOfFreedom, double[] expected, int steps)
        implements CurveFitOutcome {
    /** Copies the arrays. */
    public CurveFit {
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

    /**
     * One parameter with its standard uncertainty from the unscaled covariance.
     *
     * @param index from 0
     * @return the estimate
     */
    public Estimate estimate(int index) {
        return new Estimate(values[index], Math.sqrt(covariance[SymmetricMatrix.at(index, index)]));
    }

    /**
     * Objective over degrees of freedom.
     *
     * @return &chi;&sup2; / &nu;, the squared residual standard deviation for unit weights
     * @throws IllegalStateException if no degree of freedom is left
     */
    public double residualVariance() {
        if (degreesOfFreedom == 0) {
            throw new IllegalStateException("no degree of freedom is left to take a variance from");
        }
        return objective / degreesOfFreedom;
    }

    /**
     * Standard deviation of a parameter scaled by the scatter of the residuals.
     *
     * @param index from 0
     * @return the deviation
     */
    public double scaledDeviation(int index) {
        return Math.sqrt(residualVariance() * covariance[SymmetricMatrix.at(index, index)]);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof CurveFit that
                && Arrays.equals(values, that.values)
                && Arrays.equals(covariance, that.covariance)
                && Double.compare(objective, that.objective) == 0
                && degreesOfFreedom == that.degreesOfFreedom
                && Arrays.equals(expected, that.expected)
                && steps == that.steps;
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(values) + Arrays.hashCode(covariance);
    }

    @Override
    public String toString() {
        return Arrays.toString(values) + ", objective " + objective + ", " + degreesOfFreedom + " degrees of freedom";
    }
}
