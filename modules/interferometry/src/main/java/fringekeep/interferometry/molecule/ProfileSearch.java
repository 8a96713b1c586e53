package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Interval;
import fringekeep.interferometry.statistics.ScalarSearch;
import java.util.Optional;

/**
 * Profile-likelihood intervals: where the weighted sum of squares, minimised over all other parameters, has risen by
 * the square of the normal deviate of the level.
 *
 * <p>Source: G. Cowan, Statistical Data Analysis (1998), section 9.7; the rise is exact for Gaussian data and
 * asymptotic for a curved model.
 */
final class ProfileSearch {
    private static final int MOST_DOUBLINGS = 40;

    private final CurveModel model;
    private final MeasuredCurve data;
    private final double[] best;
    private final double lowestSquare;
    private final int index;
    private double[] others;

    ProfileSearch(CurveModel model, MeasuredCurve data, KinkedCurveFitter.Minimum best, int index) {
        this.model = model;
        this.data = data;
        this.best = best.parameters();
        this.lowestSquare = best.chiSquare();
        this.index = index;
        this.others = without(this.best);
    }

    /** The interval; an end that is not reached within 40 doublings of the step is infinite. */
    Interval interval(double level, double standardUncertainty) {
        double deviate = Distributions.twoSidedDeviate(level);
        double rise = deviate * deviate;
        double low = end(rise, -deviate * standardUncertainty);
        double high = end(rise, deviate * standardUncertainty);
        return new Interval(level, low, high);
    }

    private double end(double rise, double step) {
        others = without(best);
        double inside = best[index];
        double reach = step;
        for (int k = 0; k < MOST_DOUBLINGS; k++) {
            double outside = best[index] + reach;
            double excess = excess(outside);
            if (excess >= rise) {
                return ScalarSearch.root(x -> excess(x) - rise, inside, outside, 1e-9 * Math.abs(step));
            }
            inside = outside;
            reach *= 1.5;
        }
        return step < 0.0 ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
    }

    private double excess(double value) {
        if (best.length == 1) {
            double[] one = {value};
            return squareAt(one) - lowestSquare;
        }
        KinkedCurveFitter fitter = new KinkedCurveFitter(new Held(value), data);
        Optional<KinkedCurveFitter.Minimum> minimum = fitter.minimum(others);
        if (minimum.isEmpty()) {
            return Double.POSITIVE_INFINITY;
        }
        others = minimum.get().parameters();
        return minimum.get().chiSquare() - lowestSquare;
    }

    private double squareAt(double[] parameters) {
        double[] values = new double[data.size()];
        model.evaluate(parameters, values, new double[data.size()][parameters.length]);
        double sum = 0.0;
        for (int k = 0; k < values.length; k++) {
            double pull = (data.value(k) - values[k]) / data.uncertainty(k);
            sum += pull * pull;
        }
        return sum;
    }

    private double[] without(double[] all) {
        double[] rest = new double[all.length - 1];
        for (int k = 0; k < rest.length; k++) {
            rest[k] = all[k < index ? k : k + 1];
        }
        return rest;
    }

    /** The model with one parameter held. */
    private final class Held implements CurveModel {
        private final double value;
        private final double[][] full = new double[data.size()][best.length];

        Held(double value) {
            this.value = value;
        }

        @Override
        public int parameters() {
            return best.length - 1;
        }

        @Override
        public void evaluate(double[] parameters, double[] values, double[][] jacobian) {
            double[] all = new double[best.length];
            for (int k = 0; k < all.length; k++) {
                all[k] = k == index ? value : parameters[k < index ? k : k - 1];
            }
            model.evaluate(all, values, full);
            for (int row = 0; row < jacobian.length; row++) {
                for (int k = 0; k < parameters.length; k++) {
                    jacobian[row][k] = full[row][k < index ? k : k + 1];
                }
            }
        }
    }
}
