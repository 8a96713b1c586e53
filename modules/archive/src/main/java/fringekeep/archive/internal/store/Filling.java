package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.projection.ProjectedRow;
import fringekeep.archive.internal.store.projection.Projections;
import fringekeep.archive.internal.store.tables.Located;
import fringekeep.archive.internal.store.tables.Records;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.ReentrantLock;

/**
 * Fills projections: after opening those that are new or declared otherwise, on request all, and the words that records are
 * found by. Rows are gathered in a new table while the old one answers; the swap is one transaction.
 */
final class Filling implements AutoCloseable {
    private static final System.Logger LOG = System.getLogger(Filling.class.getName());
    private static final int STEP = 100;
    private static final long WAIT_MILLISECONDS = 200;
    private final Store store;
    private final Projections projections;
    private final Arriving arriving;
    private final ReentrantLock oneAtATime = new ReentrantLock();
    private final Thread thread;
    private final List<String> unfilled = new ArrayList<>();
    private volatile boolean closing;

    Filling(Store store, Projections projections, Arriving arriving) {
        this.store = store;
        this.projections = projections;
        this.arriving = arriving;
        this.thread = new Thread(this::fillInBackground, "archive projections");
        thread.setDaemon(true);
    }

    /** Finds out what must be filled, and begins in the background. */
    void begin() {
        State state = store.state();
        unfilled.addAll(store.<List<String>, RuntimeException>write((c, progress) -> projections.prepare(
                c,
                kind -> state.tallies().containsKey(kind.text())
                        && progress.tally(kind.text()).records() > 0,
                state.watermark())));
        if (!unfilled.isEmpty()) {
            thread.start();
        }
    }

    private void fillInBackground() {
        Work quiet = new Quiet();
        int last = unfilled.size() - 1;
        oneAtATime.lock();
        try {
            // A kind whose schema number rose may say other words too. The last list comes after them, so that what a
            // stop
            // cuts short begins again at the next opening.
            rebuild(unfilled.subList(0, last), quiet);
            new WordFilling(store, arriving).rebuild(quiet);
            rebuild(unfilled.subList(last, unfilled.size()), quiet);
        } catch (StoppedException e) {
            LOG.log(System.Logger.Level.DEBUG, "filling lists was stopped; it begins again at the next opening");
        } catch (RuntimeException e) {
            LOG.log(System.Logger.Level.ERROR, "filling lists failed", e);
        } finally {
            oneAtATime.unlock();
        }
    }

    /** Makes all projections and words anew. */
    void rebuild(Work work) throws StoppedException, ProblemException {
        hold(work);
        try {
            rebuild(projections.names(), work);
            new WordFilling(store, arriving).rebuild(work);
        } finally {
            release();
        }
    }

    /**
     * Waits until no filling is under way, and keeps others from beginning until {@link #release}: rows worked out before a
     * part was purged or supplied would otherwise be put in place after it.
     *
     * @throws StoppedException if the work was stopped while waiting; then nothing is held
     */
    void hold(Work work) throws StoppedException {
        boolean interrupted = false;
        try {
            boolean held = oneAtATime.tryLock();
            while (!held) {
                work.check();
                work.progress(0, 1, "waiting until lists are filled");
                try {
                    held = oneAtATime.tryLock(WAIT_MILLISECONDS, TimeUnit.MILLISECONDS);
                } catch (InterruptedException e) {
                    interrupted = true;
                }
            }
        } finally {
            if (interrupted) {
                Thread.currentThread().interrupt();
            }
        }
    }

    /** Lets fillings begin again; on the thread that holds them. */
    void release() {
        oneAtATime.unlock();
    }

    /** Returns when a swap that has begun is known to all readers; they happen on the writer thread. */
    void awaitSwap() {
        store.<Boolean, RuntimeException>onWriter(transactor -> true);
    }

    private void rebuild(List<String> names, Work work) throws StoppedException {
        for (int i = 0; i < names.size(); i++) {
            work.progress(i, names.size(), names.get(i));
            rebuild(names.get(i), work);
        }
        work.progress(names.size(), names.size(), "");
    }

    private void rebuild(String name, Work work) throws StoppedException {
        store.<Boolean, RuntimeException>write((c, progress) -> {
            projections.begin(c, name);
            return true;
        });
        long done = 0;
        boolean finished = false;
        while (!finished) {
            work.check();
            Map<Long, List<ProjectedRow>> rows = rowsAfter(name, done);
            for (long n : rows.keySet()) {
                done = Math.max(done, n);
            }
            finished = rows.isEmpty() ? swapped(name, done) : gathered(rows);
        }
    }

    /** Rows of the next records, by entry; of records without rows the entry alone. */
    private Map<Long, List<ProjectedRow>> rowsAfter(String name, long done) {
        String kind = projections.kind(name).text();
        long watermark = store.state().watermark();
        List<Records.HeadRow> heads = store.<List<Records.HeadRow>, RuntimeException>read(c -> {
            List<Records.HeadRow> found = new ArrayList<>();
            for (Located record : Records.ofKind(c, kind, done + 1, watermark, STEP)) {
                found.addAll(Records.heads(c, record.n(), record.n()));
            }
            return found;
        });
        Map<Long, List<ProjectedRow>> rows = new LinkedHashMap<>();
        for (Records.HeadRow row : heads) {
            rows.put(row.record().n(), arriving.rows(name, row.record().fingerprint(), HeadReading.head(row)));
        }
        return rows;
    }

    private boolean gathered(Map<Long, List<ProjectedRow>> rows) {
        return store.<Boolean, RuntimeException>write((c, progress) -> {
            for (Map.Entry<Long, List<ProjectedRow>> entry : rows.entrySet()) {
                projections.gather(c, entry.getKey(), entry.getValue());
            }
            return false;
        });
    }

    /** Swaps, unless records of the kind came meanwhile; on the writer thread, so none can come in between. */
    private boolean swapped(String name, long done) {
        return store.<Boolean, RuntimeException>onWriter(transactor -> {
            String generation = transactor.<String, RuntimeException>inTransaction(c -> {
                String kind = projections.kind(name).text();
                if (!Records.ofKind(c, kind, done + 1, Long.MAX_VALUE, 1).isEmpty()) {
                    return "";
                }
                projections.finish(c, name, store.state().watermark());
                return projections.pending(c, name);
            });
            if (!generation.isEmpty()) {
                projections.markReady(name, generation);
            }
            return !generation.isEmpty();
        });
    }

    @Override
    public void close() {
        closing = true;
        awaitBackground();
    }

    /** Returns when the filling that opening began has ended. */
    void awaitBackground() {
        boolean interrupted = false;
        while (thread.isAlive()) {
            try {
                thread.join();
            } catch (InterruptedException e) {
                interrupted = true;
            }
        }
        if (interrupted) {
            Thread.currentThread().interrupt();
        }
    }

    /** Reports to nobody; stops when the archive closes. */
    private final class Quiet implements Work {
        @Override
        public void progress(long done, long total, String what) {
            LOG.log(System.Logger.Level.TRACE, "{0} of {1} lists filled, at {2}", done, total, what);
        }

        @Override
        public boolean stopped() {
            return closing;
        }
    }
}
