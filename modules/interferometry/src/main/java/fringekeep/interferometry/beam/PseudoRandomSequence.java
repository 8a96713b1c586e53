package fringekeep.interferometry.beam;

import java.util.Arrays;

/**
 * A binary maximum-length sequence as cut into a chopper disc, and the exact decoding of counts taken through it.
 *
 * <p>With q in {0, 1}, N = 2<sup>n</sup> &minus; 1 and w = 2 q &minus; 1: &Sigma; w<sub>j</sub> w<sub>j+k</sub> = N at k = 0,
 * &minus;1 elsewhere, so f<sub>k</sub> = 2 / (N + 1) &Sigma;<sub>j</sub> w<sub>j&minus;k</sub> y<sub>j</sub> inverts
 * y<sub>j</sub> = &Sigma;<sub>i</sub> q<sub>j&minus;i</sub> f<sub>i</sub> exactly; a flat background b per bin leaves
 * 2 b / (N + 1) in every bin. Source: S. W. Golomb, Shift Register Sequences; use in time of flight: D. D. Koleske and
 * S. J. Sibener, Review of Scientific Instruments 63 (1992).
 */
public final class PseudoRandomSequence {
    private final boolean[] open;

    private PseudoRandomSequence(boolean[] open) {
        this.open = open;
    }

    /**
     * From a shift register: the last stage is put out, the exclusive or of the tapped stages is fed to the first.
     *
     * @param stages number of stages n, 2 to 14
     * @param taps tapped stages, numbered from 1; with stage n among them
     * @param seed first filling, bit k in stage k + 1, not 0
     * @return the sequence of 2<sup>n</sup> &minus; 1 bins
     * @throws IllegalArgumentException if the taps do not give a sequence of greatest length
     */
    public static PseudoRandomSequence ofRegister(int stages, int[] taps, int seed) {
        if (stages < 2 || stages > 14 || seed <= 0 || seed >= 1 << stages) {
            throw new IllegalArgumentException(
                    "register of 2 to 14 stages with a filling of that size: " + stages + ", " + seed);
        }
        boolean[] open = new boolean[(1 << stages) - 1];
        int state = seed;
        for (int j = 0; j < open.length; j++) {
            open[j] = (state >> (stages - 1) & 1) == 1;
            int fed = 0;
            for (int tap : taps) {
                if (tap < 1 || tap > stages) {
                    throw new IllegalArgumentException("tap " + tap + " is not a stage of " + stages);
                }
                fed ^= state >> (tap - 1) & 1;
            }
            state = (state << 1 | fed) & (1 << stages) - 1;
        }
        return of(open);
    }

    /**
     * From the openings themselves.
     *
     * @param open true where the chopper is open, 2<sup>n</sup> &minus; 1 bins
     * @return the sequence
     * @throws IllegalArgumentException if it is not of maximum length, checked by its autocorrelation
     */
    public static PseudoRandomSequence of(boolean[] open) {
        int n = open.length;
        if (n < 3 || (n + 1 & n) != 0) {
            throw new IllegalArgumentException("a maximum-length sequence has 2^n - 1 bins, this has " + n);
        }
        PseudoRandomSequence sequence = new PseudoRandomSequence(open.clone());
        int opened = 0;
        for (boolean bin : open) {
            opened += bin ? 1 : 0;
        }
        if (opened == (n - 1) / 2) {
            throw new IllegalArgumentException(
                    "the sequence has one opening less than half: its polarity is reversed; exchange open and shut");
        }
        for (int lag = 1; lag <= n / 2; lag++) {
            if (sequence.autocorrelation(lag) != -1) {
                throw new IllegalArgumentException("not a maximum-length sequence: autocorrelation at lag " + lag
                        + " is " + sequence.autocorrelation(lag) + ", not -1");
            }
        }
        if (opened != (n + 1) / 2) {
            throw new IllegalArgumentException("not a maximum-length sequence: " + opened + " openings in " + n);
        }
        return sequence;
    }

    /**
     * The same with open and shut exchanged, as a disc mounted the wrong way would be written down.
     *
     * @param shut true where the chopper is shut
     * @return the sequence of the openings
     */
    public static PseudoRandomSequence ofReversedPolarity(boolean[] shut) {
        boolean[] open = new boolean[shut.length];
        for (int j = 0; j < open.length; j++) {
            open[j] = !shut[j];
        }
        return of(open);
    }

    /**
     * Number of bins N.
     *
     * @return N
     */
    public int length() {
        return open.length;
    }

    /**
     * The openings.
     *
     * @return a copy, true where open
     */
    public boolean[] open() {
        return open.clone();
    }

    /**
     * Autocorrelation of the &plusmn;1 sequence.
     *
     * @param lag shift in bins
     * @return N at lag 0, &minus;1 elsewhere
     */
    public int autocorrelation(int lag) {
        int sum = 0;
        int n = open.length;
        for (int j = 0; j < n; j++) {
            sum += open[j] == open[Math.floorMod(j + lag, n)] ? 1 : -1;
        }
        return sum;
    }

    boolean opensAt(int bin) {
        return open[Math.floorMod(bin, open.length)];
    }

    /**
     * Decodes one cycle of counts.
     *
     * @param counts counts in each of the N bins, summed over cycles
     * @param cycles number of cycles summed, positive
     * @return counts per bin and cycle that one open bin lets through, with a constant 2 b / (N + 1) from a flat background
     *     of b per bin and cycle
     */
    public double[] decode(double[] counts, double cycles) {
        int n = checked(counts, cycles);
        double[] decoded = new double[n];
        for (int k = 0; k < n; k++) {
            double sum = 0;
            for (int j = 0; j < n; j++) {
                sum += opensAt(j - k) ? counts[j] : -counts[j];
            }
            decoded[k] = 2 * sum / ((n + 1.0) * cycles);
        }
        return decoded;
    }

    /**
     * Variance of each decoded bin for Poisson counts: the same in every bin, and not the decoded counts themselves.
     *
     * @param counts counts in each bin, summed over cycles
     * @param cycles number of cycles summed
     * @return (2 / (N + 1))&sup2; &Sigma; y, per cycle squared; bins are correlated by about &minus;1 / N
     */
    public double decodedVariance(double[] counts, double cycles) {
        int n = checked(counts, cycles);
        double sum = 0;
        for (double count : counts) {
            sum += count;
        }
        double factor = 2 / ((n + 1.0) * cycles);
        return factor * factor * sum;
    }

    private int checked(double[] counts, double cycles) {
        if (counts.length != open.length) {
            throw new IllegalArgumentException(counts.length + " bins of counts for a sequence of " + open.length);
        }
        MatterWave.positive("number of cycles", cycles);
        return open.length;
    }

    /**
     * Gain in the standard error of one bin over a single slot in the same time.
     *
     * @param signal counts of the bin per open bin and cycle
     * @param total sum of all bins' signal
     * @param background flat background per bin and cycle
     * @return sqrt{(f + b) / ([F + 2 b N / (N + 1)] 2 / (N + 1))}; below 1 in weak bins without background
     */
    public double gain(double signal, double total, double background) {
        double n = open.length;
        return Math.sqrt((signal + background) / ((total + 2 * background * n / (n + 1)) * 2 / (n + 1)));
    }

    /**
     * Does the signal run over the end of the cycle? Compares the mean of the last and first twentieth of the bins after
     * the time zero with the lowest mean over as many neighbouring bins.
     *
     * @param decoded decoded counts
     * @param variance variance of each
     * @param zeroBin bin of the time zero
     * @return how many standard errors the bins around the end lie above the lowest; above about 5 molecules slower than
     *     one cycle arrive in the next
     */
    public double wrapAround(double[] decoded, double variance, int zeroBin) {
        int n = decoded.length;
        int size = Math.max(3, n / 10);
        double ends = window(decoded, Math.floorMod(zeroBin - size / 2, n), size);
        double lowest = Double.POSITIVE_INFINITY;
        for (int start = 0; start < n; start++) {
            lowest = Math.min(lowest, window(decoded, start, size));
        }
        return (ends - lowest) / Math.sqrt(2 * variance / size);
    }

    private static double window(double[] values, int start, int size) {
        double sum = 0;
        for (int k = 0; k < size; k++) {
            sum += values[(start + k) % values.length];
        }
        return sum / size;
    }

    /**
     * Which polarity do the counts speak for? The decoded signal of a beam is a positive peak; with the polarity reversed
     * it is a negative one.
     *
     * @param decoded decoded counts
     * @return true if the largest deviation from the median points down
     */
    public static boolean looksReversed(double[] decoded) {
        double[] sorted = decoded.clone();
        Arrays.sort(sorted);
        double median = sorted[sorted.length / 2];
        return median - sorted[0] > sorted[sorted.length - 1] - median;
    }
}
