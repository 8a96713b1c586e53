package fringekeep.interferometry.nearfield;

/**
 * The laser of a standing-light-wave grating.
 *
 * @param wavelength   vacuum wavelength (m)
 * @param waist        1/e&sup2; intensity radius across the molecular beam (m)
 * @param reflectivity intensity reflectivity of the retro-mirror, 0 to 1
 * @param recoil       how absorption acts
 */
public record LaserBeam(double wavelength, double waist, double reflectivity, RecoilKernel recoil) {
    /** Checks the lengths and the reflectivity. */
    public LaserBeam {
        if (!(wavelength > 0.0) || !(waist > 0.0)) {
            throw new IllegalArgumentException(
                    "wavelength and waist are positive, not " + wavelength + " m and " + waist + " m");
        }
        if (!(LightStrength.modulation(reflectivity) > 0.0)) {
            throw new IllegalArgumentException("without a reflection there is no grating");
        }
    }

    /**
     * A laser before a perfect mirror, absorption acting coherently on one standing mode.
     *
     * @param wavelength vacuum wavelength (m)
     * @param waist      1/e&sup2; intensity radius across the molecular beam (m)
     * @return the laser
     */
    public static LaserBeam ideal(double wavelength, double waist) {
        return new LaserBeam(wavelength, waist, 1.0, RecoilKernel.STANDING_MODE_COHERENT);
    }
}
