package fringekeep.interferometry.constants;

/**
 * Values that are fixed by convention, not measured, and non-SI units that the trade's papers use.
 *
 * <p>Thread rule: constants only.
 */
public final class ConventionalValues {
    /** Standard acceleration of gravity (m/s^2), exact by resolution 2 of the 3rd CGPM (1901). */
    public static final double STANDARD_GRAVITY = 9.80665;

    /** One cubic angstrom (m^3), exact. */
    public static final double CUBIC_ANGSTROM = 1.0e-30;

    /** One debye (C m): 1e-21/c coulomb metre with c in m/s, exact by definition. */
    public static final double DEBYE = 1.0e-21 / 299792458.0;

    private ConventionalValues() {}
}
