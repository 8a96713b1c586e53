package fringekeep.property.internal;

import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.record.Hash;
import fringekeep.interferometry.molecule.FitOutcome;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.PowerCurveFitter;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** The points with both fitted curves, and the curves with a band of one statistical standard uncertainty. */
final class PowerCurves {
    /** Payload of the points. */
    static final String POINTS = "points";

    /** Payload of the curves. */
    static final String CURVES = "curves";

    private static final int VERTICES = 161;
    private static final double BEYOND = 1.06;

    private final PowerQuestion question;
    private final FitOutcome quantum;
    private final FitOutcome classical;

    PowerCurves(PowerQuestion question, FitOutcome quantum, FitOutcome classical) {
        this.question = question;
        this.quantum = quantum;
        this.classical = classical;
    }

    List<NewPayload> payloads() {
        return List.of(points(), curves());
    }

    private NewPayload points() {
        int n = question.points().size();
        double[] powers = new double[n];
        double[] visibilities = new double[n];
        double[] deviations = new double[n];
        for (int i = 0; i < n; i++) {
            powers[i] = question.points().get(i).power(Shift.NONE);
            visibilities[i] = question.points().get(i).visibility();
            deviations[i] = question.points().get(i).deviation();
        }
        List<Optional<String>> fits = question.points().stream()
                .map(PowerPoint::fit)
                .map(Hash::hex)
                .map(Optional::of)
                .toList();
        return new NewPayload(
                POINTS,
                CsvPayload.FORM,
                CsvPayload.write(new CsvPayload.Table(List.of(
                        new CsvPayload.Numbers("power_w", powers),
                        new CsvPayload.Numbers("visibility", visibilities),
                        new CsvPayload.Numbers("visibility_u", deviations),
                        new CsvPayload.Numbers("quantum", new Curve(quantum, Description.QUANTUM).at(powers)[0]),
                        new CsvPayload.Numbers("classical", new Curve(classical, Description.CLASSICAL).at(powers)[0]),
                        new CsvPayload.Texts("fit", fits)))));
    }

    private NewPayload curves() {
        double largest = question.data(Shift.NONE).largestPlace() * BEYOND;
        double[] powers = new double[VERTICES];
        for (int i = 0; i < VERTICES; i++) {
            powers[i] = largest * i / (VERTICES - 1);
        }
        double[][] q = new Curve(quantum, Description.QUANTUM).at(powers);
        double[][] c = new Curve(classical, Description.CLASSICAL).at(powers);
        return new NewPayload(
                CURVES,
                CsvPayload.FORM,
                CsvPayload.write(
                        List.of(
                                "power_w",
                                "quantum",
                                "quantum_lower",
                                "quantum_upper",
                                "classical",
                                "classical_lower",
                                "classical_upper"),
                        List.of(powers, q[0], q[1], q[2], c[0], c[1], c[2])));
    }

    /** One description's curve; absent throughout where the fit was refused. */
    private final class Curve {
        private final FitOutcome outcome;
        private final Description description;

        Curve(FitOutcome outcome, Description description) {
            this.outcome = outcome;
            this.description = description;
        }

        /** Curve, lower and upper edge. */
        double[][] at(double[] powers) {
            double[][] edges = new double[3][powers.length];
            if (!(outcome instanceof PropertyFit fit)) {
                Arrays.stream(edges).forEach(edge -> Arrays.fill(edge, Double.NaN));
                return edges;
            }
            PowerCurveFitter fitter = question.fitter(Shift.NONE);
            VisibilityAgainstPower model = new VisibilityAgainstPower(fitter.setup(), fitter.ensemble(), description);
            double volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value();
            double section = value(
                    fit, Parameter.ABSORPTION_CROSS_SECTION, fitter.choices().crossSection());
            double factor =
                    value(fit, Parameter.VISIBILITY_FACTOR, fitter.choices().factor());
            for (int i = 0; i < powers.length; i++) {
                VisibilityAgainstPower.Point point = model.point(powers[i], new OpticalResponse(volume, section));
                double sign = point.signed() < 0 ? -1 : 1;
                double[] gradient = gradient(fit, point, sign, factor);
                double deviation = Math.sqrt(Math.max(0, quadratic(fit, gradient)));
                edges[0][i] = factor * Math.abs(point.signed());
                edges[1][i] = Math.max(0, edges[0][i] - deviation);
                edges[2][i] = edges[0][i] + deviation;
            }
            return edges;
        }
    }

    private static double value(PropertyFit fit, Parameter parameter, double held) {
        return fit.has(parameter) ? fit.estimate(parameter).value() : held;
    }

    private static double[] gradient(PropertyFit fit, VisibilityAgainstPower.Point point, double sign, double factor) {
        double[] gradient = new double[fit.parameters().size()];
        for (int k = 0; k < gradient.length; k++) {
            gradient[k] = switch (fit.parameters().get(k)) {
                case POLARIZABILITY_VOLUME -> factor * sign * point.byPolarizability();
                case ABSORPTION_CROSS_SECTION -> factor * sign * point.byCrossSection();
                case VISIBILITY_FACTOR -> Math.abs(point.signed());
                default ->
                    throw new IllegalStateException("a power series has no parameter "
                            + fit.parameters().get(k));
            };
        }
        return gradient;
    }

    private static double quadratic(PropertyFit fit, double[] gradient) {
        double sum = 0;
        for (int i = 0; i < gradient.length; i++) {
            for (int j = 0; j < gradient.length; j++) {
                sum += gradient[i]
                        * gradient[j]
                        * fit.covariance(
                                fit.parameters().get(i), fit.parameters().get(j));
            }
        }
        return sum;
    }
}
