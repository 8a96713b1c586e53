package fringekeep.interferometry.farfield;

import fringekeep.interferometry.statistics.Distributions;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;
import java.util.function.DoubleBinaryOperator;

/**
 * Populations of diffraction orders from a profile: weighted linear least squares of one shape per order and a constant
 * background, with full covariance, and the populations as parts of their sum.
 *
 * @param lowest  lowest order fitted
 * @param highest highest order fitted
 */
public record OrderPopulations(int lowest, int highest) {
    /** Checks the range. */
    public OrderPopulations {
        if (highest < lowest) {
            throw new IllegalArgumentException("orders from " + lowest + " to " + highest + " are none");
        }
    }

    /**
     * The fit.
     *
     * @param amplitudes       strength of each order in units of its shape, lowest first
     * @param background       constant background
     * @param covariance       of amplitudes, then background; lower triangle by rows
     * @param populations      amplitudes over their sum, with uncertainties that take the correlations along
     * @param chiSquare        weighted sum of squares
     * @param degreesOfFreedom bins less parameters
     * @param pValue           probability of a larger chi-square
     */
    public record Result(
            double[] amplitudes,
            Estimate background,
            double[] covariance,
            Estimate[] populations,
            double chiSquare,
            int degreesOfFreedom,
            double pValue) {}

    /**
     * Fits.
     *
     * @param places        place of each bin (m)
     * @param values        profile
     * @param uncertainties standard uncertainty of each bin, &gt; 0; bins with an infinite one are left out
     * @param shape         shape of an order: (order, place) to intensity, known up to its strength
     * @return the fit; empty if the shapes cannot be told apart on these bins, or their strengths do not sum to a
     *     positive number
     */
    public Optional<Result> fit(double[] places, double[] values, double[] uncertainties, DoubleBinaryOperator shape) {
        int parameters = highest - lowest + 2;
        double[] normal = new double[parameters * (parameters + 1) / 2];
        double[] right = new double[parameters];
        double[] row = new double[parameters];
        int used = 0;
        for (int k = 0; k < places.length; k++) {
            if (uncertainties[k] < Double.POSITIVE_INFINITY) {
                fill(row, places[k], shape);
                accumulate(normal, right, row, values[k], uncertainties[k]);
                used++;
            }
        }
        double[] factors = normal.clone();
        if (used < parameters || !SymmetricMatrix.factor(factors, parameters, 1e-12)) {
            return Optional.empty();
        }
        SymmetricMatrix.solve(factors, parameters, right);
        double[] covariance = SymmetricMatrix.inverse(factors, parameters);
        double chiSquare = 0.0;
        for (int k = 0; k < places.length; k++) {
            if (uncertainties[k] < Double.POSITIVE_INFINITY) {
                fill(row, places[k], shape);
                double pull = (values[k] - dot(row, right)) / uncertainties[k];
                chiSquare += pull * pull;
            }
        }
        return result(right, covariance, chiSquare, used - parameters);
    }

    private void fill(double[] row, double place, DoubleBinaryOperator shape) {
        for (int order = lowest; order <= highest; order++) {
            row[order - lowest] = shape.applyAsDouble(order, place);
        }
        row[row.length - 1] = 1.0;
    }

    private static void accumulate(double[] normal, double[] right, double[] row, double value, double uncertainty) {
        double weight = 1.0 / (uncertainty * uncertainty);
        for (int i = 0; i < row.length; i++) {
            right[i] += weight * row[i] * value;
            for (int j = 0; j <= i; j++) {
                normal[SymmetricMatrix.at(i, j)] += weight * row[i] * row[j];
            }
        }
    }

    private static double dot(double[] a, double[] b) {
        double sum = 0.0;
        for (int k = 0; k < a.length; k++) {
            sum += a[k] * b[k];
        }
        return sum;
    }

    private Optional<Result> result(double[] solution, double[] covariance, double chiSquare, int freedom) {
        int orders = highest - lowest + 1;
        double total = 0.0;
        for (int k = 0; k < orders; k++) {
            total += solution[k];
        }
        if (!(total > 0.0)) {
            return Optional.empty();
        }
        Estimate[] populations = new Estimate[orders];
        for (int k = 0; k < orders; k++) {
            double[] slope = new double[orders + 1];
            for (int j = 0; j < orders; j++) {
                slope[j] = ((j == k ? 1.0 : 0.0) - solution[k] / total) / total;
            }
            double variance = Math.max(0.0, SymmetricMatrix.form(covariance, slope));
            populations[k] = new Estimate(solution[k] / total, Math.sqrt(variance));
        }
        Estimate background = new Estimate(solution[orders], Math.sqrt(covariance[SymmetricMatrix.at(orders, orders)]));
        double pValue = freedom > 0 ? Distributions.chiSquareUpper(chiSquare, freedom) : 1.0;
        return Optional.of(new Result(
                java.util.Arrays.copyOf(solution, orders),
                background,
                covariance,
                populations,
                chiSquare,
                freedom,
                pValue));
    }
}
