package fringekeep.interferometry.beam;

import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.GaussLegendre;

/**
 * Velocity from the free-flight parabola through three horizontal slits: v = sqrt(g (z<sub>2</sub> &minus; z<sub>1</sub>)
 * (z<sub>3</sub> &minus; z<sub>2</sub>) / (2 h)), h the height of slit 2 above the line through 1 and 3. v is the horizontal
 * speed, exact for any launch angle.
 *
 * @param distances z<sub>1</sub>, z<sub>2</sub>, z<sub>3</sub> along the beam (m), rising
 * @param heights y<sub>1</sub>, y<sub>2</sub>, y<sub>3</sub> (m), upwards
 * @param gravity g (m/s&sup2;), positive
 */
public record GravitySelector(double[] distances, double[] heights, double gravity) {
    /** Standard acceleration of gravity, exact by definition (3rd General Conference on Weights and Measures, 1901). */
    public static final double STANDARD_GRAVITY = 9.80665;

    /** Copies and checks. */
    public GravitySelector {
        distances = distances.clone();
        heights = heights.clone();
        if (distances.length != 3 || heights.length != 3) {
            throw new IllegalArgumentException("a selector has three slits");
        }
        MatterWave.positive("distance from slit 1 to 2", distances[1] - distances[0]);
        MatterWave.positive("distance from slit 2 to 3", distances[2] - distances[1]);
        MatterWave.positive("gravity", gravity);
    }

    @Override
    public double[] distances() {
        return distances.clone();
    }

    @Override
    public double[] heights() {
        return heights.clone();
    }

    /**
     * Height of the middle slit above the line through the outer ones.
     *
     * @return h (m)
     */
    public double sag() {
        double part = (distances[1] - distances[0]) / (distances[2] - distances[0]);
        return heights[1] - (heights[0] + (heights[2] - heights[0]) * part);
    }

    private double product() {
        return 0.5 * gravity * (distances[1] - distances[0]) * (distances[2] - distances[1]);
    }

    /**
     * The selected velocity.
     *
     * @return v (m/s)
     * @throws IllegalArgumentException if the middle slit does not lie above the line: no velocity passes
     */
    public double velocity() {
        return Math.sqrt(product() / MatterWave.positive("height of the middle slit above the line", sag()));
    }

    /**
     * The selected velocity with its uncertainty from that of the height h: u(v) / v = u(h) / (2 h).
     *
     * @param sagUncertainty standard uncertainty of h (m)
     * @return v (m/s)
     */
    public Estimate velocity(double sagUncertainty) {
        double v = velocity();
        return new Estimate(v, 0.5 * v * sagUncertainty / sag());
    }

    /**
     * The velocities that pass slits of finite opening: h is the sum of three independent uniform errors; weighted with the
     * velocities of the source.
     *
     * @param openings heights of the three openings (m), not negative, not all 0
     * @param source law of the source at the detector
     * @param sagUncertainty standard uncertainty of h (m)
     * @return the distribution
     */
    public VelocityDistribution passed(double[] openings, VelocityLaw source, double sagUncertainty) {
        double part = (distances[1] - distances[0]) / (distances[2] - distances[0]);
        double[] spans = {openings[0] * (1 - part), openings[1], openings[2] * part};
        double reach = 0.5 * (spans[0] + spans[1] + spans[2]);
        MatterWave.positive("opening", reach);
        double sag = sag();
        double slowest = Math.sqrt(product() / (sag + reach));
        double fastest = sag > reach ? Math.sqrt(product() / (sag - reach)) : 20 * source.mode();
        int panels = 8;
        double[] nodes = new double[panels * GaussLegendre.order()];
        double[] weights = new double[nodes.length];
        GaussLegendre.fill(slowest, fastest, panels, nodes, weights);
        for (int i = 0; i < nodes.length; i++) {
            double v = nodes[i];
            weights[i] *= source.density(v) * shared(product() / (v * v) - sag, spans);
        }
        return VelocityDistribution.of(nodes, weights, 0.5 * velocity() * sagUncertainty / sag);
    }

    /** Density of the sum of three centred uniform variables, by second differences of the cubed positive part. */
    private static double shared(double x, double[] spans) {
        double widest = Math.max(spans[0], Math.max(spans[1], spans[2]));
        double a = Math.max(spans[0], 1e-4 * widest);
        double b = Math.max(spans[1], 1e-4 * widest);
        double c = Math.max(spans[2], 1e-4 * widest);
        double sum = 0;
        for (int corner = 0; corner < 8; corner++) {
            int signA = (corner & 1) == 0 ? 1 : -1;
            int signB = (corner & 2) == 0 ? 1 : -1;
            int signC = (corner & 4) == 0 ? 1 : -1;
            double at = x + 0.5 * (signA * a + signB * b + signC * c);
            double positive = at > 0 ? at * at : 0;
            sum += signA * signB * signC * positive;
        }
        return Math.max(0, sum / (2 * a * b * c));
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof GravitySelector that
                && java.util.Arrays.equals(distances, that.distances)
                && java.util.Arrays.equals(heights, that.heights)
                && Double.compare(gravity, that.gravity) == 0;
    }

    @Override
    public int hashCode() {
        return 31 * java.util.Arrays.hashCode(distances) + java.util.Arrays.hashCode(heights);
    }

    @Override
    public String toString() {
        return "slits at " + java.util.Arrays.toString(distances) + " m, heights " + java.util.Arrays.toString(heights)
                + " m";
    }
}
