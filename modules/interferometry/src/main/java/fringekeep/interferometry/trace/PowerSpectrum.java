package fringekeep.interferometry.trace;

import fringekeep.interferometry.special.HalfTurn;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.transform.DftNormalization;
import org.apache.commons.math3.transform.FastFourierTransformer;
import org.apache.commons.math3.transform.TransformType;

/**
 * One-sided power spectral density of a trace, averaged over half-overlapping Hann-windowed segments, each freed of its
 * mean.
 *
 * <p>Source: P. D. Welch, IEEE Trans. Audio Electroacoust. 15, 70 (1967). The integral over frequency is the variance
 * of the trace. Thread rule: immutable.
 */
public final class PowerSpectrum {
    private final double[] density;
    private final double resolution;
    private final int segments;

    private PowerSpectrum(double[] density, double resolution, int segments) {
        this.density = density;
        this.resolution = resolution;
        this.segments = segments;
    }

    /**
     * Computes the spectrum.
     *
     * @param trace    equally spaced samples, finite, at least one segment (any unit U)
     * @param interval time between samples (s), &gt; 0
     * @param segment  samples per segment, a power of two, &ge; 8
     * @return densities (U^2/Hz) at whole multiples of 1/(segment interval), from zero to half the sampling rate
     * @throws IllegalArgumentException if the trace is shorter than a segment or a sample is not finite
     */
    public static PowerSpectrum of(double[] trace, double interval, int segment) {
        if (segment < 8 || Integer.bitCount(segment) != 1 || trace.length < segment || !(interval > 0.0)) {
            throw new IllegalArgumentException("a spectrum needs segments of a power of two from 8 within the trace: "
                    + segment + " of " + trace.length + " samples, interval " + interval + " s");
        }
        double[] window = hann(segment);
        double power = 0.0;
        for (double value : window) {
            power += value * value;
        }
        double[] sums = new double[segment / 2 + 1];
        int count = 0;
        for (int start = 0; start + segment <= trace.length; start += segment / 2) {
            addPeriodogram(trace, start, window, sums);
            count++;
        }
        double scale = interval / (power * count);
        for (int k = 0; k < sums.length; k++) {
            sums[k] *= k == 0 || k == segment / 2 ? scale : 2.0 * scale;
        }
        return new PowerSpectrum(sums, 1.0 / (segment * interval), count);
    }

    private static double[] hann(int length) {
        double[] window = new double[length];
        for (int k = 0; k < length; k++) {
            double sine = HalfTurn.sin(k / (double) length);
            window[k] = sine * sine;
        }
        return window;
    }

    private static void addPeriodogram(double[] trace, int start, double[] window, double[] sums) {
        double mean = 0.0;
        for (int k = 0; k < window.length; k++) {
            mean += trace[start + k];
        }
        mean /= window.length;
        double[] piece = new double[window.length];
        for (int k = 0; k < piece.length; k++) {
            if (!Double.isFinite(trace[start + k])) {
                throw new IllegalArgumentException("sample " + (start + k) + " is not finite");
            }
            piece[k] = (trace[start + k] - mean) * window[k];
        }
        Complex[] transformed =
                new FastFourierTransformer(DftNormalization.STANDARD).transform(piece, TransformType.FORWARD);
        for (int k = 0; k < sums.length; k++) {
            double re = transformed[k].getReal();
            double im = transformed[k].getImaginary();
            sums[k] += re * re + im * im;
        }
    }

    /**
     * Number of frequencies.
     *
     * @return half the segment plus one
     */
    public int size() {
        return density.length;
    }

    /**
     * Frequency of a bin.
     *
     * @param index from 0
     * @return frequency (Hz)
     */
    public double frequency(int index) {
        return index * resolution;
    }

    /**
     * Density of a bin.
     *
     * @param index from 0
     * @return density (U^2/Hz)
     */
    public double density(int index) {
        return density[index];
    }

    /**
     * Distance of neighbouring frequencies.
     *
     * @return resolution (Hz)
     */
    public double resolution() {
        return resolution;
    }

    /**
     * Number of segments averaged.
     *
     * @return at least one
     */
    public int segments() {
        return segments;
    }

    /**
     * Independent averages behind one bin: half-overlapping Hann segments are correlated by 1/6 in amplitude.
     *
     * @return segments/(1 + (1 - 1/segments)/18), so that the variance of a bin is its density squared over this
     */
    public double effectiveAverages() {
        return segments / (1.0 + (1.0 - 1.0 / segments) / 18.0);
    }
}
