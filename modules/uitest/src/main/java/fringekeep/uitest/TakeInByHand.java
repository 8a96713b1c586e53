package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.event.KeyEvent;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.atomic.AtomicInteger;
import javax.swing.JTable;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** Raw files are taken in from a folder, a refused one says line and column, and the new scans are placed in one act. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class TakeInByHand {
    private static final AtomicInteger DRAWN = new AtomicInteger();

    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private int records(String kind) {
        return person.see(() -> desk.hand().register().current(kind).size());
    }

    private JTable table(String name) {
        return (JTable) person.named(name);
    }

    private String cell(JTable table, int row, int column) {
        return person.see(() -> String.valueOf(table.getValueAt(row, column)));
    }

    /** Counts as the invented lab's first counter writes them; no two files are the same. */
    private static String counts(String fifth) {
        StringBuilder text = new StringBuilder("# short bench, invented data\n"
                + "# start: 2031-10-14T23:5" + DRAWN.incrementAndGet() % 10 + ":00+02:00\n"
                + "# dwell: 5 s\n# laser power: 0.25 W\nposition_nm\tcounts\n");
        for (int i = 0; i < 24; i++) {
            String count = i == 4 ? fifth : Integer.toString(740 + (i * 37 + DRAWN.get()) % 90);
            text.append(38 * i).append(".0\t").append(count).append('\n');
        }
        return text.toString();
    }

    @Test
    @Order(1)
    void aFolderIsTriedAtOnceAndTheRefusedFileSaysLineAndColumn() throws IOException {
        Path folder = Files.createTempDirectory("invented-raw");
        Files.writeString(folder.resolve("a.txt"), counts("751"));
        Files.writeString(folder.resolve("b.txt"), counts("many"));
        Files.writeString(folder.resolve("c.txt"), counts("748"));
        person.waitFor("the register", () -> desk.quiet());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_I);
        person.waitFor("the sheet", () -> desk.sheetShown().equals("take in"));
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the chooser gone", () -> person.frame().isFocused());
        person.press(KeyEvent.VK_D);
        person.waitFor("the chooser", () -> !person.frame().isFocused());
        person.write(folder.toString());
        person.press(KeyEvent.VK_ENTER);

        JTable files = table("files");
        person.waitFor("three files tried", () -> files.getRowCount() == 3 && desk.quiet());
        assertThat(cell(files, 0, 2)).isEqualTo("new");
        assertThat(cell(files, 1, 2)).isEqualTo("refused");
        assertThat(cell(files, 1, 6)).startsWith("line 10, column ");
        assertThat(cell(files, 2, 2)).isEqualTo("new");
        person.press(KeyEvent.VK_DOWN);
        person.waitFor("its text", () -> desk.quiet());
        person.picture("take-in-refused");
    }

    @Test
    @Order(2)
    void enterTakesInAndKeepsTheRefusedFileInTheTable() {
        int before = records("scan");
        person.press(KeyEvent.VK_ENTER);
        person.sitDown();
        person.waitFor("two scans more", () -> records("scan") == before + 2);
        person.waitFor("the end", () -> person.find("place").isPresent() && desk.quiet());
        person.picture("take-in-done");

        JTable files = table("files");
        assertThat(cell(files, 0, 2)).startsWith("scan ");
        assertThat(cell(files, 1, 2)).isEqualTo("refused");
    }

    @Test
    @Order(3)
    void theNewScansArePlacedInOneAct() {
        int before = records("placement");
        person.click(person.named("place"));
        person.waitFor("the sheet for placing", () -> desk.sheetShown().equals("place") && desk.quiet());
        JTable scans = table("scans");
        person.waitFor("both scans", () -> scans.getRowCount() == 2);
        person.picture("place-offered");
        person.press(KeyEvent.VK_R);
        person.waitFor("what it would do", desk::quiet);
        assertThat(cell(scans, 0, 4)).startsWith("reference");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        person.waitFor("two placements more", () -> records("placement") == before + 2);
        person.waitFor("the records again", () -> desk.sheetShown().equals("records") && desk.quiet());
    }
}
