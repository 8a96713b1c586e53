package fringekeep.interferometry.statistics;

/** A curve with parameters and its analytic derivatives. Implementations are pure. */
public interface ParametricModel {
    /**
     * Number of parameters p.
     *
     * @return p
     */
    int parameters();

    /**
     * Number of points n.
     *
     * @return n
     */
    int points();

    /**
     * Evaluates the curve.
     *
     * @param theta parameters, length p
     * @param values filled with the n values
     * @param slopes filled row by row: slopes[i p + j] is the derivative of value i by parameter j
     * @return false where the model has no meaning at these parameters
     */
    boolean evaluate(double[] theta, double[] values, double[] slopes);
}
