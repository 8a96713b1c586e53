package fringekeep.interferometry.judge;

import java.util.Arrays;

/**
 * Amplitude propagation of matter waves through gratings, with no Talbot coefficient anywhere: the periodic part of a
 * Bloch wave on a grid over two periods, multiplied by each grating and moved by exact free evolution in momentum space.
 *
 * <p>Units: lengths in periods d, momenta in h/d, times in Talbot times m d^2/h. Free evolution multiplies momentum p by
 * exp(-i pi p^2 t).
 */
public final class WaveTrain {
    /** A complex transmission as a function of place (in periods): real and imaginary part. */
    @FunctionalInterface
    public interface Transmission {
        /** Value at a place. */
        double[] at(double x);
    }

    private final int points;
    private final double kappa;
    private final double[] real;
    private final double[] imaginary;

    /** A plane wave of momentum kappa on a grid of a power of two points. */
    public WaveTrain(int points, double kappa) {
        this.points = points;
        this.kappa = kappa;
        this.real = new double[points];
        this.imaginary = new double[points];
        Arrays.fill(real, 1.0);
    }

    private WaveTrain(WaveTrain other) {
        this.points = other.points;
        this.kappa = other.kappa;
        this.real = other.real.clone();
        this.imaginary = other.imaginary.clone();
    }

    /** An independent copy. */
    public WaveTrain copy() {
        return new WaveTrain(this);
    }

    /** Grid places, from 0 to below 2 periods. */
    public static double place(int index, int points) {
        return 2.0 * index / points;
    }

    /** Samples a transmission on the grid. */
    public static double[][] sample(Transmission transmission, int points) {
        double[][] samples = new double[points][];
        for (int i = 0; i < points; i++) {
            samples[i] = transmission.at(place(i, points));
        }
        return samples;
    }

    /** Passes a grating. */
    public WaveTrain pass(double[][] samples) {
        for (int i = 0; i < points; i++) {
            double re = real[i] * samples[i][0] - imaginary[i] * samples[i][1];
            imaginary[i] = real[i] * samples[i][1] + imaginary[i] * samples[i][0];
            real[i] = re;
        }
        return this;
    }

    /** Flies for a time. */
    public WaveTrain fly(double time) {
        transform(false);
        for (int k = 0; k < points; k++) {
            int j = k < points / 2 ? k : k - points;
            double p = kappa + 0.5 * j;
            double angle = -Math.PI * p * p * time;
            double cosine = Math.cos(angle) / points;
            double sine = Math.sin(angle) / points;
            double re = real[k] * cosine - imaginary[k] * sine;
            imaginary[k] = real[k] * sine + imaginary[k] * cosine;
            real[k] = re;
        }
        transform(true);
        return this;
    }

    /** Adds the weighted probability density to a sum. */
    public void addDensity(double weight, double[] sum) {
        for (int i = 0; i < points; i++) {
            sum[i] += weight * (real[i] * real[i] + imaginary[i] * imaginary[i]);
        }
    }

    /** Signal behind a last grating moved by a number of grid points. */
    public static double signal(double[] density, double[][] grating, int shift) {
        int points = density.length;
        double sum = 0.0;
        for (int i = 0; i < points; i++) {
            double[] t = grating[Math.floorMod(i - shift, points)];
            sum += density[i] * (t[0] * t[0] + t[1] * t[1]);
        }
        return sum / points;
    }

    /** 2 S_1/S_0 of the signal against the last grating's place, by the discrete Fourier sum over one period. */
    public static double[] meanAndSignedVisibility(double[] density, double[][] grating) {
        int steps = 32;
        double mean = 0.0;
        double first = 0.0;
        for (int k = 0; k < steps; k++) {
            double value = signal(density, grating, k * (density.length / 2) / steps);
            mean += value / steps;
            first += value * Math.cos(2 * Math.PI * k / steps) / steps;
        }
        return new double[] {mean, 2 * first / mean};
    }

    /** Radix-2 transform in place, unscaled. */
    private void transform(boolean back) {
        for (int i = 1, j = 0; i < points; i++) {
            int bit = points >> 1;
            for (; (j & bit) != 0; bit >>= 1) {
                j ^= bit;
            }
            j ^= bit;
            if (i < j) {
                swap(real, i, j);
                swap(imaginary, i, j);
            }
        }
        for (int size = 2; size <= points; size <<= 1) {
            butterflies(size, (back ? 2 : -2) * Math.PI / size);
        }
    }

    private void butterflies(int size, double angle) {
        double[] cosines = new double[size / 2];
        double[] sines = new double[size / 2];
        for (int k = 0; k < size / 2; k++) {
            cosines[k] = Math.cos(angle * k);
            sines[k] = Math.sin(angle * k);
        }
        for (int start = 0; start < points; start += size) {
            for (int k = 0; k < size / 2; k++) {
                int a = start + k;
                int b = a + size / 2;
                double re = real[b] * cosines[k] - imaginary[b] * sines[k];
                double im = real[b] * sines[k] + imaginary[b] * cosines[k];
                real[b] = real[a] - re;
                imaginary[b] = imaginary[a] - im;
                real[a] += re;
                imaginary[a] += im;
            }
        }
    }

    private static void swap(double[] values, int i, int j) {
        double kept = values[i];
        values[i] = values[j];
        values[j] = kept;
    }
}
