package fringekeep.sourcerun;

import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.beam.FlightSetup;
import fringekeep.interferometry.beam.FlightTime;
import fringekeep.interferometry.beam.VelocityDistribution;

/**
 * A trace read as velocities, without a law.
 *
 * @param setup geometry and timing
 * @param signal counts, or decoded counts, in each bin
 * @param variances variance of each
 * @param random whether the chopper was pseudo-random, so that opening and bin are each one element long
 */
record MeasuredTrace(FlightSetup setup, double[] signal, double[] variances, boolean random) {
    private static final int LEAST_PEAK = 3;

    /**
     * The peak and what was taken off.
     *
     * @param distribution nodes with rising velocity
     * @param deviations standard uncertainty of each weight from counting
     * @param spreadDeviation standard uncertainty of the spread (m/s)
     * @param background taken off each bin
     * @param backgroundDeviation its standard uncertainty
     * @param negative whether bins of the peak lay below the background
     * @param resolution share of the measured variance of velocities that opening and bin account for
     */
    record Peak(
            VelocityDistribution distribution,
            double[] deviations,
            double spreadDeviation,
            double background,
            double backgroundDeviation,
            boolean negative,
            double resolution) {}

    private double velocity(int bin) {
        double t = setup.firstBin() + bin * setup.binWidth() - setup.timeZero();
        return t > 0 ? setup.length() / t : Double.POSITIVE_INFINITY;
    }

    /**
     * Reads the velocities from one to another (m/s).
     *
     * @param background whether the mean of the bins outside is taken off
     */
    Peak peak(double from, double to, boolean background) throws ProblemException {
        int first = -1;
        int last = -1;
        for (int bin = 0; bin < signal.length; bin++) {
            if (velocity(bin) >= from && velocity(bin) <= to) {
                first = first < 0 ? bin : first;
                last = bin;
            }
        }
        if (first < 0 || last - first + 1 < LEAST_PEAK) {
            throw new ProblemException(Trouble.at("window-empty", "/choices/from"));
        }
        int outside = signal.length - (last - first + 1);
        if (background && outside < LEAST_PEAK) {
            throw new ProblemException(Trouble.at("background-bins", "/choices/background"));
        }
        double level = 0;
        double levelVariance = 0;
        for (int bin = 0; background && bin < signal.length; bin++) {
            if (bin < first || bin > last) {
                level += signal[bin] / outside;
                levelVariance += variances[bin] / outside / outside;
            }
        }
        return above(first, last, level, levelVariance);
    }

    private Peak above(int first, int last, double level, double levelVariance) throws ProblemException {
        double[] net = new double[signal.length];
        boolean negative = false;
        double sum = 0;
        for (int bin = 0; bin < net.length; bin++) {
            net[bin] = signal[bin] - level;
            if (bin >= first && bin <= last) {
                negative |= net[bin] < 0;
                sum += factor(bin) * net[bin];
            }
        }
        if (!(sum > 0)) {
            throw new ProblemException(Trouble.at("no-peak", "/choices/from"));
        }
        FlightSetup resolving = random
                ? new FlightSetup(
                        setup.length(),
                        setup.firstBin(),
                        setup.binWidth(),
                        setup.timeZero(),
                        setup.binWidth(),
                        setup.densityDetector())
                : setup;
        VelocityDistribution counted = FlightTime.velocities(resolving, net, variances, first, last);
        return described(counted, net, first, last, new double[] {sum, level, levelVariance}, negative);
    }

    private Peak described(
            VelocityDistribution counted, double[] net, int first, int last, double[] sums, boolean negative) {
        double mean = counted.mean();
        double square = 0;
        for (int bin = first; bin <= last; bin++) {
            square += factor(bin) * net[bin] * (velocity(bin) - mean) * (velocity(bin) - mean) / sums[0];
        }
        double[] deviations = new double[last - first + 1];
        double spreadVariance = 0;
        double shiftByLevel = 0;
        double squareByLevel = 0;
        for (int bin = first; bin <= last; bin++) {
            double off = velocity(bin) - mean;
            double deviation = factor(bin) * Math.sqrt(Math.max(0, variances[bin])) / sums[0];
            deviations[last - bin] = deviation;
            spreadVariance += (off * off - square) * (off * off - square) * deviation * deviation;
            shiftByLevel += factor(bin) * off / sums[0];
            squareByLevel += factor(bin) * (off * off - square) / sums[0];
        }
        spreadVariance += squareByLevel * squareByLevel * sums[2];
        double statistical = Math.sqrt(
                counted.meanUncertainty() * counted.meanUncertainty() + shiftByLevel * shiftByLevel * sums[2]);
        double spread = counted.spread();
        VelocityDistribution distribution =
                new VelocityDistribution(counted.nodes(), counted.weights(), mean, statistical, spread);
        double spreadDeviation =
                spread > 0 ? Math.sqrt(spreadVariance) / (2 * spread) : Math.sqrt(Math.sqrt(spreadVariance));
        double resolution = square > 0 ? 1 - spread * spread / square : 1;
        return new Peak(distribution, deviations, spreadDeviation, sums[1], Math.sqrt(sums[2]), negative, resolution);
    }

    private double factor(int bin) {
        return setup.densityDetector() ? velocity(bin) : 1;
    }
}
