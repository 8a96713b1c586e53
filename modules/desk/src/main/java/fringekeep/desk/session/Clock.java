package fringekeep.desk.session;

import fringekeep.archive.ArchiveFacts;
import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalTime;
import java.time.ZoneId;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.List;

/** Instants as people of the lab read them: its zone, its day boundary, no locale. */
public final class Clock {
    private static final List<String> MONTHS =
            List.of("Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec");
    private static final List<String> DAYS = List.of("Mon", "Tue", "Wed", "Thu", "Fri", "Sat", "Sun");

    private final ZoneId zone;
    private final LocalTime boundary;

    /** The clock of an archive; UTC and midnight where its facts cannot be read. */
    public Clock(ArchiveFacts facts) {
        this.zone = zone(facts.zone());
        this.boundary = boundary(facts.dayBoundary());
    }

    private static ZoneId zone(String text) {
        try {
            return ZoneId.of(text);
        } catch (DateTimeException e) {
            return ZoneOffset.UTC; // a zone of a newer table than ours: shown in UTC, as the tooltip says
        }
    }

    private static LocalTime boundary(String text) {
        try {
            return LocalTime.parse(text);
        } catch (DateTimeException e) {
            return LocalTime.MIDNIGHT;
        }
    }

    /** Zone in force. */
    public ZoneId zone() {
        return zone;
    }

    /** {@code 03:02}. */
    public String time(Instant at) {
        ZonedDateTime local = at.atZone(zone);
        return two(local.getHour()) + ":" + two(local.getMinute());
    }

    /** {@code 14 Mar 00:41}. */
    public String moment(Instant at) {
        ZonedDateTime local = at.atZone(zone);
        return local.getDayOfMonth() + " " + MONTHS.get(local.getMonthValue() - 1) + " " + time(at);
    }

    /** {@code 2025-03-14}. */
    public String date(Instant at) {
        return at.atZone(zone).toLocalDate().toString();
    }

    /** The measurement day an instant belongs to. */
    public LocalDate day(Instant at) {
        ZonedDateTime local = at.atZone(zone);
        return local.toLocalTime().isBefore(boundary) ? local.toLocalDate().minusDays(1) : local.toLocalDate();
    }

    /** {@code Thu 13 Mar 2025}. */
    public static String words(LocalDate day) {
        return DAYS.get(day.getDayOfWeek().getValue() - 1) + " " + day.getDayOfMonth() + " "
                + MONTHS.get(day.getMonthValue() - 1) + " " + day.getYear();
    }

    /** {@code 10 to 14 Mar 2025}, {@code 28 Feb to 2 Mar 2025}. */
    public static String words(LocalDate from, LocalDate to) {
        String last = to.getDayOfMonth() + " " + MONTHS.get(to.getMonthValue() - 1) + " " + to.getYear();
        String first = Integer.toString(from.getDayOfMonth());
        if (from.getYear() != to.getYear()) {
            first += " " + MONTHS.get(from.getMonthValue() - 1) + " " + from.getYear();
        } else if (from.getMonthValue() != to.getMonthValue()) {
            first += " " + MONTHS.get(from.getMonthValue() - 1);
        }
        return from.equals(to) ? words(to) : first + " to " + last;
    }

    /** {@code 14 Mar}. */
    public String dayAndMonth(Instant at) {
        ZonedDateTime local = at.atZone(zone);
        return local.getDayOfMonth() + " " + MONTHS.get(local.getMonthValue() - 1);
    }

    /** When a measurement day begins. */
    public Instant begin(LocalDate day) {
        return day.atTime(boundary).atZone(zone).toInstant();
    }

    /** {@code 06:00 to 06:00}. */
    public String boundaries() {
        String at = two(boundary.getHour()) + ":" + two(boundary.getMinute());
        return at + " to " + at;
    }

    private static String two(int number) {
        return number < 10 ? "0" + number : Integer.toString(number);
    }
}
