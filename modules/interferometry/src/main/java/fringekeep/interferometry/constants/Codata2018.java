package fringekeep.interferometry.constants;

/**
 * The constants of nature as the CODATA adjustment of 2018 published them; recorded under the name "CODATA 2018".
 *
 * <p>Source: E. Tiesinga, P. J. Mohr, D. B. Newell, B. N. Taylor, CODATA recommended values of the
 * fundamental physical constants: 2018, Rev. Mod. Phys. 93, 025010 (2021), doi:10.1103/RevModPhys.93.025010.
 * Uncertainties are standard uncertainties. Thread rule: constants only.
 */
public final class Codata2018 {
    /** The name under which a result records that it was computed with this set. */
    public static final String NAME = "CODATA 2018";

    /** Planck constant (J s), exact. */
    public static final double PLANCK_CONSTANT = 6.62607015e-34;

    /** Planck constant over 2&pi; (J s), exact. */
    public static final double REDUCED_PLANCK_CONSTANT = PLANCK_CONSTANT / (2.0 * Math.PI);

    /** Speed of light in vacuum (m/s), exact. */
    public static final double SPEED_OF_LIGHT = 299792458.0;

    /** Boltzmann constant (J/K), exact. */
    public static final double BOLTZMANN_CONSTANT = 1.380649e-23;

    /** Elementary charge (C), exact. */
    public static final double ELEMENTARY_CHARGE = 1.602176634e-19;

    /** Avogadro constant (1/mol), exact. */
    public static final double AVOGADRO_CONSTANT = 6.02214076e23;

    /** Molar gas constant, the product of the Boltzmann and Avogadro constants (J/(mol K)), exact. */
    public static final double MOLAR_GAS_CONSTANT = 8.31446261815324;

    /** Atomic mass constant (1 u) (kg), standard uncertainty 0.00000000050e-27 kg. */
    public static final double ATOMIC_MASS_CONSTANT = 1.66053906660e-27;

    /** Standard uncertainty of {@link #ATOMIC_MASS_CONSTANT} (kg). */
    public static final double ATOMIC_MASS_CONSTANT_UNCERTAINTY = 0.00000000050e-27;

    /** Vacuum electric permittivity (F/m), standard uncertainty 0.0000000013e-12 F/m. */
    public static final double ELECTRIC_CONSTANT = 8.8541878128e-12;

    /** Standard uncertainty of {@link #ELECTRIC_CONSTANT} (F/m). */
    public static final double ELECTRIC_CONSTANT_UNCERTAINTY = 0.0000000013e-12;

    /** Electron mass (kg), standard uncertainty 0.0000000028e-31 kg. */
    public static final double ELECTRON_MASS = 9.1093837015e-31;

    /** Standard uncertainty of {@link #ELECTRON_MASS} (kg). */
    public static final double ELECTRON_MASS_UNCERTAINTY = 0.0000000028e-31;

    /** Bohr radius (m), standard uncertainty 0.00000000080e-11 m. */
    public static final double BOHR_RADIUS = 5.29177210903e-11;

    /** Standard uncertainty of {@link #BOHR_RADIUS} (m). */
    public static final double BOHR_RADIUS_UNCERTAINTY = 0.00000000080e-11;

    /** Hartree energy (J), standard uncertainty 0.0000000000085e-18 J. */
    public static final double HARTREE_ENERGY = 4.3597447222071e-18;

    /** Standard uncertainty of {@link #HARTREE_ENERGY} (J). */
    public static final double HARTREE_ENERGY_UNCERTAINTY = 0.0000000000085e-18;

    /** Bohr magneton (J/T), standard uncertainty 0.0000000028e-24 J/T. */
    public static final double BOHR_MAGNETON = 9.2740100783e-24;

    /** Standard uncertainty of {@link #BOHR_MAGNETON} (J/T). */
    public static final double BOHR_MAGNETON_UNCERTAINTY = 0.0000000028e-24;

    /** Atomic unit of electric polarizability (C^2 m^2/J), standard uncertainty 0.00000000050e-41 C^2 m^2/J. */
    public static final double ATOMIC_UNIT_OF_POLARIZABILITY = 1.64877727436e-41;

    /** Standard uncertainty of {@link #ATOMIC_UNIT_OF_POLARIZABILITY} (C^2 m^2/J). */
    public static final double ATOMIC_UNIT_OF_POLARIZABILITY_UNCERTAINTY = 0.00000000050e-41;

    /** Atomic unit of electric dipole moment (C m), standard uncertainty 0.0000000013e-30 C m. */
    public static final double ATOMIC_UNIT_OF_DIPOLE_MOMENT = 8.4783536255e-30;

    /** Standard uncertainty of {@link #ATOMIC_UNIT_OF_DIPOLE_MOMENT} (C m). */
    public static final double ATOMIC_UNIT_OF_DIPOLE_MOMENT_UNCERTAINTY = 0.0000000013e-30;

    private Codata2018() {}
}
