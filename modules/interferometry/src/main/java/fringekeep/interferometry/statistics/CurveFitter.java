package fringekeep.interferometry.statistics;

import java.util.Arrays;

/**
 * Fits any {@link ParametricModel} by weighted least squares or Poisson likelihood: Levenberg&ndash;Marquardt steps by
 * orthogonal factorisation, then undamped Gauss&ndash;Newton steps until they no longer shrink.
 *
 * <p>Sources: K. Levenberg, Quarterly of Applied Mathematics 2, 164 (1944); D. Marquardt, SIAM Journal 11, 431 (1963); J. J.
 * Mor&eacute;, Lecture Notes in Mathematics 630, 105 (1978) for the scaling by the largest column norms seen; Householder
 * factorisation after G. H. Golub and C. F. Van Loan, Matrix Computations, section 5.2. A descent that stops on the
 * objective reaches half the digits at most; the undamped steps bring the parameters to the accuracy of the derivatives.
 */
public final class CurveFitter {
    private static final int MOST_STEPS = 20_000;
    private static final double STEP_TOLERANCE = 1e-10;

    /** A bold start first; a cautious one where the bold one ran onto a plateau. */
    private static final double[] FIRST_DAMPINGS = {1e-3, 1, 1e3};

    /** A column of slopes this much smaller than it once was, and than the data, no longer determines its parameter. */
    private static final double VANISHED = 1e-10;

    private final ParametricModel model;
    private final double[] observed;
    private final double[] rootWeights;
    private final boolean poisson;
    private final int n;
    private final int p;
    private final double[] values;
    private final double[] slopes;
    private final double[] largest;
    private double[] matrix = new double[0];
    private double[] residuals = new double[0];

    private CurveFitter(ParametricModel model, double[] observed, double[] rootWeights, boolean poisson) {
        this.model = model;
        this.observed = observed;
        this.rootWeights = rootWeights;
        this.poisson = poisson;
        this.n = model.points();
        this.p = model.parameters();
        this.values = new double[n];
        this.slopes = new double[n * p];
        this.largest = new double[p];
        if (observed.length != n || rootWeights.length != n) {
            throw new IllegalArgumentException(
                    observed.length + " values and " + rootWeights.length + " weights for " + n + " points");
        }
    }

    /**
     * Least squares with known standard deviations.
     *
     * @param model the curve
     * @param observed observed values
     * @param deviations standard deviation of each, positive; all 1 for an unweighted fit
     * @param start start values
     * @return the fit, or a reason
     */
    public static CurveFitOutcome squares(
            ParametricModel model, double[] observed, double[] deviations, double[] start) {
        double[] roots = new double[deviations.length];
        for (int i = 0; i < roots.length; i++) {
            if (!(deviations[i] > 0)) {
                throw new IllegalArgumentException(
                        "deviation of point " + i + " must be positive, is " + deviations[i]);
            }
            roots[i] = 1 / deviations[i];
        }
        return new CurveFitter(model, observed, roots, false).run(start.clone());
    }

    /**
     * Poisson likelihood with the identity link.
     *
     * @param model expected counts; positive wherever counts fell
     * @param counts observed counts
     * @param start start values inside the domain
     * @return the fit, its covariance the inverse expected information, or a reason
     */
    public static CurveFitOutcome poisson(ParametricModel model, double[] counts, double[] start) {
        double[] ones = new double[counts.length];
        Arrays.fill(ones, 1);
        return new CurveFitter(model, counts, ones, true).run(start.clone());
    }

    private CurveFitOutcome run(double[] theta) {
        if (n < p) {
            return new CurveFitOutcome.Failure(
                    CurveFitOutcome.Reason.TOO_FEW_POINTS, n + " points cannot determine " + p + " parameters.");
        }
        double objective = objective(theta);
        if (!(objective < Double.POSITIVE_INFINITY)) {
            return new CurveFitOutcome.Failure(
                    CurveFitOutcome.Reason.BAD_START, "The model has no meaning at the start values.");
        }
        CurveFitOutcome outcome = attempt(theta.clone(), objective, FIRST_DAMPINGS[0]);
        for (int k = 1; k < FIRST_DAMPINGS.length && !(outcome instanceof CurveFit); k++) {
            outcome = attempt(theta.clone(), objective, FIRST_DAMPINGS[k]);
        }
        return outcome;
    }

    private CurveFitOutcome attempt(double[] theta, double objective, double firstDamping) {
        Arrays.fill(largest, 0);
        int steps = descend(theta, objective, firstDamping);
        if (steps < 0) {
            return new CurveFitOutcome.Failure(
                    CurveFitOutcome.Reason.NO_CONVERGENCE,
                    "No minimum within " + MOST_STEPS + " steps; start closer to it.");
        }
        return polish(theta, steps);
    }

    /** Damped steps down to a relative step below the tolerance; returns the number of steps, -1 if there is no end. */
    private int descend(double[] theta, double first, double firstDamping) {
        double objective = first;
        double damping = firstDamping;
        double growth = 2;
        double[] trial = new double[p];
        for (int step = 0; step < MOST_STEPS; step++) {
            fill(theta);
            double[] move = step(damping);
            double relative = 0;
            for (int j = 0; j < p; j++) {
                trial[j] = theta[j] + move[j];
                relative = Math.max(relative, Math.abs(move[j]) / Math.max(Math.abs(theta[j]), 1e-12));
            }
            double next = objective(trial);
            double predicted = predicted(move, damping);
            if (next < objective && predicted > 0) {
                double ratio = (objective - next) / predicted;
                double shrunk = 1 - (2 * ratio - 1) * (2 * ratio - 1) * (2 * ratio - 1);
                damping = Math.max(damping * Math.max(1.0 / 3, Math.min(shrunk, 2)), 1e-300);
                growth = 2;
                boolean still = objective - next <= 1e-12 * objective && relative < 1e-6;
                System.arraycopy(trial, 0, theta, 0, p);
                objective = next;
                if (still || relative < STEP_TOLERANCE) {
                    return step + 1;
                }
            } else {
                damping *= growth;
                growth *= 2;
                if (relative < STEP_TOLERANCE || damping > 1e200) {
                    return step + 1;
                }
            }
        }
        return -1;
    }

    /** Undamped steps while they shrink; the last ones are lost in rounding and are not taken. */
    private CurveFitOutcome polish(double[] theta, int steps) {
        double last = Double.POSITIVE_INFINITY;
        int more = 0;
        for (; more < 200; more++) {
            fill(theta);
            double[] move = step(0);
            if (move.length == 0 || covariance(theta).length == 0) {
                return notDetermined();
            }
            double size = size(theta, move);
            if (!(size < 0.95 * last) || size == 0) {
                if (last > 1e-3) {
                    return new CurveFitOutcome.Failure(
                            CurveFitOutcome.Reason.NO_CONVERGENCE,
                            "The descent stopped where undamped steps do not shrink; start closer to the minimum.");
                }
                break;
            }
            double[] trial = theta.clone();
            for (int j = 0; j < p; j++) {
                trial[j] += move[j];
            }
            if (!(objective(trial) < Double.POSITIVE_INFINITY)) {
                break;
            }
            System.arraycopy(trial, 0, theta, 0, p);
            last = size;
        }
        double objective = objective(theta);
        fill(theta);
        double[] covariance = covariance(theta);
        return covariance.length == 0
                ? notDetermined()
                : new CurveFit(theta, covariance, objective, n - p, values, steps + more);
    }

    private static double size(double[] theta, double[] move) {
        double size = 0;
        for (int j = 0; j < theta.length; j++) {
            size = Math.max(size, Math.abs(move[j]) / Math.max(Math.abs(theta[j]), 1e-300));
        }
        return size;
    }

    private static CurveFitOutcome.Failure notDetermined() {
        return new CurveFitOutcome.Failure(
                CurveFitOutcome.Reason.NOT_DETERMINED,
                "The data do not tell the parameters apart at the place found; hold one of them.");
    }

    private double objective(double[] theta) {
        for (double value : theta) {
            if (!Double.isFinite(value)) {
                return Double.POSITIVE_INFINITY;
            }
        }
        if (!model.evaluate(theta, values, slopes)) {
            return Double.POSITIVE_INFINITY;
        }
        double sum = 0;
        for (int i = 0; i < n; i++) {
            if (poisson) {
                sum += values[i] < 0 ? Double.POSITIVE_INFINITY : PoissonDeviance.term(observed[i], values[i]);
            } else {
                double residual = rootWeights[i] * (observed[i] - values[i]);
                sum += residual * residual;
            }
        }
        return Double.isNaN(sum) ? Double.POSITIVE_INFINITY : sum;
    }

    /** Weighted slopes and residuals at theta. */
    private void fill(double[] theta) {
        model.evaluate(theta, values, slopes);
        matrix = new double[n * p];
        residuals = new double[n];
        for (int i = 0; i < n; i++) {
            double root = poisson ? 1 / Math.sqrt(Math.max(values[i], 1e-6)) : rootWeights[i];
            residuals[i] = root * (observed[i] - values[i]);
            for (int j = 0; j < p; j++) {
                matrix[i * p + j] = root * slopes[i * p + j];
            }
        }
        for (int j = 0; j < p; j++) {
            double sum = 0;
            for (int i = 0; i < n; i++) {
                sum += matrix[i * p + j] * matrix[i * p + j];
            }
            largest[j] = Math.max(largest[j], Math.sqrt(sum));
        }
    }

    private double scale(int j) {
        return largest[j] > 0 ? largest[j] : 1;
    }

    /** Step with damping times the scaled unit matrix appended; empty if undamped and singular. */
    private double[] step(double damping) {
        int rows = damping > 0 ? n + p : n;
        double[] a = new double[rows * p];
        double[] b = new double[rows];
        System.arraycopy(residuals, 0, b, 0, n);
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < p; j++) {
                a[i * p + j] = matrix[i * p + j] / scale(j);
            }
        }
        double root = Math.sqrt(damping);
        for (int j = 0; j < rows - n; j++) {
            a[(n + j) * p + j] = root;
        }
        if (!triangular(a, b, rows, p)) {
            return new double[0];
        }
        for (int j = p - 1; j >= 0; j--) {
            double sum = b[j];
            for (int k = j + 1; k < p; k++) {
                sum -= a[j * p + k] * b[k];
            }
            b[j] = sum / a[j * p + j];
        }
        double[] move = new double[p];
        for (int j = 0; j < p; j++) {
            move[j] = b[j] / scale(j);
        }
        return move;
    }

    /** Householder reflections to a triangle; false where a column vanishes against the others. */
    static boolean triangular(double[] a, double[] b, int rows, int p) {
        for (int j = 0; j < p; j++) {
            double norm = 0;
            double whole = 0;
            for (int i = 0; i < rows; i++) {
                whole += a[i * p + j] * a[i * p + j];
                norm += i >= j ? a[i * p + j] * a[i * p + j] : 0;
            }
            norm = Math.sqrt(norm);
            if (!(norm > 1e-15 * Math.sqrt(whole)) || norm == Double.POSITIVE_INFINITY) {
                return false;
            }
            double head = a[j * p + j];
            double pivot = head > 0 ? -norm : norm;
            double first = head - pivot;
            double half = -pivot * first;
            a[j * p + j] = first;
            for (int k = j + 1; k <= p; k++) {
                double sum = 0;
                for (int i = j; i < rows; i++) {
                    sum += a[i * p + j] * (k == p ? b[i] : a[i * p + k]);
                }
                double factor = sum / half;
                for (int i = j; i < rows; i++) {
                    if (k == p) {
                        b[i] -= factor * a[i * p + j];
                    } else {
                        a[i * p + k] -= factor * a[i * p + j];
                    }
                }
            }
            a[j * p + j] = pivot;
        }
        return true;
    }

    private double predicted(double[] move, double damping) {
        double linear = 0;
        double quadratic = 0;
        for (int i = 0; i < n; i++) {
            double sum = 0;
            for (int j = 0; j < p; j++) {
                sum += matrix[i * p + j] * move[j];
            }
            linear += sum * residuals[i];
            quadratic += sum * sum;
        }
        return damping >= 0 ? 2 * linear - quadratic : 0;
    }

    /** Inverse of the normal matrix from the triangle of the scaled slopes; empty if singular. */
    private double[] covariance(double[] theta) {
        double size = 0;
        for (int i = 0; i < n; i++) {
            double weighted = (poisson ? 1 / Math.sqrt(Math.max(values[i], 1e-6)) : rootWeights[i]) * observed[i];
            size += weighted * weighted;
        }
        size = Math.sqrt(size);
        double[] a = new double[n * p];
        double[] scales = new double[p];
        for (int j = 0; j < p; j++) {
            double sum = 0;
            for (int i = 0; i < n; i++) {
                sum += matrix[i * p + j] * matrix[i * p + j];
            }
            scales[j] = Math.sqrt(sum);
            boolean matters = Math.abs(theta[j]) * scales[j] > VANISHED * size;
            if (!(scales[j] > 0) || !(scales[j] > VANISHED * largest[j]) && !matters) {
                return new double[0];
            }
        }
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < p; j++) {
                a[i * p + j] = matrix[i * p + j] / scales[j];
            }
        }
        if (!triangular(a, new double[n], n, p)) {
            return new double[0];
        }
        double[][] inverse = new double[p][p];
        for (int column = 0; column < p; column++) {
            for (int row = column; row >= 0; row--) {
                double sum = row == column ? 1 : 0;
                for (int k = row + 1; k <= column; k++) {
                    sum -= a[row * p + k] * inverse[k][column];
                }
                inverse[row][column] = sum / a[row * p + row];
            }
        }
        double[] covariance = new double[p * (p + 1) / 2];
        for (int i = 0; i < p; i++) {
            for (int j = 0; j <= i; j++) {
                double sum = 0;
                for (int k = i; k < p; k++) {
                    sum += inverse[i][k] * inverse[j][k];
                }
                covariance[SymmetricMatrix.at(i, j)] = sum / (scales[i] * scales[j]);
            }
        }
        return covariance;
    }
}
