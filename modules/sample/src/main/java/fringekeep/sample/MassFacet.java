package fringekeep.sample;

import java.util.OptionalDouble;

/**
 * What later stages ask a compound for: the mass in flight.
 *
 * @param nodes masses in flight, ascending (kg); one node for a molecule
 * @param weights share of the particles at each node, same length, sum 1
 * @param mean mean mass in flight (kg)
 * @param meanDeviation standard uncertainty of the mean, which shifts all nodes in proportion (kg)
 * @param spread standard deviation of the distribution (kg); 0 for a molecule, whose isotopes are not spread out
 * @param monoisotopic mass in flight with the most abundant isotopes (kg), where a formula is given
 * @param charge charge in flight (elementary charges)
 */
public record MassFacet(
        double[] nodes,
        double[] weights,
        double mean,
        double meanDeviation,
        double spread,
        OptionalDouble monoisotopic,
        int charge) {
    /** Copies and checks lengths. */
    public MassFacet {
        nodes = nodes.clone();
        weights = weights.clone();
        if (nodes.length != weights.length || nodes.length == 0) {
            throw new IllegalArgumentException(nodes.length + " masses, " + weights.length + " weights");
        }
    }

    @Override
    public double[] nodes() {
        return nodes.clone();
    }

    @Override
    public double[] weights() {
        return weights.clone();
    }
}
