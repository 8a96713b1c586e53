package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Estimate;
import java.util.Optional;

/**
 * The period of an unknown fringe by a periodogram with a floating mean, then a fit with the period free.
 *
 * <p>Power: half the fall of &chi;&sup2; from a constant to constant, cosine and sine, all in the variance of the constant
 * (M. Zechmeister and M. K&uuml;rster, Astronomy and Astrophysics 496, 577 (2009)). False-alarm probability: the upper bound
 * of R. V. Baluev, Monthly Notices of the Royal Astronomical Society 385, 1279 (2008), for known variance.
 *
 * @param period the period of the highest power (m)
 * @param power the highest power
 * @param falseAlarm probability of a power as high anywhere in the range without a fringe
 * @param refined the period by a fit with the period free, empty where that fit failed
 */
public record PeriodSearch(double period, double power, double falseAlarm, Optional<Estimate> refined) {
    /**
     * Searches a range.
     *
     * @param data the scan
     * @param shortest shortest period (m), positive
     * @param longest longest period (m), above the shortest; about twice the range of positions is the most a scan tells
     * @return the best period, empty where fewer than four points or no counts are left
     */
    public static Optional<PeriodSearch> over(FringeData data, double shortest, double longest) {
        if (!(shortest > 0) || !(longest > shortest)) {
            throw new IllegalArgumentException("periods from " + shortest + " m to " + longest + " m are no range");
        }
        FringeModel model = new FringeModel(data, FringeOptions.atPeriod(shortest));
        if (model.points < 4 || model.observedTotal() == 0) {
            return Optional.empty();
        }
        double span = model.span() * shortest;
        double low = 1 / longest;
        double high = 1 / shortest;
        int steps = (int) Math.min(200_000, Math.max(16, Math.ceil(12 * span * (high - low))));
        double best = low;
        double most = -1;
        for (int k = 0; k <= steps; k++) {
            double frequency = low + (high - low) * k / steps;
            double power = power(data, frequency);
            if (power > most) {
                most = power;
                best = frequency;
            }
        }
        double width = (high - low) / steps;
        double polished = fringekeep.interferometry.statistics.ScalarSearch.minimum(
                f -> -power(data, f), Math.max(low, best - width), Math.min(high, best + width), 1e-9 * best);
        double power = power(data, polished);
        return Optional.of(
                new PeriodSearch(1 / polished, power, falseAlarm(data, power, low, high), refined(data, 1 / polished)));
    }

    private static Optional<Estimate> refined(FringeData data, double period) {
        return FringeFitter.fit(data, FringeOptions.atPeriod(period).periodFree(true)) instanceof FringeFit fit
                ? fit.estimate("period")
                : Optional.empty();
    }

    private static double power(FringeData data, double frequency) {
        FringeModel model = new FringeModel(data, FringeOptions.atPeriod(1 / frequency));
        double[] theta = new double[3];
        double[] constant = {model.observedTotal() / (model.points * model.meanExposure()), 0, 0};
        model.evaluate(constant);
        double[] weights = new double[model.rows];
        for (int row = 0; row < model.rows; row++) {
            weights[row] = 1 / model.expected[row];
        }
        FringeSolver mean = new FringeSolver(model, new int[] {0});
        mean.leastSquares(constant, weights);
        model.evaluate(constant);
        double without = mean.squares(weights);
        FringeSolver all = new FringeSolver(model, new int[] {0, 1, 2});
        if (all.leastSquares(theta, weights) != FringeSolver.End.FOUND) {
            return 0;
        }
        model.evaluate(theta);
        return 0.5 * (without - all.squares(weights));
    }

    private static double falseAlarm(FringeData data, double power, double low, double high) {
        double sum = 0;
        double square = 0;
        int n = 0;
        for (int i = 0; i < data.size(); i++) {
            if (!data.masked[i]) {
                n++;
                sum += data.positions[i];
            }
        }
        for (int i = 0; i < data.size(); i++) {
            if (!data.masked[i]) {
                square += (data.positions[i] - sum / n) * (data.positions[i] - sum / n);
            }
        }
        double trials = (high - low) * Math.sqrt(4 * Math.PI * square / n);
        double single = StrictMath.exp(-power);
        return Math.min(1, single + trials * single * Math.sqrt(power));
    }
}
