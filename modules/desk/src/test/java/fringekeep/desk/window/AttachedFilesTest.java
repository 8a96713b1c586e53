package fringekeep.desk.window;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.Archive;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.desk.pane.RecordPage.Attached;
import java.io.ByteArrayInputStream;
import java.lang.reflect.Proxy;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class AttachedFilesTest {
    private static final byte[] BYTES = "shutter stuck\n".getBytes(StandardCharsets.UTF_8);
    private static final Hash KNOWN = Hash.of(BYTES);

    @TempDir
    Path folder;

    private static Archive archive() {
        return (Archive) Proxy.newProxyInstance(
                AttachedFilesTest.class.getClassLoader(),
                new Class<?>[] {Archive.class},
                (proxy, method, arguments) ->
                        arguments[0].equals(KNOWN) ? Optional.of(new ByteArrayInputStream(BYTES)) : Optional.empty());
    }

    @Test
    void anAttachedFileIsWrittenAsItWasTakenIn() throws Exception {
        Path to = folder.resolve("notes.txt");

        AttachedFiles.written(archive(), new Attached("notes.txt", KNOWN), to);

        assertThat(Files.readAllBytes(to)).isEqualTo(BYTES);
    }

    @Test
    void absentBytesAndBadPlacesAreSaid() {
        Attached absent = new Attached("gone.txt", Hash.of(new byte[] {1}));

        assertThatThrownBy(() -> AttachedFiles.written(archive(), absent, folder.resolve("gone.txt")))
                .isInstanceOf(ProblemException.class)
                .hasMessageContaining("not in this archive");
        assertThat(folder.resolve("gone.txt")).doesNotExist();
        assertThatThrownBy(() -> AttachedFiles.written(
                        archive(),
                        new Attached("a", KNOWN),
                        folder.resolve("no-such").resolve("a")))
                .isInstanceOf(ProblemException.class)
                .hasMessageContaining("could not be written");
    }
}
