package fringekeep.commandline.compute;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;

/** The answer of a method that says why there is no number. */
final class NoResult {
    private NoResult() {}

    /** With the reason the library gives. */
    static ProblemException because(String words) {
        return new ProblemException(
                new Problem(
                        "compute.no-result",
                        words.isEmpty() || words.endsWith(".") ? words : words + ".",
                        "",
                        "Check the inputs against the data; \"--form\" shows what each means. No number is better than a wrong one."));
    }
}
