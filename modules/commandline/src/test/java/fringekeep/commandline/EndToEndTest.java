package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.MethodOrderer;
import org.junit.jupiter.api.Order;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestMethodOrder;
import org.junit.jupiter.api.io.TempDir;

/**
 * The whole chain over all of the invented laboratory. Derived values are judged by its known truth, which the sample data's
 * generator made by brute-force propagation of amplitudes (sample-data/generator), not by this program's formulas; the
 * provenance by Debian's python3-prov.
 */
@TestMethodOrder(MethodOrderer.OrderAnnotation.class)
class EndToEndTest {
    private static final Path SAMPLES =
            Path.of("../../sample-data").toAbsolutePath().normalize();
    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final String PERSON = "Bram Quillow";

    @TempDir
    private static Path folder;

    private record Ended(int code, String data, String words) {}

    private static Ended run(String... arguments) {
        ByteArrayOutputStream data = new ByteArrayOutputStream();
        ByteArrayOutputStream words = new ByteArrayOutputStream();
        Console console = new Console(
                new PrintStream(data, true, StandardCharsets.UTF_8),
                new PrintStream(words, true, StandardCharsets.UTF_8));
        int code = Main.run(console, arguments);
        return new Ended(code, data.toString(StandardCharsets.UTF_8), words.toString(StandardCharsets.UTF_8));
    }

    private static Ended onLab(String command, String... arguments) {
        List<String> all = new ArrayList<>(List.of(command, "--archive", lab().toString()));
        all.addAll(List.of(arguments));
        return run(all.toArray(String[]::new));
    }

    private static Path lab() {
        return folder.resolve("lab");
    }

    private static Ended done(Ended ended) {
        assertThat(ended.code()).as(ended.words()).isZero();
        return ended;
    }

    private static JsonNode json(Ended ended) throws IOException {
        return MAPPER.readTree(done(ended).data());
    }

    @BeforeAll
    static void replay() {
        done(run("demo", "--quiet", "--from", SAMPLES.toString(), lab().toString()));
    }

    @Test
    @Order(1)
    void theArchiveIsWhole() throws IOException {
        assertThat(json(onLab("check", "--json")).get("faults")).isEmpty();
        assertThat(json(onLab("facts", "--json")).get("invented").asBoolean()).isTrue();
    }

    @Test
    @Order(2)
    void polarizabilitiesAgreeWithTheTruthWithinTheirUncertainty() throws IOException {
        JsonNode truth = MAPPER.readTree(SAMPLES.resolve("truth.json").toFile());
        int compared = 0;
        for (JsonNode property : json(onLab("list", "--json", "property"))) {
            double value = property.get("volume_m3").asDouble();
            double u = property.get("volume_u_m3").asDouble();
            // the clusters' truth is stated per compound at the wavelength of the light grating, as the others' is
            for (JsonNode compound : truth.get("compounds")) {
                boolean same = compound.get("name")
                                .asText()
                                .equals(property.get("compound").asText())
                        && compound.get("wavelength").asDouble() > 5e-7;
                if (same) {
                    compared++;
                    double pull = (value - compound.get("polarizabilityVolume").asDouble()) / u;
                    assertThat(pull).as(property.toString()).isBetween(-3.0, 3.0);
                }
            }
        }
        assertThat(compared).isGreaterThanOrEqualTo(4);
    }

    @Test
    @Order(3)
    void theDataThatCannotTellSaySo() throws IOException {
        List<String> verdicts = new ArrayList<>();
        json(onLab("list", "--json", "property"))
                .forEach(row -> verdicts.add(row.get("verdict").asText()));

        assertThat(verdicts).contains("quantum", "cannot tell").doesNotContain("classical", "neither fits");
    }

    @Test
    @Order(4)
    void aFigureIsTracedToRawFilesInThreeForms() throws Exception {
        assertThat(done(onLab("trace", "figure 1")).data())
                .contains("property", "selection", "fit", "scan", "raw file");
        JsonNode trace = json(onLab("trace", "--json", "figure 1"));
        assertThat(trace.get("rawFiles").size()).isGreaterThan(100);
        assertThat(trace.get("absent")).isEmpty();
        Path prov = Files.writeString(
                folder.resolve("prov.json"),
                done(onLab("trace", "--form", "prov", "figure 1")).data());
        Process python = new ProcessBuilder(
                        "/usr/bin/python3",
                        "-c",
                        "import sys, prov.model as m; d = m.ProvDocument.deserialize(sys.argv[1]);"
                                + "assert m.ProvDocument.deserialize(content=d.serialize()) == d; print(len(d.get_records()))",
                        prov.toString())
                .redirectErrorStream(true)
                .start();
        String words = new String(python.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
        assertThat(python.waitFor())
                .as("Debian's python3-prov reads the provenance (apt-get install python3-prov): " + words)
                .isZero();
        assertThat(Integer.parseInt(words.strip()))
                .isGreaterThan(trace.get("records").size());
    }

    @Test
    @Order(5)
    void theFigureIsRecomputedToTheSameBits() throws IOException {
        assertThat(json(onLab("recompute", "--json", "figure 1")).get("worst").asText())
                .isEqualTo("same bits");
    }

    @Test
    @Order(6)
    void aCorrectedSetupLeavesTheFitsThatWereNotMadeAnewOutdated() throws IOException {
        JsonNode outdated = json(onLab("outdated", "--json"));

        assertThat(outdated.size()).isEqualTo(9);
        for (JsonNode record : outdated) {
            assertThat(record.get("causes").get(0).get("words").asText())
                    .contains("setup 0001 was corrected by setup 0001 b");
        }
        assertThat(json(onLab("outdated", "--json", "figure 1"))).isEmpty();
    }

    @Test
    @Order(7)
    void picturesAreWrittenInEveryForm() throws IOException {
        Path pictures = folder.resolve("pictures");
        done(onLab("draw", "--into", pictures.toString(), "figure 1"));

        assertThat(Files.readString(pictures.resolve("figure-0001.svg"))).contains("<svg");
        assertThat(new String(Files.readAllBytes(pictures.resolve("figure-0001.pdf")), StandardCharsets.ISO_8859_1))
                .startsWith("%PDF-");
        assertThat(pictures.resolve("figure-0001.png")).isNotEmptyFile();
        assertThat(pictures.resolve("figure-0001.csv")).isNotEmptyFile();
    }

    @Test
    @Order(8)
    void aPlainCopyIsRestoredToTheSameJournal() throws IOException {
        done(onLab("copy", folder.resolve("copy").toString()));
        done(run(
                "restore",
                folder.resolve("copy").toString(),
                folder.resolve("restored").toString()));

        assertThat(json(run(
                                "facts",
                                "--json",
                                "--archive",
                                folder.resolve("restored").toString()))
                        .get("journalHead"))
                .isEqualTo(json(onLab("facts", "--json")).get("journalHead"));
    }

    @Test
    @Order(9)
    void aWithdrawnScanMovesThePropertyAndTheNextRevisionSettlesIt() throws IOException {
        done(onLab("judge", "--person", PERSON, "--verdict", "withdrawn", "--reason", "drift", "scan 9"));
        JsonNode outdated = json(onLab("outdated", "--json", "--sizes", "figure 1"));
        List<String> labels = new ArrayList<>();
        outdated.forEach(record -> labels.add(record.get("label").asText()));
        assertThat(labels)
                .contains("figure 0001", "property 0001", "selection 0001")
                .doesNotContain("property 0002");
        assertThat(outdated.toString()).contains("sigmas");

        done(onLab("revise", "--person", PERSON, "figure 1"));

        assertThat(json(onLab("outdated", "--json", "figure 1"))).isEmpty();
        assertThat(json(onLab("show", "--json", "figure 1")).get(0).get("label").asText())
                .isEqualTo("figure 0001 b");
        assertThat(json(onLab("recompute", "--json", "figure 1")).get("worst").asText())
                .isEqualTo("same bits");
    }

    @Test
    @Order(10)
    void supposingRecordsNothing() throws IOException {
        JsonNode before = json(onLab("facts", "--json")).get("entries");
        JsonNode supposed = json(onLab("suppose", "--json", "--without", "scan 11", "property 1"));

        assertThat(supposed.toString()).contains("/polarizabilityVolume");
        assertThat(json(onLab("facts", "--json")).get("entries")).isEqualTo(before);
    }

    @Test
    void everyCommandHelps() {
        Ended all = done(run("--help"));
        for (String command : List.of(
                "found",
                "facts",
                "person",
                "check",
                "copy",
                "restore",
                "receive",
                "rebuild",
                "purge",
                "record",
                "show",
                "list",
                "schema",
                "judge",
                "take-in",
                "place",
                "fit",
                "select",
                "property",
                "draw",
                "trace",
                "outdated",
                "suppose",
                "revise",
                "recompute",
                "bundle",
                "check-bundle",
                "demo",
                "compute")) {
            assertThat(all.data()).contains(command);
            assertThat(done(run(command, "--help")).data()).contains("Usage: fringekeep-headless " + command);
        }
    }

    @Test
    void wrongUseIsSaidAndAnsweredByTwo() {
        assertThat(run("publish").code()).isEqualTo(2);
        assertThat(run().code()).isEqualTo(2);
        assertThat(run("trace", "--no-such-option", "figure 1").code()).isEqualTo(2);
        Ended missing = onLab("show", "scan 99999");
        assertThat(missing.code()).isEqualTo(1);
        assertThat(missing.words()).contains("mend:");
    }
}
