package fringekeep.interferometry.beam;

import fringekeep.interferometry.statistics.CurveFit;
import fringekeep.interferometry.statistics.CurveFitOutcome;
import fringekeep.interferometry.statistics.CurveFitter;
import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.ParametricModel;
import org.jspecify.annotations.Nullable;

/**
 * Velocities from times of flight.
 *
 * <p>The opening is deconvolved by a forward model: the density of arrival times f(L / t) L / t&sup2; of the shifted flux
 * law, averaged over bin and opening, is fitted to the raw counts by Poisson likelihood with signal F and flat background b
 * free. Raw counts, not decoded ones, are fitted for the pseudo-random chopper too, because decoded bins are correlated and
 * far from Poisson.
 */
public final class FlightTime {
    private FlightTime() {}

    /**
     * Fits the trace of a single slot.
     *
     * @param setup geometry and timing
     * @param counts counts in each bin, summed over cycles
     * @param cycles number of openings summed, positive
     * @return the fit, or a reason
     */
    public static FlightOutcome singleSlot(FlightSetup setup, double[] counts, double cycles) {
        FlightOutcome.@Nullable Failure refusal = refusal(counts, cycles);
        if (refusal != null) {
            return refusal;
        }
        double[] above = new double[counts.length];
        double floor = lowestTenth(counts);
        for (int i = 0; i < counts.length; i++) {
            above[i] = (counts[i] - floor) / cycles;
        }
        return fit(new TraceModel(setup, counts.length, cycles, null, 1), counts, above, floor / cycles, setup, 0);
    }

    /**
     * Fits the trace of a pseudo-random chopper.
     *
     * @param setup geometry and timing; flight times are counted modulo the cycle
     * @param sequence openings, one per bin
     * @param counts counts in each bin of the cycle, summed over cycles
     * @param cycles number of cycles summed, positive
     * @return the fit with the wrap-around measure, or a reason
     */
    public static FlightOutcome pseudoRandom(
            FlightSetup setup, PseudoRandomSequence sequence, double[] counts, double cycles) {
        return pseudoRandom(setup, sequence, counts, cycles, true);
    }

    /**
     * The same with the choice whether molecules slower than one cycle are counted where they arrive, in the next cycle, as
     * they are with a chopper that turns on, or left out, as programs do that cut the model off at the cycle.
     *
     * @param setup geometry and timing
     * @param sequence openings, one per bin
     * @param counts counts in each bin of the cycle, summed over cycles
     * @param cycles number of cycles summed, positive
     * @param carriedOver true to count them where they arrive
     * @return the fit with the wrap-around measure, or a reason
     */
    public static FlightOutcome pseudoRandom(
            FlightSetup setup, PseudoRandomSequence sequence, double[] counts, double cycles, boolean carriedOver) {
        FlightOutcome.@Nullable Failure refusal = refusal(counts, cycles);
        if (refusal != null) {
            return refusal;
        }
        double[] decoded = sequence.decode(counts, cycles);
        if (PseudoRandomSequence.looksReversed(decoded)) {
            return new FlightOutcome.Failure(
                    FlightOutcome.Reason.REVERSED_POLARITY,
                    "The decoded signal points down: open and shut of the chopper are exchanged.");
        }
        int zero = (int) Math.floorMod(
                Math.round((setup.timeZero() - setup.firstBin()) / setup.binWidth()), (long) counts.length);
        double wrap = sequence.wrapAround(decoded, sequence.decodedVariance(counts, cycles), zero);
        double floor = lowestTenth(decoded);
        double[] above = new double[decoded.length];
        double signal = 0;
        double total = 0;
        for (int i = 0; i < decoded.length; i++) {
            above[i] = decoded[i] - floor;
            signal += Math.max(above[i], 0);
            total += counts[i];
        }
        double level = total / (counts.length * cycles);
        double background = Math.max(level - 0.5 * signal * (counts.length + 1) / counts.length, 0.05 * level);
        TraceModel model = new TraceModel(setup, counts.length, cycles, sequence, carriedOver ? 3 : 1);
        return fit(model, counts, above, background, setup, wrap);
    }

    private static FlightOutcome.@Nullable Failure refusal(double[] counts, double cycles) {
        MatterWave.positive("number of cycles", cycles);
        double total = 0;
        for (int i = 0; i < counts.length; i++) {
            if (!(counts[i] >= 0) || counts[i] != Math.rint(counts[i])) {
                throw new IllegalArgumentException(
                        "counts of bin " + i + " must be whole and not negative, are " + counts[i]);
            }
            total += counts[i];
        }
        if (counts.length < 8 || total < 20) {
            return new FlightOutcome.Failure(
                    FlightOutcome.Reason.TOO_LITTLE_DATA,
                    total + " counts in " + counts.length + " bins are too little for a velocity law.");
        }
        return null;
    }

    /** The mean of the lowest tenth of the values, at least three. */
    private static double lowestTenth(double[] values) {
        double[] sorted = values.clone();
        java.util.Arrays.sort(sorted);
        int n = Math.max(3, sorted.length / 10);
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += sorted[i];
        }
        return sum / n;
    }

    private static FlightOutcome fit(
            TraceModel model, double[] counts, double[] above, double background, FlightSetup setup, double wrap) {
        double @Nullable [] start = start(setup, above, background);
        if (start == null) {
            return new FlightOutcome.Failure(
                    FlightOutcome.Reason.NO_PEAK, "No arrival peak after the time zero stands above the background.");
        }
        CurveFitOutcome outcome = CurveFitter.poisson(model, counts, start);
        if (!(outcome instanceof CurveFit fit)) {
            return new FlightOutcome.Failure(
                    FlightOutcome.Reason.NO_CONVERGENCE, ((CurveFitOutcome.Failure) outcome).words());
        }
        double[] values = fit.values();
        if (!(fit.estimate(0).value() > 3 * fit.estimate(0).standardUncertainty())) {
            return new FlightOutcome.Failure(
                    FlightOutcome.Reason.NO_PEAK, "The signal is not three standard errors above nothing.");
        }
        VelocityLaw law = new VelocityLaw(3, values[1], values[2]);
        double mean = law.mean();
        return new FlightFit(
                values,
                fit.covariance(),
                fit.objective(),
                fit.degreesOfFreedom(),
                Distributions.chiSquareUpper(fit.objective(), fit.degreesOfFreedom()),
                fit.expected(),
                wrap,
                mean / setup.length(),
                law.moment(2) / setup.length());
    }

    /** Start values from the weighted mean and spread of 1 / t around the highest stretch. */
    private static double @Nullable [] start(FlightSetup setup, double[] above, double background) {
        int n = above.length;
        int half = Math.max(1, n / 40);
        int peak = -1;
        double highest = 0;
        for (int i = 0; i < n; i++) {
            if (time(setup, i, n) > 0) {
                double sum = 0;
                for (int k = Math.max(0, i - half); k <= Math.min(n - 1, i + half); k++) {
                    sum += above[k];
                }
                if (sum > highest) {
                    highest = sum;
                    peak = i;
                }
            }
        }
        if (peak < 0) {
            return null;
        }
        double mark = highest / (2 * half + 1) / 4;
        double sum = 0;
        double first = 0;
        double second = 0;
        double total = 0;
        for (int i = 0; i < n; i++) {
            double t = time(setup, i, n);
            if (t > 0) {
                total += Math.max(above[i], 0);
            }
            if (t > 0 && above[i] > mark) {
                double v = setup.length() / t;
                sum += above[i];
                first += above[i] * v;
                second += above[i] * v * v;
            }
        }
        if (!(sum > 0)) {
            return null;
        }
        double mean = first / sum;
        double spread = Math.sqrt(Math.max(second / sum - mean * mean, 1e-4 * mean * mean));
        return new double[] {total, 0.9 * mean, 1.3 * spread, Math.max(background, 1e-3 * highest)};
    }

    private static double time(FlightSetup setup, int bin, int bins) {
        double t = setup.firstBin() + bin * setup.binWidth() - setup.timeZero();
        return t > 0 || setup.openTime() > 0 ? t : t + bins * setup.binWidth();
    }

    /**
     * Arrival times read as velocities, without a law: node i at L / (t<sub>i</sub> &minus; t<sub>0</sub>), weighted with
     * the counts above the background. The variance the opening and the bin add is taken off the spread, not off the shape.
     *
     * @param setup geometry and timing
     * @param signal counts above background in each bin (raw or decoded), may be negative by noise
     * @param variances variance of each
     * @param from first bin of the arrival peak
     * @param to last bin of the arrival peak
     * @return nodes of rising velocity, flux-weighted, with the statistical uncertainty of the mean
     */
    public static VelocityDistribution velocities(
            FlightSetup setup, double[] signal, double[] variances, int from, int to) {
        if (from < 0 || to >= signal.length || to - from < 2 || variances.length != signal.length) {
            throw new IllegalArgumentException("bins " + from + " to " + to + " of " + signal.length + " are no peak");
        }
        int n = to - from + 1;
        double[] nodes = new double[n];
        double[] weights = new double[n];
        double[] deviations = new double[n];
        double sum = 0;
        double first = 0;
        for (int k = 0; k < n; k++) {
            int bin = to - k;
            double t = setup.firstBin() + bin * setup.binWidth() - setup.timeZero();
            nodes[k] = setup.length() / MatterWave.positive("flight time of bin " + bin, t);
            double factor = setup.densityDetector() ? nodes[k] : 1;
            weights[k] = factor * signal[bin];
            deviations[k] = factor * Math.sqrt(Math.max(variances[bin], 0));
            sum += weights[k];
            first += weights[k] * nodes[k];
        }
        MatterWave.positive("sum of the signal", sum);
        double mean = first / sum;
        double variance = 0;
        double second = 0;
        double broadening = 0;
        for (int k = 0; k < n; k++) {
            double part = (nodes[k] - mean) / sum * deviations[k];
            variance += part * part;
            second += weights[k] * (nodes[k] - mean) * (nodes[k] - mean) / sum;
            double smear = nodes[k] * nodes[k] / setup.length();
            double squares = setup.openTime() * setup.openTime() + setup.binWidth() * setup.binWidth();
            broadening += weights[k] * smear * smear * squares / 12 / sum;
            weights[k] = Math.max(weights[k], 0);
        }
        VelocityDistribution shape = VelocityDistribution.of(nodes, weights, Math.sqrt(variance));
        double spread = Math.sqrt(Math.max(second - broadening, 0));
        return new VelocityDistribution(shape.nodes(), shape.weights(), mean, Math.sqrt(variance), spread);
    }

    /** Expected counts of a trace against F, v0, w, b. */
    private static final class TraceModel implements ParametricModel {
        private final FlightSetup setup;
        private final int bins;
        private final double cycles;
        private final @Nullable PseudoRandomSequence sequence;
        private final int turns;

        TraceModel(FlightSetup setup, int bins, double cycles, @Nullable PseudoRandomSequence sequence, int turns) {
            this.turns = turns;
            this.setup = setup;
            this.bins = bins;
            this.cycles = cycles;
            this.sequence = sequence;
        }

        @Override
        public int parameters() {
            return 4;
        }

        @Override
        public int points() {
            return bins;
        }

        @Override
        public boolean evaluate(double[] theta, double[] values, double[] slopes) {
            if (!(theta[2] > 0) || !(theta[1] > -3 * theta[2]) || !(theta[3] >= 0) || theta[2] > 1e6) {
                return false;
            }
            double[][] shares = new Arrivals(setup, theta[1], theta[2]).shares(bins, turns);
            for (int j = 0; j < bins; j++) {
                double[] sums = new double[3];
                if (sequence == null) {
                    for (int k = 0; k < 3; k++) {
                        sums[k] = shares[k][j];
                    }
                } else {
                    through(sequence, shares, j, sums);
                }
                values[j] = cycles * (theta[0] * sums[0] + theta[3]);
                slopes[4 * j] = cycles * sums[0];
                slopes[4 * j + 1] = cycles * theta[0] * sums[1];
                slopes[4 * j + 2] = cycles * theta[0] * sums[2];
                slopes[4 * j + 3] = cycles;
            }
            return true;
        }

        private void through(PseudoRandomSequence openings, double[][] shares, int j, double[] sums) {
            for (int i = 0; i < bins; i++) {
                if (openings.opensAt(j - i)) {
                    for (int k = 0; k < 3; k++) {
                        sums[k] += shares[k][i];
                    }
                }
            }
        }
    }

    /** Share of the signal in each bin with its slopes by centre and width. */
    private static final class Arrivals {
        private static final int NODES = 3;
        private static final double[] PLACES = {-Math.sqrt(0.6), 0, Math.sqrt(0.6)};
        private static final double[] PARTS = {5.0 / 18, 8.0 / 18, 5.0 / 18};
        private final FlightSetup setup;
        private final VelocityLaw law;
        private final double[] means;

        Arrivals(FlightSetup setup, double centre, double width) {
            this.setup = setup;
            this.law = new VelocityLaw(setup.densityDetector() ? 2 : 3, centre, width);
            this.means = law.scoreMeans();
        }

        double[][] shares(int bins, int turns) {
            double[][] shares = new double[3][bins];
            for (int i = 0; i < bins * turns; i++) {
                double middle = setup.firstBin() + i * setup.binWidth() - setup.timeZero();
                for (int piece = 0; piece < 2; piece++) {
                    addPiece(shares, i % bins, middle + (piece - 0.5) * 0.5 * setup.binWidth());
                }
            }
            return shares;
        }

        /** Half a bin: three nodes in the bin, three in the opening. */
        private void addPiece(double[][] shares, int bin, double middle) {
            for (int a = 0; a < NODES; a++) {
                double inBin = middle + 0.25 * setup.binWidth() * PLACES[a];
                if (setup.openTime() == 0) {
                    add(shares, bin, inBin, PARTS[a]);
                    continue;
                }
                for (int half = -1; half <= 1; half += 2) {
                    for (int b = 0; b < NODES; b++) {
                        double opened = 0.25 * setup.openTime() * (half + PLACES[b]);
                        add(shares, bin, inBin - opened, 0.5 * PARTS[a] * PARTS[b]);
                    }
                }
            }
        }

        private void add(double[][] shares, int bin, double time, double part) {
            if (!(time > 0)) {
                return;
            }
            double velocity = setup.length() / time;
            double density = law.density(velocity) * velocity / time * 0.5 * setup.binWidth() * part;
            if (density == 0) {
                return;
            }
            double[] score = law.score(velocity, means);
            shares[0][bin] += density;
            shares[1][bin] += density * score[0];
            shares[2][bin] += density * score[1];
        }
    }
}
