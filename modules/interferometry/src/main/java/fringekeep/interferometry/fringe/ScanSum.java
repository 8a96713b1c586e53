package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Scans made into one before fitting.
 *
 * @param data the combined scan
 * @param phases phase by which each scan was shifted (rad); all 0 for a plain sum
 * @param jitterFactor factor by which the visibility is expected to be lowered by the uncertainty of the phases; 1 for a
 *     plain sum
 */
public record ScanSum(FringeData data, List<Double> phases, double jitterFactor) implements SumOutcome {
    /** Copies the phases. */
    public ScanSum {
        phases = List.copyOf(phases);
    }

    /**
     * Adds scans over the same positions, point by point. Masked points of a scan add nothing. Dark counts of all scans are
     * kept.
     *
     * @param scans at least one scan
     * @return the sum, or a reason
     */
    public static SumOutcome plain(List<FringeData> scans) {
        FringeFailure differing = differing(scans, true);
        if (differing != null) {
            return differing;
        }
        FringeData first = scans.get(0);
        int n = first.size();
        double[] counts = new double[n];
        double[] exposures = new double[n];
        double[] monitor = new double[n];
        double[] times = new double[n];
        boolean[] masked = new boolean[n];
        for (int i = 0; i < n; i++) {
            for (FringeData scan : scans) {
                if (!scan.masked[i]) {
                    counts[i] += scan.counts[i];
                    exposures[i] += scan.exposures[i];
                    monitor[i] += scan.exposures[i] * scan.monitor[i];
                    times[i] += scan.exposures[i] * (scan.times[i] - scan.times[0]);
                }
            }
            masked[i] = exposures[i] == 0;
            monitor[i] = masked[i] ? 1 : monitor[i] / exposures[i];
            times[i] = masked[i] ? first.times[i] - first.times[0] : times[i] / exposures[i];
            exposures[i] = masked[i] ? first.exposures[i] : exposures[i];
        }
        FringeData sum = FringeData.of(first.positions, counts)
                .exposures(exposures)
                .monitor(monitor)
                .times(times)
                .masked(masked);
        return new ScanSum(common(sum, scans), zeros(scans.size()), 1);
    }

    /**
     * Puts scans together after turning each to phase 0: every position is moved by phase d / (2 &pi;) and all points are
     * fitted as one scan. Means may differ from scan to scan; they are scaled out.
     *
     * <p>Phases from references taken around each scan leave only the factor of their uncertainty,
     * exp(&minus;u&sup2; / 2), which is given. Phases of the weak scans themselves would bias the visibility upwards by about
     * s&sup2; / (2 V), s the noise of one scan; {@link #afterOwnPhase} is for strong scans only.
     *
     * @param scans the scans
     * @param phases phase of each with its uncertainty (rad)
     * @param period fringe period (m)
     * @return the combined scan, whose phase is near 0, or a reason
     */
    public static SumOutcome afterPhase(List<FringeData> scans, List<Estimate> phases, double period) {
        FringeFailure differing = differing(scans, false);
        if (differing != null) {
            return differing;
        }
        if (phases.size() != scans.size()) {
            throw new IllegalArgumentException(phases.size() + " phases for " + scans.size() + " scans");
        }
        return together(scans, phases, period);
    }

    /**
     * The same with the phase each scan shows in a fit of its own.
     *
     * @param scans strong scans
     * @param options how each is fitted; the period must be fixed
     * @return the combined scan, or the first scan's reason
     */
    public static SumOutcome afterOwnPhase(List<FringeData> scans, FringeOptions options) {
        List<Estimate> phases = new ArrayList<>();
        for (FringeData scan : scans) {
            FringeOutcome outcome = FringeFitter.fit(scan, options.periodFree(false));
            if (outcome instanceof FringeFailure failure) {
                return failure;
            }
            Optional<Estimate> phase = outcome.orThrow().phase();
            if (phase.isEmpty()) {
                return new FringeFailure(
                        FringeFailure.Reason.NOT_DETERMINED,
                        "Scan " + phases.size() + " shows no phase to align it by; use references or a plain sum.");
            }
            phases.add(new Estimate(phase.get().value(), 0));
        }
        return afterPhase(scans, phases, options.period());
    }

    private static ScanSum together(List<FringeData> scans, List<Estimate> phases, double period) {
        int n = 0;
        for (FringeData scan : scans) {
            n += scan.size();
        }
        double[] positions = new double[n];
        double[] counts = new double[n];
        double[] exposures = new double[n];
        double[] monitor = new double[n];
        double[] times = new double[n];
        boolean[] masked = new boolean[n];
        List<Double> turned = new ArrayList<>();
        double weighted = 0;
        double total = 0;
        int at = 0;
        for (int k = 0; k < scans.size(); k++) {
            FringeData scan = scans.get(k);
            double phase = phases.get(k).value();
            double u = phases.get(k).standardUncertainty();
            double level = signalRate(scan);
            turned.add(phase);
            for (int i = 0; i < scan.size(); i++, at++) {
                positions[at] = scan.positions[i] + phase / (2 * Math.PI) * period;
                counts[at] = scan.counts[i];
                exposures[at] = scan.exposures[i];
                monitor[at] = level * scan.monitor[i];
                times[at] = scan.times[i] - scan.times[0];
                masked[at] = scan.masked[i];
                weighted += scan.counts[i] * StrictMath.exp(-0.5 * u * u);
                total += scan.counts[i];
            }
        }
        FringeData data = FringeData.of(positions, counts)
                .exposures(exposures)
                .monitor(monitor)
                .times(times)
                .masked(masked);
        return new ScanSum(common(data, scans), turned, total > 0 ? weighted / total : 1);
    }

    /** Counts per unit exposure and monitor, less the scan's dark rate, never below a tenth of all. */
    private static double signalRate(FringeData scan) {
        double counts = 0;
        double exposure = 0;
        double monitored = 0;
        for (int i = 0; i < scan.size(); i++) {
            if (!scan.masked[i]) {
                counts += scan.counts[i];
                exposure += scan.exposures[i];
                monitored += scan.exposures[i] * scan.monitor[i];
            }
        }
        double dark = scan.darkExposureTotal() > 0 ? scan.darkTotal() / scan.darkExposureTotal() : 0;
        double signal = Math.max(counts - dark * exposure, 0.1 * Math.max(counts, 1));
        return monitored > 0 ? signal / monitored : 1;
    }

    private static FringeData common(FringeData data, List<FringeData> scans) {
        int n = 0;
        for (FringeData scan : scans) {
            n += scan.darkCounts.length;
        }
        double[] dark = new double[n];
        double[] exposures = new double[n];
        int at = 0;
        for (FringeData scan : scans) {
            System.arraycopy(scan.darkCounts, 0, dark, at, scan.darkCounts.length);
            System.arraycopy(scan.darkExposures, 0, exposures, at, scan.darkExposures.length);
            at += scan.darkCounts.length;
        }
        FringeData first = scans.get(0);
        return data.dark(dark, exposures).deadTime(first.deadTime).secondsPerExposure(first.secondsPerExposure);
    }

    private static List<Double> zeros(int n) {
        return java.util.Collections.nCopies(n, 0.0);
    }

    private static @org.jspecify.annotations.Nullable FringeFailure differing(
            List<FringeData> scans, boolean samePositions) {
        if (scans.isEmpty()) {
            throw new IllegalArgumentException("no scan to combine");
        }
        FringeData first = scans.get(0);
        for (int k = 1; k < scans.size(); k++) {
            FringeData scan = scans.get(k);
            if (!scan.deadTime.equals(first.deadTime) || scan.secondsPerExposure != first.secondsPerExposure) {
                return new FringeFailure(
                        FringeFailure.Reason.SCANS_DIFFER,
                        "Scan " + k + " has another dead time or unit of exposure than scan 0; fit them jointly.");
            }
            if (samePositions && !samePositions(first, scan)) {
                return new FringeFailure(
                        FringeFailure.Reason.SCANS_DIFFER,
                        "Scan " + k + " has other positions than scan 0; sum after phase or fit them jointly.");
            }
        }
        return null;
    }

    /** Positions are the same if they differ by less than a millionth of the range. */
    private static boolean samePositions(FringeData a, FringeData b) {
        if (a.size() != b.size()) {
            return false;
        }
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        double furthest = 0;
        for (int i = 0; i < a.size(); i++) {
            low = Math.min(low, a.positions[i]);
            high = Math.max(high, a.positions[i]);
            furthest = Math.max(furthest, Math.abs(a.positions[i] - b.positions[i]));
        }
        return furthest <= 1e-6 * (high - low);
    }
}
