package fringekeep.benchmarks;

import java.lang.management.ManagementFactory;
import java.util.Arrays;
import java.util.Locale;
import java.util.function.DoubleSupplier;

/** Alternates two sides and prints their times and the ratio: median over rounds with least and largest. */
final class Bench {
    private static final int ROUNDS = 7;

    private Bench() {}

    /** CPU seconds of this thread while something runs. */
    static double cpu(Runnable work) {
        long before = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
        work.run();
        return (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - before) * 1e-9;
    }

    /**
     * Runs both sides in turn.
     *
     * @param row what is measured
     * @param ours seconds per unit of work of our side
     * @param reference name of the other side
     * @param theirs its seconds per unit of work
     */
    static void compare(String row, DoubleSupplier ours, String reference, DoubleSupplier theirs) {
        warm(ours);
        double[] mine = new double[ROUNDS];
        double[] other = new double[ROUNDS];
        double[] ratios = new double[ROUNDS];
        for (int round = 0; round < ROUNDS; round++) {
            mine[round] = ours.getAsDouble();
            other[round] = theirs.getAsDouble();
            ratios[round] = other[round] / mine[round];
        }
        Arrays.sort(ratios);
        print(
                "%-38s ours %11.3f us   %-24s %13.3f us   ratio %8.1f (%.1f to %.1f)",
                row,
                1e6 * median(mine),
                reference,
                1e6 * median(other),
                ratios[ROUNDS / 2],
                ratios[0],
                ratios[ROUNDS - 1]);
    }

    /** Until the compiler is done: 12 s of CPU time. */
    private static void warm(DoubleSupplier work) {
        long start = ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
        double last = 0;
        while (ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() - start < Long.getLong("warm", 12) * 1e9) {
            last += work.getAsDouble();
        }
        if (!(last > 0)) {
            throw new IllegalStateException("nothing was measured");
        }
    }

    static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    static void print(String form, Object... values) {
        System.out.println(String.format(Locale.ROOT, form, values));
    }
}
