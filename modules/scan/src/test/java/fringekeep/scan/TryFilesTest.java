package fringekeep.scan;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.scan.internal.reading.Profiles;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class TryFilesTest {
    @TempDir
    private static Path archives;

    private static TemporaryArchive lab;
    private static Hash profile;

    @TempDir
    private Path folder;

    @BeforeAll
    static void found() throws ProblemException {
        lab = new TemporaryArchive(archives);
        profile = lab.enter("reading-profile", Profiles.content(Profiles.GOLDEN));
    }

    @AfterAll
    static void close() {
        lab.close();
    }

    private Path file(String name, String text) throws IOException {
        return Files.writeString(folder.resolve(name), text);
    }

    @Test
    void tellsWhatTakingInWouldGiveAndStoresNothing() throws IOException, ProblemException {
        Path good = file("a.csv", "pos/nm,n\n0,6\n26,13\n52,10\n");
        List<Hash> before = lab.archive.records("scan", 1, 10);

        TryFiles.Tried tried = new TryFiles(lab.archive).attempt(good, Optional.empty());

        assertThat(tried.profile()).contains(profile);
        assertThat(tried.fitting()).containsExactly(profile);
        assertThat(tried.rows()).isEqualTo(3);
        assertThat(tried.isNew()).isTrue();
        assertThat(lab.archive.records("scan", 1, 10)).isEqualTo(before);
        assertThat(new TryFiles(lab.archive).look(good, tried.profile(), 100).pictures())
                .hasSize(1);
    }

    @Test
    void namesLineAndColumnOfWhatIsWrong() throws IOException {
        Path bad = file("b.csv", "pos/nm,n\n0,5\n26,twelve\n52,9\n");

        TryFiles.Tried tried = new TryFiles(lab.archive).attempt(bad, Optional.of(profile));

        Problem problem = tried.problems().get(0);
        assertThat(problem.code()).isEqualTo("scan.not-a-number");
        assertThat(FilePlace.of(problem)).contains(new FilePlace(3, 4));
        assertThat(tried.isNew()).isFalse();
    }

    @Test
    void knowsAFileThatWasReadBefore() throws IOException, ProblemException {
        Path good = file("c.csv", "pos/nm,n\n0,5\n26,12\n52,9\n");
        List<TakeInFiles.FileOutcome> heard = new ArrayList<>();
        List<TakeInFiles.FileOutcome> outcomes = new TakeInFiles(lab.archive)
                .takeEach(
                        List.of(
                                new TakeInFiles.Chosen(good, Optional.of(profile)),
                                new TakeInFiles.Chosen(good, Optional.of(Hash.of(new byte[0])))),
                        false,
                        Optional.empty(),
                        Work.QUIET,
                        heard::add);

        TryFiles.Tried tried = new TryFiles(lab.archive).attempt(good, Optional.empty());

        assertThat(heard).isEqualTo(outcomes);
        assertThat(outcomes.get(1).state()).isEqualTo(TakeInFiles.State.REFUSED);
        assertThat(tried.known()).isEqualTo(outcomes.get(0).scans());
        assertThat(tried.isNew()).isFalse();
    }

    @Test
    void aFileThatNoProfileReadsSaysSo() throws IOException {
        TryFiles.Tried tried = new TryFiles(lab.archive).attempt(file("d.csv", "nothing\n"), Optional.empty());
        TryFiles.Tried missing = new TryFiles(lab.archive).attempt(folder.resolve("none.csv"), Optional.empty());

        assertThat(tried.problems()).extracting(Problem::code).containsExactly("scan.no-profile");
        assertThat(missing.problems()).extracting(Problem::code).containsExactly("scan.file-unreadable");
    }

    @Test
    void theProfileThatGetsFarthestTellsWhatStopsIt() throws IOException, ProblemException {
        lab.enter("reading-profile", Profiles.content(Profiles.TAB));
        Path bad = file("e.csv", "pos/nm,n\n0,5\n26,12\n52,nine\n");

        TryFiles.Tried tried = new TryFiles(lab.archive).attempt(bad, Optional.empty());

        assertThat(tried.profile()).contains(profile);
        assertThat(tried.problems()).extracting(Problem::code).containsExactly("scan.no-profile", "scan.not-a-number");
        assertThat(FilePlace.of(tried.problems().get(1))).contains(new FilePlace(4, 4));
    }

    @Test
    void onlyPlacesAtTheEndOfWhereAreReadAsPlaces() {
        assertThat(FilePlace.of(new Problem("c", "w", "a, line 7.csv", "m"))).isEmpty();
        assertThat(FilePlace.of(new Problem("c", "w", "a.csv, line 7", "m"))).contains(new FilePlace(7, 1));
    }
}
