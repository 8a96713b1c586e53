package fringekeep.interferometry.molecule;

/** A curve with analytic derivatives, as the solver sees it. */
interface CurveModel {
    /**
     * Number of parameters.
     *
     * @return at least one
     */
    int parameters();

    /**
     * Computes the curve at every data point.
     *
     * @param parameters values
     * @param values     target, one per point
     * @param jacobian   target, [point][parameter]
     */
    void evaluate(double[] parameters, double[] values, double[][] jacobian);
}
