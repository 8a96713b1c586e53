package fringekeep.scan;

import fringekeep.archive.problem.Problem;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Where in a raw file something is wrong.
 *
 * @param line from 1
 * @param column from 1
 */
public record FilePlace(int line, int column) {
    private static final Pattern PLACE = Pattern.compile(", line (\\d{1,9})(?:, column (\\d{1,9}))?$");

    /** The place a problem of reading names; empty when it concerns the file as a whole. */
    public static Optional<FilePlace> of(Problem problem) {
        Matcher found = PLACE.matcher(problem.where());
        return found.find()
                ? Optional.of(new FilePlace(
                        Integer.parseInt(found.group(1)),
                        Optional.ofNullable(found.group(2))
                                .map(Integer::parseInt)
                                .orElse(1)))
                : Optional.empty();
    }
}
