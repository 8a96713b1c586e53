package fringekeep.interferometry.molecule;

import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;

/** Weighted straight line through data: value = slope g(place) + offset, parameters in that order. */
final class LineFit implements CurveModel {
    private final MeasuredCurve data;
    private final DoubleUnaryOperator abscissa;

    private LineFit(MeasuredCurve data, DoubleUnaryOperator abscissa) {
        this.data = data;
        this.abscissa = abscissa;
    }

    /** Empty if the places do not determine both parameters. */
    static Optional<PropertyFit> fit(MeasuredCurve data, DoubleUnaryOperator abscissa, List<Parameter> parameters) {
        LineFit line = new LineFit(data, abscissa);
        KinkedCurveFitter fitter = new KinkedCurveFitter(line, data);
        double[] start = {0.0, 0.0};
        Optional<double[]> covariance = fitter.covariance(start);
        if (covariance.isEmpty()) {
            return Optional.empty();
        }
        return fitter.minimum(start)
                .map(best -> new PropertyFit.Solution(
                        best.parameters(), covariance.get(), fitter.curve(best.parameters()), best.chiSquare()))
                .map(solution -> new PropertyFit(parameters, solution, data, List.of()));
    }

    @Override
    public int parameters() {
        return 2;
    }

    @Override
    public void evaluate(double[] parameters, double[] values, double[][] jacobian) {
        for (int k = 0; k < values.length; k++) {
            double x = abscissa.applyAsDouble(data.place(k));
            values[k] = Math.fma(parameters[0], x, parameters[1]);
            jacobian[k][0] = x;
            jacobian[k][1] = 1.0;
        }
    }
}
