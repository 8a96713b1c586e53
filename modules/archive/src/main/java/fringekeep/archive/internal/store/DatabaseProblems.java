package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.files.ArchiveFolder;
import fringekeep.archive.problem.Problem;
import java.sql.SQLException;

/** Failures of starting the database, in words. Told apart by SQLState, never by message. */
final class DatabaseProblems {
    private static final String BOOTED_ELSEWHERE = "XSDB6";
    private static final String NEWER_ENGINE = "XSLAN";

    private DatabaseProblems() {}

    static Problem starting(SQLException failure, ArchiveFolder folder) {
        String where = folder.database().toString();
        if (has(failure, BOOTED_ELSEWHERE)) {
            return new Problem(
                    "archive.in-use",
                    "Another program has the archive's database open.",
                    where,
                    "Close the archive there. Nothing was changed.");
        }
        if (has(failure, NEWER_ENGINE)) {
            return new Problem(
                    "archive.newer-database",
                    "The archive's database was written by a newer database engine.",
                    where,
                    "Use the newer program, or restore a plain copy with this one. Nothing was changed.");
        }
        return new Problem(
                "archive.database-damaged",
                "The archive's database does not start (" + states(failure) + "): " + failure.getMessage(),
                where,
                "Set the folder aside untouched and restore the archive from its plain copy; raw files can be copied"
                        + " from the damaged one.");
    }

    private static boolean has(SQLException failure, String state) {
        for (Throwable cause = failure; cause != null; cause = cause.getCause()) {
            if (cause instanceof SQLException one && state.equals(one.getSQLState())) {
                return true;
            }
        }
        return false;
    }

    private static String states(SQLException failure) {
        StringBuilder states = new StringBuilder();
        for (Throwable cause = failure; cause != null; cause = cause.getCause()) {
            if (cause instanceof SQLException one) {
                states.append(states.isEmpty() ? "" : ", ").append(one.getSQLState());
            }
        }
        return states.toString();
    }
}
