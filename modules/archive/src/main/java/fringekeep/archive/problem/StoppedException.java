package fringekeep.archive.problem;

/** Work ended because a person asked for it; what was finished before stays. */
public final class StoppedException extends Exception {
    private static final long serialVersionUID = 1L;

    /** Stopped. */
    public StoppedException() {
        super("stopped");
    }
}
