package fringekeep.sample;

import java.math.BigDecimal;
import java.util.Collections;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * A chemical element.
 *
 * @param number atomic number
 * @param symbol symbol
 * @param weight standard atomic weight; absent for elements without one
 * @param isotopes by nucleon number
 */
record Element(int number, String symbol, Optional<Weight> weight, SortedMap<Integer, Isotope> isotopes) {
    Element {
        isotopes = Collections.unmodifiableSortedMap(new TreeMap<>(isotopes));
    }

    /** The isotope with the largest share in normal terrestrial material; absent where there is none. */
    Optional<Isotope> mostAbundant() {
        Optional<Isotope> best = Optional.empty();
        for (Isotope isotope : isotopes.values()) {
            if (isotope.share() > best.map(Isotope::share).orElse(0.0)) {
                best = Optional.of(isotope);
            }
        }
        return best;
    }

    /**
     * A relative atomic mass.
     *
     * @param value relative to 1/12 of carbon-12
     * @param deviation its standard uncertainty
     */
    record Weight(BigDecimal value, double deviation) {}

    /**
     * An isotope.
     *
     * @param mass of the neutral atom (u)
     * @param deviation upper bound of its standard uncertainty (u)
     * @param share share in normal terrestrial material, 0 where not found
     */
    record Isotope(BigDecimal mass, double deviation, double share) {}
}
