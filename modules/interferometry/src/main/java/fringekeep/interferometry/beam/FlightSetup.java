package fringekeep.interferometry.beam;

/**
 * Geometry and timing of a time-of-flight trace.
 *
 * @param length flight length from chopper to detector (m), positive
 * @param firstBin time at the middle of the first bin (s)
 * @param binWidth width of the bins (s), positive
 * @param timeZero time at which the middle of the slot opens, with all electronic delays (s); for a pseudo-random chopper
 *     the time zero of bin 0 of the sequence
 * @param openTime how long a single slot is open (s), 0 for a pseudo-random chopper, whose openings last one bin
 * @param densityDetector whether slow molecules count for more, as in an ionising detector they cross
 */
public record FlightSetup(
        double length, double firstBin, double binWidth, double timeZero, double openTime, boolean densityDetector) {
    /** Refuses what cannot be. */
    public FlightSetup {
        MatterWave.positive("flight length", length);
        MatterWave.positive("width of the bins", binWidth);
        if (!Double.isFinite(firstBin) || !Double.isFinite(timeZero) || !(openTime >= 0)) {
            throw new IllegalArgumentException("times must be finite and the opening not negative: " + firstBin + ", "
                    + timeZero + ", " + openTime);
        }
    }
}
