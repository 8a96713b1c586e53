package fringekeep.daysheet;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalTime;
import java.time.ZoneId;
import org.junit.jupiter.api.Test;

/** Clock changes of Europe/Lisbon in 2031 by the rule in force: last Sundays of March and October at 01:00 UTC (IANA tz database). */
class MeasurementDayTest {
    private static final ZoneId LISBON = ZoneId.of("Europe/Lisbon");
    private static final LocalTime SIX = LocalTime.of(6, 0);

    @Test
    void aNightBelongsToTheEveningItBeganOn() {
        MeasurementDay day = MeasurementDay.of(Instant.parse("2031-05-15T01:30:00Z"), SIX, LISBON);

        assertThat(day.date()).isEqualTo(LocalDate.of(2031, 5, 14));
    }

    @Test
    void theBoundaryItselfBeginsTheNewDay() {
        MeasurementDay day = MeasurementDay.of(Instant.parse("2031-05-15T05:00:00Z"), SIX, LISBON);

        assertThat(day.date()).isEqualTo(LocalDate.of(2031, 5, 15));
        assertThat(day.begin()).isEqualTo(Instant.parse("2031-05-15T05:00:00Z"));
    }

    @Test
    void theDayWithTheSpringChangeIsAnHourShorter() {
        MeasurementDay day = new MeasurementDay(LocalDate.of(2031, 3, 29), SIX, LISBON);

        assertThat(Duration.between(day.begin(), day.end())).isEqualTo(Duration.ofHours(23));
    }

    @Test
    void theDayWithTheAutumnChangeIsAnHourLonger() {
        MeasurementDay day = new MeasurementDay(LocalDate.of(2031, 10, 25), SIX, LISBON);

        assertThat(Duration.between(day.begin(), day.end())).isEqualTo(Duration.ofHours(25));
    }

    @Test
    void daysFollowOneAnotherWithoutAGapOverAYear() {
        MeasurementDay day = new MeasurementDay(LocalDate.of(2031, 1, 1), LocalTime.of(1, 30), LISBON);
        for (int i = 0; i < 366; i++) {
            assertThat(MeasurementDay.of(day.begin(), day.boundary(), LISBON)).isEqualTo(day);
            assertThat(MeasurementDay.of(day.end().minusNanos(1), day.boundary(), LISBON))
                    .isEqualTo(day);
            day = day.next();
        }
    }
}
