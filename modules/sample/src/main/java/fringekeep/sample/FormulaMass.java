package fringekeep.sample;

import fringekeep.interferometry.constants.Codata2018;
import java.math.BigDecimal;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Mass of one neutral entity of a formula, as relative molecular mass.
 *
 * <p>The uncertainties of atoms of one sort are fully correlated and add; those of different sorts are independent
 * (A. M. H. van der Veen et al., Pure Appl. Chem. 93, 629 (2021), section 7). The sum of values is exact decimal arithmetic.
 *
 * @param mean mean over the isotopes as they come (relative, 1/12 of carbon-12)
 * @param deviation its standard uncertainty
 * @param monoisotopic with the most abundant isotope of every element not marked; absent where an element has none
 */
record FormulaMass(BigDecimal mean, double deviation, OptionalDouble monoisotopic) {
    /** Works the mass out; empty where an element without standard atomic weight is not marked with an isotope. */
    static Optional<FormulaMass> of(Formula formula) {
        BigDecimal mean = BigDecimal.ZERO;
        BigDecimal light = BigDecimal.ZERO;
        boolean lightKnown = true;
        SortedMap<String, Double> deviations = new TreeMap<>();
        for (Formula.Term term : formula.terms()) {
            Optional<Element.Weight> weight = weight(term);
            if (weight.isEmpty()) {
                return Optional.empty();
            }
            BigDecimal count = BigDecimal.valueOf(term.count());
            mean = mean.add(weight.get().value().multiply(count));
            deviations.merge(term.atom(), term.count() * weight.get().deviation(), Double::sum);
            Optional<BigDecimal> lightest = mostAbundant(term);
            lightKnown &= lightest.isPresent();
            light = light.add(lightest.orElse(BigDecimal.ZERO).multiply(count));
        }
        OptionalDouble monoisotopic = lightKnown ? OptionalDouble.of(light.doubleValue()) : OptionalDouble.empty();
        return Optional.of(new FormulaMass(mean, rootOfSquares(deviations), monoisotopic));
    }

    /** Relative atomic mass of one atom of a term. */
    static Optional<Element.Weight> weight(Formula.Term term) {
        Optional<Element> element = Elements.symbol(term.symbol());
        return term.nucleons() == 0
                ? element.flatMap(Element::weight)
                : element.map(known -> known.isotopes().get(term.nucleons()))
                        .map(isotope -> new Element.Weight(isotope.mass(), isotope.deviation()));
    }

    /** Mean mass (kg). */
    double kilograms() {
        return mean.doubleValue() * Codata2018.ATOMIC_MASS_CONSTANT;
    }

    private static Optional<BigDecimal> mostAbundant(Formula.Term term) {
        return term.nucleons() == 0
                ? Elements.symbol(term.symbol()).flatMap(Element::mostAbundant).map(Element.Isotope::mass)
                : weight(term).map(Element.Weight::value);
    }

    private static double rootOfSquares(SortedMap<String, Double> deviations) {
        double sum = 0;
        for (double deviation : deviations.values()) {
            sum += deviation * deviation;
        }
        return Math.sqrt(sum);
    }
}
