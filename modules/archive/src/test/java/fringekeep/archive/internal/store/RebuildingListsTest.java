package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.internal.store.db.StoreFailure;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicBoolean;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Lists and words can be made anew at any time, also while they are asked. */
class RebuildingListsTest {
    private static final int REBUILDS = 3;
    private static final int READERS = 3;

    @TempDir
    private Path folder;

    private DerbyArchive archive;

    @BeforeEach
    void found() throws Exception {
        archive = (DerbyArchive) Filled.golden(folder.resolve("archive"));
    }

    @AfterEach
    void close() {
        archive.close();
    }

    @Test
    void aListAnswersWhileItsTableIsSwapped() throws Exception {
        AtomicBoolean done = new AtomicBoolean();
        ExecutorService threads = Executors.newFixedThreadPool(READERS);
        List<Future<Integer>> readers = new ArrayList<>();
        for (int i = 0; i < READERS; i++) {
            readers.add(threads.submit(() -> look(done)));
        }
        try {
            for (int i = 0; i < REBUILDS; i++) {
                archive.rebuildProjections(Work.QUIET);
            }
        } finally {
            done.set(true);
        }
        for (Future<Integer> reader : readers) {
            assertThat(reader.get()).isPositive();
        }
        threads.shutdown();
    }

    private int look(AtomicBoolean done) throws Exception {
        int looks = 0;
        while (!done.get() || looks == 0) {
            for (String list : List.of("setup_list", "scan_list", "fit_list")) {
                assertThat(archive.list(Listing.newest(list, 10)).rows()).hasSize(1);
            }
            looks++;
        }
        return looks;
    }

    @Test
    void aTableOrIndexThatIsGoneIsToldFromOtherFailures() {
        String scans = "select n from p_scan_list";
        for (String question : List.of(
                "select n from p_no_such_list", scans + " --DERBY-PROPERTIES index=no_such_index\n where n > 0")) {
            assertThatThrownBy(() -> ask(question))
                    .isInstanceOfSatisfying(
                            StoreFailure.class, e -> assertThat(e.tableGone()).isTrue());
        }
        assertThatThrownBy(() -> ask("select no_such_column from p_scan_list"))
                .isInstanceOfSatisfying(
                        StoreFailure.class, e -> assertThat(e.tableGone()).isFalse());
    }

    private Optional<Long> ask(String question) {
        return archive.store()
                .<Optional<Long>, RuntimeException>read(c -> Sql.first(c, question, row -> row.getLong(1)));
    }

    @Test
    void wordsThatAreWrongMissingOrOfNoRecordAreFoundAndMadeAnew() throws Exception {
        for (String change : List.of(
                "update word set word = 'shirt' where word = 'short'",
                "delete from word where n = 3",
                "insert into word (word, n) values ('stranger', 1)")) {
            archive.store().<Integer, RuntimeException>write((c, progress) -> Sql.run(c, change));
        }
        assertThat(archive.check(Work.QUIET))
                .allSatisfy(problem -> assertThat(problem.mend()).isEqualTo("Rebuild the lists."))
                .extracting(Problem::code)
                .contains("word.differs", "word.surplus")
                .allMatch(code -> code.startsWith("word."));

        archive.rebuildProjections(Work.QUIET);

        assertThat(archive.check(Work.QUIET)).isEmpty();
    }

    @Test
    void makingWordsAnewBringsNoPurgedRemarkBack() throws Exception {
        Hash note = archive.record(Filled.with(
                        Filled.labelled("note", "plain"), PartName.REMARK, JsonObject.EMPTY.with("text", "secret")))
                .fingerprint();
        assertThat(withWord("secret").rows()).hasSize(1);
        Hash remark = Objects.requireNonNull(
                archive.record(note).orElseThrow().head().sealed().get(PartName.REMARK.text()));
        archive.purge(Archive.PurgeTarget.PART, remark, "privacy", "a test");

        archive.rebuildProjections(Work.QUIET);

        assertThat(withWord("secret").rows()).isEmpty();
        assertThat(withWord("plain").rows()).hasSize(1);
        assertThat(archive.check(Work.QUIET)).isEmpty();
    }

    private Page withWord(String word) throws Exception {
        return archive.list(new Listing(
                "note_list", List.of(), true, List.of(word), Optional.empty(), "n", true, Optional.empty(), 10));
    }
}
