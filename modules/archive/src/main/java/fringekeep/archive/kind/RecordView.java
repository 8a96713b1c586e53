package fringekeep.archive.kind;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import java.util.Optional;

/** A record as it can be read: its head, those parts that are at hand, its payloads. */
public interface RecordView {
    /** SHA-256 of the head. */
    Hash fingerprint();

    /** The head. */
    Head head();

    /** Value of a part, lifted to the kind's present schema; empty when the record has none or it is withheld. */
    Optional<JsonObject> part(PartName name);

    /** Whether the head names the part but its bytes are not at hand. */
    boolean withheld(PartName name);

    /**
     * Bytes of a payload by name.
     *
     * @throws ProblemException if the record names none so, or its bytes are missing
     */
    byte[] payload(String name) throws ProblemException;

    /** Value of part {@code content}, or the empty object. */
    default JsonObject content() {
        return part(PartName.CONTENT).orElse(JsonObject.EMPTY);
    }

    /** Value of part {@code choices}, or the empty object. */
    default JsonObject choices() {
        return part(PartName.CHOICES).orElse(JsonObject.EMPTY);
    }

    /** Value of part {@code result}, or the empty object. */
    default JsonObject result() {
        return part(PartName.RESULT).orElse(JsonObject.EMPTY);
    }
}
