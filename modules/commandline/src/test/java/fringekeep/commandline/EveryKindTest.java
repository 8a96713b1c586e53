package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.networknt.schema.JsonSchema;
import com.networknt.schema.JsonSchemaFactory;
import com.networknt.schema.SpecVersion;
import com.networknt.schema.ValidationMessage;
import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.SchemaResource;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.Head;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What must hold for every announced kind, whichever it is: kept documents of each schema number (reference/documents) are
 * valid, survive writing and reading, and lift to the newest number; records of the invented laboratory keep their bytes; and
 * entry documents of the kind that are damaged at random are recorded whole or refused with what, where and mend.
 */
class EveryKindTest {
    private static final Path KEPT = Path.of("src/test/reference/documents");
    private static final int DAMAGED_A_KIND = 64;
    private static final int EXAMPLES_A_KIND = 4;

    @TempDir
    static Path folder;

    private static Optional<Archive> opened = Optional.empty();

    @BeforeAll
    static void makeTheInventedLaboratory() throws Exception {
        ByteArrayOutputStream data = new ByteArrayOutputStream();
        ByteArrayOutputStream words = new ByteArrayOutputStream();
        Path place = folder.resolve("lab");
        int code = Main.run(
                ComputeReferenceTest.console(data, words),
                "demo",
                "--quiet",
                "--from",
                ReducedLab.SAMPLES.toString(),
                place.toString());
        assertThat(code).as(words.toString(StandardCharsets.UTF_8)).isZero();
        opened = Optional.of(Archives.open(place, Session.kinds(), Circumstances.real(Main.VERSION)));
    }

    @AfterAll
    static void close() {
        opened.ifPresent(Archive::close);
    }

    static Stream<RecordKind> kinds() {
        return Session.kinds().all().stream();
    }

    private static Archive archive() {
        return opened.orElseThrow();
    }

    private static List<Hash> records(RecordKind kind) {
        List<Hash> records = archive().records(kind.kind().text(), 1, 1_000);
        assertThat(records)
                .as("the invented laboratory has a record of kind %s; add one to sample-data", kind.kind())
                .isNotEmpty();
        return records;
    }

    @ParameterizedTest
    @MethodSource("kinds")
    void aDocumentOfEverySchemaNumberSurvivesWritingReadingAndLifting(RecordKind kind) throws Exception {
        for (int number = 1; number <= kind.schema(); number++) {
            Path file = KEPT.resolve(kind.kind() + "-" + number + ".json");
            assertThat(file)
                    .as("schema number %d of kind %s needs a kept document", number, kind.kind())
                    .isRegularFile();
            JsonObject document =
                    (JsonObject) JsonDocument.read(Files.readAllBytes(file)).value();
            assertThat(faults(kind, number, document)).as("%s", file).isEmpty();
            byte[] written = CanonicalJson.write(document);
            assertThat(CanonicalJson.read(written)).as("%s", file).isEqualTo(document);
            assertThat(CanonicalJson.write(CanonicalJson.read(written))).isEqualTo(written);
            assertThat(JsonDocument.read(PrettyJson.write(document)).value()).isEqualTo(document);
            assertThat(faults(kind, kind.schema(), lifted(kind, number, document)))
                    .as("%s lifted to %d", file, kind.schema())
                    .isEmpty();
        }
    }

    private static JsonObject lifted(RecordKind kind, int from, JsonObject document) {
        JsonObject lifted = document;
        for (int number = from; number < kind.schema(); number++) {
            for (Map.Entry<String, Json> part : lifted.members().entrySet()) {
                PartName name = PartName.of(part.getKey()).orElseThrow();
                lifted = lifted.with(part.getKey(), kind.lift(name, number, (JsonObject) part.getValue()));
            }
        }
        return lifted;
    }

    /** What a validator by others says about the parts of a record, by the published schema of a number. */
    private static List<String> faults(RecordKind kind, int number, JsonObject parts) throws IOException {
        String text = new String(PrettyJson.write(kind.jsonSchema(number).without("$id")), StandardCharsets.UTF_8);
        ObjectNode node = (ObjectNode) ReducedLab.MAPPER.readTree(text.replace("common-1.schema.json#", "#"));
        JsonNode common = ReducedLab.MAPPER.readTree(PrettyJson.write(SchemaResource.common()));
        node.withObjectProperty("$defs").setAll((ObjectNode) common.get("$defs"));
        JsonSchema schema =
                JsonSchemaFactory.getInstance(SpecVersion.VersionFlag.V202012).getSchema(node);
        return schema.validate(ReducedLab.MAPPER.readTree(CanonicalJson.write(parts))).stream()
                .map(ValidationMessage::getMessage)
                .toList();
    }

    @ParameterizedTest
    @MethodSource("kinds")
    void theStoredBytesOfEveryRecordAreThoseOfItsMeaning(RecordKind kind) throws Exception {
        for (Hash record : records(kind)) {
            Head head = archive().record(record).orElseThrow().head();
            List<Hash> hashes = new ArrayList<>(head.parts().values());
            hashes.addAll(head.sealed().values());
            hashes.add(record);
            for (Hash hash : hashes) {
                byte[] bytes = archive().stored(hash).orElseThrow();
                assertThat(Hash.of(bytes)).isEqualTo(hash);
                assertThat(CanonicalJson.write(CanonicalJson.read(bytes))).isEqualTo(bytes);
            }
        }
    }

    @Test
    @Timeout(value = 300, unit = TimeUnit.SECONDS, threadMode = Timeout.ThreadMode.SEPARATE_THREAD)
    void damagedDocumentsOfEveryKindAreRecordedWholeOrRefusedWithTheirPlace() throws Exception {
        Map<String, Integer> recorded = new TreeMap<>();
        Map<String, Integer> refused = new TreeMap<>();
        DocumentMutations mutations = new DocumentMutations(20310514);
        PersonId person = archive().persons().get(0).id();
        Entering entering = new Entering(archive(), archive()::find, name -> person, ReducedLab.SAMPLES.resolve("raw"));
        for (RecordKind kind : Session.kinds().all()) {
            List<JsonObject> examples = examples(kind);
            for (int i = 0; i < DAMAGED_A_KIND; i++) {
                byte[] bytes = mutations.of(examples.get(i / DocumentMutations.SORTS % examples.size()), i);
                long before = archive().facts().watermark();
                boolean entered = enter(entering, bytes, person);
                assertThat(archive().facts().watermark()).isEqualTo(before + (entered ? 1 : 0));
                (entered ? recorded : refused).merge(kind.kind().text(), 1, Integer::sum);
            }
        }
        int all = DAMAGED_A_KIND * Session.kinds().all().size();
        assertThat(all).isGreaterThanOrEqualTo(1_000);
        assertThat(refused.keySet()).hasSameSizeAs(Session.kinds().all());
        assertThat(recorded.values().stream().mapToInt(n -> n).sum())
                .as("recorded %s, refused %s", recorded, refused)
                .isBetween(20, all / 2);
        assertThat(archive().check(Work.QUIET).stream().map(Problem::code).distinct())
                .allMatch(code -> code.startsWith("orphan."));
    }

    private static boolean enter(Entering entering, byte[] bytes, PersonId person) throws Exception {
        try {
            Entering.Done done = entering.enter(JsonDocument.read(bytes), Optional.of(person), Work.QUIET);
            assertThat(archive().record(done.recorded().fingerprint())).isPresent();
            return true;
        } catch (ProblemException e) {
            assertThat(e.problems()).isNotEmpty().allSatisfy(problem -> {
                assertThat(problem.what()).isNotBlank();
                assertThat(problem.mend()).isNotBlank();
            });
            return false;
        }
    }

    /** Entry documents that say what some records of the laboratory say, as a script would. */
    private static List<JsonObject> examples(RecordKind kind) {
        List<Hash> records = records(kind);
        List<JsonObject> examples = new ArrayList<>();
        for (int i = 0; i < EXAMPLES_A_KIND; i++) {
            examples.add(example(archive()
                    .record(records.get(i * records.size() / EXAMPLES_A_KIND))
                    .orElseThrow()));
        }
        return examples;
    }

    private static JsonObject example(RecordView record) {
        JsonObject document = JsonObject.EMPTY.with("kind", record.head().kind().text());
        for (PartName name : List.of(PartName.CONTENT, PartName.CHOICES, PartName.IDENTITY, PartName.REMARK)) {
            Optional<JsonObject> part = record.part(name);
            document = part.isPresent() ? document.with(name.text(), part.get()) : document;
        }
        List<Json> inputs = new ArrayList<>();
        for (InputReference input : record.head().inputs()) {
            inputs.add(input(input));
        }
        List<Json> about = new ArrayList<>();
        for (AboutReference one : record.head().about()) {
            about.add(JsonObject.EMPTY
                    .with("role", one.role())
                    .with("record", one.record().hex())
                    .with("reach", one.reach().name().toLowerCase(Locale.ROOT)));
        }
        return document.with("inputs", new JsonArray(inputs)).with("about", new JsonArray(about));
    }

    private static JsonObject input(InputReference input) {
        if (input instanceof InputReference.OfRecord one) {
            JsonObject reference = JsonObject.EMPTY
                    .with("role", one.role())
                    .with("record", one.record().hex());
            return one.channel()
                    .map(channel -> reference.with("channel", channel))
                    .orElse(reference);
        }
        InputReference.OfRaw raw = (InputReference.OfRaw) input;
        return JsonObject.EMPTY.with("role", raw.role()).with("raw", raw.raw().hex());
    }
}
