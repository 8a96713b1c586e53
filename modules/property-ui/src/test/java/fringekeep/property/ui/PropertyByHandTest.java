package fringekeep.property.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.NewRecord;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.WordChoice;
import fringekeep.desk.run.Runner;
import fringekeep.property.GatherProperty;
import fringekeep.property.SelectFits;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PropertyByHandTest {
    private static PowerLab lab;
    private static List<Hash> fits;

    private QuietDesk desk;

    @BeforeAll
    static void found(@TempDir Path folder) throws Exception {
        lab = PowerLab.found(folder.resolve("archive"));
        PowerLab.Series series = lab.series("vp_01");
        fits = new ArrayList<>();
        for (PowerLab.Point point : series.points()) {
            fits.add(lab.fit(series, point, point.power() + " W"));
        }
    }

    @BeforeEach
    void sit() {
        desk = new QuietDesk(lab.archive, PowerLab.PERSON);
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private static RecordView record(Hash hash) {
        return lab.archive.record(hash).orElseThrow();
    }

    private static RecordView last(String kind) {
        List<Hash> all = lab.archive.records(kind, 1, 10_000);
        return record(all.get(all.size() - 1));
    }

    private static PropertySheet quick(PropertySheet sheet) {
        ((FieldRow) sheet.choices().row("property.heightNodes").orElseThrow()).enter("1");
        return sheet;
    }

    private PropertySheet picked(List<Hash> list) {
        return quick(new PropertySheet(desk, PropertyPlan.picked(list)));
    }

    private static void type(RowsPanel panel, String row, String text) {
        ((FieldRow) panel.row(row).orElseThrow()).enter(text);
    }

    private static void choose(RowsPanel panel, String row, String code) {
        ((WordChoice) panel.row(row).orElseThrow()).choose(code);
    }

    private static RecordView headless(Hash selection, JsonObject choices) throws Exception {
        NewRecord request = new GatherProperty(lab.archive).request(selection, choices, List.of(), Optional.empty());
        return record(lab.archive
                .record(lab.archive.compute(request, List.of(), Work.QUIET))
                .fingerprint());
    }

    private static Hash selectionOf(RecordView property) {
        return ((InputReference.OfRecord) property.head().inputs().get(0)).record();
    }

    private static void assertSame(RecordView one, RecordView other) throws ProblemException {
        assertThat(one.choices()).isEqualTo(other.choices());
        assertThat(one.result()).isEqualTo(other.result());
        assertThat(one.head().inputs()).isEqualTo(other.head().inputs());
        assertThat(one.payload("points")).isEqualTo(other.payload("points"));
        assertThat(one.payload("curves")).isEqualTo(other.payload("curves"));
    }

    @Test
    void recordsListAndPropertyAsTheHeadlessWayDoes() throws Exception {
        PropertySheet sheet = picked(fits);
        assertThat(sheet.property().gathered().orElseThrow().taken()).isEqualTo(fits.size());
        assertThat(lab.archive.records("selection", 1, 100)).isEmpty();
        sheet.compute();
        Answer answer = sheet.property().answer().orElseThrow();
        sheet.record();

        RecordView property = last("property");
        assertSame(property, headless(selectionOf(property), PowerLab.json("{'heightNodes':1}")));
        JsonObject volume = property.result().object("polarizabilityVolume").orElseThrow();
        assertThat(answer.volume())
                .containsExactly(
                        volume.number("value").orElseThrow(), volume.number("u").orElseThrow());
        assertThat(answer.quantities()).hasSize(4);
        assertThat(answer.say().verdict())
                .isEqualTo(property.result().text("verdict").orElseThrow());
        assertThat(sheet.state()).isEqualTo("recorded as " + lab.archive.label(property.fingerprint()));
        assertThat(desk.said).isEmpty();
    }

    @Test
    void aRuleGivesTheSelectionOfTheHeadlessCommand() throws Exception {
        PropertySheet sheet = new PropertySheet(desk, PropertyPlan.rule());
        type(sheet.rule(), "rule.laser_power_w", "2 to 9");
        type(sheet.rule(), "property.label", "middle");
        type(sheet.rule(), "property.words", "signals of middle power");
        quick(sheet).compute();
        sheet.record();

        NewRecord byCommand = new SelectFits(lab.archive)
                .select(
                        "middle",
                        "signals of middle power",
                        List.of(
                                new SelectFits.Condition(
                                        "laser_power_w", Optional.empty(), OptionalDouble.of(2), OptionalDouble.of(9)),
                                new SelectFits.Condition(
                                        "purpose",
                                        Optional.of("signal"),
                                        OptionalDouble.empty(),
                                        OptionalDouble.empty())),
                        PowerLab.PERSON);
        RecordView byHand = last("selection");
        assertThat(byHand.head().inputs()).isEqualTo(byCommand.inputs());
        assertThat(byHand.content()).isEqualTo(byCommand.parts().get(fringekeep.archive.record.PartName.CONTENT));
    }

    @Test
    void aRangeThatIsNoneIsSaidAtTheField() {
        PropertySheet sheet = new PropertySheet(desk, PropertyPlan.rule());
        FieldRow row = (FieldRow) sheet.rule().row("rule.visibility").orElseThrow();
        for (String wrong : List.of("9 to 2", "about 3", "to")) {
            row.enter(wrong);
            assertThat(row.fault()).as(wrong).contains(wrong);
        }
        row.enter("below 0.2");
        assertThat(row.fault()).isEmpty();
        assertThat(sheet.property().plan().conditions()).containsKeys("purpose", "visibility");
    }

    @Test
    void aFitIsLeftOutByHandWithAReasonAndTakenAgain() {
        PropertySheet sheet = picked(fits);
        sheet.fits().go(3);
        Hash fit = sheet.fits().current().orElseThrow().fit();
        sheet.leaving().choose("drifting");

        assertThat(sheet.property().gathered().orElseThrow().taken()).isEqualTo(fits.size() - 1);
        assertThat(sheet.fits().current().orElseThrow().reason()).isEqualTo("drifting");
        sheet.compute();
        sheet.record();
        RecordView selection = last("selection");
        assertThat(selection.content().array("left").objects().get(0).text("reason"))
                .contains("drifting");
        assertThat(selection.head().about().get(0).record()).isEqualTo(fit);
        assertThat(last("property").result().integer("points")).hasValue(fits.size() - 1);

        sheet.leaving().choose("taken");
        assertThat(sheet.property().gathered().orElseThrow().taken()).isEqualTo(fits.size());
        assertThat(sheet.property().undo()).isTrue();
        assertThat(sheet.property().gathered().orElseThrow().taken()).isEqualTo(fits.size() - 1);
    }

    @Test
    void theNextRevisionCorrectsThePropertyAndShowsWhatMoved() throws Exception {
        PropertySheet first = picked(fits);
        first.compute();
        first.record();
        RecordView old = last("property");

        PropertySheet next = new PropertySheet(desk, PropertyByHand.ofProperty(lab.archive, old.fingerprint()));
        choose(next.choices(), "property.bias", "none");
        next.compute();
        List<Answer.Moved> moved = next.property().answer().orElseThrow().moved();
        next.record();

        RecordView now = last("property");
        assertThat(now.head().corrects()).contains(old.fingerprint());
        assertThat(lab.archive.graph().states(old.fingerprint())).contains(StateName.CORRECTED);
        double before = old.result()
                .object("polarizabilityVolume")
                .orElseThrow()
                .number("value")
                .orElseThrow();
        double u = old.result()
                .object("polarizabilityVolume")
                .orElseThrow()
                .number("u")
                .orElseThrow();
        double after = now.result()
                .object("polarizabilityVolume")
                .orElseThrow()
                .number("value")
                .orElseThrow();
        double sigma =
                Double.parseDouble(moved.get(0).sigma().replace('\u2212', '-').replace(" \u03c3", ""));
        assertThat(sigma).isCloseTo((after - before) / u, org.assertj.core.data.Offset.offset(0.0051));
        assertThat(selectionOf(now)).isEqualTo(selectionOf(old));
    }

    @Test
    void tooFewFitsSayWhyAndRecordNothing() {
        int recorded = lab.archive.records("property", 1, 10_000).size();
        PropertySheet sheet = picked(fits.subList(0, 1));
        sheet.compute();
        sheet.record();

        assertThat(sheet.property().problems()).isNotEmpty();
        assertThat(sheet.state()).startsWith(sheet.property().problems().get(0).what());
        assertThat(sheet.property().answer()).isEmpty();
        assertThat(lab.archive.records("property", 1, 10_000)).hasSize(recorded);
    }

    @Test
    void fewSmallPowersCannotTell() {
        PropertySheet sheet = picked(fits.subList(3, 8));
        choose(sheet.choices(), "property.factor.sort", "free");
        sheet.compute();

        assertThat(sheet.property().answer().orElseThrow().say().verdict()).isEqualTo("cannot-tell");
    }

    @Test
    void stoppingLeavesTheSheetReadyAndNothingRecorded() {
        Deque<Runnable> waiting = new ArrayDeque<>();
        QuietDesk slow = new QuietDesk(lab.archive, PowerLab.PERSON, new Runner(waiting::add, Runnable::run));
        PropertySheet sheet = new PropertySheet(slow, PropertyPlan.picked(fits));
        while (!waiting.isEmpty()) {
            waiting.pop().run();
        }
        sheet.compute();
        assertThat(sheet.property().computing()).isTrue();
        slow.stop(PropertyByHand.COMPUTE);
        sheet.property().stopped();
        waiting.pop().run();

        assertThat(sheet.property().computing()).isFalse();
        assertThat(sheet.property().answer()).isEmpty();
    }

    @Test
    void paintsEmptyFullFailingAndSlow() {
        PropertySheet full = picked(fits);
        assertThat(colours(full, 1280, 658)).isGreaterThan(50);
        full.compute();
        assertThat(colours(full, 1280, 658)).isGreaterThan(100);
        assertThat(colours(full, 2560, 1298)).isGreaterThan(100);
        full.pane("choices");
        assertThat(colours(full, 1280, 658)).isGreaterThan(100);
        PropertySheet slow = new PropertySheet(
                new QuietDesk(lab.archive, PowerLab.PERSON, new Runner(task -> {}, Runnable::run)),
                PropertyPlan.rule());
        assertThat(colours(slow, 1280, 658)).isGreaterThan(20);
    }

    private static int colours(PropertySheet sheet, int width, int height) {
        java.awt.image.BufferedImage image = Painting.of(sheet.component(), width, height);
        Set<Integer> colours = new HashSet<>();
        for (int y = 0; y < height; y += 2) {
            for (int x = 0; x < width; x++) {
                colours.add(image.getRGB(x, y));
            }
        }
        return colours.size();
    }
}
