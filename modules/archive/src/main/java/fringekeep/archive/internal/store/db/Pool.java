package fringekeep.archive.internal.store.db;

import java.sql.Connection;
import java.sql.SQLException;
import java.util.concurrent.ConcurrentLinkedDeque;
import java.util.concurrent.Semaphore;

/** A few connections that are lent for one piece of work each. Lending inside lending is an error: it could wait for itself. */
final class Pool implements AutoCloseable {
    private static final int SIZE = 8;
    private final Opening opening;
    private final Semaphore permits = new Semaphore(SIZE, true);
    private final ConcurrentLinkedDeque<Connection> idle = new ConcurrentLinkedDeque<>();
    private final ThreadLocal<Boolean> lent = ThreadLocal.withInitial(() -> false);

    /** Opens a connection. */
    @FunctionalInterface
    interface Opening {
        Connection open() throws SQLException;
    }

    Pool(Opening opening) {
        this.opening = opening;
    }

    <T, E extends Exception> T use(SqlWork<T, E> work) throws E {
        if (lent.get()) {
            throw new IllegalStateException("a connection is already lent to this thread");
        }
        permits.acquireUninterruptibly();
        lent.set(true);
        try {
            return lend(work);
        } finally {
            lent.set(false);
            permits.release();
        }
    }

    private <T, E extends Exception> T lend(SqlWork<T, E> work) throws E {
        Connection connection = null;
        boolean sound = false;
        try {
            connection = take();
            T answer = work.run(connection);
            connection.commit();
            sound = true;
            return answer;
        } catch (SQLException e) {
            throw new StoreFailure("Reading", e);
        } finally {
            giveBack(connection, sound);
        }
    }

    private Connection take() throws SQLException {
        Connection connection = idle.pollFirst();
        return connection == null ? opening.open() : connection;
    }

    private void giveBack(@org.jspecify.annotations.Nullable Connection connection, boolean sound) {
        if (connection == null) {
            return;
        }
        if (sound || Transactor.rolledBack(connection)) {
            idle.addFirst(connection);
        }
    }

    /** Keeps everybody out until {@link #open}; returns when nobody is in. */
    void shut() {
        permits.acquireUninterruptibly(SIZE);
    }

    /** Lets readers in again. */
    void open() {
        permits.release(SIZE);
    }

    int inUse() {
        return SIZE - permits.availablePermits();
    }

    @Override
    public void close() {
        permits.acquireUninterruptibly(SIZE);
        try {
            for (Connection connection = idle.pollFirst(); connection != null; connection = idle.pollFirst()) {
                connection.close();
            }
        } catch (SQLException e) {
            throw new StoreFailure("Closing a reader's connection", e);
        } finally {
            permits.release(SIZE);
        }
    }
}
