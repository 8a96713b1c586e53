package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import fringekeep.interferometry.statistics.PoissonDeviance;
import fringekeep.interferometry.statistics.ScalarSearch;
import java.util.ArrayList;
import java.util.List;

/**
 * Many scans with one visibility, each with its own mean and phase.
 *
 * <p>The likelihood of the common visibility is that of the Poisson counts, largest over each scan's mean and integrated
 * over its phase with equal weight. (Taking the largest over each phase too would be biased upwards for weak scans however
 * many there are: J. Neyman and E. L. Scott, Econometrica 16, 1 (1948).) Backgrounds, drifts, second harmonics and phase
 * drifts are held at each scan's own fit; the period is that of the options.
 */
public final class JointFit implements JointOutcome {
    private static final int NODES = 96;

    private final List<FringeFit> scans;
    private final List<ScanLikelihood> likelihoods;
    private final double visibility;
    private final double standardError;
    private final double largest;
    private final double upperEnd;

    private JointFit(List<FringeFit> scans, List<ScanLikelihood> likelihoods) {
        this.scans = List.copyOf(scans);
        this.likelihoods = likelihoods;
        double end = 0.999999;
        int best = 0;
        int steps = 80;
        double bestValue = Double.NEGATIVE_INFINITY;
        for (int k = 0; k <= steps; k++) {
            double value = logLikelihood(end * k / steps);
            if (value > bestValue) {
                bestValue = value;
                best = k;
            }
        }
        double low = end * Math.max(0, best - 1) / steps;
        double high = end * Math.min(steps, best + 1) / steps;
        double found = ScalarSearch.minimum(v -> -logLikelihood(v), low, high, 1e-8);
        this.visibility = logLikelihood(0) >= logLikelihood(found) ? 0 : found;
        this.largest = logLikelihood(visibility);
        this.upperEnd = end;
        this.standardError = error();
    }

    /**
     * Fits scans jointly.
     *
     * @param data the scans, at least one
     * @param options how each is fitted; Poisson likelihood at a fixed period
     * @return the fit, or the reason of the first scan that has no fit
     */
    public static JointOutcome of(List<FringeData> data, FringeOptions options) {
        if (options.periodFree() || options.estimator() != Estimator.POISSON_LIKELIHOOD) {
            throw new IllegalArgumentException("a joint fit is by Poisson likelihood at a fixed period");
        }
        if (data.isEmpty()) {
            throw new IllegalArgumentException("no scan to fit");
        }
        List<FringeFit> fits = new ArrayList<>();
        List<ScanLikelihood> likelihoods = new ArrayList<>();
        for (int k = 0; k < data.size(); k++) {
            FringeOutcome outcome = FringeFitter.fit(data.get(k), options);
            if (outcome instanceof FringeFailure failure) {
                return new FringeFailure(failure.reason(), "Scan " + k + ": " + failure.words());
            }
            FringeFit fit = outcome.orThrow();
            if (!(fit.mean().value() > 0)) {
                return new FringeFailure(
                        FringeFailure.Reason.NO_COUNTS, "Scan " + k + " holds no signal above its background.");
            }
            fits.add(fit);
            likelihoods.add(new ScanLikelihood(fit));
        }
        return new JointFit(fits, likelihoods);
    }

    private double logLikelihood(double v) {
        double sum = 0;
        for (ScanLikelihood likelihood : likelihoods) {
            sum += likelihood.at(v);
        }
        return sum;
    }

    /** From the curvature; where the maximum is at 0, half the width to a fall of 1/2. */
    private double error() {
        double step = 1e-3;
        if (visibility > 2 * step && visibility < upperEnd - 2 * step) {
            double curvature =
                    (logLikelihood(visibility + step) - 2 * largest + logLikelihood(visibility - step)) / (step * step);
            if (curvature < 0) {
                return 1 / Math.sqrt(-curvature);
            }
        }
        Interval interval = interval(0.6826894921370859);
        return 0.5 * (interval.high() - interval.low());
    }

    /**
     * The common visibility with its standard error from the curvature of the likelihood.
     *
     * @return V
     */
    public Estimate visibility() {
        return new Estimate(visibility, standardError);
    }

    /**
     * Likelihood interval of the common visibility, from 0 to 1.
     *
     * @param level confidence level
     * @return where ln L has fallen by at most z&sup2; / 2
     */
    public Interval interval(double level) {
        double z = Distributions.twoSidedDeviate(level);
        double fall = 0.5 * z * z;
        double low = largest - logLikelihood(0) <= fall
                ? 0
                : ScalarSearch.root(v -> largest - logLikelihood(v) - fall, 0, visibility, 1e-9);
        double high = largest - logLikelihood(upperEnd) <= fall
                ? 1
                : ScalarSearch.root(v -> bounded(largest - logLikelihood(v)) - fall, visibility, upperEnd, 1e-9);
        return new Interval(level, low, high);
    }

    private static double bounded(double value) {
        return Math.min(value, 1e6);
    }

    /**
     * Probability of the scans' visibilities to differ at least as much as they do if all are the same: the fall of the
     * likelihood from separate visibilities to one, as &chi;&sup2; with one degree of freedom less than scans.
     *
     * @return p-value; 1 for a single scan
     */
    public double sameVisibilityPValue() {
        if (scans.size() == 1) {
            return 1;
        }
        double separate = 0;
        for (ScanLikelihood likelihood : likelihoods) {
            double best = Double.NEGATIVE_INFINITY;
            for (int k = 0; k <= 60; k++) {
                best = Math.max(best, likelihood.at(upperEnd * k / 60));
            }
            separate += best;
        }
        return Distributions.chiSquareUpper(2 * Math.max(0, separate - largest), scans.size() - 1.0);
    }

    /**
     * The fit of each scan by itself, with its mean and phase.
     *
     * @return fits in the order of the scans
     */
    public List<FringeFit> scans() {
        return scans;
    }

    /** ln of one scan's likelihood against V, best over the mean, integrated over the phase. */
    private static final class ScanLikelihood {
        private final double[] counts;
        private final double[] gains;
        private final double[] offsets;
        private final double[] cosines;
        private final double[] sines;
        private final double startMean;
        private final double reference;
        private final double phase;
        private final double reachTimesVisibility;

        ScanLikelihood(FringeFit fit) {
            FringeModel model = new FringeModel(fit.data(), fit.options());
            double[] theta = fit.inside().theta().clone();
            int n = model.points;
            counts = java.util.Arrays.copyOf(model.observed, n);
            gains = new double[n];
            offsets = new double[n];
            cosines = new double[n];
            sines = new double[n];
            startMean = theta[0];
            theta[1] = 0;
            theta[2] = 0;
            model.evaluate(theta);
            for (int i = 0; i < n; i++) {
                int at = i * model.parameters;
                gains[i] = model.slopes[at];
                cosines[i] = model.slopes[at + 1] / model.slopes[at];
                sines[i] = model.slopes[at + 2] / model.slopes[at];
                offsets[i] = model.expected[i] - gains[i] * theta[0];
            }
            reference = 0.5 * fit.deviance();
            HarmonicEstimate widened = fit.inside().widened();
            phase = StrictMath.atan2(0.0 - widened.sine(), widened.cosine());
            reachTimesVisibility = 10 * widened.quadratureNoise();
        }

        double at(double v) {
            double[] logs = new double[NODES];
            double highest = Double.NEGATIVE_INFINITY;
            // Ten standard errors to either side of the fitted phase hold all of a strong scan's likelihood.
            double reach = v * Math.PI > reachTimesVisibility ? reachTimesVisibility / v : Math.PI;
            for (int k = 0; k < NODES; k++) {
                double angle = phase + reach * (2.0 * k / NODES - 1);
                logs[k] = best(v * StrictMath.cos(angle), -v * StrictMath.sin(angle));
                highest = Math.max(highest, logs[k]);
            }
            if (highest == Double.NEGATIVE_INFINITY) {
                return -1e9;
            }
            double sum = 0;
            for (double log : logs) {
                sum += StrictMath.exp(log - highest);
            }
            return highest + StrictMath.log(sum / NODES * (reach / Math.PI)) + reference;
        }

        /** ln L largest over the mean by Newton steps kept positive. */
        private double best(double a, double b) {
            double mean = startMean;
            for (int step = 0; step < 30; step++) {
                double slope = 0;
                double curvature = 0;
                for (int i = 0; i < counts.length; i++) {
                    double shape = gains[i] * (1 + a * cosines[i] + b * sines[i]);
                    double mu = offsets[i] + mean * shape;
                    slope -= shape;
                    if (counts[i] > 0) {
                        if (!(mu > 0)) {
                            return Double.NEGATIVE_INFINITY;
                        }
                        slope += counts[i] * shape / mu;
                        curvature += counts[i] * shape * shape / (mu * mu);
                    }
                }
                double move = curvature > 0 ? slope / curvature : 0;
                double next = mean + move;
                mean = next > 0.1 * mean ? next : 0.1 * mean;
                if (Math.abs(move) <= 1e-10 * mean) {
                    break;
                }
            }
            double sum = 0;
            for (int i = 0; i < counts.length; i++) {
                double mu = offsets[i] + mean * gains[i] * (1 + a * cosines[i] + b * sines[i]);
                sum -= 0.5 * (mu < 0 ? Double.POSITIVE_INFINITY : PoissonDeviance.term(counts[i], mu));
            }
            return sum;
        }
    }
}
