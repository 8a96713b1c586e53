package fringekeep.commandline.compute;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.interferometry.molecule.MeasuredCurve;
import fringekeep.interferometry.molecule.Parameter;
import fringekeep.interferometry.molecule.Polarizability;
import fringekeep.interferometry.molecule.PowerCurveChoices;
import fringekeep.interferometry.molecule.PowerCurveComparison;
import fringekeep.interferometry.molecule.PowerCurveFitter;
import fringekeep.interferometry.molecule.PowerCurveIntervals;
import fringekeep.interferometry.molecule.PropertyFit;
import fringekeep.interferometry.molecule.SharedInput;
import fringekeep.interferometry.molecule.SharedInputs;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;

/** Optical polarizability and absorption from visibility against laser power. */
final class PowerCurveMethods {
    private static final double[] POWERS = {0.5, 1, 2, 3, 4, 5, 6, 8, 10};
    private static final double[] VISIBILITIES = {0.012, 0.045, 0.142, 0.236, 0.302, 0.337, 0.341, 0.283, 0.179};
    private static final double[] UNCERTAINTIES = {0.008, 0.008, 0.008, 0.008, 0.008, 0.008, 0.008, 0.008, 0.008};

    private PowerCurveMethods() {}

    static List<Method> all() {
        return List.of(
                Method.of(
                        "polarizability-from-visibility",
                        "Optical polarizability, and where asked absorption and a visibility factor, from visibility against"
                                + " power",
                        PowerCurveMethods::fit,
                        fields(
                                Field.choice("description", Description.class, "quantum if not given"),
                                Field.number("level", 0.6827, "of the profile-likelihood intervals")
                                        .seldom(),
                                Field.whole("seed", 20310514, "of the bootstrap")
                                        .seldom(),
                                Field.whole("resamples", 2000, "of the bootstrap; none if left out")
                                        .seldom(),
                                Field.group(
                                                "sharedInputs",
                                                "inputs whose error is common to all points",
                                                List.of(
                                                        Field.choice("input", SharedInput.class, "which"),
                                                        Field.number(
                                                                "relative", 0.02, "relative standard uncertainty")),
                                                shared("power", 0.02),
                                                shared("waist", 0.03),
                                                shared("velocity", 0.01))
                                        .orNothing())),
                Method.of(
                        "quantum-against-classical",
                        "Both descriptions fitted to the same visibilities, and whether the data can tell them apart",
                        PowerCurveMethods::compare,
                        fields()),
                Method.of(
                        "polarizability-units",
                        "Polarizability as volume, in SI and in atomic units; give one",
                        PowerCurveMethods::units,
                        Field.quantity("volume", "m3", "89 Ao3", "polarizability volume")
                                .orNothing(),
                        Field.quantity("polarizability", "C.m2/V", "9.9e-39 C.m2/V", "in SI")
                                .seldom(),
                        Field.number("atomicUnits", 600.6, "in atomic units").seldom()));
    }

    private static JsonObject shared(String input, double relative) {
        return JsonObject.EMPTY.with("input", input).with("relative", Json.of(relative));
    }

    private static Field[] fields(Field... more) {
        List<Field> own = new ArrayList<>(List.of(
                Field.list("powers", "W", "W", "incident laser powers", POWERS),
                Field.measured("visibilities", "1", "1", "fitted visibilities with u", VISIBILITIES, UNCERTAINTIES),
                Field.flag("fitCrossSection", "fit the absorption cross section too"),
                Field.quantity("crossSection", "m2", "1e-22 m2", "absorption cross section, if it is not fitted")
                        .seldom(),
                Field.flag("fitFactor", "fit the remaining visibility factor too"),
                Field.number("factor", 1, "remaining visibility factor, if it is not fitted")
                        .seldom(),
                Field.quantity("searchFrom", "m3", "10 Ao3", "lower end of the search")
                        .seldom(),
                Field.quantity("searchTo", "m3", "400 Ao3", "upper end of the search")
                        .seldom(),
                Field.quantity("known", "m3", "120(4) Ao3", "polarizability volume known from elsewhere")
                        .seldom()));
        own.addAll(List.of(more));
        return BeamInputs.and(NearFieldMethods.setupAnd(own.toArray(Field[]::new)));
    }

    private static PowerCurveFitter fitter(Inputs in) {
        PowerCurveChoices choices =
                PowerCurveChoices.polarizabilityOnly().withSearch(in.number("searchFrom", 0), in.number("searchTo", 0));
        choices = in.has("crossSection") ? choices.withCrossSection(in.number("crossSection")) : choices;
        choices = in.flag("fitCrossSection") ? choices.withFreeCrossSection() : choices;
        choices = in.has("factor") ? choices.withFactor(in.number("factor")) : choices;
        choices = in.flag("fitFactor") ? choices.withFreeFactor() : choices;
        choices = in.has("known") ? choices.withKnown(in.estimate("known")) : choices;
        return new PowerCurveFitter(NearFieldMethods.setup(in), BeamInputs.ensemble(in), choices);
    }

    private static void fit(Inputs in, Results out) throws ProblemException {
        PowerCurveFitter fitter = fitter(in);
        MeasuredCurve data = in.curve("powers", "visibilities");
        Description description = in.choice("description", Description.QUANTUM);
        PropertyFit fit = Fits.report(fitter.fit(data, description), out);
        Estimate volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME);
        double perVolume = Polarizability.siFromVolume(1);
        out.estimate("polarizability", "C.m2/V", perVolume * volume.value(), perVolume * volume.standardUncertainty());
        if (in.repeated()) {
            return;
        }
        PowerCurveIntervals intervals = new PowerCurveIntervals(fitter, data, description, fit);
        for (Parameter parameter : fit.parameters()) {
            out.interval(
                    Fits.name(parameter) + "Interval",
                    parameter.unit(),
                    intervals.profile(parameter, in.number("level", 0.6827)));
        }
        if (in.has("resamples")) {
            bootstrap(intervals.bootstrap(in.whole("seed", 1), in.whole("resamples")), out);
        }
        if (in.has("sharedInputs")) {
            budget(new SharedInputs(fitter, data, description, fit), in, out);
        }
    }

    private static void bootstrap(PowerCurveIntervals.Bootstrap spread, Results out) {
        out.words("bootstrapGenerator", spread.generator());
        out.bare("bootstrapSeed", "1", spread.seed());
        out.bare("bootstrapResamples", "1", spread.resamples());
        out.bare("bootstrapFailed", "1", spread.failed());
        out.bareEstimates("bootstrapMean", "", spread.mean(), spread.deviation());
        for (int k = 0; k < spread.central68().length; k++) {
            out.bare("bootstrapCentral68Of" + (k + 1), "", spread.central68()[k]);
            out.bare("bootstrapCentral95Of" + (k + 1), "", spread.central95()[k]);
        }
    }

    private static void budget(SharedInputs shared, Inputs in, Results out) {
        List<SharedInputs.Uncertain> uncertain = in.groups("sharedInputs").stream()
                .map(one -> new SharedInputs.Uncertain(one.choice("input", SharedInput.POWER), one.number("relative")))
                .toList();
        SharedInputs.Budget budget = shared.budget(Parameter.POLARIZABILITY_VOLUME, uncertain);
        out.bare("statisticalUncertainty", "m3", budget.statistical());
        out.bare("sharedUncertainty", "m3", budget.shared());
        out.estimate("polarizabilityVolumeCombined", "m3", budget.value(), budget.combined());
        out.list(
                "sharedInputs",
                budget.contributions().stream()
                        .map(part -> Field.word(part.input()))
                        .toList());
        out.values(
                "contributions",
                "m3",
                budget.contributions().stream()
                        .mapToDouble(SharedInputs.Contribution::contribution)
                        .toArray());
    }

    private static void compare(Inputs in, Results out) throws ProblemException {
        PowerCurveComparison both = PowerCurveComparison.of(fitter(in), in.curve("powers", "visibilities"));
        Parameter volume = Parameter.POLARIZABILITY_VOLUME;
        PropertyFit quantum = Fits.found(both.quantum());
        PropertyFit classical = Fits.found(both.classical());
        out.words("verdict", Field.word(both.verdict()));
        out.words("reason", both.reason());
        out.bare("logLikelihoodRatio", "1", both.logLikelihoodRatio());
        out.bare("expectedIfQuantum", "1", both.expectedIfQuantum());
        out.bare("expectedIfClassical", "1", both.expectedIfClassical());
        out.estimate("quantumPolarizabilityVolume", "m3", quantum.estimate(volume));
        out.bare("quantumChiSquare", "1", quantum.chiSquare());
        out.estimate("classicalPolarizabilityVolume", "m3", classical.estimate(volume));
        out.bare("classicalChiSquare", "1", classical.chiSquare());
    }

    private static void units(Inputs in, Results out) {
        double volume;
        if (in.has("volume")) {
            volume = in.number("volume");
        } else if (in.has("polarizability")) {
            volume = Polarizability.volumeFromSi(in.number("polarizability"));
        } else {
            volume = Polarizability.volumeFromAtomicUnits(in.number("atomicUnits"));
        }
        out.value("volume", "m3", volume);
        out.value("cubicAngstroms", "Ao3", Polarizability.cubicAngstromsFromVolume(volume));
        out.value("polarizability", "C.m2/V", Polarizability.siFromVolume(volume));
        out.value("atomicUnits", "1", Polarizability.atomicUnitsFromVolume(volume));
    }
}
