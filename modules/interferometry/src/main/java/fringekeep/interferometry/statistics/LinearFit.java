package fringekeep.interferometry.statistics;

import java.util.Arrays;

/**
 * Linear least squares: y = &Sigma; b<sub>j</sub> x<sub>j</sub> with known standard deviations.
 *
 * <p>Householder factorisation of the weighted design in about 32 digits, so that powers of a place and other nearly
 * dependent columns are solved to the last figures of a double. The covariance is the inverse normal matrix from the
 * triangle; {@link CurveFit#scaledDeviation} scales it by the scatter.
 *
 * <p>Source: G. H. Golub and C. F. Van Loan, Matrix Computations, 5.2 and 5.3. Accuracy on the NIST StRD linear sets: at least
 * 12 of 15 certified digits, Filip included. Thread rule: stateless. Cost: O(n p&sup2;).
 */
public final class LinearFit {
    /** A column that keeps less than this of its length beside those before is given by them, within doubles' rounding. */
    private static final double DEPENDENT = 1e-15;

    private final int n;
    private final int p;
    private final Twofold[][] rows;
    private final double[] observed;
    private final double[] deviations;
    private final Twofold[][] columns;
    private final Twofold[] rest;

    private LinearFit(Twofold[][] rows, double[] observed, double[] deviations) {
        this.rows = rows;
        this.observed = observed;
        this.deviations = deviations;
        this.n = rows.length;
        this.p = n == 0 ? 0 : rows[0].length;
        this.columns = new Twofold[p][n];
        this.rest = new Twofold[n];
        for (int i = 0; i < n; i++) {
            Twofold deviation = Twofold.of(deviations[i]);
            rest[i] = Twofold.of(observed[i]).over(deviation);
            for (int j = 0; j < p; j++) {
                columns[j][i] = rows[i][j].over(deviation);
            }
        }
    }

    /**
     * Fits.
     *
     * @param rows the x of each point, n rows of p finite values
     * @param observed the n values y
     * @param deviations standard deviation of each, positive; all 1 for an unweighted fit
     * @return the fit, or the reason why there is none
     * @throws IllegalArgumentException if lengths differ or a number is not possible
     */
    public static CurveFitOutcome squares(double[][] rows, double[] observed, double[] deviations) {
        Twofold[][] design = new Twofold[rows.length][];
        for (int i = 0; i < rows.length; i++) {
            design[i] = Arrays.stream(rows[i]).mapToObj(Twofold::of).toArray(Twofold[]::new);
        }
        return squares(design, observed, deviations);
    }

    private static CurveFitOutcome squares(Twofold[][] design, double[] observed, double[] deviations) {
        check(design, observed, deviations);
        return new LinearFit(design, observed, deviations).fitted();
    }

    private CurveFitOutcome fitted() {
        if (n < p || n == 0) {
            return new CurveFitOutcome.Failure(
                    CurveFitOutcome.Reason.TOO_FEW_POINTS, n + " points cannot determine " + p + " parameters.");
        }
        for (int j = 0; j < p; j++) {
            if (!reflect(j)) {
                return new CurveFitOutcome.Failure(
                        CurveFitOutcome.Reason.NOT_DETERMINED,
                        "Column " + j + " is a combination of those before it; leave one of them out.");
            }
        }
        return solved();
    }

    /**
     * Fits a polynomial b<sub>0</sub> + b<sub>1</sub> x + &hellip;
     *
     * @param places the n places x
     * @param observed the n values y
     * @param deviations standard deviation of each, positive
     * @param degree highest power, at least 0
     * @return the fit, or the reason why there is none
     */
    public static CurveFitOutcome polynomial(double[] places, double[] observed, double[] deviations, int degree) {
        Twofold[][] rows = new Twofold[places.length][degree + 1];
        for (int i = 0; i < places.length; i++) {
            rows[i][0] = Twofold.of(1);
            for (int j = 1; j <= degree; j++) {
                rows[i][j] = rows[i][j - 1].times(Twofold.of(places[i]));
            }
        }
        return squares(rows, observed, deviations);
    }

    private static void check(Twofold[][] rows, double[] observed, double[] deviations) {
        if (observed.length != rows.length || deviations.length != rows.length) {
            throw new IllegalArgumentException(
                    observed.length + " values and " + deviations.length + " deviations for " + rows.length + " rows");
        }
        for (int i = 0; i < rows.length; i++) {
            boolean finite = Double.isFinite(observed[i]) && rows[i].length == rows[0].length;
            for (Twofold x : rows[i]) {
                finite &= Double.isFinite(x.high());
            }
            if (!finite || !(deviations[i] > 0) || deviations[i] == Double.POSITIVE_INFINITY) {
                throw new IllegalArgumentException("row " + i + " is not possible: " + Arrays.toString(rows[i])
                        + ", value " + observed[i] + ", deviation " + deviations[i]);
            }
        }
    }

    /** Reflects column j onto its diagonal; false if nothing of it is left. */
    private boolean reflect(int j) {
        Twofold whole = length(columns[j], 0);
        Twofold length = length(columns[j], j);
        if (!(length.value() > DEPENDENT * whole.value())) {
            return false;
        }
        Twofold[] mirror = columns[j].clone();
        Twofold diagonal = mirror[j].high() > 0 ? length.negative() : length;
        mirror[j] = mirror[j].minus(diagonal);
        Twofold norm = product(mirror, mirror, j);
        for (int k = j + 1; k < p; k++) {
            mirrored(columns[k], mirror, norm, j);
        }
        mirrored(rest, mirror, norm, j);
        columns[j][j] = diagonal;
        return true;
    }

    private void mirrored(Twofold[] column, Twofold[] mirror, Twofold norm, int from) {
        Twofold factor = product(column, mirror, from).times(Twofold.of(2)).over(norm);
        for (int i = from; i < n; i++) {
            column[i] = column[i].minus(factor.times(mirror[i]));
        }
    }

    private Twofold length(Twofold[] column, int from) {
        return product(column, column, from).root();
    }

    private Twofold product(Twofold[] a, Twofold[] b, int from) {
        Twofold sum = Twofold.ZERO;
        for (int i = from; i < n; i++) {
            sum = sum.plus(a[i].times(b[i]));
        }
        return sum;
    }

    private CurveFit solved() {
        Twofold[] values = new Twofold[p];
        for (int j = p - 1; j >= 0; j--) {
            Twofold sum = rest[j];
            for (int k = j + 1; k < p; k++) {
                sum = sum.minus(columns[k][j].times(values[k]));
            }
            values[j] = sum.over(columns[j][j]);
        }
        double[] expected = new double[n];
        Twofold objective = Twofold.ZERO;
        for (int i = 0; i < n; i++) {
            Twofold sum = Twofold.ZERO;
            for (int j = 0; j < p; j++) {
                sum = sum.plus(rows[i][j].times(values[j]));
            }
            expected[i] = sum.value();
            Twofold pull = Twofold.of(observed[i]).minus(sum).over(Twofold.of(deviations[i]));
            objective = objective.plus(pull.times(pull));
        }
        double[] plain = Arrays.stream(values).mapToDouble(Twofold::value).toArray();
        return new CurveFit(plain, covariance(), objective.value(), n - p, expected, 1);
    }

    /** The triangle inverted, then the inverse times its transpose. */
    private double[] covariance() {
        Twofold[][] inverse = new Twofold[p][p];
        for (int column = 0; column < p; column++) {
            Arrays.fill(inverse[column], Twofold.ZERO);
        }
        for (int column = 0; column < p; column++) {
            for (int row = column; row >= 0; row--) {
                Twofold sum = Twofold.of(row == column ? 1 : 0);
                for (int k = row + 1; k <= column; k++) {
                    sum = sum.minus(columns[k][row].times(inverse[k][column]));
                }
                inverse[row][column] = sum.over(columns[row][row]);
            }
        }
        double[] covariance = new double[p * (p + 1) / 2];
        for (int i = 0; i < p; i++) {
            for (int j = 0; j <= i; j++) {
                Twofold sum = Twofold.ZERO;
                for (int k = i; k < p; k++) {
                    sum = sum.plus(inverse[i][k].times(inverse[j][k]));
                }
                covariance[SymmetricMatrix.at(i, j)] = sum.value();
            }
        }
        return covariance;
    }
}
