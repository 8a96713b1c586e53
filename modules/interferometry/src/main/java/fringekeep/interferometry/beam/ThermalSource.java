package fringekeep.interferometry.beam;

import fringekeep.interferometry.constants.Codata2018;

/**
 * Velocities of a source at a temperature. a = sqrt(2 k T / m) throughout. Source: N. F. Ramsey, Molecular Beams, chapter
 * II.
 *
 * @param mass mass (kg), positive
 * @param temperature temperature (K), positive
 */
public record ThermalSource(double mass, double temperature) {
    /** Refuses what is not positive. */
    public ThermalSource {
        MatterWave.positive("mass", mass);
        MatterWave.positive("temperature", temperature);
    }

    /**
     * Mode of the velocities in the gas, a = sqrt(2 k T / m).
     *
     * @return velocity (m/s)
     */
    public double gasMode() {
        return Math.sqrt(2 * Codata2018.BOLTZMANN_CONSTANT * temperature / mass);
    }

    /**
     * Mean velocity in the gas, 2 a / sqrt(&pi;).
     *
     * @return velocity (m/s)
     */
    public double gasMean() {
        return 2 / Math.sqrt(Math.PI) * gasMode();
    }

    /**
     * Mode of the flux-weighted velocities of an effusive beam, a sqrt(3 / 2).
     *
     * @return velocity (m/s)
     */
    public double beamMode() {
        return Math.sqrt(1.5) * gasMode();
    }

    /**
     * Mean of the flux-weighted velocities, (3 / 4) sqrt(&pi;) a.
     *
     * @return velocity (m/s)
     */
    public double beamMean() {
        return 0.75 * Math.sqrt(Math.PI) * gasMode();
    }

    /**
     * Root mean square of the flux-weighted velocities, a sqrt(2).
     *
     * @return velocity (m/s)
     */
    public double beamRootMeanSquare() {
        return Math.sqrt(2) * gasMode();
    }

    /**
     * The flux-weighted law of the effusive beam.
     *
     * @return law v&sup3; exp(&minus;v&sup2; / a&sup2;)
     */
    public VelocityLaw beam() {
        return new VelocityLaw(3, 0, gasMode());
    }

    /**
     * The law in the gas.
     *
     * @return law v&sup2; exp(&minus;v&sup2; / a&sup2;)
     */
    public VelocityLaw gas() {
        return new VelocityLaw(2, 0, gasMode());
    }

    /**
     * The velocity an ideal adiabatic expansion ends with, sqrt(2 &gamma; / (&gamma; &minus; 1) k T / m).
     *
     * @param heatCapacityRatio &gamma;, above 1
     * @return velocity (m/s)
     */
    public double supersonicLimit(double heatCapacityRatio) {
        if (!(heatCapacityRatio > 1)) {
            throw new IllegalArgumentException("ratio of heat capacities must exceed 1, is " + heatCapacityRatio);
        }
        return Math.sqrt(heatCapacityRatio / (heatCapacityRatio - 1)) * gasMode();
    }

    /**
     * The velocity a heavy molecule seeded in a light gas ends with: the same for the mean mass of the mixture.
     *
     * @param heatCapacityRatio &gamma; of the mixture
     * @param meanMass mean mass of the mixture (kg)
     * @return velocity (m/s)
     */
    public double seededLimit(double heatCapacityRatio, double meanMass) {
        return new ThermalSource(meanMass, temperature).supersonicLimit(heatCapacityRatio);
    }
}
