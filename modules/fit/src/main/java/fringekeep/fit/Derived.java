package fringekeep.fit;

import java.util.Arrays;
import java.util.List;

/**
 * Visibility and phase as functions of mean, cosine and sine, with their gradients.
 *
 * <p>V = sqrt(c&sup2; + s&sup2;) / N, &phi; = atan2(&minus;s, c); source: the convention of the fringe, S = N [1 + V cos(2&pi;x/d
 * + &phi;)], and JCGM 100:2008 (GUM), 5.2.2, for the covariance.
 */
final class Derived {
    private final List<String> names;
    private final double[][] gradients;
    private final double visibility;
    private final double phase;

    private Derived(List<String> names, double[][] gradients, double visibility, double phase) {
        this.names = names;
        this.gradients = gradients;
        this.visibility = visibility;
        this.phase = phase;
    }

    /** Of estimates that begin with mean, cosine, sine; without any where the mean is not positive. */
    static Derived of(double[] values, boolean withPhase) {
        double mean = values[0];
        double square = values[1] * values[1] + values[2] * values[2];
        if (!(mean > 0)) {
            return new Derived(List.of(), new double[0][], 0, 0);
        }
        double amplitude = Math.sqrt(square);
        double visibility = amplitude / mean;
        double[] ofVisibility = {
            -visibility / mean,
            amplitude > 0 ? values[1] / (amplitude * mean) : 1 / mean,
            amplitude > 0 ? values[2] / (amplitude * mean) : 0
        };
        if (!withPhase || !(square > 0)) {
            return new Derived(List.of("visibility"), new double[][] {ofVisibility}, visibility, 0);
        }
        double[] ofPhase = {0, values[2] / square, -values[1] / square};
        return new Derived(
                List.of("visibility", "phase"),
                new double[][] {ofVisibility, ofPhase},
                visibility,
                StrictMath.atan2(0.0 - values[2], values[1]));
    }

    List<String> names() {
        return names;
    }

    /** Estimates with the derived ones behind. */
    double[] values(double[] values) {
        double[] all = Arrays.copyOf(values, values.length + names.size());
        if (!names.isEmpty()) {
            all[values.length] = visibility;
        }
        if (names.size() > 1) {
            all[values.length + 1] = phase;
        }
        return all;
    }

    /** Derivatives of all estimates with those of the derived ones behind. */
    double[] extended(double[] derivatives) {
        double[] all = Arrays.copyOf(derivatives, derivatives.length + names.size());
        for (int k = 0; k < names.size(); k++) {
            for (int i = 0; i < 3; i++) {
                all[derivatives.length + k] += gradients[k][i] * derivatives[i];
            }
        }
        return all;
    }

    /** Covariance of all, lower triangle by rows. */
    double[] covariance(double[] covariance) {
        int n = (int) Math.round((Math.sqrt(8.0 * covariance.length + 1) - 1) / 2);
        int all = n + names.size();
        double[] extended = Arrays.copyOf(covariance, all * (all + 1) / 2);
        for (int row = n; row < all; row++) {
            for (int column = 0; column <= row; column++) {
                double sum = 0;
                for (int i = 0; i < 3; i++) {
                    double factor = gradients[row - n][i];
                    sum += factor
                            * (column < n
                                    ? at(covariance, i, column)
                                    : gradients[column - n][0] * at(covariance, i, 0)
                                            + gradients[column - n][1] * at(covariance, i, 1)
                                            + gradients[column - n][2] * at(covariance, i, 2));
                }
                extended[row * (row + 1) / 2 + column] = sum;
            }
        }
        return extended;
    }

    private static double at(double[] covariance, int i, int j) {
        int row = Math.max(i, j);
        return covariance[row * (row + 1) / 2 + Math.min(i, j)];
    }
}
