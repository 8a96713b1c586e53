package fringekeep.bundle.internal;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.TimeZone;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ZipTest {
    @TempDir
    private Path folder;

    private Path zipOf(String... names) throws IOException {
        Path zip = folder.resolve("made.zip");
        try (ZipOutputStream out = new ZipOutputStream(Files.newOutputStream(zip), StandardCharsets.UTF_8)) {
            for (String name : names) {
                out.putNextEntry(new ZipEntry(name));
                out.write(1);
                out.closeEntry();
            }
        }
        return zip;
    }

    @ParameterizedTest
    @ValueSource(strings = {"../evil.txt", "a/../../evil.txt", "/evil.txt", "C:/evil.txt", "a\\..\\evil.txt"})
    void namesThatLeadOutAreRefused(String name) throws IOException {
        Path zip = zipOf("a/good.txt", name);
        Path into = folder.resolve("into");

        assertThatThrownBy(() -> Zip.unpack(zip, into, Work.QUIET))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("bundle.unsafe-path"));
        assertThat(folder.resolve("evil.txt")).doesNotExist();
    }

    @Test
    void namesThatDifferOnlyInCaseAreRefused() throws IOException {
        Path zip = zipOf("a/X.txt", "a/x.txt");

        assertThatThrownBy(() -> Zip.unpack(zip, folder.resolve("into"), Work.QUIET))
                .isInstanceOf(ProblemException.class);
    }

    @Test
    void whatIsPackedComesOutAgainWithTheSameBytesInEveryZone() throws Exception {
        Path bundle = folder.resolve("b");
        Layout.write(bundle, "data/one", "words".getBytes(StandardCharsets.UTF_8));
        Layout.write(bundle, "bagit.txt", new byte[] {1, 2, 3});
        TimeZone before = TimeZone.getDefault();
        byte[][] packed = new byte[2][];
        try {
            for (int i = 0; i < 2; i++) {
                TimeZone.setDefault(TimeZone.getTimeZone(i == 0 ? "Asia/Tokyo" : "America/New_York"));
                Path zip = folder.resolve(i + ".zip");
                Zip.pack(bundle, zip, Work.QUIET);
                packed[i] = Files.readAllBytes(zip);
            }
        } finally {
            TimeZone.setDefault(before);
        }
        Path out = Zip.unpack(folder.resolve("0.zip"), folder.resolve("out"), Work.QUIET);

        assertThat(Arrays.equals(packed[0], packed[1])).isTrue();
        assertThat(Files.readString(out.resolve("data/one"))).isEqualTo("words");
        assertThat(Files.readAllBytes(out.resolve("bagit.txt"))).containsExactly(1, 2, 3);
    }

    @Test
    void aFileThatIsNoZipIsRefused() throws IOException {
        Path file = Files.writeString(folder.resolve("no.zip"), "this is no zip");

        assertThatThrownBy(() -> Zip.unpack(file, folder.resolve("into"), Work.QUIET))
                .isInstanceOf(ProblemException.class);
    }
}
