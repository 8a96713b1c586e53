package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.ScalarSearch;
import fringekeep.interferometry.statistics.SymmetricMatrix;

/**
 * What a scan still to be taken will tell, and what lowers a visibility while it is taken.
 *
 * <p>Expected errors come from the 3 &times; 3 Fisher matrix, or the covariance of unweighted least squares, at the very
 * points planned; for many points they become the closed forms named with the methods.
 */
public final class FringePlanning {
    private FringePlanning() {}

    /**
     * Expected standard errors.
     *
     * @param visibilityLikelihood of V by Poisson likelihood
     * @param phaseLikelihood of &phi; by Poisson likelihood (rad)
     * @param visibilitySquares of V by unweighted least squares
     * @param phaseSquares of &phi; by unweighted least squares (rad)
     */
    public record ExpectedErrors(
            double visibilityLikelihood, double phaseLikelihood, double visibilitySquares, double phaseSquares) {}

    /**
     * Expected errors of a scan with equally spaced points over one period (or any number of whole periods).
     *
     * @param points number of different phases, at least 3
     * @param meanSignal mean signal counts at a point, positive
     * @param visibility V, from 0 up to below 1 + background / signal
     * @param background background counts at a point, known
     * @param phase phase (rad)
     * @return the errors; those of the phase are infinite at V = 0
     */
    public static ExpectedErrors errors(
            int points, double meanSignal, double visibility, double background, double phase) {
        if (points < 3 || !(meanSignal > 0) || !(visibility >= 0) || !(background >= 0)) {
            throw new IllegalArgumentException("no plan: " + points + " points, " + meanSignal + " counts, visibility "
                    + visibility + ", background " + background);
        }
        double a = meanSignal * visibility * StrictMath.cos(phase);
        double b = -meanSignal * visibility * StrictMath.sin(phase);
        double[] fisher = new double[6];
        double[] plain = new double[6];
        double[] counted = new double[6];
        for (int k = 0; k < points; k++) {
            double[] basis = {1, Turns.cos((double) k / points), Turns.sin((double) k / points)};
            double mu = background + meanSignal + a * basis[1] + b * basis[2];
            if (!(mu > 0)) {
                throw new IllegalArgumentException("visibility " + visibility + " leaves point " + k + " no counts");
            }
            for (int i = 0; i < 3; i++) {
                for (int j = 0; j <= i; j++) {
                    fisher[SymmetricMatrix.at(i, j)] += basis[i] * basis[j] / mu;
                    plain[SymmetricMatrix.at(i, j)] += basis[i] * basis[j];
                    counted[SymmetricMatrix.at(i, j)] += basis[i] * basis[j] * mu;
                }
            }
        }
        if (!SymmetricMatrix.factor(fisher, 3, 1e-14) || !SymmetricMatrix.factor(plain, 3, 1e-14)) {
            throw new IllegalArgumentException(points + " points do not tell mean, cosine and sine apart");
        }
        double[] likelihood = SymmetricMatrix.inverse(fisher, 3);
        double[] squares = FringeFitAssembly.sandwich(SymmetricMatrix.inverse(plain, 3), counted, 3);
        return new ExpectedErrors(
                visibilityError(likelihood, meanSignal, a, b, phase),
                phaseError(likelihood, a, b),
                visibilityError(squares, meanSignal, a, b, phase),
                phaseError(squares, a, b));
    }

    private static double visibilityError(double[] covariance, double mean, double a, double b, double phase) {
        double visibility = Math.sqrt(a * a + b * b) / mean;
        double[] slopes = {-visibility / mean, StrictMath.cos(phase) / mean, -StrictMath.sin(phase) / mean};
        return Math.sqrt(SymmetricMatrix.form(covariance, slopes));
    }

    private static double phaseError(double[] covariance, double a, double b) {
        double square = a * a + b * b;
        if (square == 0) {
            return Double.POSITIVE_INFINITY;
        }
        return Math.sqrt(SymmetricMatrix.form(covariance, new double[] {0, b / square, -a / square}));
    }

    /**
     * Signal counts in the whole scan for a wanted error of the visibility, by Poisson likelihood:
     * V&sup2; / {&sigma;&sup2; [(1 &minus; V&sup2;)<sup>&minus;1/2</sup> &minus; 1]} without background, 2 / &sigma;&sup2; at
     * V = 0.
     *
     * @param wanted standard error of V, positive
     * @param visibility expected V, 0 to below 1
     * @param backgroundRatio background over mean signal, known
     * @return counts
     */
    public static double countsForVisibility(double wanted, double visibility, double backgroundRatio) {
        ExpectedErrors one = errors(720, 1.0 / 720, visibility, backgroundRatio / 720, 0);
        double ratio = one.visibilityLikelihood() / wanted;
        return ratio * ratio;
    }

    /**
     * Signal counts in the whole scan for a wanted error of the phase, by Poisson likelihood:
     * 1 / {&sigma;&sup2; [1 &minus; sqrt(1 &minus; V&sup2;)]} without background.
     *
     * @param wanted standard error of &phi; (rad), positive
     * @param visibility expected V, above 0 and below 1
     * @param backgroundRatio background over mean signal, known
     * @return counts
     */
    public static double countsForPhase(double wanted, double visibility, double backgroundRatio) {
        ExpectedErrors one = errors(720, 1.0 / 720, visibility, backgroundRatio / 720, 0);
        double ratio = one.phaseLikelihood() / wanted;
        return ratio * ratio;
    }

    /**
     * Time a scan takes.
     *
     * @param counts signal counts wanted in the whole scan
     * @param signalRate mean signal rate (1/s), positive
     * @param points number of points
     * @param overheadPerPoint time lost at each point (s)
     * @return seconds
     */
    public static double seconds(double counts, double signalRate, int points, double overheadPerPoint) {
        return counts / signalRate + points * overheadPerPoint;
    }

    /**
     * Fewest equally spaced points over one period at which no harmonic up to the given one is taken for the first.
     *
     * @param highestHarmonic highest harmonic in the fringe, at least 1
     * @return number of points; 3 for a pure sine
     */
    public static int fewestPoints(int highestHarmonic) {
        return highestHarmonic + 2;
    }

    /**
     * Lowering of the visibility by Gaussian jitter of the phase.
     *
     * @param deviation standard deviation of the phase (rad)
     * @return exp(&minus;deviation&sup2; / 2)
     */
    public static double jitterFactor(double deviation) {
        return StrictMath.exp(-0.5 * deviation * deviation);
    }

    /**
     * Lowering of the visibility by moving the grating during each exposure.
     *
     * @param travel distance moved in one exposure (m)
     * @param period fringe period (m)
     * @return sin(&pi; travel / period) / (&pi; travel / period)
     */
    public static double travelFactor(double travel, double period) {
        return sinc(Math.PI * travel / period);
    }

    /**
     * Lowering of the visibility by a linear drift of the phase that is not modelled.
     *
     * @param drift change of the phase over the scan (rad)
     * @return sin(drift / 2) / (drift / 2)
     */
    public static double driftFactor(double drift) {
        return sinc(0.5 * drift);
    }

    private static double sinc(double x) {
        return Math.abs(x) < 1e-4 ? 1 - x * x / 6 : StrictMath.sin(x) / x;
    }

    /**
     * Contrast from the extremes of the raw counts. Biased upwards by noise and changed by a second harmonic; kept for
     * comparison only.
     *
     * @param counts counts
     * @param background background counts at each point
     * @return (max &minus; min) / (max + min &minus; 2 background)
     */
    public static double contrastOfExtremes(double[] counts, double background) {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (double count : counts) {
            low = Math.min(low, count);
            high = Math.max(high, count);
        }
        return (high - low) / (high + low - 2 * background);
    }

    /**
     * Contrast from the extremes of the curve 1 + c<sub>1</sub> cos t + c<sub>2</sub> cos(2 t + p).
     *
     * @param first c<sub>1</sub>
     * @param second c<sub>2</sub>
     * @param phase p (rad)
     * @return (max &minus; min) / (max + min)
     */
    public static double contrastOfCurve(double first, double second, double phase) {
        double high = highest(first, second, phase);
        double low = 2 - highest(-first, -second, phase);
        return (high - low) / (high + low);
    }

    private static double highest(double first, double second, double phase) {
        double best = 0;
        double most = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < 720; k++) {
            double t = 2 * Math.PI * k / 720;
            double value = curve(first, second, phase, t);
            if (value > most) {
                most = value;
                best = t;
            }
        }
        double place = ScalarSearch.minimum(
                t -> -curve(first, second, phase, t), best - Math.PI / 360, best + Math.PI / 360, 1e-9);
        return curve(first, second, phase, place);
    }

    private static double curve(double first, double second, double phase, double t) {
        return 1 + first * StrictMath.cos(t) + second * StrictMath.cos(2 * t + phase);
    }
}
