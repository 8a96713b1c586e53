package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.constants.ConventionalValues;

/**
 * Conversions of polarizability between SI, volume and atomic units, with CODATA 2018.
 *
 * <p>&alpha;(SI) = 4&pi;&epsilon;0 &alpha;'. Accuracy: rounding.
 */
public final class Polarizability {
    private static final double FOUR_PI_EPSILON = 4.0 * Math.PI * Codata2018.ELECTRIC_CONSTANT;

    private Polarizability() {}

    /**
     * SI polarizability of a volume.
     *
     * @param volume polarizability volume (m^3)
     * @return polarizability (C m^2/V)
     */
    public static double siFromVolume(double volume) {
        return FOUR_PI_EPSILON * volume;
    }

    /**
     * Volume of an SI polarizability.
     *
     * @param polarizability (C m^2/V)
     * @return polarizability volume (m^3)
     */
    public static double volumeFromSi(double polarizability) {
        return polarizability / FOUR_PI_EPSILON;
    }

    /**
     * Volume from cubic angstroms.
     *
     * @param cubicAngstroms polarizability volume (&Aring;^3)
     * @return polarizability volume (m^3)
     */
    public static double volumeFromCubicAngstroms(double cubicAngstroms) {
        return cubicAngstroms * ConventionalValues.CUBIC_ANGSTROM;
    }

    /**
     * Cubic angstroms of a volume.
     *
     * @param volume polarizability volume (m^3)
     * @return polarizability volume (&Aring;^3)
     */
    public static double cubicAngstromsFromVolume(double volume) {
        return volume / ConventionalValues.CUBIC_ANGSTROM;
    }

    /**
     * Volume from atomic units.
     *
     * @param atomicUnits polarizability (atomic units)
     * @return polarizability volume (m^3)
     */
    public static double volumeFromAtomicUnits(double atomicUnits) {
        return volumeFromSi(atomicUnits * Codata2018.ATOMIC_UNIT_OF_POLARIZABILITY);
    }

    /**
     * Atomic units of a volume.
     *
     * @param volume polarizability volume (m^3)
     * @return polarizability (atomic units)
     */
    public static double atomicUnitsFromVolume(double volume) {
        return siFromVolume(volume) / Codata2018.ATOMIC_UNIT_OF_POLARIZABILITY;
    }
}
