package fringekeep.interferometry.fringe;

import java.util.Random;

/** Seeded scans with known truth. {@link Random} is specified to the bit, so the scans are the same everywhere. */
final class SimulatedScans {
    private SimulatedScans() {}

    /** Poisson counts: by products of uniform numbers at small means, by a sum of a gamma and a smaller problem above. */
    static double poisson(Random random, double mean) {
        double left = mean;
        double counted = 0;
        while (left > 30) {
            // Arrival time of the m-th event is gamma distributed (J. H. Ahrens and U. Dieter, Computing 12, 223
            // (1974)).
            int m = (int) Math.floor(left * 7 / 8);
            double gamma = gamma(random, m);
            if (gamma > left) {
                return counted + binomial(random, m - 1, left / gamma);
            }
            counted += m;
            left -= gamma;
        }
        double limit = StrictMath.exp(-left);
        double product = random.nextDouble();
        while (product > limit) {
            counted++;
            product *= random.nextDouble();
        }
        return counted;
    }

    /** Gamma numbers by G. Marsaglia and W. W. Tsang, ACM Transactions on Mathematical Software 26, 363 (2000). */
    private static double gamma(Random random, double shape) {
        double d = shape - 1.0 / 3;
        double c = 1 / Math.sqrt(9 * d);
        while (true) {
            double x = random.nextGaussian();
            double v = 1 + c * x;
            if (v > 0) {
                v = v * v * v;
                double u = random.nextDouble();
                if (StrictMath.log(u) < 0.5 * x * x + d - d * v + d * StrictMath.log(v)) {
                    return d * v;
                }
            }
        }
    }

    /** Binomial numbers by splitting at the median of a beta variable until few are left. */
    private static double binomial(Random random, int n, double probability) {
        double counted = 0;
        int left = n;
        double p = probability;
        while (left > 20) {
            int a = 1 + left / 2;
            int b = left + 1 - a;
            double x = gamma(random, a);
            double beta = x / (x + gamma(random, b));
            if (beta >= p) {
                left = a - 1;
                p /= beta;
            } else {
                counted += a;
                left = b - 1;
                p = (p - beta) / (1 - beta);
            }
        }
        for (int i = 0; i < left; i++) {
            counted += random.nextDouble() < p ? 1 : 0;
        }
        return counted;
    }

    /** A scan over one period of length 1 with mean counts, visibility, phase, background counts and linear drift. */
    static FringeData scan(
            Random random, int points, double mean, double visibility, double phase, double background, double drift) {
        double[] positions = new double[points];
        double[] counts = new double[points];
        for (int i = 0; i < points; i++) {
            positions[i] = (double) i / points;
            double t = i / (points - 1.0) - 0.5;
            double shape = 1 + visibility * StrictMath.cos(2 * Math.PI * positions[i] + phase);
            counts[i] = poisson(random, background + mean * (1 + drift * t) * shape);
        }
        return FringeData.of(positions, counts);
    }
}
