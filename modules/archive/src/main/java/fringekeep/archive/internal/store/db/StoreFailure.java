package fringekeep.archive.internal.store.db;

import java.sql.SQLException;
import java.util.List;

/** The database or the disk below it failed where it should not; the transaction was rolled back. */
public final class StoreFailure extends RuntimeException {
    private static final long serialVersionUID = 1L;

    /** No such table, no such index, no such container, no such index named in a question. */
    private static final List<String> GONE = List.of("42X05", "42X65", "42Y46", "XSAI2");

    /** A failure of the database, with its SQLState. */
    public StoreFailure(String doing, SQLException cause) {
        super(doing + " failed in the database (SQLState " + cause.getSQLState() + "): " + cause.getMessage(), cause);
    }

    /** A failure of the disk or of what was stored. */
    public StoreFailure(String what, Throwable cause) {
        super(what, cause);
    }

    /** Something stored is not what was stored. */
    public StoreFailure(String what) {
        super(what);
    }

    /** Whether a table or index that was asked is not there: between two questions it was put in another's place. */
    public boolean tableGone() {
        return getCause() instanceof SQLException cause && GONE.contains(String.valueOf(cause.getSQLState()));
    }
}
