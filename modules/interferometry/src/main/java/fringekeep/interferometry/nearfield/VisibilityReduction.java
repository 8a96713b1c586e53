package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.special.Bessel;
import fringekeep.interferometry.special.HalfTurn;
import fringekeep.interferometry.special.Sinc;

/**
 * Factors by which imperfections reduce the visibility of a three-grating interferometer of period d, the fringe
 * coordinate being x1 - 2 x2 + x3. Each is exact for its model and multiplies the others where causes are independent.
 *
 * <p>All derived from that coordinate; accuracy is rounding. Lengths in metres, times in seconds.
 */
public final class VisibilityReduction {
    private VisibilityReduction() {}

    /**
     * Sinusoidal vibration of all three gratings together.
     *
     * @param amplitude amplitude A (m)
     * @param frequency frequency (Hz), not angular
     * @param time      flight time T between neighbouring gratings (s)
     * @param period    grating period d (m)
     * @return |J_0(8&pi; (A/d) sin&sup2;(&pi; f T))|; one if the flight takes whole vibration periods
     */
    public static double commonVibration(double amplitude, double frequency, double time, double period) {
        double sine = HalfTurn.sin(frequency * time);
        return Math.abs(Bessel.j(0, 8.0 * Math.PI * amplitude / period * sine * sine));
    }

    /**
     * Sinusoidal vibration of each grating by itself, with phases that have nothing to do with each other.
     *
     * @param amplitude1 amplitude of the first grating (m)
     * @param amplitude2 amplitude of the second grating (m)
     * @param amplitude3 amplitude of the third grating (m)
     * @param period     grating period d (m)
     * @return |J_0(2&pi;A1/d) J_0(4&pi;A2/d) J_0(2&pi;A3/d)|
     */
    public static double independentVibration(double amplitude1, double amplitude2, double amplitude3, double period) {
        double turn = 2.0 * Math.PI / period;
        return Math.abs(
                Bessel.j(0, turn * amplitude1) * Bessel.j(0, 2.0 * turn * amplitude2) * Bessel.j(0, turn * amplitude3));
    }

    /**
     * Random displacement of the fringe with a normal distribution.
     *
     * @param deviation standard deviation of the phase (rad)
     * @return exp(-&sigma;&sup2;/2)
     */
    public static double phaseJitter(double deviation) {
        return StrictMath.exp(-0.5 * deviation * deviation);
    }

    /**
     * Roll of one outer grating about the beam axis against the others.
     *
     * @param angle  roll angle (rad)
     * @param height beam height, uniform (m)
     * @param period grating period (m)
     * @return |sinc(&pi; h tan&theta;/d)|
     */
    public static double outerRoll(double angle, double height, double period) {
        return Math.abs(Sinc.ofHalfTurns(height * StrictMath.tan(angle) / period));
    }

    /**
     * Roll of the centre grating, which counts twice.
     *
     * @param angle  roll angle (rad)
     * @param height beam height, uniform (m)
     * @param period grating period (m)
     * @return |sinc(2&pi; h tan&theta;/d)|
     */
    public static double centreRoll(double angle, double height, double period) {
        return Math.abs(Sinc.ofHalfTurns(2.0 * height * StrictMath.tan(angle) / period));
    }

    /**
     * Periods whose wave numbers do not close across the beam.
     *
     * @param period1 period of the first grating (m)
     * @param period2 period of the second grating (m)
     * @param period3 period of the third grating (m)
     * @param width   beam width, uniform (m)
     * @return |sinc(&pi; X (1/d1 - 2/d2 + 1/d3))|
     */
    public static double periodMismatch(double period1, double period2, double period3, double width) {
        return Math.abs(Sinc.ofHalfTurns(width * (1.0 / period1 - 2.0 / period2 + 1.0 / period3)));
    }

    /**
     * Unequal flight times between the gratings: a molecule of transverse velocity v moves the fringe by v &tau;.
     *
     * <p>Source: the average of exp(2 &pi; i v &tau; / d) over normal velocities; with pulsed gratings the first grating must
     * carry no phase for this to be all (otherwise the whole fringe is to be computed).
     *
     * @param deviation standard deviation of the transverse velocities (m/s), &ge; 0
     * @param mismatch &tau;, second less first flight time (s)
     * @param period fringe period d (m), &gt; 0
     * @return visibility left, exp(&minus;2 &pi;&sup2; &sigma;&sup2; &tau;&sup2; / d&sup2;)
     */
    public static double timeMismatch(double deviation, double mismatch, double period) {
        double turns = deviation * mismatch / period;
        return StrictMath.exp(-2.0 * Math.PI * Math.PI * turns * turns);
    }

    /**
     * Phase by a constant acceleration along the grating vector.
     *
     * @param acceleration component along x (m/s^2): g times the sine of the gratings' tilt
     * @param time         flight time T between neighbouring gratings (s)
     * @param period       grating period (m)
     * @return (2&pi;/d) a T&sup2; (rad)
     */
    public static double accelerationPhase(double acceleration, double time, double period) {
        return 2.0 * Math.PI / period * acceleration * time * time;
    }

    /**
     * Phase by rotation of the apparatus.
     *
     * @param rotation angular velocity about the axis normal to beam and grating vector (rad/s)
     * @param length   distance L between neighbouring gratings (m)
     * @param velocity speed (m/s)
     * @param period   grating period (m)
     * @return (4&pi;/d) &Omega; L&sup2;/v (rad); the sign follows from the geometry
     */
    public static double rotationPhase(double rotation, double length, double velocity, double period) {
        return 4.0 * Math.PI / period * rotation * length * length / velocity;
    }

    /**
     * What a phase that depends on the speed leaves of the fringe.
     *
     * @param factor remaining visibility, modulus of the mean of exp(i&phi;)
     * @param phase  phase of the mean fringe (rad), on the branch next to the reference phase
     */
    public record Dephasing(double factor, double phase) {}

    /**
     * Dephasing of a phase that follows a power of the speed: -2 for gravity and static fields, -1 for rotation.
     *
     * @param referencePhase phase at the reference speed (rad)
     * @param reference      reference speed (m/s)
     * @param power          exponent p of &phi; = &phi;_ref (v/v_ref)^p
     * @param velocities     speeds, weighted as detected
     * @return factor and mean phase
     */
    public static Dephasing dephasing(double referencePhase, double reference, double power, WeightedNodes velocities) {
        double cosine = 0.0;
        double sine = 0.0;
        for (int k = 0; k < velocities.size(); k++) {
            double ratio = StrictMath.pow(velocities.value(k) / reference, power);
            double angle = referencePhase * (ratio - 1.0);
            cosine += velocities.weight(k) * StrictMath.cos(angle);
            sine += velocities.weight(k) * StrictMath.sin(angle);
        }
        double factor = StrictMath.hypot(cosine, sine);
        return new Dephasing(factor, referencePhase + StrictMath.atan2(sine, cosine));
    }

    /**
     * Collisions with residual gas, each of which takes the molecule out of the fringe.
     *
     * @param pressure     gas pressure (Pa)
     * @param temperature  gas temperature (K)
     * @param pathLength   length of the flight between first and last grating (m), 2L for three equally spaced
     * @param crossSection effective cross section (m^2), relative motion included
     * @return exp(-p &sigma; l/(kT))
     */
    public static double collisions(double pressure, double temperature, double pathLength, double crossSection) {
        return StrictMath.exp(-pressure * crossSection * pathLength / (Codata2018.BOLTZMANN_CONSTANT * temperature));
    }
}
