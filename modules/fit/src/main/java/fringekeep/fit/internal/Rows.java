package fringekeep.fit.internal;

import fringekeep.archive.listing.Row;
import fringekeep.archive.record.Hash;
import java.time.Instant;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.TreeMap;

/** Builds one row of a projection; what is absent is left out. */
public final class Rows {
    private static final int LONGEST = 200;

    private final TreeMap<String, Object> values = new TreeMap<>();

    /** A text, cut to what a column holds. */
    public Rows text(String column, String value) {
        int end = Math.min(value.length(), LONGEST);
        boolean halved = end < value.length() && Character.isHighSurrogate(value.charAt(end - 1));
        values.put(column, value.substring(0, halved ? end - 1 : end));
        return this;
    }

    /** A text if there is one. */
    public Rows text(String column, Optional<String> value) {
        return value.isPresent() ? text(column, value.get()) : this;
    }

    /** A number if it is one. */
    public Rows real(String column, double value) {
        if (Double.isFinite(value)) {
            values.put(column, value);
        }
        return this;
    }

    /** A number if there is one. */
    public Rows real(String column, OptionalDouble value) {
        return value.isPresent() ? real(column, value.getAsDouble()) : this;
    }

    /** An integer. */
    public Rows integer(String column, long value) {
        values.put(column, value);
        return this;
    }

    /** An integer if there is one. */
    public Rows integer(String column, OptionalLong value) {
        return value.isPresent() ? integer(column, value.getAsLong()) : this;
    }

    /** An instant if there is one. */
    public Rows instant(String column, Optional<Instant> value) {
        value.ifPresent(instant -> values.put(column, instant));
        return this;
    }

    /** A hash if there is one. */
    public Rows hash(String column, Optional<Hash> value) {
        value.ifPresent(hash -> values.put(column, hash));
        return this;
    }

    /** The row. */
    public Row row() {
        return new Row(values);
    }
}
