package fringekeep.commandline;

import fringekeep.archive.problem.Work;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;

/**
 * Work that a person stops with the terminal's interrupt key. The process then waits for the work to reach a place where
 * nothing is half done, so nothing depends on how fast a person is.
 */
final class StoppableWork implements Work, AutoCloseable {
    private static final long LONGEST_WAIT_SECONDS = 120;

    private final Console console;
    private final boolean visible;
    private final CountDownLatch ended = new CountDownLatch(1);
    private final Thread hook = new Thread(this::stopAndWait, "stop");
    private volatile boolean stopped;
    private long lastShown;
    private int width;

    StoppableWork(Console console, boolean visible) {
        this.console = console;
        this.visible = visible;
        Runtime.getRuntime().addShutdownHook(hook);
    }

    private void stopAndWait() {
        stopped = true;
        try {
            if (!ended.await(LONGEST_WAIT_SECONDS, TimeUnit.SECONDS)) {
                console.words().print("\nfringekeep: the work did not reach a stop; the archive stays consistent\n");
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    @Override
    public void progress(long done, long total, String what) {
        long now = System.nanoTime();
        boolean due = now - lastShown > 200_000_000L || done == total;
        if (visible && due) {
            lastShown = now;
            String line = what + " " + done + (total > 0 ? " of " + total : "");
            console.words().print("\r" + line + " ".repeat(Math.max(0, width - line.length())));
            console.words().flush();
            width = line.length();
        }
    }

    @Override
    public boolean stopped() {
        return stopped;
    }

    @Override
    public void close() {
        if (width > 0) {
            console.words().print("\r" + " ".repeat(width) + "\r");
        }
        ended.countDown();
        if (!stopped) {
            Runtime.getRuntime().removeShutdownHook(hook);
        }
    }
}
