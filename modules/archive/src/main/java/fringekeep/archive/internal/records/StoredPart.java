package fringekeep.archive.internal.records;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.Salt;
import java.util.Optional;

/**
 * A part as stored.
 *
 * @param name which part
 * @param salt present exactly for salted parts
 * @param value what it holds
 */
public record StoredPart(PartName name, Optional<Salt> salt, JsonObject value) {
    /** Refuses a salt where none belongs and the lack of one. */
    public StoredPart {
        if (name.salted() != salt.isPresent()) {
            throw new IllegalArgumentException(
                    "part " + name.text() + (name.salted() ? " needs a" : " has no") + " salt");
        }
    }
}
