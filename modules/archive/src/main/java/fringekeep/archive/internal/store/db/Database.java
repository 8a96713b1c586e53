package fringekeep.archive.internal.store.db;

import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import org.apache.derby.jdbc.EmbeddedDataSource;

/**
 * One embedded database with default (full) durability. Several readers at a time over a small pool; the one writer holds a
 * connection of its own, see {@link Transactor}.
 *
 * <p>Readers use READ UNCOMMITTED: the tables they read are insert-only and every question carries {@code n <= watermark}, so
 * nothing uncommitted is ever taken, and no reader waits for the writer. What is updated in place is read with READ COMMITTED.
 */
public final class Database implements AutoCloseable {
    static {
        // Read when the engine starts. Without the first, a transaction above 5,000 rows locks whole tables and stops
        // readers.
        System.setProperty("derby.locks.escalationThreshold", "1000000");
        System.setProperty("derby.stream.error.method", DerbyLog.class.getName() + ".writer");
    }

    private static final String CLOSED_DATABASE = "08006";
    private final EmbeddedDataSource source;
    private final Pool uncommitted;
    private final Pool committed;

    private Database(Path folder, boolean create) throws SQLException {
        source = new EmbeddedDataSource();
        source.setDatabaseName(folder.toAbsolutePath().toString());
        if (create) {
            source.setCreateDatabase("create");
            // the engine refuses a program whose locale names no language, and no table may hang on one
            source.setConnectionAttributes("territory=en_US");
        }
        source.getConnection().close();
        source.setCreateDatabase(null);
        source.setConnectionAttributes(null);
        uncommitted = new Pool(() -> connect(Connection.TRANSACTION_READ_UNCOMMITTED));
        committed = new Pool(() -> connect(Connection.TRANSACTION_READ_COMMITTED));
    }

    /** Makes a new database in a folder that must not exist yet. */
    public static Database create(Path folder) throws SQLException {
        return new Database(folder, true);
    }

    /** Starts an existing database, mending what an abrupt end left half done. */
    public static Database open(Path folder) throws SQLException {
        return new Database(folder, false);
    }

    /** A connection outside the pool, without auto-commit; whoever asks closes it. */
    Connection connect(int isolation) throws SQLException {
        Connection connection = source.getConnection();
        connection.setAutoCommit(false);
        connection.setTransactionIsolation(isolation);
        return connection;
    }

    /** Reads insert-only tables without ever waiting for the writer. */
    public <T, E extends Exception> T read(SqlWork<T, E> work) throws E {
        return uncommitted.use(work);
    }

    /** Reads what may be updated, in short statements. */
    public <T, E extends Exception> T readCommitted(SqlWork<T, E> work) throws E {
        return committed.use(work);
    }

    /** How many pooled connections are in use now; 0 when nobody reads. */
    public int inUse() {
        return uncommitted.inUse() + committed.inUse();
    }

    /** Does something, on the writer's way in, while nobody reads; readers wait until it is done. */
    public void alone(Runnable work) {
        uncommitted.shut();
        committed.shut();
        try {
            work.run();
        } finally {
            committed.open();
            uncommitted.open();
        }
    }

    /** The writer's way in; ask once. */
    public Transactor transactor() throws SQLException {
        return new Transactor(connect(Connection.TRANSACTION_READ_COMMITTED));
    }

    /** Closes idle connections and stops this database. */
    @Override
    public void close() {
        uncommitted.close();
        committed.close();
        source.setShutdownDatabase("shutdown");
        try {
            source.getConnection().close();
        } catch (SQLException e) {
            // A successful stop is reported as an exception too.
            if (!CLOSED_DATABASE.equals(e.getSQLState())) {
                throw new StoreFailure("Stopping", e);
            }
        }
    }
}
