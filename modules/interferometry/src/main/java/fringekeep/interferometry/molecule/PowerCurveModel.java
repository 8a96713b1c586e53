package fringekeep.interferometry.molecule;

import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/**
 * V(P) = factor |2 S_1/S_0| for the solver: parameters are the polarizability volume, then, where free, cross section
 * and factor. A known polarizability is one more point of the data. A workspace: one thread at a time.
 */
final class PowerCurveModel implements CurveModel {
    private final VisibilityAgainstPower model;
    private final PowerCurveChoices choices;
    private final MeasuredCurve data;
    private final int points;
    private final double[] powers;
    private final double[] signed;
    private final double[] slopes;

    PowerCurveModel(VisibilityAgainstPower model, PowerCurveChoices choices, MeasuredCurve measured) {
        this.model = model;
        this.choices = choices;
        this.points = measured.size();
        this.data = choices.known().map(known -> extended(measured, known)).orElse(measured);
        this.powers = new double[points];
        for (int k = 0; k < points; k++) {
            powers[k] = measured.place(k);
        }
        this.signed = new double[points];
        this.slopes = new double[points];
    }

    private static MeasuredCurve extended(MeasuredCurve measured, Estimate known) {
        int n = measured.size();
        double[] places = new double[n + 1];
        double[] values = new double[n + 1];
        double[] uncertainties = new double[n + 1];
        for (int k = 0; k < n; k++) {
            places[k] = measured.place(k);
            values[k] = measured.value(k);
            uncertainties[k] = measured.uncertainty(k);
        }
        values[n] = known.value();
        uncertainties[n] = known.standardUncertainty();
        return new MeasuredCurve(places, values, uncertainties);
    }

    /** The measured points, with the known polarizability as the last where there is one. */
    MeasuredCurve data() {
        return data;
    }

    VisibilityAgainstPower visibility() {
        return model;
    }

    static List<Parameter> parameters(PowerCurveChoices choices) {
        List<Parameter> parameters = new ArrayList<>();
        parameters.add(Parameter.POLARIZABILITY_VOLUME);
        if (choices.fitCrossSection()) {
            parameters.add(Parameter.ABSORPTION_CROSS_SECTION);
        }
        if (choices.fitFactor()) {
            parameters.add(Parameter.VISIBILITY_FACTOR);
        }
        return parameters;
    }

    @Override
    public int parameters() {
        return 1 + (choices.fitCrossSection() ? 1 : 0) + (choices.fitFactor() ? 1 : 0);
    }

    double crossSection(double[] parameters) {
        return choices.fitCrossSection() ? parameters[1] : choices.crossSection();
    }

    double factor(double[] parameters) {
        return choices.fitFactor() ? parameters[parameters.length - 1] : choices.factor();
    }

    boolean phaseOnly() {
        return !choices.fitCrossSection() && choices.crossSection() == 0.0;
    }

    @Override
    public void evaluate(double[] parameters, double[] values, double[][] jacobian) {
        if (phaseOnly()) {
            evaluatePhaseOnly(parameters, values, jacobian);
        } else {
            evaluateAbsorbing(parameters, values, jacobian);
        }
        if (data.size() > points) {
            values[points] = parameters[0];
            jacobian[points][0] = 1.0;
        }
    }

    private void evaluatePhaseOnly(double[] parameters, double[] values, double[][] jacobian) {
        double factor = factor(parameters);
        model.phaseOnlyCurve(powers, parameters[0], signed, slopes);
        for (int k = 0; k < points; k++) {
            double sign = signed[k] < 0.0 ? -1.0 : 1.0;
            values[k] = factor * sign * signed[k];
            jacobian[k][0] = factor * sign * slopes[k];
            if (choices.fitFactor()) {
                jacobian[k][1] = sign * signed[k];
            }
        }
    }

    private void evaluateAbsorbing(double[] parameters, double[] values, double[][] jacobian) {
        double factor = factor(parameters);
        OpticalResponse response = new OpticalResponse(parameters[0], crossSection(parameters));
        for (int k = 0; k < points; k++) {
            VisibilityAgainstPower.Point point = model.point(powers[k], response);
            double sign = point.signed() < 0.0 ? -1.0 : 1.0;
            values[k] = factor * sign * point.signed();
            jacobian[k][0] = factor * sign * point.byPolarizability();
            if (choices.fitCrossSection()) {
                jacobian[k][1] = factor * sign * point.byCrossSection();
            }
            if (choices.fitFactor()) {
                jacobian[k][parameters.length - 1] = sign * point.signed();
            }
        }
    }

    /** The shape |2 S_1/S_0| at the measured powers. */
    double[] shape(double volume, double crossSection) {
        OpticalResponse response = new OpticalResponse(volume, crossSection);
        double[] shape = new double[points];
        for (int k = 0; k < points; k++) {
            shape[k] = model.visibility(data.place(k), response);
        }
        return shape;
    }

    /** The shape along a ray of one ratio of absorption to polarizability. */
    double[] shape(DoubleUnaryOperator ray, double volume) {
        double[] shape = new double[points];
        for (int k = 0; k < points; k++) {
            shape[k] = Math.abs(ray.applyAsDouble(volume * data.place(k)));
        }
        return shape;
    }

    int points() {
        return points;
    }

    double largestPower() {
        return data.largestPlace();
    }
}
