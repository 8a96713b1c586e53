package fringekeep.scan.internal.reading;

import java.util.Optional;

/**
 * Looks for a change of the mean over a scan. Because part of a fringe looks like a slope, the slope is fitted together with a
 * fringe of the period that fits best: counts = a + c cos 2&pi;ku + s sin 2&pi;ku + b t, u the position scaled to 0 … 1, t the
 * row scaled to -&frac12; … &frac12;, k from 0.75 to a third of the rows. Own derivation; common practice, no source.
 *
 * <p>Thread rule: stateless. Cost: at most 77 fits of at most 400 points.
 */
final class DriftTest {
    private static final int LEAST_ROWS = 8;
    private static final int MOST_POINTS = 400;
    private static final double LEAST_COUNTS = 100;
    private static final double SIGNIFICANT = 5;
    private static final double FEWEST_CYCLES = 0.75;
    private static final double MOST_CYCLES = 20;
    private static final int COLUMNS = 4;

    private DriftTest() {}

    /** Relative change of the mean over the scan where it is significant (five standard deviations); else empty. */
    static Optional<Double> relativeChange(double[] positions, double[] counts) {
        if (positions.length < LEAST_ROWS || sum(counts) < LEAST_COUNTS) {
            return Optional.empty();
        }
        double[] u = scaled(groups(positions));
        double[] y = groups(counts);
        double perPoint = Math.ceil(counts.length / (double) MOST_POINTS);
        Fit best = null;
        for (double k = FEWEST_CYCLES; k <= Math.min(MOST_CYCLES, y.length / 3.0); k += 0.25) {
            Fit fit = fit(u, y, k);
            if (fit != null && (best == null || fit.residual < best.residual)) {
                best = fit;
            }
        }
        if (best == null || !(best.mean > 0)) {
            return Optional.empty();
        }
        double deviation = Math.sqrt(best.slopeVariance * best.mean / perPoint);
        return Math.abs(best.slope) > SIGNIFICANT * deviation ? Optional.of(best.slope / best.mean) : Optional.empty();
    }

    private record Fit(double mean, double slope, double slopeVariance, double residual) {}

    private static @org.jspecify.annotations.Nullable Fit fit(double[] u, double[] y, double k) {
        double[][] normal = new double[COLUMNS][COLUMNS + 2];
        for (int i = 0; i < y.length; i++) {
            double[] row = basis(u[i], i, y.length, k);
            for (int p = 0; p < COLUMNS; p++) {
                for (int q = 0; q < COLUMNS; q++) {
                    normal[p][q] += row[p] * row[q];
                }
                normal[p][COLUMNS] += row[p] * y[i];
            }
        }
        normal[COLUMNS - 1][COLUMNS + 1] = 1;
        if (!solve(normal)) {
            return null;
        }
        double residual = 0;
        for (int i = 0; i < y.length; i++) {
            double[] row = basis(u[i], i, y.length, k);
            double model = 0;
            for (int p = 0; p < COLUMNS; p++) {
                model += normal[p][COLUMNS] * row[p];
            }
            residual += (y[i] - model) * (y[i] - model);
        }
        return new Fit(normal[0][COLUMNS], normal[COLUMNS - 1][COLUMNS], normal[COLUMNS - 1][COLUMNS + 1], residual);
    }

    private static double[] basis(double u, int i, int rows, double k) {
        double angle = 2 * Math.PI * k * u;
        return new double[] {1, StrictMath.cos(angle), StrictMath.sin(angle), i / (rows - 1.0) - 0.5};
    }

    /** Gauss-Jordan elimination with pivots by column; false where the matrix is singular to working accuracy. */
    private static boolean solve(double[][] rows) {
        for (int p = 0; p < COLUMNS; p++) {
            int pivot = p;
            for (int r = p + 1; r < COLUMNS; r++) {
                pivot = Math.abs(rows[r][p]) > Math.abs(rows[pivot][p]) ? r : pivot;
            }
            double[] swap = rows[p];
            rows[p] = rows[pivot];
            rows[pivot] = swap;
            if (!(Math.abs(rows[p][p]) > 1e-9)) {
                return false;
            }
            for (int r = 0; r < COLUMNS; r++) {
                double factor = r == p ? 0 : rows[r][p] / rows[p][p];
                for (int c = p; c < COLUMNS + 2 && factor != 0; c++) {
                    rows[r][c] -= factor * rows[p][c];
                }
            }
        }
        for (int p = 0; p < COLUMNS; p++) {
            rows[p][COLUMNS] /= rows[p][p];
            rows[p][COLUMNS + 1] /= rows[p][p];
        }
        return true;
    }

    /** Means of equal groups of rows, so that long scans cost no more than short ones. */
    private static double[] groups(double[] values) {
        int size = (int) Math.ceil(values.length / (double) MOST_POINTS);
        double[] means = new double[values.length / size];
        for (int g = 0; g < means.length; g++) {
            double sum = 0;
            for (int i = 0; i < size; i++) {
                sum += values[g * size + i];
            }
            means[g] = sum / size;
        }
        return means;
    }

    private static double[] scaled(double[] values) {
        double least = Double.POSITIVE_INFINITY;
        double greatest = Double.NEGATIVE_INFINITY;
        for (double value : values) {
            least = Math.min(least, value);
            greatest = Math.max(greatest, value);
        }
        double span = greatest > least ? greatest - least : 1;
        double[] scaled = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            scaled[i] = (values[i] - least) / span;
        }
        return scaled;
    }

    private static double sum(double[] values) {
        double sum = 0;
        for (double value : values) {
            sum += value;
        }
        return sum;
    }
}
