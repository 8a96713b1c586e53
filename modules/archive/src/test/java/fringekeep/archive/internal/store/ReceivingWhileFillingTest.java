package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.RecordSource;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/**
 * A part supplied while lists are being filled would miss the rows worked out before it; so receiving waits for the filling,
 * says so, and can be stopped while it waits.
 */
@Timeout(120)
class ReceivingWhileFillingTest {
    @TempDir
    private Path folder;

    private final ExecutorService threads = Executors.newCachedThreadPool();
    private Archive origin;
    private DerbyArchive archive;
    private Hash note;
    private Archive.Origin from;

    /** A note whose remark, the only text its row could show, is withheld at first. */
    @BeforeEach
    void receiveWithoutTheRemark() throws Exception {
        origin = Filled.golden(folder.resolve("origin"));
        note = origin.record(Filled.with(
                        Filled.content("note", JsonObject.EMPTY),
                        PartName.REMARK,
                        JsonObject.EMPTY.with("text", "supplied")))
                .fingerprint();
        Hash remark = new Hash(
                String.valueOf(origin.record(note).orElseThrow().head().sealed().get(PartName.REMARK.text())));
        archive = (DerbyArchive) Filled.found(folder.resolve("archive"), new Script());
        from = new Archive.Origin(origin.facts().id(), "origin");
        archive.receive(List.of(note), new Without(origin.source(), remark), from, Work.QUIET);
    }

    @AfterEach
    void close() {
        threads.shutdown();
        archive.close();
        origin.close();
    }

    /** Goes on, or stops, once it was told that it must wait. */
    private static final class Waiting implements Work {
        private final CountDownLatch waits = new CountDownLatch(1);
        private final boolean stops;

        Waiting(boolean stops) {
            this.stops = stops;
        }

        @Override
        public void progress(long done, long total, String what) {
            if (what.startsWith("waiting")) {
                waits.countDown();
            }
        }

        @Override
        public boolean stopped() {
            return stops && waits.getCount() == 0;
        }
    }

    /** Receives in the middle of a filling. */
    private Future<Archive.Received> receiveInTheMiddle(Waiting waiting) throws Exception {
        RecordSource whole = origin.source();
        CountDownLatch begun = new CountDownLatch(1);
        CountDownLatch goOn = new CountDownLatch(1);
        Future<Boolean> filling = threads.submit(() -> {
            archive.rebuildProjections(new Work() {
                @Override
                public void progress(long done, long total, String what) {
                    // words are the last, so every list has been filled without the remark
                    if (what.equals("words")) {
                        begun.countDown();
                        await(goOn);
                    }
                }

                @Override
                public boolean stopped() {
                    return false;
                }
            });
            return true;
        });
        begun.await();
        Future<Archive.Received> received = threads.submit(() -> archive.receive(List.of(note), whole, from, waiting));
        waiting.waits.await();
        goOn.countDown();
        assertThat(filling.get()).isTrue();
        return received;
    }

    private static void await(CountDownLatch latch) {
        try {
            latch.await();
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    @Test
    void receivingWaitsForTheFillingAndThenSupplies() throws Exception {
        assertThat(receiveInTheMiddle(new Waiting(false)).get()).isEqualTo(new Archive.Received(0, 1, 1));
        assertThat(archive.check(Work.QUIET)).isEmpty();
    }

    @Test
    void whoWaitsCanStopAndNothingIsReceived() throws Exception {
        Future<Archive.Received> received = receiveInTheMiddle(new Waiting(true));

        assertThatThrownBy(received::get).hasCauseInstanceOf(StoppedException.class);
        assertThat(archive.record(note).orElseThrow().withheld(PartName.REMARK)).isTrue();
        assertThat(archive.check(Work.QUIET)).isEmpty();
    }
}
