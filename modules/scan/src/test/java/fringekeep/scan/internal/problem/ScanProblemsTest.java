package fringekeep.scan.internal.problem;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.problem.Problem;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class ScanProblemsTest {
    private static final Pattern CODE = Pattern.compile("\"((?:scan|profile|series|placement)\\.[a-z-]+)\"");

    private static Set<String> codesInSource() throws IOException {
        Set<String> codes = new TreeSet<>();
        try (Stream<Path> files = Files.walk(Path.of("src/main/java"))) {
            for (Path file :
                    files.filter(path -> path.toString().endsWith(".java")).toList()) {
                Matcher matcher = CODE.matcher(Files.readString(file));
                while (matcher.find()) {
                    codes.add(matcher.group(1));
                }
            }
        }
        return codes;
    }

    @Test
    void everyCodeSaysWhatHappenedAndHowToMendIt() throws IOException {
        Set<String> codes = codesInSource();

        assertThat(codes).hasSizeGreaterThan(50);
        for (String code : codes) {
            Problem problem = ScanProblems.of(code, "here", "first", "second", "third");
            assertThat(problem.what()).as(code).isNotBlank().doesNotContain("{");
            assertThat(problem.mend()).as(code).isNotBlank().doesNotContain("{");
        }
    }
}
