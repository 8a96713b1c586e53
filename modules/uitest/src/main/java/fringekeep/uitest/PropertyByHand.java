package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.record.Hash;
import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.Component;
import java.awt.event.KeyEvent;
import java.util.List;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** A property is derived anew from its list: a fit left out by hand, both models computed, the next revision recorded. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class PropertyByHand {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private List<Hash> records(String kind) {
        return person.see(() -> desk.hand().register().records(kind));
    }

    @Test
    @Order(1)
    void theNextRevisionIsComputedAndRecordedByKeyboard() {
        person.resize(1280, 800);
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_9);
        person.waitFor(
                "the properties",
                () -> desk.stopShown() == 8
                        && desk.quiet()
                        && desk.listPane().selected().isPresent());
        int properties = records("property").size();
        int selections = records("selection").size();
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_P);
        person.waitFor("the sheet", () -> desk.sheetShown().equals("property"));
        person.waitFor("the fits", () -> person.named("property.compute").isEnabled());
        person.waitFor(
                "the list has the focus", () -> person.named("property.fits").isFocusOwner());
        person.press(KeyEvent.VK_DOWN);
        person.click(person.named("property.leave"), 268, 10);
        person.waitFor("the list again", desk::quiet);
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_SPACE);
        person.waitForLong(
                "both models",
                () -> person.find("property.record").map(Component::isEnabled).orElse(false));
        person.picture("property-by-hand");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        person.sitDown();
        person.waitForLong(
                "one property more",
                () -> desk.hand().register().records("property").size() == properties + 1);

        assertThat(records("selection")).hasSize(selections + 1);
        person.picture("property-by-hand-recorded");
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the records again", () -> desk.sheetShown().equals("records"));
    }

    @Test
    @Order(2)
    void aRuleIsTypedAndItsListFollows() {
        person.menu("property.rule");
        person.waitFor("the sheet", () -> desk.sheetShown().equals("property") && desk.quiet());
        Component field = person.named("rule.laser_power_w");
        person.click(field);
        person.write("1 to 2");
        person.press(KeyEvent.VK_ENTER);
        person.waitFor("the list", desk::quiet);
        person.picture("property-by-rule");

        assertThat(person.see(() -> ((javax.swing.JTextField) field).getText())).isEqualTo("1 to 2");
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the records again", () -> desk.sheetShown().equals("records"));
    }
}
