package fringekeep.scan;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.scan.PlacementFacet.Purpose;
import fringekeep.scan.internal.reading.Profiles;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PlaceScansTest {
    private static final String SETUP = """
            {'label':'bench','gratings':[{'sort':'material','period':{'text':'266.0','unit':'nm','si':2.66e-7,
              'uncertainty':{'sort':'exact'}}}],'separations':[{'text':'100','unit':'mm','si':0.1,
              'uncertainty':{'sort':'unstated'}}]}""";

    @TempDir
    private static Path archives;

    private static TemporaryArchive lab;

    @TempDir
    private Path folder;

    private Hash setup;
    private Hash series;
    private Hash profile;
    private List<Hash> scans;

    @BeforeAll
    static void found() throws ProblemException {
        lab = new TemporaryArchive(archives);
    }

    /** Each test reads by a profile of its own, so that it has scans of its own. */
    @BeforeEach
    void bench() throws ProblemException, IOException {
        setup = lab.enter("setup", Profiles.any(SETUP));
        series = lab.enter(
                "series",
                Profiles.any("{'varied':'laser power','steps':[{'name':'low'},{'name':'high'}],'pattern':'A/B/A'}"),
                new AboutReference("setup", setup, AboutReference.Reach.THING));
        profile = lab.enter("reading-profile", Profiles.content(Profiles.GOLDEN));
        scans = takeIn(2);
    }

    private List<Hash> takeIn(int count) throws IOException, ProblemException {
        List<Path> files = new ArrayList<>();
        for (int i = 0; i < count; i++) {
            files.add(Files.writeString(folder.resolve(i + ".csv"), "pos/nm,n\n0," + i + "\n26,12\n52,9\n"));
        }
        TakeInFiles.Request request = new TakeInFiles.Request(files, Optional.of(profile), false, Optional.empty());
        return new TakeInFiles(lab.archive)
                .takeIn(request, Work.QUIET).stream()
                        .flatMap(outcome -> outcome.scans().stream())
                        .toList();
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private PlaceScans.Place place(Hash scan, Purpose purpose, int step) {
        return new PlaceScans.Place(
                scan,
                purpose,
                setup,
                Optional.empty(),
                List.of(),
                step < 0 ? Optional.empty() : Optional.of(series),
                step < 0 ? OptionalInt.empty() : OptionalInt.of(step),
                Optional.empty(),
                Optional.empty());
    }

    private List<Hash> placeAll(List<PlaceScans.Place> places) throws ProblemException {
        return new PlaceScans(lab.archive).place(places, TemporaryArchive.PERSON);
    }

    @Test
    void placesMoreThanATransactionHoldsInOneAct() throws ProblemException, IOException {
        List<Hash> many = takeIn(104);

        List<Hash> placements = placeAll(
                many.stream().map(scan -> place(scan, Purpose.SIGNAL, 1)).toList());

        assertThat(placements).hasSize(104).doesNotHaveDuplicates();
        RecordView first = lab.archive.record(placements.get(0)).orElseThrow();
        assertThat(first.content())
                .isEqualTo(JsonObject.EMPTY.with("purpose", "signal").with("step", 1));
        assertThat(first.head().about()).extracting(AboutReference::role).containsExactly("scan", "setup", "series");
    }

    @Test
    void correctsAnExistingPlacementAndLeavesOneThatSaysTheSame() throws ProblemException {
        Hash first = placeAll(List.of(place(scans.get(0), Purpose.SIGNAL, 0))).get(0);

        Hash same = placeAll(List.of(place(scans.get(0), Purpose.SIGNAL, 0))).get(0);
        Hash changed =
                placeAll(List.of(place(scans.get(0), Purpose.REFERENCE, 0))).get(0);

        assertThat(same).isEqualTo(first);
        assertThat(changed).isNotEqualTo(first);
        assertThat(lab.archive.record(changed).orElseThrow().head().corrects()).contains(first);
        assertThat(PlaceScans.placements(
                        lab.archive,
                        lab.archive.graph(),
                        lab.archive.record(scans.get(0)).orElseThrow()))
                .extracting(RecordView::fingerprint)
                .containsExactly(changed);
    }

    @Test
    void refusesAllWhenOneIsWrongAndStoresNothing() throws ProblemException {
        List<PlaceScans.Place> places = List.of(
                place(scans.get(0), Purpose.SIGNAL, 0),
                place(scans.get(0), Purpose.SIGNAL, 0),
                place(scans.get(1), Purpose.SIGNAL, 7),
                place(setup, Purpose.SIGNAL, -1));

        int before = lab.archive.records("placement", 1, 1_000).size();

        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> placeAll(places));

        assertThat(thrown.problems())
                .extracting(Problem::code)
                .containsExactly("placement.scan-twice", "placement.step-missing", "placement.scan-kind");
        assertThat(thrown.problems().get(1).where()).startsWith(lab.archive.label(scans.get(1)));
        assertThat(lab.archive.records("placement", 1, 1_000)).hasSize(before);
    }

    @Test
    void refusesAStepWithoutASeries() {
        PlaceScans.Place alone = new PlaceScans.Place(
                scans.get(0),
                Purpose.SIGNAL,
                setup,
                Optional.empty(),
                List.of(),
                Optional.empty(),
                OptionalInt.of(0),
                Optional.empty(),
                Optional.empty());

        ProblemException thrown = catchThrowableOfType(ProblemException.class, () -> placeAll(List.of(alone)));

        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("placement.step-alone");
    }
}
