package fringekeep.desk.session;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.lab.InventedLab;
import org.junit.jupiter.api.Test;

class NamesTest {
    private final Clock clock = new Clock(new InventedLab().archive().facts());

    @Test
    void aContinuationIsCalledByItsDayInsteadOfTheWholeInstant() {
        String label = "calibration 0001 from 2031-10-21T10:00:00Z";

        assertThat(Names.shortLabel(label, clock)).isEqualTo("calibration 0001 from 21 Oct 11:00");
        assertThat(Names.shortNumber(label, "calibration", clock)).isEqualTo("1, 21 Oct");
        assertThat(Names.shortNumber(label + " b", "calibration", clock)).isEqualTo("1, 21 Oct b");
    }

    @Test
    void otherLabelsStayAndKindsLoseTheirHyphens() {
        assertThat(Names.shortLabel("scan 0412 b", clock)).isEqualTo("scan 0412 b");
        assertThat(Names.shortNumber("scan 0412 b", "scan", clock)).isEqualTo("0412 b");
        assertThat(Names.shortLabel("source-run 0004", clock)).isEqualTo("source run 0004");
        assertThat(Names.shortNumber("source-run 0004", "source-run", clock)).isEqualTo("0004");
    }
}
