package fringekeep.interferometry.farfield;

import fringekeep.interferometry.constants.Codata2018;

/**
 * Angles of diffraction orders and the numbers that tell thin from thick gratings.
 *
 * <p>Accuracy: rounding. Thread rule: stateless.
 */
public final class Diffraction {
    private Diffraction() {}

    /**
     * De Broglie wavelength.
     *
     * @param mass     mass (kg), &gt; 0
     * @param velocity speed (m/s), &gt; 0
     * @return h/(mv) (m)
     */
    public static double wavelength(double mass, double velocity) {
        return Codata2018.PLANCK_CONSTANT / (mass * velocity);
    }

    /**
     * Place of a diffraction order on a flat screen at normal incidence.
     *
     * @param order      diffraction order n
     * @param wavelength de Broglie wavelength (m)
     * @param period     grating period d (m)
     * @param distance   distance of the screen (m)
     * @return x (m) with sin(atan(x/L)) = n&lambda;/d
     */
    public static double orderPosition(int order, double wavelength, double period, double distance) {
        double sine = order * wavelength / period;
        if (!(Math.abs(sine) < 1.0)) {
            throw new IllegalArgumentException("order " + order + " does not exist: its sine would be " + sine);
        }
        return distance * sine / Math.sqrt(1.0 - sine * sine);
    }

    /**
     * Angle of incidence at which one order is reflected.
     *
     * @param wavelength de Broglie wavelength (m)
     * @param period     grating period d (m)
     * @return &theta;_B (rad) with &lambda; = 2 d sin &theta;_B; neighbouring orders lie 2&theta;_B apart
     */
    public static double braggAngle(double wavelength, double period) {
        return StrictMath.asin(wavelength / (2.0 * period));
    }

    /**
     * Klein-Cook parameter: well below one the grating is thin (Raman-Nath), well above one it is thick (Bragg), as
     * long as its phase is of order one.
     *
     * @param wavelength de Broglie wavelength (m)
     * @param thickness  length of the grating along the beam (m)
     * @param period     grating period d (m)
     * @return Q = 2&pi; &lambda; z/d&sup2;
     */
    public static double kleinCook(double wavelength, double thickness, double period) {
        return 2.0 * Math.PI * wavelength * thickness / (period * period);
    }

    /**
     * Fall of a molecule, which sorts slow from fast on a screen.
     *
     * @param distance distance flown horizontally (m)
     * @param velocity speed (m/s)
     * @param gravity  acceleration of gravity (m/s^2)
     * @return g L&sup2;/(2v&sup2;) (m)
     */
    public static double fall(double distance, double velocity, double gravity) {
        double time = distance / velocity;
        return 0.5 * gravity * time * time;
    }

    /**
     * Speed of a molecule that fell a height, for a beam that left the collimator horizontally.
     *
     * @param distance distance flown horizontally (m)
     * @param height   height fallen (m), &gt; 0
     * @param gravity  acceleration of gravity (m/s^2)
     * @return L &radic;(g/(2h)) (m/s)
     */
    public static double velocityOfFall(double distance, double height, double gravity) {
        if (!(height > 0.0)) {
            throw new IllegalArgumentException("a speed needs a height fallen above zero, not " + height + " m");
        }
        return distance * Math.sqrt(gravity / (2.0 * height));
    }
}
