package fringekeep.archive.facet;

/**
 * A distribution on nodes: weights that sum to 1.
 *
 * @param quantity such as {@code velocity} or {@code mass}
 * @param unit UCUM code of the SI unit
 * @param nodes ascending (SI)
 * @param weights same length, not negative, sum 1: share of the detected particles at each node
 * @param mean mean (SI)
 * @param meanDeviation standard uncertainty of the mean (SI), the part that shifts all nodes together
 * @param spread standard deviation of the distribution (SI)
 */
public record Distribution(
        String quantity,
        String unit,
        double[] nodes,
        double[] weights,
        double mean,
        double meanDeviation,
        double spread) {
    /** Copies and checks lengths. */
    public Distribution {
        nodes = nodes.clone();
        weights = weights.clone();
        if (nodes.length != weights.length || nodes.length == 0) {
            throw new IllegalArgumentException(nodes.length + " nodes, " + weights.length + " weights");
        }
    }
}
