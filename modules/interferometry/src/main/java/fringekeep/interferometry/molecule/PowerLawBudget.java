package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;

/**
 * Uncertainty of a result that is a product of powers of its inputs, such as a susceptibility from a deflection
 * (&Delta;x m v&sup2;/(K (E.grad)E)) or a cross section from a decay pressure (kT/(l p0)).
 *
 * <p>Law of propagation of uncertainty for y = c &Pi; x_i^p_i: [u(y)/y]&sup2; = &Sigma; [p_i u(x_i)/x_i]&sup2;
 * (JCGM 100:2008, 5.1.6), inputs independent. Statistical and shared parts stay apart.
 *
 * @param value       the result
 * @param statistical its standard uncertainty from the data
 * @param parts       contributions of shared inputs
 * @param shared      root of the sum of squares of the contributions
 * @param combined    root of the sum of squares of statistical and shared
 */
public record PowerLawBudget(double value, double statistical, List<Part> parts, double shared, double combined) {
    /** Keeps an own list. */
    public PowerLawBudget {
        parts = List.copyOf(parts);
    }

    /**
     * A shared input.
     *
     * @param name     what it is
     * @param exponent power p with which it enters the result
     * @param relative its relative standard uncertainty, &ge; 0
     */
    public record Input(String name, double exponent, double relative) {
        /** Checks the uncertainty. */
        public Input {
            if (!(relative >= 0.0 && relative < Double.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException(
                        "the relative uncertainty of " + name + " is at least 0, not " + relative);
            }
        }
    }

    /**
     * What one input contributes.
     *
     * @param input        the input
     * @param contribution |p| u(x)/|x| times |result| (unit of the result)
     */
    public record Part(Input input, double contribution) {}

    /**
     * Propagates.
     *
     * @param result value with its statistical uncertainty
     * @param inputs shared inputs, independent of each other and of the data
     * @return the budget
     */
    public static PowerLawBudget of(Estimate result, List<Input> inputs) {
        List<Part> parts = new ArrayList<>();
        double square = 0.0;
        for (Input input : inputs) {
            double contribution = Math.abs(input.exponent() * input.relative() * result.value());
            parts.add(new Part(input, contribution));
            square += contribution * contribution;
        }
        double statistical = result.standardUncertainty();
        return new PowerLawBudget(
                result.value(), statistical, parts, Math.sqrt(square), Math.sqrt(square + statistical * statistical));
    }
}
