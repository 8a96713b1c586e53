package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import org.jspecify.annotations.Nullable;

/**
 * Fits one scan.
 *
 * <p>Model of the counts at point i: exposure<sub>i</sub> {m<sub>i</sub> D(t<sub>i</sub>) [N + a cos &theta; + b sin &theta;
 * + a<sub>2</sub> cos 2&theta; + b<sub>2</sub> sin 2&theta;] + B}, &theta; = 2 &pi; x<sub>i</sub> / d, m the monitor over its
 * mean, D the drift of {@link FringeOptions}; then the detector's dead time. All rates are per unit exposure.
 *
 * <p>The normal equations are solved in full, so the scan may cover any range of positions. Thread-safe; cosines and sines
 * of the grid fitted last are kept for the next scan over the same grid.
 */
public final class FringeFitter {
    /** Share of the mean expected count below which a point with the weighted estimator keeps the weight of half a count. */
    private static final double LEAST_VARIANCE = 0.5;

    private static final int MOST_ROUNDS = 200;

    private FringeFitter() {}

    /**
     * Fits a scan.
     *
     * @param data the scan
     * @param options what is fitted and how
     * @return the fit, or the reason why there is none
     */
    public static FringeOutcome fit(FringeData data, FringeOptions options) {
        FringeFit quick = PlainSquares.covers(data, options) ? quick(data, options) : null;
        return quick == null ? general(data, options) : quick;
    }

    private static @Nullable FringeFit quick(FringeData data, FringeOptions options) {
        if (options.estimator() != Estimator.UNWEIGHTED) {
            return null;
        }
        return options.periodFree() ? FreeSquares.fit(data, options) : PlainSquares.fit(data, options);
    }

    /** The way for every question, and the judge of the short ones: they must give the same bits. */
    static FringeOutcome general(FringeData data, FringeOptions options) {
        FringeModel model = new FringeModel(data, options);
        FringeFailure refusal = refusal(data, options, model);
        if (refusal != null) {
            return refusal;
        }
        double[] theta = new double[model.parameters];
        int[] all = all(model.parameters);
        FringeSolver.End end = solve(model, theta, all);
        if (end != FringeSolver.End.FOUND) {
            return failure(end, model);
        }
        FringeFailure lost = lostPeriod(model, theta);
        if (lost != null) {
            return lost;
        }
        return FringeFitAssembly.assemble(data, options, model, theta);
    }

    static int[] all(int parameters) {
        int[] all = new int[parameters];
        for (int i = 0; i < parameters; i++) {
            all[i] = i;
        }
        return all;
    }

    private static @Nullable FringeFailure refusal(FringeData data, FringeOptions options, FringeModel model) {
        boolean needsDark = options.background().sort() == Background.Sort.ESTIMATED
                || options.background().sort() == Background.Sort.JOINT;
        if (needsDark && data.darkCounts.length == 0) {
            return new FringeFailure(
                    FringeFailure.Reason.NO_DARK_COUNTS,
                    "The background is to come from dark counts, but the scan has none; give dark counts or a rate.");
        }
        int needed = model.parameters - (model.backgroundAt >= 0 ? 1 : 0);
        if (model.points < needed) {
            return new FringeFailure(
                    FringeFailure.Reason.TOO_FEW_POINTS,
                    model.points + " points cannot determine " + needed + " parameters; use a simpler model.");
        }
        if (options.covariance() == CovarianceSort.RESIDUAL_SCATTER && model.points == needed) {
            return new FringeFailure(
                    FringeFailure.Reason.TOO_FEW_POINTS,
                    "No degree of freedom is left to take the scatter from; use the expected covariance.");
        }
        if (model.observedTotal() == 0) {
            return new FringeFailure(
                    FringeFailure.Reason.NO_COUNTS, "All points hold zero counts; there is no mean to modulate.");
        }
        if (options.periodFree() && model.span() < 0.5) {
            return new FringeFailure(
                    FringeFailure.Reason.NOT_DETERMINED,
                    "The scan covers " + model.span() + " periods, too little to fit the period; fix it.");
        }
        return saturated(data);
    }

    private static @Nullable FringeFailure saturated(FringeData data) {
        for (int i = 0; i < data.counts.length; i++) {
            double live = data.exposures[i] * data.secondsPerExposure;
            double most =
                    switch (data.deadTime.sort()) {
                        case NONE -> Double.POSITIVE_INFINITY;
                        case NON_PARALYSABLE -> live / data.deadTime.seconds();
                        case PARALYSABLE -> live / (Math.E * data.deadTime.seconds());
                    };
            if (!data.masked[i] && data.counts[i] >= most) {
                return new FringeFailure(
                        FringeFailure.Reason.SATURATED,
                        "Point " + i + " holds " + data.counts[i] + " counts; with the dead time at most " + most
                                + " can be recorded.");
            }
        }
        return null;
    }

    private static FringeFailure failure(FringeSolver.End end, FringeModel model) {
        if (end == FringeSolver.End.NOT_DETERMINED) {
            return new FringeFailure(
                    FringeFailure.Reason.NOT_DETERMINED,
                    "The positions do not tell the " + model.parameters
                            + " parameters apart (fewer different phases than needed); use a simpler model.");
        }
        return new FringeFailure(
                FringeFailure.Reason.NO_CONVERGENCE, "The fit did not settle; use a simpler model or more counts.");
    }

    /** Half a period more or less over the scan is as far as a local fit may carry the period. */
    private static @Nullable FringeFailure lostPeriod(FringeModel model, double[] theta) {
        if (model.frequencyAt < 0) {
            return null;
        }
        double slipped = Math.abs(theta[model.frequencyAt]) * model.span();
        if (slipped <= 1 && Math.abs(theta[model.frequencyAt]) <= 0.5) {
            return null;
        }
        return new FringeFailure(
                FringeFailure.Reason.PERIOD_LOST,
                "The period moved from " + model.options.period() + " m by more than the scan can tell; give a better"
                        + " start or fix it.");
    }

    /** Fills theta; starts from the linear part by unweighted squares, then frees the rest. */
    static FringeSolver.End solve(FringeModel model, double[] theta, int[] all) {
        double[] weights = new double[model.rows];
        java.util.Arrays.fill(weights, 1);
        if (model.backgroundAt >= 0) {
            theta[model.backgroundAt] = darkRate(model);
        }
        int[] linear = linearPart(model);
        FringeSolver.End end = new FringeSolver(model, linear).leastSquares(theta, weights);
        if (end != FringeSolver.End.FOUND) {
            return end;
        }
        return switch (model.options.estimator()) {
            case UNWEIGHTED -> new FringeSolver(model, all).leastSquares(theta, weights);
            case WEIGHTED -> reweighted(model, theta, all, weights);
            case WEIGHTED_BY_COUNTS -> {
                byCounts(model, weights);
                yield new FringeSolver(model, all).leastSquares(theta, weights);
            }
            case POISSON_LIKELIHOOD -> {
                insideDomain(model, theta);
                yield new FringeSolver(model, all).poisson(theta);
            }
        };
    }

    private static int[] linearPart(FringeModel model) {
        int[] linear = all(3 + (model.harmonicAt >= 0 ? 2 : 0));
        return linear;
    }

    private static double darkRate(FringeModel model) {
        double counts = 0;
        double exposure = 0;
        double[] zero = new double[model.parameters];
        model.evaluate(zero);
        for (int row = model.points; row < model.rows; row++) {
            counts += model.observed[row];
            exposure += model.backgroundSlopes[row];
        }
        return counts / exposure;
    }

    static void byCounts(FringeModel model, double[] weights) {
        for (int row = 0; row < model.rows; row++) {
            weights[row] = 1 / Math.max(model.observed[row], 1);
        }
    }

    static void byModel(FringeModel model, double[] weights) {
        for (int row = 0; row < model.rows; row++) {
            weights[row] = 1 / Math.max(model.expected[row] * model.varianceRatios[row], LEAST_VARIANCE);
        }
    }

    private static FringeSolver.End reweighted(FringeModel model, double[] theta, int[] all, double[] weights) {
        FringeSolver solver = new FringeSolver(model, all);
        FringeSolver.End end = solver.leastSquares(theta, weights);
        double[] before = theta.clone();
        for (int round = 0; round < MOST_ROUNDS && end == FringeSolver.End.FOUND; round++) {
            model.evaluate(theta);
            byModel(model, weights);
            end = solver.leastSquares(theta, weights);
            if (settled(model, before, theta)) {
                return end;
            }
            System.arraycopy(theta, 0, before, 0, theta.length);
        }
        return end == FringeSolver.End.FOUND ? FringeSolver.End.NO_CONVERGENCE : end;
    }

    private static boolean settled(FringeModel model, double[] before, double[] after) {
        double level = Math.abs(after[0]) + 1 / model.meanExposure();
        for (int j = 0; j < after.length; j++) {
            double scale = j < model.harmonicAt + 2 || j < 3 ? level : Math.max(Math.abs(after[j]), 1e-3);
            if (!(Math.abs(after[j] - before[j]) <= 1e-12 * scale)) {
                return false;
            }
        }
        return true;
    }

    /** Shrinks the modulation until every point expects at least a twentieth of its unmodulated counts. */
    static void insideDomain(FringeModel model, double[] theta) {
        double mean = model.observedTotal() / (model.points * model.meanExposure());
        double background = model.backgroundAt >= 0 ? theta[model.backgroundAt] : model.knownBackground;
        if (model.backgroundAt >= 0 && !(theta[model.backgroundAt] > 0)) {
            theta[model.backgroundAt] = 0.01 * mean;
        }
        if (!(theta[0] + background > 0.05 * mean)) {
            theta[0] = mean;
        }
        for (int halving = 0; halving < 200; halving++) {
            boolean possible = model.evaluate(theta);
            double least = Double.POSITIVE_INFINITY;
            for (int row = 0; row < model.rows; row++) {
                least = Math.min(least, model.expected[row]);
            }
            double mark = 0.02 * Math.max(theta[0] + background, 0.05 * mean) * model.meanExposure();
            if (possible && least > Math.min(mark, 0.5 * mean)) {
                return;
            }
            for (int j = 1; j < theta.length; j++) {
                if (j != model.frequencyAt && j != model.backgroundAt) {
                    theta[j] *= 0.7;
                }
            }
        }
    }

    /** Packed covariance of the free parameters before any change of variables, or null if not determined. */
    static double @Nullable [] inverseOf(FringeModel model, double[] weights, int parameters) {
        double[] matrix = weighted(model, weights, parameters);
        return SymmetricMatrix.factor(matrix, parameters, FringeSolver.SMALLEST_PIVOT)
                ? SymmetricMatrix.inverse(matrix, parameters)
                : null;
    }

    static double[] weighted(FringeModel model, double[] weights, int parameters) {
        double[] matrix = new double[parameters * (parameters + 1) / 2];
        for (int row = 0; row < model.rows; row++) {
            int at = row * model.parameters;
            for (int i = 0; i < parameters; i++) {
                double slope = weights[row] * model.slopes[at + i];
                for (int j = 0; j <= i; j++) {
                    matrix[i * (i + 1) / 2 + j] += slope * model.slopes[at + j];
                }
            }
        }
        return matrix;
    }
}
