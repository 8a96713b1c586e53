package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.desk.look.Ink;
import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.event.KeyEvent;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Pictures of every stop and sheet, small and wide, light and dark, for people to look at. */
class Screens {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    @ParameterizedTest(name = "screens of {0} × {1}, {2}")
    @CsvSource({"1280, 800, light", "1280, 800, dark", "2560, 1440, light", "2560, 1440, dark"})
    void everyStopAndSheetIsPainted(int width, int height, String theme) {
        theme(theme.equals("dark"));
        person.resize(width, height);
        String name = "screen-" + width + "-" + theme + "-";
        for (int stop = 0; stop < 10; stop++) {
            int number = stop;
            person.press(KeyEvent.VK_ALT, stop == 9 ? KeyEvent.VK_0 : KeyEvent.VK_1 + stop);
            person.waitFor("stop " + stop, () -> desk.stopShown() == number && desk.quiet());
            person.picture(name + "stop-" + (stop + 1));
        }
        person.press(KeyEvent.VK_T);
        person.waitForLong("lineage", () -> desk.sheetShown().equals("lineage") && desk.quiet());
        person.picture(name + "lineage");
        person.press(KeyEvent.VK_F1);
        person.waitFor("keys", () -> desk.sheetShown().equals("keys"));
        person.picture(name + "keys");
        person.press(KeyEvent.VK_ESCAPE);
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_0);
        person.waitFor("figures", () -> desk.sheetShown().equals("records") && desk.quiet());

        assertThat(person.see(() -> person.frame().getWidth())).isEqualTo(width);
        assertThat(person.colours()).as("colours on the screen").isGreaterThan(50);
        theme(false);
    }

    private void theme(boolean dark) {
        if (person.see(() -> Ink.dark() != dark)) {
            person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_L);
        }
        person.waitFor("the theme", () -> Ink.dark() == dark && desk.quiet());
    }
}
