package fringekeep.interferometry.nearfield;

/**
 * One molecule's way through the train: times between gratings, mass, and the spread of transverse velocities of the
 * source before the first grating.
 *
 * @param firstTime               flight time T1 from grating 1 to 2 (s), &gt; 0
 * @param secondTime              flight time T2 from grating 2 to 3 (s), &gt; 0
 * @param mass                    mass of the molecule (kg), &gt; 0
 * @param transverseVelocitySpread standard deviation &sigma;_v of the transverse velocity (m/s); infinite for a source
 *     of unlimited divergence, which then needs matched separations
 */
public record Passage(double firstTime, double secondTime, double mass, double transverseVelocitySpread) {
    /** Checks every part. */
    public Passage {
        if (!(firstTime > 0.0 && secondTime > 0.0 && mass > 0.0 && transverseVelocitySpread >= 0.0)) {
            throw new IllegalArgumentException("times, mass and velocity spread are positive, not " + firstTime + " s, "
                    + secondTime + " s, " + mass + " kg, " + transverseVelocitySpread + " m/s");
        }
    }

    /**
     * A molecule of a beam through a train with equal distances.
     *
     * @param separation distance L between neighbouring gratings (m)
     * @param velocity   speed (m/s)
     * @param mass       mass (kg)
     * @return the passage with T1 = T2 = L/v and a source of unlimited divergence
     */
    public static Passage ofBeam(double separation, double velocity, double mass) {
        double time = separation / velocity;
        return new Passage(time, time, mass, Double.POSITIVE_INFINITY);
    }

    /**
     * Two pulsed gratings' worth of free flight with equal pulse separations.
     *
     * @param separation pulse separation T (s)
     * @param mass       mass (kg)
     * @return the passage
     */
    public static Passage ofPulses(double separation, double mass) {
        return new Passage(separation, separation, mass, Double.POSITIVE_INFINITY);
    }
}
