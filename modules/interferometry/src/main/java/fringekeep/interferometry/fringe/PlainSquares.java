package fringekeep.interferometry.fringe;

import org.jspecify.annotations.Nullable;

/**
 * The short way to the unweighted fit of a scan without background, drift, second harmonic and dead time. It takes the
 * steps of {@link FringeSolver} in the same order with the same operations, so that the answer has the same bits, over
 * arrays that depend on the grid alone. Where anything is unusual it gives up and the general way decides.
 */
final class PlainSquares {
    private static final int FEW_STEPS = 6;

    /** Mean, cosine and sine. */
    double mean;

    double cosine;
    double sine;
    /** Expected counts there, and the sum of squared residuals. */
    final double[] expected;

    double squares;

    private final FringeGrid grid;
    private final double[] factors;
    private final double[] observed;
    private final double[] residuals;
    final double level;
    private double pull0;
    private double pull1;
    private double pull2;

    private PlainSquares(FringeGrid grid, double[] factors, double[] observed, double total) {
        this.grid = grid;
        this.factors = factors;
        this.observed = observed;
        this.expected = new double[grid.points];
        this.residuals = new double[grid.points];
        this.level = Math.max(total / grid.points, 1e-300);
    }

    /** Whether a question is of the kind that is answered here and in {@link FreeSquares}. */
    static boolean covers(FringeData data, FringeOptions options) {
        return options.background().sort() == Background.Sort.NONE
                && options.driftOrder() == 0
                && !options.secondHarmonic()
                && !options.phaseDrift()
                && data.deadTime.sort() == DeadTime.Sort.NONE;
    }

    /** The minimum from zero on; null where the general way has to decide. */
    static @Nullable PlainSquares solve(FringeGrid grid, double[] observed) {
        double total = 0;
        for (double count : observed) {
            total += count;
        }
        double[] factors = grid.factors;
        if (grid.points < 3 || total == 0 || factors == null) {
            return null;
        }
        PlainSquares found = new PlainSquares(grid, factors, observed, total);
        found.evaluate();
        return found.descend() ? found : null;
    }

    /** The fit at a fixed period; null where the general way has to decide. */
    static @Nullable FringeFit fit(FringeData data, FringeOptions options) {
        FringeGrid grid = FringeGrid.of(data, options.period(), false);
        double[] observed = grid.observed(data);
        if (options.covariance() == CovarianceSort.RESIDUAL_SCATTER && grid.points == 3) {
            return null;
        }
        PlainSquares found = solve(grid, observed);
        // A second search from the answer, with which the general way ends, moves the last digits.
        if (found == null || !found.descend()) {
            return null;
        }
        double[] theta = {found.mean, found.cosine, found.sine};
        return FringeFitAssembly.plain(data, options, theta, found.covariance(options), found.expected, observed);
    }

    private double[] covariance(FringeOptions options) {
        if (options.covariance() == CovarianceSort.RESIDUAL_SCATTER) {
            double[] covariance = grid.inverse.clone();
            FringeFitAssembly.scale(covariance, squares / (grid.points - 3));
            return covariance;
        }
        double[] variances = options.covariance() == CovarianceSort.OBSERVED ? observed : positive();
        return FringeFitAssembly.sandwich(grid.inverse, grid.normal(variances), 3);
    }

    private double[] positive() {
        double[] positive = residuals;
        for (int row = 0; row < positive.length; row++) {
            positive[row] = Math.max(expected[row], 0);
        }
        return positive;
    }

    /** Steps until one is small; false where one does not lower the squares or there are unusually many. */
    private boolean descend() {
        for (int round = 0; round < FEW_STEPS; round++) {
            double step0 = pull0;
            double step1 = pull1 - factors[1] * step0;
            double step2 = pull2 - factors[3] * step0 - factors[4] * step1;
            step2 = step2 / factors[5];
            step1 = step1 / factors[2] - factors[4] * step2;
            step0 = step0 / factors[0] - factors[1] * step1 - factors[3] * step2;
            boolean settled = small(step0, 0, mean) && small(step1, 2, cosine) && small(step2, 5, sine);
            double before = squares;
            mean += step0;
            cosine += step1;
            sine += step2;
            evaluate();
            boolean accepted = squares <= before + 1e-12 * Math.abs(before) || settled && squares < Double.MAX_VALUE;
            if (!accepted || settled) {
                return accepted;
            }
        }
        return false;
    }

    private boolean small(double step, int diagonal, double parameter) {
        double scale = Math.sqrt(level / grid.matrix[diagonal]);
        double size = Math.abs(mean) + Math.abs(parameter);
        return Math.abs(step) <= FringeSolver.STEP_TOLERANCE * scale + FringeSolver.ROUNDING * size;
    }

    /** Expected counts, squares and their gradient at the parameters. */
    private void evaluate() {
        double[] signal = grid.signal;
        double[] cosines = grid.cosine;
        double[] sines = grid.sine;
        for (int row = 0; row < expected.length; row++) {
            expected[row] = signal[row] * (mean + cosine * cosines[row] + sine * sines[row]) + 0.0;
        }
        for (int row = 0; row < expected.length; row++) {
            residuals[row] = observed[row] - expected[row];
        }
        sum();
    }

    private void sum() {
        double[] signal = grid.signal;
        double[] byCosine = grid.byCosine;
        double[] bySine = grid.bySine;
        double sum = 0;
        double g0 = 0;
        double g1 = 0;
        double g2 = 0;
        for (int row = 0; row < residuals.length; row++) {
            double residual = residuals[row];
            sum += residual * residual;
            g0 += residual * signal[row];
            g1 += residual * byCosine[row];
            g2 += residual * bySine[row];
        }
        squares = sum;
        pull0 = g0;
        pull1 = g1;
        pull2 = g2;
    }
}
