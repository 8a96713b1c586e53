package fringekeep.interferometry.beam;

import fringekeep.interferometry.constants.Codata2018;
import org.apache.commons.math3.special.Erf;

/**
 * Vapour pressure, effusion and free paths. Sources: R. G. J. Fraser, Molecular Rays; G. A. Bird, Molecular Gas Dynamics,
 * sections 1.4 and 4.2.
 */
public final class Oven {
    private Oven() {}

    /**
     * Vapour pressure by log<sub>10</sub>(p / Pa) = A &minus; B / T. Published pairs often give kPa, Torr or ln: convert
     * first.
     *
     * @param a A, for pascal and decadic logarithm
     * @param b B (K)
     * @param temperature T (K), positive, inside the range the pair was measured in
     * @return pressure (Pa)
     */
    public static double vapourPressure(double a, double b, double temperature) {
        return StrictMath.pow(10, a - b / MatterWave.positive("temperature", temperature));
    }

    /**
     * Heat of sublimation or evaporation at the middle of the measured range, B R ln 10; not the value at 298 K.
     *
     * @param b B (K)
     * @return enthalpy (J/mol)
     */
    public static double enthalpy(double b) {
        return b * Codata2018.MOLAR_GAS_CONSTANT * StrictMath.log(10);
    }

    /**
     * Molecules that leave an aperture per second, p A / sqrt(2 &pi; m k T); for Knudsen numbers above about 1.
     *
     * @param pressure vapour pressure (Pa)
     * @param area area of the aperture (m&sup2;)
     * @param mass mass (kg)
     * @param temperature temperature (K)
     * @return rate (1/s)
     */
    public static double effusionRate(double pressure, double area, double mass, double temperature) {
        double kT = Codata2018.BOLTZMANN_CONSTANT * MatterWave.positive("temperature", temperature);
        return pressure * area / Math.sqrt(2 * Math.PI * MatterWave.positive("mass", mass) * kT);
    }

    /**
     * Mean free path of molecules in their own gas, k T / (sqrt 2 &sigma; p) with &sigma; = &pi; D&sup2;.
     *
     * @param diameter D (m)
     * @param pressure pressure (Pa)
     * @param temperature temperature (K)
     * @return path (m)
     */
    public static double freePathInOwnGas(double diameter, double pressure, double temperature) {
        return freePathOfFastBeam(Math.PI * diameter * diameter, pressure, temperature) / Math.sqrt(2);
    }

    /**
     * Mean free path of a beam much faster than the gas it flies through, k T / (&sigma; p).
     *
     * @param crossSection &sigma; (m&sup2;)
     * @param pressure pressure (Pa)
     * @param temperature temperature of the gas (K)
     * @return path (m)
     */
    public static double freePathOfFastBeam(double crossSection, double pressure, double temperature) {
        return Codata2018.BOLTZMANN_CONSTANT
                * MatterWave.positive("temperature", temperature)
                / (MatterWave.positive("cross section", crossSection) * MatterWave.positive("pressure", pressure));
    }

    /**
     * Mean free path of a beam of any velocity in a gas, constant cross section: the fast limit times v over the mean
     * relative velocity.
     *
     * @param velocity v of the beam (m/s)
     * @param gasMass mass of a gas particle (kg)
     * @param crossSection &sigma; (m&sup2;)
     * @param pressure pressure (Pa)
     * @param temperature temperature of the gas (K)
     * @return path (m)
     */
    public static double freePath(
            double velocity, double gasMass, double crossSection, double pressure, double temperature) {
        double x = MatterWave.positive("velocity", velocity) / new ThermalSource(gasMass, temperature).gasMode();
        double relative = (1 + 0.5 / (x * x)) * Erf.erf(x) + StrictMath.exp(-x * x) / (x * Math.sqrt(Math.PI));
        return freePathOfFastBeam(crossSection, pressure, temperature) / relative;
    }

    /**
     * The pressure at which a given share of a beam passes a length without a collision.
     *
     * @param share share left, between 0 and 1, exclusive
     * @param length length of the flight (m)
     * @param crossSection effective cross section (m&sup2;)
     * @param temperature temperature of the gas (K)
     * @return &minus;ln(share) k T / (&sigma; L) (Pa)
     */
    public static double pressureFor(double share, double length, double crossSection, double temperature) {
        if (!(share > 0 && share < 1)) {
            throw new IllegalArgumentException("share must lie between 0 and 1, is " + share);
        }
        return -StrictMath.log(share)
                * Codata2018.BOLTZMANN_CONSTANT
                * MatterWave.positive("temperature", temperature)
                / (MatterWave.positive("cross section", crossSection) * MatterWave.positive("length", length));
    }

    /**
     * Knudsen number: mean free path over aperture.
     *
     * @param freePath mean free path (m)
     * @param aperture width of the aperture (m)
     * @return the number; effusion formulas hold above about 1
     */
    public static double knudsenNumber(double freePath, double aperture) {
        return freePath / MatterWave.positive("aperture", aperture);
    }

    /**
     * Shift of an absorption line by the beam's motion, v cos(angle) / c.
     *
     * @param velocity velocity (m/s)
     * @param angle angle between beam and light (rad)
     * @return relative shift of the frequency
     */
    public static double dopplerShift(double velocity, double angle) {
        return velocity * StrictMath.cos(angle) / Codata2018.SPEED_OF_LIGHT;
    }
}
