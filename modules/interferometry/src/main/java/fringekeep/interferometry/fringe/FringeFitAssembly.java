package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** From a found minimum to the published fit: covariance, change of variables, goodness of fit. */
final class FringeFitAssembly {
    private static final List<String> PLAIN_NAMES = List.of("mean", "cosine", "sine");
    private static final List<String> FREE_NAMES = List.of("mean", "cosine", "sine", "period");
    private static final double[] NO_RATIOS = new double[0];

    private final FringeData data;
    private final FringeOptions options;
    private final FringeModel model;
    private final double[] theta;
    private final int p;
    private final double[] estimating;
    private final double[] variances;
    private boolean onEdge;

    private FringeFitAssembly(FringeData data, FringeOptions options, FringeModel model, double[] theta) {
        this.data = data;
        this.options = options;
        this.model = model;
        this.theta = theta;
        this.p = model.parameters;
        this.estimating = new double[model.rows];
        this.variances = new double[model.rows];
    }

    static FringeOutcome assemble(FringeData data, FringeOptions options, FringeModel model, double[] theta) {
        return new FringeFitAssembly(data, options, model, theta).run();
    }

    private FringeOutcome run() {
        model.evaluate(theta);
        onEdge = options.estimator() == Estimator.POISSON_LIKELIHOOD && touchesBound();
        fillVariances();
        fillEstimating();
        double[] bread = FringeFitter.inverseOf(model, estimating, p);
        if (bread == null) {
            return notDetermined();
        }
        double[] covariance = covariance(bread);
        if (covariance == null) {
            return notDetermined();
        }
        double[] plain = covariance.clone();
        addBackground(covariance, bread);
        FringeFit.Inside inside = new FringeFit.Inside(
                theta.clone(),
                plain,
                covariance,
                model.expected.clone(),
                model.observed.clone(),
                model.varianceRatios.clone(),
                model.points);
        if (options.scaleByDispersion()) {
            inside = inside.dispersed(options.estimator());
        }
        return published(inside.widenedCovariance(), inside);
    }

    private static FringeFailure notDetermined() {
        return new FringeFailure(
                FringeFailure.Reason.NOT_DETERMINED,
                "The positions do not tell the parameters apart at the fitted values; use a simpler model.");
    }

    private boolean touchesBound() {
        double level = model.observedTotal() / model.points;
        for (int row = 0; row < model.rows; row++) {
            if (model.observed[row] == 0 && model.expected[row] <= 1e-6 * level) {
                return true;
            }
        }
        return false;
    }

    private void fillVariances() {
        for (int row = 0; row < model.rows; row++) {
            double ratio = model.varianceRatios[row];
            double expected = Math.max(model.expected[row], 0) * ratio;
            variances[row] = options.covariance() == CovarianceSort.OBSERVED ? observedVariance(row) * ratio : expected;
        }
    }

    private double observedVariance(int row) {
        double y = model.observed[row];
        return options.estimator() == Estimator.WEIGHTED_BY_COUNTS ? Math.max(y, 1) : y;
    }

    /** The weights of the estimating equations at the solution. */
    private void fillEstimating() {
        switch (options.estimator()) {
            case UNWEIGHTED -> java.util.Arrays.fill(estimating, 1);
            case WEIGHTED -> FringeFitter.byModel(model, estimating);
            case WEIGHTED_BY_COUNTS -> FringeFitter.byCounts(model, estimating);
            case POISSON_LIKELIHOOD -> {
                for (int row = 0; row < model.rows; row++) {
                    estimating[row] = onEdge ? 1 : 1 / model.expected[row];
                }
            }
        }
    }

    private double @Nullable [] covariance(double[] bread) {
        if (options.covariance() == CovarianceSort.RESIDUAL_SCATTER) {
            return residualScatter(bread);
        }
        if (options.estimator() == Estimator.POISSON_LIKELIHOOD && !onEdge) {
            if (options.covariance() == CovarianceSort.OBSERVED) {
                return observedInformation();
            }
            if (data.deadTime.sort() == DeadTime.Sort.NONE) {
                return bread;
            }
        }
        double[] squared = new double[model.rows];
        for (int row = 0; row < model.rows; row++) {
            squared[row] = estimating[row] * estimating[row] * variances[row];
        }
        return sandwich(bread, FringeFitter.weighted(model, squared, p), p);
    }

    static double[] sandwich(double[] bread, double[] filling, int p) {
        double[][] full = new double[p][p];
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                full[i][j] = bread[SymmetricMatrix.at(i, j)];
            }
        }
        return SymmetricMatrix.transform(full, filling);
    }

    private double[] residualScatter(double[] bread) {
        double sum = 0;
        for (int row = 0; row < model.rows; row++) {
            double residual = model.observed[row] - model.expected[row];
            sum += estimating[row] * residual * residual;
        }
        double[] covariance = bread.clone();
        scale(covariance, sum / (model.rows - p));
        return covariance;
    }

    static void scale(double[] matrix, double factor) {
        for (int k = 0; k < matrix.length; k++) {
            matrix[k] *= factor;
        }
    }

    /** Inverse of the negative second derivatives of the log likelihood; by differences of the score unless linear. */
    private double @Nullable [] observedInformation() {
        double[] matrix;
        if (model.linear()) {
            double[] weights = new double[model.rows];
            for (int row = 0; row < model.rows; row++) {
                double mu = model.expected[row];
                weights[row] = model.observed[row] / (mu * mu);
            }
            matrix = FringeFitter.weighted(model, weights, p);
        } else {
            matrix = differencedScore();
        }
        return SymmetricMatrix.factor(matrix, p, FringeSolver.SMALLEST_PIVOT)
                ? SymmetricMatrix.inverse(matrix, p)
                : null;
    }

    private double[] differencedScore() {
        double[] expected = FringeFitter.weighted(model, estimating, p);
        FringeSolver solver = new FringeSolver(model, FringeFitter.all(p));
        double[] matrix = new double[p * (p + 1) / 2];
        for (int j = 0; j < p; j++) {
            double step = 1e-4 / Math.sqrt(expected[SymmetricMatrix.at(j, j)]);
            double[] shifted = theta.clone();
            shifted[j] = theta[j] + step;
            double[] above = solver.score(shifted, null);
            shifted[j] = theta[j] - step;
            double[] below = solver.score(shifted, null);
            for (int i = 0; i < p; i++) {
                double slope = -(above[i] - below[i]) / (2 * step);
                matrix[SymmetricMatrix.at(i, j)] += i == j ? slope : 0.5 * slope;
            }
        }
        model.evaluate(theta);
        return matrix;
    }

    /** Adds what the uncertainty of a background taken as known does to the parameters, by implicit differentiation. */
    private void addBackground(double[] covariance, double[] bread) {
        if (!(model.knownBackgroundVariance > 0)) {
            return;
        }
        double[] pull = new double[p];
        for (int row = 0; row < model.rows; row++) {
            for (int j = 0; j < p; j++) {
                pull[j] += estimating[row] * model.slopes[row * p + j] * model.backgroundSlopes[row];
            }
        }
        double[] shift = new double[p];
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                shift[i] -= bread[SymmetricMatrix.at(i, j)] * pull[j];
            }
        }
        for (int i = 0; i < p; i++) {
            for (int j = 0; j <= i; j++) {
                covariance[SymmetricMatrix.at(i, j)] += shift[i] * shift[j] * model.knownBackgroundVariance;
            }
        }
    }

    private FringeFit published(double[] covariance, FringeFit.Inside inside) {
        double[] values = theta.clone();
        double[] changed = covariance;
        if (model.frequencyAt >= 0) {
            changed = SymmetricMatrix.transform(toOrigin(values), covariance);
        }
        return published(data, options, model.names(), values, changed, inside, onEdge);
    }

    private static FringeFit published(
            FringeData data,
            FringeOptions options,
            List<String> names,
            double[] values,
            double[] covariance,
            FringeFit.Inside inside,
            boolean onEdge) {
        int degrees = inside.observed().length - values.length;
        for (int j = 0; j < values.length; j++) {
            values[j] += 0.0;
        }
        return new FringeFit(
                data, options, names, values, covariance, inside, degrees, findings(values, onEdge, degrees));
    }

    private static List<FringeFit.Finding> findings(double[] values, boolean onEdge, int degrees) {
        boolean noSignal = !(values[0] > 0);
        boolean aboveOne = !noSignal && values[1] * values[1] + values[2] * values[2] > values[0] * values[0];
        if (!onEdge && !noSignal && !aboveOne && degrees > 0) {
            return List.of();
        }
        List<FringeFit.Finding> findings = new ArrayList<>();
        add(findings, onEdge, FringeFit.Finding.ON_EDGE);
        add(findings, noSignal, FringeFit.Finding.NO_SIGNAL);
        add(findings, aboveOne, FringeFit.Finding.ABOVE_ONE);
        add(findings, degrees == 0, FringeFit.Finding.NO_DEGREE_OF_FREEDOM);
        return List.copyOf(findings);
    }

    private static void add(List<FringeFit.Finding> findings, boolean holds, FringeFit.Finding finding) {
        if (holds) {
            findings.add(finding);
        }
    }

    /** The fit of a scan without background and dead time at a fixed period, from its minimum; keeps the arrays. */
    static FringeFit plain(
            FringeData data,
            FringeOptions options,
            double[] theta,
            double[] covariance,
            double[] expected,
            double[] observed) {
        FringeFit.Inside inside = plainInside(options, theta, covariance, expected, observed);
        return published(data, options, PLAIN_NAMES, theta.clone(), inside.widenedCovariance(), inside, false);
    }

    private static FringeFit.Inside plainInside(
            FringeOptions options, double[] theta, double[] covariance, double[] expected, double[] observed) {
        FringeFit.Inside inside =
                new FringeFit.Inside(theta, covariance, covariance, expected, observed, NO_RATIOS, observed.length);
        return options.scaleByDispersion() ? inside.dispersed(options.estimator()) : inside;
    }

    /** The fit of such a scan with the period free, its phase counted from the centre; keeps the arrays. */
    static FringeFit free(
            FringeData data,
            FringeOptions options,
            double[] theta,
            double[] covariance,
            double[] expected,
            double[] observed,
            double centre) {
        FringeFit.Inside inside = plainInside(options, theta, covariance, expected, observed);
        double[] values = theta.clone();
        double[][] change = identity(values.length);
        double middle = centre / options.period();
        double frequency = 1 + theta[3];
        rotate(theta, values, change, 1, 3, middle * frequency, 2 * Math.PI * middle);
        toPeriod(values, change, 3, options.period(), frequency);
        double[] changed = SymmetricMatrix.transform(change, inside.widenedCovariance());
        return published(data, options, FREE_NAMES, values, changed, inside, false);
    }

    /** Turns cosine and sine from the middle of the scan to position 0 and the frequency to a period; returns the slopes. */
    private double[][] toOrigin(double[] values) {
        double[][] change = identity(p);
        int at = model.frequencyAt;
        double frequency = 1 + theta[at];
        double middle = model.centre / options.period();
        rotate(theta, values, change, 1, at, middle * frequency, 2 * Math.PI * middle);
        if (model.harmonicAt >= 0) {
            rotate(theta, values, change, model.harmonicAt, at, 2 * middle * frequency, 4 * Math.PI * middle);
        }
        toPeriod(values, change, at, options.period(), frequency);
        return change;
    }

    private static double[][] identity(int p) {
        double[][] identity = new double[p][p];
        for (int j = 0; j < p; j++) {
            identity[j][j] = 1;
        }
        return identity;
    }

    private static void toPeriod(double[] values, double[][] change, int at, double start, double frequency) {
        values[at] = start / frequency;
        change[at][at] = -start / (frequency * frequency);
    }

    private static void rotate(
            double[] theta,
            double[] values,
            double[][] change,
            int at,
            int frequencyAt,
            double turns,
            double angleByFrequency) {
        double c = Turns.cos(turns);
        double s = Turns.sin(turns);
        double a = theta[at];
        double b = theta[at + 1];
        values[at] = a * c - b * s;
        values[at + 1] = a * s + b * c;
        change[at][at] = c;
        change[at][at + 1] = -s;
        change[at + 1][at] = s;
        change[at + 1][at + 1] = c;
        change[at][frequencyAt] = -values[at + 1] * angleByFrequency;
        change[at + 1][frequencyAt] = values[at] * angleByFrequency;
    }
}
