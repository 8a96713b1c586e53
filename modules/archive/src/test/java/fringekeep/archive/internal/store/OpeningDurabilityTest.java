package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.internal.store.db.Migration;
import fringekeep.archive.internal.store.files.FolderPlace;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.testsupport.OtherProgram;
import java.io.BufferedReader;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Who may open an archive, and what is said when it cannot be opened. */
class OpeningDurabilityTest {
    @TempDir
    private Path folder;

    private static Problem problem(ThrowingCallable work) {
        List<Problem> problems = new ArrayList<>();
        assertThatThrownBy(work).isInstanceOfSatisfying(ProblemException.class, e -> problems.addAll(e.problems()));
        assertThat(problems.get(0).what()).isNotBlank();
        assertThat(problems.get(0).where()).isNotBlank();
        assertThat(problems.get(0).mend()).isNotBlank();
        return problems.get(0);
    }

    private static Archive open(Path place) throws ProblemException {
        return Archives.open(place, OpenKind.all(), new Script().circumstances());
    }

    @Test
    void aSecondProgramIsRefusedAndToldWhoHoldsIt() throws Exception {
        Path place = folder.resolve("archive");
        Filled.golden(place).close();
        Process other = OtherProgram.start(HoldingProgram.class, place.toString());
        try (BufferedReader lines =
                new BufferedReader(new InputStreamReader(other.getInputStream(), StandardCharsets.UTF_8))) {
            assertThat(lines.readLine()).isEqualTo("open 11");

            Problem problem = problem(() -> open(place));

            assertThat(problem.code()).isEqualTo("archive.in-use");
            assertThat(problem.what()).contains("process " + other.pid());
            assertThat(Archives.look(place).orElseThrow().heldBy()).contains("process " + other.pid());
            other.getOutputStream().close();
            assertThat(other.waitFor()).isZero();
        }
        open(place).close();
        assertThat(Archives.look(place).orElseThrow().heldBy()).isEmpty();
    }

    @Test
    void theSameProgramOpensItOnce() throws Exception {
        Path place = folder.resolve("archive");
        try (Archive archive = Filled.found(place, new Script())) {
            assertThat(archive.facts().title()).isEqualTo("demo lab");
            assertThat(problem(() -> open(place)).code()).isEqualTo("archive.in-use");
        }
    }

    @Test
    void foldersThatAreNoArchiveOrLackAPieceAreNamed() throws Exception {
        assertThat(problem(() -> open(folder.resolve("nowhere"))).code()).isEqualTo("archive.no-folder");
        Files.createDirectory(folder.resolve("empty"));
        assertThat(problem(() -> open(folder.resolve("empty"))).code()).isEqualTo("archive.not-an-archive");
        Files.writeString(folder.resolve("empty/notes.txt"), "mine");
        assertThat(problem(() -> Filled.found(folder.resolve("empty"), new Script()))
                        .code())
                .isEqualTo("archive.folder-not-empty");
        Path place = folder.resolve("archive");
        Filled.found(place, new Script()).close();
        Files.move(place.resolve("db"), folder.resolve("db elsewhere"));
        assertThat(problem(() -> open(place)).code()).isEqualTo("archive.no-database");
        Files.createDirectory(place.resolve("db"));
        assertThat(problem(() -> open(place)).code()).isEqualTo("archive.database-damaged");
    }

    @Test
    void theHintIsWrittenAgainFromTheJournalButAForeignFormIsRefused() throws Exception {
        Path place = folder.resolve("archive");
        Filled.found(place, new Script()).close();
        String hint = Files.readString(place.resolve("archive.json"));
        Files.delete(place.resolve("archive.json"));
        open(place).close();
        assertThat(Files.readString(place.resolve("archive.json"))).isEqualTo(hint);
        Files.writeString(place.resolve("archive.json"), hint.replace("archive/1", "archive/2"));
        assertThat(problem(() -> open(place)).code()).isEqualTo("archive.newer-form");
        Files.writeString(place.resolve("archive.json"), hint.replace("archive/1", "copy/1"));
        assertThat(problem(() -> open(place)).code()).isEqualTo("archive.is-a-copy");
        Files.writeString(place.resolve("archive.json"), "{");
        assertThat(problem(() -> open(place)).code()).isEqualTo("archive.hint");
    }

    @Test
    void tablesOfANewerProgramOrAnotherLineAreRefused() throws Exception {
        Path place = folder.resolve("archive");
        Filled.found(place, new Script()).close();
        List<Migration> later = KilledProgram.steps(0);
        new Opening(place, OpenKind.all(), new Script().circumstances(), later)
                .open()
                .close();

        assertThat(problem(() -> open(place)).code()).isEqualTo("archive.newer-tables");
        List<Migration> other = new ArrayList<>(later);
        other.set(2, new Migration(3, "create table other (n bigint);\n"));
        assertThat(problem(() -> new Opening(place, OpenKind.all(), new Script().circumstances(), other).open())
                        .code())
                .isEqualTo("archive.foreign-tables");
    }

    @Test
    void networkFoldersAreNoSafePlace() {
        for (String type : List.of("nfs", "nfs4", "cifs", "smb3", "fuse.sshfs", "fuse", "9p", "NFS")) {
            assertThat(FolderPlace.examineStore(type, "share", folder))
                    .hasValueSatisfying(problem -> assertThat(problem.code()).isEqualTo("archive.network-folder"));
        }
        for (String source :
                List.of("machine:/export/lab", "192.0.2.1,192.0.2.2:/lab", "//machine/lab", "\\\\machine\\lab")) {
            assertThat(FolderPlace.examineStore("unheard-of", source, folder))
                    .hasValueSatisfying(problem -> assertThat(problem.what()).contains(source));
        }
    }

    @Test
    void disksOfThisMachineAreSafePlaces() {
        for (String type : List.of("ext4", "xfs", "apfs", "NTFS", "fuseblk", "overlay", "tmpfs", "zfs", "exfat")) {
            for (String source :
                    List.of("/dev/disk1", "overlay", "pool/lab", "Data", "C:/", "/dev/disk/by-path/usb-0:1")) {
                assertThat(FolderPlace.examineStore(type, source, folder)).isEmpty();
            }
        }
    }

    @Test
    void aFoundingThatIsIncompleteIsRefusedWithEveryFault() {
        var founding = new Archives.Founding("", "6 o'clock", "Moon/Base", true, List.of(), java.util.Optional.empty());

        assertThatThrownBy(() -> Archives.found(
                        folder.resolve("archive"), founding, OpenKind.all(), new Script().circumstances()))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems())
                                .extracting(Problem::where)
                                .containsExactly("/title", "/dayBoundary", "/zone"));
        assertThat(folder.resolve("archive")).doesNotExist();
    }

    /** That programs which copy folders between machines leave a hidden sync entry: common practice, no source. */
    @Test
    void aFolderKeptTheSameOnSeveralMachinesIsRefused() throws Exception {
        Path shared = Files.createDirectories(folder.resolve("home/shared/bench"));
        Path home = folder.resolve("home");
        assertThat(FolderPlace.examineNeighbours(shared, home, shared)).isEmpty();
        Files.createDirectory(home.resolve(".sync-settings"));
        assertThat(FolderPlace.examineNeighbours(shared, home, shared)).isEmpty();
        Files.createFile(home.resolve("shared/.sync_0123.db"));

        assertThat(FolderPlace.examineNeighbours(shared, home, shared))
                .hasValueSatisfying(problem -> assertThat(problem.code()).isEqualTo("archive.sync-folder"));
    }
}
