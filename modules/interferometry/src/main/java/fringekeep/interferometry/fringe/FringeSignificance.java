package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;

/**
 * Is there a fringe at all? Likelihood fits compare the deviance with and without cosine and sine; the others the quadratic
 * form of both in their covariance. Either is &chi;&sup2; with two degrees of freedom without a fringe.
 *
 * @param statistic the difference or the form
 * @param pValue probability of a larger one without a fringe, exp(&minus;statistic / 2)
 * @param deviations the same as the deviate of a normal law with that probability above it
 * @param threshold95 the visibility noise alone exceeds in 5 % of scans
 */
public record FringeSignificance(double statistic, double pValue, double deviations, double threshold95) {
    static Optional<FringeSignificance> of(FringeFit fit) {
        HarmonicEstimate widened = fit.inside().widened();
        if (!(widened.mean() > 0)) {
            return Optional.empty();
        }
        double statistic;
        if (fit.options().estimator() == Estimator.POISSON_LIKELIHOOD) {
            double deviate = FringeProfile.of(fit).visibilityDeviate(0);
            statistic = deviate * deviate;
            if (!(statistic < Double.POSITIVE_INFINITY)) {
                return Optional.empty();
            }
        } else {
            double[] two = widened.covariance();
            double[] block = {two[2], two[4], two[5]};
            if (!SymmetricMatrix.factor(block, 2, 1e-14)) {
                return Optional.empty();
            }
            double[] vector = {widened.cosine(), widened.sine()};
            statistic = SymmetricMatrix.form(SymmetricMatrix.inverse(block, 2), vector);
        }
        double pValue = StrictMath.exp(-0.5 * statistic);
        double deviations = -Distributions.normalQuantile(Math.min(Math.max(pValue, 1e-300), 1 - 1e-15));
        return Optional.of(new FringeSignificance(
                statistic, pValue, deviations, AmplitudeLimits.threshold(widened.quadratureNoise(), 0.95)));
    }
}
