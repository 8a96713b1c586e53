package fringekeep.commandline.compute;

import fringekeep.interferometry.molecule.PowerLawBudget;
import fringekeep.interferometry.statistics.Estimate;
import java.util.List;

/** Uncertainty of a result that is a power of one input, by the library's propagation. */
final class Relative {
    private Relative() {}

    static Estimate power(double result, double exponent, Estimate input) {
        double relative = Math.abs(input.standardUncertainty() / input.value());
        PowerLawBudget budget = PowerLawBudget.of(
                new Estimate(result, 0), List.of(new PowerLawBudget.Input("input", exponent, relative)));
        return new Estimate(result, budget.combined());
    }
}
