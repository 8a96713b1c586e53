package fringekeep.desk.run;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Executor;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.function.Consumer;
import javax.swing.SwingUtilities;

/**
 * The only way from a window to a use case: jobs run on workers, answers come back on the window thread. A newer job for the
 * same place stops the older one, whose answer is dropped. To be used on the window thread.
 */
public final class Runner {
    private final Executor workers;
    private final Executor window;
    private final Map<String, Ticket> latest = new HashMap<>();
    private Consumer<List<Problem>> trouble = problems -> {};
    private Consumer<Optional<Progress>> progress = now -> {};

    /** Workers and window thread of one's own, for tests. */
    public Runner(Executor workers, Executor window) {
        this.workers = workers;
        this.window = window;
    }

    /** Two daemon workers and the window thread of the toolkit. */
    public static Runner forWindow() {
        ExecutorService workers = Executors.newFixedThreadPool(2, task -> {
            Thread thread = new Thread(task, "fringekeep worker");
            thread.setDaemon(true);
            return thread;
        });
        return new Runner(workers, SwingUtilities::invokeLater);
    }

    /** Called on the window thread with the problems of a job that could not be done. */
    public void onTrouble(Consumer<List<Problem>> listener) {
        this.trouble = listener;
    }

    /** Called on the window thread as a job gets on; empty when the last one has ended. */
    public void onProgress(Consumer<Optional<Progress>> listener) {
        this.progress = listener;
    }

    /**
     * Runs a job for a place.
     *
     * @param place what the answer is for; a newer job for it supersedes
     * @param done called on the window thread with the answer, unless superseded
     */
    public <T> void run(String place, Job<T> job, Consumer<T> done) {
        run(place, job, done, trouble);
    }

    /** Runs a job for a place with its own ear for problems. */
    public <T> void run(String place, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed) {
        Ticket ticket = new Ticket(place);
        Ticket before = latest.put(place, ticket);
        if (before != null) {
            before.stopped = true;
        }
        workers.execute(() -> attempt(place, ticket, job, done, failed));
    }

    /** Whether nothing runs. */
    public boolean quiet() {
        return latest.isEmpty();
    }

    /** Stops what runs for a place. */
    public void stop(String place) {
        Ticket ticket = latest.get(place);
        if (ticket != null) {
            ticket.stopped = true;
        }
    }

    /** Stops all that runs. */
    public void stop() {
        latest.values().forEach(ticket -> ticket.stopped = true);
    }

    private <T> void attempt(
            String place, Ticket ticket, Job<T> job, Consumer<T> done, Consumer<List<Problem>> failed) {
        if (ticket.stopped) {
            window.execute(() -> end(place, ticket, () -> {})); // stopped before it began: it must not count as running
            return;
        }
        try {
            T answer = job.work(ticket);
            window.execute(() -> end(place, ticket, () -> done.accept(answer)));
        } catch (ProblemException e) {
            List<Problem> problems = e.problems();
            window.execute(() -> end(place, ticket, () -> failed.accept(problems)));
        } catch (StoppedException e) {
            window.execute(() -> end(place, ticket, () -> {}));
        } catch (RuntimeException | Error e) {
            window.execute(() -> end(place, ticket, () -> {}));
            throw e; // rises to the single handler of the window
        }
    }

    private void end(String place, Ticket ticket, Runnable answer) {
        if (latest.get(place) == ticket) {
            latest.remove(place);
            if (ticket.reported) {
                progress.accept(Optional.empty());
            }
            answer.run();
        }
    }

    private final class Ticket implements Work {
        private final String place;
        private volatile boolean stopped;
        private volatile boolean reported;
        private volatile long last;

        Ticket(String place) {
            this.place = place;
        }

        @Override
        public void progress(long done, long total, String what) {
            long now = System.nanoTime();
            if (now - last > 100_000_000L) {
                last = now;
                reported = true;
                window.execute(() -> progress.accept(Optional.of(new Progress(what, done, total, place))));
            }
        }

        @Override
        public boolean stopped() {
            return stopped;
        }
    }
}
