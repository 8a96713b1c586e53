package fringekeep.property.internal;

import fringekeep.archive.record.Hash;
import org.jspecify.annotations.Nullable;

/**
 * One shared parameter moved by an amount, or nothing moved.
 *
 * @param shared which
 * @param by how far (SI)
 */
record Shift(@Nullable Shared shared, double by) {
    /** Everything as recorded. */
    static final Shift NONE = new Shift(null, 0);

    /** How far a parameter is moved. */
    double of(Hash source, String parameter) {
        boolean moved = shared != null
                && shared.source().equals(source)
                && shared.parameter().equals(parameter);
        return moved ? by : 0;
    }

    /** How far all power readings are moved together, in units of their own standard uncertainties. */
    double readings() {
        return shared != null && shared.parameter().equals(Readings.TOGETHER) ? by : 0;
    }
}
