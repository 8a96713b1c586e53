package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.Component;
import java.awt.event.KeyEvent;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import javax.swing.JTable;
import javax.swing.text.JTextComponent;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** A figure is exported as a dataset, checked, and a changed file is named. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class BundleByHand {
    private static Path folder = Path.of(".");

    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private void write(String field, String words) {
        Component component = person.named(field);
        person.see(component::requestFocusInWindow);
        person.waitFor(field, component::isFocusOwner);
        person.write(words);
        person.waitFor(words, () -> ((JTextComponent) component).getText().equals(words));
    }

    private String cell(JTable table, int row, int column) {
        return person.see(() -> String.valueOf(table.getValueAt(row, column)));
    }

    @Test
    @Order(1)
    void aFigureIsExportedAfterEveryCheck() throws IOException {
        folder = Files.createTempDirectory("invented-export");
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_0);
        person.waitFor(
                "the figures",
                () -> desk.stopShown() == 9
                        && desk.quiet()
                        && desk.listPane().selected().isPresent());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_E);
        person.waitFor("the sheet", () -> desk.sheetShown().equals("export") && desk.quiet());
        write("title", "Invented counts behind a figure");
        write("name", "figure-by-hand");
        write("description", "All counts of this dataset are invented.");
        write("author 0 name", "A. Tester");
        write("into", folder.toString());
        person.picture("export-ready");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        person.waitForLong(
                "the line for strangers", () -> person.find("stranger").isPresent());
        person.picture("export-done");

        JTable checks = (JTable) person.named("checks");
        for (int row = 0; row < checks.getRowCount(); row++) {
            assertThat(cell(checks, row, 2)).as(cell(checks, row, 0)).doesNotContain("fault", "waits", "not done");
        }
        assertThat(folder.resolve("figure-by-hand/manifest-sha256.txt")).isRegularFile();
        assertThat(folder.resolve(".figure-by-hand.aside")).doesNotExist();
    }

    @Test
    @Order(2)
    void aChangedFileOfABundleIsNamed() throws IOException {
        Path raw;
        try (Stream<Path> all = Files.walk(folder.resolve("figure-by-hand/data/raw"))) {
            raw = all.filter(Files::isRegularFile).findFirst().orElseThrow();
        }
        Files.writeString(raw, "changed");
        person.menu("bundle.check");
        person.waitFor("the sheet", () -> desk.sheetShown().equals("check bundle"));
        person.press(KeyEvent.VK_F);
        person.waitFor("the chooser", () -> !person.frame().isFocused());
        person.write(folder.resolve("figure-by-hand").toString());
        person.press(KeyEvent.VK_ENTER);
        JTable faults = (JTable) person.named("faults");
        person.waitForLong("the faults", () -> faults.getRowCount() > 0 && desk.quiet());
        person.picture("check-fails");

        assertThat(cell(faults, 0, 0)).contains(raw.getFileName().toString());
        assertThat(cell((JTable) person.named("levels"), 0, 2)).contains("named below");
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the records again", () -> desk.sheetShown().equals("records"));
    }
}
