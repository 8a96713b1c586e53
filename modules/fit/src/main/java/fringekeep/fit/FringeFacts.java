package fringekeep.fit;

import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.record.ThingId;
import fringekeep.fit.FringeFacet.ScanFact;
import fringekeep.fit.FringeFacet.Value;
import fringekeep.scan.PlacementFacet;
import fringekeep.scan.SettingsFacet;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Gathers the facet of a fit from its record and inputs. */
final class FringeFacts {
    private FringeFacts() {}

    /** The facet; empty where the fit shows no visibility. */
    static Optional<FringeFacet> of(RecordView record, Inputs inputs) {
        JsonObject result = record.result();
        Optional<JsonObject> visibility = result.object("visibility");
        if (visibility.isEmpty()) {
            return Optional.empty();
        }
        JsonObject reference = result.object("reference").orElse(JsonObject.EMPTY);
        return Optional.of(new FringeFacet(
                value(visibility.get()),
                visibility.get().number("lower").orElseThrow(),
                visibility.get().number("upper").orElseThrow(),
                result.object("phase").map(FringeFacts::value),
                mean(result),
                reference.object("relativeVisibility").map(FringeFacts::value),
                reference.object("relativePhase").map(FringeFacts::value),
                channel(inputs),
                scans(inputs),
                sensitivities(result, inputs)));
    }

    static String channel(Inputs inputs) {
        return inputs.role("scan").stream().findFirst().flatMap(Input::channel).orElse("counts");
    }

    private static Value value(JsonObject estimate) {
        return new Value(
                estimate.number("value").orElseThrow(), estimate.number("u").orElseThrow());
    }

    /** Mean in rates; a result of the first form without an exposure is taken as stated for one second. */
    private static Value mean(JsonObject result) {
        double exposure = result.object("exposure")
                .map(member -> member.number("si").orElse(1))
                .orElse(1.0);
        double value = result.array("values").numbers()[0];
        double variance = result.array("covariance").numbers()[0];
        return new Value(value / exposure, Math.sqrt(Math.max(0, variance)) / exposure);
    }

    private static List<Sensitivity> sensitivities(JsonObject result, Inputs inputs) {
        double[] values = result.array("values").numbers();
        Derived derived = Derived.of(values, result.object("phase").isPresent());
        int derivedCount = derived.names().size();
        return FitReading.sensitivities(result, inputs).stream()
                .map(each -> {
                    double[] all = derived.extended(each.derivatives());
                    return new Sensitivity(
                            each.source(),
                            each.parameter(),
                            each.deviation(),
                            Arrays.copyOfRange(all, all.length - derivedCount, all.length));
                })
                .toList();
    }

    static List<ScanFact> scans(Inputs inputs) {
        List<ScanFact> facts = new ArrayList<>();
        for (Input scan : inputs.role("scan")) {
            Optional<Input> placement = placement(scan, inputs);
            Optional<PlacementFacet> placed = placement.flatMap(each -> each.facet(PlacementFacet.class));
            List<SettingsFacet.Setting> settings = new ArrayList<>(
                    scan.facet(SettingsFacet.class).map(SettingsFacet::settings).orElse(List.of()));
            placed.flatMap(PlacementFacet::stepSetting).ifPresent(settings::add);
            facts.add(new ScanFact(
                    scan.target(),
                    placement.map(Input::target),
                    placed.map(PlacementFacet::purpose),
                    scan.facet(TimeSpan.class).map(span -> span.start().at()),
                    new SettingsFacet(settings)));
        }
        return facts;
    }

    /** The pinned placement that speaks of a scan's thing. */
    private static Optional<Input> placement(Input scan, Inputs inputs) {
        Optional<ThingId> thing = scan.record().map(record -> record.head().thing());
        return inputs.role("placement").stream()
                .filter(placement ->
                        placement.inputs().about("scan").stream().anyMatch(subject -> speaksOf(subject, scan, thing)))
                .findFirst();
    }

    private static boolean speaksOf(Subject subject, Input scan, Optional<ThingId> thing) {
        Optional<ThingId> spoken = subject.record().map(record -> record.head().thing());
        return subject.target().equals(scan.target()) || spoken.isPresent() && spoken.equals(thing);
    }
}
