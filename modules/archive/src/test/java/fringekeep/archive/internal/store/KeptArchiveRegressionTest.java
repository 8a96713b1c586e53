package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.RecordVectors;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.problem.Work;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Archives that earlier releases wrote are opened and restored by this one (see ORIGIN.md beside each). */
class KeptArchiveRegressionTest {
    private static final Path REFERENCE = Path.of("src/test/reference");

    /** The last entry's hash in record format 1, section 17. */
    private static final String HEAD = "ab31b1e610335d5c734385250745a1aa4ce64f275103e56dd501a37da51fa440";

    @TempDir
    private Path folder;

    @ParameterizedTest
    @ValueSource(strings = "kept-archive-1")
    void theDatabaseOfAReleaseOpensIsWholeAndAnswers(String kept) throws Exception {
        Path place = folder.resolve("archive");
        KeptArchive.unpack(REFERENCE.resolve(kept), place);
        try (Archive archive = Archives.open(place, OpenKind.all(), new Script().circumstances())) {
            archive.rebuildProjections(Work.QUIET);
            holdsTheGoldenRecords(archive);
            assertThat(archive.list(Listing.newest("setup_list", 10)).rows())
                    .extracting(line -> line.label())
                    .containsExactly("setup 0001 b");
            assertThat(archive.record(Filled.labelled("setup", "next")).label()).isEqualTo("setup 0002");
        }
    }

    @ParameterizedTest
    @ValueSource(strings = "kept-archive-1")
    void thePlainCopyOfAReleaseRestoresToTheSameJournal(String kept) throws Exception {
        try (Archive archive = Archives.restore(
                KeptArchive.copy(REFERENCE.resolve(kept)),
                folder.resolve("restored"),
                OpenKind.all(),
                new Script().circumstances(),
                Work.QUIET)) {
            holdsTheGoldenRecords(archive);
        }
    }

    private static void holdsTheGoldenRecords(Archive archive) throws Exception {
        assertThat(archive.check(Work.QUIET)).isEmpty();
        assertThat(archive.journalHead().hex()).isEqualTo(HEAD);
        assertThat(archive.facts().watermark()).isEqualTo(11);
        assertThat(archive.find("fit 1")).isEqualTo(RecordVectors.FIT);
        assertThat(archive.graph().states(RecordVectors.FIT)).containsExactly(StateName.OUTDATED);
        assertThat(archive.list(Listing.newest("fit_list", 10)).rows()).hasSize(1);
        assertThat(archive.raw(RecordVectors.RAW).orElseThrow().readAllBytes())
                .isEqualTo(RecordVectors.bytes(RecordVectors.RAW));
    }

    @Test
    void thePlainCopyOfThisProgramIsThatOfTheReleaseByteForByte() throws Exception {
        Path made = folder.resolve("made");
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.copyTo(made, Work.QUIET);
        }
        Path kept = KeptArchive.copy(REFERENCE.resolve("kept-archive-1"));
        for (String file : List.of("journal/000000.txt", "records/000000.txt")) {
            assertThat(made.resolve(file)).hasSameBinaryContentAs(kept.resolve(file));
        }
    }
}
