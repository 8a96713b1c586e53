package fringekeep.property.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.problem.Problem;
import fringekeep.interferometry.molecule.MeasuredCurve;
import fringekeep.interferometry.molecule.PowerCurveChoices;
import fringekeep.interferometry.molecule.PowerCurveFitter;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What is asked of the model: set-up, beam, points and choices, with any one shared parameter moved.
 *
 * @param choices complete choices
 * @param bench the set-up
 * @param beam the beam
 * @param points the fits, in order of power
 * @param deviations standard uncertainty by which each point is weighted
 */
record PowerQuestion(JsonObject choices, Bench bench, Beam beam, List<PowerPoint> points, List<Double> deviations) {
    PowerQuestion {
        points = List.copyOf(points);
        deviations = List.copyOf(deviations);
    }

    /** The same with other weights. */
    PowerQuestion withDeviations(double[] others) {
        return new PowerQuestion(
                choices, bench, beam, points, Arrays.stream(others).boxed().toList());
    }

    /** Reads everything; empty with problems where something is missing. */
    static Optional<PowerQuestion> read(JsonObject choices, Inputs inputs, List<Problem> problems) {
        List<PowerPoint> points = new PowerPoints(choices, inputs, problems).read();
        if (!problems.isEmpty()) {
            return Optional.empty();
        }
        Optional<Bench> bench = Bench.read(inputs, problems);
        Optional<Beam> beam = Beam.read(inputs, problems);
        return bench.isPresent() && beam.isPresent() && problems.isEmpty()
                ? Optional.of(new PowerQuestion(
                        choices,
                        bench.get(),
                        beam.get(),
                        points,
                        points.stream().map(PowerPoint::deviation).toList()))
                : Optional.empty();
    }

    /** The fitter, with a shared parameter moved. */
    PowerCurveFitter fitter(Shift shift) {
        BeamEnsemble ensemble = new BeamEnsemble(beam.speeds(shift), beam.masses(shift), bench.heights(choices, shift));
        return new PowerCurveFitter(bench.optics(choices, shift), ensemble, asked());
    }

    private PowerCurveChoices asked() {
        PowerCurveChoices asked = PowerCurveChoices.polarizabilityOnly()
                .withDecisionThreshold(choices.number("threshold").orElseThrow());
        JsonObject factor = choices.object("factor").orElseThrow();
        asked = factor.text("sort").orElse("").equals("free")
                ? asked.withFreeFactor()
                : asked.withFactor(factor.number("value").orElse(1));
        JsonObject absorption = choices.object("crossSection").orElseThrow();
        asked = switch (absorption.text("sort").orElse("")) {
            case "free" -> asked.withFreeCrossSection();
            case "given" -> asked.withCrossSection(absorption.number("si").orElse(0));
            default -> asked;
        };
        Optional<JsonObject> search = choices.object("search");
        return search.isPresent()
                ? asked.withSearch(
                        search.get().number("from").orElseThrow(),
                        search.get().number("to").orElseThrow())
                : asked;
    }

    /** The points, with a shared parameter moved. */
    MeasuredCurve data(Shift shift) {
        double[] powers = new double[points.size()];
        double[] visibilities = new double[points.size()];
        double[] deviations = new double[points.size()];
        for (int i = 0; i < powers.length; i++) {
            powers[i] = points.get(i).power(shift);
            visibilities[i] = points.get(i).visibility();
            deviations[i] = this.deviations.get(i);
        }
        return new MeasuredCurve(powers, visibilities, deviations);
    }

    /** Every parameter that points share, each once. */
    List<Shared> shared() {
        List<Shared> all = new ArrayList<>();
        for (PowerPoint point : points) {
            point.calibrations().forEach(pinned -> Bench.ofCalibration(pinned).forEach(each -> addOnce(all, each)));
        }
        boolean together = Readings.Use.of(choices) == Readings.Use.TOGETHER
                && points.stream().anyMatch(point -> point.readingDeviation() > 0);
        if (together) {
            addOnce(all, new Shared(bench.record(), Readings.TOGETHER, 0, OptionalDouble.of(1)));
        }
        bench.shared(choices).forEach(each -> addOnce(all, each));
        beam.shared().forEach(each -> addOnce(all, each));
        return List.copyOf(all);
    }

    private static void addOnce(List<Shared> all, Shared shared) {
        if (all.stream().noneMatch(shared::same)) {
            all.add(shared);
        }
    }
}
