package fringekeep.fit;

import fringekeep.archive.Archive;
import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.Moment;
import fringekeep.archive.record.ThingId;
import fringekeep.fit.internal.FitProblems;
import fringekeep.instrument.CurrentCalibrations;
import fringekeep.scan.PlaceScans;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Gathers what a fit pins (record format 1, section 6): each scan as it stands now with its current placement; then, each
 * record once, the setup that held when the scan began, the run, its batches and their compounds, the calibrations valid then,
 * and live masks. Refuses, naming the records, where something is disputed, not placed, or withdrawn and not asked for
 * notwithstanding.
 *
 * <p>Thread rule: one call at a time for one instance; it sees the archive as it is when made.
 */
public final class GatherInputs {
    private final Archive archive;
    private final Graph graph;
    private final List<Problem> problems = new ArrayList<>();
    private final Set<Hash> setups = new LinkedHashSet<>();
    private final Set<Hash> runs = new LinkedHashSet<>();
    private final Set<Hash> batches = new LinkedHashSet<>();
    private final Set<Hash> compounds = new LinkedHashSet<>();
    private final Set<Hash> calibrations = new LinkedHashSet<>();
    private final Set<Hash> masks = new LinkedHashSet<>();
    private final List<InputReference> inputs = new ArrayList<>();
    private final Set<Hash> forgiven = new LinkedHashSet<>();
    private List<String> targets = List.of();

    /** Gathers from an archive. */
    public GatherInputs(Archive archive) {
        this.archive = archive;
        this.graph = archive.graph();
    }

    /**
     * What is to be fitted.
     *
     * @param scans signal scans, any record of their things
     * @param references reference scans
     * @param backgrounds background scans
     * @param channel channel that is fitted, also of references and backgrounds
     * @param calibrationTargets codes of the calibrations the fit uses, such as {@code position-scale}
     * @param notwithstanding judgements in spite of which withdrawn records are used
     */
    public record Asked(
            List<Hash> scans,
            List<Hash> references,
            List<Hash> backgrounds,
            String channel,
            List<String> calibrationTargets,
            List<Hash> notwithstanding) {
        /** Copies. */
        public Asked {
            scans = List.copyOf(scans);
            references = List.copyOf(references);
            backgrounds = List.copyOf(backgrounds);
            calibrationTargets = List.copyOf(calibrationTargets);
            notwithstanding = List.copyOf(notwithstanding);
        }

        /** One signal scan alone. */
        public static Asked of(Hash scan, String channel) {
            return new Asked(List.of(scan), List.of(), List.of(), channel, List.of(), List.of());
        }
    }

    /**
     * The inputs, in the order in which a fit pins them.
     *
     * @throws ProblemException all that stands against it, each with the record's name
     */
    public List<InputReference> of(Asked asked) throws ProblemException {
        clear();
        targets = asked.calibrationTargets();
        forgiven.addAll(asked.notwithstanding());
        asked.scans().forEach(scan -> scan("scan", scan, asked.channel()));
        asked.references().forEach(scan -> scan("reference", scan, asked.channel()));
        asked.backgrounds().forEach(scan -> scan("background", scan, asked.channel()));
        for (Hash used : List.copyOf(setups)) {
            refuseWithdrawn(used);
        }
        runs.forEach(this::refuseWithdrawn);
        batches.forEach(this::refuseWithdrawn);
        compounds.forEach(this::refuseWithdrawn);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        add("setup", setups);
        add("run", runs);
        add("batch", batches);
        add("compound", compounds);
        add("calibration", calibrations);
        add("mask", masks);
        add("notwithstanding", forgiven);
        return List.copyOf(inputs);
    }

    private void clear() {
        problems.clear();
        inputs.clear();
        List.of(setups, runs, batches, compounds, calibrations, masks, forgiven).forEach(Set::clear);
    }

    private void add(String role, Set<Hash> records) {
        records.forEach(record -> inputs.add(new InputReference.OfRecord(role, record)));
    }

    private void scan(String role, Hash named, String channel) {
        Optional<RecordView> scan = current(named);
        if (scan.isEmpty()) {
            return;
        }
        Hash hash = scan.get().fingerprint();
        refuseWithdrawn(hash);
        inputs.add(new InputReference.OfRecord(role, hash, Optional.of(channel)));
        placement(scan.get()).ifPresent(placement -> {
            refuseWithdrawn(placement.fingerprint());
            inputs.add(new InputReference.OfRecord("placement", placement.fingerprint()));
            Optional<Instant> start = start(scan.get());
            setup(placement, start, hash);
            start.ifPresent(this::calibrations);
            sample(placement);
        });
        masks(hash, channel);
    }

    /** The record that stands for a thing now. */
    private Optional<RecordView> current(Hash named) {
        Optional<Hash> current = graph.current(named);
        if (current.isEmpty()) {
            problems.add(FitProblems.of("gather.disputed", archive.label(named), archive.label(named)));
        }
        return current.flatMap(archive::record);
    }

    private Optional<RecordView> placement(RecordView scan) {
        List<RecordView> placements = PlaceScans.placements(archive, graph, scan);
        String label = archive.label(scan.fingerprint());
        if (placements.isEmpty()) {
            problems.add(FitProblems.of("gather.not-placed", label, label));
        } else if (placements.size() > 1) {
            List<String> labels = placements.stream()
                    .map(each -> archive.label(each.fingerprint()))
                    .toList();
            problems.add(FitProblems.of("gather.placements", label, label, String.join(", ", labels)));
        }
        return placements.size() == 1 ? Optional.of(placements.get(0)) : Optional.empty();
    }

    private static Optional<Instant> start(RecordView scan) {
        return scan.result().object("start").map(json -> moment(json).at());
    }

    private static Moment moment(JsonObject json) {
        return fringekeep.archive.quantity.QuantityJson.moment(json.without("known"));
    }

    private void setup(RecordView placement, Optional<Instant> start, Hash scan) {
        for (Hash named : named(placement, "setup")) {
            Optional<ThingId> thing =
                    archive.record(named).map(record -> record.head().thing());
            Optional<Hash> segment =
                    thing.flatMap(each -> start.isPresent() ? graph.at(each, start.get()) : onlySegment(each));
            if (segment.isPresent()) {
                setups.add(segment.get());
            } else {
                String code = start.isPresent() ? "gather.setup-disputed" : "gather.setup-time";
                problems.add(FitProblems.of(code, archive.label(scan), archive.label(named)));
            }
        }
    }

    /** Without a time the setup must have one segment only. */
    private Optional<Hash> onlySegment(ThingId thing) {
        List<Hash> segments = graph.records(thing).stream()
                .filter(record -> graph.current(record).equals(Optional.of(record)))
                .toList();
        return segments.size() == 1 ? Optional.of(segments.get(0)) : Optional.empty();
    }

    private void calibrations(Instant start) {
        try {
            for (String target : targets) {
                calibrations.addAll(CurrentCalibrations.at(archive, start, target, Optional.empty()));
            }
        } catch (ProblemException e) {
            problems.addAll(e.problems());
        }
    }

    private void sample(RecordView placement) {
        List<Hash> placed = new ArrayList<>(named(placement, "batch"));
        for (Hash named : named(placement, "run")) {
            current(named).ifPresent(run -> {
                runs.add(run.fingerprint());
                if (placed.isEmpty()) {
                    placed.addAll(named(run, "batch"));
                }
            });
        }
        for (Hash named : placed) {
            current(named).ifPresent(batch -> {
                batches.add(batch.fingerprint());
                named(batch, "compound")
                        .forEach(compound -> current(compound).ifPresent(each -> compounds.add(each.fingerprint())));
            });
        }
    }

    private static List<Hash> named(RecordView record, String role) {
        return record.head().about().stream()
                .filter(reference -> reference.role().equals(role))
                .map(AboutReference::record)
                .toList();
    }

    private void masks(Hash scan, String channel) {
        for (Hash judgement : graph.judgements(scan)) {
            JsonObject content =
                    archive.record(judgement).map(RecordView::content).orElse(JsonObject.EMPTY);
            boolean masked = content.text("verdict").equals(Optional.of("masked"));
            if (masked
                    && (content.text("channel").isEmpty()
                            || content.text("channel").equals(Optional.of(channel)))) {
                masks.add(judgement);
            }
        }
    }

    /** Using a withdrawn record on purpose is said by pinning the judgement. */
    private void refuseWithdrawn(Hash record) {
        if (!graph.states(record).contains(StateName.WITHDRAWN)) {
            return;
        }
        List<Hash> withdrawing = graph.judgements(record).stream()
                .filter(judgement -> archive.record(judgement)
                        .map(RecordView::content)
                        .flatMap(content -> content.text("verdict"))
                        .equals(Optional.of("withdrawn")))
                .toList();
        if (!forgiven.containsAll(withdrawing)) {
            List<String> labels = withdrawing.stream().map(archive::label).toList();
            String label = archive.label(record);
            problems.add(FitProblems.of("gather.withdrawn", label, label, String.join(", ", labels)));
        }
    }
}
