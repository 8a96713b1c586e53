package fringekeep.interferometry.fringe;

import java.util.Arrays;

/**
 * One scan: counts at grating positions, and what is known about how each was taken. Immutable; arrays are copied.
 *
 * <p>Start with {@link #of} and add what there is: {@code FringeData.of(x, n).exposures(seconds).dark(d, seconds)}.
 * Anything left out is taken as: exposure 1, monitor 1, times equally spaced in the order of the points, no dark counts,
 * no dead time, nothing masked.
 */
public final class FringeData {
    final double[] positions;
    final double[] counts;
    final double[] exposures;
    final double[] monitor;
    final double[] times;
    final double[] darkCounts;
    final double[] darkExposures;
    final boolean[] masked;
    final DeadTime deadTime;
    final double secondsPerExposure;

    private FringeData(Parts parts) {
        this.positions = parts.positions;
        this.counts = parts.counts;
        this.exposures = parts.exposures;
        this.monitor = parts.monitor;
        this.times = parts.times;
        this.darkCounts = parts.darkCounts;
        this.darkExposures = parts.darkExposures;
        this.masked = parts.masked;
        this.deadTime = parts.deadTime;
        this.secondsPerExposure = parts.secondsPerExposure;
    }

    private static final class Parts {
        double[] positions;
        double[] counts;
        double[] exposures;
        double[] monitor;
        double[] times;
        double[] darkCounts = new double[0];
        double[] darkExposures = new double[0];
        boolean[] masked;
        DeadTime deadTime = DeadTime.NONE;
        double secondsPerExposure = 1;

        Parts(double[] positions, double[] counts) {
            int n = positions.length;
            this.positions = positions;
            this.counts = counts;
            this.exposures = filled(n, 1);
            this.monitor = filled(n, 1);
            this.times = new double[n];
            for (int i = 0; i < n; i++) {
                times[i] = i;
            }
            this.masked = new boolean[n];
        }

        Parts(FringeData data) {
            this.positions = data.positions;
            this.counts = data.counts;
            this.exposures = data.exposures;
            this.monitor = data.monitor;
            this.times = data.times;
            this.darkCounts = data.darkCounts;
            this.darkExposures = data.darkExposures;
            this.masked = data.masked;
            this.deadTime = data.deadTime;
            this.secondsPerExposure = data.secondsPerExposure;
        }
    }

    private static double[] filled(int n, double value) {
        double[] array = new double[n];
        Arrays.fill(array, value);
        return array;
    }

    /**
     * A scan with exposure 1 at every point.
     *
     * @param positions grating positions (m), in the order of taking
     * @param counts recorded counts, whole and not negative, same length
     * @return the scan
     * @throws IllegalArgumentException if the lengths differ or a value is not possible; the text names the point
     */
    public static FringeData of(double[] positions, double[] counts) {
        checkLength("counts", counts.length, positions.length);
        checkFinite("position", positions);
        checkCounts("counts", counts);
        return new FringeData(new Parts(positions.clone(), counts.clone()));
    }

    /**
     * The same with an exposure for each point.
     *
     * @param each exposure of each point, positive: seconds, or shots when {@link #secondsPerExposure} says so
     * @return the scan
     */
    public FringeData exposures(double[] each) {
        checkLength("exposures", each.length, positions.length);
        checkPositive("exposure", each);
        Parts parts = new Parts(this);
        parts.exposures = each.clone();
        return new FringeData(parts);
    }

    /**
     * The same with one exposure for all points.
     *
     * @param all exposure, positive
     * @return the scan
     */
    public FringeData exposure(double all) {
        return exposures(filled(positions.length, all));
    }

    /**
     * The same with a monitor of the beam: the signal, not the background, is proportional to it.
     *
     * @param readings monitor at each point, positive, any unit; only the ratio to their mean counts
     * @return the scan
     */
    public FringeData monitor(double[] readings) {
        checkLength("monitor readings", readings.length, positions.length);
        checkPositive("monitor reading", readings);
        Parts parts = new Parts(this);
        parts.monitor = readings.clone();
        return new FringeData(parts);
    }

    /**
     * The same with the time of each point, on which drifts run.
     *
     * @param seconds time of each point (s), any zero
     * @return the scan
     */
    public FringeData times(double[] seconds) {
        checkLength("times", seconds.length, positions.length);
        checkFinite("time", seconds);
        Parts parts = new Parts(this);
        parts.times = seconds.clone();
        return new FringeData(parts);
    }

    /**
     * The same with dark counts, taken with the beam shut.
     *
     * @param dark dark counts, whole and not negative
     * @param darkExposure exposure of each, in the unit of {@link #exposures}, positive
     * @return the scan
     */
    public FringeData dark(double[] dark, double[] darkExposure) {
        checkLength("dark exposures", darkExposure.length, dark.length);
        checkCounts("dark counts", dark);
        checkPositive("dark exposure", darkExposure);
        Parts parts = new Parts(this);
        parts.darkCounts = dark.clone();
        parts.darkExposures = darkExposure.clone();
        return new FringeData(parts);
    }

    /**
     * The same with the detector's dead time.
     *
     * @param time dead time
     * @return the scan
     */
    public FringeData deadTime(DeadTime time) {
        Parts parts = new Parts(this);
        parts.deadTime = time;
        return new FringeData(parts);
    }

    /**
     * The same with the length of one unit of exposure: 1 for exposures in seconds, the gate for exposures in shots.
     *
     * @param seconds length (s), positive
     * @return the scan
     */
    public FringeData secondsPerExposure(double seconds) {
        checkPositive("length of one exposure", new double[] {seconds});
        Parts parts = new Parts(this);
        parts.secondsPerExposure = seconds;
        return new FringeData(parts);
    }

    /**
     * The same with points left out.
     *
     * @param leftOut true where a point is not to be used
     * @return the scan
     */
    public FringeData masked(boolean[] leftOut) {
        checkLength("mask", leftOut.length, positions.length);
        Parts parts = new Parts(this);
        parts.masked = leftOut.clone();
        return new FringeData(parts);
    }

    /**
     * Number of points, masked ones included.
     *
     * @return the number
     */
    public int size() {
        return positions.length;
    }

    /**
     * Grating positions.
     *
     * @return a copy (m)
     */
    public double[] positions() {
        return positions.clone();
    }

    /**
     * Recorded counts.
     *
     * @return a copy
     */
    public double[] counts() {
        return counts.clone();
    }

    /**
     * Exposures.
     *
     * @return a copy
     */
    public double[] exposures() {
        return exposures.clone();
    }

    /**
     * Points left out.
     *
     * @return a copy, true where left out
     */
    public boolean[] masked() {
        return masked.clone();
    }

    /**
     * Sum of the dark counts.
     *
     * @return the sum
     */
    public double darkTotal() {
        return sum(darkCounts);
    }

    /**
     * Sum of the dark exposures, 0 without dark counts.
     *
     * @return the sum
     */
    public double darkExposureTotal() {
        return sum(darkExposures);
    }

    private static double sum(double[] values) {
        double sum = 0;
        for (double value : values) {
            sum += value;
        }
        return sum;
    }

    private static void checkLength(String what, int length, int expected) {
        if (length != expected) {
            throw new IllegalArgumentException(what + ": " + length + " values for " + expected + " points");
        }
    }

    private static void checkFinite(String what, double[] values) {
        for (int i = 0; i < values.length; i++) {
            if (!Double.isFinite(values[i])) {
                throw new IllegalArgumentException(what + " of point " + i + " is " + values[i]);
            }
        }
    }

    private static void checkPositive(String what, double[] values) {
        for (int i = 0; i < values.length; i++) {
            if (!(values[i] > 0) || values[i] == Double.POSITIVE_INFINITY) {
                throw new IllegalArgumentException(what + " of point " + i + " must be positive, is " + values[i]);
            }
        }
    }

    private static void checkCounts(String what, double[] values) {
        for (int i = 0; i < values.length; i++) {
            if (!(values[i] >= 0) || values[i] != Math.rint(values[i]) || values[i] > 9.007199254740992e15) {
                throw new IllegalArgumentException(
                        what + " of point " + i + " must be whole and not negative, is " + values[i]);
            }
        }
    }
}
