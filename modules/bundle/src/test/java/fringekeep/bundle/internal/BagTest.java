package fringekeep.bundle.internal;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What RFC 8493 asks of a bag, and coreutils as the outside judge of the checksums. */
class BagTest {
    @TempDir
    private Path folder;

    private Path bag;

    @BeforeEach
    void makeABag() throws Exception {
        bag = Files.createDirectories(folder.resolve("bag"));
        Layout.write(bag.resolve("data"), "raw/one", "1,2\n".getBytes(StandardCharsets.UTF_8));
        Layout.write(bag.resolve("data"), "raw/two", new byte[] {0, 1, 2, (byte) 0xff});
        Layout.write(bag.resolve("data"), "README.md", "words\n".getBytes(StandardCharsets.UTF_8));
        Bag.close(
                bag,
                "A description that is longer than one line of seventy-nine characters, so that it has to be folded.",
                "the invented laboratory",
                LocalDate.of(2031, 5, 14),
                Work.QUIET);
    }

    private List<String> faults() throws Exception {
        return BagFaults.of(bag, Work.QUIET).stream().map(Problem::code).toList();
    }

    @Test
    void aFreshBagIsCompleteAndValid() throws Exception {
        assertThat(faults()).isEmpty();
        assertThat(Files.readString(bag.resolve("bagit.txt")))
                .isEqualTo("BagIt-Version: 1.0\nTag-File-Character-Encoding: UTF-8\n");
        assertThat(Files.readString(bag.resolve("bag-info.txt"))).contains("Payload-Oxum: 14.3\n");
        assertThat(Files.readAllLines(bag.resolve("bag-info.txt"))).allMatch(line -> line.length() <= 79);
    }

    @Test
    void coreutilsReadTheManifestsAsTheyAre() throws Exception {
        for (String[] command : new String[][] {
            {"sha256sum", "--strict", "-c", "manifest-sha256.txt", "tagmanifest-sha256.txt"},
            {"sha512sum", "--strict", "-c", "manifest-sha512.txt", "tagmanifest-sha512.txt"}
        }) {
            Process process = new ProcessBuilder(command)
                    .directory(bag.toFile())
                    .redirectErrorStream(true)
                    .start();
            String words = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
            assertThat(process.waitFor()).as(words).isZero();
        }
    }

    @Test
    void aChangedByteOfAnyFileIsNamed() throws Exception {
        for (Path file : Bag.filesBelow(bag, bag)) {
            byte[] good = Files.readAllBytes(file);
            byte[] bad = good.clone();
            bad[bad.length / 2] ^= 1;
            Files.write(file, bad);
            assertThat(BagFaults.of(bag, Work.QUIET))
                    .as("changed %s", file)
                    .isNotEmpty()
                    .anyMatch(problem -> (problem.where() + problem.what())
                            .contains(file.getFileName().toString()));
            Files.write(file, good);
        }
        assertThat(faults()).isEmpty();
    }

    @Test
    void aMissingAndAnExtraFileAreNamed() throws IOException, Exception {
        Files.delete(bag.resolve("data/raw/one"));
        Files.writeString(bag.resolve("data/raw/three"), "x");

        assertThat(faults()).contains("bundle.missing-file", "bundle.unlisted");
    }

    @Test
    void aManifestThatLeadsOutOfTheBagIsRefused() throws Exception {
        Files.writeString(
                bag.resolve("manifest-sha256.txt"),
                Files.readString(bag.resolve("manifest-sha256.txt")) + "00  data/../../etc/passwd\n");

        assertThat(faults()).contains("bundle.unsafe-path");
    }
}
