package fringekeep.interferometry.special;

/**
 * The entire function G_n(w) that joins J_n and I_n: J_n(&radic;w)/w^(n/2) for w &gt; 0, I_n(&radic;-w)/(-w)^(n/2)
 * for w &lt; 0, 1/(2^n n!) at w = 0.
 *
 * <p>It has no branch, so kernels of gratings that absorb and shift phase are evaluated without complex arithmetic
 * and without the removable singularity of the quotient form. Derivative: G_n' = -G_(n+1)/2 (NIST Digital Library
 * of Mathematical Functions 10.6.6, 10.29.4). Accuracy: relative 2e-14 for w &lt; 2(n+1); for larger w absolute
 * 4e-15 w^(-n/2). Thread rule: stateless.
 */
public final class EntireBessel {
    private EntireBessel() {}

    /**
     * Value of G_n(w), scaled for negative w so that it cannot overflow.
     *
     * @param n order, &ge; 0
     * @param w argument, finite
     * @return G_n(w) for w &ge; 0 and e^(-&radic;-w) G_n(w) for w &lt; 0
     * @throws IllegalArgumentException if n is negative or w is not finite
     */
    public static double scaled(int n, double w) {
        if (n < 0) {
            throw new IllegalArgumentException("G_n is defined for orders from 0, not " + n);
        }
        return scaledAtRoot(n, Math.sqrt(Math.abs(w)), w < 0.0);
    }

    /** The same with the root of |w| and the sign of w at hand. */
    static double scaledAtRoot(int n, double root, boolean negative) {
        if (root < Bessel.REDUCED_BELOW) {
            double reduced = negative ? Bessel.reducedScaledI(n, root) : Bessel.reducedJ(n, root);
            return reduced * BesselSeries.prefactor(n, 1.0);
        }
        double value = negative ? Bessel.scaledI(n, root) : Bessel.j(n, root);
        return value / power(root, n);
    }

    /**
     * Value of G_n(w).
     *
     * @param n order, &ge; 0
     * @param w argument, finite
     * @return G_n(w), infinite beyond the range of a double
     * @throws IllegalArgumentException if n is negative or w is not finite
     */
    public static double value(int n, double w) {
        double scaled = scaled(n, w);
        return w < 0.0 ? scaled * StrictMath.exp(Math.sqrt(-w)) : scaled;
    }

    /** Whole power by repeated multiplication, the same bits everywhere. */
    static double power(double base, int exponent) {
        double value = 1.0;
        for (int k = 0; k < exponent; k++) {
            value *= base;
        }
        return value;
    }
}
