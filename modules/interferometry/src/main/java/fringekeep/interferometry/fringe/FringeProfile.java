package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Interval;
import fringekeep.interferometry.statistics.ScalarSearch;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;

/**
 * Intervals of visibility and phase from the profile: what the deviance rises to when V (or &phi;) is held and all else
 * fitted again. For least-squares fits the quadratic form of the covariance of mean, cosine and sine takes the place of the
 * deviance.
 *
 * <p>The signed root w of the rise is read as (seen &minus; true) amplitude over noise. A visibility is the length of a
 * vector, so w is not normal near V = 0: true values are accepted by the unified bands of {@link AmplitudeLimits} for the
 * Rice law with the fit's noise, which turn into &plusmn;z far from 0. The interval is never empty, starts at 0 where no
 * fringe is established, and covers V = 0 as stated. Phases are accepted where |w| &le; z; while V is below about twice its
 * standard error the phase interval covers less than stated (54 % instead of 68.27 % at V = 0), and an undetermined phase
 * gives none.
 *
 * <p>Measured coverage of V (20,000 seeded scans a cell, 8 to 200 points; 68.27 % and 95.45 % are stated): without a drift 66.4
 * to 69.2 % and 94.3 to 95.8 % from 200 counts on at any visibility and from 100 counts on up to V = 0.6; 63.7 to 68.4 % and
 * 94.5 to 96.3 % at 100 counts, 60.1 to 67.9 % and 93.9 to 98.2 % at 50 counts with V from 0.75 to 0.9, where the counts in the
 * dark fringe are nearly all 0. With a drift fitted over a single period and V from 0.6 on: 58.5 to 65.5 % and 91.1 to 95.1 %
 * at 50 counts, 65.0 to 67.8 % and 92.3 to 94.8 % at 200, 66.9 to 68.5 % and 92.9 to 95.4 % at 1000; the mean is biased by up
 * to 0.24 standard errors at 50 counts, 0.16 at 200, 0.12 at 1000, under 0.1 from 10,000 on and without a drift everywhere.
 * Plain standard errors do worse wherever the two differ (at 50 to 200 counts down to 37 % and 77 % at V up to 0.3, 62 % and 85 %
 * at V from 0.6 on), so that these intervals are the ones {@link FringeFit} gives.
 *
 * <p>An uncertain background taken as known, and a scaling by the dispersion, widen the profile in the ratio of the
 * standard errors with and without them. With a free period the phase interval is &plusmn;z standard errors.
 *
 * <p>Source of the method: S. S. Wilks, Annals of Mathematical Statistics 9, 60 (1938), with the bands named above.
 */
public final class FringeProfile {
    private final FringeFit fit;
    private final HarmonicEstimate widened;
    private final double visibility;
    private final double phase;
    private final double visibilityError;
    private final double phaseError;
    private final boolean likelihood;
    private final FringeModel model;
    private final double least;
    private final double visibilityRatio;
    private final double phaseRatio;

    private FringeProfile(FringeFit fit) {
        this.fit = fit;
        this.widened = fit.inside().widened();
        this.visibility = widened.amplitude() / widened.mean();
        this.phase = StrictMath.atan2(0.0 - widened.sine(), widened.cosine());
        this.visibilityError = widened.visibility().orElseThrow().standardUncertainty();
        this.phaseError = widened.phase().map(e -> e.standardUncertainty()).orElse(Double.POSITIVE_INFINITY);
        this.likelihood = fit.options().estimator() == Estimator.POISSON_LIKELIHOOD;
        this.model = new FringeModel(fit.data(), fit.options());
        this.model.polar = true;
        this.least = fit.deviance();
        HarmonicEstimate plain = fit.inside().plain();
        this.visibilityRatio = plain.visibility().orElseThrow().standardUncertainty() / visibilityError;
        this.phaseRatio =
                plain.phase().map(e -> e.standardUncertainty() / phaseError).orElse(1.0);
    }

    /**
     * The profile of a fit.
     *
     * @param fit a fit with positive mean
     * @return its profile
     * @throws IllegalArgumentException if the mean is not positive
     */
    public static FringeProfile of(FringeFit fit) {
        if (!(fit.mean().value() > 0)) {
            throw new IllegalArgumentException(
                    "no visibility at mean " + fit.mean().value());
        }
        return new FringeProfile(fit);
    }

    /** Noise of the amplitude across its direction, over the mean: the scale on which the circle is seen as curved. */
    private double noise() {
        double across = visibility * phaseError;
        double around = widened.quadratureNoise();
        return visibility > 4 * around ? across : around;
    }

    /**
     * The signed root of the rise of the profile, (fitted &minus; assumed visibility) in standard errors.
     *
     * @param assumed visibility, not negative
     * @return w; infinite where the assumed value is not possible at all, NaN where the profile is {@link #undetermined}
     */
    public double visibilityDeviate(double assumed) {
        double rise = likelihood ? likelihoodRise(1, assumed) * square(visibilityRatio) : quadraticRise(assumed);
        double root = Math.sqrt(Math.max(rise, 0));
        return assumed <= visibility ? root : -root;
    }

    /**
     * The signed root of the rise of the profile over the phase.
     *
     * @param assumed phase (rad)
     * @return (fitted &minus; assumed phase) in standard errors, NaN where the profile is {@link #undetermined}
     */
    public double phaseDeviate(double assumed) {
        double turned = phase - assumed;
        turned -= 2 * Math.PI * Math.rint(turned / (2 * Math.PI));
        double rise = likelihood ? likelihoodRise(2, assumed) * square(phaseRatio) : quadraticPhaseRise(assumed);
        return turned >= 0 ? Math.sqrt(Math.max(rise, 0)) : -Math.sqrt(Math.max(rise, 0));
    }

    private static double square(double x) {
        return x * x;
    }

    /**
     * Tells whether a visibility lies in the interval, with a single refit.
     *
     * @param assumed visibility, not negative
     * @param level confidence level
     * @return true if it does
     */
    public boolean acceptsVisibility(double assumed, double level) {
        double v = assumed / noise();
        double seen = Math.max(0, v + visibilityDeviate(assumed));
        return AmplitudeLimits.acceptedLow(v, level) <= seen && seen <= AmplitudeLimits.acceptedHigh(v, level);
    }

    /**
     * Tells whether a phase lies in the interval.
     *
     * @param assumed phase (rad)
     * @param level confidence level
     * @return true if it does
     */
    public boolean acceptsPhase(double assumed, double level) {
        return Math.abs(phaseDeviate(assumed)) <= Distributions.twoSidedDeviate(level);
    }

    Optional<Interval> visibility(double level) {
        if (!determined()) {
            return Optional.empty();
        }
        double low = acceptsVisibility(0, level) ? 0 : edge(0, visibility, level);
        double reach = visibility + visibilityError;
        for (int widening = 0; widening < 60 && acceptsVisibility(reach, level); widening++) {
            reach = visibility + 1.6 * (reach - visibility);
        }
        return Optional.of(new Interval(level, low, edge(reach, visibility, level)));
    }

    /**
     * Why there is no profile: least-squares profiles need a covariance that can be inverted, and points without counts may
     * leave none.
     *
     * @return the reason, empty where there is a profile
     */
    public Optional<FringeFailure> undetermined() {
        if ((likelihood || SymmetricMatrix.factor(widened.covariance(), 3, 1e-14)) && visibilityError > 0) {
            return Optional.empty();
        }
        return Optional.of(new FringeFailure(
                FringeFailure.Reason.NOT_DETERMINED,
                "The covariance of mean, cosine and sine is singular, so that no interval can be made from it; use the"
                        + " Poisson likelihood or the expected covariance."));
    }

    private boolean determined() {
        return undetermined().isEmpty();
    }

    /** The border between a refused and an accepted visibility, by bisection to 1e-9 of the standard error. */
    private double edge(double refused, double accepted, double level) {
        double outside = refused;
        double inside = accepted;
        double tolerance = 1e-9 * Math.min(visibilityError, 1);
        while (Math.abs(outside - inside) > tolerance) {
            double middle = 0.5 * (outside + inside);
            if (middle == outside || middle == inside) {
                break;
            }
            if (acceptsVisibility(middle, level)) {
                inside = middle;
            } else {
                outside = middle;
            }
        }
        return inside;
    }

    Optional<Interval> phase(double level) {
        if (!(phaseError < Double.POSITIVE_INFINITY) || !determined()) {
            return Optional.empty();
        }
        double z = Distributions.twoSidedDeviate(level);
        if (fit.options().periodFree()) {
            return wald(z, level);
        }
        if (acceptsPhase(phase + Math.PI, level)) {
            return Optional.empty();
        }
        double low = phaseEdge(phase - Math.PI, z);
        double high = phaseEdge(phase + Math.PI, z);
        return Optional.of(new Interval(level, low, high));
    }

    /** The border between a refused phase and the fitted one, by bisection to 1e-9 of the standard error. */
    private double phaseEdge(double refused, double z) {
        double outside = refused;
        double inside = phase;
        double tolerance = 1e-9 * Math.min(1, phaseError);
        while (Math.abs(outside - inside) > tolerance) {
            double middle = 0.5 * (outside + inside);
            if (middle == outside || middle == inside) {
                break;
            }
            if (Math.abs(phaseDeviate(middle)) <= z) {
                inside = middle;
            } else {
                outside = middle;
            }
        }
        return inside;
    }

    private Optional<Interval> wald(double z, double level) {
        return fit.phase().map(estimate -> {
            double reach = z * estimate.standardUncertainty();
            return new Interval(level, estimate.value() - reach, estimate.value() + reach);
        });
    }

    /** The rise of the deviance with one polar parameter held: 1 visibility, 2 phase. */
    private double likelihoodRise(int held, double assumed) {
        double rise = refit(held, assumed, phase, visibility);
        if (rise < Double.POSITIVE_INFINITY) {
            return rise;
        }
        return march(held, assumed);
    }

    private double[] start(int held, double assumed) {
        double[] theta = fit.inside().theta().clone();
        theta[1] = held == 1 ? assumed : visibility;
        theta[2] = held == 2 ? assumed : phase;
        return theta;
    }

    private double refit(int held, double assumed, double startPhase, double startVisibility) {
        double[] theta = start(held, assumed);
        theta[held == 1 ? 2 : 1] = held == 1 ? startPhase : startVisibility;
        return descend(held, theta);
    }

    private double descend(int held, double[] theta) {
        if (held == 2) {
            insideByVisibility(theta);
        }
        int[] free = free(held, held == 1 && theta[1] == 0);
        FringeSolver solver = new FringeSolver(model, free);
        if (solver.poisson(theta) != FringeSolver.End.FOUND) {
            return Double.POSITIVE_INFINITY;
        }
        if (held == 2 && theta[1] < 0) {
            return likelihoodRise(1, 0);
        }
        model.evaluate(theta);
        return solver.deviance() - least;
    }

    /** With the phase held the visibility may have to shrink before the model allows the counts. */
    private void insideByVisibility(double[] theta) {
        for (int shrinking = 0; shrinking < 100; shrinking++) {
            if (model.evaluate(theta) && smallest() > 0.01 * model.observedTotal() / model.points) {
                return;
            }
            theta[1] *= 0.8;
        }
    }

    private double smallest() {
        double smallest = Double.POSITIVE_INFINITY;
        for (int row = 0; row < model.rows; row++) {
            smallest = Math.min(smallest, model.expected[row]);
        }
        return smallest;
    }

    /** Walks from the fitted to the held value in shrinking steps, each refit starting from the last. */
    private double march(int held, double assumed) {
        double from = held == 1 ? visibility : phase;
        double[] theta = start(held, from);
        double rise = Double.POSITIVE_INFINITY;
        double step = 0.25 * (assumed - from);
        double at = from;
        for (int k = 0; k < 40 && at != assumed; k++) {
            double next = Math.abs(assumed - at) <= Math.abs(step) * 1.0001 ? assumed : at + step;
            double[] trial = theta.clone();
            trial[held] = next;
            rise = descend(held, trial);
            if (rise < Double.POSITIVE_INFINITY) {
                theta = trial;
                at = next;
            } else {
                step *= 0.5;
            }
        }
        return at == assumed ? rise : Double.POSITIVE_INFINITY;
    }

    private int[] free(int held, boolean noPhase) {
        int[] free = new int[model.parameters - (noPhase ? 2 : 1)];
        int next = 0;
        for (int j = 0; j < model.parameters; j++) {
            if (j != held && !(noPhase && j == 2)) {
                free[next++] = j;
            }
        }
        return free;
    }

    /** Least of the quadratic form over means and phases at a visibility. */
    private double quadraticRise(double assumed) {
        double[] precision = precision();
        double reach = Math.PI;
        double best = ScalarSearch.minimum(p -> alongRay(precision, assumed, p), phase - reach, phase + reach, 1e-7);
        double direct = ScalarSearch.minimum(p -> alongRay(precision, assumed, p), phase - 0.3, phase + 0.3, 1e-7);
        return Math.min(alongRay(precision, assumed, best), alongRay(precision, assumed, direct));
    }

    private double quadraticPhaseRise(double assumed) {
        double[] precision = precision();
        double end = 3 * visibility + 1;
        double best = ScalarSearch.minimum(v -> alongRay(precision, v, assumed), 0, end, 1e-8 * end);
        return Math.min(alongRay(precision, best, assumed), alongRay(precision, 0, assumed));
    }

    private double[] precision() {
        double[] matrix = widened.covariance();
        if (!SymmetricMatrix.factor(matrix, 3, 1e-14)) {
            java.util.Arrays.fill(matrix, Double.NaN);
            return matrix;
        }
        return SymmetricMatrix.inverse(matrix, 3);
    }

    /** The quadratic form least over the mean along the direction (1, V cos, -V sin). */
    private double alongRay(double[] precision, double assumed, double angle) {
        double[] ray = {1, assumed * StrictMath.cos(angle), -assumed * StrictMath.sin(angle)};
        double[] point = {widened.mean(), widened.cosine(), widened.sine()};
        double mixed = 0;
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                mixed += ray[i] * precision[SymmetricMatrix.at(i, j)] * point[j];
            }
        }
        double rayForm = SymmetricMatrix.form(precision, ray);
        double scale = Math.max(mixed / rayForm, 0);
        double[] rest = {point[0] - scale * ray[0], point[1] - scale * ray[1], point[2] - scale * ray[2]};
        return SymmetricMatrix.form(precision, rest);
    }
}
