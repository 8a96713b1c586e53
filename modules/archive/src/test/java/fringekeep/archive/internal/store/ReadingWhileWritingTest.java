package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Prepared;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.internal.store.journal.Act;
import fringekeep.archive.listing.Listing;
import fringekeep.archive.listing.Page;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Readers see whole transactions and never wait for the writer. */
class ReadingWhileWritingTest {
    private static final int TOGETHER = 10;

    @TempDir
    private Path folder;

    @Test
    void aReaderSeesAllRecordsOfATransactionOrNone() throws Exception {
        DerbyArchive archive = (DerbyArchive) Filled.found(folder.resolve("archive"), new Script());
        ExecutorService threads = Executors.newFixedThreadPool(3);
        AtomicBoolean done = new AtomicBoolean();
        List<Future<Long>> readers = new ArrayList<>();
        for (int i = 0; i < 3; i++) {
            readers.add(threads.submit(() -> read(archive, done)));
        }
        for (int i = 0; i < 20; i++) {
            List<Prepared> prepared = new ArrayList<>();
            for (int k = 0; k < TOGETHER; k++) {
                prepared.add(archive.prepare(Filled.labelled("note", "note " + i + " " + k), List.of()));
            }
            archive.record(prepared);
        }
        done.set(true);
        for (Future<Long> reader : readers) {
            assertThat(reader.get()).isPositive();
        }
        threads.shutdown();
        assertThat(archive.check(Work.QUIET)).isEmpty();
        assertThat(archive.store().database().inUse()).isZero();
        archive.close();
    }

    private static long read(Archive archive, AtomicBoolean done) throws Exception {
        long looks = 0;
        while (!done.get() || looks == 0) {
            Page page = archive.list(Listing.newest("note_list", 1_000));
            assertThat(page.rows().size() % TOGETHER).isZero();
            assertThat(page.rows())
                    .allMatch(line -> archive.record(line.record()).isPresent());
            assertThat((page.watermark() - 1) % TOGETHER).isZero();
            long counted = archive.counts().getOrDefault("note", 0L);
            assertThat(counted % TOGETHER).isZero();
            looks++;
        }
        return looks;
    }

    @Test
    void readersGoOnWhileATransactionIsOpen() throws Exception {
        DerbyArchive archive = (DerbyArchive) Filled.golden(folder.resolve("archive"));
        CountDownLatch written = new CountDownLatch(1);
        CountDownLatch mayCommit = new CountDownLatch(1);
        ExecutorService threads = Executors.newSingleThreadExecutor();
        Future<Boolean> writing =
                threads.submit(() -> archive.store().<Boolean, RuntimeException>write((c, progress) -> {
                    progress.append(c, new Act.PersonErased(Filled.PERSON));
                    progress.tally("scan", tally -> tally);
                    progress.saveTallies(c);
                    written.countDown();
                    await(mayCommit);
                    return true;
                }));
        assertThat(written.await(1, TimeUnit.MINUTES)).isTrue();

        assertThat(archive.list(Listing.newest("scan_list", 10)).rows()).hasSize(1);
        assertThat(archive.find("setup 1")).isNotNull();
        assertThat(archive.journal(1, 100)).hasSize(11);
        assertThat(archive.counts()).containsEntry("scan", 1L);
        assertThat(archive.facts().watermark()).isEqualTo(11);

        mayCommit.countDown();
        assertThat(writing.get()).isTrue();
        assertThat(archive.facts().watermark()).isEqualTo(12);
        threads.shutdown();
        archive.close();
    }

    private static void await(CountDownLatch latch) {
        try {
            if (!latch.await(1, TimeUnit.MINUTES)) {
                throw new IllegalStateException("the readers never came");
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    @Test
    void theGraphGrowsWithEveryCommitAndListenersHearOfIt() throws Exception {
        Path place = folder.resolve("archive");
        Filled.golden(place).close();
        try (Archive archive = Archives.open(place, OpenKind.all(), new Script().circumstances())) {
            AtomicLong heard = new AtomicLong();
            AutoCloseable listening = archive.onCommit(heard::set);
            Hash fit = archive.find("fit 1");
            assertThat(archive.graph().states(fit)).containsExactly(StateName.OUTDATED);

            archive.record(Filled.correcting(Filled.labelled("batch", "other"), archive.find("batch 1")));

            assertThat(heard).hasValue(12);
            assertThat(archive.graph().watermark()).isEqualTo(12);
            assertThat(archive.graph().causes(fit)).hasSize(3);
            assertThat(archive.graphReady()).isTrue();
            assertThat(archive.states(List.of(fit)).orElseThrow()).containsKey(fit);
            listening.close();
            archive.settings("new title", "05:00", "Etc/UTC");
            assertThat(heard).hasValue(12);
            assertThat(archive.facts().title()).isEqualTo("new title");
        }
        try (Archive again = Archives.open(place, OpenKind.all(), new Script().circumstances())) {
            assertThat(again.facts().dayBoundary()).isEqualTo("05:00");
            again.erasePerson(Filled.PERSON);
            assertThat(again.persons()).isEmpty();
        }
    }

    @Test
    void listsAreMadeAnewWhenTheirDeclarationChanged() throws Exception {
        Path place = folder.resolve("archive");
        Filled.golden(place).close();
        try (Archive later = Archives.open(place, OpenKind.later(), new Script().circumstances())) {
            later.rebuildProjections(Work.QUIET);
            assertThat(later.list(Listing.newest("setup_list", 5))
                            .rows()
                            .get(0)
                            .row()
                            .values())
                    .containsEntry("twice", "short benchshort bench");
            assertThat(later.check(Work.QUIET)).isEmpty();
        }
    }
}
