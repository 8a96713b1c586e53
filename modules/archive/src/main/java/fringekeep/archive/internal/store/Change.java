package fringekeep.archive.internal.store;

import java.sql.Connection;
import java.sql.SQLException;

/**
 * A change within one transaction.
 *
 * @param <T> what it answers
 * @param <E> what else it may throw; the transaction is rolled back then
 */
@FunctionalInterface
interface Change<T, E extends Exception> {
    T make(Connection connection, Progress progress) throws SQLException, E;
}
