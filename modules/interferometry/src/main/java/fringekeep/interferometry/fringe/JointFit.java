package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import fringekeep.interferometry.statistics.ScalarSearch;
import java.util.ArrayList;
import java.util.List;

/**
 * Many scans with one visibility, each with its own mean and phase.
 *
 * <p>The likelihood of the common visibility is that of the Poisson counts, largest over each scan's mean and integrated
 * over its phase with equal weight. (Taking the largest over each phase too would be biased upwards for weak scans however
 * many there are: J. Neyman and E. L. Scott, Econometrica 16, 1 (1948).) The period is that of the options. What becomes of
 * backgrounds, drifts, second harmonics and phase drifts is a choice, {@link Nuisances}.
 */
public final class JointFit implements JointOutcome {
    /** What becomes of the parameters beside mean, visibility and phase. */
    public enum Nuisances {
        /** Held at each scan's own fit: fast, but the error of V lacks theirs. */
        HELD,
        /**
         * Fitted anew at every visibility and phase, so that the likelihood of V is largest over them too. A background
         * estimated from dark counts is fitted jointly with those; the uncertainty of a known one, common to all scans, is
         * carried to the standard error (not to the interval) by fits with the background moved by it.
         */
        FREE
    }

    private final List<FringeFit> scans;
    private final List<ScanLikelihood> likelihoods;
    private final double visibility;
    private final double standardError;
    private final double largest;
    private final double upperEnd;
    private double backgroundError;

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
     * Fits scans jointly with the nuisance parameters held at each scan's own fit.
     *
     * @param data the scans, at least one
     * @param options how each is fitted; Poisson likelihood at a fixed period
     * @return the fit, or the reason of the first scan that has no fit
     */
    public static JointOutcome of(List<FringeData> data, FringeOptions options) {
        return of(data, options, Nuisances.HELD);
    }

    /**
     * Fits scans jointly.
     *
     * @param data the scans, at least one
     * @param options how each is fitted; Poisson likelihood at a fixed period
     * @param nuisances what becomes of the parameters beside mean, visibility and phase
     * @return the fit, or the reason why there is none
     */
    public static JointOutcome of(List<FringeData> data, FringeOptions options, Nuisances nuisances) {
        if (options.periodFree() || options.estimator() != Estimator.POISSON_LIKELIHOOD) {
            throw new IllegalArgumentException("a joint fit is by Poisson likelihood at a fixed period");
        }
        if (data.isEmpty()) {
            throw new IllegalArgumentException("no scan to fit");
        }
        FringeOptions used = nuisances == Nuisances.FREE ? withDarkCountsJoint(options) : options;
        List<FringeFit> fits = new ArrayList<>();
        List<ScanLikelihood> likelihoods = new ArrayList<>();
        for (int k = 0; k < data.size(); k++) {
            FringeOutcome outcome = FringeFitter.fit(data.get(k), used);
            if (outcome instanceof FringeFailure failure) {
                return new FringeFailure(failure.reason(), "Scan " + k + ": " + failure.words());
            }
            FringeFit fit = outcome.orThrow();
            if (!(fit.mean().value() > 0)) {
                return new FringeFailure(
                        FringeFailure.Reason.NO_COUNTS, "Scan " + k + " holds no signal above its background.");
            }
            ScanLikelihood likelihood = nuisances == Nuisances.FREE ? new FreeLikelihood(fit) : new HeldLikelihood(fit);
            if (!likelihood.determined()) {
                return new FringeFailure(
                        FringeFailure.Reason.NOT_DETERMINED,
                        "Scan " + k + ": the fitted drift leaves no signal at some point; fit it with a lower order.");
            }
            fits.add(fit);
            likelihoods.add(likelihood);
        }
        JointFit joint = new JointFit(fits, likelihoods);
        if (!(joint.largest > ScanLikelihood.IMPOSSIBLE) || Double.isNaN(joint.standardError)) {
            return new FringeFailure(
                    FringeFailure.Reason.NO_CONVERGENCE,
                    "No common visibility makes all scans possible; fit them one by one and see which differs.");
        }
        return nuisances == Nuisances.FREE ? joint.carryingBackground(data, options) : joint;
    }

    private static FringeOptions withDarkCountsJoint(FringeOptions options) {
        return options.background().sort() == Background.Sort.ESTIMATED
                ? options.background(Background.JOINT)
                : options;
    }

    /** Carries the uncertainty of a known background; numerically, JCGM 100:2008, 5.1.3 note 2. */
    private JointOutcome carryingBackground(List<FringeData> data, FringeOptions options) {
        Background background = options.background();
        if (background.sort() != Background.Sort.KNOWN || background.standardUncertainty() == 0) {
            return this;
        }
        double[] moved = new double[2];
        for (int side = 0; side < 2; side++) {
            double rate = background.rate() + (side == 0 ? 1 : -1) * background.standardUncertainty();
            JointOutcome outcome = of(data, options.background(Background.known(rate, 0)), Nuisances.FREE);
            if (outcome instanceof FringeFailure failure) {
                return new FringeFailure(
                        failure.reason(), "With the background moved by its uncertainty: " + failure.words());
            }
            moved[side] = outcome.jointOrThrow().visibility;
        }
        backgroundError = 0.5 * Math.abs(moved[0] - moved[1]);
        return this;
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
        return new Estimate(
                visibility,
                backgroundError == 0
                        ? standardError
                        : Math.sqrt(standardError * standardError + backgroundError * backgroundError));
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
}
