package fringekeep.audit;

import fringekeep.archive.Archive;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.Regathering;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Role;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The rule of kinds that announce none: each input is replaced by what stands for it, one that fell away is left out. */
enum PlainRegathering implements Regathering {
    /** The one rule. */
    INSTANCE;

    @Override
    public KindName kind() {
        throw new UnsupportedOperationException("the plain rule serves every kind that has none of its own");
    }

    @Override
    public Optional<NewRecord> regather(Archive archive, Hash record, StandIn standIn, List<Prepared> prepared)
            throws ProblemException {
        RecordView view = archive.record(record).orElseThrow();
        RecordKind kind = archive.kinds().get(view.head().kind()).orElse(null);
        if (kind == null) {
            return Optional.empty();
        }
        List<InputReference> inputs = new ArrayList<>();
        for (InputReference input : view.head().inputs()) {
            replaced(input, standIn).ifPresent(inputs::add);
        }
        for (Role role : kind.inputRoles()) {
            long left = inputs.stream()
                    .filter(input -> input.role().equals(role.name()))
                    .count();
            if (left < role.least()) {
                return Optional.empty();
            }
        }
        Map<PartName, JsonObject> parts = new EnumMap<>(PartName.class);
        for (PartName name : List.of(PartName.CONTENT, PartName.CHOICES)) {
            view.part(name).ifPresent(value -> parts.put(name, value));
        }
        List<NewPayload> payloads = List.of();
        Optional<After> after = view.head().after();
        return Optional.of(new NewRecord(
                view.head().kind(),
                inputs,
                view.head().about(),
                parts,
                payloads,
                Optional.of(record),
                after,
                Optional.empty()));
    }

    private static Optional<InputReference> replaced(InputReference input, StandIn standIn) {
        if (input instanceof InputReference.OfRecord of) {
            return standIn.of(of.record()).map(now -> new InputReference.OfRecord(of.role(), now, of.channel()));
        }
        return Optional.of(input);
    }
}
