package fringekeep.interferometry.beam;

import java.util.Arrays;

/**
 * A velocity distribution as models average over it.
 *
 * @param nodes velocities (m/s), positive, rising
 * @param weights weights, not negative, of sum 1
 * @param mean mean velocity (m/s)
 * @param meanUncertainty standard uncertainty of the mean (m/s)
 * @param spread standard deviation of the velocities (m/s)
 */
public record VelocityDistribution(
        double[] nodes, double[] weights, double mean, double meanUncertainty, double spread) {
    /** Copies and checks. */
    public VelocityDistribution {
        nodes = nodes.clone();
        weights = weights.clone();
        if (nodes.length != weights.length || nodes.length == 0) {
            throw new IllegalArgumentException(nodes.length + " nodes and " + weights.length + " weights");
        }
        double sum = 0;
        for (int i = 0; i < nodes.length; i++) {
            MatterWave.positive("velocity of node " + i, nodes[i]);
            if (!(weights[i] >= 0)) {
                throw new IllegalArgumentException("weight of node " + i + " is " + weights[i]);
            }
            sum += weights[i];
        }
        if (Math.abs(sum - 1) > 1e-9) {
            throw new IllegalArgumentException("weights add to " + sum + ", not 1");
        }
    }

    /**
     * From unnormalised weights; mean and spread are those of the nodes.
     *
     * @param nodes velocities (m/s)
     * @param weights weights, not negative, not all 0
     * @param meanUncertainty standard uncertainty of the mean (m/s)
     * @return the distribution
     */
    public static VelocityDistribution of(double[] nodes, double[] weights, double meanUncertainty) {
        double sum = 0;
        double first = 0;
        for (int i = 0; i < nodes.length; i++) {
            sum += weights[i];
            first += weights[i] * nodes[i];
        }
        if (!(sum > 0)) {
            throw new IllegalArgumentException("all weights are 0");
        }
        double[] normal = new double[weights.length];
        double second = 0;
        for (int i = 0; i < nodes.length; i++) {
            normal[i] = weights[i] / sum;
            second += normal[i] * (nodes[i] - first / sum) * (nodes[i] - first / sum);
        }
        return new VelocityDistribution(nodes, normal, first / sum, meanUncertainty, Math.sqrt(second));
    }

    /**
     * A normal distribution given by mean and spread, as quoted from elsewhere, cut at 3.5 spreads and above 0.
     *
     * @param mean mean velocity (m/s), positive
     * @param meanUncertainty its standard uncertainty (m/s)
     * @param spread standard deviation (m/s), 0 for a single velocity
     * @return 64 equally spaced nodes, or one
     */
    public static VelocityDistribution quoted(double mean, double meanUncertainty, double spread) {
        if (spread == 0) {
            return new VelocityDistribution(new double[] {mean}, new double[] {1}, mean, meanUncertainty, 0);
        }
        int n = 64;
        double low = Math.max(mean - 3.5 * spread, 0.02 * mean);
        double high = mean + 3.5 * spread;
        double[] nodes = new double[n];
        double[] weights = new double[n];
        for (int i = 0; i < n; i++) {
            nodes[i] = low + (high - low) * (i + 0.5) / n;
            double u = (nodes[i] - mean) / spread;
            weights[i] = StrictMath.exp(-0.5 * u * u);
        }
        VelocityDistribution shape = of(nodes, weights, meanUncertainty);
        return new VelocityDistribution(shape.nodes, shape.weights, mean, meanUncertainty, spread);
    }

    @Override
    public double[] nodes() {
        return nodes.clone();
    }

    @Override
    public double[] weights() {
        return weights.clone();
    }

    /**
     * What a detector sees that a slow molecule crosses for longer: weights over velocity.
     *
     * @return the distribution seen
     */
    public VelocityDistribution seenByDensityDetector() {
        double[] seen = new double[weights.length];
        for (int i = 0; i < seen.length; i++) {
            seen[i] = weights[i] / nodes[i];
        }
        return of(nodes, seen, meanUncertainty);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof VelocityDistribution that
                && Arrays.equals(nodes, that.nodes)
                && Arrays.equals(weights, that.weights)
                && Double.compare(mean, that.mean) == 0
                && Double.compare(meanUncertainty, that.meanUncertainty) == 0
                && Double.compare(spread, that.spread) == 0;
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(nodes) + Arrays.hashCode(weights);
    }

    @Override
    public String toString() {
        return nodes.length + " nodes, mean " + mean + "(" + meanUncertainty + ") m/s, spread " + spread + " m/s";
    }
}
