package fringekeep.archive.internal.store;

import fringekeep.archive.Circumstances;
import fringekeep.archive.internal.store.db.Database;
import fringekeep.archive.internal.store.db.SqlWork;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.internal.store.files.ArchiveFolder;
import fringekeep.archive.internal.store.files.FolderLock;
import fringekeep.archive.internal.store.files.HashedFiles;
import java.io.IOException;
import java.util.List;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.function.LongConsumer;

/** An open archive's database, files, writer and committed state. Thread-safe. */
final class Store implements AutoCloseable {
    private static final System.Logger LOG = System.getLogger(Store.class.getName());
    private final ArchiveFolder folder;
    private final FolderLock lock;
    private final Database database;
    private final Circumstances circumstances;
    private final HashedFiles raw;
    private final HashedFiles payloads;
    private final Writer writer;
    private final List<LongConsumer> listeners = new CopyOnWriteArrayList<>();
    private volatile State state;

    Store(
            ArchiveFolder folder,
            FolderLock lock,
            Database database,
            Writer writer,
            State state,
            Circumstances circumstances) {
        this.folder = folder;
        this.lock = lock;
        this.database = database;
        this.writer = writer;
        this.state = state;
        this.circumstances = circumstances;
        this.raw = new HashedFiles(folder.raw(), folder.aside());
        this.payloads = new HashedFiles(folder.payloads(), folder.aside());
    }

    ArchiveFolder folder() {
        return folder;
    }

    Database database() {
        return database;
    }

    Circumstances circumstances() {
        return circumstances;
    }

    HashedFiles raw() {
        return raw;
    }

    HashedFiles payloads() {
        return payloads;
    }

    /** What is committed now. */
    State state() {
        return state;
    }

    /** Reads insert-only tables. */
    <T, E extends Exception> T read(SqlWork<T, E> work) throws E {
        return database.read(work);
    }

    /** Changes something in one transaction on the writer thread; returns after the commit. */
    <T, E extends Exception> T write(Change<T, E> change) throws E {
        return writer.<T, E>run(transactor -> {
            Progress progress = new Progress(state, circumstances.clock());
            T answer = transactor.<T, E>inTransaction(connection -> {
                T made = change.make(connection, progress);
                progress.saveTallies(connection);
                return made;
            });
            publish(progress);
            return answer;
        });
    }

    private void publish(Progress progress) {
        boolean grown = progress.watermark() > state.watermark();
        state = progress.state();
        if (grown) {
            listeners.forEach(listener -> tell(listener, progress.watermark()));
        }
    }

    /** A listener's fault must not look like a failed commit. */
    private static void tell(LongConsumer listener, long watermark) {
        try {
            listener.accept(watermark);
        } catch (RuntimeException e) {
            LOG.log(System.Logger.Level.ERROR, "a listener failed after the commit of entry " + watermark, e);
        }
    }

    AutoCloseable listen(LongConsumer listener) {
        listeners.add(listener);
        return () -> listeners.remove(listener);
    }

    /** Runs something on the writer thread between transactions. */
    <T, E extends Exception> T onWriter(Writer.Task<T, E> task) throws E {
        return writer.run(task);
    }

    @Override
    public void close() {
        try {
            writer.close();
            database.close();
        } finally {
            release();
        }
    }

    private void release() {
        try {
            lock.close();
        } catch (IOException e) {
            throw new StoreFailure("Releasing the lock of " + folder.root(), e);
        }
    }
}
