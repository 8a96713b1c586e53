package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import org.jspecify.annotations.Nullable;

/**
 * The short way to the unweighted fit of a plain scan with its period free, as {@link PlainSquares} is for a fixed one: the
 * same operations in the same order as {@link FringeSolver}, one pass over the points for counts, squares, gradient and
 * normal matrix. Where anything is unusual it gives up and the general way decides.
 */
final class FreeSquares {
    private static final int MOST_STEPS = 40;
    private static final int P = 4;

    private final FringeGrid grid;
    private final double[] observed;
    private final double[] cosine;
    private final double[] sine;
    private final double[] byFrequency;
    private final double[] residuals;
    private final double[] expected;
    private final double level;
    private final double[] theta = new double[P];
    private final double[] trial = new double[P];
    private final double[] step = new double[P];
    private final double[] gradient = new double[P];
    private final double[] normal = new double[P * (P + 1) / 2];
    private final double[] factors = new double[normal.length];
    private double squares;

    private FreeSquares(FringeGrid grid, double[] observed, PlainSquares start) {
        this.grid = grid;
        this.observed = observed;
        this.cosine = new double[grid.points];
        this.sine = new double[grid.points];
        this.byFrequency = new double[grid.points];
        this.residuals = new double[grid.points];
        this.expected = new double[grid.points];
        this.level = start.level;
        trial[0] = start.mean;
        trial[1] = start.cosine;
        trial[2] = start.sine;
    }

    /** The fit; null where the general way has to decide. */
    static @Nullable FringeFit fit(FringeData data, FringeOptions options) {
        FringeGrid grid = FringeGrid.of(data, options.period(), true);
        double[] observed = grid.observed(data);
        boolean scatter = options.covariance() == CovarianceSort.RESIDUAL_SCATTER;
        if (grid.points < P || grid.span < 0.5 || scatter && grid.points == P) {
            return null;
        }
        PlainSquares start = PlainSquares.solve(grid, observed);
        if (start == null) {
            return null;
        }
        FreeSquares found = new FreeSquares(grid, observed, start);
        return found.descend() && found.keptPeriod() ? found.published(data, options) : null;
    }

    private boolean keptPeriod() {
        double moved = Math.abs(theta[3]);
        return moved * grid.span <= 1 && moved <= 0.5;
    }

    private boolean descend() {
        evaluate();
        accept();
        double before = Double.POSITIVE_INFINITY;
        for (int round = 0; round < MOST_STEPS; round++) {
            System.arraycopy(normal, 0, factors, 0, normal.length);
            if (!SymmetricMatrix.factor(factors, P, FringeSolver.SMALLEST_PIVOT)) {
                return false;
            }
            System.arraycopy(gradient, 0, step, 0, P);
            SymmetricMatrix.solve(factors, P, step);
            double decrement = decrement();
            if (round >= 3 && decrement > 0.1 * before) {
                return false;
            }
            before = decrement;
            boolean settled = small();
            if (!halved(settled)) {
                return false;
            }
            if (settled) {
                return true;
            }
        }
        return false;
    }

    /** Takes the step or a half, a quarter, &hellip; of it; false where none lowers the squares. */
    private boolean halved(boolean settled) {
        double objective = squares;
        double factor = 1;
        for (int halving = 0; halving < 8; halving++, factor *= 0.5) {
            for (int j = 0; j < P; j++) {
                trial[j] = theta[j] + factor * step[j];
            }
            if (!(1 + trial[3] > 0)) {
                continue;
            }
            evaluate();
            if (squares <= objective + 1e-12 * Math.abs(objective) || settled && squares < Double.MAX_VALUE) {
                accept();
                return true;
            }
        }
        return false;
    }

    private void accept() {
        System.arraycopy(trial, 0, theta, 0, P);
    }

    private double decrement() {
        double sum = 0;
        for (int j = 0; j < P; j++) {
            sum += gradient[j] * step[j];
        }
        return Math.abs(sum);
    }

    private boolean small() {
        return small(0, 0, Math.abs(theta[0]) + Math.abs(theta[0]))
                && small(1, 2, Math.abs(theta[0]) + Math.abs(theta[1]))
                && small(2, 5, Math.abs(theta[0]) + Math.abs(theta[2]))
                && small(3, 9, Math.max(1, Math.abs(theta[3])));
    }

    private boolean small(int parameter, int diagonal, double size) {
        double scale = Math.sqrt(level / normal[diagonal]);
        return Math.abs(step[parameter]) <= FringeSolver.STEP_TOLERANCE * scale + FringeSolver.ROUNDING * size;
    }

    /** Expected counts, squares, gradient and normal matrix at the trial. */
    private void evaluate() {
        Turns.all(grid.turns, 1 + trial[3], cosine, sine, expected, residuals);
        double mean = trial[0];
        double a = trial[1];
        double b = trial[2];
        for (int row = 0; row < expected.length; row++) {
            double signal = grid.signal[row];
            double c = cosine[row];
            double s = sine[row];
            expected[row] = signal * (mean + a * c + b * s) + 0.0;
            byFrequency[row] = signal * (b * c - a * s) * 2 * Math.PI * grid.turns[row];
        }
        for (int row = 0; row < expected.length; row++) {
            residuals[row] = observed[row] - expected[row];
            cosine[row] = grid.signal[row] * cosine[row];
            sine[row] = grid.signal[row] * sine[row];
        }
        sumSquares();
        sumNormal();
    }

    private void sumSquares() {
        double[] signal = grid.signal;
        double sum = 0;
        double g0 = 0;
        double g1 = 0;
        double g2 = 0;
        double g3 = 0;
        for (int row = 0; row < residuals.length; row++) {
            double residual = residuals[row];
            sum += residual * residual;
            g0 += residual * signal[row];
            g1 += residual * cosine[row];
            g2 += residual * sine[row];
            g3 += residual * byFrequency[row];
        }
        squares = sum;
        gradient[0] = g0;
        gradient[1] = g1;
        gradient[2] = g2;
        gradient[3] = g3;
    }

    private void sumNormal() {
        double[] signal = grid.signal;
        double m00 = 0;
        double m10 = 0;
        double m11 = 0;
        double m20 = 0;
        double m21 = 0;
        double m22 = 0;
        double m30 = 0;
        double m31 = 0;
        double m32 = 0;
        double m33 = 0;
        for (int row = 0; row < signal.length; row++) {
            double s0 = signal[row];
            double s1 = cosine[row];
            double s2 = sine[row];
            double s3 = byFrequency[row];
            m00 += s0 * s0;
            m10 += s1 * s0;
            m11 += s1 * s1;
            m20 += s2 * s0;
            m21 += s2 * s1;
            m22 += s2 * s2;
            m30 += s3 * s0;
            m31 += s3 * s1;
            m32 += s3 * s2;
            m33 += s3 * s3;
        }
        normal[0] = m00;
        normal[1] = m10;
        normal[2] = m11;
        normal[3] = m20;
        normal[4] = m21;
        normal[5] = m22;
        normal[6] = m30;
        normal[7] = m31;
        normal[8] = m32;
        normal[9] = m33;
    }

    private @Nullable FringeFit published(FringeData data, FringeOptions options) {
        System.arraycopy(normal, 0, factors, 0, normal.length);
        if (!SymmetricMatrix.factor(factors, P, FringeSolver.SMALLEST_PIVOT)) {
            return null;
        }
        double[] covariance = SymmetricMatrix.inverse(factors, P);
        if (options.covariance() == CovarianceSort.RESIDUAL_SCATTER) {
            FringeFitAssembly.scale(covariance, squares / (grid.points - P));
        } else {
            boolean ofCounts = options.covariance() == CovarianceSort.OBSERVED;
            covariance = FringeFitAssembly.sandwich(covariance, weighted(ofCounts ? observed : positive()), P);
        }
        return FringeFitAssembly.free(data, options, theta, covariance, expected, observed, grid.centre);
    }

    private double[] positive() {
        double[] positive = new double[expected.length];
        for (int row = 0; row < positive.length; row++) {
            positive[row] = Math.max(expected[row], 0);
        }
        return positive;
    }

    private double[] weighted(double[] weights) {
        double[] sum = new double[normal.length];
        double[] slopes = new double[P];
        for (int row = 0; row < weights.length; row++) {
            slopes[0] = grid.signal[row];
            slopes[1] = cosine[row];
            slopes[2] = sine[row];
            slopes[3] = byFrequency[row];
            for (int i = 0; i < P; i++) {
                double slope = weights[row] * slopes[i];
                for (int j = 0; j <= i; j++) {
                    sum[i * (i + 1) / 2 + j] += slope * slopes[j];
                }
            }
        }
        return sum;
    }
}
