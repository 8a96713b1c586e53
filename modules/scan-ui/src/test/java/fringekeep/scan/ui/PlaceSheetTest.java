package fringekeep.scan.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.NewRecord;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.desk.session.Register;
import fringekeep.desk.session.Stops;
import fringekeep.scan.PlaceScans;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.TakeInFiles;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PlaceSheetTest {
    @TempDir
    private Path folder;

    private Bench bench;
    private TestHand hand;
    private List<Hash> scans;

    @BeforeEach
    void found() throws ProblemException, IOException {
        bench = new Bench(folder);
        hand = new TestHand(bench.archive);
        scans = scans(1, 5);
    }

    @AfterEach
    void close() {
        bench.close();
    }

    private List<Hash> scans(int from, int count) throws IOException, ProblemException {
        List<Path> files = new ArrayList<>();
        for (int i = from; i < from + count; i++) {
            files.add(bench.tabFile("p" + i + ".txt", i));
        }
        return new TakeInFiles(bench.archive)
                        .takeIn(
                                new TakeInFiles.Request(
                                        files, Optional.of(bench.tab), false, Optional.of(Bench.PERSON)),
                                Work.QUIET)
                        .stream()
                        .flatMap(outcome -> outcome.scans().stream())
                        .toList();
    }

    private RecordView placement(Hash scan) {
        return PlaceScans.placements(
                        bench.archive,
                        bench.archive.graph(),
                        bench.archive.record(scan).orElseThrow())
                .get(0);
    }

    private static Optional<Hash> names(RecordView placement, String role) {
        return placement.head().about().stream()
                .filter(reference -> reference.role().equals(role))
                .map(AboutReference::record)
                .findFirst();
    }

    @Test
    void offersTheNewestSetupAndTheRunOfTheTimeWhenNothingIsPlaced() {
        PlaceSheet sheet = new PlaceSheet(hand, scans);

        assertThat(sheet.model().setup()).contains(bench.setup);
        assertThat(sheet.model().run()).contains(bench.run);
        assertThat(sheet.pane().whenceShown()).contains("no scan before").contains("by the time of the scan");
        assertThat(sheet.pane().consequenceShown()).contains("5 to be placed");
        assertThat(sheet.pane().table().getValueAt(0, 3)).isEqualTo("unplaced");
    }

    @Test
    void seriesStepsGoToTheScansInOrderAndTheNextOnesGoOn() {
        PlaceSheet first = new PlaceSheet(hand, scans.subList(0, 2));
        first.pane().choose("series", 1);
        first.pane().choose("step", 1);
        first.pane().press();

        assertThat(first.placedAll()).isTrue();
        assertThat(hand.done).isEqualTo("placed: 2 scans");
        assertThat(placement(scans.get(0)).content().integer("step")).hasValue(0);
        assertThat(placement(scans.get(1)).content().integer("step")).hasValue(1);
        assertThat(names(placement(scans.get(1)), "run")).contains(bench.run);

        PlaceSheet next = new PlaceSheet(hand, scans.subList(2, 4));
        assertThat(next.pane().whenceShown()).contains(bench.archive.label(scans.get(1)));
        assertThat(next.model().series()).contains(bench.series);
        assertThat(next.model().firstStep()).hasValue(2);
        next.model().purposeOfSteps();
        assertThat(next.model().purpose(0)).isEqualTo(Purpose.SIGNAL);
        assertThat(next.model().purpose(1)).isEqualTo(Purpose.REFERENCE);

        PlaceSheet tooMany = new PlaceSheet(hand, scans.subList(2, 5));
        assertThat(tooMany.model().withoutStep()).isEqualTo(1);
        assertThat(tooMany.pane().canPlace()).isFalse();
        assertThat(tooMany.pane().consequenceShown()).contains("1 scans have no step left");
    }

    @Test
    void aPlacedScanSaysWhatACorrectionWouldOutdateAndWhatStays() throws ProblemException {
        new PlaceSheet(hand, scans.subList(0, 1)).pane().press();
        Hash placed = placement(scans.get(0)).fingerprint();
        bench.archive.record(new NewRecord(
                LeaningKind.NAME,
                List.of(new InputReference.OfRecord("placement", placed)),
                List.of(),
                Map.of(PartName.CONTENT, JsonObject.EMPTY.with("any", 1)),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.of(Bench.PERSON)));

        PlaceSheet same = new PlaceSheet(hand, scans.subList(0, 1));
        assertThat(same.pane().consequenceShown()).isEqualTo("1 as they are");
        assertThat(same.pane().canPlace()).isFalse();

        PlaceSheet other = new PlaceSheet(hand, scans.subList(0, 2));
        other.pane().choosePurpose(Purpose.REFERENCE);
        assertThat(other.pane().consequenceShown())
                .contains("1 to be placed, 1 to be placed anew")
                .contains("outdated: 1 leaning");
        other.pane().press();
        assertThat(placement(scans.get(0)).head().corrects()).contains(placed);
        assertThat(placement(scans.get(0)).content().text("purpose")).contains("reference");
    }

    @Test
    void stoppingBetweenTransactionsKeepsTheFirstHundred() throws IOException, ProblemException {
        List<Hash> many = new ArrayList<>(scans);
        many.addAll(scans(6, 54));
        many.addAll(commaScans(61));
        PlaceSheet sheet = new PlaceSheet(hand, many);
        hand.stopAfter = many.size() + 1;
        sheet.pane().press();

        assertThat(many).hasSizeGreaterThan(110);
        assertThat(bench.archive.records("placement", 1, 1000)).hasSize(100);
        assertThat(sheet.pane().consequenceShown())
                .contains("stopped: 100 of " + many.size() + " placed and kept")
                .contains((many.size() - 100) + " to be placed");
    }

    private List<Hash> commaScans(int count) throws IOException, ProblemException {
        List<Path> files = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            files.add(bench.commaFile("c" + i + ".csv", i));
        }
        return new TakeInFiles(bench.archive)
                        .takeIn(
                                new TakeInFiles.Request(
                                        files, Optional.of(bench.comma), false, Optional.of(Bench.PERSON)),
                                Work.QUIET)
                        .stream()
                        .flatMap(outcome -> outcome.scans().stream())
                        .toList();
    }

    @Test
    void unplacedScansAreThoseWithoutACurrentPlacement() {
        Stops stops = Stops.shipped();
        assertThat(UnplacedScans.of(Register.read(bench.archive, stops))).isEqualTo(scans);

        new PlaceSheet(hand, scans.subList(0, 2)).pane().press();

        assertThat(UnplacedScans.of(Register.read(bench.archive, stops))).isEqualTo(scans.subList(2, 5));
    }
}
