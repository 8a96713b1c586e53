package fringekeep.interferometry.fringe;

import java.util.ArrayList;
import java.util.List;

/**
 * Expected counts and their derivatives for one scan; the workspace of a fit. Not thread-safe, never leaves the package.
 *
 * <p>Rows are the unmasked points, then, where the background is joint, the dark counts. Parameters stand in the order
 * mean, cosine, sine, [cosine2, sine2], [drift1 &hellip;], [phaseDrift], [frequency], [background]. The frequency is the
 * relative change of 1 / period, and with it free the phase is counted from the middle of the scan while fitting.
 */
final class FringeModel {
    final FringeOptions options;
    final int points;
    final int rows;
    final int parameters;
    final double[] observed;
    final double[] expected;
    final double[] slopes;
    final double[] backgroundSlopes;
    final double[] varianceRatios;
    final double[] arrivals;
    final int harmonicAt;
    final int driftAt;
    final int phaseDriftAt;
    final int frequencyAt;
    final int backgroundAt;
    final double centre;
    double knownBackground;
    double knownBackgroundVariance;
    boolean polar;

    private final double[] turns;
    private final double[] exposure;
    private final double[] signal;
    private final double[] time;
    private final DeadTime deadTime;
    private final double secondsPerExposure;
    private final double[] pair = new double[2];
    private final double[] cosine;
    private final double[] sine;
    private final double[] cosineTwice;
    private final double[] sineTwice;

    FringeModel(FringeData data, FringeOptions options) {
        this.options = options;
        int[] used = used(data);
        this.points = used.length;
        boolean joint = options.background().sort() == Background.Sort.JOINT;
        this.rows = points + (joint ? data.darkCounts.length : 0);
        int next = 3;
        this.harmonicAt = options.secondHarmonic() ? next : -1;
        next += options.secondHarmonic() ? 2 : 0;
        this.driftAt = options.driftOrder() > 0 ? next : -1;
        next += options.driftOrder();
        this.phaseDriftAt = options.phaseDrift() ? next++ : -1;
        this.frequencyAt = options.periodFree() ? next++ : -1;
        this.backgroundAt = joint ? next++ : -1;
        this.parameters = next;
        this.observed = new double[rows];
        this.expected = new double[rows];
        this.arrivals = new double[rows];
        this.slopes = new double[rows * parameters];
        this.backgroundSlopes = new double[rows];
        this.varianceRatios = new double[rows];
        this.turns = new double[points];
        this.exposure = new double[rows];
        this.signal = new double[points];
        this.time = new double[points];
        this.cosine = new double[points];
        this.sine = new double[points];
        this.cosineTwice = new double[points];
        this.sineTwice = new double[points];
        this.deadTime = data.deadTime;
        this.secondsPerExposure = data.secondsPerExposure;
        this.centre = options.periodFree() ? middle(data, used) : 0;
        fillRows(data, used);
        fillTimes(data, used);
        fillTurns(0);
        setBackground(data);
    }

    static int[] used(FringeData data) {
        int count = 0;
        for (boolean masked : data.masked) {
            count += masked ? 0 : 1;
        }
        int[] used = new int[count];
        int next = 0;
        for (int i = 0; i < data.masked.length; i++) {
            if (!data.masked[i]) {
                used[next++] = i;
            }
        }
        return used;
    }

    static double middle(FringeData data, int[] used) {
        double sum = 0;
        for (int i : used) {
            sum += data.positions[i];
        }
        return used.length == 0 ? 0 : sum / used.length;
    }

    private void fillRows(FringeData data, int[] used) {
        double monitorSum = 0;
        for (int i : used) {
            monitorSum += data.monitor[i];
        }
        for (int row = 0; row < points; row++) {
            int i = used[row];
            observed[row] = data.counts[i];
            exposure[row] = data.exposures[i];
            signal[row] = data.exposures[i] * (data.monitor[i] * points / monitorSum);
            turns[row] = (data.positions[i] - centre) / options.period();
        }
        for (int row = points; row < rows; row++) {
            observed[row] = data.darkCounts[row - points];
            exposure[row] = data.darkExposures[row - points];
        }
    }

    /** Times run from -1/2 to 1/2 over all points of the scan, masked ones included, so that a mask moves no zero. */
    private void fillTimes(FringeData data, int[] used) {
        double first = Double.POSITIVE_INFINITY;
        double last = Double.NEGATIVE_INFINITY;
        for (double t : data.times) {
            first = Math.min(first, t);
            last = Math.max(last, t);
        }
        for (int row = 0; row < points; row++) {
            time[row] = last > first ? (data.times[used[row]] - first) / (last - first) - 0.5 : 0;
        }
    }

    private void fillTurns(double relativeFrequency) {
        for (int row = 0; row < points; row++) {
            double turn = turns[row] * (1 + relativeFrequency);
            Turns.both(turn, pair, 0);
            cosine[row] = pair[0];
            sine[row] = pair[1];
            if (harmonicAt >= 0) {
                cosineTwice[row] = Turns.cos(2 * turn);
                sineTwice[row] = Turns.sin(2 * turn);
            }
        }
    }

    private void setBackground(FringeData data) {
        switch (options.background().sort()) {
            case NONE, JOINT -> knownBackground = 0;
            case KNOWN -> {
                knownBackground = options.background().rate();
                double u = options.background().standardUncertainty();
                knownBackgroundVariance = u * u;
            }
            case ESTIMATED -> {
                double total = data.darkExposureTotal();
                knownBackground = total > 0 ? data.darkTotal() / total : 0;
                knownBackgroundVariance = total > 0 ? data.darkTotal() / (total * total) : 0;
            }
        }
    }

    boolean linear() {
        return !polar && driftAt < 0 && phaseDriftAt < 0 && frequencyAt < 0 && deadTime.sort() == DeadTime.Sort.NONE;
    }

    List<String> names() {
        List<String> names = new ArrayList<>(List.of("mean", "cosine", "sine"));
        if (harmonicAt >= 0) {
            names.add("cosine2");
            names.add("sine2");
        }
        for (int order = 1; order <= options.driftOrder(); order++) {
            names.add("drift" + order);
        }
        if (phaseDriftAt >= 0) {
            names.add("phaseDrift");
        }
        if (frequencyAt >= 0) {
            names.add("period");
        }
        if (backgroundAt >= 0) {
            names.add("background");
        }
        return List.copyOf(names);
    }

    /** The range of the points in periods. */
    double span() {
        return FringeGrid.span(turns);
    }

    /** Fills expected counts and slopes; false where the model has no meaning. */
    boolean evaluate(double[] theta) {
        double background = backgroundAt >= 0 ? theta[backgroundAt] : knownBackground;
        double amplitude = polar ? theta[0] * theta[1] : 0;
        double cosPhase = polar ? StrictMath.cos(theta[2]) : 0;
        double sinPhase = polar ? StrictMath.sin(theta[2]) : 0;
        double a = polar ? amplitude * cosPhase : theta[1];
        double b = polar ? -amplitude * sinPhase : theta[2];
        if (frequencyAt >= 0) {
            if (!(1 + theta[frequencyAt] > 0)) {
                return false;
            }
            fillTurns(theta[frequencyAt]);
        }
        boolean possible = true;
        for (int row = 0; row < points; row++) {
            possible &= signalRow(row, theta, a, b, background);
            if (polar) {
                int at = row * parameters;
                double byA = slopes[at + 1];
                double byB = slopes[at + 2];
                slopes[at] += byA * theta[1] * cosPhase - byB * theta[1] * sinPhase;
                slopes[at + 1] = theta[0] * (byA * cosPhase - byB * sinPhase);
                slopes[at + 2] = -amplitude * (byA * sinPhase + byB * cosPhase);
            }
        }
        for (int row = points; row < rows; row++) {
            double slope = detect(row, exposure[row] * background);
            slopes[row * parameters + backgroundAt] = slope * exposure[row];
            backgroundSlopes[row] = slope * exposure[row];
            possible &= slope > 0;
        }
        return possible;
    }

    private boolean signalRow(int row, double[] theta, double a, double b, double background) {
        double t = time[row];
        double c = cosine[row];
        double s = sine[row];
        double turned = phaseDriftAt >= 0 ? theta[phaseDriftAt] * t : 0;
        if (phaseDriftAt >= 0) {
            double cosTurned = StrictMath.cos(turned);
            double sinTurned = StrictMath.sin(turned);
            double rotated = c * cosTurned - s * sinTurned;
            s = s * cosTurned + c * sinTurned;
            c = rotated;
        }
        double shape = theta[0] + a * c + b * s;
        double shapeByAngle = b * c - a * s;
        double shapeByAngleAll = shapeByAngle;
        if (harmonicAt >= 0) {
            double a2 = theta[harmonicAt];
            double b2 = theta[harmonicAt + 1];
            shape += a2 * cosineTwice[row] + b2 * sineTwice[row];
            shapeByAngleAll += 2 * (b2 * cosineTwice[row] - a2 * sineTwice[row]);
        }
        double drift = 1;
        for (int order = 1; order <= options.driftOrder(); order++) {
            drift += theta[driftAt + order - 1] * driftShape(order, t);
        }
        double slope = detect(row, signal[row] * drift * shape + exposure[row] * background);
        double gain = slope * signal[row];
        int at = row * parameters;
        slopes[at] = gain * drift;
        slopes[at + 1] = gain * drift * c;
        slopes[at + 2] = gain * drift * s;
        if (harmonicAt >= 0) {
            slopes[at + harmonicAt] = gain * drift * cosineTwice[row];
            slopes[at + harmonicAt + 1] = gain * drift * sineTwice[row];
        }
        for (int order = 1; order <= options.driftOrder(); order++) {
            slopes[at + driftAt + order - 1] = gain * shape * driftShape(order, t);
        }
        if (phaseDriftAt >= 0) {
            slopes[at + phaseDriftAt] = gain * drift * shapeByAngle * t;
        }
        if (frequencyAt >= 0) {
            slopes[at + frequencyAt] = gain * drift * shapeByAngleAll * 2 * Math.PI * turns[row];
        }
        backgroundSlopes[row] = slope * exposure[row];
        if (backgroundAt >= 0) {
            slopes[at + backgroundAt] = slope * exposure[row];
        }
        return slope > 0;
    }

    private double detect(int row, double arriving) {
        arrivals[row] = arriving;
        if (deadTime.sort() == DeadTime.Sort.NONE) {
            expected[row] = arriving;
            varianceRatios[row] = 1;
            return 1;
        }
        double live = exposure[row] * secondsPerExposure;
        double inside = Math.max(arriving, 0);
        expected[row] = deadTime.recorded(inside, live) + (arriving - inside);
        varianceRatios[row] = deadTime.varianceRatio(inside, live);
        return deadTime.slope(inside, live);
    }

    static double driftShape(int order, double t) {
        return switch (order) {
            case 1 -> t;
            case 2 -> t * t - 1.0 / 12;
            default -> t * (t * t - 0.15);
        };
    }

    double meanExposure() {
        double sum = 0;
        for (int row = 0; row < points; row++) {
            sum += exposure[row];
        }
        return sum / points;
    }

    double observedTotal() {
        double sum = 0;
        for (int row = 0; row < points; row++) {
            sum += observed[row];
        }
        return sum;
    }
}
