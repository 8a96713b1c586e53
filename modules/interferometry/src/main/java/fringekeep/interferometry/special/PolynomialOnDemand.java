package fringekeep.interferometry.special;

import java.util.function.DoubleUnaryOperator;
import org.jspecify.annotations.Nullable;

/**
 * The same polynomials as {@link PiecewisePolynomial}, bit for bit, but each cell is made when it is first asked for: for
 * functions that are dear to compute and looked up in a few places of a long range.
 *
 * <p>Thread rule: safe for any number of threads if the function is; two threads may make the same cell, with the same
 * bits. Cost: as of the other, and 11 values of the function at the first question to a cell.
 */
public final class PolynomialOnDemand {
    private final DoubleUnaryOperator function;
    private final double start;
    private final double width;
    private final double inverseWidth;
    private final @Nullable Cell[] cells;

    /**
     * A table without cells yet.
     *
     * @param function the function, pure
     * @param start    lower end of the first cell
     * @param width    width of a cell, &gt; 0
     * @param cells    number of cells, &ge; 1
     * @throws IllegalArgumentException if the width is not positive or there is no cell
     */
    public PolynomialOnDemand(DoubleUnaryOperator function, double start, double width, int cells) {
        PiecewisePolynomial.requireCells(width, cells);
        this.function = function;
        this.start = start;
        this.width = width;
        this.inverseWidth = 1.0 / width;
        this.cells = new Cell[cells];
    }

    /**
     * Upper end of the table.
     *
     * @return the largest argument the table holds
     */
    public double end() {
        return start + cells.length / inverseWidth;
    }

    /**
     * Value of the function.
     *
     * @param x argument within the table
     * @return the interpolated value
     * @throws IllegalArgumentException if x lies outside the table or is not a number
     */
    public double value(double x) {
        double position = position(x);
        int cell = Math.min((int) position, cells.length - 1);
        return cell(cell).value(2.0 * (position - cell) - 1.0);
    }

    /**
     * Value and derivative at once.
     *
     * @param x      argument within the table
     * @param target filled with value and derivative
     * @throws IllegalArgumentException if x lies outside the table or is not a number
     */
    public void valueAndDerivative(double x, double[] target) {
        double position = position(x);
        int cell = Math.min((int) position, cells.length - 1);
        double t = 2.0 * (position - cell) - 1.0;
        double[] slope = new double[1];
        cell(cell).both(t, 2.0 * inverseWidth, target, slope, 0);
        target[1] = slope[0];
    }

    /**
     * Values and derivatives at many places.
     *
     * @param places      arguments within the table
     * @param values      filled with the values; may be the places themselves
     * @param derivatives filled with the derivatives
     * @throws IllegalArgumentException if a place lies outside the table or is not a number
     */
    public void curve(double[] places, double[] values, double[] derivatives) {
        int last = cells.length - 1;
        double scale = 2.0 * inverseWidth;
        for (int k = 0; k < places.length; k++) {
            double position = position(places[k]);
            int at = Math.min((int) position, last);
            cell(at).both(2.0 * (position - at) - 1.0, scale, values, derivatives, k);
        }
    }

    private double position(double x) {
        double position = (x - start) * inverseWidth;
        if (!(position >= 0.0 && position <= cells.length)) {
            throw new IllegalArgumentException(
                    "argument " + x + " lies outside the table [" + start + ", " + end() + "]");
        }
        return position;
    }

    private Cell cell(int at) {
        Cell known = cells[at];
        return known == null ? made(at) : known;
    }

    private Cell made(int at) {
        double[] c = PiecewisePolynomial.cell(function, start + at * width, width);
        Cell made = new Cell(c[0], c[1], c[2], c[3], c[4], c[5], c[6], c[7], c[8], c[9], c[10]);
        cells[at] = made;
        return made;
    }

    /** One polynomial; its final fields let any thread see it whole without a lock. */
    private record Cell(
            double c0,
            double c1,
            double c2,
            double c3,
            double c4,
            double c5,
            double c6,
            double c7,
            double c8,
            double c9,
            double c10) {
        double value(double t) {
            double upper = Math.fma(Math.fma(Math.fma(c10, t, c9), t, c8), t, c7);
            double middle = Math.fma(Math.fma(Math.fma(Math.fma(upper, t, c6), t, c5), t, c4), t, c3);
            return Math.fma(Math.fma(Math.fma(middle, t, c2), t, c1), t, c0);
        }

        /** Value, and derivative by t times a scale: each of its steps needs the value of the step before. */
        void both(double t, double scale, double[] values, double[] derivatives, int k) {
            double value = Math.fma(c10, t, c9);
            double slope = Math.fma(c10, t, value);
            value = Math.fma(value, t, c8);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c7);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c6);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c5);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c4);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c3);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c2);
            slope = Math.fma(slope, t, value);
            value = Math.fma(value, t, c1);
            derivatives[k] = scale * Math.fma(slope, t, value);
            values[k] = Math.fma(value, t, c0);
        }
    }
}
