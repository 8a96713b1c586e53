package fringekeep.fit.internal;

import fringekeep.interferometry.fringe.FringeFit;
import fringekeep.interferometry.fringe.HarmonicEstimate;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import java.util.List;
import java.util.Optional;

/**
 * What a fit gives: estimates in rates per unit exposure and what stands behind them.
 *
 * @param names names of the estimates; mean, cosine, sine first
 * @param values rates (per second or shot), drifts and phase drift as they are, period (m)
 * @param covariance lower triangle by rows
 * @param exposure exposure that counts are stated for: of one row, or of one row of all summed scans
 * @param visibility with its standard error
 * @param interval its interval
 * @param limit its upper limit
 * @param phase phase, where there is one
 * @param significance statistic and p of the test for any fringe
 * @param same probability that scans of a joint fit agree; empty for others
 * @param fits the fit, or one for each scan of a joint fit
 * @param rows where each row of each fit comes from
 */
public record FitAnswer(
        List<String> names,
        double[] values,
        double[] covariance,
        double exposure,
        Optional<Estimate> visibility,
        Optional<Interval> interval,
        Optional<Double> limit,
        Optional<Estimate> phase,
        Optional<double[]> significance,
        Optional<Double> same,
        List<FringeFit> fits,
        List<List<RowSource>> rows) {
    /** Copies. */
    public FitAnswer {
        names = List.copyOf(names);
        values = values.clone();
        covariance = covariance.clone();
        fits = List.copyOf(fits);
        rows = rows.stream().map(List::copyOf).toList();
    }

    /** Mean, cosine and sine alone. */
    HarmonicEstimate harmonic() {
        double[] first = new double[6];
        System.arraycopy(covariance, 0, first, 0, 6);
        return new HarmonicEstimate(values[0], values[1], values[2], first);
    }

    /**
     * Where a fitted row comes from.
     *
     * @param input position of the scan; of the first of them for a sum
     * @param row row in it, from 0
     */
    public record RowSource(int input, int row) {}
}
