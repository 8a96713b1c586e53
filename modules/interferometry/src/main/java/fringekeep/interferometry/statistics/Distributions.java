package fringekeep.interferometry.statistics;

import org.apache.commons.math3.special.Erf;
import org.apache.commons.math3.special.Gamma;

/**
 * Distribution functions by pure-Java special functions (incomplete gamma function and error function of Commons
 * Math), good to about 1e-14 relative in the bulk.
 */
public final class Distributions {
    private static final double ROOT_TWO = Math.sqrt(2);

    private Distributions() {}

    /**
     * The standard normal distribution function.
     *
     * @param z deviate
     * @return probability of a smaller value
     */
    public static double normal(double z) {
        return 0.5 * Erf.erfc(-z / ROOT_TWO);
    }

    /**
     * The quantile of the standard normal distribution.
     *
     * @param probability between 0 and 1, exclusive
     * @return the deviate with that probability below it
     */
    public static double normalQuantile(double probability) {
        if (!(probability > 0 && probability < 1)) {
            throw new IllegalArgumentException("probability must lie between 0 and 1, is " + probability);
        }
        double tail = Math.min(probability, 1 - probability);
        if (tail < 0.02) {
            double far = tailQuantile(tail);
            return probability < 0.5 ? -far : far;
        }
        double z = ROOT_TWO * Erf.erfInv(2 * probability - 1);
        for (int polish = 0; polish < 2; polish++) {
            double density = StrictMath.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);
            z -= (normal(z) - probability) / density;
        }
        return z;
    }

    /** The deviate with a small probability above it, by Newton steps on the logarithm of the tail. */
    private static double tailQuantile(double tail) {
        double twice = -2 * StrictMath.log(tail);
        double z = Math.sqrt(twice - StrictMath.log(2 * Math.PI * Math.max(twice - 1.8, 1)));
        for (int step = 0; step < 30; step++) {
            double above = normal(-z);
            double density = StrictMath.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);
            double move = StrictMath.log(above / tail) * above / density;
            z += move;
            if (Math.abs(move) <= 1e-15 * z) {
                break;
            }
        }
        return z;
    }

    /**
     * The two-sided normal deviate of a confidence level: 1 for 68.27 %, 2 for 95.45 %.
     *
     * @param level between 0 and 1, exclusive
     * @return z with probability level between &minus;z and z
     */
    public static double twoSidedDeviate(double level) {
        return normalQuantile(0.5 + 0.5 * level);
    }

    /**
     * Probability of a &chi;&sup2; larger than the given one.
     *
     * @param chiSquare value, not negative
     * @param degreesOfFreedom degrees of freedom, positive, need not be whole
     * @return the upper tail
     */
    public static double chiSquareUpper(double chiSquare, double degreesOfFreedom) {
        return chiSquare <= 0 ? 1 : Gamma.regularizedGammaQ(0.5 * degreesOfFreedom, 0.5 * chiSquare, 1e-15, 100_000);
    }

    /**
     * Probability of a gamma variable larger than x.
     *
     * @param shape shape, positive
     * @param x value over scale
     * @return the upper tail
     */
    public static double gammaUpper(double shape, double x) {
        return x <= 0 ? 1 : Gamma.regularizedGammaQ(shape, x, 1e-15, 100_000);
    }

    /**
     * Probability of more than n Poisson counts.
     *
     * @param mean expected counts, not negative
     * @param n counts
     * @return P(X &gt; n)
     */
    public static double poissonAbove(double mean, long n) {
        return n < 0 ? 1 : mean == 0 ? 0 : Gamma.regularizedGammaP(n + 1.0, mean, 1e-15, 100_000);
    }

    /**
     * Probability of at most n Poisson counts.
     *
     * @param mean expected counts, not negative
     * @param n counts
     * @return P(X &le; n)
     */
    public static double poissonAtMost(double mean, long n) {
        return n < 0 ? 0 : mean == 0 ? 1 : Gamma.regularizedGammaQ(n + 1.0, mean, 1e-15, 100_000);
    }
}
