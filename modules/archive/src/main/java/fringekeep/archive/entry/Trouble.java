package fringekeep.archive.entry;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.util.ArrayList;
import java.util.List;

/** Collects what is wrong with a document, up to a hundred problems. */
final class Trouble {
    private static final int MOST = 100;
    private final JsonDocument document;
    private final List<Problem> problems = new ArrayList<>();

    Trouble(JsonDocument document) {
        this.document = document;
    }

    void add(String code, String what, String pointer, String mend) {
        add(new Problem(code, what, pointer, mend + " Nothing has been stored."));
    }

    /** Adds a problem whose place is a JSON pointer. */
    void add(Problem problem) {
        if (problems.size() < MOST) {
            problems.add(problem.at(place(document, problem.where())));
        }
    }

    Problem placed(Problem problem) {
        return problem.at(place(document, problem.where()));
    }

    static String place(JsonDocument document, String pointer) {
        if (!pointer.isEmpty() && pointer.charAt(0) != '/') {
            return pointer;
        }
        return pointer.isEmpty() ? document.place("") : pointer + ", " + document.place(pointer);
    }

    void refuseAny() throws ProblemException {
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
    }
}
