package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Arrays;
import java.util.Optional;

/**
 * Weighted least squares of a curve with few parameters whose modulus makes kinks: damped Gauss-Newton steps in
 * parameters scaled by their own curvature, then undamped polishing, so that the answer is the minimum to rounding.
 *
 * <p>Beside the general {@link fringekeep.interferometry.statistics.CurveFitter} because a visibility |S_1| has a kink
 * wherever the fringe changes sign: there the general fitter rightly refuses, this one stops at the kink and says so. It
 * also keeps its arrays and the curve at the start, which makes a bootstrap of thousands of fits a matter of milliseconds.
 * A workspace: one thread at a time.
 *
 * <p>Source: D. W. Marquardt, J. Soc. Indust. Appl. Math. 11, 431 (1963), with the diagonal as scale.
 */
final class KinkedCurveFitter {
    private static final int MAXIMUM_STEPS = 300;
    private static final double SMALLEST_PIVOT = 1e-11;
    private static final double FINISHED = 1e-9;
    private static final double LARGEST_DAMPING = 1e12;

    private final CurveModel model;
    private final int count;
    private final double[] observed;
    private final double[] uncertainties;
    private final double[] weights;
    private final double[] values;
    private final double[] pulls;
    private final double[][] jacobian;
    private final double[] scale;
    private final double[] gradient;
    private final double[] normal;
    private final double[] factors;
    private final double[] step;
    private final Start start = new Start();
    /** Where values and slopes were computed last; an array that is not written to afterwards. */
    private double[] evaluatedAt = new double[0];
    /** Fall of the sum of squares that the last step promised if the model were linear. */
    private double promised;

    KinkedCurveFitter(CurveModel model, MeasuredCurve data) {
        int points = data.size();
        this.model = model;
        this.count = model.parameters();
        this.observed = new double[points];
        this.uncertainties = new double[points];
        this.weights = new double[points];
        for (int k = 0; k < points; k++) {
            observed[k] = data.value(k);
            uncertainties[k] = data.uncertainty(k);
            weights[k] = 1.0 / uncertainties[k];
        }
        this.values = new double[points];
        this.pulls = new double[points];
        this.jacobian = new double[points][count];
        this.scale = new double[count];
        this.gradient = new double[count];
        this.normal = new double[count * (count + 1) / 2];
        this.factors = new double[normal.length];
        this.step = new double[count];
    }

    /** Puts other values in the place of the measured ones, for resampling. */
    void observe(double[] others) {
        System.arraycopy(others, 0, observed, 0, observed.length);
    }

    /** Where the iteration ended; smooth is false if it stopped at a kink of the model. */
    record Minimum(double[] parameters, double chiSquare, boolean smooth) {}

    /** Finds the minimum next to a start; empty if the steps come to no end or a parameter has no effect. */
    Optional<Minimum> minimum(double[] from) {
        return end(from).map(end -> new Minimum(end.place, square(end.place), end.smooth));
    }

    /** The place of the minimum alone. */
    Optional<double[]> place(double[] from) {
        return end(from).map(End::place);
    }

    private record End(double[] place, boolean smooth) {}

    private Optional<End> end(double[] from) {
        double[] here = from.clone();
        start.visit(here);
        double chiSquare = square(here);
        double damping = 1e-3;
        for (int round = 0; round < MAXIMUM_STEPS; round++) {
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
                double trialSquare = square(trial);
                better = trialSquare < before;
                if (better) {
                    next = trial;
                    chiSquare = trialSquare;
                    damping = adjusted(damping, (before - trialSquare) / promised);
                } else if (length < FINISHED) {
                    return Optional.of(new End(polished(here), true));
                } else {
                    damping *= 10.0;
                }
            }
            if (!better) {
                return Optional.of(new End(here, false));
            }
            // The accepted trial was the last point evaluated, so its slopes are at hand for the next step.
            here = next;
            if (length < FINISHED) {
                return Optional.of(new End(polished(here), true));
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
    private double[] polished(double[] here) {
        double[] polished = here;
        double shortest = 1e-3;
        for (int round = 0; round < 4; round++) {
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
        return polished;
    }

    /** Covariance at a point, packed; empty if the data leave a combination of parameters open. */
    Optional<double[]> covariance(double[] at) {
        evaluate(at);
        if (!assemble()) {
            return Optional.empty();
        }
        System.arraycopy(normal, 0, factors, 0, normal.length);
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
        evaluate(at);
        return values.clone();
    }

    private void evaluate(double[] at) {
        if (!Arrays.equals(at, evaluatedAt)) {
            model.evaluate(at, values, jacobian);
            evaluatedAt = at;
        }
    }

    /** The sum of weighted squares at a place that is not written to afterwards. */
    private double square(double[] at) {
        evaluate(at);
        for (int k = 0; k < values.length; k++) {
            pulls[k] = (observed[k] - values[k]) / uncertainties[k];
        }
        double sum = 0.0;
        for (double pull : pulls) {
            sum = Math.fma(pull, pull, sum);
        }
        return sum;
    }

    /** Curve and slopes at the last start: thousands of resamples begin at one place. */
    private final class Start {
        private double[] place = new double[0];
        private double[] curve = new double[0];
        private double[][] slopes = new double[0][];

        void visit(double[] here) {
            if (Arrays.equals(here, place)) {
                System.arraycopy(curve, 0, values, 0, values.length);
                for (int k = 0; k < slopes.length; k++) {
                    System.arraycopy(slopes[k], 0, jacobian[k], 0, count);
                }
                evaluatedAt = here;
                return;
            }
            evaluate(here);
            place = here;
            curve = values.clone();
            slopes = new double[jacobian.length][];
            for (int k = 0; k < slopes.length; k++) {
                slopes[k] = jacobian[k].clone();
            }
        }
    }

    /** Normal equations scaled to a unit diagonal; false if a parameter has no effect. */
    private boolean assemble() {
        if (count == 1) {
            assembleOne();
            return rescale();
        }
        Arrays.fill(gradient, 0.0);
        Arrays.fill(normal, 0.0);
        for (int k = 0; k < values.length; k++) {
            double weight = weights[k];
            double pull = (observed[k] - values[k]) * weight;
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

    private void assembleOne() {
        double pulled = 0.0;
        double squared = 0.0;
        for (int k = 0; k < values.length; k++) {
            double slope = jacobian[k][0] * weights[k];
            pulled = Math.fma(slope, (observed[k] - values[k]) * weights[k], pulled);
            squared = Math.fma(slope, slope, squared);
        }
        gradient[0] = pulled;
        normal[0] = squared;
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
        System.arraycopy(normal, 0, factors, 0, normal.length);
        for (int i = 0; i < count; i++) {
            factors[SymmetricMatrix.at(i, i)] += damping;
        }
        if (!SymmetricMatrix.factor(factors, count, 1e-15)) {
            return Double.POSITIVE_INFINITY;
        }
        System.arraycopy(gradient, 0, step, 0, count);
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
