package fringekeep.interferometry.statistics;

/**
 * Mean, standard deviation and lag-1 autocorrelation of a sample.
 *
 * <p>Sums run over the deviations from the mean in about 32 digits, so that a small scatter on a large mean costs no figures:
 * what is lost is lost in the sample's own rounding. Accuracy: 1e-15 of each value for the doubles given. Thread rule:
 * stateless. Cost: O(n).
 *
 * @param size number of values n, at least 2
 * @param mean arithmetic mean, in the unit of the values
 * @param standardDeviation with n &minus; 1 degrees of freedom, in the unit of the values
 * @param autocorrelation &Sigma; (x<sub>i</sub> &minus; m)(x<sub>i+1</sub> &minus; m) / &Sigma; (x<sub>i</sub> &minus;
 *     m)&sup2;; NaN where all values are equal
 */
public record SampleSummary(int size, double mean, double standardDeviation, double autocorrelation) {
    /**
     * Summarises.
     *
     * @param values the sample in the order of taking, at least 2 finite values
     * @return the summary
     * @throws IllegalArgumentException if there are fewer, or a value is not finite
     */
    public static SampleSummary of(double[] values) {
        if (values.length < 2) {
            throw new IllegalArgumentException("a sample needs at least 2 values, not " + values.length);
        }
        Twofold sum = Twofold.ZERO;
        for (int k = 0; k < values.length; k++) {
            if (!Double.isFinite(values[k])) {
                throw new IllegalArgumentException("value " + k + " is " + values[k]);
            }
            sum = sum.plus(Twofold.of(values[k]));
        }
        Twofold mean = sum.over(Twofold.of(values.length));
        Twofold squares = Twofold.ZERO;
        Twofold products = Twofold.ZERO;
        Twofold before = Twofold.ZERO;
        for (double value : values) {
            Twofold deviation = Twofold.of(value).minus(mean);
            squares = squares.plus(deviation.times(deviation));
            products = products.plus(deviation.times(before));
            before = deviation;
        }
        return new SampleSummary(
                values.length,
                mean.value(),
                squares.over(Twofold.of(values.length - 1.0)).root().value(),
                squares.high() == 0 ? Double.NaN : products.over(squares).value());
    }

    /**
     * Standard uncertainty of the mean of independent values (JCGM 100:2008, 4.2.3).
     *
     * @return standard deviation over &radic;n
     */
    public double uncertaintyOfMean() {
        return standardDeviation / Math.sqrt(size);
    }
}
