package fringekeep.desk.session;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.record.Hash;
import fringekeep.desk.lab.InventedLab;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

class LinkedRecordsTest {
    private final InventedLab lab = new InventedLab();
    private final Register register = Register.read(lab.archive(), Stops.shipped());

    private Set<String> kinds(Hash record) {
        return LinkedRecords.of(register, record).stream()
                .map(one -> register.kind(one).orElse(""))
                .collect(Collectors.toSet());
    }

    @Test
    void aScanIsLinkedWithEverythingFromItsCompoundToTheFigureButNotWithItsLike() {
        assertThat(kinds(lab.scan))
                .contains(
                        "compound",
                        "batch",
                        "setup",
                        "calibration",
                        "source-run",
                        "placement",
                        "fit",
                        "property",
                        "figure");
        assertThat(LinkedRecords.of(register, lab.scan).stream()
                        .filter(one -> register.kind(one).orElse("").equals("scan")))
                .containsExactly(lab.scan);
    }

    @Test
    void aPropertyIsLinkedWithAllItsFitsAndScans() {
        assertThat(LinkedRecords.of(register, lab.property).stream()
                        .filter(one -> register.kind(one).orElse("").equals("fit")))
                .hasSize(36);
    }

    @Test
    void statesSayWhatSinceWhenAndWhy() {
        Clock clock = new Clock(lab.archive().facts());

        assertThat(States.sentences(lab.archive(), lab.graph(), clock, lab.property)
                        .get(0)
                        .text())
                .isEqualTo("outdated since 18 Mar 10:05: calibration 1 (power meter scale) was corrected by 3");
        assertThat(States.sentences(lab.archive(), lab.graph(), clock, lab.withdrawn)
                        .get(0)
                        .text())
                .isEqualTo("withdrawn since 13 Mar 01:04: mode hop");
    }

    @Test
    void theMeasurementDayRunsFromBoundaryToBoundary() {
        Clock clock = new Clock(lab.archive().facts());

        // The zone is an hour before UTC, the day begins at 06:00: 04:59 UTC is 05:59, still the day before.
        assertThat(Clock.words(clock.day(java.time.Instant.parse("2025-03-14T04:59:00Z"))))
                .isEqualTo("Thu 13 Mar 2025");
        assertThat(Clock.words(clock.day(java.time.Instant.parse("2025-03-14T05:00:00Z"))))
                .isEqualTo("Fri 14 Mar 2025");
    }
}
