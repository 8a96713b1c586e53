package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;

/**
 * Mean, cosine and sine of a fringe with their covariance: what a fit is remembered by.
 *
 * @param mean N
 * @param cosine N V cos &phi;
 * @param sine &minus;N V sin &phi;
 * @param covariance lower triangle by rows, six values, in the squared unit of the mean
 */
public record HarmonicEstimate(double mean, double cosine, double sine, double[] covariance) {
    /** Copies the covariance and checks its length. */
    public HarmonicEstimate {
        if (covariance.length != 6) {
            throw new IllegalArgumentException("covariance of three needs 6 values, has " + covariance.length);
        }
        covariance = covariance.clone();
    }

    @Override
    public double[] covariance() {
        return covariance.clone();
    }

    /**
     * The visibility with its standard error by the delta method.
     *
     * @return V, empty where the mean is not positive
     */
    public Optional<Estimate> visibility() {
        if (!(mean > 0)) {
            return Optional.empty();
        }
        double amplitude = amplitude();
        double visibility = amplitude / mean;
        double cosPhase = amplitude > 0 ? cosine / amplitude : 1;
        double sinPhase = amplitude > 0 ? sine / amplitude : 0;
        double[] slopes = {-visibility / mean, cosPhase / mean, sinPhase / mean};
        return Optional.of(new Estimate(visibility, root(slopes)));
    }

    /**
     * The phase with its standard error by the delta method.
     *
     * @return &phi; = atan2(&minus;sine, cosine) in (&minus;&pi;, &pi;] (rad), empty without modulation or mean
     */
    public Optional<Estimate> phase() {
        double square = cosine * cosine + sine * sine;
        if (!(mean > 0) || !(square > 0)) {
            return Optional.empty();
        }
        double[] slopes = {0, sine / square, -cosine / square};
        return Optional.of(new Estimate(StrictMath.atan2(0.0 - sine, cosine), root(slopes)));
    }

    /**
     * Noise of the modulation in any one direction over the mean: the s of the Rice law of the visibility.
     *
     * @return s, dimensionless; infinite where the mean is not positive
     */
    public double quadratureNoise() {
        return mean > 0 ? Math.sqrt(0.5 * (covariance[2] + covariance[5])) / mean : Double.POSITIVE_INFINITY;
    }

    double amplitude() {
        return Math.sqrt(cosine * cosine + sine * sine);
    }

    private double root(double[] slopes) {
        return Math.sqrt(Math.max(SymmetricMatrix.form(covariance, slopes), 0));
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof HarmonicEstimate that
                && Double.compare(mean, that.mean) == 0
                && Double.compare(cosine, that.cosine) == 0
                && Double.compare(sine, that.sine) == 0
                && java.util.Arrays.equals(covariance, that.covariance);
    }

    @Override
    public int hashCode() {
        return java.util.Arrays.hashCode(new double[] {mean, cosine, sine}) * 31
                + java.util.Arrays.hashCode(covariance);
    }

    @Override
    public String toString() {
        return "mean " + mean + ", cosine " + cosine + ", sine " + sine + ", covariance "
                + java.util.Arrays.toString(covariance);
    }
}
