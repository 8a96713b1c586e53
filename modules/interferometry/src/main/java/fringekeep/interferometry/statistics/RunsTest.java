package fringekeep.interferometry.statistics;

import org.apache.commons.math3.special.Gamma;

/**
 * Runs of signs: are residuals of the same sign strung together more than chance allows?
 *
 * <p>Source: A. Wald and J. Wolfowitz, Annals of Mathematical Statistics 11, 147 (1940); exact distribution by binomial
 * coefficients.
 *
 * @param positive number of positive values
 * @param negative number of negative values
 * @param runs number of runs; zeros are left out
 * @param pValue probability of at most as many runs in random order; 1 where all signs are alike
 */
public record RunsTest(int positive, int negative, int runs, double pValue) {
    /**
     * Counts the runs of a sequence.
     *
     * @param values the sequence, for example residuals in the order of taking
     * @return the test
     */
    public static RunsTest of(double[] values) {
        int positive = 0;
        int negative = 0;
        int runs = 0;
        double last = 0;
        for (double value : values) {
            if (value == 0) {
                continue;
            }
            positive += value > 0 ? 1 : 0;
            negative += value < 0 ? 1 : 0;
            runs += last == 0 || value > 0 != last > 0 ? 1 : 0;
            last = value;
        }
        return new RunsTest(positive, negative, runs, atMost(positive, negative, runs));
    }

    private static double atMost(int positive, int negative, int runs) {
        if (positive == 0 || negative == 0) {
            return 1;
        }
        double all = logChoose(positive + negative, positive);
        double sum = 0;
        for (int r = 2; r <= runs; r++) {
            int half = r / 2;
            if (r % 2 == 0) {
                sum += 2 * ratio(positive - 1, half - 1, negative - 1, half - 1, all);
            } else {
                sum += ratio(positive - 1, half - 1, negative - 1, half, all)
                        + ratio(positive - 1, half, negative - 1, half - 1, all);
            }
        }
        return Math.min(1, sum);
    }

    private static double ratio(int n, int k, int m, int l, double all) {
        if (k < 0 || k > n || l < 0 || l > m) {
            return 0;
        }
        return StrictMath.exp(logChoose(n, k) + logChoose(m, l) - all);
    }

    private static double logChoose(int n, int k) {
        return Gamma.logGamma(n + 1.0) - Gamma.logGamma(k + 1.0) - Gamma.logGamma(n - k + 1.0);
    }
}
