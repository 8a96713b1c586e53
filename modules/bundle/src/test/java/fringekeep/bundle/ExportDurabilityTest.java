package fringekeep.bundle;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Work;
import java.io.File;
import java.net.URI;
import java.net.URLClassLoader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What a killed export leaves behind. */
class ExportDurabilityTest {
    private static final int ROUNDS = 4;

    @TempDir
    private Path folder;

    @Test
    void whatStandsUnderAFinalNameIsWhole() throws Exception {
        Random random = new Random(20310514);
        int found = 0;
        for (int round = 0; round < ROUNDS; round++) {
            Path place = Files.createDirectory(folder.resolve("round-" + round));
            Path out = Files.createDirectory(place.resolve("out"));
            assertThat(run(place, 30 + random.nextInt(300)))
                    .as("%s", Files.readString(folder.resolve("words")))
                    .isEqualTo(HaltedExport.HALTED);
            for (Path bundle : finalNames(out)) {
                BundleReport report = CheckBundle.check(bundle, SmallArchive.kinds(), Level.FILES_INTACT, Work.QUIET);
                assertThat(report.level())
                        .as("%s %s", bundle, report.allFaults())
                        .isEqualTo(Level.FILES_INTACT);
                found++;
            }
        }
        assertThat(found).isPositive();
    }

    private int run(Path place, int reports) throws Exception {
        Process process = new ProcessBuilder(
                        Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                        "-cp",
                        classPath(),
                        HaltedExport.class.getName(),
                        place.toString(),
                        Integer.toString(reports))
                .redirectErrorStream(true)
                .redirectOutput(folder.resolve("words").toFile())
                .start();
        return process.waitFor();
    }

    /** The class path of the tests, however they were started. */
    private static String classPath() {
        if (ExportDurabilityTest.class.getClassLoader() instanceof URLClassLoader loader) {
            return Arrays.stream(loader.getURLs())
                    .map(url -> Path.of(URI.create(url.toString())).toString())
                    .collect(Collectors.joining(File.pathSeparator));
        }
        return System.getProperty("java.class.path");
    }

    private static List<Path> finalNames(Path out) throws Exception {
        try (Stream<Path> all = Files.list(out)) {
            return all.filter(path -> !path.getFileName().toString().startsWith("."))
                    .toList();
        }
    }
}
