package fringekeep.interferometry.beam;

import fringekeep.interferometry.statistics.GaussLegendre;

/**
 * Velocities with density v<sup>n</sup> exp(&minus;(v &minus; v<sub>0</sub>)&sup2; / w&sup2;), v &gt; 0. n = 3 is the flux
 * (what crosses a plane or hits a surface), n = 2 the density (what a detector sees that a slow molecule crosses for
 * longer). w is the 1/e half width; w / sqrt 2 is a standard deviation only if the power is left out.
 *
 * <p>Moments by Gauss&ndash;Legendre panels over mode &plusmn; 9 w, relative error below 1e-13 for v<sub>0</sub> / w from
 * &minus;2 to 1000.
 */
public final class VelocityLaw {
    private static final int PANELS = 24;

    private final int power;
    private final double centre;
    private final double width;
    private final double low;
    private final double high;
    private final double scale;
    private final double norm;

    /**
     * A law.
     *
     * @param power n, at least 0
     * @param centre v<sub>0</sub> (m/s), may be 0 or negative
     * @param width w (m/s), positive
     */
    public VelocityLaw(int power, double centre, double width) {
        if (power < 0 || !Double.isFinite(centre)) {
            throw new IllegalArgumentException("no velocity law: power " + power + ", centre " + centre + " m/s");
        }
        this.power = power;
        this.centre = centre;
        this.width = MatterWave.positive("width", width);
        double mode = mode();
        this.low = Math.max(0, mode - 9 * width);
        this.high = mode + 9 * width;
        this.scale = mode > 0 ? mode : width;
        this.norm = GaussLegendre.integrate(this::shape, low, high, PANELS);
    }

    private double shape(double v) {
        double u = (v - centre) / width;
        double top = (scale - centre) / width;
        double ratio = v / scale;
        double raised = 1;
        for (int k = 0; k < power; k++) {
            raised *= ratio;
        }
        return raised * StrictMath.exp((top - u) * (top + u));
    }

    /**
     * The power n.
     *
     * @return n
     */
    public int power() {
        return power;
    }

    /**
     * The centre v<sub>0</sub>.
     *
     * @return (m/s)
     */
    public double centre() {
        return centre;
    }

    /**
     * The 1/e half width w.
     *
     * @return (m/s)
     */
    public double width() {
        return width;
    }

    /**
     * The normalised density.
     *
     * @param velocity v (m/s)
     * @return probability per velocity (s/m), 0 for v &le; 0
     */
    public double density(double velocity) {
        return velocity > 0 ? shape(velocity) / norm : 0;
    }

    /**
     * The mode, [v<sub>0</sub> + sqrt(v<sub>0</sub>&sup2; + 2 n w&sup2;)] / 2.
     *
     * @return velocity (m/s)
     */
    public double mode() {
        return peak(2 * power);
    }

    private double peak(int factor) {
        double root = Math.sqrt(centre * centre + factor * width * width);
        // For a negative centre the sum cancels; the product of both roots does not.
        return centre >= 0 ? 0.5 * (centre + root) : 0.5 * factor * width * width / (root - centre);
    }

    /**
     * The velocity L / t at the peak of the density of arrival times; not the mode of the velocities.
     *
     * @return [v<sub>0</sub> + sqrt(v<sub>0</sub>&sup2; + 2 (n + 2) w&sup2;)] / 2 (m/s)
     */
    public double arrivalPeakVelocity() {
        return peak(2 * (power + 2));
    }

    /**
     * The time at the peak of the density of arrival times.
     *
     * @param length flight length (m)
     * @return time (s)
     */
    public double arrivalPeakTime(double length) {
        return length / arrivalPeakVelocity();
    }

    /**
     * Density of arrival times f(L / t) L / t&sup2;.
     *
     * @param time flight time (s)
     * @param length flight length (m)
     * @return probability per time (1/s), 0 for t &le; 0
     */
    public double arrivalDensity(double time, double length) {
        return time > 0 ? density(length / time) * length / (time * time) : 0;
    }

    /**
     * Mean velocity.
     *
     * @return (m/s)
     */
    public double mean() {
        return moment(1);
    }

    /**
     * Mean of a power of the velocity.
     *
     * @param order power, at least &minus;n
     * @return mean of v<sup>order</sup>
     */
    public double moment(int order) {
        return GaussLegendre.integrate(v -> shape(v) * raised(v, order), low, high, PANELS) / norm;
    }

    private static double raised(double v, int order) {
        double result = 1;
        for (int k = 0; k < Math.abs(order); k++) {
            result *= v;
        }
        return order >= 0 ? result : 1 / result;
    }

    /**
     * Standard deviation of the velocity.
     *
     * @return (m/s)
     */
    public double standardDeviation() {
        double mean = mean();
        return Math.sqrt(GaussLegendre.integrate(v -> shape(v) * (v - mean) * (v - mean), low, high, PANELS) / norm);
    }

    /**
     * Harmonic mean 1 / &lt;1 / v&gt;: the velocity of the mean flight time.
     *
     * @return (m/s)
     */
    public double harmonicMean() {
        return 1 / moment(-1);
    }

    /**
     * What a detector sees whose response is proportional to the time a molecule spends in it: the law with one power less.
     *
     * @return the law f / v
     */
    public VelocityLaw seenByDensityDetector() {
        if (power == 0) {
            throw new IllegalArgumentException("a law without a power of v has no density counterpart");
        }
        return new VelocityLaw(power - 1, centre, width);
    }

    /**
     * The law as weighted nodes for averages: Gauss&ndash;Legendre panels from 1 % of the density's foot up.
     *
     * @param panels number of panels of 24 nodes, at least 1
     * @return nodes and weights, exact mean and spread, uncertainty of the mean 0
     */
    public VelocityDistribution nodes(int panels) {
        double from = Math.max(Math.max(low, mode() - 5 * width), 1e-3 * mode());
        double to = mode() + 5 * width;
        double[] nodes = new double[panels * GaussLegendre.order()];
        double[] weights = new double[nodes.length];
        GaussLegendre.fill(from, to, panels, nodes, weights);
        double sum = 0;
        for (int i = 0; i < nodes.length; i++) {
            weights[i] *= density(nodes[i]);
            sum += weights[i];
        }
        for (int i = 0; i < nodes.length; i++) {
            weights[i] /= sum;
        }
        return new VelocityDistribution(nodes, weights, mean(), 0, standardDeviation());
    }

    /** Slopes of ln density by centre and width, less their means (the score), at a velocity. */
    double[] score(double velocity, double[] means) {
        double u = (velocity - centre) / width;
        return new double[] {2 * u / width - means[0], 2 * u * u / width - means[1]};
    }

    /** Means of 2 u / w and 2 u^2 / w. */
    double[] scoreMeans() {
        double first = GaussLegendre.integrate(v -> shape(v) * 2 * (v - centre) / (width * width), low, high, PANELS);
        double second = GaussLegendre.integrate(
                v -> shape(v) * 2 * (v - centre) * (v - centre) / (width * width * width), low, high, PANELS);
        return new double[] {first / norm, second / norm};
    }

    /** Slopes of the mean velocity by centre and width. */
    double[] meanSlopes() {
        double[] means = scoreMeans();
        double[] slopes = new double[2];
        for (int k = 0; k < 2; k++) {
            int which = k;
            slopes[k] = GaussLegendre.integrate(v -> shape(v) * v * score(v, means)[which], low, high, PANELS) / norm;
        }
        return slopes;
    }
}
