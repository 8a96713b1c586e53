package fringekeep.interferometry.fringe;

/**
 * The fast way for many scans over one grid at one period: cosines and sines are computed once, a fit allocates nothing.
 * For simulations, resampling and batches; without drift, harmonics, dead time or dark counts, for which there is
 * {@link FringeFitter}. Results agree with it to about 1e-12 relative. Immutable and thread-safe.
 *
 * <p>A result holds nine numbers: mean, cosine, sine, then their expected covariance as lower triangle by rows.
 */
public final class FringeBasis {
    /** Length of a result. */
    public static final int RESULT_LENGTH = 9;

    private static final int MOST_STEPS = 60;
    private static final double STEP_TOLERANCE = 1e-11;

    private final int n;
    private final double[] cosine;
    private final double[] sine;
    private final double[] gram = new double[6];

    private FringeBasis(double[] positions, double period) {
        this.n = positions.length;
        this.cosine = new double[n];
        this.sine = new double[n];
        double[] pair = new double[2];
        for (int i = 0; i < n; i++) {
            Turns.both(positions[i] / period, pair, 0);
            cosine[i] = pair[0];
            sine[i] = pair[1];
        }
    }

    /**
     * The basis of a grid.
     *
     * @param positions grating positions (m), with at least three different phases
     * @param period fringe period (m), positive
     * @return the basis
     * @throws IllegalArgumentException if the positions do not tell mean, cosine and sine apart
     */
    public static FringeBasis of(double[] positions, double period) {
        if (!(period > 0)) {
            throw new IllegalArgumentException("period must be positive, is " + period + " m");
        }
        FringeBasis basis = new FringeBasis(positions, period);
        double[] g = basis.gram;
        for (int i = 0; i < basis.n; i++) {
            double c = basis.cosine[i];
            double s = basis.sine[i];
            g[0] += 1;
            g[1] += c;
            g[2] += c * c;
            g[3] += s;
            g[4] += c * s;
            g[5] += s * s;
        }
        if (!invert(g[0], g[1], g[2], g[3], g[4], g[5], g, 0)) {
            throw new IllegalArgumentException("the positions hold fewer than three different phases");
        }
        return basis;
    }

    /**
     * Number of points.
     *
     * @return n
     */
    public int size() {
        return n;
    }

    /** Writes the inverse of a symmetric 3 by 3 matrix by L D L^T; false if it is singular. */
    private static boolean invert(
            double m00, double m10, double m11, double m20, double m21, double m22, double[] out, int at) {
        double l10 = m10 / m00;
        double l20 = m20 / m00;
        double d1 = m11 - l10 * m10;
        double e21 = m21 - l20 * m10;
        double l21 = e21 / d1;
        double d2 = m22 - l20 * m20 - l21 * e21;
        if (!(m00 > 0) || !(d1 > FringeSolver.SMALLEST_PIVOT * m11) || !(d2 > FringeSolver.SMALLEST_PIVOT * m22)) {
            return false;
        }
        double i22 = 1 / d2;
        double i21 = -l21 * i22;
        double i11 = 1 / d1 - l21 * i21;
        double i20 = -l20 * i22 - l10 * i21;
        double i10 = -l10 * i11 - l20 * i21;
        double i00 = 1 / m00 - l10 * i10 - l20 * i20;
        out[at] = i00;
        out[at + 1] = i10;
        out[at + 2] = i11;
        out[at + 3] = i20;
        out[at + 4] = i21;
        out[at + 5] = i22;
        return true;
    }

    /**
     * Unweighted least squares.
     *
     * @param counts counts at the n positions
     * @param result filled with the nine numbers
     */
    public void unweighted(double[] counts, double[] result) {
        double y0 = 0;
        double y1 = 0;
        double y2 = 0;
        for (int i = 0; i < n; i++) {
            double y = counts[i];
            y0 += y;
            y1 += y * cosine[i];
            y2 += y * sine[i];
        }
        double mean = gram[0] * y0 + gram[1] * y1 + gram[3] * y2;
        double a = gram[1] * y0 + gram[2] * y1 + gram[4] * y2;
        double b = gram[3] * y0 + gram[4] * y1 + gram[5] * y2;
        result[0] = mean;
        result[1] = a;
        result[2] = b;
        spread(mean, a, b, result);
    }

    private void spread(double mean, double a, double b, double[] result) {
        double v00 = 0;
        double v10 = 0;
        double v11 = 0;
        double v20 = 0;
        double v21 = 0;
        double v22 = 0;
        for (int i = 0; i < n; i++) {
            double c = cosine[i];
            double s = sine[i];
            double mu = Math.max(mean + a * c + b * s, 0);
            double mc = mu * c;
            double ms = mu * s;
            v00 += mu;
            v10 += mc;
            v11 += mc * c;
            v20 += ms;
            v21 += mc * s;
            v22 += ms * s;
        }
        for (int row = 0; row < 3; row++) {
            double g0 = gram(row, 0);
            double g1 = gram(row, 1);
            double g2 = gram(row, 2);
            double w0 = g0 * v00 + g1 * v10 + g2 * v20;
            double w1 = g0 * v10 + g1 * v11 + g2 * v21;
            double w2 = g0 * v20 + g1 * v21 + g2 * v22;
            for (int column = 0; column <= row; column++) {
                result[3 + row * (row + 1) / 2 + column] =
                        w0 * gram(column, 0) + w1 * gram(column, 1) + w2 * gram(column, 2);
            }
        }
    }

    private double gram(int row, int column) {
        return row >= column ? gram[row * (row + 1) / 2 + column] : gram[column * (column + 1) / 2 + row];
    }

    /**
     * Poisson likelihood with a known background.
     *
     * @param counts counts at the n positions
     * @param background background counts at each point, not negative
     * @param result filled with the nine numbers; its contents are undefined if the answer is false
     * @return false where scoring does not settle inside the domain, as with empty points at high visibility: use
     *     {@link FringeFitter} there
     */
    public boolean poisson(double[] counts, double background, double[] result) {
        double total = 0;
        double y1 = 0;
        double y2 = 0;
        for (int i = 0; i < n; i++) {
            double y = counts[i];
            total += y;
            y1 += y * cosine[i];
            y2 += y * sine[i];
        }
        if (!(total > 0)) {
            return false;
        }
        double mean = gram[0] * total + gram[1] * y1 + gram[3] * y2;
        double a = gram[1] * total + gram[2] * y1 + gram[4] * y2;
        double b = gram[3] * total + gram[4] * y1 + gram[5] * y2;
        double amplitude = Math.sqrt(a * a + b * b);
        if (!(mean > 0.05 * total / n)) {
            mean = total / n;
        }
        if (amplitude > 0.95 * mean) {
            a *= 0.95 * mean / amplitude;
            b *= 0.95 * mean / amplitude;
        }
        return score(counts, background, mean, a, b, total, result);
    }

    private boolean score(
            double[] counts,
            double background,
            double startMean,
            double startCosine,
            double startSine,
            double total,
            double[] result) {
        double mean = startMean;
        double a = startCosine;
        double b = startSine;
        double scale = STEP_TOLERANCE * Math.sqrt(total) / n;
        boolean last = false;
        for (int step = 0; step < MOST_STEPS; step++) {
            double f00 = 0;
            double f10 = 0;
            double f11 = 0;
            double f20 = 0;
            double f21 = 0;
            double f22 = 0;
            double g0 = 0;
            double g1 = 0;
            double g2 = 0;
            for (int i = 0; i < n; i++) {
                double c = cosine[i];
                double s = sine[i];
                double mu = mean + a * c + b * s;
                if (!(mu > 0)) {
                    return false;
                }
                double weight = 1 / mu;
                double pull = counts[i] * weight - 1;
                double wc = weight * c;
                double ws = weight * s;
                f00 += weight;
                f10 += wc;
                f11 += wc * c;
                f20 += ws;
                f21 += wc * s;
                f22 += ws * s;
                g0 += pull;
                g1 += pull * c;
                g2 += pull * s;
            }
            if (!invert(f00, f10, f11, f20, f21, f22, result, 3)) {
                return false;
            }
            if (last) {
                result[0] = mean - background;
                result[1] = a;
                result[2] = b;
                return true;
            }
            double d0 = result[3] * g0 + result[4] * g1 + result[6] * g2;
            double d1 = result[4] * g0 + result[5] * g1 + result[7] * g2;
            double d2 = result[6] * g0 + result[7] * g1 + result[8] * g2;
            double factor = shortened(mean, a, b, d0, d1, d2);
            mean += factor * d0;
            a += factor * d1;
            b += factor * d2;
            last = Math.abs(d0) <= scale && Math.abs(d1) <= scale && Math.abs(d2) <= scale;
        }
        return false;
    }

    /** The part of a step that leaves every point at least a tenth of its expected counts. */
    private double shortened(double mean, double a, double b, double d0, double d1, double d2) {
        double factor = 1;
        double least = mean - Math.sqrt(a * a + b * b) + d0 - Math.sqrt(d1 * d1 + d2 * d2);
        if (least > 0) {
            return factor;
        }
        for (int i = 0; i < n; i++) {
            double mu = mean + a * cosine[i] + b * sine[i];
            double change = d0 + d1 * cosine[i] + d2 * sine[i];
            if (mu + factor * change < 0.1 * mu) {
                factor = -0.9 * mu / change;
            }
        }
        return factor;
    }

    /**
     * Visibility from a result.
     *
     * @param result a filled result with positive mean
     * @return V
     */
    public static double visibility(double[] result) {
        return Math.sqrt(result[1] * result[1] + result[2] * result[2]) / result[0];
    }

    /**
     * Standard error of the visibility by the delta method.
     *
     * @param result a filled result with positive mean
     * @return &sigma;<sub>V</sub>
     */
    public static double visibilityError(double[] result) {
        return harmonic(result).visibility().orElseThrow().standardUncertainty();
    }

    /**
     * Phase from a result.
     *
     * @param result a filled result
     * @return &phi; (rad)
     */
    public static double phase(double[] result) {
        return StrictMath.atan2(0.0 - result[2], result[1]);
    }

    /**
     * A result as a record.
     *
     * @param result a filled result
     * @return mean, cosine, sine and covariance
     */
    public static HarmonicEstimate harmonic(double[] result) {
        return new HarmonicEstimate(
                result[0], result[1], result[2], java.util.Arrays.copyOfRange(result, 3, RESULT_LENGTH));
    }
}
