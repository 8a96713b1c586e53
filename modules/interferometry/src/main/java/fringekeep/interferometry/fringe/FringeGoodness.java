package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.PoissonDeviance;
import fringekeep.interferometry.statistics.RunsTest;
import fringekeep.interferometry.statistics.SymmetricMatrix;

/**
 * Goodness of fit.
 *
 * <p>The statistic is the Poisson deviance for likelihood fits, &chi;&sup2; with the model's variances for the others. Its
 * p-value is the upper tail of a gamma law with the statistic's mean and variance at the fitted counts, given the estimates
 * (P. McCullagh, International Statistical Review 53, 61 (1985), to the order used there), which turns into the
 * &chi;&sup2; law at many counts and stays usable at few. With fewer than about 30 counts in the whole scan it is a guide
 * only.
 *
 * @param statistic deviance or &chi;&sup2;
 * @param degreesOfFreedom rows less parameters
 * @param pValue probability of a larger statistic if the model holds; NaN-free: 1 where no degree of freedom is left
 * @param dispersion &chi;&sup2; over degrees of freedom; 1 for Poisson counts, larger for pulsed sources; 1 where no degree
 *     of freedom is left
 * @param dispersionUncertainty its standard deviation for Poisson counts
 * @param runs runs of the residuals' signs in the order of taking
 */
public record FringeGoodness(
        double statistic,
        int degreesOfFreedom,
        double pValue,
        double dispersion,
        double dispersionUncertainty,
        RunsTest runs) {
    static FringeGoodness of(FringeFit fit) {
        boolean likelihood = fit.options().estimator() == Estimator.POISSON_LIKELIHOOD;
        double statistic = likelihood ? fit.deviance() : fit.chiSquare();
        int degrees = fit.degreesOfFreedom();
        double[] meanAndVariance = degrees > 0 ? moments(fit, likelihood) : new double[] {0, 0};
        double pValue = 1;
        if (degrees > 0) {
            double mean = meanAndVariance[0];
            double variance = meanAndVariance[1];
            pValue = Distributions.gammaUpper(mean * mean / variance, statistic * mean / variance);
        }
        double dispersion = degrees > 0 ? fit.chiSquare() / degrees : 1;
        double deviation = degrees > 0 ? Math.sqrt(moments(fit, false)[1]) / degrees : 0;
        return new FringeGoodness(
                statistic, degrees, pValue, dispersion, deviation, RunsTest.of(fit.standardisedResiduals()));
    }

    /** Mean and variance of the statistic at the fitted counts, given the estimates. */
    private static double[] moments(FringeFit fit, boolean likelihood) {
        FringeModel model = new FringeModel(fit.data(), fit.options());
        model.evaluate(fit.inside().theta());
        int p = model.parameters;
        double[] weights = new double[model.rows];
        for (int row = 0; row < model.rows; row++) {
            weights[row] = 1 / Math.max(model.expected[row], 1e-3);
        }
        double[] inverse = FringeFitter.inverseOf(model, weights, p);
        double mean = 0;
        double variance = 0;
        double[] pull = new double[p];
        double[] slopes = new double[p];
        for (int row = 0; row < model.rows; row++) {
            double mu = Math.max(model.expected[row], 1e-3);
            double[] m = likelihood ? PoissonDeviance.moments(mu) : new double[] {1, 2 + 1 / mu, 1, 0};
            System.arraycopy(model.slopes, row * p, slopes, 0, p);
            double leverage = inverse == null ? 0 : SymmetricMatrix.form(inverse, slopes);
            mean += m[0] - 0.5 * m[3] * leverage;
            variance += m[1];
            for (int j = 0; j < p; j++) {
                pull[j] += slopes[j] * m[2] / mu;
            }
        }
        double explained = inverse == null ? 0 : SymmetricMatrix.form(inverse, pull);
        double lost = !likelihood && fit.options().estimator() == Estimator.UNWEIGHTED ? unweightedLoss(model, p) : p;
        mean -= lost;
        variance -= explained + 2 * lost;
        double least = 0.05 * (model.rows - p);
        return new double[] {Math.max(mean, least), Math.max(variance, least)};
    }

    /** What an unweighted fit takes from the expected chi-square: less than one per parameter, as it is not the minimum. */
    private static double unweightedLoss(FringeModel model, int p) {
        double[] ones = new double[model.rows];
        double[] means = new double[model.rows];
        for (int row = 0; row < model.rows; row++) {
            ones[row] = 1;
            means[row] = Math.max(model.expected[row], 1e-3);
        }
        double[] bread = FringeFitter.inverseOf(model, ones, p);
        if (bread == null) {
            return p;
        }
        double[] covariance = FringeFitAssembly.sandwich(bread, FringeFitter.weighted(model, means, p), p);
        double loss = 0;
        double[] slopes = new double[p];
        for (int row = 0; row < model.rows; row++) {
            System.arraycopy(model.slopes, row * p, slopes, 0, p);
            loss += 2 * SymmetricMatrix.form(bread, slopes) - SymmetricMatrix.form(covariance, slopes) / means[row];
        }
        return loss;
    }
}
