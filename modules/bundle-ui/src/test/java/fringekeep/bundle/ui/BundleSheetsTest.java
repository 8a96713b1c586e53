package fringekeep.bundle.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.Hash;
import fringekeep.bundle.Level;
import fringekeep.bundle.ui.BundleDraft.Writer;
import fringekeep.bundle.ui.CheckLine.Stand;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Export and check on a real archive, with jobs run at once. */
class BundleSheetsTest {
    @TempDir
    private static Path shared;

    private static SmallArchive small;
    private static Hash root;

    @TempDir
    private Path folder;

    private TestHand hand;

    @BeforeAll
    static void found() throws Exception {
        small = SmallArchive.found(shared.resolve("archive"));
        root = small.root();
    }

    @AfterAll
    static void close() {
        small.archive().close();
    }

    @BeforeEach
    void open() throws Exception {
        hand = new TestHand(small.archive());
        small.archive().drafts().remove(ExportSheet.DRAFT);
    }

    private ExportSheet sheet() {
        return new ExportSheet(hand, Runnable::run, List.of(root));
    }

    private BundleDraft draft(String name, boolean zip) {
        return new BundleDraft(
                name,
                "Invented readings",
                "Invented readings and their sums.",
                "2031-05-14",
                "CC0-1.0",
                "the invented laboratory",
                "invented, readings",
                List.of(new Writer("Invented Person", "", ""), new Writer("", "", "")),
                folder.toString(),
                zip);
    }

    private List<String> left() throws Exception {
        try (Stream<Path> all = Files.list(folder)) {
            return all.map(path -> path.getFileName().toString()).sorted().toList();
        }
    }

    @Test
    void beginsWithWhatIsKnownAndSaysAtEachFieldWhatIsMissing() {
        ExportSheet sheet = sheet();
        BundleDraft draft = sheet.pane().fields().draft();

        assertThat(draft.name()).startsWith("total-");
        assertThat(draft.publisher()).isEqualTo("invented laboratory");
        assertThat(draft.authors()).extracting(Writer::name).containsExactly("N. N.");
        assertThat(sheet.pane().fields().faultAt("description")).isEqualTo("says nothing yet");
        assertThat(sheet.pane().fields().faultAt("title")).isEmpty();
        assertThat(sheet.pane().canExport()).isFalse();
        assertThat(sheet.pane().goesIn().all().records()).isEqualTo(4);
        assertThat(sheet.pane().goesIn().all().rawFiles()).isEqualTo(1);
    }

    /** 0000-0002-1825-0097 is the example in ORCID's description of its identifier's structure (from memory). */
    @Test
    void namesWhatIsWrongWithEachField() {
        BundleDraft wrong = new BundleDraft(
                "Big Name",
                "",
                " ",
                "14.5.2031",
                "MIT",
                "",
                "",
                List.of(new Writer("", "0000-0002-1825-0098", "")),
                "",
                false);

        assertThat(wrong.faults())
                .containsOnlyKeys(
                        "name",
                        "title",
                        "description",
                        "published",
                        "license",
                        "publisher",
                        "into",
                        "author.0",
                        "author.0.orcid");
        assertThat(draft("fine", false).faults()).isEmpty();
        assertThat(new BundleDraft(
                                "a",
                                "b",
                                "c",
                                "2031-01-01",
                                "CC-BY-4.0",
                                "d",
                                "",
                                List.of(new Writer("Invented Person", "0000-0002-1825-0097", "")),
                                "e",
                                false)
                        .faults())
                .isEmpty();
    }

    @Test
    void exportsAFolderAfterEveryCheckAndSaysHowStrangersCheckIt() throws Exception {
        ExportSheet sheet = sheet();
        sheet.pane().fields().fill(draft("readings", false));
        sheet.press();

        Path place = folder.resolve("readings");
        assertThat(left()).containsExactly("readings");
        assertThat(sheet.exported()).isPresent();
        assertThat(sheet.checks().lines()).extracting(CheckLine::stand).containsOnly(Stand.HOLDS);
        assertThat(sheet.checks().lines().get(6).words()).isEqualTo("2 same bits");
        assertThat(sheet.pane().strangersLine()).isEqualTo("cd '" + place + "' && sha256sum -c manifest-sha256.txt");
        assertThat(hand.done).isEqualTo("exported: " + place);
        Process stranger = new ProcessBuilder("sh", "-c", sheet.pane().strangersLine() + " > /dev/null").start();
        assertThat(stranger.waitFor()).isZero();
    }

    @Test
    void aStoppedExportLeavesNothing() throws Exception {
        for (int reports : List.of(1, 3, 8, 20)) {
            ExportSheet sheet = sheet();
            sheet.pane().fields().fill(draft("stopped", reports % 2 == 0));
            hand.stopAfter = reports;
            sheet.press();
            hand.stopAfter = Integer.MAX_VALUE;

            assertThat(sheet.exported()).as("after %d", reports).isEmpty();
            assertThat(left()).isEmpty();
            assertThat(sheet.pane().wordsShown()).startsWith("Stopped: nothing stands under the name");
            assertThat(sheet.checks().lines()).extracting(CheckLine::stand).contains(Stand.LEFT);
        }
    }

    @Test
    void aNameThatIsTakenIsRefusedAndNothingIsWrittenOver() throws Exception {
        Files.writeString(Files.createDirectory(folder.resolve("taken")).resolve("mine"), "x");
        ExportSheet sheet = sheet();
        sheet.pane().fields().fill(draft("taken", false));
        sheet.press();

        assertThat(sheet.pane().wordsShown()).contains("Not exported").contains("There is something of that name");
        assertThat(Files.readString(folder.resolve("taken/mine"))).isEqualTo("x");
        assertThat(left()).containsExactly("taken");
    }

    @Test
    void whatWasTypedIsKeptAndOffersTheSameAgain() {
        ExportSheet sheet = sheet();
        sheet.pane().fields().fill(draft("kept", true));
        sheet.saveDraft();

        BundleDraft again = sheet().pane().fields().draft();

        assertThat(again).isEqualTo(draft("kept", true));
    }

    @Test
    void ofADraftForAnotherRecordOnlyAuthorsLicenceAndPlaceAreTaken() {
        BundleDraft fresh = draft("fresh", false);
        BundleDraft taken = fresh.taking(draft("other", true).json().with("root", "00"), "01");

        assertThat(taken.name()).isEqualTo("fresh");
        assertThat(taken.zip()).isTrue();
    }

    @Test
    void aBundleIsCheckedAsFolderAndAsZip() throws Exception {
        for (boolean zip : new boolean[] {false, true}) {
            ExportSheet export = sheet();
            export.pane().fields().fill(draft("whole", zip));
            export.press();
            CheckSheet sheet = new CheckSheet(hand, Runnable::run);
            sheet.check(export.exported().orElseThrow().place());

            assertThat(sheet.report().orElseThrow().level()).isEqualTo(Level.RECOMPUTED);
            assertThat(sheet.checks().lines()).extracting(CheckLine::stand).containsOnly(Stand.HOLDS);
            assertThat(sheet.pane().verdictShown())
                    .contains("Holds at every level")
                    .contains("same bits");
        }
    }

    @Test
    void aChangedByteIsNamedAndLaterLevelsAreNotAsked() throws Exception {
        ExportSheet export = sheet();
        export.pane().fields().fill(draft("changed", false));
        export.press();
        Path raw;
        try (Stream<Path> all = Files.walk(folder.resolve("changed/data/raw"))) {
            raw = all.filter(Files::isRegularFile).findFirst().orElseThrow();
        }
        Files.writeString(raw, "9,9\n");

        CheckSheet sheet = new CheckSheet(hand, Runnable::run);
        sheet.check(folder.resolve("changed"));

        assertThat(sheet.report().orElseThrow().level()).isEqualTo(Level.NONE);
        assertThat(sheet.pane().verdictShown()).startsWith("Nothing holds");
        assertThat(sheet.pane().faultsShown()).isPositive();
        assertThat(sheet.pane().mendShown()).contains(raw.getFileName().toString());
        assertThat(sheet.checks().lines())
                .extracting(CheckLine::stand)
                .containsExactly(Stand.FAILS, Stand.LEFT, Stand.LEFT, Stand.LEFT);
    }

    @Test
    void whatIsNoBundleSaysSoAndAStoppedCheckToo() throws Exception {
        CheckSheet sheet = new CheckSheet(hand, Runnable::run);
        sheet.check(folder.resolve("nothing"));
        assertThat(sheet.report()).isEmpty();
        assertThat(sheet.pane().faultsShown()).isEqualTo(1);
        assertThat(sheet.pane().mendShown()).contains("bagit.txt");

        ExportSheet export = sheet();
        export.pane().fields().fill(draft("long", false));
        export.press();
        hand.stopAfter = 1;
        sheet.check(folder.resolve("long"));
        assertThat(sheet.pane().verdictShown()).startsWith("Stopped before the end");
        assertThat(hand.problems).extracting(Problem::code).isEmpty();
    }
}
