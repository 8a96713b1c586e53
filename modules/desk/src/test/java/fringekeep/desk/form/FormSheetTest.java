package fringekeep.desk.form;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.Archive;
import fringekeep.archive.Archives;
import fringekeep.archive.Circumstances;
import fringekeep.archive.Person;
import fringekeep.archive.graph.StateName;
import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonArray;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import fringekeep.archive.record.InputReference;
import fringekeep.archive.record.PartName;
import fringekeep.archive.record.PersonId;
import fringekeep.desk.form.FormState.Way;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Forms over a real archive: what is typed is recorded, kept, corrected, continued, questioned. */
class FormSheetTest {
    private static final JsonObject NOTHING = JsonObject.EMPTY;

    @TempDir
    static Path folder;

    private static Archive archive;

    private BenchHand hand;

    @BeforeAll
    static void found() throws ProblemException {
        Circumstances real = Circumstances.real("test");
        Circumstances utc = new Circumstances(real.clock(), real.random(), ZoneOffset.UTC, "test");
        Person person = new Person(
                new PersonId("00112233445566778899aabbccddeeff"),
                Optional.of("M. Oduya"),
                Optional.empty(),
                Optional.empty());
        archive = Archives.found(
                folder.resolve("lab"),
                new Archives.Founding("bench", "06:00", "CET", true, List.of(person), Optional.empty()),
                LabDocuments.KINDS,
                utc);
    }

    @AfterAll
    static void close() {
        archive.close();
    }

    @BeforeEach
    void sitDown() throws ProblemException {
        for (String draft : archive.drafts().all().keySet()) {
            archive.drafts().remove(draft);
        }
        hand = new BenchHand(archive);
    }

    private RecordView recorded() {
        return archive.record(hand.opened.get(hand.opened.size() - 1)).orElseThrow();
    }

    /** Fills a form with a document of the invented laboratory, ticks the cautions and records. */
    private Hash enter(String kind) {
        Forms.open(hand, kind, LabDocuments.first(kind));
        return record();
    }

    private Hash record() {
        FormSheet form = hand.form();
        form.check();
        if (form.pane().caution().unread()) {
            form.pane().caution().tick(true);
            form.readCautions();
        }
        form.record();
        assertThat(hand.sheet).as(form.model().found().toString()).isEmpty();
        return hand.opened.get(hand.opened.size() - 1);
    }

    @Test
    void whatIsTypedIsRecordedAsTheDocumentWouldBe() throws ProblemException {
        enter("compound");
        enter("batch");
        enter("setup");

        JsonObject content = recorded().content();
        assertThat(content)
                .isEqualTo(LabDocuments.entered(LabDocuments.first("setup"))
                        .parts()
                        .get(PartName.CONTENT));
        assertThat(hand.said)
                .hasSize(3)
                .allMatch(words -> words.matches("recorded: (compound|batch|setup) 00[0-9]{2}"));
        assertThat(recorded().head().sealed()).containsKey("who");
    }

    @Test
    void aNewFormSaysOnlyAtRecordingWhatIsMissingAndRecordsNothing() {
        Map<String, Long> before = archive.counts();
        Forms.open(hand, "quoted", NOTHING);
        FormSheet form = hand.form();
        form.check();
        assertThat(form.table().rows()).noneMatch(row -> row.sort() == FormRow.Sort.PROBLEM);

        form.record();

        assertThat(hand.opened).isEmpty();
        assertThat(archive.counts()).isEqualTo(before);
        assertThat(form.table().rows().stream()
                        .filter(row -> row.sort() == FormRow.Sort.PROBLEM)
                        .map(FormRow::words))
                .contains("what must be filled in.", "value must be filled in.");
        assertThat(form.table().row().orElseThrow().pointer()).startsWith("/content/");
    }

    @Test
    void aWrongUnitIsSaidAtItsFieldInTheWordsOfTheHeadlessProgram() {
        Forms.open(hand, "setup", LabDocuments.first("setup"));
        FormSheet form = hand.form();
        form.model().type("/content/separations/0", "10,50(5) kg");
        form.table().refresh();

        FormRow problem = form.table().rows().stream()
                .filter(row -> row.sort() == FormRow.Sort.PROBLEM)
                .findFirst()
                .orElseThrow();
        assertThat(problem.pointer()).isEqualTo("/content/separations/0");
        assertThat(problem.words()).contains("The unit kg is not one for this quantity, which is measured in m.");
        form.record();
        assertThat(hand.opened).isEmpty();
    }

    @Test
    void siAndChangeStandBesideWhatIsTyped() {
        Forms.correct(hand, enter("setup"));
        FormSheet form = hand.form();
        form.model().type("/content/separations/0", "10,50(5) mm");
        form.table().refresh();

        FormRow row = row(form, "/content/separations/0");
        assertThat(row.si()).isEqualTo("10.500(50) × 10⁻³");
        assertThat(row.siUnit()).isEqualTo("m");
        assertThat(row.before()).isEqualTo("150.0(1) mm");
        assertThat(row.change()).isEqualTo("−139.5 mm");
        assertThat(row.changed()).isTrue();
    }

    private static FormRow row(FormSheet form, String pointer) {
        return form.table().rows().stream()
                .filter(row -> row.pointer().equals(pointer) && row.sort() == FormRow.Sort.FIELD)
                .findFirst()
                .orElseThrow();
    }

    @Test
    void aValueFarFromEarlierOnesIsQuestionedAndCanBeMeant() {
        Forms.correct(hand, enter("setup"));
        FormSheet form = hand.form();
        form.model().type("/content/separations/0", "15,00(1) mm");
        form.table().refresh();

        FormRow question = question(form).orElseThrow();
        assertThat(question.words()).isEqualTo("15.00(1) mm? The record before had 150 mm.");
        assertThat(question.answers()).containsExactly("15.00(1) mm is meant", "make it 150.0(1) mm");

        form.model().mean("/content/separations/0");
        form.table().refresh();
        assertThat(question(form)).isEmpty();
        assertThat(recorded(record(), "separations")).isEqualTo("15.00");
    }

    @Test
    void theOtherAnswerTakesTheDecimalSignBack() {
        Forms.correct(hand, enter("setup"));
        FormSheet form = hand.form();
        form.model().type("/content/separations/0", "1500(1) mm");
        form.table().refresh();
        form.table().nextChange();
        while (form.table().row().orElseThrow().sort() != FormRow.Sort.QUESTION) {
            form.table().nextChange();
        }
        form.table().answer(1);

        assertThat(form.model().text("/content/separations/0")).isEqualTo("150.0(1) mm");
        assertThat(question(form)).isEmpty();
    }

    private static Optional<FormRow> question(FormSheet form) {
        return form.table().rows().stream()
                .filter(row -> row.sort() == FormRow.Sort.QUESTION)
                .findFirst();
    }

    private String recorded(Hash record, String list) {
        JsonArray items = archive.record(record).orElseThrow().content().array(list);
        return items.objects().get(0).text("text").orElseThrow();
    }

    @Test
    void cautionsMustBeReadAndAreRecordedWithThePerson() {
        JsonObject document = LabDocuments.first("setup");
        JsonObject content = document.object("content").orElseThrow().without("acknowledged");
        Forms.open(hand, "setup", document.with("content", content));
        FormSheet form = hand.form();
        form.check();

        assertThat(form.pane().caution().getAccessibleContext().getAccessibleName())
                .contains("Laser of class 4")
                .containsIgnoringCase("local rules");
        form.record();
        assertThat(hand.opened).isEmpty();

        Hash setup = record();
        assertThat(archive.record(setup).orElseThrow().content().flag("acknowledged"))
                .contains(true);
        Forms.correct(hand, setup);
        assertThat(hand.form().pane().caution().unread()).isTrue();
    }

    @Test
    void correctingAndComingAfterAreTwoWaysToANewerRecord() throws ProblemException {
        Hash first = enter("setup");
        Forms.correct(hand, first);
        hand.form().model().type("/content/separations/0", "151.0(1) mm");
        Hash corrected = record();

        assertThat(archive.record(corrected).orElseThrow().head().corrects()).contains(first);
        assertThat(archive.graph().states(first)).contains(StateName.CORRECTED);

        Forms.comeAfter(hand, corrected);
        FormSheet form = hand.form();
        assertThat(form.model().state().way()).isEqualTo(Way.AFTER);
        form.model().type("/from", "2031-11-02 09:00");
        form.model().type("/content/separations/0", "152.0(1) mm");
        Hash after = record();

        assertThat(archive.record(after)
                        .orElseThrow()
                        .head()
                        .after()
                        .orElseThrow()
                        .from())
                .isEqualTo(Instant.parse("2031-11-02T08:00:00Z"));
        assertThat(archive.label(after)).startsWith("setup 00").contains("from 2031-11-02");
        Forms.correct(hand, after);
        assertThat(hand.form()
                        .model()
                        .document()
                        .document()
                        .object("after")
                        .orElseThrow()
                        .text("from"))
                .contains("2031-11-02T08:00:00Z");
    }

    @Test
    void aContinuationWithoutAnInstantIsRefusedAtItsField() {
        Forms.comeAfter(hand, enter("setup"));
        hand.form().model().type("/from", "yesterday");
        hand.form().check();
        hand.form().pane().caution().tick(true);
        hand.form().readCautions();
        hand.form().record();

        assertThat(hand.form().model().found())
                .anyMatch(problem -> problem.where().equals("/from"));
    }

    @Test
    void whatWouldBecomeOutdatedIsSaidBefore() throws Exception {
        enter("compound");
        Hash quoted = enter("quoted");
        Forms.open(
                hand,
                "statement",
                JsonObject.EMPTY
                        .with("content", LabDocuments.first("statement").object("content"))
                        .with("inputs", JsonArray.of(NOTHING.with("role", "of").with("record", quoted.hex()))));
        hand.form().model().type("/content/pointer", "/quantity");
        hand.form().model().type("/content/printed", "431(22)");
        record();
        Effects effects = new Effects(archive, archive.graph(), fringekeep.archive.problem.Work.QUIET);

        assertThat(effects.said(quoted, Way.CORRECTS, Optional.empty()).outdates())
                .isEqualTo("1 statement will be outdated.");
        assertThat(effects.said(hand.opened.get(2), Way.CORRECTS, Optional.empty())
                        .outdates())
                .isEqualTo("Nothing becomes outdated.");
    }

    @Test
    void draftsAreKeptAndGoOnAfterACrash() throws ProblemException {
        Hash setup = enter("setup");
        Forms.correct(hand, setup);
        hand.form().model().type("/content/label", "short bench, mended");
        hand.form().left();
        assertThat(archive.drafts().all()).hasSize(1);

        archive.close();
        archive = Archives.open(folder.resolve("lab"), LabDocuments.KINDS, Circumstances.real("test"));
        hand = new BenchHand(archive);
        new FormStage().opened(hand);
        assertThat(hand.said.get(0)).startsWith("kept: setup 00");

        List<FormReading.Kept> kept = new FormReading(archive, hand.register()).drafts(Optional.of("setup"));
        Forms.resume(hand, kept.get(0));
        assertThat(hand.form().model().text("/content/label")).isEqualTo("short bench, mended");
        assertThat(hand.form().model().state().way()).isEqualTo(Way.CORRECTS);
        Hash corrected = record();

        assertThat(archive.record(corrected).orElseThrow().content().text("label"))
                .contains("short bench, mended");
        assertThat(archive.drafts().all()).isEmpty();
    }

    @Test
    void aDiscardedDraftIsGone() throws ProblemException {
        Forms.open(hand, "series", NOTHING);
        hand.form().model().type("/content/label", "a");
        FormSheet form = hand.form();
        form.left();
        assertThat(archive.drafts().all()).hasSize(1);
        form.discard();

        assertThat(archive.drafts().all()).isEmpty();
    }

    @Test
    void undoTakesBackFieldByField() {
        Forms.open(hand, "series", NOTHING);
        FormModel model = hand.form().model();
        for (String text : List.of("p", "po", "pow", "power")) {
            model.type("/content/label", text);
        }
        model.settle();
        model.type("/content/varied", "laser power");
        model.settle();
        hand.form().undo();
        assertThat(model.text("/content/varied")).isEmpty();
        assertThat(model.text("/content/label")).isEqualTo("power");
        hand.form().undo();
        assertThat(model.text("/content/label")).isEmpty();
        hand.form().redo();
        hand.form().redo();
        assertThat(model.text("/content/varied")).isEqualTo("laser power");
    }

    @Test
    void oneJudgementOfAllThatIsSelected() throws ProblemException {
        enter("compound");
        Hash first = enter("quoted");
        Hash second = enter("quoted");
        hand.select("quoted", first, second);
        action("form.judge");
        FormSheet form = hand.form();
        form.model().type("/content/verdict", "withdrawn");
        form.model().type("/content/reason", "other");
        form.model().type("/remark/text", "Read from the wrong column.");
        Hash judgement = record();

        assertThat(archive.record(judgement).orElseThrow().head().about())
                .hasSize(2)
                .allMatch(about -> about.role().equals("target"));
        assertThat(archive.graph().states(first)).contains(StateName.WITHDRAWN);
        assertThat(archive.graph().states(second)).contains(StateName.WITHDRAWN);

        hand.select("quoted", first);
        action("form.judge");
        hand.form().model().type("/content/verdict", "restored");
        hand.form().model().type("/content/reason", "judged-in-error");
        record();
        assertThat(archive.graph().states(second)).doesNotContain(StateName.WITHDRAWN);
    }

    private void action(String id) {
        new FormStage()
                .actions().stream()
                        .filter(action -> action.id().equals(id))
                        .findFirst()
                        .orElseThrow()
                        .work()
                        .accept(hand);
    }

    @Test
    void theReasonsOfferedGoWithTheVerdict() {
        Forms.open(hand, "judgement", NOTHING);
        FormSheet form = hand.form();
        form.model().type("/content/verdict", "doubted");
        form.table().refresh();

        assertThat(row(form, "/content/reason").leaf().orElseThrow().options())
                .contains("few-counts")
                .doesNotContain("truncated");
        assertThat(form.table().rows()).noneMatch(row -> row.pointer().equals("/content/points"));
    }

    @Test
    void aNoteTakesFilesWithIt() throws IOException, ProblemException {
        Path sheet = Files.writeString(folder.resolve("local rules.txt"), "goggles", StandardCharsets.UTF_8);
        hand.select("compound", enter("compound"));
        action("form.note");
        FormSheet form = hand.form();
        form.model().type("/content/heading", "local rules");
        hand.files = List.of(sheet);
        form.table().refresh();
        assertThat(form.table().go("/inputs/+attachment/raw")).isTrue();
        form.table().ask();
        RecordView note = archive.record(record()).orElseThrow();

        assertThat(note.head().inputs()).hasSize(1).allMatch(InputReference.OfRaw.class::isInstance);
        assertThat(note.content().array("attachments").objects().get(0).text("name"))
                .contains("local rules.txt");
        assertThat(note.head().about().get(0).role()).isEqualTo("subject");
    }

    @Test
    void othersAreNamedByLabelAndKnownByTheirWords() {
        enter("compound");
        Forms.open(hand, "batch", NOTHING);
        FormSheet form = hand.form();
        form.model().type("/about/+compound/record", "compound 1");
        form.check();

        assertThat(row(form, "/about/0/record").si()).isEqualTo("demo fan");
        form.table().go("/about/+compound/record");
        form.table().ask();
        assertThat(form.table().choices().shown()).contains(new ChoiceList.Option("compound 0001", "demo fan"));
        form.model().type("/about/0/record", "compound 7000");
        form.check();
        assertThat(form.model().found()).anyMatch(problem -> problem.where().equals("/about/0/record"));
    }

    @Test
    void aVariantSwapsWhatIsAskedAndKeepsWhatWasTyped() {
        Forms.open(hand, "setup", LabDocuments.first("setup"));
        FormModel model = hand.form().model();
        model.type("/content/gratings/0/sort", "standing-wave");
        JsonObject light = grating(model);
        assertThat(light.get("openFraction")).isEmpty();

        model.type("/content/gratings/0/sort", "material");
        assertThat(grating(model).get("openFraction")).contains(Json.of("0.420(5)"));
    }

    private static JsonObject grating(FormModel model) {
        return model.document()
                .document()
                .object("content")
                .orElseThrow()
                .array("gratings")
                .objects()
                .get(0);
    }
}
