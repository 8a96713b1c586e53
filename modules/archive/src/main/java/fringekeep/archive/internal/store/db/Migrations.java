package fringekeep.archive.internal.store.db;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.sql.Timestamp;
import java.time.Instant;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/** Brings the tables to the state this program knows: forward only, each step one transaction with its checksum. */
public final class Migrations {
    private final List<Migration> steps;

    /** These steps, numbered 1, 2, 3 … */
    public Migrations(List<Migration> steps) {
        for (int i = 0; i < steps.size(); i++) {
            if (steps.get(i).number() != i + 1) {
                throw new IllegalArgumentException("migration " + steps.get(i).number() + " at place " + (i + 1));
            }
        }
        this.steps = List.copyOf(steps);
    }

    /**
     * Applies what is missing.
     *
     * @param now for the time applied
     * @param backup where the database is copied before an existing one is changed
     * @throws ProblemException if a newer program has been here, or a step was changed after it was applied
     */
    public void apply(Transactor transactor, Instant now, Path backup) throws ProblemException {
        SortedMap<Integer, Hash> applied =
                transactor.<SortedMap<Integer, Hash>, ProblemException>inTransaction(Migrations::applied);
        refuseForeign(applied);
        if (!applied.isEmpty() && applied.size() < steps.size()) {
            transactor.<Integer, ProblemException>inTransaction(connection -> backUp(connection, backup));
        }
        for (Migration step : steps.subList(applied.size(), steps.size())) {
            transactor.<Integer, ProblemException>inTransaction(connection -> step(connection, step, now));
        }
    }

    private static SortedMap<Integer, Hash> applied(Connection connection) throws SQLException {
        SortedMap<Integer, Hash> applied = new TreeMap<>();
        try (ResultSet tables = connection.getMetaData().getTables(null, null, "MIGRATION", null)) {
            if (!tables.next()) {
                return applied;
            }
        }
        Sql.list(
                connection,
                "select number, sha from migration order by number",
                row -> applied.put(row.getInt(1), Hash.fromBytes(row.getBytes(2))));
        return applied;
    }

    private void refuseForeign(SortedMap<Integer, Hash> applied) throws ProblemException {
        if (applied.size() > steps.size()) {
            throw new ProblemException(new Problem(
                    "archive.newer-tables",
                    "The archive's tables are at step " + applied.size() + "; this program knows " + steps.size() + ".",
                    "db",
                    "Use the newer program that opened it last, or restore a plain copy with this one."
                            + " Nothing was changed."));
        }
        for (Migration step : steps.subList(0, applied.size())) {
            if (!step.checksum().equals(applied.get(step.number()))) {
                throw new ProblemException(new Problem(
                        "archive.foreign-tables",
                        "Step " + step.number() + " of the archive's tables was not made by this line of programs.",
                        "db",
                        "Use the program that made the archive, or restore a plain copy with this one."
                                + " Nothing was changed."));
            }
        }
    }

    private static int backUp(Connection connection, Path backup) throws SQLException {
        return Sql.run(connection, "call syscs_util.syscs_backup_database(?)", backup.toString());
    }

    private static int step(Connection connection, Migration step, Instant now) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            for (String text : step.statements()) {
                statement.executeUpdate(text);
            }
        }
        return Sql.run(
                connection,
                "insert into migration (number, sha, applied) values (?, ?, ?)",
                step.number(),
                step.checksum().bytes(),
                Timestamp.from(now));
    }
}
