package fringekeep.interferometry.statistics;

import java.util.function.DoubleUnaryOperator;

/** Roots and minima of functions of one variable, by methods that cannot leave their bracket. */
public final class ScalarSearch {
    private ScalarSearch() {}

    /**
     * A root inside a bracket by the secant of Illinois type with bisection as safeguard.
     *
     * @param f continuous function
     * @param low one end
     * @param high other end; f has opposite signs at both
     * @param tolerance absolute width of the final bracket
     * @return the root
     * @throws IllegalArgumentException if the signs at both ends are the same
     */
    public static double root(DoubleUnaryOperator f, double low, double high, double tolerance) {
        double a = low;
        double b = high;
        double fa = f.applyAsDouble(a);
        double fb = f.applyAsDouble(b);
        if (fa == 0) {
            return a;
        }
        if (fb == 0) {
            return b;
        }
        if (fa > 0 == fb > 0) {
            throw new IllegalArgumentException("no change of sign between " + low + " and " + high);
        }
        for (int step = 0; step < 300 && Math.abs(b - a) > tolerance; step++) {
            double middle = step % 3 == 2 ? 0.5 * (a + b) : b - fb * (b - a) / (fb - fa);
            if (!(middle > Math.min(a, b) && middle < Math.max(a, b))) {
                middle = 0.5 * (a + b);
                if (middle == a || middle == b) {
                    break;
                }
            }
            double value = f.applyAsDouble(middle);
            if (value == 0) {
                return middle;
            }
            if (value > 0 == fb > 0) {
                fa = step % 3 == 2 ? fa : 0.5 * fa;
            } else {
                a = b;
                fa = fb;
            }
            b = middle;
            fb = value;
        }
        return b;
    }

    /**
     * The place of a minimum by golden sections.
     *
     * @param f function with one minimum in the bracket
     * @param low lower end
     * @param high upper end
     * @param tolerance width of the final bracket, not below 1e-8 of its place
     * @return the place
     */
    public static double minimum(DoubleUnaryOperator f, double low, double high, double tolerance) {
        double ratio = 0.5 * (Math.sqrt(5) - 1);
        double a = low;
        double b = high;
        double c = b - ratio * (b - a);
        double d = a + ratio * (b - a);
        double fc = f.applyAsDouble(c);
        double fd = f.applyAsDouble(d);
        while (b - a > tolerance && c > a && d < b) {
            if (fc <= fd) {
                b = d;
                d = c;
                fd = fc;
                c = b - ratio * (b - a);
                fc = f.applyAsDouble(c);
            } else {
                a = c;
                c = d;
                fc = fd;
                d = a + ratio * (b - a);
                fd = f.applyAsDouble(d);
            }
        }
        return 0.5 * (a + b);
    }
}
