package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.PoissonDeviance;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import org.jspecify.annotations.Nullable;

/**
 * Minimisers over a {@link FringeModel}: Gauss&ndash;Newton for weighted squares, scoring with linear bounds for the
 * Poisson deviance. Steps are halved until the objective does not rise.
 *
 * <p>The Poisson deviance with identity link is convex in the linear parameters. Its domain is &mu; &gt; 0 where counts
 * fell and &mu; &ge; 0 where none did; the second kind of bound is met by solving each step as a small quadratic programme.
 */
final class FringeSolver {
    static final double SMALLEST_PIVOT = 1e-11;
    static final double STEP_TOLERANCE = 1e-11;
    static final double ROUNDING = 1e-14;
    private static final int MOST_STEPS = 200;
    private static final double BOUND_PENALTY = 200;

    /** A profile needs the deviance, not the parameters: it is settled when a step can lower it by no more than this. */
    private static final double PROFILE_TOLERANCE = 1e-11;

    /** With empty points some directions may be flat: no step can lower the deviance by more than rounding. */
    private static final double FLAT_TOLERANCE = 1e-15;

    private final FringeModel model;
    private final int[] free;
    private final int n;
    private final double[] matrix;
    private final double[] gradient;
    private final double[] step;

    FringeSolver(FringeModel model, int[] free) {
        this.model = model;
        this.free = free;
        this.n = free.length;
        this.matrix = new double[n * (n + 1) / 2];
        this.gradient = new double[n];
        this.step = new double[n];
    }

    /** How a minimisation ended. */
    enum End {
        FOUND,
        NOT_DETERMINED,
        NO_CONVERGENCE
    }

    /** Minimises the sum of weighted squares from theta, which is overwritten. */
    End leastSquares(double[] theta, double[] weights) {
        double[] trial = theta.clone();
        if (!model.evaluate(theta)) {
            return End.NO_CONVERGENCE;
        }
        double objective = squares(weights);
        double level = Math.max(model.observedTotal() / model.points, 1e-300);
        boolean newton = false;
        double before = Double.POSITIVE_INFINITY;
        for (int round = 0; round < MOST_STEPS; round++) {
            normal(weights);
            double[] scales = scales(level * meanWeight(weights));
            if (!(newton && useCurvature(theta, weights, 0)) && !SymmetricMatrix.factor(matrix, n, SMALLEST_PIVOT)) {
                return End.NOT_DETERMINED;
            }
            System.arraycopy(gradient, 0, step, 0, n);
            SymmetricMatrix.solve(matrix, n, step);
            newton |= slow(round, before);
            before = decrement();
            boolean last = small(theta, scales);
            double factor = 1;
            boolean accepted = false;
            double next = objective;
            for (int halving = 0; halving < 60 && !accepted; halving++, factor *= 0.5) {
                move(theta, trial, factor);
                if (model.evaluate(trial)) {
                    next = squares(weights);
                    accepted = next <= objective + 1e-12 * Math.abs(objective) || last && next < Double.MAX_VALUE;
                }
            }
            if (!accepted) {
                return model.evaluate(theta) && nearlySmall(theta, scales) ? End.FOUND : End.NO_CONVERGENCE;
            }
            System.arraycopy(trial, 0, theta, 0, theta.length);
            objective = next;
            if (last) {
                return End.FOUND;
            }
        }
        return End.NO_CONVERGENCE;
    }

    /** Minimises the Poisson deviance from theta, which is overwritten and must lie in the domain. */
    End poisson(double[] theta) {
        double[] trial = theta.clone();
        if (!model.evaluate(theta)) {
            return End.NO_CONVERGENCE;
        }
        double objective = deviance();
        if (objective == Double.POSITIVE_INFINITY) {
            return End.NO_CONVERGENCE;
        }
        boolean empty = hasEmptyRows();
        double[] weights = new double[model.rows];
        boolean newton = false;
        double before = Double.POSITIVE_INFINITY;
        for (int round = 0; round < MOST_STEPS; round++) {
            double[] scales = scoring(weights, empty, round >= 3 && model.linear());
            if (model.polar && !newton) {
                addPhaseCurvature(theta);
            }
            if (!(newton && useCurvature(theta, null, empty ? 1e-9 : 0))
                    && !SymmetricMatrix.factor(matrix, n, empty ? 0 : SMALLEST_PIVOT)) {
                return End.NOT_DETERMINED;
            }
            if (empty) {
                boundedStep();
            } else {
                System.arraycopy(gradient, 0, step, 0, n);
                SymmetricMatrix.solve(matrix, n, step);
            }
            newton |= slow(round, before);
            before = decrement();
            boolean last = small(theta, scales)
                    || model.polar && before < PROFILE_TOLERANCE
                    || empty && before < FLAT_TOLERANCE;
            double factor = 1;
            boolean accepted = false;
            double next = objective;
            for (int halving = 0; halving < 60 && !accepted; halving++, factor *= 0.5) {
                move(theta, trial, factor);
                if (model.evaluate(trial)) {
                    next = deviance();
                    accepted = next <= objective + 1e-12 * (1 + Math.abs(objective));
                }
            }
            if (!accepted) {
                return model.evaluate(theta) && nearlySmall(theta, scales) ? End.FOUND : End.NO_CONVERGENCE;
            }
            System.arraycopy(trial, 0, theta, 0, theta.length);
            objective = next;
            if (last) {
                return End.FOUND;
            }
        }
        return End.NO_CONVERGENCE;
    }

    private void move(double[] from, double[] to, double factor) {
        System.arraycopy(from, 0, to, 0, from.length);
        for (int j = 0; j < n; j++) {
            to[free[j]] = from[free[j]] + factor * step[j];
        }
    }

    private boolean small(double[] theta, double[] scales) {
        return within(theta, scales, STEP_TOLERANCE);
    }

    private boolean nearlySmall(double[] theta, double[] scales) {
        return within(theta, scales, 1e-6);
    }

    /** A step is small against the standard deviation, or lost in the rounding of the parameter. */
    private boolean within(double[] theta, double[] scales, double tolerance) {
        for (int j = 0; j < n; j++) {
            if (!(Math.abs(step[j]) <= tolerance * scales[j] + ROUNDING * size(theta, free[j]))) {
                return false;
            }
        }
        return true;
    }

    /** The size whose rounding a parameter shares: of the counts for amplitudes, 1 for pure numbers. */
    private double size(double[] theta, int parameter) {
        boolean amplitude = parameter == 0
                || parameter < 3 && !model.polar
                || model.harmonicAt >= 0 && (parameter == model.harmonicAt || parameter == model.harmonicAt + 1)
                || parameter == model.backgroundAt;
        return amplitude
                ? Math.abs(theta[0]) + Math.abs(theta[parameter]) + Math.abs(model.knownBackground)
                : Math.max(1, Math.abs(theta[parameter]));
    }

    private static double meanWeight(double[] weights) {
        double sum = 0;
        for (double weight : weights) {
            sum += weight;
        }
        return sum / weights.length;
    }

    /** Rough standard deviations of the parameters, from the diagonal, as the measure of a small step. */
    private double[] scales(double variance) {
        double[] scales = new double[n];
        for (int j = 0; j < n; j++) {
            scales[j] = Math.sqrt(variance / matrix[SymmetricMatrix.at(j, j)]);
        }
        return scales;
    }

    void normal(double[] weights) {
        java.util.Arrays.fill(matrix, 0);
        java.util.Arrays.fill(gradient, 0);
        for (int row = 0; row < model.rows; row++) {
            accumulate(row, weights[row], weights[row] * (model.observed[row] - model.expected[row]));
        }
    }

    private void accumulate(int row, double weight, double pull) {
        int at = row * model.parameters;
        for (int i = 0; i < n; i++) {
            double slope = model.slopes[at + free[i]];
            gradient[i] += pull * slope;
            double weighted = weight * slope;
            int rowI = i * (i + 1) / 2;
            for (int j = 0; j <= i; j++) {
                matrix[rowI + j] += weighted * model.slopes[at + free[j]];
            }
        }
    }

    private double[] scoring(double[] weights, boolean empty, boolean newton) {
        java.util.Arrays.fill(matrix, 0);
        java.util.Arrays.fill(gradient, 0);
        double[] base = new double[n];
        double floor = 0.1 * level();
        for (int row = 0; row < model.rows; row++) {
            double mu = model.expected[row];
            double y = model.observed[row];
            weights[row] = y == 0 && empty ? 0 : newton || empty ? y / (mu * mu) : 1 / mu;
            accumulate(row, weights[row], y == 0 ? -1 : y / mu - 1);
            for (int j = 0; j < n; j++) {
                double slope = model.slopes[row * model.parameters + free[j]];
                base[j] += slope * slope / Math.max(mu, floor);
            }
        }
        for (int j = 0; j < n; j++) {
            if (empty) {
                matrix[SymmetricMatrix.at(j, j)] += 1e-9 * base[j];
            }
            base[j] = 1 / Math.sqrt(base[j]);
        }
        return base;
    }

    /** Scoring that does not gain a digit in two steps is held up by the curvature of the model itself. */
    private boolean slow(int round, double before) {
        return !model.linear() && round >= 3 && decrement() > 0.1 * before;
    }

    /**
     * Replaces the matrix by the factors of the observed information, from central differences of the score; leaves it as
     * it is where that is not positive.
     */
    private boolean useCurvature(double[] theta, double @Nullable [] weights, double ridge) {
        double[] curvature = new double[matrix.length];
        double[] kept = gradient.clone();
        double[] shifted = theta.clone();
        for (int j = 0; j < n; j++) {
            double width = 1e-4 / Math.sqrt(matrix[SymmetricMatrix.at(j, j)]);
            shifted[free[j]] = theta[free[j]] + width;
            double[] above = score(shifted, weights);
            shifted[free[j]] = theta[free[j]] - width;
            double[] below = score(shifted, weights);
            shifted[free[j]] = theta[free[j]];
            for (int i = 0; i < n; i++) {
                double slope = -(above[i] - below[i]) / (2 * width);
                curvature[SymmetricMatrix.at(i, j)] += i == j ? slope : 0.5 * slope;
            }
        }
        model.evaluate(theta);
        System.arraycopy(kept, 0, gradient, 0, n);
        for (int j = 0; j < n; j++) {
            curvature[SymmetricMatrix.at(j, j)] += ridge * matrix[SymmetricMatrix.at(j, j)];
        }
        if (!SymmetricMatrix.factor(curvature, n, SMALLEST_PIVOT)) {
            return false;
        }
        System.arraycopy(curvature, 0, matrix, 0, matrix.length);
        return true;
    }

    /** What the next step lowers half the deviance by, to first order. */
    private double decrement() {
        double sum = 0;
        for (int j = 0; j < n; j++) {
            sum += gradient[j] * step[j];
        }
        return Math.abs(sum);
    }

    /**
     * With the visibility held far from its best value the expected information is far from the curvature along the phase,
     * and scoring would swing. The second derivative of the counts by the phase is minus the visibility times that by it.
     */
    private void addPhaseCurvature(double[] theta) {
        int at = -1;
        for (int j = 0; j < n; j++) {
            at = free[j] == 2 ? j : at;
        }
        if (at < 0) {
            return;
        }
        double curvature = 0;
        for (int row = 0; row < model.points; row++) {
            double y = model.observed[row];
            double pull = y == 0 ? -1 : y / model.expected[row] - 1;
            curvature += pull * theta[1] * model.slopes[row * model.parameters + 1];
        }
        int diagonal = SymmetricMatrix.at(at, at);
        matrix[diagonal] = Math.max(matrix[diagonal] + curvature, 0.05 * matrix[diagonal]);
    }

    private double level() {
        double sum = 0;
        for (int row = 0; row < model.rows; row++) {
            sum += Math.max(model.expected[row], 0);
        }
        return Math.max(sum / model.rows, 1e-300);
    }

    private boolean hasEmptyRows() {
        for (int row = 0; row < model.rows; row++) {
            if (model.observed[row] == 0) {
                return true;
            }
        }
        return false;
    }

    /**
     * The step that minimises the quadratic model under expected &ge; 0 at the empty rows, to first order: bounds are
     * added where they are most violated and dropped where their multiplier turns negative.
     */
    private void boundedStep() {
        double[] unbounded = gradient.clone();
        SymmetricMatrix.solve(matrix, n, unbounded);
        System.arraycopy(unbounded, 0, step, 0, n);
        int[] active = new int[n];
        int count = 0;
        double tolerance = 1e-12 * level();
        for (int round = 0; round < 8 * n + 40; round++) {
            int worst = mostViolated(active, count, tolerance);
            if (worst < 0 || count == n) {
                return;
            }
            active[count++] = worst;
            count = dropNegative(unbounded, active, count);
        }
    }

    private int mostViolated(int[] active, int count, double tolerance) {
        int worst = -1;
        double lowest = -tolerance;
        for (int row = 0; row < model.rows; row++) {
            if (model.observed[row] != 0 || contains(active, count, row)) {
                continue;
            }
            double value = reached(row);
            if (value < lowest) {
                lowest = value;
                worst = row;
            }
        }
        return worst;
    }

    private static boolean contains(int[] active, int count, int row) {
        for (int k = 0; k < count; k++) {
            if (active[k] == row) {
                return true;
            }
        }
        return false;
    }

    /** Solves on the active bounds; drops the bound with the most negative multiplier until none is negative. */
    private int dropNegative(double[] unbounded, int[] active, int count) {
        int left = count;
        while (left > 0) {
            double[] multipliers = onBounds(unbounded, active, left);
            if (multipliers.length == 0) {
                left--;
                continue;
            }
            int lowest = 0;
            for (int k = 1; k < left; k++) {
                lowest = multipliers[k] < multipliers[lowest] ? k : lowest;
            }
            if (multipliers[lowest] >= 0) {
                return left;
            }
            System.arraycopy(active, lowest + 1, active, lowest, left - lowest - 1);
            left--;
        }
        System.arraycopy(unbounded, 0, step, 0, n);
        return 0;
    }

    private double[] onBounds(double[] unbounded, int[] active, int count) {
        double[][] columns = new double[count][n];
        double[] gram = new double[count * (count + 1) / 2];
        double[] multipliers = new double[count];
        for (int k = 0; k < count; k++) {
            int at = active[k] * model.parameters;
            double value = model.expected[active[k]];
            for (int j = 0; j < n; j++) {
                columns[k][j] = model.slopes[at + free[j]];
                value += columns[k][j] * unbounded[j];
            }
            multipliers[k] = -value;
            SymmetricMatrix.solve(matrix, n, columns[k]);
        }
        for (int k = 0; k < count; k++) {
            for (int l = 0; l <= k; l++) {
                double sum = 0;
                for (int j = 0; j < n; j++) {
                    sum += model.slopes[active[k] * model.parameters + free[j]] * columns[l][j];
                }
                gram[SymmetricMatrix.at(k, l)] = sum;
            }
        }
        if (!SymmetricMatrix.factor(gram, count, 1e-12)) {
            return new double[0];
        }
        SymmetricMatrix.solve(gram, count, multipliers);
        for (int j = 0; j < n; j++) {
            double sum = unbounded[j];
            for (int k = 0; k < count; k++) {
                sum += multipliers[k] * columns[k][j];
            }
            step[j] = sum;
        }
        // Along a flat direction the unbounded step is huge and its cancellation coarse: put the step on the bounds
        // again.
        for (int refinement = 0; refinement < 2; refinement++) {
            double[] left = new double[count];
            for (int k = 0; k < count; k++) {
                left[k] = -reached(active[k]);
            }
            SymmetricMatrix.solve(gram, count, left);
            for (int j = 0; j < n; j++) {
                for (int k = 0; k < count; k++) {
                    step[j] += left[k] * columns[k][j];
                }
            }
        }
        return multipliers;
    }

    /** Expected counts of a row after the step, to first order. */
    private double reached(int row) {
        double value = model.expected[row];
        for (int j = 0; j < n; j++) {
            value += model.slopes[row * model.parameters + free[j]] * step[j];
        }
        return value;
    }

    double squares(double[] weights) {
        double sum = 0;
        for (int row = 0; row < model.rows; row++) {
            double residual = model.observed[row] - model.expected[row];
            sum += weights[row] * residual * residual;
        }
        return sum;
    }

    /** The Poisson deviance of the current expected counts, with a steep wall below 0 at empty rows. */
    double deviance() {
        double sum = 0;
        for (int row = 0; row < model.rows; row++) {
            double mu = model.expected[row];
            double y = model.observed[row];
            if (y == 0) {
                sum += mu >= 0 ? 2 * mu : -BOUND_PENALTY * mu;
            } else {
                sum += PoissonDeviance.term(y, mu);
            }
        }
        return sum;
    }

    /**
     * Half the negative gradient of the objective for all free parameters at theta: of the squares with the given weights,
     * of the deviance without.
     */
    double[] score(double[] theta, double @Nullable [] weights) {
        model.evaluate(theta);
        double[] score = new double[n];
        for (int row = 0; row < model.rows; row++) {
            double y = model.observed[row];
            double pull = weights != null
                    ? weights[row] * (y - model.expected[row])
                    : y == 0 ? -1 : y / model.expected[row] - 1;
            for (int j = 0; j < n; j++) {
                score[j] += pull * model.slopes[row * model.parameters + free[j]];
            }
        }
        return score;
    }
}
