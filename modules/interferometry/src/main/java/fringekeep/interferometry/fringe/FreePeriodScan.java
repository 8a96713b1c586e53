package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Arrays;

/**
 * A fast way for many scans over one grid with the period free, by unweighted Gauss&ndash;Newton steps with halving;
 * with or without a linear drift. Results agree with {@link FringeFitter} to about 1e-9 standard errors; without a drift
 * that one is faster, with one this is.
 *
 * <p>A result holds mean, cosine, sine, [drift], period, then their expected covariance as lower triangle by rows. A workspace:
 * one thread at a time.
 */
public final class FreePeriodScan {
    private static final int MOST_STEPS = 60;

    private final int n;
    private final int p;
    private final double[] turns;
    private final double[] time;
    private final double centre;
    private final double start;
    private final double[] wave;
    private final double[] expected;
    private final double[] rows;
    private final double[] matrix;
    private final double[] gradient;
    private final double[] next;
    private final double[] nextGradient;
    private final double[] theta;
    private final double[] trial;
    private final double[][] change;

    /**
     * A workspace.
     *
     * @param positions grating positions (m), at least as many as parameters, over at least half a period
     * @param startPeriod start value of the period (m), positive
     * @param drift whether a linear drift is fitted; the points were taken in order at equal times
     */
    public FreePeriodScan(double[] positions, double startPeriod, boolean drift) {
        this.n = positions.length;
        this.p = drift ? 5 : 4;
        if (n < p || !(startPeriod > 0)) {
            throw new IllegalArgumentException(n + " points and period " + startPeriod + " m are no scan to fit");
        }
        this.start = startPeriod;
        double sum = 0;
        for (double position : positions) {
            sum += position;
        }
        this.centre = sum / n;
        this.turns = new double[n];
        this.time = new double[n];
        for (int i = 0; i < n; i++) {
            turns[i] = (positions[i] - centre) / startPeriod;
            time[i] = i / (n - 1.0) - 0.5;
        }
        this.wave = new double[2 * n];
        this.expected = new double[n];
        this.rows = new double[n * p];
        this.matrix = new double[p * (p + 1) / 2];
        this.gradient = new double[p];
        this.next = new double[p * (p + 1) / 2];
        this.nextGradient = new double[p];
        this.theta = new double[p];
        this.trial = new double[p];
        this.change = new double[p][p];
    }

    /**
     * Length of a result.
     *
     * @return parameters and their covariance
     */
    public int resultLength() {
        return p + p * (p + 1) / 2;
    }

    /**
     * Fits one scan.
     *
     * @param counts counts at the positions
     * @param result filled if the answer is true
     * @return false where the steps do not settle or the period leaves what the scan can tell
     */
    public boolean fit(double[] counts, double[] result) {
        if (!linearStart(counts)) {
            return false;
        }
        double squares = evaluate(theta, counts);
        double level = 0;
        for (double count : counts) {
            level += count;
        }
        level = Math.max(level / n, 1e-300);
        for (int step = 0; step < MOST_STEPS; step++) {
            System.arraycopy(next, 0, matrix, 0, matrix.length);
            System.arraycopy(nextGradient, 0, gradient, 0, p);
            boolean last = step(level);
            if (Double.isNaN(gradient[0])) {
                return false;
            }
            double factor = 1;
            double moved = move(factor, counts);
            for (int halving = 0; halving < 40 && !(moved <= squares * (1 + 1e-12)) && !last; halving++) {
                factor *= 0.5;
                moved = move(factor, counts);
            }
            if (!(moved < Double.POSITIVE_INFINITY)) {
                return false;
            }
            System.arraycopy(trial, 0, theta, 0, p);
            squares = moved;
            if (last) {
                return publish(result);
            }
        }
        return false;
    }

    /** Mean, cosine and sine at the start period. */
    private boolean linearStart(double[] counts) {
        Arrays.fill(theta, 0);
        theta[0] = 1;
        evaluate(theta, counts);
        double[] f = new double[6];
        double[] g = new double[3];
        for (int i = 0; i < n; i++) {
            double c = wave[2 * i];
            double s = wave[2 * i + 1];
            f[0] += 1;
            f[1] += c;
            f[2] += c * c;
            f[3] += s;
            f[4] += c * s;
            f[5] += s * s;
            g[0] += counts[i];
            g[1] += counts[i] * c;
            g[2] += counts[i] * s;
        }
        if (!SymmetricMatrix.factor(f, 3, FringeSolver.SMALLEST_PIVOT)) {
            return false;
        }
        SymmetricMatrix.solve(f, 3, g);
        System.arraycopy(g, 0, theta, 0, 3);
        return true;
    }

    /**
     * One pass over the points: normal matrix and gradient in five columns (mean, cosine, sine, drift, frequency), expected
     * counts and slopes kept for the covariance. Written out, because a loop over five columns costs three times as much.
     *
     * @return the sum of squared residuals, infinite where the frequency is not positive
     */
    private double evaluate(double[] at, double[] counts) {
        double mean = at[0];
        double a = at[1];
        double b = at[2];
        double slope = p == 5 ? at[3] : 0;
        double frequency = 1 + at[p - 1];
        if (!(frequency > 0)) {
            return Double.POSITIVE_INFINITY;
        }
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
        double m40 = 0;
        double m41 = 0;
        double m42 = 0;
        double m43 = 0;
        double m44 = 0;
        double g0 = 0;
        double g1 = 0;
        double g2 = 0;
        double g3 = 0;
        double g4 = 0;
        double sum = 0;
        for (int i = 0; i < n; i++) {
            Turns.both(turns[i] * frequency, wave, 2 * i);
            double c = wave[2 * i];
            double s = wave[2 * i + 1];
            double t = time[i];
            double shape = mean + a * c + b * s;
            double d0 = 1 + slope * t;
            double d1 = d0 * c;
            double d2 = d0 * s;
            double d3 = shape * t;
            double d4 = d0 * (b * c - a * s) * (2 * Math.PI) * turns[i];
            double residual = counts[i] - d0 * shape;
            sum += residual * residual;
            m00 += d0 * d0;
            m10 += d1 * d0;
            m11 += d1 * d1;
            m20 += d2 * d0;
            m21 += d2 * d1;
            m22 += d2 * d2;
            m30 += d3 * d0;
            m31 += d3 * d1;
            m32 += d3 * d2;
            m33 += d3 * d3;
            m40 += d4 * d0;
            m41 += d4 * d1;
            m42 += d4 * d2;
            m43 += d4 * d3;
            m44 += d4 * d4;
            g0 += residual * d0;
            g1 += residual * d1;
            g2 += residual * d2;
            g3 += residual * d3;
            g4 += residual * d4;
        }
        next[0] = m00;
        next[1] = m10;
        next[2] = m11;
        next[3] = m20;
        next[4] = m21;
        next[5] = m22;
        nextGradient[0] = g0;
        nextGradient[1] = g1;
        nextGradient[2] = g2;
        nextGradient[p - 1] = g4;
        if (p == 5) {
            next[6] = m30;
            next[7] = m31;
            next[8] = m32;
            next[9] = m33;
            next[13] = m43;
            nextGradient[3] = g3;
        }
        int last = p * (p - 1) / 2;
        next[last] = m40;
        next[last + 1] = m41;
        next[last + 2] = m42;
        next[last + p - 1] = m44;
        return sum;
    }

    /** Expected counts and slopes at theta, for the covariance. */
    private void fillRows() {
        double slope = p == 5 ? theta[3] : 0;
        for (int i = 0; i < n; i++) {
            double c = wave[2 * i];
            double s = wave[2 * i + 1];
            double shape = theta[0] + theta[1] * c + theta[2] * s;
            double drift = 1 + slope * time[i];
            int row = i * p;
            rows[row] = drift;
            rows[row + 1] = drift * c;
            rows[row + 2] = drift * s;
            if (p == 5) {
                rows[row + 3] = shape * time[i];
            }
            rows[row + p - 1] = drift * (theta[2] * c - theta[1] * s) * (2 * Math.PI) * turns[i];
            expected[i] = drift * shape;
        }
    }

    /** Turns the gradient into the step; true if it is small against the standard deviations. NaN marks a singular one. */
    private boolean step(double level) {
        double[] scales = change[0];
        for (int j = 0; j < p; j++) {
            scales[j] = Math.sqrt(level / matrix[SymmetricMatrix.at(j, j)]);
        }
        if (!SymmetricMatrix.factor(matrix, p, FringeSolver.SMALLEST_PIVOT)) {
            gradient[0] = Double.NaN;
            return false;
        }
        SymmetricMatrix.solve(matrix, p, gradient);
        boolean small = true;
        for (int j = 0; j < p; j++) {
            small &= Math.abs(gradient[j]) <= 1e-7 * scales[j];
        }
        return small;
    }

    private double move(double factor, double[] counts) {
        for (int j = 0; j < p; j++) {
            trial[j] = theta[j] + factor * gradient[j];
        }
        return evaluate(trial, counts);
    }

    private boolean publish(double[] result) {
        double slipped = Math.abs(theta[p - 1]) * (turns[n - 1] - turns[0]);
        if (!(Math.abs(slipped) <= 1) || Math.abs(theta[p - 1]) > 0.5) {
            return false;
        }
        fillRows();
        double[] inverse = SymmetricMatrix.inverse(matrix, p);
        double[] filling = new double[inverse.length];
        for (int i = 0; i < n; i++) {
            double mu = Math.max(expected[i], 0);
            int at = 0;
            for (int j = 0; j < p; j++) {
                double slope = mu * rows[i * p + j];
                for (int k = 0; k <= j; k++) {
                    filling[at++] += slope * rows[i * p + k];
                }
            }
        }
        double[] covariance = FringeFitAssembly.sandwich(inverse, filling, p);
        toOrigin(result);
        double[] turned = SymmetricMatrix.transform(change, covariance);
        System.arraycopy(turned, 0, result, p, turned.length);
        return true;
    }

    /** Cosine and sine from the middle of the scan to position 0, frequency to period. */
    private void toOrigin(double[] result) {
        for (double[] row : change) {
            Arrays.fill(row, 0);
        }
        double frequency = 1 + theta[p - 1];
        double middle = centre / start;
        double c = Turns.cos(middle * frequency);
        double s = Turns.sin(middle * frequency);
        for (int j = 0; j < p; j++) {
            change[j][j] = 1;
            result[j] = theta[j];
        }
        result[1] = theta[1] * c - theta[2] * s;
        result[2] = theta[1] * s + theta[2] * c;
        result[p - 1] = start / frequency;
        change[1][1] = c;
        change[1][2] = -s;
        change[2][1] = s;
        change[2][2] = c;
        change[1][p - 1] = -result[2] * 2 * Math.PI * middle;
        change[2][p - 1] = result[1] * 2 * Math.PI * middle;
        change[p - 1][p - 1] = -start / (frequency * frequency);
    }
}
