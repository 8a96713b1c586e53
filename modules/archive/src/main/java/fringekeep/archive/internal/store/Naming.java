package fringekeep.archive.internal.store;

import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.time.DateTimeException;
import java.time.LocalTime;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;

/** Examines what a lab calls its archive and how it counts days. */
final class Naming {
    private static final int LONGEST_TITLE = 200;
    private static final Pattern BOUNDARY = Pattern.compile("\\d\\d:\\d\\d");

    private Naming() {}

    static Act.Naming examined(String title, String dayBoundary, String zone) throws ProblemException {
        List<Problem> problems = new ArrayList<>();
        if (title.isBlank() || title.length() > LONGEST_TITLE) {
            problems.add(problem("title", "The title has 1 to " + LONGEST_TITLE + " characters.", title));
        }
        if (!isTime(dayBoundary)) {
            problems.add(problem("dayBoundary", "The day boundary is a time such as 06:00.", dayBoundary));
        }
        if (!isZone(zone)) {
            problems.add(problem("zone", "The zone is a name such as Etc/GMT-2.", zone));
        }
        if (!problems.isEmpty()) {
            throw new ProblemException(problems);
        }
        return new Act.Naming(title, dayBoundary, zone);
    }

    private static Problem problem(String member, String what, String found) {
        return new Problem(
                "archive.naming",
                what + " Found: \"" + found + "\".",
                "/" + member,
                "Change that member. Nothing was changed.");
    }

    private static boolean isTime(String text) {
        try {
            return BOUNDARY.matcher(text).matches() && LocalTime.parse(text).getSecond() == 0;
        } catch (DateTimeException e) {
            return false;
        }
    }

    private static boolean isZone(String text) {
        try {
            return ZoneId.of(text).getId().equals(text);
        } catch (DateTimeException e) {
            return false;
        }
    }
}
