package fringekeep.desk.stage;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;

/**
 * Works out by how much an outdated record would move if it were computed again. Announced with
 * {@code @ServiceProvider(service = SizeOfChange.class)} by the module that can.
 */
public interface SizeOfChange {
    /**
     * What moves, as one sentence such as {@code V 0.2113 → 0.2109, 0.04 σ; phase stays}. Called away from the window thread.
     *
     * @throws ProblemException if it cannot be computed again here
     * @throws StoppedException if it was stopped
     */
    String sentence(Archive archive, Hash record, Work work) throws ProblemException, StoppedException;
}
