package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The same entries make the same journal and the same pictures whatever language, time zone, encoding or Java runs them. */
class SameBytesTest {
    private static final Path JVMS = Path.of("/usr/lib/jvm");
    private static final Pattern HEAD = Pattern.compile("journal head (\\S+)");
    private static final Pattern FILE = Pattern.compile("day-1/sb-10(0[4-9]|1[0-3])\\.txt");
    private static final Pattern VERSION = Pattern.compile("JAVA_VERSION=\"(\\d+)");

    @TempDir
    static Path folder;

    private static Path reduced = Path.of("");
    private static Made plain = new Made("", Map.of());

    /** What one process made: journal head and every picture as ISO 8859-1 text, byte for character. */
    private record Made(String head, Map<String, String> pictures) {}

    @BeforeAll
    static void makeThePlainOne() throws IOException, InterruptedException {
        reduced = ReducedLab.write(
                folder.resolve("samples"),
                ReducedLab.SAMPLES.resolve("raw"),
                name -> FILE.matcher(name).matches());
        plain = made(Path.of(System.getProperty("java.home")), List.of("-Duser.language=en", "-Duser.timezone=UTC"));
        assertThat(plain.pictures()).hasSizeGreaterThanOrEqualTo(4);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "-Duser.language=de -Duser.country=DE -Duser.language.format=de -Duser.timezone=America/New_York",
                "-Duser.language=tr -Duser.country=TR -Duser.language.format=tr -Duser.timezone=Asia/Tokyo",
                "-Duser.language=ar -Duser.country=EG -Duser.language.format=ar -Dfile.encoding=ISO-8859-1"
            })
    void languageZoneAndEncodingChangeNoByte(String options) throws IOException, InterruptedException {
        assertThat(made(Path.of(System.getProperty("java.home")), List.of(options.split(" "))))
                .isEqualTo(plain);
    }

    @Test
    void theNewestOtherJavaMakesTheSameBytes() throws IOException, InterruptedException {
        Optional<Path> other = newestOther();
        assumeTrue(other.isPresent(), "only one Java is installed under " + JVMS + ", so there is none to compare");
        assertThat(made(other.orElseThrow(), List.of())).isEqualTo(plain);
    }

    private static Optional<Path> newestOther() throws IOException {
        if (!Files.isDirectory(JVMS)) {
            return Optional.empty();
        }
        TreeMap<Integer, Path> homes = new TreeMap<>();
        try (Stream<Path> found = Files.list(JVMS)) {
            for (Path home : found.sorted().toList()) {
                version(home).ifPresent(version -> homes.put(version, home));
            }
        }
        homes.remove(Runtime.version().feature());
        homes.headMap(17).clear();
        return homes.isEmpty()
                ? Optional.empty()
                : Optional.of(homes.lastEntry().getValue());
    }

    private static Optional<Integer> version(Path home) throws IOException {
        Path release = home.resolve("release");
        if (!Files.isRegularFile(release)
                || !Files.isExecutable(home.resolve("bin").resolve("java"))) {
            return Optional.empty();
        }
        Matcher matcher = VERSION.matcher(Files.readString(release, StandardCharsets.UTF_8));
        return matcher.find() ? Optional.of(Integer.valueOf(matcher.group(1))) : Optional.empty();
    }

    private static Made made(Path java, List<String> options) throws IOException, InterruptedException {
        Path own = Files.createTempDirectory(folder, "made");
        Path archive = own.resolve("archive");
        String words = run(java, options, own, "demo", "--quiet", "--from", reduced.toString(), archive.toString());
        Matcher matcher = HEAD.matcher(words);
        assertThat(matcher.find()).as(words).isTrue();
        Path into = own.resolve("pictures");
        run(
                java,
                options,
                own,
                "draw",
                "--archive",
                archive.toString(),
                "--into",
                into.toString(),
                "--form",
                "svg,csv",
                "fit 1",
                "scan 3");
        Map<String, String> pictures = new TreeMap<>();
        try (Stream<Path> found = Files.list(into)) {
            for (Path picture : found.toList()) {
                pictures.put(picture.getFileName().toString(), Files.readString(picture, StandardCharsets.ISO_8859_1));
            }
        }
        return new Made(matcher.group(1), pictures);
    }

    private static String run(Path java, List<String> options, Path own, String... arguments)
            throws IOException, InterruptedException {
        List<String> command = new ArrayList<>();
        command.add(java.resolve("bin").resolve("java").toString());
        command.addAll(List.of("-XX:+UseSerialGC", "-XX:TieredStopAtLevel=1", "-Djava.awt.headless=true"));
        command.addAll(options);
        command.addAll(List.of("-cp", System.getProperty("java.class.path"), Main.class.getName()));
        command.addAll(List.of(arguments));
        File output = Files.createTempFile(own, "output", ".txt").toFile();
        Process process = new ProcessBuilder(command)
                .redirectErrorStream(true)
                .redirectOutput(output)
                .start();
        int code = process.waitFor();
        String words = Files.readString(output.toPath(), StandardCharsets.ISO_8859_1);
        assertThat(code).as(String.join(" ", options) + ": " + words).isZero();
        return words;
    }
}
