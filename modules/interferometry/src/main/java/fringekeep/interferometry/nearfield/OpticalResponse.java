package fringekeep.interferometry.nearfield;

/**
 * What a molecule does in the laser's light.
 *
 * @param polarizabilityVolume optical polarizability volume &alpha;/(4&pi;&epsilon;0) (m^3)
 * @param crossSection         absorption cross section (m^2)
 */
public record OpticalResponse(double polarizabilityVolume, double crossSection) {
    /** Checks that both are finite. */
    public OpticalResponse {
        if (!Double.isFinite(polarizabilityVolume) || !Double.isFinite(crossSection)) {
            throw new IllegalArgumentException("polarizability and cross section must be finite, not "
                    + polarizabilityVolume + " m^3 and " + crossSection + " m^2");
        }
    }
}
