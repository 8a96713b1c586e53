package fringekeep.fit.internal;

import fringekeep.interferometry.statistics.Distributions;

/** Tail probabilities. */
final class Chances {
    private Chances() {}

    /** Probability of a chi-square of so many degrees of freedom above a value. */
    static double upper(double chiSquare, int degreesOfFreedom) {
        return Distributions.chiSquareUpper(Math.max(0, chiSquare), degreesOfFreedom);
    }
}
