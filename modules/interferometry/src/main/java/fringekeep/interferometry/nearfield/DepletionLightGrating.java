package fringekeep.interferometry.nearfield;

/**
 * A continuous standing light wave that removes molecules where it is bright.
 *
 * <p>Behind an imperfect mirror of reflectivity R the modulation is &radic;R of the full one, and the part that does
 * not vary, (1-&radic;R)&sup2;/4 of the full antinode, removes molecules everywhere alike.
 *
 * @param period   grating period (m), half the wavelength at normal incidence
 * @param laser    the laser; its recoil kernel plays no part
 * @param power    incident power (W), &ge; 0
 * @param response polarizability volume, and cross section for removal by one photon
 */
public record DepletionLightGrating(double period, LaserBeam laser, double power, OpticalResponse response)
        implements BeamGrating {
    /** Checks period and power. */
    public DepletionLightGrating {
        if (!(period > 0.0) || !(power >= 0.0 && power < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("a light grating needs a positive period and a power from 0 W, not "
                    + period + " m, " + power + " W");
        }
    }

    @Override
    public TalbotKernel at(double velocity, double height) {
        double profile = LightStrength.profile(height, laser.waist());
        double phase = LightStrength.beamPhase(response.polarizabilityVolume(), power, laser.waist(), velocity);
        double photons =
                LightStrength.beamPhotons(response.crossSection(), laser.wavelength(), power, laser.waist(), velocity);
        double modulation = LightStrength.modulation(laser.reflectivity());
        double flat = 0.25 * (1.0 - modulation) * (1.0 - modulation) * photons * profile;
        DepletionKernel kernel = new DepletionKernel(phase * profile * modulation, photons * profile * modulation);
        return flat == 0.0 ? kernel : new Dimmed(kernel, StrictMath.exp(-flat));
    }

    /** A kernel behind a loss that is the same everywhere. */
    private record Dimmed(TalbotKernel kernel, double factor) implements TalbotKernel {
        @Override
        public double quantum(int order, double xi) {
            return factor * kernel.quantum(order, xi);
        }

        @Override
        public double classical(int order, double xi) {
            return factor * kernel.classical(order, xi);
        }
    }
}
