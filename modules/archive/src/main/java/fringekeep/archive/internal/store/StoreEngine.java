package fringekeep.archive.internal.store;

import fringekeep.archive.Archive;
import fringekeep.archive.ArchiveEngine;
import fringekeep.archive.Archives.FolderHint;
import fringekeep.archive.Archives.Founding;
import fringekeep.archive.Circumstances;
import fringekeep.archive.internal.store.files.ArchiveFolder;
import fringekeep.archive.internal.store.files.FolderLock;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.ArchiveId;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.regex.Pattern;

/** The engine with the embedded database. */
public final class StoreEngine implements ArchiveEngine {
    private static final Pattern ID = Pattern.compile("[0-9a-f]{32}");

    @Override
    public Archive found(Path folder, Founding founding, Kinds kinds, Circumstances circumstances)
            throws ProblemException {
        return new Opening(folder, kinds, circumstances).found(founding);
    }

    @Override
    public Archive open(Path folder, Kinds kinds, Circumstances circumstances) throws ProblemException {
        return new Opening(folder, kinds, circumstances).open();
    }

    @Override
    public Archive restore(Path copy, Path folder, Kinds kinds, Circumstances circumstances, Work work)
            throws ProblemException, StoppedException {
        return Restoring.restore(copy, folder, kinds, circumstances, work);
    }

    @Override
    public Optional<FolderHint> look(Path folder) throws ProblemException {
        ArchiveFolder names = new ArchiveFolder(folder);
        try {
            if (!Files.exists(names.hint())) {
                return Optional.empty();
            }
            JsonObject hint = Hint.read(names);
            return Optional.of(new FolderHint(
                    hint.text("archive").filter(id -> ID.matcher(id).matches()).map(ArchiveId::new),
                    hint.text("title"),
                    hint.text("fringekeep").orElse("").startsWith("copy/"),
                    FolderLock.holder(names.lock())));
        } catch (IOException e) {
            throw new ProblemException(new Problem(
                    "archive.unreadable",
                    "The folder cannot be read: " + e + ".",
                    folder.toString(),
                    "Check the disk and the permissions."));
        }
    }
}
