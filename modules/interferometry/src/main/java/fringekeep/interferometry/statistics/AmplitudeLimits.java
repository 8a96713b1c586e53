package fringekeep.interferometry.statistics;

import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.ConcurrentMap;

/**
 * What a fitted amplitude (visibility) with noise s in each quadrature says about the true one.
 *
 * <p>Sources: upper limits and thresholds by inversion of the {@link RiceDistribution}; the unified interval by the
 * ordering of G. J. Feldman and R. D. Cousins, Physical Review D 57, 3873 (1998), applied to the Rice law: it is never
 * empty, covers at the stated level for every true amplitude, 0 included, and turns from a limit to a two-sided interval by
 * itself.
 */
public final class AmplitudeLimits {
    private static final double GRID_STEP = 0.05;
    private static final double GRID_END = 12;
    private static final ConcurrentMap<Double, double[][]> TABLES = new ConcurrentHashMap<>();

    private AmplitudeLimits() {}

    private static void check(double amplitude, double noise, double level) {
        if (!(amplitude >= 0) || !(noise > 0) || !(level > 0 && level < 1)) {
            throw new IllegalArgumentException("amplitude " + amplitude + " must not be negative, noise " + noise
                    + " must be positive, level " + level + " between 0 and 1");
        }
    }

    /**
     * The amplitude noise alone exceeds with probability 1 &minus; level.
     *
     * @param noise s
     * @param level confidence level
     * @return s sqrt(&minus;2 ln(1 &minus; level)), 2.448 s at 95 %
     */
    public static double threshold(double noise, double level) {
        check(0, noise, level);
        return noise * Math.sqrt(-2 * StrictMath.log1p(-level));
    }

    /**
     * The classical upper limit: the true amplitude with which a smaller value than the seen one has probability
     * 1 &minus; level.
     *
     * @param amplitude the fitted amplitude
     * @param noise s
     * @param level confidence level
     * @return the limit; 0 where the amplitude lies below the (1 &minus; level) quantile of pure noise, in which case
     *     {@link #flatPriorUpperLimit} is the one to quote
     */
    public static double classicalUpperLimit(double amplitude, double noise, double level) {
        check(amplitude, noise, level);
        double r = amplitude / noise;
        double target = 1 - level;
        if (RiceDistribution.cumulative(r, 0) <= target) {
            return 0;
        }
        return noise
                * ScalarSearch.root(v -> RiceDistribution.cumulative(r, v) - target, 0, r + 12, 1e-12 * Math.max(1, r));
    }

    /**
     * The upper limit of a posterior with flat prior over amplitudes from 0.
     *
     * @param amplitude the fitted amplitude
     * @param noise s
     * @param level credibility
     * @return the limit
     */
    public static double flatPriorUpperLimit(double amplitude, double noise, double level) {
        check(amplitude, noise, level);
        double r = amplitude / noise;
        double end = r + 12;
        double start = Math.max(0, r - 12);
        double total = posterior(r, start, end);
        return noise
                * ScalarSearch.root(v -> posterior(r, start, v) - level * total, start, end, 1e-12 * Math.max(1, r));
    }

    /** Integral of exp(-(v - r)^2 / 2) times the scaled Bessel function of r v, by Gauss-Legendre panels of length 1. */
    private static double posterior(double r, double from, double to) {
        double sum = 0;
        int panels = (int) Math.ceil(to - from);
        for (int panel = 0; panel < panels; panel++) {
            double low = from + panel;
            double high = Math.min(to, low + 1);
            sum += GaussLegendre.integrate(
                    v -> StrictMath.exp(-0.5 * (v - r) * (v - r)) * RiceDistribution.scaledBessel(r * v)[0], low, high);
        }
        return sum;
    }

    /**
     * The amplitude less its bias: sqrt(max(0, amplitude&sup2; &minus; s&sup2;)).
     *
     * @param amplitude the fitted amplitude
     * @param noise s
     * @return corrected amplitude; a small positive bias is left below s
     */
    public static double biasCorrected(double amplitude, double noise) {
        return Math.sqrt(Math.max(0, (amplitude - noise) * (amplitude + noise)));
    }

    /**
     * Root of the mean square over many scans less the noise: sqrt(max(0, mean(V&sup2;) &minus; 2 s&sup2;)).
     *
     * @param meanSquare mean of the squared amplitudes
     * @param noise s
     * @return the amplitude common to the scans
     */
    public static double secondMomentCorrected(double meanSquare, double noise) {
        double difference = meanSquare - 2 * noise * noise;
        return difference > 4e-16 * meanSquare ? Math.sqrt(difference) : 0;
    }

    /**
     * The unified interval of the true amplitude.
     *
     * @param amplitude the fitted amplitude
     * @param noise s
     * @param level confidence level
     * @return the interval
     */
    public static Interval unifiedInterval(double amplitude, double noise, double level) {
        check(amplitude, noise, level);
        double r = amplitude / noise;
        double z = Distributions.twoSidedDeviate(level);
        double low = 0;
        if (r > acceptedHigh(0, level)) {
            low = ScalarSearch.root(v -> acceptedHigh(v, level) - r, 0, r + 1, 1e-10 * Math.max(1, r));
        }
        double high = ScalarSearch.root(
                v -> acceptedLow(v, level) - r - (acceptedLow(v, level) == 0 && r == 0 ? 1e-12 : 0),
                0,
                r + z + 4,
                1e-10 * Math.max(1, r));
        return new Interval(level, noise * low, noise * Math.max(low, high));
    }

    /**
     * Lower end of the lengths accepted at a true length, both over the noise.
     *
     * @param v true length over noise
     * @param level confidence level
     * @return r<sub>1</sub>; interpolated from exact values every 0.05, to about 1e-3
     */
    public static double acceptedLow(double v, double level) {
        return accepted(v, level, 0);
    }

    /**
     * Upper end of the lengths accepted at a true length, both over the noise.
     *
     * @param v true length over noise
     * @param level confidence level
     * @return r<sub>2</sub>
     */
    public static double acceptedHigh(double v, double level) {
        return accepted(v, level, 1);
    }

    private static double accepted(double v, double level, int end) {
        if (v >= GRID_END) {
            double z = Distributions.twoSidedDeviate(level);
            return v + 0.5 / v + (end == 0 ? -z : z);
        }
        double[] table = TABLES.computeIfAbsent(level, AmplitudeLimits::tabulate)[end];
        double place = v / GRID_STEP;
        int cell = (int) place;
        double part = place - cell;
        return table[cell] * (1 - part) + table[cell + 1] * part;
    }

    private static double[][] tabulate(double level) {
        int cells = (int) Math.round(GRID_END / GRID_STEP) + 1;
        double[][] ends = new double[2][cells + 1];
        for (int cell = 0; cell <= cells; cell++) {
            double[] band = band(cell * GRID_STEP, level);
            ends[0][cell] = band[0];
            ends[1][cell] = band[1];
        }
        return ends;
    }

    /** The acceptance band at one true length: equal likelihood ratio at both ends, or from 0. */
    private static double[] band(double v, double level) {
        if (v == 0) {
            return new double[] {0, RiceDistribution.quantile(level, 0)};
        }
        double top = RiceDistribution.quantile(level, v);
        if (logRatio(top, v) <= logRatio(0, v)) {
            return new double[] {0, top};
        }
        double best = ratioMaximum(v);
        double high = ScalarSearch.root(
                r -> {
                    double low = matching(r, v, best);
                    return RiceDistribution.cumulative(r, v) - RiceDistribution.cumulative(low, v) - level;
                },
                best,
                top + 8,
                1e-9);
        return new double[] {matching(high, v, best), high};
    }

    private static double matching(double high, double v, double best) {
        double target = logRatio(high, v);
        if (logRatio(0, v) >= target) {
            return 0;
        }
        return ScalarSearch.root(r -> logRatio(r, v) - target, 0, best, 1e-11);
    }

    /** The length at which v itself is the most likely true length. */
    private static double ratioMaximum(double v) {
        return ScalarSearch.root(r -> mostLikely(r) - v, Math.sqrt(2), v + 2, 1e-11);
    }

    /** ln of the density at v over the density at the most likely v. */
    private static double logRatio(double r, double v) {
        return logDensity(r, v) - logDensity(r, mostLikely(r));
    }

    private static double logDensity(double r, double v) {
        return -0.5 * (r - v) * (r - v) + StrictMath.log(RiceDistribution.scaledBessel(r * v)[0]);
    }

    /** The true length that makes a length most likely: 0 up to sqrt 2, then the root of v = r I1(r v) / I0(r v). */
    static double mostLikely(double r) {
        if (r * r <= 2) {
            return 0;
        }
        double low = 1e-9;
        if (slope(r, low) <= 0) {
            return 0;
        }
        return ScalarSearch.root(v -> slope(r, v), low, r, 1e-12);
    }

    private static double slope(double r, double v) {
        double[] bessel = RiceDistribution.scaledBessel(r * v);
        return r * bessel[1] / bessel[0] - v;
    }
}
