package fringekeep.interferometry.nearfield;

/**
 * Periods of the three gratings and the Fourier orders at which they act together in the first harmonic of the fringe.
 *
 * <p>The molecule's transverse wave number must close: n1/d1 + n2/d2 + n3/d3 = 0. Equal periods: (1, -2, 1). The l-th
 * harmonic uses (l n1, l n2, l n3). A small mismatch of the periods is a reduction of the visibility
 * ({@link VisibilityReduction#periodMismatch}), not a matter of this record.
 *
 * @param period1   period of the first grating (m)
 * @param period2   period of the second grating (m)
 * @param period3   period of the third grating (m)
 * @param harmonic1 Fourier order of the first grating
 * @param harmonic2 Fourier order of the second grating
 * @param harmonic3 Fourier order of the third grating
 */
public record TrainGeometry(
        double period1, double period2, double period3, int harmonic1, int harmonic2, int harmonic3) {
    private static final double CLOSURE = 1e-6;

    /** Checks that the orders close. */
    public TrainGeometry {
        if (!(period1 > 0.0 && period2 > 0.0 && period3 > 0.0)) {
            throw new IllegalArgumentException(
                    "grating periods are positive, not " + period1 + ", " + period2 + ", " + period3 + " m");
        }
        double sum = harmonic1 / period1 + harmonic2 / period2 + harmonic3 / period3;
        if (harmonic2 == 0 || Math.abs(sum) > CLOSURE * Math.abs(harmonic2 / period2)) {
            throw new IllegalArgumentException("the orders " + harmonic1 + ", " + harmonic2 + ", " + harmonic3
                    + " do not close for periods " + period1 + ", " + period2 + ", " + period3
                    + " m: n1/d1 + n2/d2 + n3/d3 must be zero");
        }
    }

    /**
     * Three gratings of the same period.
     *
     * @param period the common period d (m)
     * @return the train with orders (1, -2, 1)
     */
    public static TrainGeometry equal(double period) {
        return new TrainGeometry(period, period, period, 1, -2, 1);
    }
}
