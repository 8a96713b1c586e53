package fringekeep.interferometry.fringe;

/**
 * Cosine and sine of an angle in turns, exact at quarter turns: there they are exactly 0 and &plusmn;1, so that four-step
 * scans give the exact quotients. An angle within its own last two places of a quarter counts as the quarter.
 *
 * <p>Between, the angle is reduced exactly to an eighth of a turn and the Taylor series summed to the order where the rest
 * falls below 1e-18: absolute error below 2e-16. Sums and products only, so the same bits on every machine, and three times
 * faster than the library's.
 */
final class Turns {
    private static final double TWO_PI = 2 * Math.PI;

    /** Twice the last place of a turn, as an angle, and a little more. */
    private static final double NEAR_QUARTER = 3.2e-15;

    private static final double C2 = -1.0 / 2;
    private static final double C4 = 1.0 / 24;
    private static final double C6 = -1.0 / 720;
    private static final double C8 = 1.0 / 40320;
    private static final double C10 = -1.0 / 3628800;
    private static final double C12 = 1.0 / 479001600;
    private static final double C14 = -1.0 / 87178291200.0;
    private static final double C16 = 1.0 / 20922789888000.0;
    private static final double S3 = -1.0 / 6;
    private static final double S5 = 1.0 / 120;
    private static final double S7 = -1.0 / 5040;
    private static final double S9 = 1.0 / 362880;
    private static final double S11 = -1.0 / 39916800;
    private static final double S13 = 1.0 / 6227020800.0;
    private static final double S15 = -1.0 / 1307674368000.0;
    private static final double S17 = 1.0 / 355687428096000.0;

    private Turns() {}

    static double cos(double turns) {
        double quarters = Math.rint(4 * turns);
        double angle = rest(turns, quarters);
        return switch ((int) (quarters - 4 * Math.floor(0.25 * quarters))) {
            case 0 -> cosine(angle);
            case 1 -> 0.0 - sine(angle);
            case 2 -> -cosine(angle);
            default -> sine(angle);
        };
    }

    static double sin(double turns) {
        double quarters = Math.rint(4 * turns);
        double angle = rest(turns, quarters);
        return switch ((int) (quarters - 4 * Math.floor(0.25 * quarters))) {
            case 0 -> sine(angle);
            case 1 -> cosine(angle);
            case 2 -> 0.0 - sine(angle);
            default -> -cosine(angle);
        };
    }

    /** Both at once: the cosine at out[at], the sine at out[at + 1]. */
    static void both(double turns, double[] out, int at) {
        double quarters = Math.rint(4 * turns);
        double angle = rest(turns, quarters);
        double c = cosine(angle);
        double s = sine(angle);
        int quarter = (int) (quarters - 4 * Math.floor(0.25 * quarters));
        boolean odd = (quarter & 1) != 0;
        double first = odd ? 0.0 - s : c;
        double second = odd ? c : s;
        boolean back = quarter >= 2;
        out[at] = back ? 0.0 - first : first;
        out[at + 1] = back ? 0.0 - second : second;
    }

    /**
     * Many at once, the same bits as {@link #both}: plain loops over arrays, which the compiler turns into vector
     * instructions.
     *
     * @param turns angles before the factor
     * @param factor multiplies every angle
     * @param cosine filled
     * @param sine filled
     * @param rest scratch of the same length
     * @param quarter scratch of the same length
     */
    static void all(double[] turns, double factor, double[] cosine, double[] sine, double[] rest, double[] quarter) {
        int n = turns.length;
        for (int i = 0; i < n; i++) {
            double turn = turns[i] * factor;
            double quarters = Math.rint(4 * turn);
            quarter[i] = quarters;
            rest[i] = TWO_PI * (turn - 0.25 * quarters);
        }
        for (int i = 0; i < n; i++) {
            cosine[i] = cosine(rest[i]);
        }
        for (int i = 0; i < n; i++) {
            sine[i] = sine(rest[i]);
        }
        for (int i = 0; i < n; i++) {
            toQuarter(i, turns[i] * factor, cosine, sine, rest[i], quarter[i]);
        }
    }

    private static void toQuarter(int i, double turn, double[] cosine, double[] sine, double rest, double quarters) {
        if (Math.abs(rest) <= NEAR_QUARTER * Math.abs(turn) || Math.abs(rest) <= 1e-300) {
            cosine[i] = cos(turn);
            sine[i] = sin(turn);
            return;
        }
        // Products with 1, 0 and -1 are exact and cheaper than a choice among four.
        double quarter = quarters - 4 * Math.floor(0.25 * quarters);
        double across = Math.abs(quarter - 2) - 1;
        double along = 1 - Math.abs(quarter - 1);
        double c = cosine[i];
        double s = sine[i];
        cosine[i] = c * across - s * along;
        sine[i] = s * across + c * along;
    }

    private static double rest(double turns, double quarters) {
        double rest = turns - 0.25 * quarters;
        return Math.abs(rest) <= 2 * Math.ulp(turns) ? 0 : TWO_PI * rest;
    }

    private static double cosine(double x) {
        double q = x * x;
        return 1 + q * (C2 + q * (C4 + q * (C6 + q * (C8 + q * (C10 + q * (C12 + q * (C14 + q * C16)))))));
    }

    private static double sine(double x) {
        double q = x * x;
        return x + x * (q * (S3 + q * (S5 + q * (S7 + q * (S9 + q * (S11 + q * (S13 + q * (S15 + q * S17))))))));
    }
}
