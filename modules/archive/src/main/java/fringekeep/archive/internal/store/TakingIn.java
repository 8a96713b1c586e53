package fringekeep.archive.internal.store;

import fringekeep.archive.Archive.RawTaken;
import fringekeep.archive.internal.store.files.HashedFiles;
import fringekeep.archive.internal.store.files.HashedFiles.Written;
import fringekeep.archive.internal.store.tables.PartsTable;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;

/**
 * Takes raw files in: written aside, forced to disk, renamed to their hash. Only the record that is made from a file names it
 * in the tables; until then it is an orphan that does no harm, and taking the same bytes in again finds it.
 */
final class TakingIn {
    private static final long LARGEST = 1L << 40;
    private final Store store;

    TakingIn(Store store) {
        this.store = store;
    }

    RawTaken file(Path file) throws ProblemException {
        if (!Files.isRegularFile(file)) {
            throw new ProblemException(new Problem(
                    "raw.no-file",
                    Files.exists(file) ? "That is not a file." : "There is no such file.",
                    file.toString(),
                    "Check the path. Nothing has been stored."));
        }
        try (InputStream in = Files.newInputStream(file)) {
            return take(in, file.toString());
        } catch (IOException e) {
            throw unreadable(file.toString(), e);
        }
    }

    RawTaken bytes(byte[] raw) throws ProblemException {
        try {
            return take(new ByteArrayInputStream(raw), store.folder().raw().toString());
        } catch (IOException e) {
            throw unreadable(store.folder().raw().toString(), e);
        }
    }

    private RawTaken take(InputStream in, String where) throws IOException, ProblemException {
        HashedFiles files = store.raw();
        Written written = files.write(in, LARGEST);
        if (store.state().purged().contains(written.hash())) {
            written.discard();
            throw new ProblemException(Purging.refused(written.hash(), where));
        }
        boolean known = store.<Optional<Long>, RuntimeException>read(c -> PartsTable.rawSize(c, written.hash()))
                .isPresent();
        files.adopt(written);
        return new RawTaken(written.hash(), written.size(), known);
    }

    Optional<InputStream> open(Hash raw) throws ProblemException {
        try {
            return store.raw().open(raw);
        } catch (IOException e) {
            throw unreadable(store.raw().path(raw).toString(), e);
        }
    }

    private static ProblemException unreadable(String where, IOException e) {
        return new ProblemException(new Problem(
                "raw.unreadable",
                "The file cannot be read or stored: " + e + ".",
                where,
                "Check the disk and the permissions, then take it in again. Nothing has been stored."));
    }
}
