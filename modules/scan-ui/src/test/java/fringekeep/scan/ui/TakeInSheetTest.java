package fringekeep.scan.ui;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.scan.ui.FileLine.Stand;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class TakeInSheetTest {
    @TempDir
    private static Path folder;

    private static Bench bench;

    private final List<Hash> toPlace = new ArrayList<>();
    private TestHand hand;
    private TakeInSheet sheet;

    @BeforeAll
    static void found() throws ProblemException {
        bench = new Bench(folder);
    }

    @AfterAll
    static void close() {
        bench.close();
    }

    @BeforeEach
    void open() {
        hand = new TestHand(bench.archive);
        sheet = new TakeInSheet(hand, Runnable::run, toPlace::addAll);
    }

    private List<Stand> stands() {
        return sheet.model().lines().stream().map(FileLine::stand).toList();
    }

    private long scans() {
        return bench.archive.records("scan", 1, 10_000).size();
    }

    private Object cell(int row, int column) {
        return sheet.pane().table().getValueAt(row, column);
    }

    @Test
    void filesAreTriedAtOnceAndNothingIsStored() throws IOException {
        long before = scans();
        sheet.add(List.of(bench.commaFile("t1.csv", 1), bench.tabFile("t2.txt", 2), bench.brokenFile("t3.csv")));

        assertThat(stands()).containsExactly(Stand.READS, Stand.READS, Stand.REFUSED);
        assertThat(cell(0, 3)).asString().contains("counter 1");
        assertThat(cell(1, 3)).asString().contains("counter 2");
        assertThat(cell(0, 4)).isEqualTo("21");
        assertThat(sheet.pane().lookPane().pictures()).hasSize(1);
        assertThat(scans()).isEqualTo(before);
    }

    @Test
    void aRefusedFileNamesLineAndColumnOnceAProfileIsChosenAndShowsItsLine() throws IOException {
        sheet.add(List.of(bench.brokenFile("r1.csv")));
        int counterOne = 1
                + sheet.pane()
                        .profileChoice()
                        .words()
                        .subList(1, 3)
                        .indexOf(sheet.pane().profileChoice().words().stream()
                                .filter(words -> words.contains("counter 1"))
                                .findFirst()
                                .orElseThrow());
        sheet.pane().profileChoice().choose(counterOne);

        assertThat(sheet.model().line(0).problems()).extracting(Problem::code).containsExactly("scan.not-a-number");
        assertThat(cell(0, 6)).asString().startsWith("line 4, column 4: ");
        assertThat(sheet.pane().lookPane().raw().marked()).containsExactly(4);
        assertThat(sheet.pane().wordsShown()).contains("five").contains("Nothing was stored");
    }

    @Test
    void takingInKeepsRefusedFilesInTheTableAndOffersToPlace() throws IOException {
        long before = scans();
        sheet.add(List.of(bench.commaFile("g1.csv", 11), bench.brokenFile("g2.csv"), bench.tabFile("g3.txt", 13)));
        sheet.ear().take();

        assertThat(stands()).containsExactly(Stand.TAKEN_IN, Stand.REFUSED, Stand.TAKEN_IN);
        assertThat(scans()).isEqualTo(before + 2);
        assertThat(hand.done).isEqualTo("2 files taken in");
        sheet.ear().placeThem();
        assertThat(toPlace).isEqualTo(sheet.model().scansTaken()).hasSize(2);
        assertThat(sheet.pane().canTake()).isFalse();
    }

    @Test
    void aFileThatIsKnownIsRecognisedByItsBytes() throws IOException {
        Path first = bench.commaFile("k1.csv", 21);
        sheet.add(List.of(first));
        sheet.ear().take();
        String label = bench.archive.label(sheet.model().scansTaken().get(0));

        TakeInSheet again = new TakeInSheet(hand, Runnable::run, scans -> {});
        again.add(List.of(Files.copy(first, folder.resolve("another name.csv"))));

        assertThat(again.model().line(0).stand()).isEqualTo(Stand.KNOWN);
        assertThat(again.pane().table().getValueAt(0, 2)).isEqualTo("known: " + label);
        assertThat(again.pane().canTake()).isFalse();
    }

    @Test
    void aMendedFileIsTriedAgain() throws IOException {
        Path broken = bench.brokenFile("m1.csv");
        sheet.add(List.of(broken));
        assertThat(stands()).containsExactly(Stand.REFUSED);

        Files.writeString(broken, "pos/nm,n\n0,512\n26,498\n52,455\n78,401\n");
        sheet.ear().again();

        assertThat(stands()).containsExactly(Stand.READS);
    }

    @Test
    void aFolderIsWalkedThroughByNameWithoutHiddenFiles() throws IOException {
        Path inside = Files.createDirectories(folder.resolve("day/deeper"));
        Files.copy(bench.commaFile("f-b.csv", 31), inside.resolve("b.csv"));
        Files.copy(bench.commaFile("f-a.csv", 32), folder.resolve("day/a.csv"));
        Files.writeString(folder.resolve("day/.hidden"), "x");

        sheet.add(List.of(folder.resolve("day"), folder.resolve("day/a.csv")));

        assertThat(sheet.model().lines())
                .extracting(line -> line.file().getFileName().toString())
                .containsExactly("a.csv", "b.csv");
    }

    @Test
    void stoppingKeepsWhatIsDoneAndSaysSo() throws IOException {
        long before = scans();
        List<Path> files = new ArrayList<>();
        for (int i = 0; i < 6; i++) {
            files.add(bench.commaFile("s" + i + ".csv", 40 + i));
        }
        sheet.add(files);
        hand.stopAfter = 2;
        sheet.ear().take();

        assertThat(stands().subList(0, 2)).containsOnly(Stand.TAKEN_IN);
        assertThat(stands().subList(2, 6)).containsOnly(Stand.READS);
        assertThat(scans()).isEqualTo(before + 2);
        assertThat(sheet.pane().summaryShown()).startsWith("stopped: 2 of 6 taken in and kept");
        hand.stopAfter = Integer.MAX_VALUE;
        sheet.ear().take();
        assertThat(stands()).containsOnly(Stand.TAKEN_IN);
    }

    @Test
    void removedFilesLeaveTheTableOnly() throws IOException {
        sheet.add(List.of(bench.commaFile("d1.csv", 51), bench.commaFile("d2.csv", 52)));
        sheet.pane().table().setRowSelectionInterval(0, 0);
        sheet.ear().remove();

        assertThat(sheet.model().lines())
                .extracting(line -> line.file().getFileName().toString())
                .containsExactly("d2.csv");
    }
}
