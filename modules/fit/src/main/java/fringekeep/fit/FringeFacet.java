package fringekeep.fit;

import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.record.Hash;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.SettingsFacet;
import java.time.Instant;
import java.util.List;
import java.util.Optional;

/**
 * A fringe as later stages take it.
 *
 * @param visibility amplitude over mean
 * @param lower lower end of the visibility's interval at the level the fit chose
 * @param upper upper end of it
 * @param phase phase (rad), where there is one
 * @param mean mean rate (1/s, or per shot)
 * @param relativeVisibility visibility over that of the references, where asked
 * @param relativePhase phase less that of the references (rad), where asked
 * @param channel channel that was fitted
 * @param scans the fitted scans (role scan) in order
 * @param sensitivities how visibility (first) and phase (second, where there is one) answer to shared sources
 */
public record FringeFacet(
        Value visibility,
        double lower,
        double upper,
        Optional<Value> phase,
        Value mean,
        Optional<Value> relativeVisibility,
        Optional<Value> relativePhase,
        String channel,
        List<ScanFact> scans,
        List<Sensitivity> sensitivities) {
    /** Copies. */
    public FringeFacet {
        scans = List.copyOf(scans);
        sensitivities = List.copyOf(sensitivities);
    }

    /** A value and its standard uncertainty. */
    public record Value(double value, double deviation) {}

    /**
     * What is known of one fitted scan.
     *
     * @param scan its record
     * @param placement its pinned placement, where one is pinned
     * @param purpose what it was taken for
     * @param start when it began
     * @param settings settings of its header, then that of its series step
     */
    public record ScanFact(
            Hash scan,
            Optional<Hash> placement,
            Optional<Purpose> purpose,
            Optional<Instant> start,
            SettingsFacet settings) {}

    /** The purpose all scans share; empty where they differ or one has none. */
    public Optional<Purpose> purpose() {
        Optional<Purpose> first = scans.stream().findFirst().flatMap(ScanFact::purpose);
        return scans.stream().allMatch(scan -> scan.purpose().equals(first)) ? first : Optional.empty();
    }

    /**
     * Mean over the scans of a setting, such as {@code laser power} (SI), with the mean of their standard uncertainties, as
     * for readings of one meter; the uncertainty is 0 where none is stated. Empty where a scan lacks the setting.
     */
    public Optional<Value> setting(String name) {
        double sum = 0;
        double deviations = 0;
        for (ScanFact scan : scans) {
            Optional<SettingsFacet.Setting> setting = scan.settings().named(name);
            if (setting.isEmpty()) {
                return Optional.empty();
            }
            sum += setting.get().value();
            deviations +=
                    Double.isNaN(setting.get().deviation()) ? 0 : setting.get().deviation();
        }
        int n = scans.size();
        return n == 0 ? Optional.empty() : Optional.of(new Value(sum / n, deviations / n));
    }

    /** Power of the grating laser (W): setting {@code laser power}. */
    public Optional<Value> power() {
        return setting("laser power");
    }

    /** Begin of the first scan, where known. */
    public Optional<Instant> start() {
        return scans.stream().flatMap(scan -> scan.start().stream()).min(Instant::compareTo);
    }
}
