package fringekeep.fit.internal;

import fringekeep.archive.record.Moment;
import java.util.Optional;

/**
 * One scan as a fit takes it: arrays of equal length, one element a row.
 *
 * @param input position of the scan among the inputs
 * @param positions as read (m)
 * @param counts whole numbers, 0 where masked rows have none
 * @param exposures seconds or shots
 * @param times of the rows, any zero
 * @param masked rows that are left out
 * @param dark dark counts, any number
 * @param darkExposures their exposures
 * @param shots whether exposures are shots
 * @param start begin of the scan where known
 */
public record ScanArrays(
        int input,
        double[] positions,
        double[] counts,
        double[] exposures,
        double[] times,
        boolean[] masked,
        double[] dark,
        double[] darkExposures,
        boolean shots,
        Optional<Moment> start) {
    /** Copies. */
    public ScanArrays {
        positions = positions.clone();
        counts = counts.clone();
        exposures = exposures.clone();
        times = times.clone();
        masked = masked.clone();
        dark = dark.clone();
        darkExposures = darkExposures.clone();
    }

    /** Number of rows. */
    public int rows() {
        return positions.length;
    }

    /** Rows that are left out. */
    public int left() {
        int left = 0;
        for (boolean each : masked) {
            left += each ? 1 : 0;
        }
        return left;
    }

    /** The same with dark counts. */
    ScanArrays withDark(double[] counts, double[] exposures) {
        return new ScanArrays(
                input, positions, this.counts, this.exposures, times, masked, counts, exposures, shots, start);
    }
}
