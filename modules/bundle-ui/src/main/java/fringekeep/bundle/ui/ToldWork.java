package fringekeep.bundle.ui;

import fringekeep.archive.problem.Work;
import java.util.concurrent.Executor;

/** Work that also tells a sheet how far it is, on the window thread, not more often than people can read. */
final class ToldWork implements Work {
    private static final long EVERY = 50_000_000L;

    private final Work work;
    private final Executor window;
    private final Told told;
    private String last = "";
    private long at;

    /** Hears progress on the window thread. */
    interface Told {
        /** How many of how many of something. */
        void progress(String what, long done, long total);
    }

    ToldWork(Work work, Executor window, Told told) {
        this.work = work;
        this.window = window;
        this.told = told;
    }

    @Override
    public void progress(long done, long total, String what) {
        work.progress(done, total, what);
        long now = System.nanoTime();
        if (!what.equals(last) || done + 1 >= total || now - at > EVERY) {
            last = what;
            at = now;
            window.execute(() -> told.progress(what, done, total));
        }
    }

    @Override
    public boolean stopped() {
        return work.stopped();
    }
}
