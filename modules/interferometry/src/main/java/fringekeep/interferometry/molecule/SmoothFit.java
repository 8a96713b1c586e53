package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.CurveFit;
import fringekeep.interferometry.statistics.CurveFitOutcome;
import fringekeep.interferometry.statistics.CurveFitter;
import fringekeep.interferometry.statistics.ParametricModel;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Fit of a smooth curve with one minimum from a given start: the common end of the simple property fits. */
final class SmoothFit {
    private static final double POOR = 1e-3;

    private SmoothFit() {}

    static FitOutcome fit(CurveModel model, MeasuredCurve data, double[] start, List<Parameter> parameters) {
        double[] values = new double[data.size()];
        double[] uncertainties = new double[data.size()];
        for (int k = 0; k < values.length; k++) {
            values[k] = data.value(k);
            uncertainties[k] = data.uncertainty(k);
        }
        double[] ones = new double[start.length];
        Arrays.fill(ones, 1.0);
        CurveFitOutcome outcome =
                CurveFitter.squares(new Scaled(model, data.size(), start), values, uncertainties, ones);
        if (outcome instanceof CurveFitOutcome.Failure failure) {
            return new FitRefused(reason(failure.reason()), failure.words() + " Fitted were " + parameters + ".");
        }
        PropertyFit fit = new PropertyFit(parameters, unscaled((CurveFit) outcome, start), data, List.of());
        return fit.withWarnings(warnings(fit));
    }

    private static FitRefused.Reason reason(CurveFitOutcome.Reason reason) {
        return switch (reason) {
            case TOO_FEW_POINTS -> FitRefused.Reason.TOO_FEW_POINTS;
            case NOT_DETERMINED -> FitRefused.Reason.NOT_DETERMINED;
            case BAD_START, NO_CONVERGENCE -> FitRefused.Reason.NOT_CONVERGED;
        };
    }

    private static PropertyFit.Solution unscaled(CurveFit fit, double[] units) {
        double[] values = fit.values();
        double[] covariance = fit.covariance();
        for (int i = 0; i < values.length; i++) {
            values[i] *= units[i];
            for (int j = 0; j <= i; j++) {
                covariance[SymmetricMatrix.at(i, j)] *= units[i] * units[j];
            }
        }
        return new PropertyFit.Solution(values, covariance, fit.expected(), fit.objective());
    }

    /** The model in units of the start, so that a cross section of 1e-21 is a number near one. */
    private static final class Scaled implements ParametricModel {
        private final CurveModel model;
        private final int points;
        private final double[] units;
        private final double[][] jacobian;

        Scaled(CurveModel model, int points, double[] units) {
            this.model = model;
            this.points = points;
            this.units = units.clone();
            this.jacobian = new double[points][units.length];
        }

        @Override
        public int parameters() {
            return units.length;
        }

        @Override
        public int points() {
            return points;
        }

        @Override
        public boolean evaluate(double[] theta, double[] values, double[] slopes) {
            double[] parameters = theta.clone();
            for (int j = 0; j < units.length; j++) {
                parameters[j] *= units[j];
            }
            model.evaluate(parameters, values, jacobian);
            boolean finite = true;
            for (int k = 0; k < points; k++) {
                finite &= Double.isFinite(values[k]);
                for (int j = 0; j < units.length; j++) {
                    slopes[k * units.length + j] = jacobian[k][j] * units[j];
                }
            }
            return finite;
        }
    }

    private static List<FitWarning> warnings(PropertyFit fit) {
        List<FitWarning> warnings = new ArrayList<>();
        if (fit.pValue() < POOR) {
            warnings.add(new FitWarning(
                    FitWarning.Sort.POOR_FIT,
                    Rounded.words(
                            "chi-square {4} at {} degrees of freedom (p = {2})",
                            fit.chiSquare(), fit.degreesOfFreedom(), fit.pValue())));
        }
        for (Parameter parameter : fit.parameters()) {
            if (fit.estimate(parameter).value() < 0.0) {
                warnings.add(new FitWarning(
                        FitWarning.Sort.NEGATIVE_VALUE, parameter + " came out negative; quote an upper limit"));
            }
        }
        return warnings;
    }
}
