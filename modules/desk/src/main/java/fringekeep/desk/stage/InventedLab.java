package fringekeep.desk.stage;

import fringekeep.archive.kind.Kinds;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.nio.file.Path;

/** Makes the archive of the invented laboratory; announced by the module that knows how. */
public interface InventedLab {
    /**
     * Makes it, not on the window thread.
     *
     * @param folder new or empty
     * @throws ProblemException if it cannot be made; nothing stays in the folder
     * @throws StoppedException if it was stopped; nothing stays in the folder
     */
    void make(Path folder, Kinds kinds, String build, Work work) throws ProblemException, StoppedException;
}
