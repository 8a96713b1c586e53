package fringekeep.interferometry.molecule;

import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Propagates inputs that all points share (power calibration, waist, velocity scale, &hellip;) to fitted parameters by
 * the law of propagation of uncertainty (JCGM 100:2008, 5.1.2 and 5.1.3, inputs independent of each other).
 *
 * <p>The derivative of a parameter with respect to the logarithm of an input is a central difference of two refits at a
 * relative change of 1e-4, each converged to rounding: about 1e-7 of its value, away from kinks of the model.
 */
public final class SharedInputs {
    private static final double STEP = 1e-4;

    private final PowerCurveFitter fitter;
    private final MeasuredCurve data;
    private final Description description;
    private final PropertyFit fit;

    /**
     * Takes the fit whose inputs are to be judged.
     *
     * @param fitter      the question
     * @param data        the data
     * @param description the description
     * @param fit         the answer
     */
    public SharedInputs(PowerCurveFitter fitter, MeasuredCurve data, Description description, PropertyFit fit) {
        this.fitter = fitter;
        this.data = data;
        this.description = description;
        this.fit = fit;
    }

    /**
     * Uncertainty of one shared input.
     *
     * @param input    which
     * @param relative relative standard uncertainty, &ge; 0
     */
    public record Uncertain(SharedInput input, double relative) {
        /** Checks the uncertainty. */
        public Uncertain {
            if (!(relative >= 0.0 && relative < 1.0)) {
                throw new IllegalArgumentException(
                        "a relative uncertainty lies between 0 and 1, not " + relative + " for " + input);
            }
        }
    }

    /**
     * What one input contributes.
     *
     * @param input       which
     * @param relative    its relative standard uncertainty
     * @param sensitivity derivative of the parameter with respect to the logarithm of the input (unit of the parameter)
     * @param contribution |sensitivity| times relative uncertainty (unit of the parameter)
     */
    public record Contribution(SharedInput input, double relative, double sensitivity, double contribution) {}

    /**
     * Uncertainty of a parameter with its parts kept apart.
     *
     * @param parameter     which
     * @param value         its value
     * @param statistical   standard uncertainty from the data
     * @param contributions what each shared input adds
     * @param shared        root of the sum of squares of the contributions
     * @param combined      root of the sum of squares of statistical and shared
     */
    public record Budget(
            Parameter parameter,
            double value,
            double statistical,
            List<Contribution> contributions,
            double shared,
            double combined) {
        /** Keeps an own list. */
        public Budget {
            contributions = List.copyOf(contributions);
        }
    }

    /**
     * Derivatives of all fitted parameters with respect to the logarithm of one input.
     *
     * @param input which
     * @return one derivative per parameter, in the order of the fit; empty if a refit failed
     */
    public Optional<double[]> sensitivities(SharedInput input) {
        Optional<double[]> above = refitted(input, 1.0 + STEP);
        Optional<double[]> below = refitted(input, 1.0 - STEP);
        if (above.isEmpty() || below.isEmpty()) {
            return Optional.empty();
        }
        double[] slopes = new double[fit.parameters().size()];
        for (int k = 0; k < slopes.length; k++) {
            slopes[k] = (above.get()[k] - below.get()[k]) / (2.0 * STEP);
        }
        return Optional.of(slopes);
    }

    private Optional<double[]> refitted(SharedInput input, double factor) {
        MeasuredCurve changed = input.changed(data, factor);
        PowerCurveModel model = input.changed(fitter, factor).near(changed, description, fit.values());
        return new KinkedCurveFitter(model, model.data())
                .minimum(fit.values())
                .map(KinkedCurveFitter.Minimum::parameters);
    }

    /**
     * Uncertainty budget of one parameter.
     *
     * @param parameter a fitted parameter
     * @param inputs    uncertain shared inputs
     * @return the budget
     * @throws IllegalStateException if the fit cannot be followed along an input
     */
    public Budget budget(Parameter parameter, List<Uncertain> inputs) {
        Estimate estimate = fit.estimate(parameter);
        int index = fit.parameters().indexOf(parameter);
        List<Contribution> contributions = new ArrayList<>();
        double square = 0.0;
        for (Uncertain uncertain : inputs) {
            double slope = sensitivities(uncertain.input())
                    .orElseThrow(
                            () -> new IllegalStateException("the fit cannot be followed along " + uncertain.input()))[
                    index];
            double part = Math.abs(slope) * uncertain.relative();
            contributions.add(new Contribution(uncertain.input(), uncertain.relative(), slope, part));
            square += part * part;
        }
        double statistical = estimate.standardUncertainty();
        double combined = Math.sqrt(square + statistical * statistical);
        return new Budget(parameter, estimate.value(), statistical, contributions, Math.sqrt(square), combined);
    }
}
