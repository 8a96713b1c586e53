package fringekeep.desk.window;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;

class DaysTest {
    private static final LocalDate FIRST = LocalDate.of(2031, 10, 14);
    private static final LocalDate SECOND = LocalDate.of(2031, 10, 17);
    private static final LocalDate THIRD = LocalDate.of(2031, 10, 21);
    private static final Set<LocalDate> DAYS = Set.of(SECOND, FIRST, THIRD);

    @Test
    void oneGoesFromDayToDayOnWhichSomethingWasRecorded() {
        assertThat(Days.day(DAYS, Optional.of(SECOND), 1)).contains(THIRD);
        assertThat(Days.day(DAYS, Optional.of(SECOND), -1)).contains(FIRST);
        assertThat(Days.day(DAYS, Optional.of(FIRST.plusDays(1)), 1)).contains(SECOND);
        assertThat(Days.day(DAYS, Optional.of(THIRD), 1)).isEmpty();
    }

    @Test
    void withoutADayTheLastOneIsMeant() {
        assertThat(Days.day(DAYS, Optional.empty(), -1)).contains(THIRD);
        assertThat(Days.day(DAYS, Optional.of(FIRST), 0)).contains(FIRST);
        assertThat(Days.day(DAYS, Optional.of(FIRST.minusDays(9)), 0)).contains(THIRD);
        assertThat(Days.day(Set.of(), Optional.empty(), 0)).isEmpty();
    }
}
