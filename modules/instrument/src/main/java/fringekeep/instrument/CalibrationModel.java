package fringekeep.instrument;

import java.util.List;
import java.util.Optional;

/** How a calibration turns a reading x into a true value. */
public enum CalibrationModel {
    /** The parameter takes the place of the reading. */
    VALUE("calibration.value/1", List.of("value")),
    /** scale &middot; x. */
    SCALE("calibration.scale/1", List.of("scale")),
    /** x + offset. */
    OFFSET("calibration.offset/1", List.of("offset")),
    /** offset + scale &middot; x. */
    OFFSET_SCALE("calibration.offset-scale/1", List.of("offset", "scale")),
    /** offset + scale &middot; x + curvature &middot; x&sup2;. */
    QUADRATIC("calibration.quadratic/1", List.of("offset", "scale", "curvature"));

    private final String method;
    private final List<String> parameters;

    CalibrationModel(String method, List<String> parameters) {
        this.method = method;
        this.parameters = parameters;
    }

    /** Method id. */
    public String method() {
        return method;
    }

    /** Names of its parameters, in the order of a record. */
    public List<String> parameters() {
        return parameters;
    }

    /** Value at a reading; parameters in the order of {@link #parameters()}. */
    double value(double[] p, double x) {
        return switch (this) {
            case VALUE -> p[0];
            case SCALE -> p[0] * x;
            case OFFSET -> x + p[0];
            case OFFSET_SCALE -> p[0] + p[1] * x;
            case QUADRATIC -> p[0] + x * (p[1] + p[2] * x);
        };
    }

    /** Derivative with respect to the reading. */
    double slope(double[] p, double x) {
        return switch (this) {
            case VALUE -> 0;
            case SCALE -> p[0];
            case OFFSET -> 1;
            case OFFSET_SCALE -> p[1];
            case QUADRATIC -> p[1] + 2 * p[2] * x;
        };
    }

    /** Derivatives with respect to the parameters. */
    double[] gradient(double x) {
        return switch (this) {
            case VALUE, OFFSET -> new double[] {1};
            case SCALE -> new double[] {x};
            case OFFSET_SCALE -> new double[] {1, x};
            case QUADRATIC -> new double[] {1, x, x * x};
        };
    }

    static Optional<CalibrationModel> of(String method) {
        for (CalibrationModel model : values()) {
            if (model.method.equals(method)) {
                return Optional.of(model);
            }
        }
        return Optional.empty();
    }
}
