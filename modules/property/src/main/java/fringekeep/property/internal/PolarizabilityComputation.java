package fringekeep.property.internal;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.interferometry.molecule.FitOutcome;
import fringekeep.interferometry.molecule.FitRefused;
import fringekeep.interferometry.molecule.PowerCurveChoices;
import fringekeep.interferometry.molecule.PowerCurveComparison;
import fringekeep.interferometry.nearfield.Description;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Method {@code property.polarizability-power/1}: polarizability from visibility against laser power. */
public final class PolarizabilityComputation implements Computation {
    private static final MethodId METHOD = new MethodId("property.polarizability-power/1");
    private static final JsonObject FREE = JsonObject.EMPTY.with("sort", "free");

    @Override
    public List<MethodId> methods() {
        return List.of(METHOD);
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        JsonObject complete = choices;
        complete = text(complete, "method", METHOD.text());
        complete = text(complete, "constants", "CODATA 2018");
        complete = text(complete, "description", "quantum");
        complete = text(complete, "powerSetting", "laser power");
        complete = text(complete, "bias", "noise-subtracted");
        complete = text(complete, "visibility", "as-fitted");
        complete = text(complete, "powers", "independent");
        complete = text(complete, "recoil", "standing-mode-coherent");
        complete = number(complete, "threshold", PowerCurveChoices.ODDS_OF_A_HUNDRED);
        complete = number(complete, "level", 0.6827);
        complete = number(complete, "heightNodes", 8);
        if (complete.object("crossSection").isEmpty()) {
            complete = complete.with("crossSection", JsonObject.EMPTY.with("sort", "none"));
        }
        if (complete.object("factor").isEmpty()) {
            complete = complete.with("factor", FREE);
        }
        boolean seedless = complete.object("bootstrap").isPresent()
                && complete.integer("seed").isEmpty();
        if (seedless) {
            throw new ProblemException(new Problem(
                    "property.no-seed",
                    "A bootstrap is asked for without a seed.",
                    "/choices/seed",
                    "Give any integer; it is recorded, so that the same bits come out again."));
        }
        return complete;
    }

    private static JsonObject text(JsonObject choices, String name, String value) {
        return choices.get(name).isPresent() ? choices : choices.with(name, value);
    }

    private static JsonObject number(JsonObject choices, String name, double value) {
        return choices.get(name).isPresent() ? choices : choices.with(name, value);
    }

    @Override
    public Outcome compute(JsonObject choices, Inputs inputs, Work work) throws StoppedException {
        List<Problem> problems = new ArrayList<>();
        Optional<PowerQuestion> question = PowerQuestion.read(choices, inputs, problems);
        if (question.isEmpty()) {
            return new Outcome.NoResult(problems);
        }
        work.check();
        try {
            return answer(question.get(), work);
        } catch (IllegalArgumentException e) {
            // a value that the model refuses, such as a negative separation: its words name the value and its range
            return new Outcome.NoResult(List.of(new Problem(
                    "property.out-of-range",
                    "The model refuses a value: " + e.getMessage() + ".",
                    "/inputs",
                    "Correct the record that states it.")));
        }
    }

    private static Outcome answer(PowerQuestion asked, Work work) throws StoppedException {
        boolean quantum = asked.choices().text("description").orElse("").equals("quantum");
        PowerQuestion question = Readings.widened(asked, quantum ? Description.QUANTUM : Description.CLASSICAL);
        PowerCurveComparison comparison =
                PowerCurveComparison.of(question.fitter(Shift.NONE), question.data(Shift.NONE));
        FitOutcome stated = quantum ? comparison.quantum() : comparison.classical();
        if (stated instanceof FitRefused refused) {
            return new Outcome.NoResult(List.of(new Problem(
                    "property.refused",
                    "No fit: " + refused.words() + ".",
                    "/choices",
                    "Take more powers, hold a parameter, or give a search range.")));
        }
        work.check();
        JsonObject result = new PropertyResult(
                        question, comparison, quantum ? Description.QUANTUM : Description.CLASSICAL)
                .write(work);
        return new Outcome.Computed(
                result, new PowerCurves(question, comparison.quantum(), comparison.classical()).payloads());
    }
}
