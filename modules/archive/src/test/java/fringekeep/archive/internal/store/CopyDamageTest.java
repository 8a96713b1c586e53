package fringekeep.archive.internal.store;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.testsupport.OtherProgram;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * One byte of a plain copy is changed: restoring refuses, names the place and writes nothing. The ordinary build changes a
 * seeded fortieth of all bytes, the profile {@code thorough} each of them.
 */
class CopyDamageTest {
    private static final long SEED = 20310514;
    private static final int ONE_IN = 40;

    @TempDir
    private Path folder;

    private Path copy;

    @BeforeEach
    void copyOut() throws Exception {
        copy = folder.resolve("copy");
        try (Archive archive = Filled.golden(folder.resolve("archive"))) {
            archive.record(Filled.with(
                    Filled.labelled("note", "with a remark"),
                    PartName.REMARK,
                    JsonObject.EMPTY.with("text", "said in confidence")));
            byte[] bytes = "0;1\n1;2\n".getBytes(StandardCharsets.ISO_8859_1);
            Archive.RawTaken raw = archive.takeIn(bytes);
            archive.record(Filled.madeFrom(
                    Filled.carrying(
                            Filled.labelled("scan", "one more"),
                            "position_m,counts\n0,1\n".getBytes(StandardCharsets.UTF_8)),
                    new InputReference.OfRaw("raw", raw.hash(), raw.bytes())));
            archive.settings("demo lab", "05:00", "Etc/GMT-2");
            archive.copyTo(copy, Work.QUIET);
        }
    }

    /** All but persons and drafts, which no hash protects, as the format says. */
    private List<Path> protectedFiles() throws Exception {
        try (Stream<Path> files = Files.walk(copy)) {
            return files.filter(Files::isRegularFile)
                    .filter(file -> !file.getFileName().toString().equals("persons.json"))
                    .sorted()
                    .toList();
        }
    }

    @Test
    void aChangedByteIsFoundAndNamedAndNothingIsWritten() throws Exception {
        SplittableRandom random = new SplittableRandom(SEED);
        int changed = 0;
        for (Path file : protectedFiles()) {
            byte[] whole = Files.readAllBytes(file);
            assertThat(file.toFile().setWritable(true)).isTrue();
            for (int at = 0; at < whole.length; at++) {
                int other = 1 + random.nextInt(255);
                if (OtherProgram.thorough() || random.nextInt(ONE_IN) == 0) {
                    byte[] damaged = whole.clone();
                    damaged[at] ^= (byte) other;
                    Files.write(file, damaged);
                    found(file, whole, at, other);
                    changed++;
                }
            }
            Files.write(file, whole);
        }
        assertThat(changed).isGreaterThan(300);
        restored().close();
    }

    /** The hardest byte: in the last line a line end in place of the space leaves a hash alone, as if withheld. */
    @Test
    void aLineBrokenInTwoIsNotTakenForAWithheldPart() throws Exception {
        Path file = copy.resolve("records/000000.txt");
        byte[] whole = Files.readAllBytes(file);
        String text = new String(whole, StandardCharsets.ISO_8859_1);
        int line = text.lastIndexOf('\n', text.length() - 2) + 1;
        int space = text.indexOf(' ', line);
        assertThat(space).isEqualTo(line + 64);
        byte[] damaged = whole.clone();
        damaged[space] = '\n';
        Files.write(file, damaged);

        found(file, whole, space, ' ' ^ '\n');
    }

    private Archive restored() throws Exception {
        return Archives.restore(
                copy, folder.resolve("restored"), OpenKind.all(), new Script().circumstances(), Work.QUIET);
    }

    private void found(Path file, byte[] whole, int at, int other) throws Exception {
        String what = copy.relativize(file) + ", byte " + at + " xor " + other;
        try (Archive archive = restored()) {
            throw new AssertionError(what + " was not found; restored up to entry "
                    + archive.facts().watermark());
        } catch (ProblemException e) {
            assertThat(e.problems()).as(what).isNotEmpty().allSatisfy(CopyDamageTest::complete);
            assertThat(e.problems()).as(what).anyMatch(problem -> names(problem, file, whole, at));
        }
        assertThat(folder.resolve("restored")).as(what).doesNotExist();
    }

    private static void complete(Problem problem) {
        assertThat(problem.what()).isNotBlank();
        assertThat(problem.where()).isNotBlank();
        assertThat(problem.mend()).contains("Nothing was");
    }

    /** The file, or the hash that the damaged line begins with. */
    private static boolean names(Problem problem, Path file, byte[] whole, int at) {
        String said = problem.where() + " " + problem.what();
        if (said.contains(file.toString()) || said.contains(file.getFileName().toString())) {
            return true;
        }
        String line = new String(whole, 0, at, StandardCharsets.ISO_8859_1);
        int begin = line.lastIndexOf('\n') + 1;
        return whole.length >= begin + 64 && said.contains(new String(whole, begin, 64, StandardCharsets.ISO_8859_1));
    }
}
