package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.record.Hash;
import fringekeep.desk.pane.RecordPage;
import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.Toolkit;
import java.awt.datatransfer.DataFlavor;
import java.awt.datatransfer.UnsupportedFlavorException;
import java.awt.event.KeyEvent;
import java.io.IOException;
import java.util.Optional;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** Views, lists and record panes, by keyboard alone, in the archive named at the start. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class ListsAndViews {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private int rows() {
        return person.see(() -> desk.listPane().table().getRowCount());
    }

    private void openScans() {
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_7);
        person.waitFor(
                "the scans",
                () -> desk.stopShown() == 6
                        && desk.sheetShown().equals("records")
                        && desk.quiet()
                        && desk.listPane().table().isFocusOwner());
    }

    @Test
    @Order(1)
    void aDayNarrowsStripAndListAndCtrlArrowsGoToAnother() {
        person.resize(1280, 800);
        person.waitFor("a record", () -> desk.recordPane().page().isPresent() && desk.quiet());
        openScans();
        int all = rows();
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_D);
        person.waitFor("a day", () -> desk.quiet() && desk.listPane().table().getRowCount() < all);
        int first = rows();
        person.picture("view-day");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_RIGHT);
        person.waitFor(
                "another day", () -> desk.quiet() && desk.listPane().table().getRowCount() != first);
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_HOME);
        person.waitFor("all again", () -> desk.quiet());
        openScans();

        assertThat(rows()).isEqualTo(all);
    }

    @Test
    @Order(2)
    void theChoiceOfViewOpensFromTheStripByKeys() {
        openScans();
        int all = rows();
        person.press(KeyEvent.VK_F6);
        person.press(KeyEvent.VK_F6);
        for (int i = 0; i < 12; i++) {
            person.press(KeyEvent.VK_LEFT);
        }
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_D);
        person.waitFor("the choice", () -> desk.sheetShown().equals("view") && desk.quiet());
        person.picture("view-choice");
        person.press(KeyEvent.VK_DOWN);
        person.press(KeyEvent.VK_ENTER);
        person.waitFor("the records of a day", () -> desk.sheetShown().equals("records") && desk.quiet());
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_HOME);
        person.waitFor("all", () -> desk.quiet());
        openScans();

        assertThat(rows()).isEqualTo(all);
    }

    @Test
    @Order(3)
    void filterWordsAreTurnedByAKeyAndRowsMarkedBySpace() {
        openScans();
        int all = rows();
        person.press(KeyEvent.VK_F4);
        person.waitFor(
                "fewer scans", () -> desk.quiet() && desk.listPane().table().getRowCount() < all);
        person.picture("list-filtered");
        person.press(KeyEvent.VK_SPACE);
        person.press(KeyEvent.VK_SPACE);
        person.press(KeyEvent.VK_SPACE);
        person.waitFor("three marked", () -> desk.listPane().marked().size() == 3);
        person.picture("list-marked");

        assertThat(person.see(() -> desk.listPane()
                        .marked()
                        .contains(desk.listPane().selected().orElseThrow())))
                .isFalse();
    }

    @Test
    @Order(4)
    void markedRowsAreCopiedAsATableWithUnitsInHeads() throws UnsupportedFlavorException, IOException {
        openScans();
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_A);
        int marked = person.see(() -> desk.listPane().marked().size());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_C);
        person.waitFor("the copy", () -> desk.quiet());
        Object copied = Toolkit.getDefaultToolkit().getSystemClipboard().getData(DataFlavor.stringFlavor);
        String[] lines = copied.toString().split("\n");

        assertThat(lines).hasSize(marked + 1);
        assertThat(lines[0]).startsWith("scan\t").contains("P / W").contains("u(visibility)");
    }

    @Test
    @Order(5)
    void columnsAreChosenByKeysAndKept() {
        openScans();
        int before = person.see(() -> desk.listPane().table().getColumnCount());
        person.press(KeyEvent.VK_F3);
        person.picture("columns-choice");
        person.press(KeyEvent.VK_END);
        person.press(KeyEvent.VK_SPACE);
        person.press(KeyEvent.VK_ENTER);
        person.waitFor(
                "one column more or less",
                () -> desk.quiet() && desk.listPane().table().getColumnCount() != before);
        openScans();
        assertThat(person.see(() -> desk.listPane().table().getColumnCount())).isNotEqualTo(before);
        person.press(KeyEvent.VK_F3);
        person.press(KeyEvent.VK_HOME);
        person.waitFor(
                "the usual columns",
                () -> desk.quiet() && desk.listPane().table().getColumnCount() == before);
    }

    @Test
    @Order(6)
    void everyRecordOfEveryStopHasAPaneWithoutRawNames() {
        for (int stop = 0; stop < 10; stop++) {
            int key = stop == 9 ? KeyEvent.VK_0 : KeyEvent.VK_1 + stop;
            int number = stop;
            person.press(KeyEvent.VK_ALT, key);
            person.waitFor("stop " + stop, () -> desk.stopShown() == number && desk.quiet());
            person.press(KeyEvent.VK_DOWN);
            person.waitFor("its record", () -> {
                Optional<Hash> hand = desk.listPane().selected();
                return desk.quiet()
                        && desk.recordPane().page().map(RecordPage::record).equals(hand);
            });
            person.picture("pane-" + (stop + 1));
            RecordPage page = person.see(() -> desk.recordPane().page().orElseThrow());
            assertThat(page.groups().stream()
                            .flatMap(group -> group.facts().stream())
                            .map(fact -> fact.name()))
                    .as(page.label())
                    .noneMatch(name -> name.matches(".*[a-z][A-Z].*"));
        }
    }

    @Test
    @Order(7)
    void theLineageLineIsFollowedByKeys() {
        openScans();
        person.press(KeyEvent.VK_F6);
        person.press(KeyEvent.VK_F6);
        person.press(KeyEvent.VK_LEFT);
        person.press(KeyEvent.VK_ENTER);
        person.waitFor("another stop", () -> desk.stopShown() != 6 && desk.quiet());
    }
}
