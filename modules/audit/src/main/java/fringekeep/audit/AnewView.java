package fringekeep.audit;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import java.util.Optional;

/**
 * A record seen with the result and the payloads that came out anew; all else is as recorded.
 *
 * @param recorded the record
 * @param outcome what came out; empty where the computation now refuses: then there is no result
 */
record AnewView(RecordView recorded, Optional<Outcome.Computed> outcome) implements RecordView {
    @Override
    public Hash fingerprint() {
        return recorded.fingerprint();
    }

    @Override
    public Head head() {
        return recorded.head();
    }

    @Override
    public Optional<JsonObject> part(PartName name) {
        return name == PartName.RESULT ? outcome.map(Outcome.Computed::result) : recorded.part(name);
    }

    @Override
    public boolean withheld(PartName name) {
        return name != PartName.RESULT && recorded.withheld(name);
    }

    @Override
    public byte[] payload(String name) throws ProblemException {
        return outcome.stream()
                .flatMap(computed -> computed.payloads().stream())
                .filter(payload -> payload.name().equals(name))
                .findFirst()
                .map(NewPayload::bytes)
                .orElseThrow(() -> new ProblemException(new Problem(
                        "audit.payload-unknown",
                        "Recomputing gave no payload \"" + name + "\".",
                        head().kind() + " " + fingerprint().shortForm(),
                        "Recompute the record by itself to see why.")));
    }
}
