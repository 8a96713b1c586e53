package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.event.KeyEvent;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** What a new user meets: the first sheet, the invented laboratory, founding, and why an archive cannot be opened. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class FirstStart {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());
    private final Path work =
            Path.of(System.getProperty("fringekeep.uitest.out")).resolveSibling("first");

    @Test
    @Order(1)
    void withoutAnArchiveTheFirstSheetStandsWithThreeWaysIn() {
        person.menu("menu.archive.close");
        person.waitFor("the first sheet", () -> desk.sheetShown().equals("first"));
        person.picture("first");

        assertThat(person.find("first Try the invented lab")).isPresent();
        assertThat(person.find("first Found an archive")).isPresent();
    }

    @Test
    @Order(2)
    void aFolderThatIsNoArchiveIsRefusedWithWhatToDo() throws IOException {
        Files.createDirectories(work.resolve("plain"));
        Files.writeString(work.resolve("plain/notes.txt"), "no archive");
        person.see(() -> {
            Program.only().openArchive(work.resolve("plain"));
            return true;
        });
        person.waitFor("words", () -> desk.trouble().size() == 1);
        person.picture("first-no-archive");

        assertThat(person.see(() -> desk.trouble().get(0).mend())).isNotBlank();
        assertThat(person.see(desk::sheetShown)).isEqualTo("first");
    }

    @Test
    @Order(3)
    void anArchiveIsFoundedByKeyboard() throws IOException {
        Files.createDirectories(work);
        person.click(person.named("first Found an archive"));
        person.named("founding");
        person.write("Trial bench");
        person.press(KeyEvent.VK_ENTER);
        person.write("T. Sennet");
        person.press(KeyEvent.VK_ENTER);
        person.write("25:00");
        person.picture("founding-fault");
        person.write("05:30");
        person.press(KeyEvent.VK_ENTER);
        person.press(KeyEvent.VK_TAB);
        person.write(work.resolve("bench").toString());
        person.picture("founding");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        person.waitFor("the empty archive", () -> desk.sheetShown().equals("records") && desk.quiet());
        person.picture("empty");

        assertThat(person.see(() -> desk.hand().archive().facts().title())).isEqualTo("Trial bench");
        assertThat(person.see(() -> desk.hand().archive().facts().dayBoundary()))
                .isEqualTo("05:30");
        assertThat(person.see(() -> desk.hand().personName())).contains("T. Sennet");
    }

    @Test
    @Order(4)
    void theInventedLaboratoryIsMadeFromTheFirstSheet() {
        person.menu("menu.archive.close");
        person.waitFor("the first sheet", () -> desk.sheetShown().equals("first"));
        person.click(person.named("first Try the invented lab"));
        person.waitForLong(
                "the invented laboratory",
                () -> desk.sheetShown().equals("records") && desk.quiet() && desk.stopShown() == 9);
        person.picture("invented");

        assertThat(person.see(() -> desk.hand().archive().facts().invented())).isTrue();
    }
}
