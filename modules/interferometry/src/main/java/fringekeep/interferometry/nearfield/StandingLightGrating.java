package fringekeep.interferometry.nearfield;

/**
 * A continuous standing light wave that the molecular beam crosses, acting by phase and by recoil of absorbed photons.
 *
 * <p>Behind an imperfect mirror the modulation is &radic;R of the full one; recoil is described for a perfect one only.
 *
 * @param period   grating period (m), half the wavelength at normal incidence
 * @param laser    the laser
 * @param power    incident power (W), &ge; 0
 * @param response polarizability volume and absorption cross section of the molecule
 */
public record StandingLightGrating(double period, LaserBeam laser, double power, OpticalResponse response)
        implements BeamGrating {
    /** Checks period, power, and that absorption meets a perfect mirror. */
    public StandingLightGrating {
        if (!(period > 0.0) || !(power >= 0.0 && power < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("a light grating needs a positive period and a power from 0 W, not "
                    + period + " m, " + power + " W");
        }
        if (response.crossSection() != 0.0 && laser.reflectivity() != 1.0) {
            throw new IllegalArgumentException("recoil from absorption is described for a perfect mirror only");
        }
    }

    @Override
    public TalbotKernel at(double velocity, double height) {
        double profile = LightStrength.profile(height, laser.waist());
        double phase = LightStrength.beamPhase(response.polarizabilityVolume(), power, laser.waist(), velocity);
        double photons =
                LightStrength.beamPhotons(response.crossSection(), laser.wavelength(), power, laser.waist(), velocity);
        double modulation = LightStrength.modulation(laser.reflectivity());
        return new LightKernel(phase * profile * modulation, photons * profile, laser.recoil());
    }
}
