package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.PoissonDeviance;

/** The likelihood with everything but mean, visibility and phase held at the scan's own fit. */
final class HeldLikelihood extends ScanLikelihood {
    private final double[] counts;
    private final double[] gains;
    private final double[] offsets;
    private final double[] cosines;
    private final double[] sines;
    private final double startMean;

    HeldLikelihood(FringeFit fit) {
        super(fit, 96, 10);
        FringeModel model = new FringeModel(fit.data(), fit.options());
        double[] theta = fit.inside().theta().clone();
        int n = model.points;
        counts = java.util.Arrays.copyOf(model.observed, n);
        gains = new double[n];
        offsets = new double[n];
        cosines = new double[n];
        sines = new double[n];
        startMean = theta[0];
        theta[1] = 0;
        theta[2] = 0;
        model.evaluate(theta);
        for (int i = 0; i < n; i++) {
            int at = i * model.parameters;
            gains[i] = model.slopes[at];
            cosines[i] = model.slopes[at + 1] / model.slopes[at];
            sines[i] = model.slopes[at + 2] / model.slopes[at];
            offsets[i] = model.expected[i] - gains[i] * theta[0];
        }
    }

    @Override
    boolean determined() {
        for (double gain : gains) {
            if (!(gain > 0)) {
                return false;
            }
        }
        return true;
    }

    @Override
    double best(double visibility, double angle) {
        return overMean(visibility * StrictMath.cos(angle), -visibility * StrictMath.sin(angle));
    }

    /** ln L largest over the mean by Newton steps kept positive. */
    private double overMean(double a, double b) {
        double mean = startMean;
        for (int step = 0; step < 30; step++) {
            double slope = 0;
            double curvature = 0;
            for (int i = 0; i < counts.length; i++) {
                double shape = gains[i] * (1 + a * cosines[i] + b * sines[i]);
                double mu = offsets[i] + mean * shape;
                slope -= shape;
                if (counts[i] > 0) {
                    if (!(mu > 0)) {
                        return Double.NEGATIVE_INFINITY;
                    }
                    slope += counts[i] * shape / mu;
                    curvature += counts[i] * shape * shape / (mu * mu);
                }
            }
            double move = curvature > 0 ? slope / curvature : 0;
            double next = mean + move;
            mean = next > 0.1 * mean ? next : 0.1 * mean;
            if (Math.abs(move) <= 1e-10 * mean) {
                break;
            }
        }
        double sum = 0;
        for (int i = 0; i < counts.length; i++) {
            double mu = offsets[i] + mean * gains[i] * (1 + a * cosines[i] + b * sines[i]);
            sum -= 0.5 * (mu < 0 ? Double.POSITIVE_INFINITY : PoissonDeviance.term(counts[i], mu));
        }
        return sum;
    }
}
