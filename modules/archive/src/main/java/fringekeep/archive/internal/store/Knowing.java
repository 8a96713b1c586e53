package fringekeep.archive.internal.store;

import fringekeep.archive.graph.Graph;
import fringekeep.archive.graph.GraphBuilder;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.RecordSource;
import java.util.Collection;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;

/**
 * The graph in memory: loaded in the background at opening; later each question first reads what was committed since the last
 * one. Nobody but who asks for it waits. Thread-safe.
 */
final class Knowing implements AutoCloseable {
    private static final System.Logger LOG = System.getLogger(Knowing.class.getName());
    private static final int STEP = 500;
    private final Store store;
    private final JournalTimes times;
    private final GraphReading reading;
    private final GraphBuilder builder;
    private final Thread thread = new Thread(this::load, "archive graph");
    private long known;
    private @Nullable Graph snapshot;
    private volatile boolean ready;
    private volatile boolean closing;

    Knowing(Store store, RecordSource stored) {
        this.store = store;
        this.times = new JournalTimes(store);
        this.builder = new GraphBuilder(record -> stored.head(record).map(bytes -> HeadReading.head(record, bytes)));
        this.reading = new GraphReading(store, builder);
        thread.setDaemon(true);
    }

    void begin() {
        thread.start();
    }

    private void load() {
        try {
            while (!closing && !grown(STEP)) {
                Thread.onSpinWait();
            }
            ready = !closing;
        } catch (RuntimeException e) {
            LOG.log(System.Logger.Level.ERROR, "loading the graph failed; it is tried again when it is asked for", e);
        }
    }

    /** Whether a question is answered without reading the whole archive first. */
    boolean ready() {
        return ready;
    }

    JournalTimes times() {
        return times;
    }

    /** The graph at the present watermark; waits until it is loaded. */
    Graph graph() {
        while (!grown(Long.MAX_VALUE)) {
            if (closing) {
                throw new IllegalStateException("the archive is closed");
            }
        }
        return snapshot();
    }

    private synchronized Graph snapshot() {
        Graph graph = snapshot;
        if (graph == null || graph.watermark() < known) {
            graph = builder.snapshot();
            snapshot = graph;
        }
        return graph;
    }

    /** Reads up to so many entries more; whether that was all. */
    private synchronized boolean grown(long most) {
        long watermark = store.state().watermark();
        long to = most > watermark - known ? watermark : known + most;
        for (long from = known + 1; from <= to && !closing; from += STEP) {
            long end = Math.min(to, from + STEP - 1);
            reading.read(from, end);
            builder.watermark(end);
            known = end;
        }
        return known == watermark;
    }

    /** States of records, if the graph is loaded; never waits for it. */
    Optional<Map<Hash, Set<StateName>>> states(Collection<Hash> records) {
        if (!ready) {
            return Optional.empty();
        }
        Graph graph = graph();
        Map<Hash, Set<StateName>> states = new TreeMap<>();
        records.forEach(record -> states.put(record, graph.states(record)));
        return Optional.of(states);
    }

    @Override
    public void close() {
        closing = true;
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
}
