package fringekeep.sourcerun;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.archive.entry.Entered;
import fringekeep.archive.entry.EntryDocument;
import fringekeep.archive.entry.EntrySurroundings;
import fringekeep.archive.facet.Distribution;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationKind;
import fringekeep.instrument.MonitorLog;
import fringekeep.instrument.MonitorLogKind;
import fringekeep.instrument.SetupFacet;
import fringekeep.instrument.SetupKind;
import fringekeep.sample.BatchKind;
import fringekeep.sample.CompoundKind;
import fringekeep.sample.MassFacet;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** What the demo lab entered passes entry, schema, roles and rules, and is made into records. */
class LabDocumentsTest {
    private static final RecordKind[] KINDS = {
        new CompoundKind(),
        new BatchKind(),
        new SetupKind(),
        new CalibrationKind(),
        new MonitorLogKind(),
        new SourceRunKind(),
        new VelocityKind()
    };
    private final DetachedRecords records = new DetachedRecords(KINDS);
    private final Map<String, List<Hash>> made = new HashMap<>();

    private Hash find(String reference) {
        int space = reference.lastIndexOf(' ');
        return made.getOrDefault(reference.substring(0, space), List.of())
                .get(Integer.parseInt(reference.substring(space + 1)) - 1);
    }

    private EntrySurroundings.TakenRaw take(String path) {
        try {
            Path name = Path.of(path).getFileName();
            byte[] bytes =
                    Files.readAllBytes(Path.of("src/test/reference/flights").resolve(name));
            InputReference.OfRaw raw = (InputReference.OfRaw) records.raw("raw", bytes);
            return new EntrySurroundings.TakenRaw(raw.raw(), raw.bytes());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private Hash make(String document) throws ProblemException {
        EntrySurroundings surroundings = new EntrySurroundings(
                new Kinds(List.of(KINDS)), this::find, name -> DetachedRecords.PERSON, this::take);
        Entered entered = EntryDocument.read(document.getBytes(StandardCharsets.UTF_8), surroundings);
        boolean computed = entered.record().parts().containsKey(PartName.CHOICES);
        return computed ? records.compute(entered.record()) : records.record(entered.record());
    }

    @Test
    void allDocumentsBecomeRecords() throws IOException, ProblemException {
        JsonNode documents =
                new ObjectMapper().readTree(Files.readString(Path.of("src/test/reference/lab/documents.json")));
        List<Problem> problems = new ArrayList<>();
        for (JsonNode document : documents) {
            String kind = document.get("kind").asText();
            try {
                Hash hash = make(document.toString());
                if (document.get("corrects") == null && document.get("after") == null) {
                    made.computeIfAbsent(kind, none -> new ArrayList<>()).add(hash);
                }
            } catch (ProblemException e) {
                e.problems().forEach(problem -> problems.add(problem.at(kind + " " + problem.where())));
            }
        }
        assertThat(problems).isEmpty();
        assertThat(made.get("velocity")).hasSizeGreaterThan(6);
        offersFacets();
    }

    private void offersFacets() {
        assertThat(made.get("compound"))
                .allSatisfy(
                        hash -> assertThat(records.facet(hash, MassFacet.class)).isPresent());
        assertThat(made.get("setup"))
                .allSatisfy(hash ->
                        assertThat(records.facet(hash, SetupFacet.class)).isPresent());
        assertThat(made.get("calibration"))
                .allSatisfy(hash ->
                        assertThat(records.facet(hash, CalibrationFacet.class)).isPresent());
        assertThat(made.get("velocity"))
                .allSatisfy(hash ->
                        assertThat(records.facet(hash, Distribution.class)).isPresent());
        assertThat(made.get("monitor-log"))
                .allSatisfy(hash ->
                        assertThat(records.facet(hash, MonitorLog.class)).isPresent());
    }

    @Test
    void aCompoundOfTheDemoLabWeighsWhatItsTruthSays() throws ProblemException {
        Hash fan = make("{\"kind\":\"compound\",\"choices\":{\"method\":\"compound.mass/1\",\"composition\":"
                + "{\"sort\":\"formula\",\"formula\":\"C132H54F136N4O8\"}},\"identity\":{\"names\":[\"demo fan\"]}}");

        MassFacet mass = records.facet(fan, MassFacet.class).orElseThrow();
        // truth.json of the demo lab: 7.319136138021454e-24 kg, from weights of another edition
        assertThat(mass.mean())
                .isCloseTo(7.319136138021454e-24, org.assertj.core.api.Assertions.withinPercentage(0.005));
    }

    @Test
    void badDocumentsAreRefusedWithPointersAndMends() {
        for (String document : List.of(
                "{\"kind\":\"compound\",\"choices\":{\"composition\":{\"sort\":\"formula\",\"formula\":\"Xx\"}}}",
                "{\"kind\":\"batch\",\"content\":{\"label\":\"x\",\"cautions\":[\"smell\"]}}",
                "{\"kind\":\"setup\",\"content\":{\"label\":\"x\",\"gratings\":[],\"separations\":[\"3 kg\"]}}",
                "{\"kind\":\"source-run\",\"content\":{\"settings\":[{\"name\":\"a\",\"quantity\":\"warm\"}]}}",
                "{\"kind\":\"velocity\",\"content\":{\"origin\":\"x\",\"mean\":\"-3 m/s\",\"shape\":\"single\"}}")) {
            ProblemException refused =
                    org.assertj.core.api.Assertions.catchThrowableOfType(ProblemException.class, () -> make(document));
            assertThat(refused).as(document).isNotNull();
            assertThat(refused.problems()).allSatisfy(problem -> {
                assertThat(problem.where()).contains("/");
                assertThat(problem.mend()).isNotBlank();
            });
        }
    }
}
