package fringekeep.desk.form;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.time.format.DateTimeFormatter;
import java.time.format.DateTimeFormatterBuilder;
import java.time.temporal.ChronoField;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Dates with times as people of the lab type them: {@code 2025-03-14 03:34} by the clock of the archive's zone, with an
 * offset behind where the clock stood twice or another one was meant.
 */
final class LocalMoment {
    private static final DateTimeFormatter SHORT = DateTimeFormatter.ofPattern("uuuu-MM-dd HH:mm", Locale.ROOT);
    private static final DateTimeFormatter LONG = new DateTimeFormatterBuilder()
            .appendPattern("uuuu-MM-dd HH:mm:ss")
            .appendFraction(ChronoField.NANO_OF_SECOND, 0, 9, true)
            .toFormatter(Locale.ROOT);
    private static final Pattern FORM = Pattern.compile(
            "(?<date>[0-9]{4}-[0-9]{2}-[0-9]{2})[T ]+(?<time>[0-9]{1,2}:[0-9]{2}(:[0-9]{2}(\\.[0-9]{1,9})?)?)"
                    + "\\s*(?<offset>Z|[+-][0-9]{2}:[0-9]{2})?\\s*(\\[?(?<zone>[A-Za-z][A-Za-z0-9_+/-]*)]?)?");

    private final ZoneId zone;

    LocalMoment(ZoneId zone) {
        this.zone = zone;
    }

    /** The instant as typed. */
    String of(Instant at) {
        return of(at.atZone(zone), true);
    }

    /** A moment as typed; offset and zone are said where they are not the archive's. */
    String of(Instant at, String offset, String zoneText) {
        ZonedDateTime here = at.atZone(zone);
        boolean own = zoneText.equals(zone.getId()) && here.getOffset().getId().equals(offset);
        String local = of(own ? here : at.atZone(ZoneOffset.of(offset)), own);
        return own ? local : (local + " " + offset + " " + zoneText).strip();
    }

    private String of(ZonedDateTime time, boolean own) {
        String local = (time.getSecond() == 0 && time.getNano() == 0 ? SHORT : LONG).format(time);
        boolean twice =
                own && zone.getRules().getValidOffsets(time.toLocalDateTime()).size() > 1;
        return twice ? local + " " + time.getOffset().getId() : local;
    }

    /**
     * Reads what was typed.
     *
     * @throws ProblemException if it is no date with time, or the clock never showed it, or twice
     */
    ZonedDateTime read(String typed) throws ProblemException {
        Matcher matcher = FORM.matcher(typed.strip());
        if (!matcher.matches()) {
            throw wrong("\"" + shortened(typed) + "\" is not a date with a time.", "Write it as 2025-03-14 03:34.");
        }
        try {
            String time = matcher.group("time");
            LocalDateTime local =
                    LocalDateTime.parse(matcher.group("date") + "T" + (time.indexOf(':') == 1 ? "0" : "") + time);
            String named = matcher.group("zone");
            ZoneId there = named == null || named.equals("Z") ? zone : ZoneId.of(named);
            String offset = "Z".equals(named) ? "Z" : matcher.group("offset");
            return offset == null
                    ? byTheClock(local, there)
                    : withOffset(local, ZoneOffset.of(offset), there, named != null && !named.equals("Z"));
        } catch (DateTimeException e) {
            throw wrong(
                    "\"" + shortened(typed) + "\" is not a date with a time of any calendar or zone.",
                    "Write it as 2025-03-14 03:34.");
        }
    }

    private static ZonedDateTime byTheClock(LocalDateTime local, ZoneId there) throws ProblemException {
        List<ZoneOffset> offsets = there.getRules().getValidOffsets(local);
        if (offsets.size() == 1) {
            return local.atZone(there);
        }
        throw offsets.isEmpty()
                ? wrong(
                        "The clock of " + there + " never showed this time: it was put on.",
                        "Write the time it showed.")
                : wrong(
                        "The clock of " + there + " showed this time twice.",
                        "Write " + offsets.get(0) + " or " + offsets.get(1) + " behind it.");
    }

    private ZonedDateTime withOffset(LocalDateTime local, ZoneOffset offset, ZoneId there, boolean named) {
        ZonedDateTime fits = ZonedDateTime.ofInstant(local, offset, there);
        boolean keepsTime =
                fits.toLocalDateTime().equals(local) && fits.getOffset().equals(offset);
        boolean twice = there.getRules().getValidOffsets(local).size() > 1;
        return keepsTime && (named || twice)
                ? fits
                : OffsetDateTime.of(local, offset).toZonedDateTime();
    }

    private static ProblemException wrong(String what, String mend) {
        return new ProblemException(new Problem("form.moment", what, "", mend + " Nothing has been stored."));
    }

    private static String shortened(String text) {
        return text.length() > 60 ? text.substring(0, 60) + "…" : text;
    }
}
