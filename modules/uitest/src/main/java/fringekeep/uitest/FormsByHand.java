package fringekeep.uitest;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.record.Hash;
import fringekeep.desk.window.Desk;
import fringekeep.desk.window.Program;
import java.awt.event.KeyEvent;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;

/** Forms by hand: a new record, a correction, a continuation, a judgement and a note, by keyboard alone. */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class FormsByHand {
    private final Person person = new Person();
    private final Desk desk = person.see(() -> Program.only().desk());

    private Set<Hash> records(String kind) {
        return person.see(() -> Set.copyOf(desk.hand().register().records(kind)));
    }

    private RecordView added(String kind, Set<Hash> before) {
        person.waitFor("a new " + kind, () -> records(kind).size() > before.size() && desk.quiet());
        person.waitFor("the record", () -> desk.sheetShown().equals("records"));
        Hash record = records(kind).stream()
                .filter(one -> !before.contains(one))
                .findFirst()
                .orElseThrow();
        return desk.hand().archive().record(record).orElseThrow();
    }

    private void next(int times) {
        for (int i = 0; i < times; i++) {
            person.press(KeyEvent.VK_ENTER);
        }
    }

    private void form() {
        person.waitFor("the form", () -> desk.sheetShown().equals("form") && desk.quiet());
    }

    private void open(int stop) {
        person.press(KeyEvent.VK_ALT, stop);
        person.waitFor(
                "a record in hand",
                () -> desk.quiet() && desk.listPane().selected().isPresent());
    }

    @Test
    @Order(1)
    void aQuotedValueIsChosenFromTheKindsAndTyped() {
        person.resize(1280, 800);
        person.sitDown();
        Set<Hash> before = records("quoted");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_SHIFT, KeyEvent.VK_N);
        person.waitFor("the kinds", () -> desk.sheetShown().equals("kinds") && desk.quiet());
        person.picture("kinds");
        List<String> kinds =
                List.of("compound", "batch", "setup", "calibration", "monitor log", "source run", "velocity");
        for (int i = 0; i < kinds.size() + 3; i++) {
            person.press(KeyEvent.VK_DOWN);
        }
        person.press(KeyEvent.VK_ENTER);
        form();
        person.write("compound 1");
        next(1);
        person.waitFor("the compound", desk::quiet);
        next(1);
        person.write("polarizability volume");
        next(1);
        person.write("demo fan");
        next(1);
        person.write("433(11) Ao3");
        person.picture("quoted-typed");
        next(1);
        person.write("calculated");
        next(2);
        person.write("Invented for a test.");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);

        RecordView quoted = added("quoted", before);
        assertThat(quoted.content().object("quantity").orElseThrow().text("text"))
                .contains("433");
        assertThat(quoted.head().about()).hasSize(1);
    }

    @Test
    @Order(2)
    void aSetupComesAfterAnotherWithCautionsRead() {
        open(KeyEvent.VK_3);
        Set<Hash> before = records("setup");
        person.press(KeyEvent.VK_A);
        form();
        person.waitFor("the cautions", () -> person.find("caution read").isPresent());
        person.picture("setup-after");
        person.write("bench, seen again");
        person.click(person.named("caution read"));
        person.picture("setup-read");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);

        RecordView setup = added("setup", before);
        assertThat(setup.head().after()).isPresent();
        assertThat(setup.content().flag("acknowledged")).contains(true);
    }

    @Test
    @Order(3)
    void aDraftIsKeptWhenTheFormIsLeftAndGoesOn() {
        open(KeyEvent.VK_2);
        person.press(KeyEvent.VK_C);
        form();
        person.press(KeyEvent.VK_ENTER);
        person.press(KeyEvent.VK_ENTER);
        person.write("FAN-3, mended");
        person.press(KeyEvent.VK_ESCAPE);
        person.waitFor("the list", () -> desk.sheetShown().equals("records") && desk.quiet());
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_SHIFT, KeyEvent.VK_N);
        person.waitFor("the kinds", () -> desk.sheetShown().equals("kinds") && desk.quiet());
        person.press(KeyEvent.VK_ENTER);
        form();
        person.picture("batch-draft");
        person.click(person.named("discard draft"));
        person.waitFor("the list", () -> !desk.sheetShown().equals("form") && desk.quiet());
    }

    @Test
    @Order(4)
    void aJudgementWithReasonAndWords() {
        open(KeyEvent.VK_7);
        Optional<Hash> scan = person.see(() -> desk.listPane().selected());
        Set<Hash> before = records("judgement");
        person.press(KeyEvent.VK_J);
        form();
        next(2);
        person.write("doubted");
        next(1);
        person.write("few counts");
        next(1);
        person.picture("judgement");
        person.write("Few counts that night.");
        person.press(KeyEvent.VK_CONTROL, KeyEvent.VK_ENTER);
        added("judgement", before);

        assertThat(person.see(() -> desk.hand().register().graph().states(scan.orElseThrow())))
                .contains(StateName.DOUBTED);
    }
}
