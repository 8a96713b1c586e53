package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;

/**
 * Weighted least squares of a curve with few parameters whose modulus makes kinks: damped Gauss-Newton steps in
 * parameters scaled by their own curvature, then undamped polishing, so that the answer is the minimum to rounding.
 *
 * <p>Beside the general {@link fringekeep.interferometry.statistics.CurveFitter} because a visibility |S_1| has a kink
 * wherever the fringe changes sign: there the general fitter rightly refuses, this one stops at the kink and says so. It
 * also keeps its arrays, which makes a bootstrap of thousands of fits a matter of milliseconds.
 *
 * <p>Source: D. W. Marquardt, J. Soc. Indust. Appl. Math. 11, 431 (1963), with the diagonal as scale.
 */
final class KinkedCurveFitter {
    private static final int MAXIMUM_STEPS = 300;
    private static final double SMALLEST_PIVOT = 1e-11;
    private static final double FINISHED = 1e-9;
    private static final double LARGEST_DAMPING = 1e12;

    private final CurveModel model;
    private final MeasuredCurve data;
    private final int count;
    private final double[] values;
    private final double[][] jacobian;
    private final double[] scale;
    private final double[] gradient;
    private final double[] normal;
    /** Fall of the sum of squares that the last step promised if the model were linear. */
    private double promised;

    KinkedCurveFitter(CurveModel model, MeasuredCurve data) {
        this.model = model;
        this.data = data;
        this.count = model.parameters();
        this.values = new double[data.size()];
        this.jacobian = new double[data.size()][count];
        this.scale = new double[count];
        this.gradient = new double[count];
        this.normal = new double[count * (count + 1) / 2];
    }

    /** Where the iteration ended; smooth is false if it stopped at a kink of the model. */
    record Minimum(double[] parameters, double chiSquare, boolean smooth) {}

    /** Finds the minimum next to a start; empty if the steps come to no end or a parameter has no effect. */
    Optional<Minimum> minimum(double[] start) {
        double[] here = start.clone();
        double chiSquare = evaluate(here);
        double damping = 1e-3;
        for (int step = 0; step < MAXIMUM_STEPS; step++) {
            if (!Double.isFinite(chiSquare) || !assemble()) {
                return Optional.empty();
            }
            double before = chiSquare;
            double[] next = here;
            double length = Double.POSITIVE_INFINITY;
            boolean better = false;
            while (!better && damping < LARGEST_DAMPING) {
                double[] trial = here.clone();
                length = move(trial, damping);
                double trialSquare = evaluate(trial);
                better = trialSquare < before;
                if (better) {
                    next = trial;
                    chiSquare = trialSquare;
                    damping = adjusted(damping, (before - trialSquare) / promised);
                } else if (length < FINISHED) {
                    return Optional.of(polished(here));
                } else {
                    damping *= 10.0;
                }
            }
            if (!better) {
                return Optional.of(new Minimum(here, before, false));
            }
            // The accepted trial was the last point evaluated, so its slopes are at hand for the next step.
            here = next;
            if (length < FINISHED) {
                return Optional.of(polished(here));
            }
        }
        return Optional.empty();
    }

    /** Less damping after a step that kept its promise, more after one that did not: no bouncing across a valley. */
    private static double adjusted(double damping, double gain) {
        if (gain < 0.25) {
            return Math.max(10.0 * damping, 1e-3);
        }
        return gain > 0.75 ? Math.max(0.1 * damping, 1e-12) : damping;
    }

    /** Undamped steps while they stay small: they reach the root of the gradient to rounding. */
    private Minimum polished(double[] here) {
        double[] polished = here;
        double shortest = 1e-3;
        for (int step = 0; step < 4; step++) {
            evaluate(polished);
            double[] trial = polished.clone();
            double length = assemble() ? move(trial, 0.0) : Double.POSITIVE_INFINITY;
            if (!(length < shortest)) {
                break;
            }
            shortest = 1e-6;
            polished = trial;
            if (length < 1e-11) {
                break;
            }
        }
        return new Minimum(polished, evaluate(polished), true);
    }

    /** Covariance at a point, packed; empty if the data leave a combination of parameters open. */
    Optional<double[]> covariance(double[] at) {
        evaluate(at);
        if (!assemble()) {
            return Optional.empty();
        }
        double[] factors = normal.clone();
        if (!SymmetricMatrix.factor(factors, count, SMALLEST_PIVOT)) {
            return Optional.empty();
        }
        double[] inverse = SymmetricMatrix.inverse(factors, count);
        for (int i = 0; i < count; i++) {
            for (int j = 0; j <= i; j++) {
                inverse[SymmetricMatrix.at(i, j)] /= scale[i] * scale[j];
            }
        }
        return Optional.of(inverse);
    }

    /** The curve at a point. */
    double[] curve(double[] at) {
        model.evaluate(at, values, jacobian);
        return values.clone();
    }

    private double evaluate(double[] at) {
        model.evaluate(at, values, jacobian);
        double sum = 0.0;
        for (int k = 0; k < values.length; k++) {
            double pull = (data.value(k) - values[k]) / data.uncertainty(k);
            sum = Math.fma(pull, pull, sum);
        }
        return sum;
    }

    /** Normal equations scaled to a unit diagonal; false if a parameter has no effect. */
    private boolean assemble() {
        java.util.Arrays.fill(gradient, 0.0);
        java.util.Arrays.fill(normal, 0.0);
        for (int k = 0; k < values.length; k++) {
            double weight = 1.0 / data.uncertainty(k);
            double pull = (data.value(k) - values[k]) * weight;
            for (int i = 0; i < count; i++) {
                double slope = jacobian[k][i] * weight;
                gradient[i] = Math.fma(slope, pull, gradient[i]);
                for (int j = 0; j <= i; j++) {
                    int at = SymmetricMatrix.at(i, j);
                    normal[at] = Math.fma(slope, jacobian[k][j] * weight, normal[at]);
                }
            }
        }
        return rescale();
    }

    private boolean rescale() {
        for (int i = 0; i < count; i++) {
            scale[i] = Math.sqrt(normal[SymmetricMatrix.at(i, i)]);
            if (!(scale[i] > 0.0 && scale[i] < Double.POSITIVE_INFINITY)) {
                return false;
            }
        }
        for (int i = 0; i < count; i++) {
            gradient[i] /= scale[i];
            for (int j = 0; j <= i; j++) {
                normal[SymmetricMatrix.at(i, j)] /= scale[i] * scale[j];
            }
        }
        return true;
    }

    /** Moves by one damped step and returns its length in scaled parameters (about standard uncertainties). */
    private double move(double[] parameters, double damping) {
        double[] factors = normal.clone();
        for (int i = 0; i < count; i++) {
            factors[SymmetricMatrix.at(i, i)] += damping;
        }
        if (!SymmetricMatrix.factor(factors, count, 1e-15)) {
            return Double.POSITIVE_INFINITY;
        }
        double[] step = gradient.clone();
        SymmetricMatrix.solve(factors, count, step);
        double longest = 0.0;
        promised = 0.0;
        for (int i = 0; i < count; i++) {
            parameters[i] += step[i] / scale[i];
            promised += step[i] * (gradient[i] + damping * step[i]);
            longest = Math.max(longest, Math.abs(step[i]));
        }
        return longest;
    }
}
