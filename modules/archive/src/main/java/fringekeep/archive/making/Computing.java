package fringekeep.archive.making;

import fringekeep.archive.NewRecord;
import fringekeep.archive.Prepared;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Computation;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.PartName;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/** Completes choices, runs the method they name, and gives what is to be recorded. Stores nothing. */
public final class Computing {
    private final Resolver resolver;
    private final PartRules parts = new PartRules();

    /** Computes on what a resolver sees. */
    public Computing(Resolver resolver) {
        this.resolver = resolver;
    }

    /**
     * Computes.
     *
     * @param request a new record with choices (possibly incomplete) and inputs; a result it may have is replaced
     * @param earlier prepared records that the request may refer to
     * @return the same record with complete choices, result and payloads
     * @throws ProblemException if the kind is not computed, choices or inputs do not suffice, or there is no result
     */
    public NewRecord compute(NewRecord request, List<Prepared> earlier, Work work)
            throws ProblemException, StoppedException {
        Resolver seen = earlier.isEmpty() ? resolver : resolver.before(MemorySource.of(earlier));
        RecordKind kind = resolver.kinds()
                .get(request.kind())
                .orElseThrow(
                        () -> problem("record.kind-unknown", "This program knows no kind \"" + request.kind() + "\"."));
        Computation computation = kind.computation()
                .orElseThrow(
                        () -> problem("record.not-computed", "A " + request.kind() + " is entered, not computed."));
        Inputs inputs = seen.inputs(request.inputs(), request.about());
        refuseAny(RoleRules.examine(kind, inputs));
        JsonObject choices = computation.complete(choices(request), inputs);
        refuseAny(parts.examineChoices(choices, kind));
        refuseUnknownMethod(choices, computation);
        Outcome outcome = computation.compute(choices, inputs, work);
        if (outcome instanceof Outcome.Computed computed) {
            return answered(request, choices, computed);
        }
        if (outcome instanceof Outcome.NoResult none) {
            throw new ProblemException(none.reasons());
        }
        throw new AssertionError(outcome);
    }

    private static JsonObject choices(NewRecord request) {
        JsonObject choices = request.parts().get(PartName.CHOICES);
        return choices == null ? JsonObject.EMPTY : choices;
    }

    private static void refuseUnknownMethod(JsonObject choices, Computation computation) throws ProblemException {
        String method = choices.text("method").orElse("");
        if (computation.methods().stream().noneMatch(known -> known.text().equals(method))) {
            throw problem("compute.method-unknown", "This program has no method \"" + method + "\" for this kind.");
        }
    }

    private static NewRecord answered(NewRecord request, JsonObject choices, Outcome.Computed computed) {
        Map<PartName, JsonObject> parts = new EnumMap<>(PartName.class);
        parts.putAll(request.parts());
        parts.put(PartName.CHOICES, choices);
        parts.put(PartName.RESULT, computed.result());
        return new NewRecord(
                request.kind(),
                request.inputs(),
                request.about(),
                parts,
                computed.payloads(),
                request.corrects(),
                request.after(),
                request.person());
    }

    private static void refuseAny(List<Problem> problems) throws ProblemException {
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
    }

    private static ProblemException problem(String code, String what) {
        return new ProblemException(
                new Problem(code, what, "/choices/method", "Name a method of this program. Nothing has been stored."));
    }
}
