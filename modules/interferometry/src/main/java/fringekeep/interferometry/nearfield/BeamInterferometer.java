package fringekeep.interferometry.nearfield;

/**
 * Three gratings of any sort in a molecular beam, and the fringe of a whole ensemble behind them.
 *
 * <p>Coefficients are averaged with their signs and with the transmission each class of molecules has; visibilities are
 * taken from the averaged series. Thread rule: immutable.
 *
 * @param first       first grating
 * @param second      second grating
 * @param third       third grating
 * @param separation1 distance from grating 1 to 2 (m)
 * @param separation2 distance from grating 2 to 3 (m)
 * @param divergence  standard deviation of the beam's transverse angle (rad); infinite if unlimited, which needs
 *     matched separations
 */
public record BeamInterferometer(
        BeamGrating first,
        BeamGrating second,
        BeamGrating third,
        double separation1,
        double separation2,
        double divergence) {
    /** Checks the lengths. */
    public BeamInterferometer {
        if (!(separation1 > 0.0) || !(separation2 > 0.0) || !(divergence >= 0.0)) {
            throw new IllegalArgumentException("separations are positive, not " + separation1 + " m, " + separation2
                    + " m; the divergence is at least 0, not " + divergence + " rad");
        }
    }

    /**
     * Fringe of an ensemble with orders (1, -2, 1).
     *
     * @param ensemble    speeds, masses, heights
     * @param description quantum or classical
     * @param highest     highest harmonic, &ge; 1
     * @return averaged series
     * @throws IllegalArgumentException if the three periods do not close with these orders
     */
    public FringeSeries fringe(BeamEnsemble ensemble, Description description, int highest) {
        TrainGeometry geometry = new TrainGeometry(first.period(), second.period(), third.period(), 1, -2, 1);
        return fringe(ensemble, new ThreeGratingFringe(geometry, description, highest));
    }

    /**
     * Fringe of an ensemble with chosen orders.
     *
     * @param ensemble speeds, masses, heights
     * @param train    geometry, description and harmonics; its periods must be those of the gratings
     * @return averaged series
     */
    public FringeSeries fringe(BeamEnsemble ensemble, ThreeGratingFringe train) {
        return ensemble.average((velocity, mass, height) -> {
            Passage passage = new Passage(separation1 / velocity, separation2 / velocity, mass, divergence * velocity);
            return train.series(
                    first.at(velocity, height), second.at(velocity, height), third.at(velocity, height), passage);
        });
    }
}
