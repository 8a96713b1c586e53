package fringekeep.fit.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.desk.part.FieldRow;
import fringekeep.desk.part.WordChoice;
import fringekeep.desk.run.Runner;
import fringekeep.drawing.Layer;
import fringekeep.fit.FitScans;
import fringekeep.fit.Trial;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class FitByHandTest {
    @TempDir
    private static Path folder;

    private static SmallLab lab;

    private QuietDesk desk;

    @BeforeAll
    static void found() throws ProblemException {
        lab = new SmallLab(folder);
    }

    @BeforeEach
    void sit() {
        desk = lab.desk();
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private FitSheet sheet(Hash... scans) {
        return new FitSheet(desk, List.of(scans));
    }

    private static Trial trial(FitSheet sheet) {
        return sheet.fit().trial().orElseThrow();
    }

    private static Trial.Point point(FitSheet sheet, int row) {
        return trial(sheet).points().stream()
                .filter(point -> point.row() == row)
                .findFirst()
                .orElseThrow();
    }

    private static void choose(FitSheet sheet, String row, String code) {
        ((WordChoice) sheet.choices().orElseThrow().row(row).orElseThrow()).choose(code);
    }

    private static void type(FitSheet sheet, String row, String text) {
        ((FieldRow) sheet.choices().orElseThrow().row(row).orElseThrow()).enter(text);
    }

    private static RecordView record(Hash hash) {
        return lab.archive.record(hash).orElseThrow();
    }

    /** The fit that was recorded last. */
    private static RecordView lastFit() {
        List<Hash> fits = lab.archive.records("fit", 1, 1000);
        return record(fits.get(fits.size() - 1));
    }

    private static Hash headless(FitScans.Request request) throws ProblemException, StoppedException {
        return new FitScans(lab.archive).fit(request, Optional.empty(), Work.QUIET);
    }

    private static void assertSame(RecordView one, RecordView other) throws ProblemException {
        assertThat(one.choices()).isEqualTo(other.choices());
        assertThat(one.result()).isEqualTo(other.result());
        assertThat(one.head().inputs()).isEqualTo(other.head().inputs());
        assertThat(one.payload("residuals")).isEqualTo(other.payload("residuals"));
    }

    @Test
    void recordsWhatTheHeadlessFitRecords() throws ProblemException, StoppedException {
        Hash scan = lab.scan(700);
        FitSheet sheet = sheet(scan);
        choose(sheet, "fit.method", "fringe.weighted/1");
        choose(sheet, "fit.driftOrder", "1");
        type(sheet, "fit.range.to", "450");
        JsonObject shown = trial(sheet).result().orElseThrow();

        sheet.record();

        RecordView byHand = lastFit();
        RecordView byCommand = record(headless(FitScans.Request.of(
                scan, "counts", SmallLab.json("{'method':'fringe.weighted/1','driftOrder':1,'range':{'to':4.5e-7}}"))));
        assertSame(byHand, byCommand);
        assertThat(shown).isEqualTo(byHand.result());
        assertThat(desk.said).isEmpty();
        assertThat(desk.done).hasSize(1);
    }

    @Test
    void everyChoiceSaysTheDefaultThatTheMethodWritesOut() throws ProblemException {
        FitSheet sheet = sheet(lab.scan(650), lab.scan(651));
        JsonObject complete = trial(sheet).choices();

        for (String path : List.of(
                "combine",
                "method",
                "period.sort",
                "period.from",
                "background.sort",
                "references",
                "covariance",
                "dispersion",
                "deadTime.sort",
                "positions")) {
            WordChoice row = (WordChoice)
                    sheet.choices().orElseThrow().row("fit." + path).orElseThrow();
            int dot = path.indexOf('.');
            String written = dot < 0
                    ? complete.text(path).orElseThrow()
                    : complete.object(path.substring(0, dot))
                            .orElseThrow()
                            .text(path.substring(dot + 1))
                            .orElseThrow();
            String usual = row.chosen().equals("calibrated") ? "as-read" : row.chosen();
            assertThat(written).as(path).isEqualTo(usual);
        }
        assertThat(complete.number("interval")).hasValue(0.6827);
        assertThat(complete.number("limit")).hasValue(0.95);
        assertThat(complete.number("outlier")).hasValue(4);
    }

    @Test
    void aMaskWantsAReasonAndIsJudgedOnlyWhenTheFitIsRecorded() throws ProblemException, StoppedException {
        Hash scan = lab.scan(710);
        FitSheet sheet = sheet(scan);
        int judged = lab.archive.records("judgement", 1, 1000).size();

        sheet.fit().turn(point(sheet, 4));
        sheet.fit().turn(point(sheet, 5));
        assertThat(trial(sheet).result().orElseThrow().integer("masked")).hasValue(2);
        assertThat(sheet.fit().wanting()).containsExactly("reason");
        sheet.record();
        assertThat(lab.archive.records("judgement", 1, 1000)).hasSize(judged);

        sheet.masks().reason().choose("shutter-stuck");
        sheet.record();

        RecordView fit = lastFit();
        Hash mask = ((InputReference.OfRecord) fit.head().inputs().stream()
                        .filter(input -> input.role().equals("mask"))
                        .findFirst()
                        .orElseThrow())
                .record();
        assertThat(record(mask).content())
                .isEqualTo(SmallLab.json(
                        "{'verdict':'masked','reason':'shutter-stuck','channel':'counts','points':[[4,5]]}"));
        assertThat(lab.archive.graph().states(fit.fingerprint())).isEmpty();
        assertSame(fit, record(headless(FitScans.Request.of(scan, "counts", JsonObject.EMPTY))));
    }

    @Test
    void aPointMaskedBeforeIsUsedAgainByUndoingTheJudgement() throws ProblemException, StoppedException {
        Hash scan = lab.scan(720);
        FitSheet sheet = sheet(scan);
        sheet.fit().turn(point(sheet, 2));
        sheet.fit().turn(point(sheet, 9));
        sheet.masks().reason().choose("spike");
        sheet.record();

        sheet.fit().turn(point(sheet, 9));
        assertThat(sheet.fit().wanting()).containsExactly("reason");
        sheet.masks().undoing().choose("checked-and-sound");
        sheet.record();

        RecordView fit = lastFit();
        assertThat(fit.result().integer("masked")).hasValue(1);
        assertThat(lab.archive.graph().states(fit.fingerprint())).isEmpty();
        assertThat(new fringekeep.fit.TrialFits(lab.archive).masked(scan, "counts"))
                .containsExactly(2);
        assertSame(fit, record(headless(FitScans.Request.of(scan, "counts", JsonObject.EMPTY))));
    }

    @Test
    void ctrlZTakesBackOneChoiceAndAWholeDrag() throws ProblemException {
        FitSheet sheet = sheet(lab.scan(730));
        FitPlan first = sheet.plan();
        choose(sheet, "fit.period.sort", "free");
        FitPlan second = sheet.plan();
        for (int i = 1; i < 6; i++) {
            double to = 4e-7 - i * 1e-9;
            sheet.fit().drag(plan -> plan.with("range.to", Optional.of(Json.of(to))));
        }
        sheet.fit().release();

        assertThat(sheet.fit().undo()).isTrue();
        assertThat(sheet.plan()).isEqualTo(second);
        assertThat(sheet.fit().undo()).isTrue();
        assertThat(sheet.plan()).isEqualTo(first);
        assertThat(sheet.fit().undo()).isFalse();
        assertThat(sheet.fit().redo()).isTrue();
        assertThat(sheet.plan()).isEqualTo(second);
    }

    @Test
    void aFitThatFailsSaysWhyAndShowsCountsWithoutACurve() throws ProblemException {
        FitSheet sheet = sheet(lab.scan(740));
        type(sheet, "fit.range.to", "40");

        Trial trial = trial(sheet);
        assertThat(trial.result()).isEmpty();
        assertThat(trial.picture().panels()).hasSize(1);
        assertThat(trial.picture().panels().get(0).layers()).noneMatch(Layer.Curve.class::isInstance);
        assertThat(trial.points(Trial.Use.OUTSIDE)).hasSize(SmallLab.ROWS - 2);
        assertThat(sheet.state())
                .isEqualTo(trial.problems().get(0).what() + " "
                        + trial.problems().get(0).mend());
        assertThat(sheet.fit().wanting()).contains("no-fit");
    }

    @Test
    void aScanThatIsNotPlacedShowsItsCountsAndWhatIsWanting() throws ProblemException {
        FitSheet sheet = sheet(lab.unplaced(300));

        assertThat(trial(sheet).problems().get(0).code()).isEqualTo("gather.not-placed");
        assertThat(trial(sheet).points()).hasSize(SmallLab.ROWS);
    }

    @Test
    void whileOneIsComputedOnlyTheNewestChangeIsTriedNext() throws ProblemException {
        Deque<Runnable> waiting = new ArrayDeque<>();
        QuietDesk slow = new QuietDesk(lab.archive, SmallLab.PERSON, new Runner(waiting::add, Runnable::run));
        FitSheet sheet = new FitSheet(slow, List.of(lab.scan(750)));
        drain(waiting);
        for (int i = 1; i <= 50; i++) {
            double to = 4e-7 - i * 1e-9;
            sheet.fit().drag(plan -> plan.with("range.to", Optional.of(Json.of(to))));
        }
        assertThat(waiting).hasSize(1);
        assertThat(sheet.fit().settled()).isFalse();
        int tried = drain(waiting);

        assertThat(tried).isLessThanOrEqualTo(3);
        assertThat(trial(sheet).choices().object("range").orElseThrow().number("to"))
                .hasValue(3.5e-7);
        assertThat(sheet.fit().settled()).isTrue();
    }

    private static int drain(Deque<Runnable> waiting) {
        int count = 0;
        while (!waiting.isEmpty()) {
            waiting.pop().run();
            count++;
        }
        return count;
    }

    @Test
    void whatWasChosenAndNotRecordedIsThereAgain() throws ProblemException {
        Hash scan = lab.scan(760);
        FitSheet sheet = sheet(scan);
        choose(sheet, "fit.driftOrder", "2");
        sheet.fit().turn(point(sheet, 3));
        sheet.left();

        FitSheet again = sheet(scan);
        assertThat(again.plan()).isEqualTo(sheet.plan());
        again.masks().reason().choose("noise");
        again.record();
        assertThat(sheet(scan).plan().choices()).isEqualTo(JsonObject.EMPTY);
    }

    @Test
    void severalScansAreSummedOrJointByAWord() throws ProblemException, StoppedException {
        Hash one = lab.scan(400);
        Hash two = lab.scan(420);
        FitSheet sheet = sheet(one, two);
        assertThat(trial(sheet).result().orElseThrow().number("counts").orElseThrow())
                .isGreaterThan(13_000);
        for (String together : List.of("sum-after-phase", "joint")) {
            choose(sheet, "fit.combine", together);
            sheet.record();
            assertSame(
                    lastFit(),
                    record(headless(new FitScans.Request(
                            List.of(one, two),
                            "counts",
                            JsonObject.EMPTY.with("combine", together),
                            List.of(),
                            List.of(),
                            List.of(),
                            false))));
        }
    }

    @Test
    void ofSeveralFitsOneIsPreferredWithAReason() throws ProblemException, StoppedException {
        Hash scan = lab.scan(770);
        Hash first = headless(FitScans.Request.of(scan, "counts", JsonObject.EMPTY));
        FitSheet sheet = sheet(scan);
        assertThat(sheet.others().lines()).extracting(FitLine::fit).containsExactly(first);
        choose(sheet, "fit.method", "fringe.unweighted/1");
        choose(sheet, "fit.preferred", "better-model");
        sheet.record();
        Hash second = lastFit().fingerprint();

        assertThat(lab.archive.graph().preferred(List.of(first, second)).chosen())
                .contains(second);
        assertThat(sheet.others().lines()).extracting(FitLine::word).containsExactly("", "preferred");

        sheet.fit().prefer(first, "agreed", "", SmallLab.PERSON, desk.said::addAll);
        assertThat(lab.archive.graph().preferred(List.of(first, second)).chosen())
                .contains(first);
        assertThat(desk.said).isEmpty();
    }

    @Test
    void aFitRecordedAsCorrectionReplacesTheOneThatStands() throws ProblemException, StoppedException {
        Hash scan = lab.scan(780);
        Hash first = headless(FitScans.Request.of(scan, "counts", JsonObject.EMPTY));
        FitSheet sheet = sheet(scan);
        choose(sheet, "fit.driftOrder", "1");
        choose(sheet, "fit.again", "yes");
        sheet.record();

        assertThat(lastFit().head().corrects()).contains(first);
        assertThat(lab.archive.graph().states(first)).contains(StateName.CORRECTED);
    }

    @Test
    void backgroundScansAreFoundByTheirNumbers() throws ProblemException {
        Hash dark = lab.scan(20);
        FitSheet sheet = sheet(lab.scan(790));
        String number = lab.archive.label(dark).replace("scan ", "");
        type(sheet, "fit.backgrounds.scans", number);
        choose(sheet, "fit.background.sort", "scan");

        assertThat(sheet.plan().backgrounds()).containsExactly(dark);
        assertThat(trial(sheet).result().orElseThrow().object("backgroundRate")).isPresent();

        type(sheet, "fit.backgrounds.scans", "scan 99999");
        FieldRow row = (FieldRow)
                sheet.choices().orElseThrow().row("fit.backgrounds.scans").orElseThrow();
        assertThat(row.fault()).isNotEmpty();
    }

    @Test
    void ofManyScansThoseThatFailAreNamedAndTheOthersRecorded() throws ProblemException {
        List<Hash> scans = new ArrayList<>(Arrays.asList(lab.scan(500), lab.unplaced(510), lab.scan(520)));
        EachSheet sheet = EachSheet.of(desk, scans);
        sheet.begin();

        assertThat(sheet.each().recorded()).isEqualTo(2);
        assertThat(sheet.each().failures()).hasSize(1);
        assertThat(sheet.each().failures().get(0).problem().code()).isEqualTo("gather.not-placed");
        assertThat(sheet.state()).isEqualTo("2 recorded, 1 failed");
        assertThat(lastFit().head().kind()).isEqualTo(new KindName("fit"));
    }
}
