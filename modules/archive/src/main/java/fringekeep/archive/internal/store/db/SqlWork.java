package fringekeep.archive.internal.store.db;

import java.sql.Connection;
import java.sql.SQLException;

/**
 * Work on a connection, which it must not keep.
 *
 * @param <T> what it answers
 * @param <E> what else it may throw
 */
@FunctionalInterface
public interface SqlWork<T, E extends Exception> {
    /** Does it. */
    T run(Connection connection) throws SQLException, E;
}
