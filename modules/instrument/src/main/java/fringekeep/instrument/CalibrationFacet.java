package fringekeep.instrument;

import java.time.Instant;
import java.util.Optional;

/**
 * What later stages ask a calibration for: a pure function of readings.
 *
 * @param target what is calibrated; readings and true values are in its SI unit
 * @param model how
 * @param parameters in the order of the model (SI)
 * @param covariance of the parameters, lower triangle by rows
 * @param from first instant at which it holds
 * @param to first instant at which it holds no longer; absent while it lasts
 * @param subject which device is meant, where there are several of a sort
 */
public record CalibrationFacet(
        CalibrationTarget target,
        CalibrationModel model,
        double[] parameters,
        double[] covariance,
        Instant from,
        Optional<Instant> to,
        Optional<String> subject) {
    /** Copies and checks lengths. */
    public CalibrationFacet {
        parameters = parameters.clone();
        covariance = covariance.clone();
        int n = model.parameters().size();
        if (parameters.length != n || covariance.length != n * (n + 1) / 2) {
            throw new IllegalArgumentException(
                    model + " with " + parameters.length + " parameters, " + covariance.length + " covariances");
        }
    }

    @Override
    public double[] parameters() {
        return parameters.clone();
    }

    @Override
    public double[] covariance() {
        return covariance.clone();
    }

    /** Standard uncertainty of a parameter by its place (SI). */
    public double deviation(int parameter) {
        return Math.sqrt(covariance[parameter * (parameter + 1) / 2 + parameter]);
    }

    /** Whether it holds at an instant. */
    public boolean holds(Instant at) {
        return !at.isBefore(from) && (to.isEmpty() || at.isBefore(to.get()));
    }

    /**
     * The true value for a reading, with all that is needed to carry uncertainties on.
     *
     * <p>Source: law of propagation of uncertainty with correlated inputs, JCGM 100:2008 (GUM), 5.2.2, equation (13).
     *
     * @param reading in the target's SI unit; left aside by the model {@link CalibrationModel#VALUE}
     */
    public Calibrated apply(double reading) {
        double[] gradient = model.gradient(reading);
        double variance = 0;
        for (int i = 0; i < gradient.length; i++) {
            for (int j = 0; j < gradient.length; j++) {
                int row = Math.max(i, j);
                variance += gradient[i] * gradient[j] * covariance[row * (row + 1) / 2 + Math.min(i, j)];
            }
        }
        return new Calibrated(
                model.value(parameters, reading),
                model.slope(parameters, reading),
                gradient,
                Math.sqrt(Math.max(0, variance)));
    }

    /**
     * A calibrated value.
     *
     * @param value true value (SI)
     * @param slope derivative with respect to the reading
     * @param gradient derivatives with respect to the parameters, in the model's order
     * @param deviation standard uncertainty of the value from the parameters alone (SI)
     */
    public record Calibrated(double value, double slope, double[] gradient, double deviation) {
        /** Copies. */
        public Calibrated {
            gradient = gradient.clone();
        }

        @Override
        public double[] gradient() {
            return gradient.clone();
        }
    }
}
