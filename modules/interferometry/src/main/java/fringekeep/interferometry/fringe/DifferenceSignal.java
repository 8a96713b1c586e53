package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Estimate;
import java.util.Optional;

/**
 * Difference of the signal with resonant and off-resonant pulse timing, normalised so that drifts of the source common to
 * both cancel. Uncertainties by propagation of Poisson counts, times the root of the dispersion for pulsed sources.
 */
public final class DifferenceSignal {
    private DifferenceSignal() {}

    /**
     * (resonant &minus; off) / off, per shot.
     *
     * @param resonantCounts counts with resonant timing
     * @param resonantShots shots with resonant timing, positive
     * @param offCounts counts with off-resonant timing
     * @param offShots shots with off-resonant timing, positive
     * @param dispersion variance over mean of the counts, 1 for Poisson
     * @return the normalised difference, empty without off-resonant counts; its law is skewed below about 100 of them
     */
    public static Optional<Estimate> relative(
            double resonantCounts, double resonantShots, double offCounts, double offShots, double dispersion) {
        check(resonantCounts, resonantShots, offCounts, offShots, dispersion);
        if (offCounts == 0) {
            return Optional.empty();
        }
        double shots = offShots / resonantShots;
        double ratio = shots * resonantCounts / offCounts;
        double variance = shots * shots * resonantCounts / (offCounts * offCounts) + ratio * ratio / offCounts;
        return Optional.of(new Estimate(ratio - 1, Math.sqrt(dispersion * variance)));
    }

    /**
     * (resonant &minus; off) / (resonant + off), per shot.
     *
     * @param resonantCounts counts with resonant timing
     * @param resonantShots shots with resonant timing, positive
     * @param offCounts counts with off-resonant timing
     * @param offShots shots with off-resonant timing, positive
     * @param dispersion variance over mean of the counts, 1 for Poisson
     * @return the contrast, empty without any counts
     */
    public static Optional<Estimate> symmetric(
            double resonantCounts, double resonantShots, double offCounts, double offShots, double dispersion) {
        check(resonantCounts, resonantShots, offCounts, offShots, dispersion);
        double resonant = resonantCounts / resonantShots;
        double off = offCounts / offShots;
        double sum = resonant + off;
        if (!(sum > 0)) {
            return Optional.empty();
        }
        double byResonant = 2 * off / (sum * sum) / resonantShots;
        double byOff = 2 * resonant / (sum * sum) / offShots;
        double variance = byResonant * byResonant * resonantCounts + byOff * byOff * offCounts;
        return Optional.of(new Estimate((resonant - off) / sum, Math.sqrt(dispersion * variance)));
    }

    private static void check(double resonant, double resonantShots, double off, double offShots, double dispersion) {
        if (!(resonant >= 0) || !(off >= 0) || !(resonantShots > 0) || !(offShots > 0) || !(dispersion > 0)) {
            throw new IllegalArgumentException("counts must not be negative and shots and dispersion positive: "
                    + resonant + " in " + resonantShots + ", " + off + " in " + offShots + ", " + dispersion);
        }
    }
}
