package fringekeep.interferometry.fringe;

import fringekeep.interferometry.statistics.PoissonDeviance;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** From a found minimum to the published fit: covariance, change of variables, goodness of fit. */
final class FringeFitAssembly {
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
        int degrees = model.rows - p;
        double pearson = pearson();
        double dispersion = degrees > 0 ? pearson / degrees : 1;
        if (options.scaleByDispersion() && dispersion > 1) {
            for (int k = 0; k < covariance.length; k++) {
                covariance[k] *= dispersion;
            }
        }
        return published(covariance, plain, degrees, pearson);
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
        for (int k = 0; k < covariance.length; k++) {
            covariance[k] *= sum / (model.rows - p);
        }
        return covariance;
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

    private double pearson() {
        double sum = 0;
        for (int row = 0; row < model.rows; row++) {
            double residual = model.observed[row] - model.expected[row];
            double variance = options.estimator() == Estimator.WEIGHTED_BY_COUNTS
                    ? Math.max(model.observed[row], 1)
                    : model.expected[row] * model.varianceRatios[row];
            if (residual != 0) {
                sum += variance > 0 ? residual * residual / variance : 0;
            }
        }
        return sum;
    }

    private double deviance() {
        double sum = 0;
        for (int row = 0; row < model.rows; row++) {
            sum += PoissonDeviance.term(model.observed[row], Math.max(model.expected[row], 0));
        }
        return sum;
    }

    private FringeFit published(double[] covariance, double[] plain, int degrees, double pearson) {
        double[] values = theta.clone();
        double[] changed = covariance;
        if (model.frequencyAt >= 0) {
            double[][] change = toOrigin(values);
            changed = SymmetricMatrix.transform(change, covariance);
        }
        for (int j = 0; j < values.length; j++) {
            values[j] += 0.0;
        }
        List<FringeFit.Finding> findings = new ArrayList<>();
        if (onEdge) {
            findings.add(FringeFit.Finding.ON_EDGE);
        }
        if (!(values[0] > 0)) {
            findings.add(FringeFit.Finding.NO_SIGNAL);
        } else if (values[1] * values[1] + values[2] * values[2] > values[0] * values[0]) {
            findings.add(FringeFit.Finding.ABOVE_ONE);
        }
        if (degrees == 0) {
            findings.add(FringeFit.Finding.NO_DEGREE_OF_FREEDOM);
        }
        return new FringeFit(
                data,
                options,
                model.names(),
                values,
                changed,
                new FringeFit.Inside(
                        theta.clone(),
                        new HarmonicEstimate(theta[0], theta[1], theta[2], java.util.Arrays.copyOf(plain, 6)),
                        new HarmonicEstimate(theta[0], theta[1], theta[2], java.util.Arrays.copyOf(covariance, 6)),
                        model.expected.clone(),
                        model.observed.clone(),
                        model.points),
                degrees,
                pearson,
                deviance(),
                List.copyOf(findings));
    }

    /** Turns cosine and sine from the middle of the scan to position 0 and the frequency to a period; returns the slopes. */
    private double[][] toOrigin(double[] values) {
        double[][] change = new double[p][p];
        for (int j = 0; j < p; j++) {
            change[j][j] = 1;
        }
        double frequency = 1 + theta[model.frequencyAt];
        double middle = model.centre / options.period();
        rotate(values, change, 1, middle * frequency, 2 * Math.PI * middle);
        if (model.harmonicAt >= 0) {
            rotate(values, change, model.harmonicAt, 2 * middle * frequency, 4 * Math.PI * middle);
        }
        values[model.frequencyAt] = options.period() / frequency;
        change[model.frequencyAt][model.frequencyAt] = -options.period() / (frequency * frequency);
        return change;
    }

    private void rotate(double[] values, double[][] change, int at, double turns, double angleByFrequency) {
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
        change[at][model.frequencyAt] = -values[at + 1] * angleByFrequency;
        change[at + 1][model.frequencyAt] = values[at] * angleByFrequency;
    }
}
