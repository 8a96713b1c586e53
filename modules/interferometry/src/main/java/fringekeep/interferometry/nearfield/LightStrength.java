package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.constants.Codata2018;

/**
 * How strongly a standing light wave acts: peak phase and mean number of absorbed photons at the antinode.
 *
 * <p>A retro-reflected Gaussian beam of incident power P and 1/e&sup2; intensity radius w_y across the molecular beam,
 * crossed at speed v: &phi;0 = 8 &radic;(2&pi;) &alpha;' P/(&#x127; c w_y v), n0 = (8/&radic;(2&pi;)) &sigma;
 * &lambda; P/(h c w_y v), with &alpha;' the polarizability volume and antinode intensity four times the incident one
 * (integral of the standing-wave intensity along the path). Independent of the radius along the beam. Accuracy:
 * rounding.
 */
public final class LightStrength {
    private LightStrength() {}

    /**
     * Peak phase of a continuous standing wave.
     *
     * @param polarizabilityVolume &alpha;' = &alpha;/(4&pi;&epsilon;0) (m^3), any sign
     * @param power                incident, single-pass power (W)
     * @param waist                1/e&sup2; intensity radius across the molecular beam (m)
     * @param velocity             speed (m/s)
     * @return &phi;0 on the laser axis (rad)
     */
    public static double beamPhase(double polarizabilityVolume, double power, double waist, double velocity) {
        return 8.0
                * Math.sqrt(2.0 * Math.PI)
                * polarizabilityVolume
                * power
                / (Codata2018.REDUCED_PLANCK_CONSTANT * Codata2018.SPEED_OF_LIGHT * waist * velocity);
    }

    /**
     * Mean number of photons absorbed at the antinode of a continuous standing wave.
     *
     * @param crossSection absorption cross section (m^2)
     * @param wavelength   laser wavelength (m)
     * @param power        incident, single-pass power (W)
     * @param waist        1/e&sup2; intensity radius across the molecular beam (m)
     * @param velocity     speed (m/s)
     * @return n0 on the laser axis
     */
    public static double beamPhotons(
            double crossSection, double wavelength, double power, double waist, double velocity) {
        return 4.0 * runningPhotons(crossSection, wavelength, power, waist, velocity);
    }

    /**
     * Mean number of photons absorbed from a single running beam.
     *
     * @param crossSection absorption cross section (m^2)
     * @param wavelength   laser wavelength (m)
     * @param power        power (W)
     * @param waist        1/e&sup2; intensity radius across the molecular beam (m)
     * @param velocity     speed (m/s)
     * @return the mean number &radic;(2/&pi;) &sigma; &lambda; P/(h c w_y v) on the laser axis
     */
    public static double runningPhotons(
            double crossSection, double wavelength, double power, double waist, double velocity) {
        return Math.sqrt(2.0 / Math.PI)
                * crossSection
                * wavelength
                * power
                / (Codata2018.PLANCK_CONSTANT * Codata2018.SPEED_OF_LIGHT * waist * velocity);
    }

    /**
     * Peak phase of a pulsed standing wave.
     *
     * @param polarizabilityVolume &alpha;' (m^3)
     * @param fluence              incident, single-pass energy per area F (J/m^2)
     * @return &phi;0 = 8&pi; &alpha;' F/(&#x127;c) (rad)
     */
    public static double pulsePhase(double polarizabilityVolume, double fluence) {
        return 8.0
                * Math.PI
                * polarizabilityVolume
                * fluence
                / (Codata2018.REDUCED_PLANCK_CONSTANT * Codata2018.SPEED_OF_LIGHT);
    }

    /**
     * Mean number of photons absorbed at the antinode of a pulsed standing wave.
     *
     * @param crossSection absorption cross section (m^2)
     * @param wavelength   laser wavelength (m)
     * @param fluence      incident, single-pass energy per area F (J/m^2)
     * @return n0 = 4 &sigma; &lambda; F/(hc)
     */
    public static double pulsePhotons(double crossSection, double wavelength, double fluence) {
        return 4.0 * crossSection * wavelength * fluence / (Codata2018.PLANCK_CONSTANT * Codata2018.SPEED_OF_LIGHT);
    }

    /**
     * Factor of both strengths away from the laser axis.
     *
     * @param height height y of the molecule (m)
     * @param waist  1/e&sup2; intensity radius (m)
     * @return exp(-2y&sup2;/w&sup2;)
     */
    public static double profile(double height, double waist) {
        double ratio = height / waist;
        return StrictMath.exp(-2.0 * ratio * ratio);
    }

    /**
     * Modulation of a standing wave behind an imperfect mirror, against four for a perfect one.
     *
     * @param reflectivity intensity reflectivity R, 0 to 1
     * @return &radic;R; the rest, (1-&radic;R)&sup2; of the incident intensity, does not vary along the grating
     */
    public static double modulation(double reflectivity) {
        if (!(reflectivity >= 0.0 && reflectivity <= 1.0)) {
            throw new IllegalArgumentException("a mirror reflects between 0 and 1, not " + reflectivity);
        }
        return Math.sqrt(reflectivity);
    }
}
