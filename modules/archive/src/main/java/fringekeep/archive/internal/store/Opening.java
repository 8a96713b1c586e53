package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives.Founding;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Person;
import fringekeep.archive.internal.store.db.Database;
import fringekeep.archive.internal.store.db.Migration;
import fringekeep.archive.internal.store.db.Migrations;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.db.Transactor;
import fringekeep.archive.internal.store.files.ArchiveFolder;
import fringekeep.archive.internal.store.files.Durable;
import fringekeep.archive.internal.store.files.FolderLock;
import fringekeep.archive.internal.store.files.FolderPlace;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.ArchiveId;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.SQLException;
import java.time.Instant;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** Founding and opening: place, lock, database, tables, first entry. */
final class Opening {
    private static final System.Logger LOG = System.getLogger(Opening.class.getName());
    private final ArchiveFolder folder;
    private final Kinds kinds;
    private final Circumstances circumstances;
    private final List<Migration> migrations;

    Opening(Path folder, Kinds kinds, Circumstances circumstances) {
        this(folder, kinds, circumstances, Migration.all());
    }

    /** With other steps of tables, as a later program would have; for tests. */
    Opening(Path folder, Kinds kinds, Circumstances circumstances, List<Migration> migrations) {
        this.folder = new ArchiveFolder(folder);
        this.kinds = kinds;
        this.circumstances = circumstances;
        this.migrations = migrations;
    }

    /** Founds an archive in a folder that is empty or does not exist. */
    Archive found(Founding founding) throws ProblemException {
        ArchiveId id =
                new ArchiveId(HexFormat.of().formatHex(circumstances.random().get()));
        Act.Naming naming = Naming.examined(founding.title(), founding.dayBoundary(), founding.zone());
        Optional<Act.Continues> continues =
                founding.continues().map(before -> new Act.Continues(before.archive(), before.n(), before.sha256()));
        Act.Founded act = new Act.Founded(naming, founding.invented(), continues);
        return create(
                (connection, progress) -> {
                    progress.append(connection, act);
                    for (Person person : founding.persons()) {
                        Persons.save(connection, Persons.examined(person));
                    }
                    return progress;
                },
                id,
                act);
    }

    /** Makes the folder with whatever entries the filling writes, the first of them {@code founded}. */
    DerbyArchive create(Change<Progress, ProblemException> filling, ArchiveId id, Act.Founded founded)
            throws ProblemException {
        try {
            requireSafePlace();
            requireEmpty();
            Durable.makeFolders(folder.root());
            FolderLock lock = FolderLock.take(folder.lock(), Instant.now());
            return started(lock, true, (transactor, database) -> {
                Progress progress = new Progress(id, founded.naming(), founded.invented(), circumstances.clock());
                return transactor.<State, ProblemException>inTransaction(connection -> {
                    filling.make(connection, progress);
                    progress.saveTallies(connection);
                    return progress.state();
                });
            });
        } catch (IOException e) {
            throw unwritable(e);
        }
    }

    /** Opens what was founded. */
    DerbyArchive open() throws ProblemException {
        try {
            requireSafePlace();
            requireWhole();
            FolderLock lock = FolderLock.take(folder.lock(), Instant.now());
            return started(
                    lock,
                    false,
                    (transactor, database) -> transactor.<State, ProblemException>inTransaction(State::load));
        } catch (IOException e) {
            throw unwritable(e);
        }
    }

    /** Gets the state on the writer's connection. */
    @FunctionalInterface
    private interface Start {
        State state(Transactor transactor, Database database) throws ProblemException;
    }

    private DerbyArchive started(FolderLock lock, boolean create, Start start) throws IOException, ProblemException {
        Database database = null;
        Writer writer = null;
        boolean done = false;
        try {
            database = database(create);
            Transactor transactor = database.transactor();
            writer = new Writer(transactor);
            Database opened = database;
            State state = writer.<State, ProblemException>run(own -> {
                new Migrations(migrations).apply(own, Instant.now(), folder.formerDatabase());
                return start.state(own, opened);
            });
            Hint.write(folder, state);
            for (Path part : List.of(folder.raw(), folder.payloads(), folder.aside())) {
                Durable.makeFolders(part);
            }
            Store store = new Store(folder, lock, database, writer, state, circumstances);
            DerbyArchive archive = new DerbyArchive(store, kinds);
            done = true;
            return archive;
        } catch (SQLException e) {
            throw new StoreFailure("Opening " + folder.root(), e);
        } finally {
            if (!done) {
                abandon(lock, database, writer);
            }
        }
    }

    /** Closes what was opened; a damaged database may refuse even that, and the lock is let go all the same. */
    private static void abandon(FolderLock lock, @Nullable Database database, @Nullable Writer writer)
            throws IOException {
        try {
            if (writer != null) {
                writer.close();
            }
            if (database != null) {
                database.close();
            }
        } catch (StoreFailure e) {
            LOG.log(System.Logger.Level.WARNING, "closing a database that could not be opened failed", e);
        } finally {
            lock.close();
        }
    }

    private Database database(boolean create) throws ProblemException {
        try {
            return create ? Database.create(folder.database()) : Database.open(folder.database());
        } catch (SQLException e) {
            throw new ProblemException(DatabaseProblems.starting(e, folder));
        }
    }

    private void requireSafePlace() throws IOException, ProblemException {
        Optional<Problem> wrong = FolderPlace.examine(folder.root());
        if (wrong.isPresent()) {
            throw new ProblemException(wrong.get());
        }
    }

    private void requireEmpty() throws IOException, ProblemException {
        if (!Files.exists(folder.root())) {
            return;
        }
        if (!Files.isDirectory(folder.root())) {
            throw problem("archive.not-a-folder", "There is a file, not a folder.", "Name a new folder.");
        }
        try (Stream<Path> entries = Files.list(folder.root())) {
            if (entries.findAny().isPresent()) {
                throw problem(
                        "archive.folder-not-empty",
                        "The folder is not empty.",
                        Files.exists(folder.hint())
                                ? "There is an archive in it already: open that, or name a new folder."
                                : "Name a new or empty folder.");
            }
        }
    }

    private void requireWhole() throws IOException, ProblemException {
        if (!Files.isDirectory(folder.root())) {
            throw problem(
                    "archive.no-folder", "There is no such folder.", "Check the path, or found an archive there.");
        }
        Hint.require(folder);
        if (!Files.isDirectory(folder.database())) {
            boolean was = Files.exists(folder.hint()) || Files.exists(folder.raw());
            throw problem(
                    was ? "archive.no-database" : "archive.not-an-archive",
                    was ? "The archive's database folder \"db\" is missing." : "The folder holds no archive.",
                    was
                            ? "Put it back, or restore the archive from a plain copy."
                            : "Check the path, or found an archive there.");
        }
        if (!Files.isWritable(folder.root())) {
            throw problem("archive.read-only", "The folder cannot be written.", "Change its permissions.");
        }
    }

    private ProblemException problem(String code, String what, String mend) {
        return new ProblemException(new Problem(code, what, folder.root().toString(), mend + " Nothing was changed."));
    }

    private ProblemException unwritable(IOException e) {
        return problem(
                "archive.unreadable",
                "The folder cannot be read or written: " + e + ".",
                "Check the disk and the permissions.");
    }
}
