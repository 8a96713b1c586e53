package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.List;

/**
 * Fitted parameters with their full covariance, from the uncertainties of the data (not scaled by the scatter).
 *
 * <p>Thread rule: immutable.
 */
public final class PropertyFit implements FitOutcome {
    private final List<Parameter> parameters;
    private final double[] values;
    private final double[] covariance;
    private final double[] fitted;
    private final double chiSquare;
    private final double logLikelihood;
    private final List<FitWarning> warnings;

    PropertyFit(List<Parameter> parameters, Solution solution, MeasuredCurve data, List<FitWarning> warnings) {
        this.parameters = List.copyOf(parameters);
        this.values = solution.values();
        this.covariance = solution.covariance();
        this.fitted = solution.fitted();
        this.chiSquare = solution.chiSquare();
        this.logLikelihood = logLikelihood(data, fitted);
        this.warnings = List.copyOf(warnings);
    }

    /** What the solver hands over: values, packed covariance, fitted curve, weighted sum of squares. */
    record Solution(double[] values, double[] covariance, double[] fitted, double chiSquare) {}

    private static double logLikelihood(MeasuredCurve data, double[] fitted) {
        double sum = 0.0;
        for (int k = 0; k < data.size(); k++) {
            double pull = (data.value(k) - fitted[k]) / data.uncertainty(k);
            sum -= 0.5 * pull * pull + StrictMath.log(data.uncertainty(k) * Math.sqrt(2.0 * Math.PI));
        }
        return sum;
    }

    PropertyFit withWarnings(List<FitWarning> more) {
        return new PropertyFit(this, more);
    }

    private PropertyFit(PropertyFit fit, List<FitWarning> warnings) {
        this.parameters = fit.parameters;
        this.values = fit.values;
        this.covariance = fit.covariance;
        this.fitted = fit.fitted;
        this.chiSquare = fit.chiSquare;
        this.logLikelihood = fit.logLikelihood;
        this.warnings = List.copyOf(warnings);
    }

    /**
     * The parameters that were fitted, in the order of the covariance.
     *
     * @return at least one
     */
    public List<Parameter> parameters() {
        return parameters;
    }

    /**
     * Tells whether a parameter was fitted.
     *
     * @param parameter the parameter
     * @return true if it was free
     */
    public boolean has(Parameter parameter) {
        return parameters.contains(parameter);
    }

    /**
     * Value and standard uncertainty of a parameter, in its SI unit.
     *
     * @param parameter one of {@link #parameters()}
     * @return the estimate
     * @throws IllegalArgumentException if it was not fitted
     */
    public Estimate estimate(Parameter parameter) {
        int at = index(parameter);
        return new Estimate(values[at], Math.sqrt(covariance[SymmetricMatrix.at(at, at)]));
    }

    /**
     * Covariance of two parameters.
     *
     * @param one   one of {@link #parameters()}
     * @param other one of {@link #parameters()}
     * @return covariance in the product of their units
     */
    public double covariance(Parameter one, Parameter other) {
        return covariance[SymmetricMatrix.at(index(one), index(other))];
    }

    /**
     * Correlation of two parameters.
     *
     * @param one   one of {@link #parameters()}
     * @param other one of {@link #parameters()}
     * @return between -1 and 1
     */
    public double correlation(Parameter one, Parameter other) {
        return covariance(one, other)
                / (estimate(one).standardUncertainty() * estimate(other).standardUncertainty());
    }

    /**
     * Whole covariance.
     *
     * @return lower triangle by rows, in the order of {@link #parameters()}
     */
    public double[] covariance() {
        return covariance.clone();
    }

    /**
     * Values of all parameters.
     *
     * @return in the order of {@link #parameters()}, SI
     */
    public double[] values() {
        return values.clone();
    }

    /**
     * The fitted curve at the data's places.
     *
     * @return one value per point
     */
    public double[] fitted() {
        return fitted.clone();
    }

    /**
     * Weighted sum of squared residuals, prior knowledge included where it was used.
     *
     * @return chi-square
     */
    public double chiSquare() {
        return chiSquare;
    }

    /**
     * Points less parameters.
     *
     * @return degrees of freedom, may be 0
     */
    public int degreesOfFreedom() {
        return fitted.length - values.length;
    }

    /**
     * Probability of a larger chi-square if model and uncertainties are right.
     *
     * @return p-value, 1 without degrees of freedom
     */
    public double pValue() {
        return degreesOfFreedom() < 1 ? 1.0 : Distributions.chiSquareUpper(chiSquare, degreesOfFreedom());
    }

    /**
     * Logarithm of the Gaussian likelihood of the data at the fitted values.
     *
     * @return ln L with all constants
     */
    public double logLikelihood() {
        return logLikelihood;
    }

    /**
     * What a reader must know.
     *
     * @return warnings, possibly none
     */
    public List<FitWarning> warnings() {
        return warnings;
    }

    private int index(Parameter parameter) {
        int at = parameters.indexOf(parameter);
        if (at < 0) {
            throw new IllegalArgumentException(parameter + " was not fitted, only " + parameters);
        }
        return at;
    }
}
