package fringekeep.archive.internal.store.db;

import java.sql.SQLException;

/** The database or the disk below it failed where it should not; the transaction was rolled back. */
public final class StoreFailure extends RuntimeException {
    private static final long serialVersionUID = 1L;

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
}
