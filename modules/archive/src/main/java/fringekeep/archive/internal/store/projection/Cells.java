package fringekeep.archive.internal.store.projection;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.listing.Column;
import fringekeep.archive.record.Hash;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import java.util.Optional;

/** Values of a row as the database holds them. Instants are texts of fixed width in UTC: they sort, and no zone bends them. */
final class Cells {
    private static final int LONGEST_TEXT = 200;
    private static final DateTimeFormatter INSTANT =
            DateTimeFormatter.ofPattern("uuuu-MM-dd'T'HH:mm:ss.SSSSSSSSS", Locale.ROOT);

    private Cells() {}

    static String type(Column.Sort sort) {
        return switch (sort) {
            case TEXT -> "varchar(200)";
            case REAL -> "double";
            case INTEGER -> "bigint";
            case INSTANT -> "char(29)";
            case FLAG -> "boolean";
            case HASH -> "char(32) for bit data";
        };
    }

    static Sql.Null nothing(Column.Sort sort) {
        return new Sql.Null(
                switch (sort) {
                    case TEXT -> Types.VARCHAR;
                    case REAL -> Types.DOUBLE;
                    case INTEGER -> Types.BIGINT;
                    case INSTANT -> Types.CHAR;
                    case FLAG -> Types.BOOLEAN;
                    case HASH -> Types.BINARY;
                });
    }

    /**
     * A value on its way into the database or a comparison.
     *
     * @throws IllegalArgumentException if it is of another class than the column's
     */
    static Object stored(Column column, Object value) {
        try {
            return switch (column.sort()) {
                case TEXT -> cut((String) value);
                case REAL -> ((Number) value).doubleValue() + 0.0; // -0 becomes 0, as in the database
                case INTEGER -> ((Number) value).longValue();
                case INSTANT -> INSTANT.format(((Instant) value).atOffset(ZoneOffset.UTC));
                case FLAG -> (Boolean) value;
                case HASH -> ((Hash) value).bytes();
            };
        } catch (ClassCastException e) {
            throw new IllegalArgumentException(
                    "column " + column.name() + " holds " + column.sort() + ", not " + value, e);
        }
    }

    /** Whether a value is one the database holds; a number that is not finite counts as absent. */
    static boolean holdable(Object value) {
        return !(value instanceof Double number) || Double.isFinite(number);
    }

    /** The value that reading gives back after storing. */
    static Object kept(Column column, Object value) {
        return switch (column.sort()) {
            case TEXT, REAL, INTEGER -> stored(column, value);
            case INSTANT, FLAG, HASH -> value;
        };
    }

    static Optional<Object> read(ResultSet row, int position, Column column) throws SQLException {
        Object value =
                switch (column.sort()) {
                    case TEXT -> row.getString(position);
                    case REAL -> row.getDouble(position);
                    case INTEGER -> row.getLong(position);
                    case INSTANT -> instant(row.getString(position));
                    case FLAG -> row.getBoolean(position);
                    case HASH -> hash(row.getBytes(position));
                };
        return row.wasNull() ? Optional.empty() : Optional.ofNullable(value);
    }

    private static @org.jspecify.annotations.Nullable Instant instant(@org.jspecify.annotations.Nullable String text) {
        return text == null ? null : LocalDateTime.parse(text, INSTANT).toInstant(ZoneOffset.UTC);
    }

    private static @org.jspecify.annotations.Nullable Hash hash(byte @org.jspecify.annotations.Nullable [] bytes) {
        return bytes == null ? null : Hash.fromBytes(bytes);
    }

    private static String cut(String text) {
        if (text.length() <= LONGEST_TEXT) {
            return text;
        }
        boolean splits = Character.isHighSurrogate(text.charAt(LONGEST_TEXT - 1));
        return text.substring(0, splits ? LONGEST_TEXT - 1 : LONGEST_TEXT);
    }
}
