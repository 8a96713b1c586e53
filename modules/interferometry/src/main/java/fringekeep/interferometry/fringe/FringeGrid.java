package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/**
 * What the fit of a plain scan needs of everything but its counts: cosines and sines at one period and the factors of the
 * unweighted normal equations. Scans are mostly taken over one grid, so the last grid is kept and asked for first.
 * Immutable.
 */
final class FringeGrid {
    private static volatile @Nullable FringeGrid last;

    /** Used points. */
    final int points;
    /** Exposure times monitor over its mean, per used point: the slopes of the counts by the mean. */
    final double[] signal;
    /** Positions from the centre in periods. */
    final double[] turns;

    final double[] cosine;
    final double[] sine;
    /** Slopes of the counts by the cosine and the sine coefficient. */
    final double[] byCosine;

    final double[] bySine;
    /** Packed normal matrix of mean, cosine and sine, all weights 1. */
    final double[] matrix;
    /** Its factors; null if the positions do not tell the three apart. */
    final double @Nullable [] factors;
    /** Its inverse, empty without factors. */
    final double[] inverse;
    /** Mean position where the period is free, else 0. */
    final double centre;

    /** The range of the points in periods. */
    final double span;

    private final FringeData data;
    private final double period;
    private final boolean centred;

    private FringeGrid(FringeData data, double period, boolean centred) {
        this.data = data;
        this.period = period;
        this.centred = centred;
        int[] used = FringeModel.used(data);
        this.points = used.length;
        this.signal = signal(data, used);
        this.centre = centred ? FringeModel.middle(data, used) : 0;
        this.turns = new double[points];
        for (int row = 0; row < points; row++) {
            turns[row] = (data.positions[used[row]] - centre) / period;
        }
        this.cosine = new double[points];
        this.sine = new double[points];
        this.byCosine = new double[points];
        this.bySine = new double[points];
        Turns.all(turns, 1, cosine, sine, byCosine, bySine);
        for (int row = 0; row < points; row++) {
            byCosine[row] = signal[row] * cosine[row];
            bySine[row] = signal[row] * sine[row];
        }
        this.span = span(turns);
        this.matrix = normal(null);
        double[] copy = matrix.clone();
        this.factors = SymmetricMatrix.factor(copy, 3, FringeSolver.SMALLEST_PIVOT) ? copy : null;
        this.inverse = factors == null ? new double[0] : SymmetricMatrix.inverse(copy, 3);
    }

    /**
     * The grid of a scan.
     *
     * @param data the scan
     * @param period fringe period (m)
     * @param centred whether turns count from the mean position, as where the period is free
     */
    static FringeGrid of(FringeData data, double period, boolean centred) {
        FringeGrid known = last;
        if (known != null && known.fits(data, period, centred)) {
            return known;
        }
        FringeGrid made = new FringeGrid(data, period, centred);
        last = made;
        return made;
    }

    private boolean fits(FringeData other, double otherPeriod, boolean otherCentred) {
        return period == otherPeriod
                && centred == otherCentred
                && Arrays.equals(data.positions, other.positions)
                && Arrays.equals(data.exposures, other.exposures)
                && Arrays.equals(data.monitor, other.monitor)
                && Arrays.equals(data.masked, other.masked);
    }

    private static double[] signal(FringeData data, int[] used) {
        double monitorSum = 0;
        for (int i : used) {
            monitorSum += data.monitor[i];
        }
        double[] signal = new double[used.length];
        for (int row = 0; row < used.length; row++) {
            int i = used[row];
            signal[row] = data.exposures[i] * (data.monitor[i] * used.length / monitorSum);
        }
        return signal;
    }

    static double span(double[] turns) {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double turn : turns) {
            low = Math.min(low, turn);
            high = Math.max(high, turn);
        }
        return high - low;
    }

    /** The counts of a scan over this grid at its used points; not to be written to. */
    double[] observed(FringeData scan) {
        if (points == scan.counts.length) {
            return scan.counts;
        }
        double[] observed = new double[points];
        int next = 0;
        for (int i = 0; i < scan.counts.length; i++) {
            if (!scan.masked[i]) {
                observed[next++] = scan.counts[i];
            }
        }
        return observed;
    }

    /** Packed normal matrix of mean, cosine and sine with weights, or with all weights 1. */
    double[] normal(double @Nullable [] weights) {
        double m00 = 0;
        double m10 = 0;
        double m11 = 0;
        double m20 = 0;
        double m21 = 0;
        double m22 = 0;
        for (int row = 0; row < points; row++) {
            double weight = weights == null ? 1 : weights[row];
            double s0 = signal[row];
            double s1 = byCosine[row];
            double s2 = bySine[row];
            double w0 = weight * s0;
            double w1 = weight * s1;
            double w2 = weight * s2;
            m00 += w0 * s0;
            m10 += w1 * s0;
            m11 += w1 * s1;
            m20 += w2 * s0;
            m21 += w2 * s1;
            m22 += w2 * s2;
        }
        return new double[] {m00, m10, m11, m20, m21, m22};
    }
}
