package fringekeep.interferometry.nearfield;

/** A grating as it stands in an apparatus: what it does depends on the speed and height of the molecule. */
public sealed interface BeamGrating permits MaterialGrating, StandingLightGrating, DepletionLightGrating {
    /**
     * Grating period.
     *
     * @return period (m)
     */
    double period();

    /**
     * The kernel that acts on one molecule.
     *
     * @param velocity speed (m/s), &gt; 0
     * @param height   height against the laser axis (m); material gratings do not depend on it
     * @return its Talbot kernel
     */
    TalbotKernel at(double velocity, double height);
}
