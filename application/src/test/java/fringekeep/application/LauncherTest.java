package fringekeep.application;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;
import org.junit.jupiter.api.io.TempDir;

/**
 * The whole job on the built launcher as a stranger would unpack it, from an empty folder to a checked bundle, over all sample
 * data. Coreutils judge the bundle beside the program's own check.
 */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class LauncherTest {
    @TempDir
    private static Path folder;

    private static Path home;
    private static Path program;
    private static Path archive;

    @BeforeAll
    static void unpackWhereThePathHasASpace() throws Exception {
        Path place = Files.createDirectories(folder.resolve("some where"));
        run(place, List.of("unzip", "-q", zip().toString(), "-d", place.toString()));
        home = place.resolve("fringekeep");
        program = home.resolve("bin").resolve("fringekeep-headless");
        archive = folder.resolve("lab");
    }

    private static Path zip() throws IOException {
        Path target = Path.of(System.getProperty("application")).getParent();
        try (Stream<Path> files = Files.list(target)) {
            return files.filter(file -> file.toString().endsWith(".zip"))
                    .findFirst()
                    .orElseThrow(() -> new IllegalStateException("no zip in " + target));
        }
    }

    private record Ended(int code, String words) {}

    private static Ended run(Path directory, List<String> command) throws IOException, InterruptedException {
        ProcessBuilder builder =
                new ProcessBuilder(command).directory(directory.toFile()).redirectErrorStream(true);
        builder.environment().remove("DISPLAY");
        builder.environment().put("FRINGEKEEP_ARCHIVE", folder.resolve("lab").toString());
        Process process = builder.start();
        process.getOutputStream().close();
        String words = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        return new Ended(process.waitFor(), words);
    }

    private static Ended headless(String... arguments) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>(List.of(program.toString()));
        command.addAll(List.of(arguments));
        return run(folder, command);
    }

    private static void requireDone(Ended ended) {
        assertThat(ended.code()).as(ended.words()).isZero();
    }

    @Test
    @Order(1)
    void theHeadlessProgramCarriesNoJarOfTheWindowPlatform() throws Exception {
        Path modules = home.resolve("fringekeep").resolve("modules");
        try (Stream<Path> jars = Files.walk(modules)) {
            // the title of the window and the like lie under locale; the headless program leaves them out
            List<String> platform = jars.filter(file -> !file.toString().contains("locale"))
                    .map(file -> file.getFileName().toString())
                    .filter(name -> name.startsWith("org-netbeans") || name.startsWith("org-openide"))
                    .toList();
            assertThat(platform).isEmpty();
        }
        Ended ended = headless("--version");
        requireDone(ended);
        assertThat(ended.words()).contains("Fringekeep 1.0.0");
    }

    @Test
    @Order(2)
    void licenceAndNoticesAreInTheZip() throws Exception {
        assertThat(Files.readString(home.resolve("LICENSE.txt"))).contains("Apache License");
        assertThat(Files.readString(home.resolve("third-party-notices.txt")))
                .contains("org.apache.derby:derby")
                .doesNotContain("junit");
    }

    @Test
    @Order(3)
    void theInventedLaboratoryIsMadeAndWhole() throws Exception {
        Path samples = Path.of("..", "sample-data").toAbsolutePath().normalize();

        requireDone(headless("demo", "--quiet", "--from", samples.toString(), archive.toString()));
        Ended check = headless("check");
        requireDone(check);
        assertThat(check.words()).contains("no fault");
    }

    @Test
    @Order(4)
    void itsFigureIsRecomputedToTheSameBits() throws Exception {
        Ended ended = headless("recompute", "figure 1");

        requireDone(ended);
        assertThat(ended.words()).contains("worst: same bits");
    }

    @Test
    @Order(5)
    void aStrangerChecksTheBundle() throws Exception {
        Path settings = Files.writeString(folder.resolve("bundle.json"), """
                {"name": "invented-fringes", "title": "Invented fringes", "description": "Invented data for trying the program.",
                 "published": "2031-11-03", "license": "CC-BY-4.0", "publisher": "demo lab",
                 "authors": [{"name": "Ottla Vireen"}], "keywords": ["invented"]}
                """);
        requireDone(headless(
                "bundle", "--settings", settings.toString(), "--into", folder.toString(), "figure 1", "statement 1"));
        Path bag = folder.resolve("invented-fringes");

        requireDone(run(bag, List.of("sha256sum", "--strict", "--quiet", "-c", "manifest-sha256.txt")));
        requireDone(run(bag, List.of("sha512sum", "--strict", "--quiet", "-c", "manifest-sha512.txt")));
        Ended check = headless("check-bundle", bag.toString());
        requireDone(check);
        assertThat(check.words()).contains("holds: recomputed");
    }

    @Test
    @Order(6)
    void aChangedCountIsFoundAndNamed() throws Exception {
        Path bag = folder.resolve("invented-fringes");
        try (Stream<Path> files = Files.list(bag.resolve("data").resolve("raw"))) {
            Path raw = files.sorted().findFirst().orElseThrow();
            byte[] bytes = Files.readAllBytes(raw);
            bytes[bytes.length / 2] ^= 1;
            Files.write(raw, bytes);
            Ended check = headless("check-bundle", bag.toString());

            assertThat(check.code()).isEqualTo(1);
            assertThat(check.words()).contains(raw.getFileName().toString());
        }
    }
}
