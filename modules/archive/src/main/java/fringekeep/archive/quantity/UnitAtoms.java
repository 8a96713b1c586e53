package fringekeep.archive.quantity;

import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * The closed list of units and prefixes, with codes of the Unified Code for Units of Measure (UCUM, version 2.2).
 *
 * <p>Factors: SI Brochure, 9th edition (2019); the electronvolt and the dalton from CODATA 2018 (E. Tiesinga et al., Rev. Mod.
 * Phys. 93, 025010, 2021), the dalton by its recommended value 1.660 539 066 60e-27 kg.
 */
final class UnitAtoms {
    /** Pi to 40 digits, as record format 1 has it. */
    static final String PI = "3.141592653589793238462643383279502884197";

    private static final SortedMap<String, Atom> ATOMS = new TreeMap<>();
    private static final Map<String, Integer> PREFIXES = Map.ofEntries(
            Map.entry("Y", 24),
            Map.entry("Z", 21),
            Map.entry("E", 18),
            Map.entry("P", 15),
            Map.entry("T", 12),
            Map.entry("G", 9),
            Map.entry("M", 6),
            Map.entry("k", 3),
            Map.entry("h", 2),
            Map.entry("da", 1),
            Map.entry("d", -1),
            Map.entry("c", -2),
            Map.entry("m", -3),
            Map.entry("u", -6),
            Map.entry("n", -9),
            Map.entry("p", -12),
            Map.entry("f", -15),
            Map.entry("a", -18),
            Map.entry("z", -21),
            Map.entry("y", -24));

    static {
        metric("m", "1", Dimension.of(1));
        metric("g", "0.001", Dimension.of(0, 1));
        metric("s", "1", Dimension.of(0, 0, 1));
        metric("A", "1", Dimension.of(0, 0, 0, 1));
        metric("K", "1", Dimension.of(0, 0, 0, 0, 1));
        metric("mol", "1", Dimension.of(0, 0, 0, 0, 0, 1));
        metric("rad", "1", Dimension.of(0, 0, 0, 0, 0, 0, 1));
        metric("Hz", "1", Dimension.of(0, 0, -1));
        metric("N", "1", Dimension.of(1, 1, -2));
        metric("Pa", "1", Dimension.of(-1, 1, -2));
        metric("J", "1", Dimension.of(2, 1, -2));
        metric("W", "1", Dimension.of(2, 1, -3));
        metric("C", "1", Dimension.of(0, 0, 1, 1));
        metric("V", "1", Dimension.of(2, 1, -3, -1));
        metric("F", "1", Dimension.of(-2, -1, 4, 2));
        metric("Ohm", "1", Dimension.of(2, 1, -3, -2));
        metric("S", "1", Dimension.of(-2, -1, 3, 2));
        metric("Wb", "1", Dimension.of(2, 1, -2, -1));
        metric("T", "1", Dimension.of(0, 1, -2, -1));
        metric("H", "1", Dimension.of(2, 1, -2, -2));
        metric("bar", "100000", Dimension.of(-1, 1, -2));
        metric("eV", "1.602176634e-19", Dimension.of(2, 1, -2));
        metric("u", "1.66053906660e-27", Dimension.of(0, 1));
        metric("G", "0.0001", Dimension.of(0, 1, -2, -1));
        metric("l", "0.001", Dimension.of(3));
        metric("L", "0.001", Dimension.of(3));
        plain("min", "60", Dimension.of(0, 0, 1));
        plain("h", "3600", Dimension.of(0, 0, 1));
        plain("d", "86400", Dimension.of(0, 0, 1));
        plain("Ao", "1e-10", Dimension.of(1));
        plain("atm", "101325", Dimension.of(-1, 1, -2));
        plain("%", "0.01", Dimension.NONE);
        plain("[ppm]", "1e-6", Dimension.NONE);
        plain("[ppb]", "1e-9", Dimension.NONE);
        atom("deg", Rational.of(PI).over(Rational.of(180)), Dimension.of(0, 0, 0, 0, 0, 0, 1), false);
    }

    private UnitAtoms() {}

    private static void metric(String code, String factor, Dimension dimension) {
        atom(code, Rational.of(factor), dimension, true);
    }

    private static void plain(String code, String factor, Dimension dimension) {
        atom(code, Rational.of(factor), dimension, false);
    }

    private static void atom(String code, Rational factor, Dimension dimension, boolean metric) {
        ATOMS.put(code, new Atom(factor, dimension, metric));
    }

    /** The atom of a code, with its prefix if it has one. */
    static Optional<Atom> find(String code) {
        Atom whole = ATOMS.get(code);
        if (whole != null) {
            return Optional.of(whole);
        }
        for (int length = Math.min(2, code.length() - 1); length >= 1; length--) {
            Integer power = PREFIXES.get(code.substring(0, length));
            Atom atom = ATOMS.get(code.substring(length));
            if (power != null && atom != null && atom.metric()) {
                return Optional.of(atom.times(Rational.of(10).power(power)));
            }
        }
        return Optional.empty();
    }

    record Atom(Rational factor, Dimension dimension, boolean metric) {
        Atom times(Rational prefix) {
            return new Atom(factor.times(prefix), dimension, false);
        }
    }
}
