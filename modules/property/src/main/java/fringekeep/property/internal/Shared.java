package fringekeep.property.internal;

import fringekeep.archive.record.Hash;
import java.util.OptionalDouble;

/**
 * Something many points rest on together.
 *
 * @param source record that states it
 * @param parameter its parameter there
 * @param value its value (SI)
 * @param deviation standard uncertainty (SI); empty where the source states none
 */
record Shared(Hash source, String parameter, double value, OptionalDouble deviation) {
    /** The same parameter of the same record. */
    boolean same(Shared other) {
        return source.equals(other.source) && parameter.equals(other.parameter);
    }

    /** Words for people. */
    String words() {
        return parameter + " of " + source.shortForm();
    }
}
