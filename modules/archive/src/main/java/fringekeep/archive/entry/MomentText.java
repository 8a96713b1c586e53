package fringekeep.archive.entry;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Moment;
import java.time.DateTimeException;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.Optional;

/** Moments as text: {@code 2031-05-14T11:03:11+02:00}, {@code 2031-05-14T09:03:11Z}, with {@code [zone]} if it matters. */
public final class MomentText {
    private MomentText() {}

    /**
     * Reads a moment.
     *
     * @throws ProblemException if it is none; a time without offset is none
     */
    public static Moment parse(String text) throws ProblemException {
        try {
            ZonedDateTime time = ZonedDateTime.parse(text);
            Optional<String> zone = time.getZone() instanceof ZoneOffset
                    ? Optional.empty()
                    : Optional.of(time.getZone().getId());
            return new Moment(time.toInstant(), time.getOffset().getId(), zone);
        } catch (DateTimeException e) {
            throw new ProblemException(
                    new Problem(
                            "entry.moment",
                            "\"" + (text.length() > 60 ? text.substring(0, 60) + "…" : text) + "\" is not a moment.",
                            "",
                            "Write date, time and offset from UTC, such as 2031-05-14T11:03:11+02:00. Nothing has been stored."));
        }
    }
}
