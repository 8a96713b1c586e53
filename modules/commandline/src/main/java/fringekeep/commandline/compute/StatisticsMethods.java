package fringekeep.commandline.compute;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.statistics.CurveFit;
import fringekeep.interferometry.statistics.CurveFitOutcome;
import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.LinearFit;
import fringekeep.interferometry.statistics.SampleSummary;
import java.util.List;

/** Plain statistics of samples and lines. */
final class StatisticsMethods {
    private StatisticsMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "sample-summary",
                        "Mean with its standard uncertainty, standard deviation and lag-1 autocorrelation",
                        StatisticsMethods::summary,
                        Field.list("sample", "1", "1", "values in the order of taking", 10.2, 10.4, 10.1, 10.3, 10.2)),
                Method.of(
                        "polynomial-fit",
                        "Line or polynomial through values with standard uncertainties, by orthogonal factorisation",
                        StatisticsMethods::polynomial,
                        Field.list("places", "1", "1", "abscissae", 0, 1, 2, 3, 4),
                        Field.measured(
                                "values",
                                "1",
                                "1",
                                "ordinates with u",
                                new double[] {1.02, 2.95, 5.03, 7.01, 8.98},
                                new double[] {0.03}),
                        Field.whole("degree", 1, "highest power")));
    }

    private static void summary(Inputs in, Results out) {
        SampleSummary summary = SampleSummary.of(in.numbers("sample"));
        out.estimate("mean", "1", summary.mean(), summary.uncertaintyOfMean());
        out.bare("standardDeviation", "1", summary.standardDeviation());
        out.bare("autocorrelation", "1", summary.autocorrelation());
        out.bare("size", "1", summary.size());
    }

    private static void polynomial(Inputs in, Results out) throws ProblemException {
        CurveFitOutcome outcome = LinearFit.polynomial(
                in.numbers("places"), in.numbers("values"), in.stated("values"), in.whole("degree"));
        if (outcome instanceof CurveFitOutcome.Failure failure) {
            throw NoResult.because(failure.words());
        }
        CurveFit fit = outcome.orThrow();
        double[] values = fit.values();
        double[] deviations = new double[values.length];
        for (int j = 0; j < values.length; j++) {
            deviations[j] = fit.estimate(j).standardUncertainty();
        }
        out.estimates("coefficients", "1", values, deviations);
        out.bare("covariance", "", fit.covariance());
        out.bare("chiSquare", "1", fit.objective());
        out.bare("degreesOfFreedom", "1", fit.degreesOfFreedom());
        if (fit.degreesOfFreedom() > 0) {
            out.bare("pValue", "1", Distributions.chiSquareUpper(fit.objective(), fit.degreesOfFreedom()));
        }
        out.bare("fitted", "1", fit.expected());
    }
}
