package fringekeep.property.ui;

import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import java.util.Optional;

/** A record that was computed and prepared and is not recorded, seen as if it were. */
record ComputedView(Prepared prepared, NewRecord computed) implements RecordView {
    @Override
    public Hash fingerprint() {
        return prepared.fingerprint();
    }

    @Override
    public Head head() {
        return prepared.head();
    }

    @Override
    public Optional<JsonObject> part(PartName name) {
        return Optional.ofNullable(computed.parts().get(name));
    }

    @Override
    public boolean withheld(PartName name) {
        return false;
    }

    @Override
    public byte[] payload(String name) throws ProblemException {
        return computed.payloads().stream()
                .filter(payload -> payload.name().equals(name))
                .map(NewPayload::bytes)
                .findFirst()
                .orElseThrow(() -> new ProblemException(new Problem(
                        "property.no-payload", "There is no file \"" + name + "\".", "", "Compute again.")));
    }
}
