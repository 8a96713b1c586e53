package fringekeep.archive.internal.store.db;

import java.sql.Connection;
import java.sql.SQLException;

/** The one way to change the database: commit on return, roll back on anything thrown. For one thread; never nested. */
public final class Transactor implements AutoCloseable {
    private static final System.Logger LOG = System.getLogger(Transactor.class.getName());
    private final Connection connection;
    private boolean busy;

    Transactor(Connection connection) {
        this.connection = connection;
    }

    /** Does the work as one transaction. */
    public <T, E extends Exception> T inTransaction(SqlWork<T, E> work) throws E {
        if (busy) {
            throw new IllegalStateException("a transaction inside a transaction");
        }
        busy = true;
        boolean committed = false;
        try {
            T answer = work.run(connection);
            connection.commit();
            committed = true;
            return answer;
        } catch (SQLException e) {
            throw new StoreFailure("Writing", e);
        } finally {
            busy = false;
            if (!committed) {
                rolledBack(connection);
            }
        }
    }

    /** Rolls back; false if even that failed, so that the connection must not be used again. */
    static boolean rolledBack(Connection connection) {
        try {
            connection.rollback();
            return true;
        } catch (SQLException e) {
            LOG.log(System.Logger.Level.WARNING, "rolling back failed", e);
            return false;
        }
    }

    /** Closes the connection; the database refuses if work is open. */
    @Override
    public void close() {
        try {
            connection.close();
        } catch (SQLException e) {
            throw new StoreFailure("Closing the writer's connection", e);
        }
    }
}
