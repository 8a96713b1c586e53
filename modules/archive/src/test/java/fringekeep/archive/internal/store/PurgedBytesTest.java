package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive.PurgeTarget;
import fringekeep.archive.Archives;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import java.util.Queue;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What was purged is nowhere in the archive's files: not in free pages, not in the engine's log, not in a former database. */
class PurgedBytesTest {
    private static final String MARKER = "quillowmarker";

    @TempDir
    private Path folder;

    private Path place;
    private DerbyArchive archive;

    @BeforeEach
    void fill() throws Exception {
        place = folder.resolve("archive");
        archive = (DerbyArchive) Filled.golden(place);
    }

    /** Files of the archive that hold the marker in any case. */
    private List<Path> holding() throws Exception {
        List<Path> found = new ArrayList<>();
        try (Stream<Path> files = Files.walk(place)) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                if (Files.readString(file, StandardCharsets.ISO_8859_1)
                        .toLowerCase(Locale.ROOT)
                        .contains(MARKER)) {
                    found.add(place.relativize(file));
                }
            }
        }
        return found;
    }

    private Head record(NewRecord record) throws Exception {
        Hash fingerprint = archive.record(record).fingerprint();
        return archive.record(fingerprint).orElseThrow().head();
    }

    private Hash remark() throws Exception {
        Head head = record(Filled.with(
                Filled.labelled("note", "plain"),
                PartName.REMARK,
                JsonObject.EMPTY.with("text", MARKER + " " + "and much more about it ".repeat(2_000))));
        for (int i = 0; i < 20; i++) {
            record(Filled.labelled("note", "after it " + i));
        }
        return Objects.requireNonNull(head.sealed().get(PartName.REMARK.text()));
    }

    @Test
    void aPurgedRemarkIsInNoFile() throws Exception {
        Hash remark = remark();
        assertThat(holding()).isNotEmpty();

        archive.purge(PurgeTarget.PART, remark, "privacy", "a test");

        assertThat(holding()).isEmpty();
        assertThat(archive.check(Work.QUIET)).isEmpty();
        record(Filled.labelled("note", "the archive goes on"));
        archive.close();
        assertThat(holding()).isEmpty();
    }

    @Test
    void aPurgedPayloadIsInNoFile() throws Exception {
        byte[] table = ("words\n\"" + MARKER + "\"\n").getBytes(StandardCharsets.UTF_8);
        Head head = record(Filled.carrying(Filled.labelled("scan", "with a table"), table));
        assertThat(holding()).isNotEmpty();

        archive.purge(PurgeTarget.PAYLOAD, head.payloads().get(0).sha256(), "privacy", "a test");

        assertThat(holding()).isEmpty();
        archive.close();
        assertThat(holding()).isEmpty();
    }

    @Test
    void anErasedPersonIsInNoFile() throws Exception {
        PersonId person = new PersonId("ab".repeat(16));
        archive.savePerson(new Person(person, Optional.of(MARKER), Optional.empty(), Optional.empty()));
        archive.savePerson(new Person(person, Optional.of(MARKER + " two"), Optional.empty(), Optional.empty()));
        assertThat(holding()).isNotEmpty();

        archive.erasePerson(person);

        assertThat(holding()).isEmpty();
        archive.close();
        assertThat(holding()).isEmpty();
    }

    @Test
    void whatACrashLeftIsCleanedAtTheNextOpening() throws Exception {
        Hash remark = remark();
        archive.store().<Integer, RuntimeException>write((c, progress) -> {
            FreedPages.note(c, List.of("PART", "WORD", "P_NOTE_LIST", "P_GONE_LIST"));
            Sql.run(c, "create table filler (id int)");
            Sql.run(c, "update p_note_list set label = 'plain'");
            Sql.run(c, "delete from word where word = ?", MARKER);
            return Sql.run(c, "delete from part where sha = ?", remark.bytes());
        });
        Path former = place.resolve("aside/db-before/db");
        Files.createDirectories(former);
        Files.writeString(former.resolve("page.dat"), MARKER);
        archive.close();
        assertThat(holding()).isNotEmpty();

        Archives.open(place, OpenKind.all(), new Script().circumstances()).close();

        assertThat(holding()).isEmpty();
    }

    @Test
    void readersGoOnWhileTablesAreWrittenAnew() throws Exception {
        Hash remark = remark();
        AtomicBoolean done = new AtomicBoolean();
        Queue<Throwable> failures = new ConcurrentLinkedQueue<>();
        Thread reader = new Thread(() -> {
            while (!done.get()) {
                Filled.GOLDEN.forEach(
                        record -> assertThat(archive.stored(record)).isPresent());
            }
        });
        reader.setUncaughtExceptionHandler((thread, failure) -> failures.add(failure));
        reader.start();
        archive.purge(PurgeTarget.PART, remark, "privacy", "a test");
        done.set(true);
        reader.join();

        assertThat(failures).isEmpty();
        archive.close();
    }
}
