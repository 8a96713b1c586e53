package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.db.Transactor;
import fringekeep.archive.internal.store.files.Durable;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/**
 * Takes purged bytes out of the database's files. A deleted row's bytes stay in free pages and in the engine's log until
 * something else is written there; so the tables are written anew while nobody reads, and the log is carried on in a new file
 * until the old ones are let go. A copy of the database that was kept when its tables were last brought forward goes too.
 */
final class FreedPages {
    /** The engine begins a new log file after 1 MiB; so much is written and rolled back. */
    private static final int FILLERS = 40;

    private static final int FILLER_BYTES = 60_000;
    private final Store store;

    FreedPages(Store store) {
        this.store = store;
    }

    /** Notes in the purge's own transaction which tables it took something from. */
    static void note(Connection c, Collection<String> tables) throws SQLException {
        for (String table : tables) {
            Sql.run(c, "delete from freed where name = ?", table);
            Sql.run(c, "insert into freed (name) values (?)", table);
        }
    }

    /** Cleans what is noted; without a note it does nothing. */
    void clean() {
        store.<Boolean, RuntimeException>onWriter(transactor -> {
            List<String> tables = transactor.<List<String>, RuntimeException>inTransaction(
                    c -> Sql.list(c, "select name from freed order by name", row -> row.getString(1)));
            if (!tables.isEmpty()) {
                store.database().alone(() -> tables.forEach(table -> writeAnew(transactor, table)));
                endLog(transactor);
                removeFormer();
                transactor.<Integer, RuntimeException>inTransaction(c -> Sql.run(c, "delete from freed"));
            }
            return true;
        });
    }

    private static void writeAnew(Transactor transactor, String table) {
        transactor.<Boolean, RuntimeException>inTransaction(c -> {
            boolean there = exists(c, table);
            if (there) {
                Sql.run(c, "call syscs_util.syscs_compress_table(current schema, ?, 1)", table);
            }
            return there;
        });
    }

    private static boolean exists(Connection c, String table) throws SQLException {
        return Sql.first(c, "select tablename from sys.systables where tablename = ?", row -> row.getString(1), table)
                .isPresent();
    }

    /** Fills the engine's log file, so that a new one begins, and lets the old ones go. */
    private static void endLog(Transactor transactor) {
        transactor.<Integer, RuntimeException>inTransaction(c -> {
            if (exists(c, "FILLER")) {
                Sql.run(c, "drop table filler");
            }
            return Sql.run(c, "create table filler (id int, bytes blob(64k))");
        });
        transactor.<Boolean, RuntimeException>inTransaction(c -> {
            for (int i = 0; i < FILLERS; i++) {
                Sql.run(c, "insert into filler (id, bytes) values (?, ?)", i, new byte[FILLER_BYTES]);
            }
            return true;
        });
        transactor.<Integer, RuntimeException>inTransaction(c -> Sql.run(c, "drop table filler"));
        transactor.<Integer, RuntimeException>inTransaction(
                c -> Sql.run(c, "call syscs_util.syscs_checkpoint_database()"));
    }

    private void removeFormer() {
        Path former = store.folder().formerDatabase();
        if (!Files.exists(former)) {
            return;
        }
        try (Stream<Path> files = Files.walk(former)) {
            for (Path file : files.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(file);
            }
            Durable.forceFolder(store.folder().aside());
        } catch (IOException e) {
            throw new StoreFailure("Removing " + former + "; it is tried again at the next opening", e);
        }
    }
}
