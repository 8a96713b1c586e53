package fringekeep.archive.problem;

/** Long work as its doer sees it: a place to report progress, and a flag to poll. Stopping is never an interrupt. */
public interface Work {
    /** Work that reports to nobody and is never stopped. */
    Work QUIET = new Work() {
        @Override
        public void progress(long done, long total, String what) {}

        @Override
        public boolean stopped() {
            return false;
        }
    };

    /**
     * Reports progress.
     *
     * @param done how many of {@code total}
     * @param total 0 when unknown
     * @param what a few words for people
     */
    void progress(long done, long total, String what);

    /** Whether a person asked to stop; the doer ends at the next place where nothing is half done. */
    boolean stopped();

    /** Throws when stopped. */
    default void check() throws StoppedException {
        if (stopped()) {
            throw new StoppedException();
        }
    }
}
