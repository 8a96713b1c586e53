package fringekeep.sourcerun;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Knob;
import fringekeep.archive.kind.MethodId;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.interferometry.beam.GravitySelector;
import fringekeep.interferometry.constants.Codata2018;
import fringekeep.sample.Entered;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Velocities computed from flight traces or three slits. */
final class VelocityComputation implements Computation {
    static final String SINGLE_SLOT = "velocity.flight-single-slot/1";
    static final String PSEUDO_RANDOM = "velocity.flight-pseudo-random/1";
    static final String THREE_SLIT = "velocity.three-slit/1";

    @Override
    public List<MethodId> methods() {
        return List.of(new MethodId(SINGLE_SLOT), new MethodId(PSEUDO_RANDOM), new MethodId(THREE_SLIT));
    }

    @Override
    public JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException {
        JsonObject complete = with(choices, "constants", Codata2018.NAME);
        boolean flight = !choices.text("method").equals(Optional.of(THREE_SLIT));
        if (flight) {
            boolean fitted = choices.text("background").orElse("fitted").equals("fitted");
            complete = with(complete, "shape", fitted ? "shifted-flux" : "as-measured");
            complete = with(complete, "background", backgroundFor(complete));
            complete = with(complete, "detector", "flux");
            if (choices.text("method").equals(Optional.of(PSEUDO_RANDOM))) {
                complete = with(complete, "direction", "forward");
            }
            complete = withReading(complete, inputs);
        } else if (choices.get("gravity").isEmpty()) {
            complete = complete.with("gravity", standardGravity());
        }
        List<Problem> problems = VelocityRules.choices(complete);
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return complete;
    }

    private static String backgroundFor(JsonObject choices) {
        return choices.text("shape").equals(Optional.of("as-measured")) ? "outside-window" : "fitted";
    }

    /** Writes out how a raw trace is read. */
    private static JsonObject withReading(JsonObject choices, Inputs inputs) {
        boolean raw = inputs.role("trace").stream().anyMatch(input -> input.raw());
        Optional<JsonObject> given = choices.object("reading");
        if (!raw || given.isEmpty()) {
            return choices;
        }
        JsonObject reading = with(given.get(), "encoding", "UTF-8");
        reading = with(reading, "delimiter", "tab");
        reading = with(reading, "decimal", ".");
        return choices.with("reading", reading.get("skip").isPresent() ? reading : reading.with("skip", 0));
    }

    private static JsonObject with(JsonObject choices, String member, String value) {
        return choices.get(member).isPresent() ? choices : choices.with(member, value);
    }

    /** Standard acceleration of free fall (3rd CGPM, 1901), exact by definition; a place may differ by 3 in 1000. */
    private static JsonObject standardGravity() {
        return JsonObject.EMPTY
                .with("text", "9.80665")
                .with("unit", "m/s2")
                .with("si", GravitySelector.STANDARD_GRAVITY)
                .with("uncertainty", JsonObject.EMPTY.with("sort", "unstated"));
    }

    @Override
    public Outcome compute(JsonObject choices, Inputs inputs, Work work) {
        List<Problem> problems = VelocityRules.choices(choices);
        if (!problems.isEmpty()) {
            return new Outcome.NoResult(problems);
        }
        try {
            boolean slits = choices.text("method").equals(Optional.of(THREE_SLIT));
            JsonObject result =
                    slits ? new ThreeSlitMethod(choices, inputs).result() : new FlightMethod(choices, inputs).result();
            return new Outcome.Computed(result, List.of());
        } catch (ProblemException e) {
            return new Outcome.NoResult(e.problems());
        } catch (IllegalArgumentException e) {
            // the beam's functions refuse numbers outside their domain so; for a record that is expected trouble
            return new Outcome.NoResult(
                    List.of(Trouble.at("out-of-domain", "/choices", String.valueOf(e.getMessage()))));
        }
    }

    @Override
    public List<Knob> knobs(JsonObject choices, Inputs inputs) {
        List<Knob> knobs = new ArrayList<>();
        knob(choices, "distance", "m").ifPresent(knobs::add);
        knob(choices, "timeZero", "s").ifPresent(knobs::add);
        knob(choices, "slotOpening", "s").ifPresent(knobs::add);
        knob(choices, "gravity", "m/s2").ifPresent(knobs::add);
        return knobs;
    }

    private static Optional<Knob> knob(JsonObject choices, String member, String unit) {
        return Entered.of(choices, member)
                .map(value -> new Knob(
                        member,
                        -1,
                        "/" + member + "/si",
                        value.si(),
                        value.deviation().orElse(Double.NaN),
                        unit));
    }

    @Override
    public List<Sensitivity> sensitivities(JsonObject choices, Inputs inputs, Outcome at, Work work) {
        if (!(at instanceof Outcome.Computed computed)) {
            return List.of();
        }
        List<Sensitivity> sensitivities = new ArrayList<>();
        for (JsonObject one : SourceRunReader.objects(computed.result().array("sensitivities"))
                .toList()) {
            int input = (int) one.integer("input").orElse(-1);
            if (input >= 0 && input < inputs.all().size()) {
                sensitivities.add(new Sensitivity(
                        inputs.all().get(input).target(),
                        one.text("parameter").orElse(""),
                        one.number("deviation").orElse(0),
                        one.array("derivatives").numbers()));
            }
        }
        return sensitivities;
    }
}
