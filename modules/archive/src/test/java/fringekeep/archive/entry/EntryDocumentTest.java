package fringekeep.archive.entry;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.json.CanonicalJson;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.json.PrettyJson;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.Role;
import fringekeep.archive.making.DemoKind;
import fringekeep.archive.making.DetachedRecords;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Random;
import org.junit.jupiter.api.Test;

class EntryDocumentTest {
    private static final Hash BATCH = Hash.of(new byte[] {1});
    private static final Hash SCAN = Hash.of(new byte[] {2});
    private static final Hash RAW = Hash.of(new byte[] {3});
    private static final PersonId PERSON = DetachedRecords.PERSON;
    private static final DemoKind BATCHES = DemoKind.measured("batch");
    private static final DemoKind NOTES =
            DemoKind.open("note", List.of(Role.anyKind("scan", 0, 9)), List.of(Role.anyKind("of", 0, 9)));
    private static final EntrySurroundings SURROUNDINGS = new EntrySurroundings(
            new Kinds(List.of(BATCHES, NOTES)),
            EntryDocumentTest::find,
            EntryDocumentTest::person,
            path -> new EntrySurroundings.TakenRaw(RAW, path.length()));

    private static Hash find(String reference) throws ProblemException {
        return switch (reference) {
            case "batch 1" -> BATCH;
            case "scan 12" -> SCAN;
            default -> throw new ProblemException(new Problem("find.nothing", "No " + reference + ".", "", "Look."));
        };
    }

    private static PersonId person(String name) throws ProblemException {
        if (name.equals("A. Demo")) {
            return PERSON;
        }
        throw new ProblemException(new Problem("person.unknown", "Nobody is called " + name + ".", "", "Add them."));
    }

    private static Entered read(String text) throws ProblemException {
        return EntryDocument.read(text.getBytes(StandardCharsets.UTF_8), SURROUNDINGS);
    }

    private static JsonObject part(Entered entered, PartName name) {
        return Objects.requireNonNull(entered.record().parts().get(name));
    }

    private static List<String> problems(String text) {
        List<String> found = new ArrayList<>();
        assertThatThrownBy(() -> read(text))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> e.problems().forEach(problem -> found.add(problem.code() + " " + problem.where())));
        return found;
    }

    @Test
    void aWholeDocumentBecomesANewRecord() throws Exception {
        Entered entered = read("""
                {
                  "kind": "batch",
                  "content": {"length": "10,50(5) mm", "label": "A"},
                  "remark": "two\\r\\nlines, e\\u0301",
                  "person": "A. Demo",
                  "about": [{"role": "compound", "record": "batch 1"}, {"role": "x", "record": "batch 1", "reach": "record"}],
                  "inputs": [{"role": "scan", "record": "scan 12", "channel": "counts"}, {"role": "raw", "raw": "a.csv"}],
                  "corrects": "batch 1",
                  "after": {"record": "batch 1", "from": "2031-05-14T11:00:00+02:00"}
                }
                """);

        assertThat(entered.questions()).isEmpty();
        assertThat(part(entered, PartName.CONTENT).object("length"))
                .contains(QuantityJson.write(QuantityText.parse("10.50(5) mm")));
        assertThat(part(entered, PartName.REMARK).text("text")).contains("two\nlines, \u00e9");
        assertThat(entered.record().person()).contains(PERSON);
        assertThat(entered.record().about())
                .containsExactly(
                        new AboutReference("compound", BATCH, AboutReference.Reach.THING),
                        new AboutReference("x", BATCH, AboutReference.Reach.RECORD));
        assertThat(entered.record().inputs())
                .containsExactly(
                        new InputReference.OfRecord("scan", SCAN, java.util.Optional.of("counts")),
                        new InputReference.OfRaw("raw", RAW, 5));
        assertThat(entered.record().corrects()).contains(BATCH);
        assertThat(entered.record().after().orElseThrow().from()).isEqualTo(Instant.parse("2031-05-14T09:00:00Z"));
    }

    @Test
    void everyFaultIsNamedWithPointerLineAndColumn() {
        assertThat(problems("""
                        {"kind": "batch",
                         "content": {"length": "10 furlong"},
                         "person": "B. Demo",
                         "odd": 1,
                         "about": [{"role": "of", "record": "batch 9"}, {"record": "batch 1"}],
                         "inputs": [{"role": "scan"}],
                         "corrects": 5,
                         "after": {"record": "batch 1", "from": "yesterday"}}
                        """))
                .containsExactlyInAnyOrder(
                        "quantity.unit /content/length, line 2, column 24",
                        "person.unknown /person, line 3, column 12",
                        "entry.unknown-member /odd, line 4, column 9",
                        "find.nothing /about/0/record, line 5, column 37",
                        "entry.missing /about/1, line 5, column 49",
                        "entry.input /inputs/0, line 6, column 13",
                        "entry.reference /corrects, line 7, column 14",
                        "entry.instant /after/from, line 8, column 41");
    }

    @Test
    void documentsThatAreNoneAreRefused() {
        assertThat(problems("[]")).hasSize(1);
        assertThat(problems("{\"kind\": \"batch\", \"kind\": \"note\"}"))
                .containsExactly("json.duplicate-name line 1, column 19");
        assertThat(problems("{\"kind\": 1e999}")).hasSize(1).first().asString().startsWith("json.number-too-large");
        assertThat(problems("{\"kind\": null}")).first().asString().startsWith("json.null");
        assertThat(problems("{\"kind\": \"nothing\"}")).first().asString().startsWith("entry.kind");
        assertThat(problems("{}")).first().asString().startsWith("entry.kind");
        assertThat(problems("{\"kind\": \"note\", \"content\": " + "[".repeat(40) + "]".repeat(40) + "}"))
                .first()
                .asString()
                .startsWith("json.too-deep");
    }

    @Test
    void aNumberWithoutUnitIsAskedBack() {
        assertThat(problems("{\"kind\": \"batch\", \"content\": {\"length\": 5}}"))
                .containsExactly("entry.bare-number /content/length, line 1, column 41");
        assertThat(problems("{\"kind\": \"batch\", \"content\": {\"length\": \"5 mbar\"}}"))
                .containsExactly("quantity.dimension /content/length/unit, line 1, column 41");
    }

    @Test
    void anUnusualValueIsAQuestionAndNoRefusal() throws Exception {
        Entered entered = read("{\"kind\": \"batch\", \"content\": {\"length\": \"50 km\"}}");

        assertThat(entered.questions()).hasSize(1);
        assertThat(entered.questions().get(0).what()).contains("50 km");
    }

    @Test
    void aMaskSpeaksOfTheVeryRecord() throws Exception {
        Entered mask = read(
                "{\"kind\":\"note\",\"content\":{\"verdict\":\"masked\"},\"about\":[{\"role\":\"target\",\"record\":\"scan 12\"}]}");
        Entered withdrawn = read(
                "{\"kind\":\"note\",\"content\":{\"verdict\":\"withdrawn\"},\"about\":[{\"role\":\"target\",\"record\":\"scan 12\"}]}");

        assertThat(mask.record().about().get(0).reach()).isEqualTo(AboutReference.Reach.RECORD);
        assertThat(withdrawn.record().about().get(0).reach()).isEqualTo(AboutReference.Reach.THING);
    }

    @Test
    void aCorrectionBeginsWithWhatStands() throws Exception {
        DetachedRecords records = new DetachedRecords(BATCHES, NOTES);
        JsonObject content = JsonObject.EMPTY
                .with("label", "A")
                .with("length", QuantityJson.write(QuantityText.parse("10.50(5) mm")));
        Hash batch = records.enter("batch", content);
        JsonObject document = new EntryWriting(hash -> "batch 1").correction(records.view(batch), BATCHES);

        assertThat(document.object("content").orElseThrow().text("length")).contains("10.50 ± 0.05 mm");
        assertThat(document.text("corrects")).contains("batch 1");
        Entered entered = read(new String(PrettyJson.write(document), StandardCharsets.UTF_8));
        assertThat(entered.record().parts().get(PartName.CONTENT)).isEqualTo(content);
    }

    /** Spoiled documents: cut off, bits turned, pieces doubled; each is read or refused with problems, never anything else. */
    @Test
    void aThousandSpoiledDocumentsAreReadOrRefused() {
        JsonObject whole = JsonObject.EMPTY
                .with("kind", "batch")
                .with("content", JsonObject.EMPTY.with("length", "10,50(5) mm").with("label", "A"))
                .with("about", JsonArray.of(JsonObject.EMPTY.with("role", "of").with("record", "batch 1")))
                .with(
                        "inputs",
                        JsonArray.of(JsonObject.EMPTY.with("role", "raw").with("raw", "a.csv")))
                .with("numbers", JsonArray.of(Json.of(1e300), Json.of(-5)))
                .with("person", "A. Demo");
        byte[] bytes = CanonicalJson.write(whole);
        Random random = new Random(1);
        int refused = 0;
        for (int i = 0; i < 1_000; i++) {
            byte[] spoiled = spoil(bytes, random);
            try {
                assertThat(EntryDocument.read(spoiled, SURROUNDINGS).record()).isNotNull();
            } catch (ProblemException e) {
                assertThat(e.problems()).isNotEmpty();
                refused++;
            }
        }
        assertThat(refused).isGreaterThan(900);
    }

    private static byte[] spoil(byte[] bytes, Random random) {
        int at = random.nextInt(bytes.length);
        return switch (random.nextInt(4)) {
            case 0 -> java.util.Arrays.copyOf(bytes, at);
            case 1 -> {
                byte[] copy = bytes.clone();
                copy[at] ^= (byte) (1 << random.nextInt(8));
                yield copy;
            }
            case 2 -> {
                byte[] copy = bytes.clone();
                System.arraycopy(bytes, random.nextInt(at + 1), copy, at, Math.min(5, bytes.length - at));
                yield copy;
            }
            default ->
                (new String(bytes, 0, at, StandardCharsets.UTF_8)
                                + "[".repeat(random.nextInt(100_000))
                                + "9".repeat(random.nextInt(2_000))
                                + new String(bytes, at, bytes.length - at, StandardCharsets.UTF_8))
                        .getBytes(StandardCharsets.UTF_8);
        };
    }
}
