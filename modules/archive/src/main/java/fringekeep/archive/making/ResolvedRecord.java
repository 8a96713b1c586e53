package fringekeep.archive.making;

import fringekeep.archive.internal.records.PartCodec;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PayloadReference;
import fringekeep.archive.record.RecordSource;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;

/** A record over its source; parts are read when asked for and kept, missing ones are asked for again. */
final class ResolvedRecord implements RecordView {
    private final Hash fingerprint;
    private final Head head;
    private final Optional<RecordKind> kind;
    private final RecordSource source;
    private final Map<PartName, JsonObject> parts = new ConcurrentHashMap<>();

    ResolvedRecord(Hash fingerprint, Head head, Optional<RecordKind> kind, RecordSource source) {
        this.fingerprint = fingerprint;
        this.head = head;
        this.kind = kind;
        this.source = source;
    }

    @Override
    public Hash fingerprint() {
        return fingerprint;
    }

    @Override
    public Head head() {
        return head;
    }

    @Override
    public Optional<JsonObject> part(PartName name) {
        JsonObject known = parts.get(name);
        if (known != null) {
            return Optional.of(known);
        }
        Optional<JsonObject> read = hash(name).flatMap(source::part).map(bytes -> lifted(name, value(name, bytes)));
        read.ifPresent(value -> parts.put(name, value));
        return read;
    }

    private Optional<Hash> hash(PartName name) {
        return Optional.ofNullable((name.salted() ? head.sealed() : head.parts()).get(name.text()));
    }

    private JsonObject value(PartName name, byte[] bytes) {
        try {
            return PartCodec.read(bytes).value();
        } catch (ProblemException e) {
            throw new IllegalStateException("part " + name.text() + " of " + fingerprint + " is broken", e);
        }
    }

    private JsonObject lifted(PartName name, JsonObject stored) {
        JsonObject value = stored;
        int present = kind.map(RecordKind::schema).orElse(head.schema());
        for (int number = head.schema(); number < present; number++) {
            value = kind.orElseThrow().lift(name, number, value);
        }
        return value;
    }

    @Override
    public boolean withheld(PartName name) {
        return hash(name).isPresent() && part(name).isEmpty();
    }

    @Override
    public byte[] payload(String name) throws ProblemException {
        for (PayloadReference payload : head.payloads()) {
            if (payload.name().equals(name)) {
                return source.payload(payload.sha256())
                        .orElseThrow(() -> problem("record.payload-missing", name, "is not at hand"));
            }
        }
        throw problem("record.payload-unknown", name, "is not one of the record's");
    }

    private ProblemException problem(String code, String name, String what) {
        return new ProblemException(new Problem(
                code,
                "The payload \"" + name + "\" " + what + ".",
                head.kind() + " " + fingerprint.shortForm(),
                "Fetch it from a copy that has it."));
    }
}
