package fringekeep.uitest;

import java.awt.AWTEvent;
import java.awt.EventQueue;
import java.awt.Toolkit;
import java.awt.event.InvocationEvent;
import java.lang.management.ManagementFactory;
import java.lang.management.ThreadInfo;
import java.lang.management.ThreadMXBean;
import java.util.Locale;

/**
 * Measures how long the window thread is taken up by one event; keeps the worst. What counts is computing and waiting of that
 * thread itself: on a machine that builds beside the tests the clock alone would also count others' work. A very long event
 * counts by the clock, so that waiting for a disk does not hide.
 */
final class BusyWatch extends EventQueue {
    /** An event that takes so long by the clock counts whatever it did. */
    private static final long LONG_BY_CLOCK = 1_500_000_000L;

    private static final ThreadMXBean THREADS = ManagementFactory.getThreadMXBean();
    private static long worst;
    private static long worstByClock;
    private static String worstEvent = "";
    private long dispatched;

    private BusyWatch() {}

    static void install() {
        if (THREADS.isThreadContentionMonitoringSupported()) {
            THREADS.setThreadContentionMonitoringEnabled(true);
        }
        Toolkit.getDefaultToolkit().getSystemEventQueue().push(new BusyWatch());
    }

    /** Forgets what was measured before. */
    static synchronized void reset() {
        worst = 0;
        worstByClock = 0;
        worstEvent = "";
    }

    static synchronized long worstMilliseconds() {
        return worst / 1_000_000;
    }

    static synchronized String report() {
        return String.format(
                Locale.ROOT, "%d ms (%d ms by the clock)\t%s", worst / 1_000_000, worstByClock / 1_000_000, worstEvent);
    }

    private static synchronized void note(long busy, long byClock, String event) {
        if (busy > worst) {
            worst = busy;
            worstByClock = byClock;
            worstEvent = event.substring(0, Math.min(240, event.length()));
        }
    }

    /** Time this thread has computed, waited for a lock or waited to be told, in nanoseconds. */
    private static long taken() {
        ThreadInfo info = THREADS.getThreadInfo(Thread.currentThread().getId());
        long waited = info == null ? 0 : Math.max(0, info.getBlockedTime()) + Math.max(0, info.getWaitedTime());
        return THREADS.getCurrentThreadCpuTime() + waited * 1_000_000;
    }

    @Override
    protected void dispatchEvent(AWTEvent event) {
        // an invocation forgets what it ran once it is over
        String before = event instanceof InvocationEvent ? event.toString() : "";
        // what the tests themselves do on the window thread, such as painting a picture, is no work of the program
        boolean robot = event.getClass().getName().startsWith("sun.awt.SunToolkit")
                || before.contains("runnable=fringekeep.uitest.");
        dispatched++;
        long number = dispatched;
        long clock = System.nanoTime();
        long start = taken();
        super.dispatchEvent(event);
        long byClock = System.nanoTime() - clock;
        // a chooser of files dispatches events inside the one that opened it: the window lives, each event counts by
        // itself
        boolean pumped = dispatched > number;
        if (!robot && !pumped) {
            long busy = byClock > LONG_BY_CLOCK ? byClock : Math.min(byClock, taken() - start);
            note(busy, byClock, before.isEmpty() ? event.toString() : before);
        }
    }
}
