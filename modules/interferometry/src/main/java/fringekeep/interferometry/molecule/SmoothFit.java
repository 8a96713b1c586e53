package fringekeep.interferometry.molecule;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Fit of a smooth curve with one minimum from a given start: the common end of the simple property fits. */
final class SmoothFit {
    private static final double POOR = 1e-3;

    private SmoothFit() {}

    static FitOutcome fit(CurveModel model, MeasuredCurve data, double[] start, List<Parameter> parameters) {
        CurveFitter fitter = new CurveFitter(model, data);
        Optional<CurveFitter.Minimum> best = fitter.minimum(start);
        if (best.isEmpty()) {
            return new FitRefused(
                    FitRefused.Reason.NOT_CONVERGED,
                    "the fit of " + parameters + " came to no end: check that the data change over the range measured");
        }
        double[] at = best.get().parameters();
        Optional<double[]> covariance = fitter.covariance(at);
        if (covariance.isEmpty()) {
            return new FitRefused(
                    FitRefused.Reason.NOT_DETERMINED,
                    "these data leave a combination of " + parameters + " open: measure at more different settings");
        }
        PropertyFit.Solution solution = new PropertyFit.Solution(
                at, covariance.get(), fitter.curve(at), best.get().chiSquare());
        PropertyFit fit = new PropertyFit(parameters, solution, data, List.of());
        return fit.withWarnings(warnings(fit));
    }

    private static List<FitWarning> warnings(PropertyFit fit) {
        List<FitWarning> warnings = new ArrayList<>();
        if (fit.pValue() < POOR) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.POOR_FIT,
                    String.format(
                            Locale.ROOT,
                            "chi-square %.4g at %d degrees of freedom (p = %.2g)",
                            fit.chiSquare(),
                            fit.degreesOfFreedom(),
                            fit.pValue())));
        }
        for (Parameter parameter : fit.parameters()) {
            if (fit.estimate(parameter).value() < 0.0) {
                warnings.add(new FitWarning(
                        FitWarning.Sort.NEGATIVE_VALUE, parameter + " came out negative; quote an upper limit"));
            }
        }
        return warnings;
    }
}
