package fringekeep.interferometry.nearfield;

/**
 * A slit - light - slit interferometer for visibility against laser power.
 *
 * @param geometry    periods and orders; the light grating's period is the second
 * @param first       first grating
 * @param third       third grating
 * @param separation1 distance from grating 1 to 2 (m)
 * @param separation2 distance from grating 2 to 3 (m)
 * @param divergence  standard deviation of the beam's transverse angle (rad); infinite if unlimited, which needs
 *     matched separations
 * @param laser       the laser of the second grating
 */
public record PowerSeriesSetup(
        TrainGeometry geometry,
        MaterialGrating first,
        MaterialGrating third,
        double separation1,
        double separation2,
        double divergence,
        LaserBeam laser) {
    /** Checks the lengths. */
    public PowerSeriesSetup {
        if (!(separation1 > 0.0) || !(separation2 > 0.0) || !(divergence >= 0.0)) {
            throw new IllegalArgumentException("separations are positive, not " + separation1 + " m, " + separation2
                    + " m; the divergence is at least 0, not " + divergence + " rad");
        }
    }

    /**
     * Equal periods, separations and open fractions, no wall forces, a perfect mirror.
     *
     * @param period       grating period d (m)
     * @param openFraction open fraction of the outer gratings
     * @param separation   distance L between neighbours (m)
     * @param laser        the laser
     * @return the set-up
     */
    public static PowerSeriesSetup symmetric(double period, double openFraction, double separation, LaserBeam laser) {
        MaterialGrating outer = MaterialGrating.bare(period, openFraction);
        return new PowerSeriesSetup(
                TrainGeometry.equal(period), outer, outer, separation, separation, Double.POSITIVE_INFINITY, laser);
    }

    /**
     * The same with both separations changed by one factor.
     *
     * @param factor factor, &gt; 0
     * @return the stretched set-up
     */
    public PowerSeriesSetup withSeparations(double factor) {
        return new PowerSeriesSetup(
                geometry, first, third, separation1 * factor, separation2 * factor, divergence, laser);
    }

    /**
     * The same with another laser.
     *
     * @param other the laser
     * @return the set-up
     */
    public PowerSeriesSetup withLaser(LaserBeam other) {
        return new PowerSeriesSetup(geometry, first, third, separation1, separation2, divergence, other);
    }
}
