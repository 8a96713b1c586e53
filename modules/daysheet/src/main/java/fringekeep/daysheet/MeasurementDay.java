package fringekeep.daysheet;

import fringekeep.archive.ArchiveFacts;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalTime;
import java.time.ZoneId;
import java.time.ZonedDateTime;

/**
 * A measurement day, named by the date on which it begins. A night's scans belong to the day whose evening it was. Where the
 * clock jumps over the boundary, the day begins at the first instant after the jump; where it strikes twice, at the first time.
 *
 * @param date date on which it begins
 * @param boundary local time at which it begins
 * @param zone the laboratory's zone
 */
public record MeasurementDay(LocalDate date, LocalTime boundary, ZoneId zone) {
    /** The day that an instant belongs to. */
    public static MeasurementDay of(Instant instant, ArchiveFacts facts) {
        return of(instant, LocalTime.parse(facts.dayBoundary()), ZoneId.of(facts.zone()));
    }

    /** The day that an instant belongs to. */
    public static MeasurementDay of(Instant instant, LocalTime boundary, ZoneId zone) {
        LocalDate date = instant.atZone(zone).toLocalDate();
        MeasurementDay day = new MeasurementDay(date, boundary, zone);
        return instant.isBefore(day.begin()) ? day.previous() : day;
    }

    /** First instant. */
    public Instant begin() {
        return ZonedDateTime.of(date, boundary, zone)
                .withEarlierOffsetAtOverlap()
                .toInstant();
    }

    /** First instant of the next day. */
    public Instant end() {
        return next().begin();
    }

    /** The day after. */
    public MeasurementDay next() {
        return new MeasurementDay(date.plusDays(1), boundary, zone);
    }

    /** The day before. */
    public MeasurementDay previous() {
        return new MeasurementDay(date.minusDays(1), boundary, zone);
    }
}
