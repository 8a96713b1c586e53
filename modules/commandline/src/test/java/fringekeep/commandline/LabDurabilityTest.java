package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.PartName;
import fringekeep.testsupport.OtherProgram;
import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Pattern;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The real kinds and verbs at work in another program that is ended at random moments. Afterwards the archive opens, every
 * acknowledged record is there whole, and a check finds nothing but named leftovers that do no harm.
 */
class LabDurabilityTest {
    private static final Pattern FILE = Pattern.compile("day-1/sb-10(0[4-9]|1\\d|2\\d)\\.txt");
    private static final Pattern DONE = Pattern.compile("done ([0-9a-f]{64})");

    @TempDir
    static Path folder;

    private static Path place = Path.of("");
    private final Set<Hash> acknowledged = new HashSet<>();

    @BeforeAll
    static void makeTheFirstNight() throws Exception {
        Path samples = ReducedLab.write(
                folder.resolve("samples"),
                ReducedLab.SAMPLES.resolve("raw"),
                name -> FILE.matcher(name).matches());
        place = folder.resolve("archive");
        ByteArrayOutputStream data = new ByteArrayOutputStream();
        ByteArrayOutputStream words = new ByteArrayOutputStream();
        int code = Main.run(
                ComputeReferenceTest.console(data, words),
                "demo",
                "--quiet",
                "--from",
                samples.toString(),
                place.toString());
        assertThat(code).as(words.toString(StandardCharsets.UTF_8)).isZero();
    }

    @Test
    void fitsThatWereAcknowledgedAreThereWhole() throws Exception {
        for (int round = 0; round < OtherProgram.kills(); round++) {
            kill("fit", round);
        }
        assertThat(acknowledged).isNotEmpty();
    }

    @Test
    void scansThatWereAcknowledgedAreThereWhole() throws Exception {
        for (int round = 0; round < OtherProgram.kills(); round++) {
            kill("take-in", round);
        }
        assertThat(acknowledged).isNotEmpty();
    }

    private void kill(String what, int round) throws Exception {
        List<String> lines =
                OtherProgram.runUntilHalted(KilledLab.class, what, place.toString(), Integer.toString(round));
        lines.stream()
                .map(DONE::matcher)
                .filter(matcher -> matcher.matches())
                .map(matcher -> new Hash(matcher.group(1)))
                .forEach(acknowledged::add);
        try (Archive archive = Archives.open(place, Session.kinds(), Session.circumstances())) {
            for (Hash record : acknowledged) {
                assertThat(archive.record(record).flatMap(found -> found.part(PartName.RESULT)))
                        .as("%s, round %d, record %s", what, round, record)
                        .isPresent();
            }
            assertThat(archive.check(Work.QUIET).stream().map(Problem::code).distinct())
                    .as("%s, round %d", what, round)
                    .allMatch(code -> code.startsWith("orphan."));
        }
    }
}
