package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import fringekeep.interferometry.statistics.PoissonDeviance;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.List;
import java.util.Optional;

/**
 * A fitted scan: mean, cosine and sine of the signal with their covariance, and what is derived from them, worked out
 * when asked for. Rates are per unit exposure. Immutable.
 */
public final class FringeFit implements FringeOutcome {
    private final FringeData data;
    private final FringeOptions options;
    private final List<String> names;
    private final double[] values;
    private final double[] covariance;
    private final Inside inside;
    private final int degreesOfFreedom;
    private final List<Finding> findings;

    /** What a reader of the fit should know. */
    public enum Finding {
        /**
         * The likelihood is largest where the model expects no counts at some point; standard errors are those of the
         * unweighted estimator and intervals by profile likelihood should be quoted.
         */
        ON_EDGE,
        /** The fitted visibility exceeds 1. */
        ABOVE_ONE,
        /** The fitted mean signal is not positive; visibility and phase do not exist. */
        NO_SIGNAL,
        /** As many parameters as points; goodness of fit does not exist. */
        NO_DEGREE_OF_FREEDOM
    }

    /**
     * What the derived quantities need of the fit's workings: the parameters as fitted, their packed covariance before and
     * after background and dispersion, expected and observed counts of all rows, the detector's variance over the Poisson
     * one at each (empty: 1 everywhere), and how many rows are points of the scan.
     */
    record Inside(
            double[] theta,
            double[] plainCovariance,
            double[] widenedCovariance,
            double[] expected,
            double[] observed,
            double[] varianceRatios,
            int points) {
        /** Mean, cosine and sine with the covariance before background and dispersion. */
        HarmonicEstimate plain() {
            return harmonic(plainCovariance);
        }

        /** Mean, cosine and sine with the covariance after background and dispersion. */
        HarmonicEstimate widened() {
            return harmonic(widenedCovariance);
        }

        private HarmonicEstimate harmonic(double[] covariance) {
            return new HarmonicEstimate(theta[0], theta[1], theta[2], java.util.Arrays.copyOf(covariance, 6));
        }

        /** The same with the covariance times the dispersion where that exceeds 1. */
        Inside dispersed(Estimator estimator) {
            int degrees = observed.length - theta.length;
            double dispersion = degrees > 0 ? pearson(estimator) / degrees : 1;
            double[] widened = widenedCovariance.clone();
            if (dispersion > 1) {
                FringeFitAssembly.scale(widened, dispersion);
            }
            return new Inside(theta, plainCovariance, widened, expected, observed, varianceRatios, points);
        }

        /** &chi;&sup2; with the variances the estimator takes for true. */
        double pearson(Estimator estimator) {
            double sum = 0;
            for (int row = 0; row < observed.length; row++) {
                double residual = observed[row] - expected[row];
                double ratio = varianceRatios.length == 0 ? 1 : varianceRatios[row];
                double variance =
                        estimator == Estimator.WEIGHTED_BY_COUNTS ? Math.max(observed[row], 1) : expected[row] * ratio;
                if (residual != 0) {
                    sum += variance > 0 ? residual * residual / variance : 0;
                }
            }
            return sum;
        }

        double deviance() {
            double sum = 0;
            for (int row = 0; row < observed.length; row++) {
                sum += PoissonDeviance.term(observed[row], Math.max(expected[row], 0));
            }
            return sum;
        }
    }

    FringeFit(
            FringeData data,
            FringeOptions options,
            List<String> names,
            double[] values,
            double[] covariance,
            Inside inside,
            int degreesOfFreedom,
            List<Finding> findings) {
        this.data = data;
        this.options = options;
        this.names = names;
        this.values = values;
        this.covariance = covariance;
        this.inside = inside;
        this.degreesOfFreedom = degreesOfFreedom;
        this.findings = findings;
    }

    /**
     * Names of the estimates in order: mean, cosine, sine, then as fitted cosine2, sine2, drift1 to drift3, phaseDrift,
     * period (m), background.
     *
     * @return the names
     */
    public List<String> names() {
        return names;
    }

    /**
     * The estimates.
     *
     * @return a copy, in the order of the names
     */
    public double[] values() {
        return values.clone();
    }

    /**
     * Covariance of the estimates.
     *
     * @return a copy of the lower triangle by rows
     */
    public double[] covariance() {
        return covariance.clone();
    }

    /**
     * One estimate by name.
     *
     * @param name one of {@link #names}
     * @return value and standard uncertainty, empty if not fitted
     */
    public Optional<Estimate> estimate(String name) {
        int at = names.indexOf(name);
        return at < 0 ? Optional.empty() : Optional.of(new Estimate(values[at], deviation(at)));
    }

    private double deviation(int at) {
        return Math.sqrt(Math.max(covariance[SymmetricMatrix.at(at, at)], 0));
    }

    /**
     * Mean of the signal N.
     *
     * @return counts per unit exposure
     */
    public Estimate mean() {
        return new Estimate(values[0], deviation(0));
    }

    /**
     * The cosine coefficient N V cos &phi;.
     *
     * @return counts per unit exposure
     */
    public Estimate cosine() {
        return new Estimate(values[1], deviation(1));
    }

    /**
     * The sine coefficient &minus;N V sin &phi;.
     *
     * @return counts per unit exposure
     */
    public Estimate sine() {
        return new Estimate(values[2], deviation(2));
    }

    /**
     * The first three estimates alone.
     *
     * @return mean, cosine, sine with their covariance
     */
    public HarmonicEstimate harmonic() {
        double[] first = new double[6];
        System.arraycopy(covariance, 0, first, 0, 6);
        return new HarmonicEstimate(values[0], values[1], values[2], first);
    }

    /**
     * The visibility of the first harmonic with its standard error by the delta method.
     *
     * @return V, empty where the mean is not positive
     */
    public Optional<Estimate> visibility() {
        return harmonic().visibility();
    }

    /**
     * The phase &phi; at position 0 with its standard error by the delta method.
     *
     * @return &phi; in (&minus;&pi;, &pi;] (rad), empty where there is no modulation or no mean
     */
    public Optional<Estimate> phase() {
        return harmonic().phase();
    }

    /**
     * Confidence interval of the visibility; see {@link FringeProfile} for how it is made and how far it holds.
     *
     * @param level confidence level, for example 0.6827 or 0.9545
     * @return the interval, empty where the mean is not positive or the covariance is singular
     */
    public Optional<Interval> visibilityInterval(double level) {
        return values[0] > 0 ? FringeProfile.of(this).visibility(level) : Optional.empty();
    }

    /**
     * Confidence interval of the phase; see {@link FringeProfile}.
     *
     * @param level confidence level
     * @return ends around the fitted phase (rad; may pass &plusmn;&pi;), empty where any phase is allowed
     */
    public Optional<Interval> phaseInterval(double level) {
        return values[0] > 0 ? FringeProfile.of(this).phase(level) : Optional.empty();
    }

    /**
     * The visibility less its bias by noise, sqrt(max(0, V&sup2; &minus; s&sup2;)) with s the noise of the modulation in any
     * one direction.
     *
     * @return corrected visibility with the standard error of the uncorrected one, empty where the mean is not positive
     */
    public Optional<Estimate> biasCorrectedVisibility() {
        return visibility()
                .map(estimate -> new Estimate(
                        AmplitudeLimits.biasCorrected(
                                estimate.value(), inside.widened().quadratureNoise()),
                        estimate.standardUncertainty()));
    }

    /**
     * Upper limit on the visibility by the Rice law: classical, or with a flat prior where the classical one would be 0.
     *
     * @param level confidence level, for example 0.95
     * @return the limit, named for how it was made; empty where the mean is not positive
     */
    public Optional<UpperLimit> upperLimit(double level) {
        return visibility().map(estimate -> {
            double noise = inside.widened().quadratureNoise();
            double classical = AmplitudeLimits.classicalUpperLimit(estimate.value(), noise, level);
            if (classical > 0) {
                return new UpperLimit(UpperLimit.Sort.CLASSICAL, level, classical);
            }
            double flat = AmplitudeLimits.flatPriorUpperLimit(estimate.value(), noise, level);
            return new UpperLimit(UpperLimit.Sort.FLAT_PRIOR, level, flat);
        });
    }

    /**
     * Goodness of fit.
     *
     * @return statistic, degrees of freedom, p-value, dispersion, runs of the residuals
     */
    public FringeGoodness goodness() {
        return FringeGoodness.of(this);
    }

    /**
     * Significance of the modulation against none.
     *
     * @return the test, empty where the period was free (its search would have to be counted), the mean is not positive, or
     *     the model without a modulation cannot be fitted
     */
    public Optional<FringeSignificance> significance() {
        return options.periodFree() ? Optional.empty() : FringeSignificance.of(this);
    }

    /**
     * Degrees of freedom: points, with joint background also dark points, less parameters.
     *
     * @return the number
     */
    public int degreesOfFreedom() {
        return degreesOfFreedom;
    }

    /**
     * The Poisson deviance at the fitted values, whichever way they were found.
     *
     * @return the deviance
     */
    public double deviance() {
        return inside.deviance();
    }

    /**
     * &chi;&sup2; with the variances of the fitted model; with {@link Estimator#WEIGHTED_BY_COUNTS} with those of its
     * weights.
     *
     * @return &chi;&sup2;
     */
    public double chiSquare() {
        return inside.pearson(options.estimator());
    }

    /**
     * Sum of the squared residuals in counts.
     *
     * @return the sum
     */
    public double residualSumOfSquares() {
        double sum = 0;
        for (int row = 0; row < inside.observed.length; row++) {
            sum += (inside.observed[row] - inside.expected[row]) * (inside.observed[row] - inside.expected[row]);
        }
        return sum;
    }

    /**
     * What a reader should know.
     *
     * @return findings, often none
     */
    public List<Finding> findings() {
        return findings;
    }

    /**
     * Expected counts at each used point.
     *
     * @return one value per unmasked point, in order
     */
    public double[] expectedCounts() {
        return java.util.Arrays.copyOf(inside.expected, inside.points);
    }

    /**
     * Residuals over the standard deviation the model expects.
     *
     * @return one value per unmasked point, in order; 0 where nothing is expected and nothing fell
     */
    public double[] standardisedResiduals() {
        double[] residuals = new double[inside.points];
        for (int row = 0; row < inside.points; row++) {
            double residual = inside.observed[row] - inside.expected[row];
            residuals[row] = inside.expected[row] > 0 ? residual / Math.sqrt(inside.expected[row]) : 0;
        }
        return residuals;
    }

    /**
     * The fitted curve.
     *
     * @param position grating position (m)
     * @return signal and background per unit exposure at the mean of the drift
     */
    public double curve(double position) {
        int periodAt = names.indexOf("period");
        double turns = position / (periodAt >= 0 ? values[periodAt] : options.period());
        double sum = values[0] + values[1] * Turns.cos(turns) + values[2] * Turns.sin(turns);
        int second = names.indexOf("cosine2");
        if (second >= 0) {
            sum += values[second] * Turns.cos(2 * turns) + values[second + 1] * Turns.sin(2 * turns);
        }
        int backgroundAt = names.indexOf("background");
        return sum + (backgroundAt >= 0 ? values[backgroundAt] : new FringeModel(data, options).knownBackground);
    }

    /**
     * The options of the fit.
     *
     * @return options
     */
    public FringeOptions options() {
        return options;
    }

    /**
     * The scan that was fitted.
     *
     * @return data
     */
    public FringeData data() {
        return data;
    }

    Inside inside() {
        return inside;
    }
}
