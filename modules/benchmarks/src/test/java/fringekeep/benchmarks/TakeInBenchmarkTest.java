package fringekeep.benchmarks;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.NewRecord;
import fringekeep.archive.Person;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.scan.TakeInFiles;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.ServiceLoader;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Files taken in a second through the real archive, every file durable on return: time on the clock, as the disk decides. */
class TakeInBenchmarkTest {
    private static final int FILES = 300;
    private static final PersonId PERSON = new PersonId("9e6f4bda0812427482f42a10b3a56faf");
    private static final String PROFILE = "{\"form\":\"delimited/1\",\"encoding\":\"UTF-8\",\"delimiter\":\"\\t\","
            + "\"decimal\":\".\",\"skip\":1,\"comment\":\"#\",\"columns\":[{\"axis\":\"position\",\"unit\":\"nm\","
            + "\"positions\":\"set\"},{\"channel\":\"counts\"}],\"header\":[{\"key\":\"start\",\"moment\":\"start\"},"
            + "{\"key\":\"dwell\",\"exposure\":true}]}";

    @TempDir
    private Path folder;

    @Test
    void filesASecond() throws ProblemException, IOException {
        Kinds kinds = new Kinds(ServiceLoader.load(RecordKind.class).stream()
                .map(ServiceLoader.Provider::get)
                .toList());
        Person person = new Person(PERSON, Optional.of("N. N."), Optional.empty(), Optional.empty());
        Archives.Founding founding = new Archives.Founding(
                "benchmark (invented)", "06:00", "Etc/GMT-2", true, List.of(person), Optional.empty());
        try (Archive archive =
                Archives.found(folder.resolve("lab"), founding, kinds, Circumstances.real("benchmark"))) {
            Hash profile = archive.record(new NewRecord(
                            new KindName("reading-profile"),
                            List.of(),
                            List.of(),
                            Map.of(PartName.CONTENT, (JsonObject)
                                    JsonDocument.read(PROFILE.getBytes(StandardCharsets.UTF_8))
                                            .value()),
                            List.of(),
                            Optional.empty(),
                            Optional.empty(),
                            Optional.of(PERSON)))
                    .fingerprint();
            take(archive, profile, files(0, 100));
            for (int round = 1; round <= 3; round++) {
                List<Path> files = files(round * FILES, FILES);
                long begin = System.nanoTime();
                double cpu = Bench.cpu(() -> take(archive, profile, files));
                double seconds = (System.nanoTime() - begin) * 1e-9;
                Bench.print(
                        "take-in of %d files of 40 points: %.0f files a second on the clock, %.0f a CPU second of the"
                                + " calling thread",
                        FILES, FILES / seconds, FILES / cpu);
            }
        }
    }

    private List<Path> files(int first, int count) throws IOException {
        List<Path> files = new ArrayList<>();
        for (int k = first; k < first + count; k++) {
            StringBuilder text = new StringBuilder("# start: 2031-05-14T09:03:11+02:00\n# dwell: 10 s\n")
                    .append("position_nm\tcounts\n");
            for (int point = 0; point < 40; point++) {
                text.append(16 * point)
                        .append('\t')
                        .append(300 + (k * 31 + point * 17) % 101 + k % 97)
                        .append('\n');
            }
            text.append("# file ").append(k).append('\n');
            files.add(Files.writeString(folder.resolve("scan" + k + ".txt"), text));
        }
        return files;
    }

    private static void take(Archive archive, Hash profile, List<Path> files) {
        try {
            List<TakeInFiles.FileOutcome> outcomes = new TakeInFiles(archive)
                    .takeIn(
                            new TakeInFiles.Request(files, Optional.of(profile), false, Optional.of(PERSON)),
                            Work.QUIET);
            assertThat(outcomes).hasSameSizeAs(files).allMatch(o -> o.state() == TakeInFiles.State.TAKEN_IN);
        } catch (ProblemException e) {
            throw new IllegalStateException(e);
        }
    }
}
