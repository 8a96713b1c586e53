package fringekeep.archive.making;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.NewRecord;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.NewPayload;
import fringekeep.archive.kind.Role;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.QuantityText;
import fringekeep.archive.record.AboutReference;
import fringekeep.archive.record.After;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.KindName;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.Test;

class DetachedRecordsTest {
    private static final JsonObject LABELLED = JsonObject.EMPTY.with("label", "first");
    private final DetachedRecords records = new DetachedRecords(
            DemoKind.open("setup", List.of(), List.of(Role.anyKind("of", 0, 1))),
            DemoKind.open(
                    "fit",
                    List.of(
                            Role.of("setup", "setup", 1, 1),
                            Role.ofRaw("raw", 0, 1),
                            Role.offering("named", String.class, 0, 1)),
                    List.of()),
            DemoKind.measured("batch"));

    @Test
    void whatIsEnteredCanBeReadBack() throws Exception {
        Hash setup = records.enter("setup", LABELLED);

        assertThat(records.view(setup).content()).isEqualTo(LABELLED);
        assertThat(records.view(setup).part(PartName.MADE).orElseThrow().text("at"))
                .contains("2031-05-14T09:00:00Z");
        assertThat(records.view(setup).part(PartName.WHO).orElseThrow().text("person"))
                .contains(DetachedRecords.PERSON.hex());
        assertThat(records.facet(setup, String.class)).contains("first");
    }

    @Test
    void aSecondRunMakesTheSameFingerprint() throws Exception {
        DetachedRecords again = new DetachedRecords(DemoKind.open("setup", List.of(), List.of()));

        assertThat(again.enter("setup", LABELLED)).isEqualTo(records.enter("setup", LABELLED));
    }

    @Test
    void aComputedRecordHoldsCompleteChoicesAndResult() throws Exception {
        Hash setup = records.enter("setup", LABELLED);
        Hash fit = records.compute(
                "fit", JsonObject.EMPTY.with("number", 3), List.of(DetachedRecords.input("setup", setup)));

        assertThat(records.view(fit).choices().text("method")).contains("demo.square/1");
        assertThat(records.view(fit).result().number("square")).hasValue(9);
        assertThat(records.inputs(fit).role("setup").get(0).facet(String.class)).contains("first");
    }

    @Test
    void noResultIsAProblemAndNotARecord() throws Exception {
        Hash setup = records.enter("setup", LABELLED);

        assertThat(codes(
                        () -> records.compute("fit", JsonObject.EMPTY, List.of(DetachedRecords.input("setup", setup)))))
                .containsExactly("demo.no-number ");
    }

    @Test
    void everyFaultOfTheSchemaIsNamedWithItsPlace() throws Exception {
        JsonObject length = QuantityJson.write(QuantityText.parse("5 mbar"));

        assertThat(codes(() -> records.enter(
                        "batch", JsonObject.EMPTY.with("label", "too long").with("odd", 1))))
                .containsExactlyInAnyOrder(
                        "schema.required /content",
                        "schema.maxLength /content/label",
                        "schema.additionalProperties /content");
        assertThat(codes(() -> records.enter("batch", JsonObject.EMPTY.with("length", length))))
                .containsExactly("quantity.dimension /content/length/unit");
        assertThat(codes(() -> records.enter("batch", JsonObject.EMPTY.with("length", 5))))
                .contains("schema.type /content/length");
    }

    @Test
    void rolesAreChecked() throws Exception {
        Hash setup = records.enter("setup", LABELLED);
        Hash bare = records.enter("setup", JsonObject.EMPTY);
        Hash nowhere = Hash.of(new byte[0]);
        InputReference raw = new InputReference.OfRaw("raw", nowhere, 0);

        assertThat(codes(() -> fit())).containsExactly("record.role-count /inputs");
        assertThat(codes(() -> fit(DetachedRecords.input("scan", setup))))
                .containsExactly("record.role-unknown /inputs/0/role", "record.role-count /inputs");
        assertThat(codes(() -> fit(DetachedRecords.input("setup", nowhere))))
                .containsExactly("record.not-at-hand /inputs/0/record");
        assertThat(codes(() -> record(DetachedRecords.input("setup", setup), raw)))
                .containsExactly("record.raw-not-at-hand /inputs/1");
        assertThat(codes(() -> fit(DetachedRecords.input("setup", setup), DetachedRecords.input("named", bare))))
                .containsExactly("record.role-facet /inputs/1/record");
    }

    private Hash fit(InputReference... inputs) throws ProblemException {
        return records.compute("fit", JsonObject.EMPTY.with("number", 3), List.of(inputs));
    }

    private Hash record(InputReference... inputs) throws ProblemException {
        JsonObject square = JsonObject.EMPTY.with("square", 9);
        return records.record(new NewRecord(
                new KindName("fit"),
                List.of(inputs),
                List.of(),
                Map.of(PartName.CHOICES, square, PartName.RESULT, square),
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty()));
    }

    @Test
    void theKindHasTheLastWord() {
        assertThat(codes(() -> records.enter("setup", JsonObject.EMPTY.with("bad", "x"))))
                .containsExactly("demo.bad /content/bad");
    }

    @Test
    void aCorrectionKeepsTheThing() throws Exception {
        Hash first = records.enter("setup", LABELLED);
        Hash second = succeed(Optional.of(first), Optional.empty());

        assertThat(records.view(second).head().thing())
                .isEqualTo(records.view(first).head().thing());
        assertThat(records.view(second).head().corrects()).contains(first);
    }

    @Test
    void rulesOfSuccessionAreChecked() throws Exception {
        Hash first = records.enter("setup", LABELLED);
        Hash other = records.enter("setup", LABELLED.with("note", 1));
        Instant noon = Instant.parse("2031-05-14T12:00:00Z");
        Hash next = succeed(Optional.empty(), Optional.of(new After(first, noon)));
        Hash batch =
                records.enter("batch", JsonObject.EMPTY.with("length", QuantityJson.write(QuantityText.parse("5 mm"))));

        assertThat(codes(() -> succeed(Optional.of(next), Optional.empty())))
                .containsExactly("record.after-dropped /after");
        assertThat(codes(() -> succeed(Optional.of(next), Optional.of(new After(other, noon)))))
                .containsExactly("record.after-changed /after/record");
        assertThat(codes(() -> succeed(Optional.of(first), Optional.of(new After(first, noon)))))
                .containsExactly("record.after-changed /after/record");
        assertThat(codes(() -> succeed(Optional.empty(), Optional.of(new After(next, noon)))))
                .containsExactly("record.from-too-early /after/from");
        assertThat(codes(() -> succeed(Optional.of(batch), Optional.empty())))
                .containsExactly("record.other-kind /corrects");
        assertThat(succeed(Optional.of(next), Optional.of(new After(first, noon.plusSeconds(1)))))
                .isNotNull();
    }

    private Hash succeed(Optional<Hash> corrects, Optional<After> after) throws ProblemException {
        return records.record(new NewRecord(
                new KindName("setup"),
                List.of(),
                List.of(),
                Map.of(PartName.CONTENT, LABELLED.with("again", 1)),
                List.of(),
                corrects,
                after,
                Optional.empty()));
    }

    @Test
    void partsThatCannotStandTogetherAreRefused() {
        assertThat(codes(() -> parts(Map.of(PartName.CONTENT, JsonObject.EMPTY, PartName.RESULT, JsonObject.EMPTY))))
                .containsExactly("record.content-and-result /content");
        assertThat(codes(() -> parts(Map.of(PartName.CHOICES, JsonObject.EMPTY))))
                .containsExactly("record.half-computed /result");
        assertThat(codes(() -> parts(Map.of(PartName.CONTENT, JsonObject.EMPTY, PartName.WHO, JsonObject.EMPTY))))
                .containsExactly("record.part-given /who");
        assertThat(codes(() -> parts(Map.of(PartName.CONTENT, JsonObject.EMPTY.with("a-b", 1)))))
                .containsExactly("json.name /content/a-b");
    }

    private Hash parts(Map<PartName, JsonObject> parts) throws ProblemException {
        return records.record(new NewRecord(
                new KindName("setup"),
                List.of(),
                List.of(),
                parts,
                List.of(),
                Optional.empty(),
                Optional.empty(),
                Optional.of(DetachedRecords.PERSON)));
    }

    @Test
    void payloadsMustKeepToTheirForm() {
        NewPayload wrong = new NewPayload("table", "csv/1", "a\r\n1\r\n".getBytes(StandardCharsets.UTF_8));
        NewPayload unknown = new NewPayload("other", "text/1", new byte[0]);

        assertThat(codes(() -> records.record(new NewRecord(
                        new KindName("setup"),
                        List.of(),
                        List.of(),
                        Map.of(PartName.CONTENT, JsonObject.EMPTY),
                        List.of(wrong, unknown),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.empty()))))
                .hasSize(2)
                .allMatch(code -> code.contains("/payloads/"));
    }

    @Test
    void whatIsSpokenOfMustBeAtHand() throws Exception {
        Hash setup = records.enter("setup", LABELLED);
        Hash speaking = records.enter("setup", LABELLED, DetachedRecords.about("of", setup));

        assertThat(records.inputs(speaking).about("of").get(0).facet(String.class))
                .contains("first");
        assertThat(codes(() -> records.enter(
                        "setup",
                        LABELLED,
                        new AboutReference("of", Hash.of(new byte[1]), AboutReference.Reach.RECORD))))
                .containsExactly("record.not-at-hand /about/0/record");
    }

    @Test
    void aMissingMethodIsRefused() throws Exception {
        Hash setup = records.enter("setup", LABELLED);
        JsonObject choices =
                JsonObject.EMPTY.with("method", Json.of("demo.cube/1")).with("number", 3);

        assertThat(codes(() -> records.compute("fit", choices, List.of(DetachedRecords.input("setup", setup)))))
                .containsExactly("compute.method-unknown /choices/method");
    }

    private static List<String> codes(ThrowingCallable call) {
        ProblemException[] caught = new ProblemException[1];
        assertThatThrownBy(call).isInstanceOfSatisfying(ProblemException.class, e -> caught[0] = e);
        return caught[0].problems().stream().map(DetachedRecordsTest::told).toList();
    }

    private static String told(Problem problem) {
        return problem.code() + " " + problem.where();
    }
}
