package fringekeep.sample;

import java.util.Arrays;
import java.util.OptionalDouble;

/**
 * Masses of neutral particles on nodes.
 *
 * @param nodes ascending (kg)
 * @param weights sum 1
 * @param mean mean (kg)
 * @param deviation standard uncertainty of the mean (kg)
 * @param spread standard deviation of the distribution (kg)
 * @param passed share that a mass window let through, where one was asked for
 */
record MassDistribution(
        double[] nodes, double[] weights, double mean, double deviation, double spread, OptionalDouble passed) {
    /** From nodes in any order and shares not normalised; {@code relative} is the relative uncertainty of all nodes. */
    static MassDistribution of(double[] masses, double[] shares, double relative, OptionalDouble passed) {
        Integer[] order = new Integer[masses.length];
        Arrays.setAll(order, i -> i);
        Arrays.sort(order, (a, b) -> Double.compare(masses[a], masses[b]));
        double[] nodes = new double[masses.length];
        double[] weights = new double[masses.length];
        double total = 0;
        for (double share : shares) {
            total += share;
        }
        for (int i = 0; i < nodes.length; i++) {
            nodes[i] = masses[order[i]];
            weights[i] = shares[order[i]] / total;
        }
        double mean = mean(nodes, weights);
        return new MassDistribution(nodes, weights, mean, mean * relative, spread(nodes, weights, mean), passed);
    }

    private static double mean(double[] nodes, double[] weights) {
        double mean = 0;
        for (int i = 0; i < nodes.length; i++) {
            mean += nodes[i] * weights[i];
        }
        return mean;
    }

    private static double spread(double[] nodes, double[] weights, double mean) {
        double variance = 0;
        for (int i = 0; i < nodes.length; i++) {
            variance += (nodes[i] - mean) * (nodes[i] - mean) * weights[i];
        }
        return Math.sqrt(variance);
    }
}
