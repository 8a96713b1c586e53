package fringekeep.archive;

import fringekeep.archive.Archives.FolderHint;
import fringekeep.archive.Archives.Founding;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.nio.file.Path;
import java.util.Optional;

/**
 * What keeps archives; announced in {@code META-INF/services}. A lab outlives its engine: whatever keeps an archive can write
 * and read the plain copy. Called through {@link Archives}.
 */
public interface ArchiveEngine {
    /** See {@link Archives#found}. */
    Archive found(Path folder, Founding founding, Kinds kinds, Circumstances circumstances) throws ProblemException;

    /** See {@link Archives#open}. */
    Archive open(Path folder, Kinds kinds, Circumstances circumstances) throws ProblemException;

    /** See {@link Archives#restore}. */
    Archive restore(Path copy, Path folder, Kinds kinds, Circumstances circumstances, Work work)
            throws ProblemException, StoppedException;

    /** See {@link Archives#look}. */
    Optional<FolderHint> look(Path folder) throws ProblemException;
}
