package fringekeep.archive.kind;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.record.PartName;
import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;

/** Values of the parts of a record that is about to be recorded or is examined. */
public record Parts(Map<PartName, JsonObject> values) {
    /** Copies. */
    public Parts {
        Map<PartName, JsonObject> copy = new EnumMap<>(PartName.class);
        copy.putAll(values);
        values = Collections.unmodifiableMap(copy);
    }

    /** Value of a part. */
    public Optional<JsonObject> get(PartName name) {
        return Optional.ofNullable(values.get(name));
    }
}
