package fringekeep.interferometry.special;

/**
 * Bessel functions J_n and I_n of whole order, fast for the orders that grating theory needs.
 *
 * <p>Orders 0 to 5 and |x| &lt; 64 come from piecewise polynomials of degree 10, made at first use from power series
 * and backward recurrence; below |x| = 4 the table holds n! (2/x)^n J_n(x), so that nothing is lost as x goes to
 * zero. Other orders and arguments are computed by series, recurrence or asymptotic expansion.
 *
 * <p>Accuracy, tested against an independent library over the domain:
 * <ul>
 *   <li>J_n: absolute error at most 4e-15; relative error at most 1e-14 for x^2 &lt; 2(n+1);
 *   <li>e^-x I_n: relative error at most 1e-14 (all x and n);
 *   <li>I_n: relative error at most 2e-14, infinite when the value exceeds the range of a double.
 * </ul>
 *
 * <p>Source: NIST Digital Library of Mathematical Functions, chapter 10. Thread rule: stateless.
 */
public final class Bessel {
    /** Largest order with a table. */
    static final int TABLE_ORDER = 5;
    /** Below this argument the tables hold the reduced functions. */
    static final double REDUCED_BELOW = 4.0;
    /** End of the tables. */
    static final double TABLE_END = 64.0;

    private static final double WIDTH = 0.5;

    private Bessel() {}

    /**
     * Bessel function of the first kind.
     *
     * @param order whole order n, any sign
     * @param x     argument, finite
     * @return J_n(x)
     * @throws IllegalArgumentException if x is not finite
     */
    public static double j(int order, double x) {
        int n = Math.abs(order);
        double size = requireFinite(x);
        boolean negative = n % 2 == 1 && (order < 0) != (x < 0.0);
        double value = positiveJ(n, size);
        return negative ? -value : value;
    }

    /**
     * A weighted sum of values at places in proportion, &Sigma; w_q J_n(f_q x), as averages over speeds need; the terms
     * are added in their order by fused multiply-adds, with the bits of {@link #j}.
     *
     * @param order   whole order n, any sign
     * @param weights w_q
     * @param factors f_q, as many
     * @param x       argument; f_q x finite
     * @return the sum
     * @throws IllegalArgumentException if an argument is not finite
     */
    public static double weightedJ(int order, double[] weights, double[] factors, double x) {
        int n = Math.abs(order);
        if (n > TABLE_ORDER) {
            return slowWeightedJ(order, weights, factors, x);
        }
        PiecewisePolynomial reduced = Tables.REDUCED_J[n];
        PiecewisePolynomial direct = Tables.DIRECT_J[n];
        double sum = 0.0;
        for (int q = 0; q < weights.length; q++) {
            double argument = factors[q] * x;
            double size = Math.abs(argument);
            double value;
            if (size >= REDUCED_BELOW && size < TABLE_END) {
                value = direct.value(size);
            } else if (size < REDUCED_BELOW) {
                value = BesselSeries.prefactor(n, size) * reduced.value(size);
            } else {
                value = positiveJ(n, requireFinite(argument));
            }
            boolean negative = n % 2 == 1 && (order < 0) != (argument < 0.0);
            sum = Math.fma(weights[q], negative ? -value : value, sum);
        }
        return sum;
    }

    private static double slowWeightedJ(int order, double[] weights, double[] factors, double x) {
        double sum = 0.0;
        for (int q = 0; q < weights.length; q++) {
            sum = Math.fma(weights[q], j(order, factors[q] * x), sum);
        }
        return sum;
    }

    /**
     * Modified Bessel function of the first kind, scaled: e^-|x| I_n(x).
     *
     * @param order whole order n, any sign
     * @param x     argument, finite
     * @return e^-|x| I_n(x)
     * @throws IllegalArgumentException if x is not finite
     */
    public static double scaledI(int order, double x) {
        int n = Math.abs(order);
        double value = positiveScaledI(n, requireFinite(x));
        return n % 2 == 1 && x < 0.0 ? -value : value;
    }

    /**
     * Modified Bessel function of the first kind.
     *
     * @param order whole order n, any sign
     * @param x     argument, finite
     * @return I_n(x), infinite beyond the range of a double (|x| above about 713); use the scaled form there
     * @throws IllegalArgumentException if x is not finite
     */
    public static double i(int order, double x) {
        return scaledI(order, x) * StrictMath.exp(Math.abs(x));
    }

    private static double requireFinite(double x) {
        if (!Double.isFinite(x)) {
            throw new IllegalArgumentException("a Bessel function needs a finite argument, not " + x);
        }
        return Math.abs(x);
    }

    private static double positiveJ(int n, double x) {
        if (n > TABLE_ORDER || x >= TABLE_END) {
            return BesselSeries.besselJ(n, x);
        }
        return x < REDUCED_BELOW
                ? BesselSeries.prefactor(n, x) * Tables.REDUCED_J[n].value(x)
                : Tables.DIRECT_J[n].value(x);
    }

    private static double positiveScaledI(int n, double x) {
        if (n > TABLE_ORDER || x >= TABLE_END) {
            return BesselSeries.scaledI(n, x);
        }
        return x < REDUCED_BELOW
                ? BesselSeries.prefactor(n, x) * Tables.REDUCED_I[n].value(x)
                : Tables.DIRECT_I[n].value(x);
    }

    /** n! (2/x)^n J_n(x) for 0 &le; x &lt; 4 and any n. */
    static double reducedJ(int n, double x) {
        return n <= TABLE_ORDER ? Tables.REDUCED_J[n].value(x) : BesselSeries.reducedJ(n, x);
    }

    /** e^-x n! (2/x)^n I_n(x) for 0 &le; x &lt; 4 and any n. */
    static double reducedScaledI(int n, double x) {
        return n <= TABLE_ORDER ? Tables.REDUCED_I[n].value(x) : StrictMath.exp(-x) * BesselSeries.reducedI(n, x);
    }

    /** Made at first use; the class loader publishes them safely. */
    private static final class Tables {
        static final PiecewisePolynomial[] REDUCED_J = new PiecewisePolynomial[TABLE_ORDER + 1];
        static final PiecewisePolynomial[] DIRECT_J = new PiecewisePolynomial[TABLE_ORDER + 1];
        static final PiecewisePolynomial[] REDUCED_I = new PiecewisePolynomial[TABLE_ORDER + 1];
        static final PiecewisePolynomial[] DIRECT_I = new PiecewisePolynomial[TABLE_ORDER + 1];

        static {
            int low = (int) (REDUCED_BELOW / WIDTH);
            int high = (int) ((TABLE_END - REDUCED_BELOW) / WIDTH);
            for (int order = 0; order <= TABLE_ORDER; order++) {
                int n = order;
                REDUCED_J[n] = PiecewisePolynomial.of(x -> BesselSeries.reducedJ(n, x), 0.0, WIDTH, low);
                DIRECT_J[n] = PiecewisePolynomial.of(x -> BesselSeries.besselJ(n, x), REDUCED_BELOW, WIDTH, high);
                REDUCED_I[n] =
                        PiecewisePolynomial.of(x -> StrictMath.exp(-x) * BesselSeries.reducedI(n, x), 0.0, WIDTH, low);
                DIRECT_I[n] = PiecewisePolynomial.of(x -> BesselSeries.scaledI(n, x), REDUCED_BELOW, WIDTH, high);
            }
        }
    }
}
