package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.special.GaussRule;
import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;

/**
 * A distribution as quadrature nodes: the mean of f is &Sigma; w_i f(x_i). Weights sum to one.
 *
 * <p>Thread rule: immutable.
 */
public final class WeightedNodes {
    private final double[] values;
    private final double[] weights;

    private WeightedNodes(double[] values, double[] weights) {
        this.values = values;
        this.weights = weights;
    }

    /**
     * Takes nodes as given and scales the weights to sum to one.
     *
     * @param values  nodes, finite, at least one
     * @param weights one per node, finite, &ge; 0, not all zero
     * @return the distribution; nodes of weight zero are left out
     * @throws IllegalArgumentException if lengths differ or a value is out of range
     */
    public static WeightedNodes of(double[] values, double[] weights) {
        if (values.length == 0 || values.length != weights.length) {
            throw new IllegalArgumentException("a distribution needs one weight per node: " + values.length + " nodes, "
                    + weights.length + " weights");
        }
        double sum = 0.0;
        int kept = 0;
        for (int k = 0; k < values.length; k++) {
            if (!Double.isFinite(values[k]) || !(weights[k] >= 0.0 && weights[k] < Double.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException("node " + k + " has value " + values[k] + " and weight " + weights[k]
                        + "; both must be finite");
            }
            sum += weights[k];
            kept += weights[k] > 0.0 ? 1 : 0;
        }
        if (!(sum > 0.0)) {
            throw new IllegalArgumentException("all weights are zero");
        }
        return normalised(values, weights, sum, kept);
    }

    private static WeightedNodes normalised(double[] values, double[] weights, double sum, int kept) {
        double[] keptValues = new double[kept];
        double[] keptWeights = new double[kept];
        int at = 0;
        for (int k = 0; k < values.length; k++) {
            if (weights[k] > 0.0) {
                keptValues[at] = values[k];
                keptWeights[at] = weights[k] / sum;
                at++;
            }
        }
        return new WeightedNodes(keptValues, keptWeights);
    }

    /**
     * A single value.
     *
     * @param value the value
     * @return one node of weight one
     */
    public static WeightedNodes single(double value) {
        return of(new double[] {value}, new double[] {1.0});
    }

    /**
     * A normal distribution on 30 panels of 8 Gauss-Legendre nodes over six standard deviations to either side.
     *
     * <p>The choice for speeds: Talbot oscillations have no limit as v goes to zero, which a Gauss-Hermite rule of 60
     * nodes follows to 5e-4 only. For a light grating at four Talbot lengths these nodes give the visibility
     * to 1e-10 where the mean lies ten deviations above zero, to 3e-4 at five and a half; give broader beams more
     * panels (120 panels: 3e-6).
     *
     * @param mean      mean
     * @param deviation standard deviation, &ge; 0; zero gives a single node
     * @param lowest    values below are cut off (a speed must exceed zero); the rest is normalised again
     * @return the distribution
     */
    public static WeightedNodes normal(double mean, double deviation, double lowest) {
        return normal(mean, deviation, lowest, 30);
    }

    /**
     * A normal distribution on a chosen number of panels, for phases that vary fast with the value.
     *
     * @param mean      mean
     * @param deviation standard deviation, &ge; 0; zero gives a single node
     * @param lowest    values below are cut off; the rest is normalised again
     * @param panels    panels of 8 Gauss-Legendre nodes over six standard deviations to either side, &ge; 1
     * @return the distribution
     */
    public static WeightedNodes normal(double mean, double deviation, double lowest, int panels) {
        if (deviation == 0.0) {
            return single(mean);
        }
        return ofDensity(
                v -> StrictMath.exp(-0.5 * (v - mean) * (v - mean) / (deviation * deviation)),
                Math.max(lowest, mean - 6.0 * deviation),
                mean + 6.0 * deviation,
                panels);
    }

    /**
     * A normal distribution by Gauss-Hermite nodes, without those at or below a limit: few nodes for smooth functions.
     *
     * @param mean      mean
     * @param deviation standard deviation, &gt; 0
     * @param points    nodes, 1 to 200
     * @param above     nodes must exceed this; the weights left sum to one again
     * @return the distribution
     */
    public static WeightedNodes gaussHermite(double mean, double deviation, int points, double above) {
        GaussRule rule = GaussRule.hermite(points);
        double[] values = rule.nodes();
        double[] weights = rule.weights();
        for (int k = 0; k < points; k++) {
            values[k] = Math.fma(Math.sqrt(2.0) * deviation, values[k], mean);
            weights[k] = values[k] > above ? weights[k] : 0.0;
        }
        return of(values, weights);
    }

    /**
     * A density on an interval, by composite Gauss-Legendre panels of 8 nodes.
     *
     * @param density probability density, any positive factor, &ge; 0
     * @param low     lower end
     * @param high    upper end, &gt; low
     * @param panels  number of panels, &ge; 1
     * @return the distribution on 8 nodes a panel
     */
    public static WeightedNodes ofDensity(DoubleUnaryOperator density, double low, double high, int panels) {
        if (!(high > low) || panels < 1) {
            throw new IllegalArgumentException("a density needs an interval and panels: " + low + " to " + high);
        }
        GaussRule rule = GaussRule.legendre(8);
        double[] nodes = rule.nodes();
        double[] factors = rule.weights();
        double half = 0.5 * (high - low) / panels;
        double[] values = new double[8 * panels];
        double[] weights = new double[8 * panels];
        for (int k = 0; k < values.length; k++) {
            double centre = low + (2.0 * (k / 8) + 1.0) * half;
            values[k] = Math.fma(half, nodes[k % 8], centre);
            weights[k] = factors[k % 8] * density.applyAsDouble(values[k]);
        }
        return of(values, weights);
    }

    /**
     * The shifted flux form v&sup3; exp(-(v-v0)&sup2;/vw&sup2;), as a detector of flux sees a beam.
     *
     * @param shift  v0 (m/s)
     * @param width  1/e half width vw (m/s), &gt; 0
     * @param lowest lowest speed taken (m/s), &gt; 0: Talbot oscillations have no limit as v goes to zero
     * @param panels panels of 8 nodes
     * @return speeds from the lowest to v0 + 6 vw
     */
    public static WeightedNodes shiftedFlux(double shift, double width, double lowest, int panels) {
        if (!(lowest > 0.0)) {
            throw new IllegalArgumentException("the lowest speed taken must exceed zero, not " + lowest + " m/s");
        }
        return ofDensity(
                v -> v * v * v * StrictMath.exp(-(v - shift) * (v - shift) / (width * width)),
                lowest,
                shift + 6.0 * width,
                panels);
    }

    /**
     * A uniform distribution by one Gauss-Legendre rule, for the height of a beam.
     *
     * @param low    lower end
     * @param high   upper end; equal ends give a single node
     * @param points nodes, 1 to 200
     * @return the distribution
     */
    public static WeightedNodes uniform(double low, double high, int points) {
        if (low == high) {
            return single(low);
        }
        GaussRule rule = GaussRule.legendre(points);
        double[] values = rule.nodes();
        for (int k = 0; k < points; k++) {
            values[k] = 0.5 * (low + high) + 0.5 * (high - low) * values[k];
        }
        return of(values, rule.weights());
    }

    /**
     * The same nodes as a detector of density sees them: weights divided by the value.
     *
     * @return the distribution with weights w_i/x_i
     */
    public WeightedNodes dividedByValue() {
        double[] divided = weights.clone();
        for (int k = 0; k < divided.length; k++) {
            divided[k] /= values[k];
        }
        return of(values, divided);
    }

    /**
     * The same distribution on a stretched axis.
     *
     * @param factor factor of every value, &gt; 0
     * @return the stretched distribution
     */
    public WeightedNodes stretched(double factor) {
        double[] stretched = values.clone();
        for (int k = 0; k < stretched.length; k++) {
            stretched[k] *= factor;
        }
        return new WeightedNodes(stretched, weights);
    }

    /**
     * Number of nodes.
     *
     * @return at least one
     */
    public int size() {
        return values.length;
    }

    /**
     * One node.
     *
     * @param index from 0
     * @return its value
     */
    public double value(int index) {
        return values[index];
    }

    /**
     * Weight of one node.
     *
     * @param index from 0
     * @return its weight
     */
    public double weight(int index) {
        return weights[index];
    }

    /**
     * Mean of a function.
     *
     * @param function the function
     * @return &Sigma; w_i f(x_i)
     */
    public double mean(DoubleUnaryOperator function) {
        double sum = 0.0;
        for (int k = 0; k < values.length; k++) {
            sum = Math.fma(weights[k], function.applyAsDouble(values[k]), sum);
        }
        return sum;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof WeightedNodes nodes
                && Arrays.equals(values, nodes.values)
                && Arrays.equals(weights, nodes.weights);
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(values) + Arrays.hashCode(weights);
    }

    @Override
    public String toString() {
        return values.length + " nodes from " + values[0] + " to " + values[values.length - 1];
    }
}
