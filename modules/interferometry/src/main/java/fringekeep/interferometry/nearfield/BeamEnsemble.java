package fringekeep.interferometry.nearfield;

/**
 * The molecules of a beam as three independent distributions: speed as the detector weights it, mass, and height in the
 * laser beam.
 *
 * @param velocities speeds (m/s), all &gt; 0
 * @param masses     masses (kg), all &gt; 0: isotopes, clusters behind a mass filter, particles
 * @param heights    heights y against the laser axis (m)
 */
public record BeamEnsemble(WeightedNodes velocities, WeightedNodes masses, WeightedNodes heights) {
    /** Checks that speeds and masses are positive. */
    public BeamEnsemble {
        requirePositive(velocities, "speed", "m/s");
        requirePositive(masses, "mass", "kg");
    }

    /**
     * One speed and mass on the laser axis.
     *
     * @param velocity speed (m/s)
     * @param mass     mass (kg)
     * @return the ensemble of one node
     */
    public static BeamEnsemble single(double velocity, double mass) {
        return new BeamEnsemble(WeightedNodes.single(velocity), WeightedNodes.single(mass), WeightedNodes.single(0.0));
    }

    private static void requirePositive(WeightedNodes nodes, String name, String unit) {
        for (int k = 0; k < nodes.size(); k++) {
            if (!(nodes.value(k) > 0.0)) {
                throw new IllegalArgumentException(
                        "every " + name + " is positive, not " + nodes.value(k) + " " + unit);
            }
        }
    }

    /** The fringe of one class of molecules. */
    @FunctionalInterface
    public interface ClassFringe {
        /**
         * Computes the fringe.
         *
         * @param velocity speed (m/s)
         * @param mass     mass (kg)
         * @param height   height (m)
         * @return its signed series, all with the same number of harmonics
         */
        FringeSeries of(double velocity, double mass, double height);
    }

    /**
     * Averages the signed Fourier coefficients; moduli and visibilities are to be taken from the result.
     *
     * @param fringe the fringe of each class of molecules
     * @return the mean series
     */
    public FringeSeries average(ClassFringe fringe) {
        double[] sum = new double[0];
        for (int i = 0; i < velocities.size(); i++) {
            for (int j = 0; j < masses.size(); j++) {
                for (int k = 0; k < heights.size(); k++) {
                    FringeSeries one = fringe.of(velocities.value(i), masses.value(j), heights.value(k));
                    sum = add(sum, one, velocities.weight(i) * masses.weight(j) * heights.weight(k));
                }
            }
        }
        return new FringeSeries(sum);
    }

    private static double[] add(double[] sum, FringeSeries one, double weight) {
        double[] target = sum.length == 0 ? new double[one.highest() + 1] : sum;
        for (int l = 0; l < target.length; l++) {
            target[l] = Math.fma(weight, one.coefficient(l), target[l]);
        }
        return target;
    }
}
