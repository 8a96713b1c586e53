package fringekeep.benchmarks;

import fringekeep.interferometry.fringe.FringeData;
import fringekeep.interferometry.fringe.FringeFitter;
import fringekeep.interferometry.fringe.FringeOptions;

/** One fit in a fresh process; prints how long it took from the first line of the program on. */
final class FirstFit {
    private FirstFit() {}

    public static void main(String[] arguments) {
        long begin = System.nanoTime();
        double[] places = new double[40];
        double[] counts = new double[40];
        for (int k = 0; k < 40; k++) {
            places[k] = 16e-9 * k;
            counts[k] = Math.rint(300 * (1 + 0.4 * StrictMath.cos(2 * Math.PI * 16 * k / 266.0)));
        }
        double found = FringeFitter.fit(FringeData.of(places, counts), FringeOptions.atPeriod(266e-9))
                .orThrow()
                .visibility()
                .orElseThrow()
                .value();
        System.out.println((System.nanoTime() - begin) * 1e-6 + " " + found);
    }
}
