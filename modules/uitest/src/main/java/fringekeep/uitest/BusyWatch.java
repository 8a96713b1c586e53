package fringekeep.uitest;

import java.awt.AWTEvent;
import java.awt.EventQueue;
import java.awt.Toolkit;
import java.awt.event.InvocationEvent;
import java.util.Locale;
import java.util.concurrent.atomic.AtomicLong;

/** Measures how long the window thread is busy with one event; keeps the worst. */
final class BusyWatch extends EventQueue {
    private static final AtomicLong WORST_NANOSECONDS = new AtomicLong();
    private static volatile String worstEvent = "";

    private BusyWatch() {}

    static void install() {
        Toolkit.getDefaultToolkit().getSystemEventQueue().push(new BusyWatch());
    }

    /** Forgets what was measured before. */
    static void reset() {
        WORST_NANOSECONDS.set(0);
        worstEvent = "";
    }

    static long worstMilliseconds() {
        return WORST_NANOSECONDS.get() / 1_000_000;
    }

    static String report() {
        return String.format(Locale.ROOT, "%d ms\t%s", worstMilliseconds(), worstEvent);
    }

    @Override
    protected void dispatchEvent(AWTEvent event) {
        // an invocation forgets what it ran once it is over
        String before = event instanceof InvocationEvent ? event.toString() : "";
        long start = System.nanoTime();
        super.dispatchEvent(event);
        long busy = System.nanoTime() - start;
        // the robot waits for an idle display inside an event of its own: that is no work of the program
        boolean robot = event.getClass().getName().startsWith("sun.awt.SunToolkit");
        if (!robot && busy > WORST_NANOSECONDS.get()) {
            WORST_NANOSECONDS.set(busy);
            String words = before.isEmpty() ? event.toString() : before;
            worstEvent = words.substring(0, Math.min(240, words.length()));
        }
    }
}
