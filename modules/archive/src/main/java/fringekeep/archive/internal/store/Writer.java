package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.db.Transactor;
import java.util.Objects;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;

/** The one thread that writes. Whoever asks waits for the commit, even when interrupted: what was begun is answered. */
final class Writer implements AutoCloseable {
    private final ExecutorService thread = Executors.newSingleThreadExecutor(work -> {
        Thread made = new Thread(work, "archive writer");
        made.setDaemon(true);
        return made;
    });
    private final Transactor transactor;

    Writer(Transactor transactor) {
        this.transactor = transactor;
    }

    /** Work on the writer thread. */
    @FunctionalInterface
    interface Task<T, E extends Exception> {
        T run(Transactor transactor) throws E;
    }

    /** Runs a task on the writer thread and waits for it. */
    <T, E extends Exception> T run(Task<T, E> task) throws E {
        Future<T> future = thread.submit(() -> task.run(transactor));
        boolean interrupted = false;
        try {
            while (true) {
                try {
                    return future.get();
                } catch (InterruptedException e) {
                    interrupted = true;
                } catch (ExecutionException e) {
                    Writer.<E>rethrow(e);
                }
            }
        } finally {
            if (interrupted) {
                Thread.currentThread().interrupt();
            }
        }
    }

    /** Throws what the task threw, with the place of the caller beside it. */
    @SuppressWarnings("unchecked") // a task throws E, an unchecked exception or an error
    private static <E extends Exception> void rethrow(ExecutionException e) throws E {
        Throwable cause = Objects.requireNonNull(e.getCause(), "a task failed without a cause");
        if (cause instanceof Error error) {
            throw error;
        }
        if (cause instanceof RuntimeException) {
            cause.addSuppressed(new IllegalStateException("asked from here"));
        }
        throw (E) cause;
    }

    /** Finishes what is begun, then ends. */
    @Override
    public void close() {
        thread.shutdown();
        boolean interrupted = false;
        while (true) {
            try {
                if (thread.awaitTermination(1, TimeUnit.MINUTES)) {
                    break;
                }
            } catch (InterruptedException e) {
                interrupted = true;
            }
        }
        transactor.close();
        if (interrupted) {
            Thread.currentThread().interrupt();
        }
    }
}
