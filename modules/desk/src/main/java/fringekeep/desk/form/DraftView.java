package fringekeep.desk.form;

import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import java.util.Map;
import java.util.Optional;

/** What would be recorded, seen as a record. */
record DraftView(Hash fingerprint, Head head, Map<PartName, JsonObject> parts) implements RecordView {
    /** Copies. */
    DraftView {
        parts = Map.copyOf(parts);
    }

    static DraftView of(NewRecord record, Prepared prepared) {
        return new DraftView(prepared.fingerprint(), prepared.head(), record.parts());
    }

    @Override
    public Optional<JsonObject> part(PartName name) {
        return Optional.ofNullable(parts.get(name));
    }

    @Override
    public boolean withheld(PartName name) {
        return false;
    }

    @Override
    public byte[] payload(String name) throws ProblemException {
        throw new ProblemException(
                new Problem("form.no-payload", "A draft has no file named " + name + ".", "", "Record it first."));
    }
}
