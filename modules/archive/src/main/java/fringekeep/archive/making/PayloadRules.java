package fringekeep.archive.making;

import fringekeep.archive.json.JsonPointer;
import fringekeep.archive.kind.CsvPayload;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.NpyPayload;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.List;

/** Checks that payloads keep to the form they name. */
final class PayloadRules {
    private PayloadRules() {}

    static List<Problem> examine(List<NewPayload> payloads) {
        List<Problem> problems = new ArrayList<>();
        for (int i = 0; i < payloads.size(); i++) {
            String pointer = JsonPointer.child("/payloads", i);
            try {
                read(payloads.get(i), pointer);
            } catch (ProblemException e) {
                e.problems().forEach(problem -> problems.add(problem.at(pointer + " " + problem.where())));
            }
        }
        return problems;
    }

    private static void read(NewPayload payload, String pointer) throws ProblemException {
        switch (payload.form()) {
            case CsvPayload.FORM -> CsvPayload.read(payload.bytes());
            case NpyPayload.FORM -> NpyPayload.read(payload.bytes());
            default ->
                throw new ProblemException(new Problem(
                        "record.payload-form",
                        "There is no form of payload \"" + payload.form() + "\".",
                        JsonPointer.child(pointer, "form"),
                        "Use " + CsvPayload.FORM + " or " + NpyPayload.FORM + "."));
        }
    }
}
