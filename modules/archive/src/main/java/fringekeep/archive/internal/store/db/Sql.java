package fringekeep.archive.internal.store.db;

import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Short forms of what every question does: bind, run, map. Values are always bound, never written into the text. */
public final class Sql {
    /** Values in one {@code in (…)}: a fixed number, so that the statement is compiled once. */
    public static final int IN_SIZE = 200;

    /** {@code ?, ?, …} of {@link #IN_SIZE} marks. */
    public static final String MARKS = marks(IN_SIZE);

    private static final int FEW = 8;

    private Sql() {}

    /** Maps a row. */
    @FunctionalInterface
    public interface RowOf<T> {
        /** The value of the row the result set stands on. */
        T map(ResultSet row) throws SQLException;
    }

    /** All rows. */
    public static <T> List<T> list(Connection connection, String text, RowOf<T> mapping, Object... values)
            throws SQLException {
        try (PreparedStatement statement = connection.prepareStatement(text)) {
            bind(statement, values);
            return rows(statement, mapping);
        }
    }

    /** The first row, if any. */
    public static <T> Optional<T> first(Connection connection, String text, RowOf<T> mapping, Object... values)
            throws SQLException {
        try (PreparedStatement statement = connection.prepareStatement(text)) {
            bind(statement, values);
            statement.setMaxRows(1);
            List<T> rows = rows(statement, mapping);
            return rows.isEmpty() ? Optional.empty() : Optional.of(rows.get(0));
        }
    }

    /** Inserts, updates or deletes; answers how many rows. */
    public static int run(Connection connection, String text, Object... values) throws SQLException {
        try (PreparedStatement statement = connection.prepareStatement(text)) {
            bind(statement, values);
            return statement.executeUpdate();
        }
    }

    /**
     * Asks with many keys, {@link #IN_SIZE} at a time; the text holds {@link #MARKS} once, after it the fixed values. The
     * last batch is padded with its first key. One key or few are asked for by themselves: with {@link #IN_SIZE} marks the
     * engine compares every row of a small table with every mark instead of using the index.
     */
    public static <K, T> List<T> in(
            Connection connection, String text, Iterable<K> keys, RowOf<T> mapping, Object... values)
            throws SQLException {
        List<Object> all = new ArrayList<>();
        keys.forEach(all::add);
        List<T> found = new ArrayList<>();
        if (all.isEmpty()) {
            return found;
        }
        int size = all.size() == 1 ? 1 : all.size() <= FEW ? FEW : IN_SIZE;
        String fitting = size == IN_SIZE ? text : text.replace(MARKS, marks(size));
        try (PreparedStatement statement = connection.prepareStatement(fitting)) {
            for (int from = 0; from < all.size(); from += size) {
                for (int i = 0; i < size; i++) {
                    bindOne(statement, i + 1, all.get(from + i < all.size() ? from + i : from));
                }
                for (int i = 0; i < values.length; i++) {
                    bindOne(statement, size + 1 + i, values[i]);
                }
                found.addAll(rows(statement, mapping));
            }
        }
        return found;
    }

    private static String marks(int size) {
        return String.join(",", java.util.Collections.nCopies(size, "?"));
    }

    private static <T> List<T> rows(PreparedStatement statement, RowOf<T> mapping) throws SQLException {
        try (ResultSet result = statement.executeQuery()) {
            List<T> rows = new ArrayList<>();
            while (result.next()) {
                rows.add(mapping.map(result));
            }
            return rows;
        }
    }

    private static void bind(PreparedStatement statement, Object... values) throws SQLException {
        for (int i = 0; i < values.length; i++) {
            bindOne(statement, i + 1, values[i]);
        }
    }

    /** Binds one value: numbers, texts, bytes, truth, time stamps, or a {@link Null} of a type. */
    public static void bindOne(PreparedStatement statement, int position, Object value) throws SQLException {
        if (value instanceof Null nothing) {
            statement.setNull(position, nothing.type());
        } else if (value instanceof byte[] bytes) {
            statement.setBytes(position, bytes);
        } else {
            statement.setObject(position, value);
        }
    }

    /**
     * No value of an SQL type.
     *
     * @param type a constant of {@link java.sql.Types}
     */
    public record Null(int type) {}
}
