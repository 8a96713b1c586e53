package fringekeep.interferometry.trace;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;

/**
 * Cooling or heating rate from the energy of an oscillator after a change: E(t) = E_end + (E_start - E_end) exp(-rate
 * t).
 *
 * <p>For each rate the two energies follow by linear least squares; the rate by Gauss-Newton from a scan over four
 * decades. Weighted by the uncertainties given.
 *
 * @param rate             decay rate of the energy (1/s)
 * @param start            energy at time zero (unit of the data)
 * @param end              energy after long times (unit of the data)
 * @param covariance       of rate, start, end, lower triangle by rows
 * @param chiSquare        weighted sum of squares
 * @param degreesOfFreedom points less three
 */
public record RingDown(
        Estimate rate, Estimate start, Estimate end, double[] covariance, double chiSquare, int degreesOfFreedom) {
    private static final int SCAN = 240;

    /**
     * Probability of a larger chi-square.
     *
     * @return p-value, 1 without degrees of freedom
     */
    public double pValue() {
        return degreesOfFreedom < 1 ? 1.0 : Distributions.chiSquareUpper(chiSquare, degreesOfFreedom);
    }

    /**
     * Fits.
     *
     * @param times         times after the change (s), &ge; 0, at least three different
     * @param energies      energy or mean square at each time
     * @param uncertainties standard uncertainty of each, &gt; 0
     * @return the fit; empty if the data do not show a decay within 1/100 to 100 of their span
     */
    public static Optional<RingDown> fit(double[] times, double[] energies, double[] uncertainties) {
        if (times.length < 3 || times.length != energies.length || times.length != uncertainties.length) {
            throw new IllegalArgumentException(
                    "a ring-down needs at least three points with uncertainties: " + times.length + " times");
        }
        return new Solver(times, energies, uncertainties).solve();
    }

    private static final class Solver {
        private final double[] times;
        private final double[] energies;
        private final double[] uncertainties;
        private final double[] normal = new double[6];
        private final double[] right = new double[3];

        Solver(double[] times, double[] energies, double[] uncertainties) {
            this.times = times.clone();
            this.energies = energies.clone();
            this.uncertainties = uncertainties.clone();
        }

        Optional<RingDown> solve() {
            double span = 0.0;
            for (double time : times) {
                span = Math.max(span, time);
            }
            double best = Double.POSITIVE_INFINITY;
            double[] here = new double[3];
            int place = -1;
            for (int k = 0; k <= SCAN; k++) {
                double rate = StrictMath.pow(10.0, -2.0 + 4.0 * k / SCAN) / span;
                double[] trial = linear(rate);
                double square = square(trial);
                if (square < best) {
                    best = square;
                    here = trial;
                    place = k;
                }
            }
            return place <= 0 || place >= SCAN ? Optional.empty() : polish(here, best);
        }

        /** Best energies at a rate, from the two-parameter normal equations. */
        private double[] linear(double rate) {
            double[] n = new double[3];
            double[] b = new double[2];
            for (int k = 0; k < times.length; k++) {
                double left = StrictMath.exp(-rate * times[k]);
                double weight = 1.0 / (uncertainties[k] * uncertainties[k]);
                n[0] += weight * left * left;
                n[1] += weight * left * (1.0 - left);
                n[2] += weight * (1.0 - left) * (1.0 - left);
                b[0] += weight * left * energies[k];
                b[1] += weight * (1.0 - left) * energies[k];
            }
            if (!SymmetricMatrix.factor(n, 2, 1e-13)) {
                return new double[] {rate, Double.NaN, Double.NaN};
            }
            SymmetricMatrix.solve(n, 2, b);
            return new double[] {rate, b[0], b[1]};
        }

        private double square(double[] p) {
            java.util.Arrays.fill(normal, 0.0);
            java.util.Arrays.fill(right, 0.0);
            double sum = 0.0;
            double[] slope = new double[3];
            for (int k = 0; k < times.length; k++) {
                double left = StrictMath.exp(-p[0] * times[k]);
                double weight = 1.0 / uncertainties[k];
                double pull = (energies[k] - p[2] - (p[1] - p[2]) * left) * weight;
                slope[0] = -times[k] * (p[1] - p[2]) * left * weight;
                slope[1] = left * weight;
                slope[2] = (1.0 - left) * weight;
                for (int i = 0; i < 3; i++) {
                    right[i] += slope[i] * pull;
                    for (int j = 0; j <= i; j++) {
                        normal[SymmetricMatrix.at(i, j)] += slope[i] * slope[j];
                    }
                }
                sum += pull * pull;
            }
            return Double.isNaN(sum) ? Double.POSITIVE_INFINITY : sum;
        }

        private Optional<RingDown> polish(double[] start, double startSquare) {
            double[] here = start;
            double best = startSquare;
            square(here);
            for (int step = 0; step < 60; step++) {
                double[] factors = normal.clone();
                double[] move = right.clone();
                if (!SymmetricMatrix.factor(factors, 3, 1e-12)) {
                    return Optional.empty();
                }
                SymmetricMatrix.solve(factors, 3, move);
                double length = Math.abs(move[0]) / here[0];
                double share = 1.0;
                double[] next = moved(here, move, share);
                while (square(next) > best * (1.0 + 1e-12) && share > 1e-6 && length > 1e-9) {
                    share *= 0.5;
                    next = moved(here, move, share);
                }
                here = next;
                best = square(here);
                if (length < 1e-11) {
                    break;
                }
            }
            return finished(here, best);
        }

        private static double[] moved(double[] from, double[] move, double share) {
            return new double[] {from[0] + share * move[0], from[1] + share * move[1], from[2] + share * move[2]};
        }

        private Optional<RingDown> finished(double[] at, double square) {
            double[] factors = normal.clone();
            if (!(at[0] > 0.0) || !SymmetricMatrix.factor(factors, 3, 1e-12)) {
                return Optional.empty();
            }
            double[] c = SymmetricMatrix.inverse(factors, 3);
            return Optional.of(new RingDown(
                    new Estimate(at[0], Math.sqrt(c[0])),
                    new Estimate(at[1], Math.sqrt(c[2])),
                    new Estimate(at[2], Math.sqrt(c[5])),
                    c,
                    square,
                    times.length - 3));
        }
    }
}
