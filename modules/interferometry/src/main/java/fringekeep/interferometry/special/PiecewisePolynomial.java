package fringekeep.interferometry.special;

import java.util.function.DoubleUnaryOperator;

/**
 * A smooth function of one variable kept as polynomials of degree 10 on equal cells, for fast repeated evaluation.
 *
 * <p>Each cell interpolates the function at the eleven Chebyshev points of the cell. For a function whose eleventh
 * derivative is bounded by M, the interpolation error is at most M (w/2)^11/(2^10 11!), w being the cell's width:
 * 6e-18 M for w = 1/2. Source: F. W. J. Olver et al., NIST Digital Library of Mathematical Functions, 3.11(ii),
 * 18.3 (interpolation at Chebyshev points).
 *
 * <p>Thread rule: immutable. Cost: about ten fused multiply-adds a value.
 */
public final class PiecewisePolynomial {
    private static final int DEGREE = 10;
    private static final int POINTS = DEGREE + 1;
    private static final double[] NODES = nodes();
    private static final double[][] COSINES = cosines();
    private static final long[][] CHEBYSHEV_POWERS = chebyshevPowers();

    private final double start;
    private final double inverseWidth;
    private final int cells;
    private final double[] coefficients;

    private PiecewisePolynomial(double start, double width, int cells, double[] coefficients) {
        this.start = start;
        this.inverseWidth = 1.0 / width;
        this.cells = cells;
        this.coefficients = coefficients;
    }

    /**
     * Tabulates a function.
     *
     * @param function the function, called 11 times per cell in a fixed order
     * @param start    lower end of the first cell
     * @param width    width of a cell, &gt; 0
     * @param cells    number of cells, &ge; 1
     * @return the table on [start, start + cells &middot; width]
     * @throws IllegalArgumentException if the width is not positive or there is no cell
     */
    public static PiecewisePolynomial of(DoubleUnaryOperator function, double start, double width, int cells) {
        requireCells(width, cells);
        double[] coefficients = new double[cells * POINTS];
        for (int cell = 0; cell < cells; cell++) {
            interpolate(function, start + cell * width, width, coefficients, cell * POINTS);
        }
        return new PiecewisePolynomial(start, width, cells, coefficients);
    }

    static void requireCells(double width, int cells) {
        if (!(width > 0.0) || cells < 1) {
            throw new IllegalArgumentException(
                    "a table needs cells of positive width: " + cells + " cells of " + width);
        }
    }

    /** The coefficients of one cell. */
    static double[] cell(DoubleUnaryOperator function, double low, double width) {
        double[] coefficients = new double[POINTS];
        interpolate(function, low, width, coefficients, 0);
        return coefficients;
    }

    private static void interpolate(DoubleUnaryOperator function, double low, double width, double[] target, int at) {
        double[] samples = new double[POINTS];
        for (int j = 0; j < POINTS; j++) {
            samples[j] = function.applyAsDouble(low + 0.5 * width * (1.0 + NODES[j]));
        }
        // Chebyshev coefficients first: they fall fast, so writing them out in powers of t costs no digits.
        for (int k = 0; k < POINTS; k++) {
            double coefficient = chebyshevCoefficient(samples, k);
            for (int power = k % 2; power <= k; power += 2) {
                target[at + power] = Math.fma(coefficient, (double) CHEBYSHEV_POWERS[k][power], target[at + power]);
            }
        }
    }

    private static double chebyshevCoefficient(double[] samples, int k) {
        double sum = 0.0;
        for (int j = 0; j < POINTS; j++) {
            sum = Math.fma(COSINES[k][j], samples[j], sum);
        }
        return sum * (k == 0 ? 1.0 : 2.0) / POINTS;
    }

    /**
     * Upper end of the table.
     *
     * @return the largest argument the table holds
     */
    public double end() {
        return start + cells / inverseWidth;
    }

    /**
     * Value of the function.
     *
     * @param x argument within the table
     * @return the interpolated value
     * @throws IllegalArgumentException if x lies outside the table or is not a number
     */
    public double value(double x) {
        double position = (x - start) * inverseWidth;
        int cell = cellOf(position, x);
        double t = 2.0 * (position - cell) - 1.0;
        return value(coefficients, cell * POINTS, t);
    }

    /** The polynomial with coefficients from c[at] on. */
    static double value(double[] c, int at, double t) {
        double upper = Math.fma(Math.fma(Math.fma(c[at + 10], t, c[at + 9]), t, c[at + 8]), t, c[at + 7]);
        double middle =
                Math.fma(Math.fma(Math.fma(Math.fma(upper, t, c[at + 6]), t, c[at + 5]), t, c[at + 4]), t, c[at + 3]);
        return Math.fma(Math.fma(Math.fma(middle, t, c[at + 2]), t, c[at + 1]), t, c[at]);
    }

    /** Value and derivative by t of that polynomial, the latter times a scale. */
    static void both(double[] c, int at, double t, double scale, double[] target) {
        double value = c[at + 10];
        double slope = value;
        value = Math.fma(value, t, c[at + 9]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 8]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 7]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 6]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 5]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 4]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 3]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 2]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at + 1]);
        slope = Math.fma(slope, t, value);
        value = Math.fma(value, t, c[at]);
        target[0] = value;
        target[1] = scale * slope;
    }

    /**
     * Derivative of the function with respect to its argument.
     *
     * @param x argument within the table
     * @return the derivative of the interpolating polynomial; its error is about 50/width times that of the value
     * @throws IllegalArgumentException if x lies outside the table or is not a number
     */
    public double derivative(double x) {
        double position = (x - start) * inverseWidth;
        int cell = cellOf(position, x);
        double t = 2.0 * (position - cell) - 1.0;
        int at = cell * POINTS;
        double sum = DEGREE * coefficients[at + DEGREE];
        for (int power = DEGREE - 1; power >= 1; power--) {
            sum = Math.fma(sum, t, power * coefficients[at + power]);
        }
        return 2.0 * inverseWidth * sum;
    }

    /**
     * Value and derivative at once.
     *
     * @param x      argument within the table
     * @param target filled with value and derivative
     * @throws IllegalArgumentException if x lies outside the table or is not a number
     */
    public void valueAndDerivative(double x, double[] target) {
        double position = (x - start) * inverseWidth;
        int cell = cellOf(position, x);
        double t = 2.0 * (position - cell) - 1.0;
        both(coefficients, cell * POINTS, t, 2.0 * inverseWidth, target);
    }

    private int cellOf(double position, double x) {
        if (!(position >= 0.0 && position <= cells)) {
            throw new IllegalArgumentException(
                    "argument " + x + " lies outside the table [" + start + ", " + end() + "]");
        }
        return Math.min((int) position, cells - 1);
    }

    private static double[] nodes() {
        double[] nodes = new double[POINTS];
        for (int j = 0; j < POINTS; j++) {
            nodes[j] = HalfTurn.cos((j + 0.5) / POINTS);
        }
        return nodes;
    }

    private static double[][] cosines() {
        double[][] cosines = new double[POINTS][POINTS];
        for (int k = 0; k < POINTS; k++) {
            for (int j = 0; j < POINTS; j++) {
                cosines[k][j] = HalfTurn.cos(k * (2.0 * j + 1.0) / (2.0 * POINTS));
            }
        }
        return cosines;
    }

    /** Row k: coefficients of the powers of t in T_k (NIST Digital Library of Mathematical Functions 18.9.1). */
    private static long[][] chebyshevPowers() {
        long[][] powers = new long[POINTS][POINTS];
        powers[0][0] = 1;
        powers[1][1] = 1;
        for (int k = 2; k < POINTS; k++) {
            for (int power = 0; power < POINTS; power++) {
                powers[k][power] = (power > 0 ? 2 * powers[k - 1][power - 1] : 0) - powers[k - 2][power];
            }
        }
        return powers;
    }
}
