package fringekeep.interferometry.statistics;

import org.apache.commons.math3.special.Gamma;

/**
 * The deviance of Poisson counts, 2 [&mu; &minus; n + n ln(n / &mu;)], and its first moments.
 *
 * <p>Source of the statistic: W. Cash, Astrophysical Journal 228, 939 (1979); moments at small means by direct
 * summation over the counts, at large means by the Bartlett factor 1 + 1 / (6 &mu;).
 */
public final class PoissonDeviance {
    private static final double SERIES_FROM = 150;

    private PoissonDeviance() {}

    /**
     * The deviance of one count.
     *
     * @param count n, not negative
     * @param mean &mu;, not negative
     * @return the deviance; infinite if counts fell where none are possible
     */
    public static double term(double count, double mean) {
        if (count == 0) {
            return 2 * mean;
        }
        if (!(mean > 0)) {
            return Double.POSITIVE_INFINITY;
        }
        double relative = (mean - count) / count;
        return 2 * count * (relative - logOnePlus(relative));
    }

    /** x &minus; ln(1 + x) loses its digits near 0; log1p keeps them down to the square. */
    private static double logOnePlus(double x) {
        return StrictMath.log1p(x);
    }

    /**
     * Mean, variance and covariance with the count of the deviance of one count at its true mean.
     *
     * @param mean &mu;, not negative
     * @return {E[d], Var[d], Cov[d, n], d&sup2;E/d&mu;&sup2;}
     */
    public static double[] moments(double mean) {
        if (mean <= 0) {
            return new double[4];
        }
        if (mean > SERIES_FROM) {
            double factor = 1 + 1 / (6 * mean);
            return new double[] {factor, 2 * factor * factor, -1 / (6 * mean), 1 / (3 * mean * mean * mean)};
        }
        return sums(mean);
    }

    private static double[] sums(double mean) {
        int last = (int) Math.ceil(mean + 12 * Math.sqrt(mean) + 25);
        int first = (int) Math.max(0, Math.floor(mean - 12 * Math.sqrt(mean)));
        double probability = first == 0 ? StrictMath.exp(-mean) : probability(first, mean);
        double expected = 0;
        double square = 0;
        double withCount = 0;
        double curvature = 0;
        for (int n = first; n <= last; n++) {
            double term = term(n, mean);
            double shift = n - mean;
            expected += probability * term;
            square += probability * term * term;
            withCount += probability * term * shift;
            curvature += probability * ((shift * shift - n) / (mean * mean) * term);
            probability *= mean / (n + 1);
        }
        // With d = 2 (mu - n + n ln(n/mu)) the first derivative of E[d] is Cov[d,n]/mu, the second adds 2/mu.
        double second = curvature - 2 / mean;
        return new double[] {expected, square - expected * expected, withCount, second};
    }

    /**
     * The probability of n Poisson counts by the saddle-point form exp(&minus;d / 2 &minus; &delta;(n)) / sqrt(2 &pi; n), which
     * keeps its digits at large means. Source: C. Loader, Fast and Accurate Computation of Binomial Probabilities (2000).
     *
     * @param count n, not negative
     * @param mean &mu;, positive
     * @return probability, relative error below 1e-14 up to means of 1e8
     */
    public static double probability(double count, double mean) {
        if (count == 0) {
            return StrictMath.exp(-mean);
        }
        double exponent = 0.5 * term(count, mean) + stirlingError(count);
        return StrictMath.exp(-exponent) / Math.sqrt(2 * Math.PI * count);
    }

    /** ln n! less Stirling's formula: its series from 16 on, below by ln Gamma. */
    private static double stirlingError(double n) {
        if (n < 16) {
            double stirling = 0.5 * StrictMath.log(2 * Math.PI * n) + n * StrictMath.log(n) - n;
            return Gamma.logGamma(n + 1) - stirling;
        }
        double square = n * n;
        return (1.0 / 12 - (1.0 / 360 - (1.0 / 1260 - (1.0 / 1680 - 1.0 / 1188 / square) / square) / square) / square)
                / n;
    }
}
