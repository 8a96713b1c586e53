package fringekeep.interferometry.molecule;

import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.special.SplitMix64;
import fringekeep.interferometry.statistics.Interval;
import java.util.Arrays;
import java.util.Optional;

/**
 * Intervals around a fit of visibility against power: by profile likelihood and by resampling.
 *
 * <p>Both stay in the minimum of the fit; other minima are the business of its warnings.
 *
 * @param fitter      the question that was answered
 * @param data        the data it was answered with
 * @param description the description it was answered in
 * @param fit         the answer
 */
public record PowerCurveIntervals(
        PowerCurveFitter fitter, MeasuredCurve data, Description description, PropertyFit fit) {
    /**
     * Profile-likelihood interval of one parameter.
     *
     * @param parameter a fitted parameter
     * @param level     confidence level, for example 0.6827
     * @return the interval; an end that the data leave open is infinite
     */
    public Interval profile(Parameter parameter, double level) {
        PowerCurveModel model = fitter.near(data, description, fit.values());
        KinkedCurveFitter.Minimum best = new KinkedCurveFitter.Minimum(fit.values(), fit.chiSquare(), true);
        int index = fit.parameters().indexOf(parameter);
        double uncertainty = fit.estimate(parameter).standardUncertainty();
        return new ProfileSearch(model, model.data(), best, index).interval(level, uncertainty);
    }

    /**
     * Result of a bootstrap.
     *
     * @param generator  name of the random generator
     * @param seed       its seed
     * @param resamples  number of resamples asked for
     * @param failed     resamples without a fit
     * @param mean       mean of each parameter over the resamples
     * @param deviation  standard deviation of each parameter
     * @param central68  ends of the central 68.27 % of each parameter, [parameter][low, high]
     * @param central95  ends of the central 95.45 %
     */
    public record Bootstrap(
            String generator,
            long seed,
            int resamples,
            int failed,
            double[] mean,
            double[] deviation,
            double[][] central68,
            double[][] central95) {}

    /**
     * Parametric bootstrap: the fitted curve with normal deviates of the data's uncertainties, fitted again from the
     * fit.
     *
     * @param seed      seed of {@link SplitMix64}; the same seed gives the same bits
     * @param resamples number of resamples, &ge; 100
     * @return spread of every parameter, in the order of the fit
     */
    public Bootstrap bootstrap(long seed, int resamples) {
        if (resamples < 100) {
            throw new IllegalArgumentException("a bootstrap needs at least 100 resamples, not " + resamples);
        }
        PowerCurveModel model = fitter.near(data, description, fit.values());
        KinkedCurveFitter solver = new KinkedCurveFitter(model, model.data());
        SplitMix64 random = new SplitMix64(seed);
        double[] start = fit.values();
        double[] fitted = fit.fitted();
        double[] sample = new double[fitted.length];
        double[][] found = new double[fit.parameters().size()][resamples];
        int good = 0;
        for (int r = 0; r < resamples; r++) {
            resample(model.data(), fitted, random, sample);
            solver.observe(sample);
            Optional<double[]> place = solver.place(start);
            if (place.isPresent()) {
                for (int k = 0; k < found.length; k++) {
                    found[k][good] = place.get()[k];
                }
                good++;
            }
        }
        return summary(seed, resamples, found, good);
    }

    private static void resample(MeasuredCurve curve, double[] fitted, SplitMix64 random, double[] sample) {
        for (int k = 0; k < fitted.length; k++) {
            sample[k] = Math.fma(curve.uncertainty(k), random.nextGaussian(), fitted[k]);
        }
    }

    private static Bootstrap summary(long seed, int resamples, double[][] found, int good) {
        if (good < 50) {
            throw new IllegalStateException("only " + good + " of " + resamples + " resamples could be fitted");
        }
        int parameters = found.length;
        double[] mean = new double[parameters];
        double[] deviation = new double[parameters];
        double[][] central68 = new double[parameters][];
        double[][] central95 = new double[parameters][];
        for (int k = 0; k < parameters; k++) {
            double[] sorted = Arrays.copyOf(found[k], good);
            Arrays.sort(sorted);
            mean[k] = mean(sorted);
            deviation[k] = deviation(sorted, mean[k]);
            central68[k] = new double[] {quantile(sorted, 0.158655), quantile(sorted, 0.841345)};
            central95[k] = new double[] {quantile(sorted, 0.02275), quantile(sorted, 0.97725)};
        }
        return new Bootstrap(SplitMix64.NAME, seed, resamples, resamples - good, mean, deviation, central68, central95);
    }

    private static double mean(double[] values) {
        double sum = 0.0;
        for (double value : values) {
            sum += value;
        }
        return sum / values.length;
    }

    private static double deviation(double[] values, double mean) {
        double sum = 0.0;
        for (double value : values) {
            sum += (value - mean) * (value - mean);
        }
        return Math.sqrt(sum / (values.length - 1));
    }

    /** Linear interpolation between order statistics at position p (n - 1). */
    private static double quantile(double[] sorted, double probability) {
        double position = probability * (sorted.length - 1);
        int below = (int) position;
        double rest = position - below;
        return sorted[below] + rest * (sorted[Math.min(below + 1, sorted.length - 1)] - sorted[below]);
    }
}
