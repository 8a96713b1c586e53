package fringekeep.interferometry.judge;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assumptions.assumeThat;

import java.io.File;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.lang.reflect.Method;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/**
 * The recorded hashes hold on the newest Java installed as on the one that builds. Looks where Linux puts Java releases
 * and at JAVA_HOME's neighbours; says so where there is no other.
 */
class NewestJavaRegressionTest {
    private static final List<String> HASHED = List.of(
            "fringekeep.interferometry.nearfield.SameBitsRegressionTest.aLargeSetOfValuesHasTheRecordedHash",
            "fringekeep.interferometry.fringe.FringeDeterminismRegressionTest.hashOfALargeResultSetIsTheRecordedOne");

    private record Release(Path home, int feature) {}

    private static Optional<Release> newest() throws IOException {
        Path own = Path.of(System.getProperty("java.home")).toRealPath();
        List<Release> found = Stream.of(Path.of("/usr/lib/jvm"), own.resolveSibling("."))
                .filter(Files::isDirectory)
                .flatMap(NewestJavaRegressionTest::homes)
                .flatMap(home -> feature(home).stream())
                .toList();
        return found.stream()
                .filter(release -> release.feature > Runtime.version().feature())
                .max(Comparator.comparingInt(Release::feature));
    }

    private static Stream<Path> homes(Path folder) {
        try (Stream<Path> homes = Files.list(folder)) {
            return homes.filter(home -> Files.isExecutable(home.resolve("bin/java"))).toList().stream();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static Optional<Release> feature(Path home) {
        Path notes = home.resolve("release");
        if (!Files.isRegularFile(notes)) {
            return Optional.empty();
        }
        try {
            return Files.readAllLines(notes).stream()
                    .filter(line -> line.startsWith("JAVA_VERSION="))
                    .map(line -> line.replaceAll("[^0-9.]", "").split("\\.")[0])
                    .map(number -> new Release(home, Integer.parseInt(number)))
                    .findFirst();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Where the classes that the hashes need were loaded from, however the tests were started. */
    private static String classPath() {
        return Stream.of(
                        NewestJavaRegressionTest.class,
                        fringekeep.interferometry.special.Bessel.class,
                        org.apache.commons.math3.special.Gamma.class,
                        Test.class,
                        org.opentest4j.AssertionFailedError.class,
                        org.assertj.core.api.Assertions.class)
                .map(type -> {
                    try {
                        return Path.of(type.getProtectionDomain()
                                        .getCodeSource()
                                        .getLocation()
                                        .toURI())
                                .toString();
                    } catch (URISyntaxException e) {
                        throw new IllegalStateException("class path entry of " + type, e);
                    }
                })
                .distinct()
                .collect(Collectors.joining(File.pathSeparator));
    }

    @Test
    void recordedHashesHoldOnTheNewestJava() throws IOException, InterruptedException {
        Optional<Release> newest = newest();
        assumeThat(newest)
                .as(
                        "No Java newer than %s is installed; nothing to compare with.",
                        Runtime.version().feature())
                .isPresent();

        Process process = new ProcessBuilder(
                        newest.orElseThrow().home.resolve("bin/java").toString(),
                        "-cp",
                        classPath(),
                        Child.class.getName())
                .redirectErrorStream(true)
                .start();
        String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);

        assertThat(process.waitFor()).as(said).isZero();
        assertThat(said).contains("Java " + newest.orElseThrow().feature, "2 hashes as recorded");
    }

    /** Runs the tests of the hashes in another Java. */
    static final class Child {
        private Child() {}

        /** Ends with an exception, and so not with 0, where a hash differs. */
        public static void main(String[] arguments) throws ReflectiveOperationException {
            for (String test : HASHED) {
                int dot = test.lastIndexOf('.');
                var constructor = Class.forName(test.substring(0, dot)).getDeclaredConstructor();
                constructor.setAccessible(true);
                Method method = constructor.getDeclaringClass().getDeclaredMethod(test.substring(dot + 1));
                method.setAccessible(true);
                method.invoke(constructor.newInstance());
            }
            System.out.println("Java " + Runtime.version().feature() + ": " + HASHED.size() + " hashes as recorded");
        }
    }
}
