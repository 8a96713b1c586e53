package fringekeep.sample;

import fringekeep.archive.problem.ProblemException;
import java.util.List;

/**
 * A chemical formula: which atoms, how many, and the charge.
 *
 * <p>Written as element symbols with counts; round brackets for groups; an isotope as {@code [13C]}, deuterium and tritium
 * also as D and T; the charge at the end: {@code +}, {@code -}, {@code ++} or {@code ^2+}. In {@code Ca2+} the 2 is a
 * count. Examples: {@code C60}, {@code [13C]2H5OH}, {@code C6H5O-}, {@code (C8F17CH2CH2)4C20H10N4}.
 *
 * @param terms each sort of atom once, in the order of first mention
 * @param charge charge in elementary charges
 */
public record Formula(List<Term> terms, int charge) {
    /** Copies. */
    public Formula {
        terms = List.copyOf(terms);
    }

    /**
     * Reads a formula.
     *
     * @throws ProblemException if it cannot be read; the problem names the column and what stands there
     */
    public static Formula parse(String text) throws ProblemException {
        return new FormulaReader(text).read();
    }

    /**
     * Atoms of one sort.
     *
     * @param symbol element symbol
     * @param nucleons nucleon number of an isotope, or 0 for the element as it comes
     * @param count how many, &ge; 1
     */
    public record Term(String symbol, int nucleons, long count) {
        /** The atom as written in a formula, without its count. */
        public String atom() {
            return nucleons == 0 ? symbol : "[" + nucleons + symbol + "]";
        }
    }
}
