package fringekeep.archive.problem;

import java.util.List;

/** Carries one or more {@link Problem}s out of work that could not be done; nothing was stored unless a problem says so. */
public final class ProblemException extends Exception {
    private static final long serialVersionUID = 1L;
    private final transient List<Problem> problems;

    /** One problem. */
    public ProblemException(Problem problem) {
        this(List.of(problem));
    }

    /** Several problems, at least one. */
    public ProblemException(List<Problem> problems) {
        super(problems.get(0).what() + " " + problems.get(0).where());
        this.problems = List.copyOf(problems);
    }

    /** The problems, at least one. */
    public List<Problem> problems() {
        return problems;
    }
}
