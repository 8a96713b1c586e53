package fringekeep.property;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.instrument.CurrentCalibrations;
import java.time.Instant;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Gathers what a property pins from a selection: the selection as it stands, the velocities its fits' placements name, the
 * compound of their batches, and the power calibrations that held when the scans began.
 */
public final class GatherProperty {
    private static final KindName PROPERTY = new KindName("property");
    private static final List<String> TARGETS = List.of("power-scale", "power-waist", "waist-across");

    private final Archive archive;

    /** Gathers from an archive. */
    public GatherProperty(Archive archive) {
        this.archive = archive;
    }

    /**
     * The request for a property; its result is still to be computed.
     *
     * @param selection any record of the selection's thing; the current one is pinned
     * @param choices choices, possibly incomplete
     * @param quoted quoted values to stand beside
     * @throws ProblemException if the selection is disputed or withdrawn, or its fits are of several compounds
     */
    public NewRecord request(Hash selection, JsonObject choices, List<Hash> quoted, Optional<PersonId> person)
            throws ProblemException {
        Hash current = standing(selection, "selection");
        return request(current, pinned(view(current), SelectionKind.TAKEN), choices, quoted, person);
    }

    /**
     * The request for a property of a selection that is about to be recorded before it.
     *
     * @param selection its fingerprint
     * @param fits the fits it takes
     * @param choices choices, possibly incomplete
     * @param quoted quoted values to stand beside
     * @throws ProblemException if the fits are of several compounds
     */
    public NewRecord request(
            Hash selection, List<Hash> fits, JsonObject choices, List<Hash> quoted, Optional<PersonId> person)
            throws ProblemException {
        List<InputReference> inputs = new ArrayList<>();
        inputs.add(new InputReference.OfRecord("selection", selection));
        Set<Hash> velocities = new LinkedHashSet<>();
        Set<Hash> compounds = new LinkedHashSet<>();
        Set<Hash> calibrations = new LinkedHashSet<>();
        for (Hash fit : fits) {
            RecordView view = view(fit);
            pinned(view, "placement").forEach(placement -> velocitiesOf(view(placement), velocities));
            for (Hash compound : pinned(view, "compound")) {
                compounds.add(archive.graph().current(compound).orElse(compound));
            }
            for (Hash scan : pinned(view, "scan")) {
                calibrationsAt(view(scan), calibrations);
            }
        }
        requireOneCompound(compounds);
        for (Hash velocity : velocities) {
            inputs.add(new InputReference.OfRecord("velocity", standing(velocity, "velocity")));
        }
        compounds.forEach(compound -> inputs.add(new InputReference.OfRecord("compound", compound)));
        calibrations.forEach(record -> inputs.add(new InputReference.OfRecord("calibration", record)));
        quoted.forEach(record -> inputs.add(new InputReference.OfRecord("quoted", record)));
        return new NewRecord(
                PROPERTY,
                inputs,
                List.of(),
                Map.of(PartName.CHOICES, choices),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                person);
    }

    private RecordView view(Hash record) {
        return archive.record(record)
                .orElseThrow(() -> new IllegalStateException("a pinned record is not at hand: " + record));
    }

    private Hash standing(Hash record, String words) throws ProblemException {
        Hash current = archive.graph()
                .current(record)
                .orElseThrow(() -> problem(
                        "property.disputed",
                        archive.label(record) + " is disputed.",
                        "Prefer one of the records that claim its place."));
        if (archive.graph().states(current).contains(StateName.WITHDRAWN)) {
            throw problem(
                    "property.withdrawn",
                    "The " + words + " " + archive.label(current) + " is withdrawn.",
                    "Leave it out, or restore it.");
        }
        return current;
    }

    private static ProblemException problem(String code, String what, String mend) {
        return new ProblemException(new Problem(code, what, "", mend + " Nothing has been stored."));
    }

    private static List<Hash> pinned(RecordView view, String role) {
        List<Hash> records = new ArrayList<>();
        for (InputReference input : view.head().inputs()) {
            if (input.role().equals(role) && input instanceof InputReference.OfRecord of) {
                records.add(of.record());
            }
        }
        return records;
    }

    private static void velocitiesOf(RecordView placement, Set<Hash> velocities) {
        for (AboutReference about : placement.head().about()) {
            if (about.role().equals("velocity")) {
                velocities.add(about.record());
            }
        }
    }

    private void calibrationsAt(RecordView scan, Set<Hash> calibrations) throws ProblemException {
        Optional<Instant> start = scan.result()
                .object("start")
                .flatMap(moment -> moment.text("at"))
                .map(Instant::parse);
        if (start.isPresent()) {
            for (String target : TARGETS) {
                calibrations.addAll(CurrentCalibrations.at(archive, start.get(), target, Optional.empty()));
            }
        }
    }

    private void requireOneCompound(Set<Hash> compounds) throws ProblemException {
        if (compounds.size() != 1) {
            throw problem(
                    "property.compounds",
                    compounds.isEmpty()
                            ? "The fits pin no compound."
                            : "The fits are of several compounds: "
                                    + String.join(
                                            ", ",
                                            compounds.stream()
                                                    .map(archive::label)
                                                    .toList())
                                    + ".",
                    compounds.isEmpty()
                            ? "Name the batch in the source run or the placement, then fit anew."
                            : "Select fits of one compound.");
        }
    }
}
