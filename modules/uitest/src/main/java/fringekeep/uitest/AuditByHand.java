package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.event.KeyEvent;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** A group lead recomputes a figure, asks what would change without a scan, and comes back; by keyboard alone. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class AuditByHand {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private void open(int key, int stop) {
        person.press(KeyEvent.VK_ALT, key);
        person.waitFor(
                "stop " + stop,
                () -> desk.stopShown() == stop
                        && desk.quiet()
                        && desk.listPane().selected().isPresent()
                        && desk.recordPane().page().isPresent());
    }

    @Test
    @Order(1)
    void aFigureIsRecomputedFromRawCountsWithAVerdictPerRecord() {
        open(KeyEvent.VK_0, 9);
        long before = person.see(() -> desk.hand().archive().facts().watermark());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_R);
        person.waitFor("the sheet of verdicts", () -> desk.sheetShown().equals("recompute"));
        person.waitForLong("verdicts", desk::quiet);
        person.picture("verdicts");

        String words =
                person.see(() -> person.named("verdicts").getAccessibleContext().getAccessibleName());
        assertThat(words).contains("same bits");
        assertThat(person.see(() -> desk.hand().archive().facts().watermark()))
                .as("recomputing records nothing")
                .isEqualTo(before);
    }

    @Test
    @Order(2)
    void enterOpensTheRecordAndBackspaceReturnsToWhereOneCameFrom() {
        person.press(KeyEvent.VK_DOWN);
        person.press(KeyEvent.VK_ENTER);
        person.waitFor("the record", () -> desk.sheetShown().equals("records") && desk.quiet());

        assertThat(person.see(() -> desk.recordPane().page().isPresent())).isTrue();
    }

    @Test
    @Order(3)
    void whatWouldChangeWithoutAScanIsSupposedAndNothingRecorded() {
        open(KeyEvent.VK_7, 6);
        long before = person.see(() -> desk.hand().archive().facts().watermark());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_SHIFT, KeyEvent.VK_S);
        person.waitFor("the sheet", () -> desk.sheetShown().equals("suppose"));
        person.waitForLong("what would change", desk::quiet);
        person.picture("suppose");

        assertThat(person.see(() -> desk.hand().archive().facts().watermark())).isEqualTo(before);
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the list again", () -> desk.sheetShown().equals("records"));
    }
}
