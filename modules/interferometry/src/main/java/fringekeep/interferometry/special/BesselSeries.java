package fringekeep.interferometry.special;

/**
 * Bessel functions of whole order by series, backward recurrence and asymptotic expansion: slow and exact, any order.
 *
 * <p>Sources: NIST Digital Library of Mathematical Functions 10.2.2, 10.25.2 (power series), 10.6.1, 10.29.1
 * (recurrences), 10.12.4, 10.35.4 (normalisation), 10.17.3, 10.40.1 (large arguments); the backward recurrence is
 * J. C. P. Miller's. Orders and arguments here are not negative.
 */
final class BesselSeries {
    private static final double RESCALE_ABOVE = 0x1.0p400;
    private static final double RESCALE = 0x1.0p-400;
    private static final int MAXIMUM_TERMS = 200;

    private BesselSeries() {}

    /** J_n(x); absolute error at most 2e-15, relative 2e-15 where x^2 &lt; 4(n+1). */
    static double besselJ(int n, double x) {
        if (x * x <= 4.0 * (n + 1)) {
            return prefactor(n, x) * reducedJ(n, x);
        }
        return x > 25.0 + 0.5 * n * n ? largeArgumentJ(n, x) : backwardJ(n, x);
    }

    /** e^-x I_n(x); relative error at most 3e-15. */
    static double scaledI(int n, double x) {
        if (x < 8.0) {
            return StrictMath.exp(-x) * prefactor(n, x) * reducedI(n, x);
        }
        return x > 30.0 + n * (double) n ? largeArgumentI(n, x) : backwardI(n, x);
    }

    /** n! (2/x)^n J_n(x), one at x = 0; accurate to 1e-15 for x up to 4. */
    static double reducedJ(int n, double x) {
        return powerSeries(n, -0.25 * x * x);
    }

    /** n! (2/x)^n I_n(x), one at x = 0. */
    static double reducedI(int n, double x) {
        return powerSeries(n, 0.25 * x * x);
    }

    private static double powerSeries(int n, double quarterSquare) {
        double term = 1.0;
        double sum = 0.0;
        for (int k = 1; k <= MAXIMUM_TERMS && Math.abs(term) > 1e-18 * Math.abs(sum); k++) {
            sum += term;
            term *= quarterSquare / (k * (double) (n + k));
        }
        return sum;
    }

    /** (x/2)^n/n!, formed factor by factor so that it neither overflows nor loses digits. */
    static double prefactor(int n, double x) {
        double value = 1.0;
        for (int k = 1; k <= n; k++) {
            value *= 0.5 * x / k;
        }
        return value;
    }

    private static double backwardJ(int n, double x) {
        double top = Math.max(n, x);
        int order = (int) (top + 30.0 + 12.0 * StrictMath.cbrt(top));
        double above = 0.0;
        double here = 1e-300;
        double evenSum = order % 2 == 0 ? here : 0.0;
        double wanted = 0.0;
        for (int k = order; k > 0; k--) {
            double below = 2.0 * k / x * here - above;
            above = here;
            here = below;
            if (Math.abs(here) > RESCALE_ABOVE) {
                here *= RESCALE;
                above *= RESCALE;
                evenSum *= RESCALE;
                wanted *= RESCALE;
            }
            if (k - 1 == n) {
                wanted = here;
            }
            if ((k - 1) % 2 == 0 && k > 1) {
                evenSum += here;
            }
        }
        return wanted / (here + 2.0 * evenSum);
    }

    private static double backwardI(int n, double x) {
        int order = (int) (20.0 + Math.sqrt(n * (double) n + 90.0 * x));
        double above = 0.0;
        double here = 1e-300;
        double sum = here;
        double wanted = 0.0;
        for (int k = order; k > 0; k--) {
            double below = 2.0 * k / x * here + above;
            above = here;
            here = below;
            if (here > RESCALE_ABOVE) {
                here *= RESCALE;
                above *= RESCALE;
                sum *= RESCALE;
                wanted *= RESCALE;
            }
            if (k - 1 == n) {
                wanted = here;
            }
            sum += k > 1 ? here : 0.0;
        }
        return wanted / (here + 2.0 * sum);
    }

    private static double largeArgumentJ(int n, double x) {
        double even = 1.0;
        double odd = 0.0;
        double term = 1.0;
        for (int k = 1; k <= MAXIMUM_TERMS; k++) {
            double next = term * (4.0 * n * n - (2.0 * k - 1.0) * (2.0 * k - 1.0)) / (8.0 * k * x);
            if (next == 0.0 || Math.abs(next) > Math.abs(term) && k > n) {
                break;
            }
            term = next;
            double signed = (k / 2) % 2 == 0 ? term : -term;
            even += k % 2 == 0 ? signed : 0.0;
            odd += k % 2 == 1 ? signed : 0.0;
            if (Math.abs(term) < 1e-18) {
                break;
            }
        }
        double cosine = StrictMath.cos(x);
        double sine = StrictMath.sin(x);
        double first = even * phaseCosine(n, cosine, sine);
        double second = odd * phaseCosine((n + 1) % 4, cosine, sine);
        return Math.sqrt(2.0 / (Math.PI * x)) * (first - second);
    }

    /**
     * cos(x - n&pi;/2 - &pi;/4) from sin x and cos x, so that a large x loses no digits in the difference; its sine is that
     * of the next order.
     */
    private static double phaseCosine(int n, double cosine, double sine) {
        double value =
                switch (n % 4) {
                    case 0 -> cosine + sine;
                    case 1 -> sine - cosine;
                    case 2 -> -cosine - sine;
                    default -> cosine - sine;
                };
        return value * Math.sqrt(0.5);
    }

    private static double largeArgumentI(int n, double x) {
        double sum = 0.0;
        double term = 1.0;
        for (int k = 1; k <= MAXIMUM_TERMS && Math.abs(term) > 1e-18 * Math.abs(sum); k++) {
            sum += term;
            term *= -(4.0 * n * n - (2.0 * k - 1.0) * (2.0 * k - 1.0)) / (8.0 * k * x);
        }
        return sum / Math.sqrt(2.0 * Math.PI * x);
    }
}
