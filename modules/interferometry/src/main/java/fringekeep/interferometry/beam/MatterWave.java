package fringekeep.interferometry.beam;

import fringekeep.interferometry.constants.Codata2018;

/** Wavelengths and Talbot scales of a molecular beam; constants of CODATA 2018. Relative error below 1e-15. */
public final class MatterWave {
    private MatterWave() {}

    /**
     * The de Broglie wavelength h / (m v).
     *
     * @param mass mass (kg), positive
     * @param velocity velocity (m/s), positive
     * @return wavelength (m)
     */
    public static double wavelength(double mass, double velocity) {
        return Codata2018.PLANCK_CONSTANT / (positive("mass", mass) * positive("velocity", velocity));
    }

    /**
     * The Talbot length d&sup2; / &lambda; = m v d&sup2; / h. Some authors call twice this the Talbot length.
     *
     * @param mass mass (kg), positive
     * @param velocity velocity (m/s), positive
     * @param period grating period (m), positive
     * @return length (m)
     */
    public static double talbotLength(double mass, double velocity, double period) {
        return talbotTime(mass, period) * positive("velocity", velocity);
    }

    /**
     * The Talbot time m d&sup2; / h.
     *
     * @param mass mass (kg), positive
     * @param period grating period (m), positive
     * @return time (s)
     */
    public static double talbotTime(double mass, double period) {
        return positive("mass", mass) * positive("period", period) * period / Codata2018.PLANCK_CONSTANT;
    }

    static double positive(String what, double value) {
        if (!(value > 0) || value == Double.POSITIVE_INFINITY) {
            throw new IllegalArgumentException(what + " must be positive, is " + value);
        }
        return value;
    }
}
