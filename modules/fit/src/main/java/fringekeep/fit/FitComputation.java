package fringekeep.fit;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Knob;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.fit.internal.ChoicesCompletion;
import fringekeep.fit.internal.FitAnswer;
import fringekeep.fit.internal.FitChoices;
import fringekeep.fit.internal.FitChoices.Combine;
import fringekeep.fit.internal.FitKnobs;
import fringekeep.fit.internal.FitParameters;
import fringekeep.fit.internal.FitResult;
import fringekeep.fit.internal.FringeAnalysis;
import fringekeep.fit.internal.ParametersReader;
import fringekeep.fit.internal.References;
import fringekeep.fit.internal.ResidualTable;
import fringekeep.fit.internal.ScanArrays;
import fringekeep.fit.internal.ScanArraysReader;
import fringekeep.fit.internal.Sensitivities;
import fringekeep.interferometry.statistics.Estimate;
import java.util.List;
import java.util.Optional;

/** Fits fringes: methods {@code fringe.poisson-likelihood/1}, {@code fringe.weighted/1} and {@code fringe.unweighted/1}. */
final class FitComputation implements Computation {
    static final FitComputation INSTANCE = new FitComputation();

    private static final List<MethodId> METHODS = List.of(
            new MethodId("fringe.poisson-likelihood/1"),
            new MethodId("fringe.weighted/1"),
            new MethodId("fringe.unweighted/1"));

    private FitComputation() {}

    @Override
    public List<MethodId> methods() {
        return METHODS;
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        return new ChoicesCompletion(choices, inputs).complete();
    }

    @Override
    public Outcome compute(JsonObject json, Inputs inputs, Work work) throws StoppedException {
        work.check();
        try {
            FitChoices choices = new FitChoices(json);
            FitParameters parameters = new ParametersReader(choices, inputs).parameters();
            ScanArraysReader reader = new ScanArraysReader(inputs, choices);
            List<ScanArrays> scans = reader.role("scan");
            Optional<References> references = references(choices, reader, parameters);
            boolean aligned = choices.combine() == Combine.SUM_AFTER_PHASE && references.isPresent();
            List<Estimate> phases = aligned ? references.get().phases(scans) : List.of();
            FringeAnalysis analysis = new FringeAnalysis(choices, scans, phases);
            FitAnswer answer = analysis.answer(parameters);
            work.check();
            List<JsonObject> sensitivities = new Sensitivities(analysis)
                    .json(new ParametersReader(choices, inputs).sources(parameters), answer, work);
            Optional<JsonObject> compared = Optional.empty();
            if (choices.normalised() && references.isPresent()) {
                compared = Optional.of(references.get().compare(answer, scans));
            }
            JsonObject result = new FitResult(choices, scans, answer).json(sensitivities, compared);
            return new Outcome.Computed(result, List.of(ResidualTable.payload(FitResult.RESIDUALS, answer)));
        } catch (ProblemException e) {
            return new Outcome.NoResult(e.problems());
        }
    }

    private static Optional<References> references(
            FitChoices choices, ScanArraysReader reader, FitParameters parameters) throws ProblemException {
        List<ScanArrays> scans = reader.role("reference");
        boolean used = choices.normalised() || choices.combine() == Combine.SUM_AFTER_PHASE && !scans.isEmpty();
        return used ? Optional.of(new References(scans, choices, parameters)) : Optional.empty();
    }

    @Override
    public List<Knob> knobs(JsonObject choices, Inputs inputs) {
        return FitKnobs.of(new FitChoices(choices), inputs);
    }

    @Override
    public List<Sensitivity> sensitivities(JsonObject choices, Inputs inputs, Outcome at, Work work) {
        return at instanceof Outcome.Computed computed
                ? FitReading.sensitivities(computed.result(), inputs)
                : List.of();
    }
}
