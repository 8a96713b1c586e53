package fringekeep.desk.run;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;

/** Something to be done away from the window thread. */
@FunctionalInterface
public interface Job<T> {
    /** Does it; polls {@code work} where it may take long. */
    T work(Work work) throws ProblemException, StoppedException;
}
