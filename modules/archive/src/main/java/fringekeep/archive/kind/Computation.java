package fringekeep.archive.kind;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import java.util.List;

/** How the results of a kind come about. Deterministic to the last bit; sees nothing but choices and inputs. */
public interface Computation {
    /** Methods, the newest of each family first. */
    List<MethodId> methods();

    /**
     * Writes out every default, so that none is ever implied.
     *
     * @throws ProblemException if the choices do not suffice or do not fit the inputs
     */
    JsonObject complete(JsonObject choices, Inputs inputs) throws ProblemException;

    /** Computes from complete choices; a failing or ill-posed computation returns a reason, never a plausible number. */
    Outcome compute(JsonObject choices, Inputs inputs, Work work) throws StoppedException;

    /** What "suppose" and the uncertainty budget may turn. */
    default List<Knob> knobs(JsonObject choices, Inputs inputs) {
        return List.of();
    }

    /** How the outcome answers to shared sources. */
    default List<Sensitivity> sensitivities(JsonObject choices, Inputs inputs, Outcome at, Work work)
            throws StoppedException {
        return List.of();
    }
}
