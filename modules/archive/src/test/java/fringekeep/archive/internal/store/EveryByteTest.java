package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.internal.store.db.Sql;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.testsupport.OtherProgram;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The same byte of every journal entry, head, part, payload and raw file is changed at once; a check must name each of them.
 * Changing all at once makes it affordable to change every byte, as the profile {@code thorough} does; the ordinary build
 * takes seeded positions and the first and last byte.
 */
class EveryByteTest {
    private static final int POSITIONS = 8;

    @TempDir
    private Path folder;

    private DerbyArchive archive;
    private final List<Stored> stored = new ArrayList<>();

    /** Where bytes lie, what they are, and how a check calls a fault in them. */
    private record Stored(String change, Object key, Path file, byte[] bytes, String code, String named) {
        boolean inTable() {
            return !change.isEmpty();
        }
    }

    @BeforeEach
    void fill() throws Exception {
        Path place = folder.resolve("archive");
        try (Archive golden = Filled.golden(place)) {
            byte[] table = ("position_m,counts\n" + "0,1\n".repeat(20)).getBytes(StandardCharsets.UTF_8);
            golden.record(Filled.carrying(Filled.labelled("scan", "small table"), table));
        }
        archive = (DerbyArchive) Archives.open(place, OpenKind.all(), Circumstances.real("1.0.0"));
        gather("select n, bytes, sha from journal", "update journal set bytes = ? where n = ?", "journal.hash");
        gather(
                "select r.n, r.head, d.sha from record r, node d where d.id = r.node",
                "update record set head = ? where n = ?",
                "head.hash");
        gather("select sha, bytes, sha from part", "update part set bytes = ? where sha = ?", "part.hash");
        gather(
                "select sha, bytes, sha from payload where bytes is not null",
                "update payload set bytes = ? where sha = ?",
                "payload.hash");
        try (Stream<Path> files = Files.walk(place.resolve("raw"))) {
            for (Path file : files.filter(Files::isRegularFile).toList()) {
                assertThat(file.toFile().setWritable(true)).isTrue();
                stored.add(new Stored("", 0, file, Files.readAllBytes(file), "raw.hash", file.toString()));
            }
        }
    }

    private void gather(String question, String change, String code) {
        stored.addAll(archive.store()
                .<List<Stored>, RuntimeException>read(c -> Sql.list(
                        c,
                        question,
                        row -> new Stored(
                                change,
                                row.getObject(1),
                                folder,
                                row.getBytes(2),
                                code,
                                code.startsWith("journal")
                                        ? "journal entry " + row.getLong(1)
                                        : Hash.fromBytes(row.getBytes(3)).hex()))));
    }

    @AfterEach
    void close() {
        archive.close();
    }

    @Test
    void aChangedByteOfAnythingStoredIsFoundAndNamed() throws Exception {
        assertThat(stored.stream().map(Stored::code).distinct())
                .containsExactly("journal.hash", "head.hash", "part.hash", "payload.hash", "raw.hash");
        int longest = stored.stream().mapToInt(one -> one.bytes().length).max().orElseThrow();
        SplittableRandom random = new SplittableRandom(20310514);
        int[] positions = OtherProgram.thorough()
                ? IntStream.range(0, longest).toArray()
                : IntStream.concat(IntStream.of(0, longest - 1), IntStream.generate(() -> random.nextInt(longest / 2)))
                        .limit(POSITIONS)
                        .toArray();
        for (int at : positions) {
            changeAndFind(at, 1 + random.nextInt(255));
        }
        writeAll(-1, 0);
        assertThat(archive.check(Work.QUIET)).isEmpty();
    }

    private void changeAndFind(int at, int other) throws Exception {
        writeAll(at, other);
        List<Problem> found = archive.check(Work.QUIET);
        for (Stored one : stored) {
            if (at < one.bytes().length) {
                assertThat(found)
                        .as("%s of %s, byte %d xor %d", one.code(), one.named(), at, other)
                        .anyMatch(problem -> problem.code().equals(one.code())
                                && problem.where().contains(one.named()));
            }
        }
    }

    /** Writes everything with the byte at a position changed, or unchanged where there is none. */
    private void writeAll(int at, int other) throws IOException {
        archive.store()
                .onWriter(transactor -> transactor.<Boolean, RuntimeException>inTransaction(c -> {
                    for (Stored one : stored) {
                        if (one.inTable()) {
                            Sql.run(c, one.change(), changed(one.bytes(), at, other), one.key());
                        }
                    }
                    return true;
                }));
        for (Stored one : stored) {
            if (!one.inTable()) {
                Files.write(one.file(), changed(one.bytes(), at, other));
            }
        }
    }

    private static byte[] changed(byte[] bytes, int at, int other) {
        byte[] copy = bytes.clone();
        if (at >= 0 && at < copy.length) {
            copy[at] ^= (byte) other;
        }
        return copy;
    }
}
