package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.record.Hash;
import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import fringekeep.drawing.PictureView;
import java.awt.Component;
import java.awt.event.KeyEvent;
import java.awt.geom.Rectangle2D;
import java.util.List;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** A scan is fitted by hand: a point masked with a reason by keyboard, the range dragged by mouse, the fit recorded. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class FitByHand {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private List<Hash> records(String kind) {
        return person.see(() -> desk.hand().register().records(kind));
    }

    private void ready() {
        person.waitForLong(
                "a fit that can be recorded",
                () -> person.find("fit.record").map(Component::isEnabled).orElse(false));
    }

    private void scans() {
        person.press(KeyEvent.VK_ALT, KeyEvent.VK_7);
        person.waitFor(
                "the scans",
                () -> desk.stopShown() == 6
                        && desk.quiet()
                        && desk.listPane().selected().isPresent());
    }

    @Test
    @Order(1)
    void aPointIsMaskedWithAReasonAndTheFitRecordedByKeyboard() {
        person.resize(1280, 800);
        scans();
        int fits = records("fit").size();
        int judgements = records("judgement").size();
        person.press(KeyEvent.VK_F);
        person.waitFor("the sheet", () -> desk.sheetShown().equals("fit-by-hand"));
        ready();
        person.waitFor(
                "the plot has the focus", () -> person.named("fit.fringe").isFocusOwner());
        person.picture("fit-by-hand");
        person.press(KeyEvent.VK_RIGHT);
        person.press(KeyEvent.VK_RIGHT);
        person.press(KeyEvent.VK_M);
        person.waitFor(
                "the reason is asked for", () -> person.named("fit.mask.reason").isShowing());
        person.press(KeyEvent.VK_F6);
        person.press(KeyEvent.VK_RIGHT);
        ready();
        person.picture("fit-by-hand-masked");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        person.sitDown();
        person.waitFor(
                "one fit more", () -> desk.hand().register().records("fit").size() == fits + 1);

        assertThat(records("judgement")).hasSize(judgements + 1);
        person.picture("fit-by-hand-recorded");
    }

    @Test
    @Order(2)
    void theRangeFollowsTheMouseAlongTheAxisAndCtrlZTakesItBack() {
        PictureView view = (PictureView) person.named("fit.fringe");
        Rectangle2D foot = person.see(() -> view.plot(1).orElseThrow());
        int axis = (int) foot.getMaxY() + 4;
        person.drag(view, (int) foot.getMaxX() - 3, axis, (int) foot.getCenterX(), axis);
        ready();
        person.picture("fit-by-hand-range");
        double less = person.see(() -> used(view));
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_Z);
        person.waitFor("the whole range again", () -> desk.quiet() && used(view) > less);

        assertThat(person.see(() -> used(view))).isGreaterThan(less);
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the records again", () -> desk.sheetShown().equals("records"));
    }

    /** How many points are drawn as used. */
    private static double used(PictureView view) {
        return view.picture().panels().get(0).layers().stream()
                .filter(layer -> layer.name().equals("counts"))
                .mapToInt(layer -> ((fringekeep.drawing.Layer.Points) layer).x().length)
                .sum();
    }

    @Test
    @Order(3)
    void allThatHaveNoFitAreFittedAndThoseThatFailAreNamed() {
        scans();
        person.menu("fit.unfitted");
        person.waitFor("the sheet", () -> desk.sheetShown().equals("fit-each"));
        person.waitForLong("the scans without fit", desk::quiet);
        person.picture("fit-each");
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the records again", () -> desk.sheetShown().equals("records"));
    }
}
