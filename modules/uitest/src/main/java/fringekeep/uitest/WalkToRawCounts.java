package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.record.Hash;
import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.event.KeyEvent;
import java.util.Optional;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** From a figure to the raw counts behind it, by keyboard alone, in the archive named at the start. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class WalkToRawCounts {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    @Test
    @Order(1)
    void theWindowShowsTheArchiveAndNoPartOfThePlatform() {
        person.resize(1280, 800);
        person.waitFor("a record", () -> desk.recordPane().page().isPresent());

        assertThat(person.see(desk::sheetShown)).isEqualTo("records");
        assertThat(person.see(() -> person.frame().getTitle())).isEqualTo("Fringekeep");
    }

    @Test
    @Order(2)
    void everyStopOpensByItsKeyAndShowsItsFirstRecord() {
        for (int stop = 0; stop < 10; stop++) {
            int key = stop == 9 ? KeyEvent.VK_0 : KeyEvent.VK_1 + stop;
            person.press(KeyEvent.VK_ALT, key);
            int number = stop;
            person.waitFor("stop " + stop, () -> desk.stopShown() == number && desk.quiet());
            person.picture("stop-" + (stop + 1));
        }
    }

    @Test
    @Order(3)
    void fromAFigureToRawCountsByArrowsAlone() {
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_0);
        person.waitFor(
                "the figures",
                () -> desk.stopShown() == 9 && desk.listPane().selected().isPresent());
        Optional<Hash> figure = person.see(() -> desk.listPane().selected());
        person.waitFor(
                "the figure's page",
                () -> desk.recordPane().page().map(page -> page.record()).equals(figure));
        person.press(KeyEvent.VK_T);
        person.waitFor("the lineage", () -> desk.sheetShown().equals("lineage"));
        person.picture("lineage-of-figure");
        for (int step = 0;
                step < 6 && person.see(() -> desk.lineageSheet().raw().isEmpty());
                step++) {
            person.press(KeyEvent.VK_LEFT);
            person.waitFor("a step", () -> desk.quiet());
        }
        person.picture("lineage-raw-counts");

        assertThat(person.see(() -> desk.lineageSheet().raw().isPresent())).isTrue();
        assertThat(person.see(() -> desk.lineageSheet().raw().orElseThrow().counts().length))
                .isGreaterThan(3);
    }

    @Test
    @Order(4)
    void enterOpensTheScanAndBackspaceReturns() {
        person.press(KeyEvent.VK_ENTER);
        person.waitFor("the record", () -> desk.sheetShown().equals("records") && desk.quiet());
        person.picture("scan");
        person.press(KeyEvent.VK_BACK_SPACE);
        person.waitFor("the lineage again", () -> desk.sheetShown().equals("lineage"));
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_7);
        person.waitFor("the scans", () -> desk.sheetShown().equals("records") && desk.quiet());
    }

    @Test
    @Order(5)
    void darkAndLightAndKeys() {
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_L);
        person.waitFor("dark", () -> fringekeep.desk.look.Ink.dark() && desk.quiet());
        person.picture("scan-dark");
        person.press(KeyEvent.VK_F1);
        person.waitFor("keys", () -> desk.sheetShown().equals("keys"));
        person.picture("keys-dark");
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("back", () -> desk.sheetShown().equals("records"));
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_L);
        person.waitFor("light", () -> !fringekeep.desk.look.Ink.dark() && desk.quiet());
        person.picture("scan-light");
    }
}
