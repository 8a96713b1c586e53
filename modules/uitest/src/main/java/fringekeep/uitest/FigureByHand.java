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

/** A figure is made of a property, a choice is typed, undone and typed again, and it is recorded. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class FigureByHand {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private List<Hash> figures() {
        return person.see(() -> desk.hand().register().current("figure"));
    }

    @Test
    @Order(1)
    void aFigureIsProposedDrawnAndRecordedByKeyboard() {
        int before = figures().size();
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_9);
        person.waitFor(
                "the properties",
                () -> desk.stopShown() == 8
                        && desk.quiet()
                        && desk.listPane().selected().isPresent());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_G);
        person.waitFor("the draft of a figure", () -> desk.sheetShown().equals("figure"));
        person.named("figure preview");
        person.press(KeyEvent.VK_ENTER);
        person.write("Invented: visibility against power");
        person.press(KeyEvent.VK_ENTER);
        person.waitFor("the drawing", desk::quiet);
        person.picture("figure-draft");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        person.sitDown();
        person.waitFor("one figure more", () -> figures().size() == before + 1);

        assertThat(figures()).hasSize(before + 1);
        person.waitFor("its page", () -> desk.sheetShown().equals("records") && desk.quiet());
        person.picture("figure-recorded");
    }

    @Test
    @Order(2)
    void theDrawingZoomsReadsOutAndCopies() {
        person.waitFor("the figure's page", () -> desk.recordPane().page().isPresent() && desk.quiet());
        person.press(KeyEvent.VK_F6);
        person.press(KeyEvent.VK_RIGHT);
        Component focus = person.see(() ->
                java.awt.KeyboardFocusManager.getCurrentKeyboardFocusManager().getFocusOwner());
        person.press(KeyEvent.VK_PLUS);
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_C);
        person.picture("figure-zoomed");

        assertThat(focus.getClass().getSimpleName()).isEqualTo("PictureView");
        assertThat(person.see(() -> java.awt.Toolkit.getDefaultToolkit()
                        .getSystemClipboard()
                        .isDataFlavorAvailable(java.awt.datatransfer.DataFlavor.imageFlavor)))
                .isTrue();
    }
}
