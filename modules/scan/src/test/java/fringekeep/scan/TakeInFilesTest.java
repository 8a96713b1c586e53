package fringekeep.scan;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.scan.TakeInFiles.FileOutcome;
import fringekeep.scan.TakeInFiles.State;
import fringekeep.scan.internal.reading.Profiles;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class TakeInFilesTest {
    private static final String HEADER = "# start: 2031-05-14T09:03:11+02:00\n# dwell: 10 s\n# operator: N. N.\n";

    @TempDir
    private static Path archives;

    private static TemporaryArchive lab;

    @TempDir
    private Path folder;

    private Hash tab;
    private int before;

    @BeforeAll
    static void found() throws ProblemException {
        lab = new TemporaryArchive(archives);
    }

    /** Each test reads by a profile of its own, so that what others took in does not count as known. */
    @BeforeEach
    void profile() throws ProblemException {
        tab = lab.enter("reading-profile", Profiles.content(Profiles.TAB));
        before = all();
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private Path file(String name, String rows) throws IOException {
        Path path = folder.resolve(name);
        return Files.writeString(path, HEADER + "position_nm\tcounts\n" + rows, StandardCharsets.UTF_8);
    }

    private List<FileOutcome> takeIn(Optional<Hash> profile, Work work, Path... files) throws ProblemException {
        TakeInFiles.Request request =
                new TakeInFiles.Request(List.of(files), profile, false, Optional.of(TemporaryArchive.PERSON));
        return new TakeInFiles(lab.archive).takeIn(request, work);
    }

    private static int all() {
        return lab.archive.records("scan", 1, 1_000).size();
    }

    private int scans() {
        return all() - before;
    }

    @Test
    void recordsGoodFilesAndRefusesBadOnesWithTheirPlace() throws IOException, ProblemException {
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");
        Path bad = file("b.txt", "0\t10\n26\tmany\n");
        Path other = file("c.txt", "0\t20\n26\t22\n52\t19\n");

        List<FileOutcome> outcomes = takeIn(Optional.of(tab), Work.QUIET, good, bad, other);

        assertThat(outcomes)
                .extracting(FileOutcome::state)
                .containsExactly(State.TAKEN_IN, State.REFUSED, State.TAKEN_IN);
        Problem problem = outcomes.get(1).problems().get(0);
        assertThat(problem.code()).isEqualTo("scan.not-a-number");
        assertThat(problem.where()).isEqualTo("b.txt, line 6, column 4");
        assertThat(scans()).isEqualTo(2);
        Hash scan = outcomes.get(0).scans().get(0);
        assertThat(lab.archive.label(scan)).matches("scan [0-9]{4}");
        assertThat(lab.archive.raw(Hash.of(Files.readAllBytes(bad)))).isEmpty();
    }

    @Test
    void whatTellsOfPersonsGoesToTheRemarkOnly() throws IOException, ProblemException {
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");

        Hash hash = takeIn(Optional.of(tab), Work.QUIET, good).get(0).scans().get(0);

        RecordView scan = lab.archive.record(hash).orElseThrow();
        assertThat(scan.part(PartName.REMARK).orElseThrow().text("text")).contains("operator: N. N.");
        assertThat(scan.result().toString()).doesNotContain("N. N.");
    }

    @Test
    void aFileThatWasReadByTheSameProfileGivesNoSecondScan() throws IOException, ProblemException {
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");
        Path copy = Files.copy(good, folder.resolve("copy of a.txt"));
        Hash first = takeIn(Optional.of(tab), Work.QUIET, good).get(0).scans().get(0);

        FileOutcome again = takeIn(Optional.of(tab), Work.QUIET, copy).get(0);

        assertThat(again.state()).isEqualTo(State.KNOWN);
        assertThat(again.scans()).containsExactly(first);
        assertThat(scans()).isEqualTo(1);
    }

    @Test
    void twoCopiesInOneActGiveOneScan() throws IOException, ProblemException {
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");
        Path copy = Files.copy(good, folder.resolve("copy of a.txt"));

        List<FileOutcome> outcomes = takeIn(Optional.of(tab), Work.QUIET, good, copy);

        assertThat(outcomes).extracting(FileOutcome::state).containsExactly(State.TAKEN_IN, State.KNOWN);
        assertThat(outcomes.get(1).scans()).isEqualTo(outcomes.get(0).scans());
        assertThat(scans()).isEqualTo(1);
    }

    @Test
    void anotherProfileGivesAnotherScanAndACorrectedProfileCorrectsIt() throws IOException, ProblemException {
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");
        Hash first = takeIn(Optional.of(tab), Work.QUIET, good).get(0).scans().get(0);
        Hash second = lab.enter(
                "reading-profile", Profiles.content(Profiles.TAB.replace("'saturation':1000", "'saturation':500")));
        Hash third = lab.correct(
                tab,
                "reading-profile",
                Profiles.content(Profiles.TAB.replace("'saturation':1000", "'saturation':700")));

        Hash beside =
                takeIn(Optional.of(second), Work.QUIET, good).get(0).scans().get(0);
        Hash instead =
                takeIn(Optional.of(third), Work.QUIET, good).get(0).scans().get(0);

        assertThat(lab.archive.record(beside).orElseThrow().head().corrects()).isEmpty();
        assertThat(lab.archive.record(instead).orElseThrow().head().corrects()).contains(first);
        assertThat(lab.archive.graph().current(first)).contains(instead);
    }

    @Test
    void theProfileIsGuessedWhereNoneIsNamed() throws IOException, ProblemException {
        lab.enter("reading-profile", Profiles.content(Profiles.SEMICOLON));
        lab.enter("reading-profile", Profiles.content(Profiles.GOLDEN));
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");
        Path none = Files.writeString(folder.resolve("none.txt"), "no rows here");

        List<FileOutcome> outcomes = takeIn(Optional.empty(), Work.QUIET, good, none);

        assertThat(outcomes.get(0).profile()).contains(tab);
        assertThat(outcomes.get(1).problems()).extracting(Problem::code).containsExactly("scan.no-profile");
    }

    @Test
    void stoppingKeepsWhatWasDone() throws IOException, ProblemException {
        Path[] files = new Path[5];
        for (int i = 0; i < files.length; i++) {
            files[i] = file(i + ".txt", "0\t1" + i + "\n26\t12\n52\t9\n");
        }
        AtomicLong done = new AtomicLong();
        Work afterTwo = new Work() {
            @Override
            public void progress(long reached, long total, String what) {
                done.set(reached);
                assertThat(total).isEqualTo(5);
            }

            @Override
            public boolean stopped() {
                return done.get() >= 2;
            }
        };

        List<FileOutcome> outcomes = takeIn(Optional.of(tab), afterTwo, files);

        assertThat(outcomes)
                .extracting(FileOutcome::state)
                .containsExactly(State.TAKEN_IN, State.TAKEN_IN, State.STOPPED, State.STOPPED, State.STOPPED);
        assertThat(scans()).isEqualTo(2);
    }

    @Test
    void everySectionOfAFileIsAScan() throws IOException, ProblemException {
        Hash pulsed = lab.enter("reading-profile", Profiles.content(Profiles.SECTIONS));
        String section = "start,2031-05-14T09:00:00Z\nshots,500\npulse energy 2 (mJ),1.2\nx,r,o\n0,10,1\n26,12,0\n";
        Path file = Files.writeString(folder.resolve("p.csv"), "bench\n[scan 1]\n" + section + "[scan 2]\n" + section);

        FileOutcome outcome = takeIn(Optional.of(pulsed), Work.QUIET, file).get(0);

        assertThat(outcome.scans()).hasSize(2);
        assertThat(lab.archive
                        .record(outcome.scans().get(1))
                        .orElseThrow()
                        .choices()
                        .integer("section"))
                .hasValue(1);
    }

    @Test
    void refusesWhatIsNoProfile() throws IOException, ProblemException {
        Path good = file("a.txt", "0\t10\n26\t12\n52\t9\n");
        Hash scan = takeIn(Optional.of(tab), Work.QUIET, good).get(0).scans().get(0);

        ProblemException thrown =
                catchThrowableOfType(ProblemException.class, () -> takeIn(Optional.of(scan), Work.QUIET, good));

        assertThat(thrown.problems()).extracting(Problem::code).containsExactly("scan.not-a-profile");
    }
}
