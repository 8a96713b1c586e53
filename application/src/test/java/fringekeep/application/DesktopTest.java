package fringekeep.application;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;

/**
 * Starts the real application under a virtual display on the invented laboratory, lets the tests inside it (module uitest)
 * press keys and look, and repeats their answers here. Screenshots go to target/screenshots.
 */
class DesktopTest {
    private static final Path APPLICATION = Path.of(System.getProperty("application"));
    private static final Path SCREENSHOTS = Path.of(System.getProperty("screenshots"));
    private static final Path WORK = APPLICATION.resolveSibling("desktop-test");
    private static final long MINUTES = 15;

    @TestFactory
    Stream<DynamicTest> theTestsInsideTheApplicationPass() throws IOException, InterruptedException {
        clear(WORK);
        Files.createDirectories(WORK.resolve("user/etc"));
        Path lab = invented();
        List<String> results = new ArrayList<>();
        try (VirtualDisplay display = VirtualDisplay.start(2600, 1500)) {
            results.addAll(run(lab, display.name(), "usual", List.of()));
        }
        try (VirtualDisplay display = VirtualDisplay.start(5200, 3000)) {
            List<String> twice = List.of("-J-Dsun.java2d.uiScale=2", "-J-Dfringekeep.uitest.only=Screens");
            run(lab, display.name(), "twice", twice)
                    .forEach(line -> results.add(line.replaceFirst("\t", "\tat 200 %: ")));
        }
        List<DynamicTest> tests = new ArrayList<>();
        for (String line : results) {
            String[] parts = line.split("\t", 3);
            String fault = parts.length > 2 ? parts[2] : "";
            tests.add(DynamicTest.dynamicTest(
                    parts[1], () -> assertThat(parts[0]).as(fault).isIn("SUCCESSFUL", "BUSY")));
        }
        tests.add(DynamicTest.dynamicTest("the log holds no warning", DesktopTest::noWarning));
        return tests.stream();
    }

    private static Path invented() throws IOException, InterruptedException {
        Path lab = WORK.resolve("lab");
        Path launcher = APPLICATION.resolve("bin/fringekeep-headless");
        Path samples = Path.of("..", "sample-data").toAbsolutePath().normalize();
        ProcessBuilder builder = new ProcessBuilder(
                "sh", launcher.toString(), "demo", "--quiet", "--from", samples.toString(), lab.toString());
        builder.environment().put("JAVA_HOME", System.getProperty("java.home"));
        await(builder, WORK.resolve("demo.log"), "the invented laboratory is made");
        return lab;
    }

    private static List<String> run(Path lab, String display, String name, List<String> more)
            throws IOException, InterruptedException {
        Path results = WORK.resolve(name + ".tsv");
        Path cluster = Path.of(System.getProperty("uitest.cluster")).normalize();
        assertThat(cluster).as("cluster of the tests inside the application").isDirectory();
        Files.writeString(
                WORK.resolve("user/etc/fringekeep.conf"),
                "extra_clusters=\"" + cluster + "\"\n",
                StandardCharsets.UTF_8);
        List<String> command = new ArrayList<>(List.of(
                "sh",
                APPLICATION.resolve("bin/fringekeep").toString(),
                "--jdkhome",
                System.getProperty("java.home"),
                "--userdir",
                WORK.resolve("user").toString(),
                "--cachedir",
                WORK.resolve("cache").toString(),
                "--nosplash",
                "-J-Dfringekeep.open=" + lab,
                "-J-Dfringekeep.uitest.out=" + results,
                "-J-Dfringekeep.uitest.pictures=" + SCREENSHOTS));
        command.addAll(more);
        ProcessBuilder builder = new ProcessBuilder(command);
        builder.environment().put("DISPLAY", display);
        await(builder, WORK.resolve(name + ".log"), "the application ends by itself");
        assertThat(results).as("results of the tests inside the application").exists();
        return Files.readAllLines(results, StandardCharsets.UTF_8);
    }

    private static void await(ProcessBuilder builder, Path log, String what) throws IOException, InterruptedException {
        Process process =
                builder.redirectErrorStream(true).redirectOutput(log.toFile()).start();
        boolean ended = process.waitFor(MINUTES, TimeUnit.MINUTES);
        if (!ended) {
            process.descendants().forEach(ProcessHandle::destroyForcibly);
            process.destroyForcibly();
        }
        assertThat(ended)
                .as(what + " within " + MINUTES + " minutes; see " + log)
                .isTrue();
        assertThat(process.exitValue()).as(what + ": " + Files.readString(log)).isZero();
    }

    private static void noWarning() throws IOException {
        List<String> log = Files.readAllLines(WORK.resolve("user/var/log/messages.log"), StandardCharsets.UTF_8);

        assertThat(log.stream().filter(line -> line.startsWith("WARNING") || line.startsWith("SEVERE")))
                .isEmpty();
    }

    private static void clear(Path folder) throws IOException {
        if (!Files.exists(folder)) {
            return;
        }
        try (Stream<Path> all = Files.walk(folder)) {
            for (File file :
                    all.sorted(Comparator.reverseOrder()).map(Path::toFile).toList()) {
                assertThat(file.delete() || file.setWritable(true) && file.delete())
                        .as("clearing " + file)
                        .isTrue();
            }
        }
    }
}
