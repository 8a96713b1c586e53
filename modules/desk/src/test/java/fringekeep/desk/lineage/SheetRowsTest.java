package fringekeep.desk.lineage;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.desk.lab.InventedLab;
import fringekeep.desk.lineage.SheetRows.Gathered;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import org.junit.jupiter.api.Test;

class SheetRowsTest {
    private final InventedLab lab = new InventedLab();
    private final SheetRows rows = new SheetRows(sheet());

    private Sheet sheet() {
        Stops stops = Stops.shipped();
        Register register = Register.read(lab.archive(), stops);
        try {
            return new ReadSheet(lab.archive(), register, stops).read(lab.figure, Work.QUIET);
        } catch (StoppedException e) {
            throw new AssertionError(e);
        }
    }

    @Test
    void theSummaryCountsEveryScanOnce() {
        assertThat(rows.sheet().summary()).contains("36 scans");
        assertThat(rows.sheet().where()).isEqualTo("of 2 measurement days");
        assertThat(rows.sheet().states()).hasSize(1);
    }

    @Test
    void scansAlikeAreGatheredAndTheWithdrawnOneStandsAlone() {
        assertThat(rows.rows().stream().filter(Gathered.class::isInstance)).hasSize(4);
        assertThat(rows.find(lab.withdrawn)).isPresent();
        assertThat(rows.find(lab.scan)).isEmpty();
        assertThat(rows.rowOf(lab.scan)).isNotNegative();
    }

    @Test
    void selectingAGatheredScanOpensItsRowAndClosingGathersItAgain() {
        rows.select(lab.scan);
        assertThat(rows.find(lab.scan)).isPresent();

        rows.close();
        assertThat(rows.find(lab.scan)).isEmpty();
    }

    @Test
    void aFitSharesTheRowOfItsOnlyScan() {
        rows.select(lab.scan);

        assertThat(rows.find(lab.fit)).isEqualTo(rows.find(lab.scan));
    }

    @Test
    void arrowsWalkFromFigureToScanAndBack() {
        assertThat(rows.selected()).contains(lab.figure);
        for (int column : new int[] {8, 7, 6}) {
            assertThat(rows.along(true)).isTrue();
            assertThat(rows.item(rows.selected().orElseThrow()).orElseThrow().column())
                    .isEqualTo(column);
        }

        assertThat(rows.along(false)).isTrue();
        assertThat(rows.item(rows.selected().orElseThrow()).orElseThrow().column())
                .isEqualTo(7);
    }

    @Test
    void theThreadHoldsInputsAndUsersOfTheRecordInHand() {
        rows.select(lab.scan);

        assertThat(rows.thread())
                .contains(lab.scan, lab.fit, lab.property, lab.figure)
                .doesNotContain(lab.withdrawn);
    }
}
