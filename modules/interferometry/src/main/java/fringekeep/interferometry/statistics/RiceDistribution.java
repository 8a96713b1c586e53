package fringekeep.interferometry.statistics;

/**
 * The Rice law: the length of a plane vector of true length v with independent normal noise 1 in both directions. A
 * fitted visibility of true value V with noise s in each quadrature follows it with v = V / s.
 *
 * <p>Source: S. O. Rice, Bell System Technical Journal 24, 46 (1945); the square is non-central &chi;&sup2; with two
 * degrees of freedom and is summed as a Poisson mixture. Absolute error below 1e-12 for v up to 1e4; above, the normal law
 * with the mean shifted by 1 / (2 v) is used (error below 1e-9).
 */
public final class RiceDistribution {
    private static final double NORMAL_FROM = 1e4;

    private RiceDistribution() {}

    /**
     * Probability of a length of at most r.
     *
     * @param r length over noise
     * @param v true length over noise, not negative
     * @return the distribution function
     */
    public static double cumulative(double r, double v) {
        if (!(r > 0)) {
            return 0;
        }
        if (v > NORMAL_FROM) {
            return Distributions.normal(r - v - 0.5 / v);
        }
        if (r - v > 40) {
            return 1;
        }
        double half = 0.5 * v * v;
        double y = 0.5 * r * r;
        if (half == 0) {
            return -StrictMath.expm1(-y);
        }
        int start = (int) Math.floor(half);
        double weight = PoissonDeviance.probability(start, half);
        double step = PoissonDeviance.probability(start + 1.0, y);
        double below = above(start, y, step);
        double sum = weight * below;
        double upWeight = weight;
        double upBelow = below;
        double upStep = step;
        for (int k = start + 1; upWeight > 1e-18 * weight || k < start + 5; k++) {
            upWeight *= half / k;
            upBelow = Math.max(0, upBelow - upStep);
            upStep *= y / (k + 1);
            sum += upWeight * upBelow;
        }
        double downWeight = weight;
        double downBelow = below;
        double downStep = step;
        for (int k = start; k > 0 && downWeight > 1e-18 * weight; k--) {
            downWeight *= k / half;
            downStep *= (k + 1) / y;
            downBelow = Math.min(1, downBelow + downStep);
            sum += downWeight * downBelow;
        }
        return Math.min(1, Math.max(0, sum));
    }

    /** Probability of more than k Poisson counts of mean y by summation away from the mode; next is that of k + 1. */
    private static double above(int k, double y, double next) {
        double sum = 0;
        double term = next;
        if (k + 1 > y) {
            for (double m = k + 2; term > 1e-18 * next; m++) {
                sum += term;
                term *= y / m;
            }
            return sum;
        }
        for (double m = k + 1; m > 0 && term > 1e-18 * next; m--) {
            term *= m / y;
            sum += term;
        }
        return 1 - sum;
    }

    /**
     * The length below which a given probability lies.
     *
     * @param probability between 0 and 1, exclusive
     * @param v true length over noise
     * @return r
     */
    public static double quantile(double probability, double v) {
        if (v == 0) {
            return Math.sqrt(-2 * StrictMath.log1p(-probability));
        }
        double high = v + 1 + 10;
        while (cumulative(high, v) < probability) {
            high += 10;
        }
        return ScalarSearch.root(
                r -> cumulative(r, v) - probability, Math.max(0, v - 40), high, 1e-13 * Math.max(1, v));
    }

    /**
     * The mean length.
     *
     * @param v true length over noise
     * @return E[r]; sqrt(&pi; / 2) at v = 0
     */
    public static double mean(double v) {
        double x = 0.5 * v * v;
        if (x > 60) {
            double term = 1;
            double sum = 1;
            for (int k = 1; k < 30 && Math.abs(term) > 1e-18; k++) {
                double factor = k - 1.5;
                term *= factor * factor / (k * x);
                sum += term;
            }
            return v * sum;
        }
        double term = 1;
        double sum = 1;
        for (int k = 1; term > 1e-18 * sum; k++) {
            term *= (k + 0.5) * x / ((double) k * k);
            sum += term;
        }
        return Math.sqrt(0.5 * Math.PI) * StrictMath.exp(-x) * sum;
    }

    /**
     * exp(&minus;z) I<sub>0</sub>(z) and exp(&minus;z) I<sub>1</sub>(z) for z &ge; 0.
     *
     * @param z argument
     * @return both, to about 1e-14 relative
     */
    static double[] scaledBessel(double z) {
        if (z > 30) {
            double zero = 1;
            double one = 1;
            double termZero = 1;
            double termOne = 1;
            for (int k = 1; k < 40; k++) {
                double odd = (2.0 * k - 1) * (2.0 * k - 1);
                double nextZero = termZero * odd / (8 * k * z);
                double nextOne = termOne * (odd - 4) / (8 * k * z);
                if (Math.abs(nextZero) > Math.abs(termZero)) {
                    break;
                }
                termZero = nextZero;
                termOne = nextOne;
                zero += termZero;
                one += termOne;
            }
            double front = 1 / Math.sqrt(2 * Math.PI * z);
            return new double[] {front * zero, front * one};
        }
        double quarter = 0.25 * z * z;
        double term = 1;
        double zero = 1;
        double one = 1;
        double termOne = 1;
        for (int k = 1; term > 1e-18 * zero; k++) {
            term *= quarter / ((double) k * k);
            termOne *= quarter / (k * (k + 1.0));
            zero += term;
            one += termOne;
        }
        double scale = StrictMath.exp(-z);
        return new double[] {scale * zero, scale * 0.5 * z * one};
    }
}
