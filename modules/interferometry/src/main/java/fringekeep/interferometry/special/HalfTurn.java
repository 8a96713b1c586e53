package fringekeep.interferometry.special;

/**
 * Sine and cosine of an angle given in half turns, sin(&pi;x) and cos(&pi;x), without loss near whole numbers.
 *
 * <p>The argument is reduced exactly before it is multiplied by &pi;, so that the zeros at whole (sine) and half-odd
 * (cosine) arguments are exact. Accuracy: relative error at most 1e-15. Thread rule: stateless.
 */
public final class HalfTurn {
    private HalfTurn() {}

    /**
     * Sine of &pi;x.
     *
     * @param x angle in half turns, finite
     * @return sin(&pi;x), exactly zero at whole x
     */
    public static double sin(double x) {
        double whole = Math.rint(x);
        double rest = x - whole;
        double value = Math.abs(rest) <= 0.25
                ? StrictMath.sin(Math.PI * rest)
                : Math.copySign(StrictMath.cos(Math.PI * (0.5 - Math.abs(rest))), rest);
        return isOdd(whole) ? -value : value;
    }

    /**
     * Cosine of &pi;x.
     *
     * @param x angle in half turns, finite
     * @return cos(&pi;x), exactly zero at half-odd x
     */
    public static double cos(double x) {
        double whole = Math.rint(x);
        double rest = Math.abs(x - whole);
        double value = rest <= 0.25 ? StrictMath.cos(Math.PI * rest) : StrictMath.sin(Math.PI * (0.5 - rest));
        return isOdd(whole) ? -value : value;
    }

    private static boolean isOdd(double whole) {
        return Math.abs(whole % 2.0) == 1.0;
    }
}
