package fringekeep.interferometry.fringe;

/** ln of one scan's likelihood against V, best over all but the phase, integrated over the phase. */
abstract sealed class ScanLikelihood permits HeldLikelihood, FreeLikelihood {
    /** Stands for a likelihood of 0. */
    static final double IMPOSSIBLE = -1e9;

    private final int nodes;
    private final double reference;
    private final double phase;
    private final double reachTimesVisibility;

    /** Phases are taken at equally many places within a reach in standard errors to either side of the fitted one. */
    ScanLikelihood(FringeFit fit, int nodes, double reach) {
        this.nodes = nodes;
        reference = 0.5 * fit.deviance();
        HarmonicEstimate widened = fit.inside().widened();
        phase = StrictMath.atan2(0.0 - widened.sine(), widened.cosine());
        reachTimesVisibility = reach * widened.quadratureNoise();
    }

    /** Whether there is a likelihood. */
    abstract boolean determined();

    /** ln L at a visibility and phase, largest over the rest; minus infinity where the counts are not possible. */
    abstract double best(double visibility, double angle);

    final double at(double v) {
        double[] logs = new double[nodes];
        double highest = Double.NEGATIVE_INFINITY;
        // Some standard errors to either side of the fitted phase hold all of a strong scan's likelihood.
        double reach = v * Math.PI > reachTimesVisibility ? reachTimesVisibility / v : Math.PI;
        for (int k = 0; k < nodes; k++) {
            double log = best(v, phase + reach * (2.0 * k / nodes - 1));
            logs[k] = Double.isNaN(log) ? Double.NEGATIVE_INFINITY : log;
            highest = Math.max(highest, logs[k]);
        }
        if (highest == Double.NEGATIVE_INFINITY) {
            return IMPOSSIBLE;
        }
        double sum = 0;
        for (double log : logs) {
            sum += StrictMath.exp(log - highest);
        }
        return highest + StrictMath.log(sum / nodes * (reach / Math.PI)) + reference;
    }
}
