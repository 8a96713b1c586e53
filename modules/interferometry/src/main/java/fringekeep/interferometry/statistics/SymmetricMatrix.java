package fringekeep.interferometry.statistics;

/**
 * Small symmetric matrices as packed lower triangles by rows: element (i, j), i &ge; j, stands at i (i + 1) / 2 + j.
 *
 * <p>The factorisation is L D L<sup>T</sup> without square roots (Golub and Van Loan, Matrix Computations, 4th edition,
 * section 4.1.2), so that integer-valued normal equations give the exact quotients. All loops run in index order.
 */
public final class SymmetricMatrix {
    private SymmetricMatrix() {}

    /**
     * Position of an element in the packed triangle.
     *
     * @param row row, from 0
     * @param column column, from 0
     * @return its index, whichever of row and column is larger
     */
    public static int at(int row, int column) {
        return row >= column ? row * (row + 1) / 2 + column : column * (column + 1) / 2 + row;
    }

    /**
     * Replaces a matrix by its factors: unit lower triangle L below, D on the diagonal.
     *
     * @param a packed triangle of n (n + 1) / 2 elements, overwritten
     * @param n order
     * @param smallest smallest pivot allowed relative to the diagonal element it came from, for example 1e-13
     * @return false if a pivot fell below it: the matrix is singular or not positive to that accuracy
     */
    public static boolean factor(double[] a, int n, double smallest) {
        for (int j = 0; j < n; j++) {
            int rowJ = j * (j + 1) / 2;
            double original = a[rowJ + j];
            double pivot = original;
            for (int k = 0; k < j; k++) {
                pivot -= a[rowJ + k] * a[rowJ + k] * a[k * (k + 1) / 2 + k];
            }
            if (!(pivot > smallest * original) || !(pivot > 0) || pivot == Double.POSITIVE_INFINITY) {
                return false;
            }
            a[rowJ + j] = pivot;
            for (int i = j + 1; i < n; i++) {
                int rowI = i * (i + 1) / 2;
                double sum = a[rowI + j];
                for (int k = 0; k < j; k++) {
                    sum -= a[rowI + k] * a[rowJ + k] * a[k * (k + 1) / 2 + k];
                }
                a[rowI + j] = sum / pivot;
            }
        }
        return true;
    }

    /**
     * Solves with the factors of {@link #factor}.
     *
     * @param factors the factors
     * @param n order
     * @param b right side, overwritten with the solution
     */
    public static void solve(double[] factors, int n, double[] b) {
        for (int i = 0; i < n; i++) {
            double sum = b[i];
            for (int k = 0; k < i; k++) {
                sum -= factors[i * (i + 1) / 2 + k] * b[k];
            }
            b[i] = sum;
        }
        for (int i = n - 1; i >= 0; i--) {
            double sum = b[i] / factors[i * (i + 1) / 2 + i];
            for (int k = i + 1; k < n; k++) {
                sum -= factors[k * (k + 1) / 2 + i] * b[k];
            }
            b[i] = sum;
        }
    }

    /**
     * The inverse from the factors.
     *
     * @param factors the factors
     * @param n order
     * @return packed lower triangle of the inverse
     */
    public static double[] inverse(double[] factors, int n) {
        double[] inverse = new double[n * (n + 1) / 2];
        double[] column = new double[n];
        for (int j = 0; j < n; j++) {
            java.util.Arrays.fill(column, 0);
            column[j] = 1;
            solve(factors, n, column);
            for (int i = j; i < n; i++) {
                inverse[at(i, j)] = column[i] + 0.0;
            }
        }
        return inverse;
    }

    /**
     * The product T A T<sup>T</sup>, as in the propagation of a covariance.
     *
     * @param t matrix of m rows and n columns
     * @param a packed symmetric matrix of order n
     * @return packed symmetric matrix of order m
     */
    public static double[] transform(double[][] t, double[] a) {
        int m = t.length;
        int n = m == 0 ? 0 : t[0].length;
        double[] result = new double[m * (m + 1) / 2];
        double[] row = new double[n];
        for (int i = 0; i < m; i++) {
            for (int k = 0; k < n; k++) {
                double sum = 0;
                for (int l = 0; l < n; l++) {
                    sum += t[i][l] * a[at(l, k)];
                }
                row[k] = sum;
            }
            for (int j = 0; j <= i; j++) {
                double sum = 0;
                for (int k = 0; k < n; k++) {
                    sum += row[k] * t[j][k];
                }
                result[at(i, j)] = sum + 0.0;
            }
        }
        return result;
    }

    /**
     * The quadratic form v<sup>T</sup> A v, the variance of a linear function.
     *
     * @param a packed symmetric matrix
     * @param v vector of its order
     * @return the form
     */
    public static double form(double[] a, double[] v) {
        double sum = 0;
        for (int i = 0; i < v.length; i++) {
            for (int j = 0; j < v.length; j++) {
                sum += v[i] * v[j] * a[at(i, j)];
            }
        }
        return sum;
    }
}
