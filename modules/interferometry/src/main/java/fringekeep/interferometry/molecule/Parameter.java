package fringekeep.interferometry.molecule;

/** What a fit determines, each with the SI unit (UCUM code) of its value. */
public enum Parameter {
    /** Optical or static polarizability volume &alpha;/(4&pi;&epsilon;0). */
    POLARIZABILITY_VOLUME("m3"),
    /** Absorption cross section. */
    ABSORPTION_CROSS_SECTION("m2"),
    /** What remains of the expected visibility, one for an ideal instrument. */
    VISIBILITY_FACTOR("1"),
    /** Visibility without the effect under study. */
    UNDISTURBED_VISIBILITY("1"),
    /** Pressure at which the visibility has fallen to 1/e. */
    DECAY_PRESSURE("Pa"),
    /** Phase of the fringe without the field. */
    UNDISTURBED_PHASE("rad"),
    /** Electric susceptibility: polarizability with the thermal part of permanent and fluctuating dipole moments. */
    ELECTRIC_SUSCEPTIBILITY("C.m2/V"),
    /** Thermal mean of the squared electric dipole moment. */
    SQUARED_DIPOLE_MOMENT("C2.m2"),
    /** Electric polarizability in SI. */
    POLARIZABILITY("C.m2/V"),
    /** Magnetic susceptibility of one molecule. */
    MAGNETIC_SUSCEPTIBILITY("J/T2"),
    /** Cross section for removal from the beam by light. */
    DEPLETION_CROSS_SECTION("m2"),
    /** Transmission without light. */
    UNDISTURBED_TRANSMISSION("1");

    private final String unit;

    Parameter(String unit) {
        this.unit = unit;
    }

    /**
     * Unit of the value.
     *
     * @return UCUM code
     */
    public String unit() {
        return unit;
    }
}
