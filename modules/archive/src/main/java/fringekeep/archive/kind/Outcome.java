package fringekeep.archive.kind;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import java.util.List;

/** What came out of a computation. */
public sealed interface Outcome {
    /** A result part and the payloads it names. */
    record Computed(JsonObject result, List<NewPayload> payloads) implements Outcome {
        /** Copies. */
        public Computed {
            payloads = List.copyOf(payloads);
        }
    }

    /** Why there is no result. */
    record NoResult(List<Problem> reasons) implements Outcome {
        /** Copies. */
        public NoResult {
            reasons = List.copyOf(reasons);
        }
    }
}
