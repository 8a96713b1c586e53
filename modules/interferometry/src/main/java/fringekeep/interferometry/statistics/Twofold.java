package fringekeep.interferometry.statistics;

/**
 * A number as the unevaluated sum of two doubles, about 32 digits.
 *
 * <p>Source: T. J. Dekker, Numerische Mathematik 18, 224 (1971), with the product by fused multiply-add; D. E. Knuth, The Art
 * of Computer Programming 2, 4.2.2 for the exact sum.
 *
 * @param high the nearest double
 * @param low what it lacks
 */
record Twofold(double high, double low) {
    static final Twofold ZERO = new Twofold(0, 0);

    static Twofold of(double value) {
        return new Twofold(value, 0);
    }

    private static Twofold normal(double a, double b) {
        double sum = a + b;
        return new Twofold(sum, b - (sum - a));
    }

    private static Twofold exactSum(double a, double b) {
        double sum = a + b;
        double part = sum - a;
        return new Twofold(sum, (a - (sum - part)) + (b - part));
    }

    Twofold plus(Twofold other) {
        Twofold first = exactSum(high, other.high);
        Twofold second = exactSum(low, other.low);
        Twofold third = normal(first.high, first.low + second.high);
        return normal(third.high, third.low + second.low);
    }

    Twofold negative() {
        return new Twofold(-high, -low);
    }

    Twofold minus(Twofold other) {
        return plus(other.negative());
    }

    Twofold times(Twofold other) {
        double product = high * other.high;
        double rest = Math.fma(high, other.high, -product) + (high * other.low + low * other.high);
        return normal(product, rest);
    }

    Twofold over(Twofold other) {
        double quotient = high / other.high;
        Twofold rest = minus(other.times(of(quotient)));
        double second = rest.high / other.high;
        Twofold last = rest.minus(other.times(of(second)));
        return exactSum(quotient, second).plus(of(last.high / other.high));
    }

    /** The root of a number that is not negative, by one step of Newton from the double one. */
    Twofold root() {
        if (high == 0) {
            return ZERO;
        }
        double root = Math.sqrt(high);
        Twofold rest = minus(of(root).times(of(root)));
        return exactSum(root, rest.high / (2 * root));
    }

    double value() {
        return high + low;
    }
}
