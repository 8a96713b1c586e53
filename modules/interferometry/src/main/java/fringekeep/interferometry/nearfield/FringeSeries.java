package fringekeep.interferometry.nearfield;

/**
 * A fringe as its Fourier series S(&theta;) = S_0 + 2 &Sigma; S_l cos(l &theta;), &theta; = 2&pi;x/d; S_0 is the mean
 * transmission. Coefficients are signed and add up over velocities; moduli are taken last.
 *
 * <p>Thread rule: immutable.
 */
public final class FringeSeries {
    private final double[] coefficients;

    /**
     * Keeps a series.
     *
     * @param coefficients S_0, S_1, &hellip;, at least two
     * @throws IllegalArgumentException if there are fewer than two
     */
    public FringeSeries(double... coefficients) {
        if (coefficients.length < 2) {
            throw new IllegalArgumentException("a fringe has at least its mean and first harmonic");
        }
        this.coefficients = coefficients.clone();
    }

    /**
     * One coefficient.
     *
     * @param harmonic l, from 0 to {@link #highest()}
     * @return S_l
     */
    public double coefficient(int harmonic) {
        return coefficients[harmonic];
    }

    /**
     * Highest harmonic kept.
     *
     * @return l, &ge; 1
     */
    public int highest() {
        return coefficients.length - 1;
    }

    /**
     * Visibility of the first harmonic, as a fit of one sinusoid gives it.
     *
     * @return 2|S_1/S_0|
     */
    public double sinusoidalVisibility() {
        return Math.abs(signedVisibility());
    }

    /**
     * Visibility of the first harmonic with the sign of the fringe: negative where the pattern is moved by half a
     * period.
     *
     * @return 2 S_1/S_0
     */
    public double signedVisibility() {
        return 2.0 * coefficients[1] / coefficients[0];
    }

    /**
     * Signal at a place of the fringe.
     *
     * @param angle &theta; (rad)
     * @return S(&theta;), in units of the incident flux
     */
    public double signal(double angle) {
        double sum = 0.0;
        for (int l = coefficients.length - 1; l >= 1; l--) {
            sum += coefficients[l] * StrictMath.cos(l * angle);
        }
        return coefficients[0] + 2.0 * sum;
    }

    /**
     * Visibility of the full fringe from its extremes, (max - min)/(max + min).
     *
     * <p>The extremes are found on a grid of 32 points per highest harmonic and refined by parabola to about 1e-6.
     *
     * @return the visibility of the series as kept
     */
    public double fullVisibility() {
        int points = 32 * coefficients.length;
        double largest = Double.NEGATIVE_INFINITY;
        double smallest = Double.POSITIVE_INFINITY;
        for (int k = 0; k < points; k++) {
            double left = signal(Math.PI * (k - 1) / points);
            double here = signal(Math.PI * k / points);
            double right = signal(Math.PI * (k + 1) / points);
            double curvature = left - 2.0 * here + right;
            boolean extreme = (here - left) * (right - here) <= 0.0 && curvature != 0.0;
            double value = extreme ? here - (right - left) * (right - left) / (8.0 * curvature) : here;
            largest = Math.max(largest, value);
            smallest = Math.min(smallest, value);
        }
        double end = signal(Math.PI);
        largest = Math.max(largest, end);
        smallest = Math.min(smallest, end);
        return (largest - smallest) / (largest + smallest);
    }
}
