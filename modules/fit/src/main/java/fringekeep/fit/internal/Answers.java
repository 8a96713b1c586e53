package fringekeep.fit.internal;

import fringekeep.fit.internal.FitAnswer.RowSource;
import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.FringeSignificance;
import fringekeep.interferometry.fringe.JointFit;
import fringekeep.interferometry.statistics.AmplitudeLimits;
import fringekeep.interferometry.statistics.Estimate;
import java.util.List;
import java.util.Optional;

/** Makes answers of fits. */
final class Answers {
    private Answers() {}

    /** The answer of one fit. */
    static FitAnswer of(FringeFit fit, FitChoices choices, List<RowSource> rows) {
        Optional<Estimate> visibility = fit.visibility();
        double noise = fit.harmonic().quadratureNoise();
        // With a drifting phase there is no fit at visibility 0 to compare with, and the statistic is infinite: none is
        // given.
        Optional<double[]> significance =
                fit.significance().map(Answers::pair).filter(pair -> Double.isFinite(pair[0]));
        return new FitAnswer(
                fit.names(),
                fit.values(),
                fit.covariance(),
                exposure(fit.data()),
                visibility,
                fit.visibilityInterval(choices.interval()),
                visibility.flatMap(each -> limit(each.value(), noise, choices.limit())),
                fit.phase(),
                significance,
                Optional.empty(),
                List.of(fit),
                List.of(rows));
    }

    private static double[] pair(FringeSignificance significance) {
        return new double[] {significance.statistic(), significance.pValue()};
    }

    private static Optional<Double> limit(double visibility, double noise, double level) {
        boolean known = noise > 0 && Double.isFinite(noise);
        return known ? Optional.of(AmplitudeLimits.flatPriorUpperLimit(visibility, noise, level)) : Optional.empty();
    }

    /** Mean exposure of the rows used. */
    private static double exposure(FringeData data) {
        double[] exposures = data.exposures();
        boolean[] masked = data.masked();
        double sum = 0;
        int used = 0;
        boolean same = true;
        double first = Double.NaN;
        for (int row = 0; row < exposures.length; row++) {
            if (!masked[row]) {
                first = used == 0 ? exposures[row] : first;
                same &= exposures[row] == first;
                sum += exposures[row];
                used++;
            }
        }
        return same ? first : sum / used;
    }

    /**
     * The answer of a joint fit: the mean of the scans' means; cosine = mean times the common visibility; sine 0, each scan
     * being turned to phase 0. The covariance is that of a visibility independent of the mean.
     */
    static FitAnswer of(JointFit fit, FitChoices choices, List<List<RowSource>> rows) {
        int scans = fit.scans().size();
        double mean = 0;
        double variance = 0;
        double exposure = 0;
        double statistic = 0;
        for (FringeFit each : fit.scans()) {
            mean += each.mean().value() / scans;
            double u = each.mean().standardUncertainty() / scans;
            variance += u * u;
            exposure += exposure(each.data()) / scans;
            statistic += each.significance().map(FringeSignificance::statistic).orElse(0.0);
        }
        double v = fit.visibility().value();
        double u = fit.visibility().standardUncertainty();
        double quadrature = mean * mean * u * u;
        double[] covariance = {variance, v * variance, v * v * variance + quadrature, 0, 0, quadrature};
        return new FitAnswer(
                List.of("mean", "cosine", "sine"),
                new double[] {mean, mean * v, 0},
                covariance,
                exposure,
                Optional.of(fit.visibility()),
                Optional.of(fit.interval(choices.interval())),
                u > 0 ? limit(v, u, choices.limit()) : Optional.empty(),
                Optional.empty(),
                Optional.of(new double[] {statistic, Chances.upper(statistic, 2 * scans)}),
                Optional.of(fit.sameVisibilityPValue()),
                fit.scans(),
                rows);
    }
}
