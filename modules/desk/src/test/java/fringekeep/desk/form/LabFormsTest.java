package fringekeep.desk.form;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.Json;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.KindName;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** Forms of all kinds, filled with what the people of the invented laboratory entered as documents. */
class LabFormsTest {
    private static final ZoneId ZONE = ZoneId.of("CET");

    static FormModel form(String kind) {
        RecordKind found = LabDocuments.KINDS.get(new KindName(kind)).orElseThrow();
        return new FormModel(new FormKind(found), ZONE);
    }

    @TestFactory
    Stream<DynamicTest> aFormMakesTheSameRecordAsTheDocument() {
        List<JsonObject> documents = LabDocuments.all();
        assertThat(documents).hasSizeGreaterThan(60);
        return documents.stream()
                .map(document -> DynamicTest.dynamicTest(
                        document.text("kind").orElseThrow() + " " + documents.indexOf(document),
                        () -> sameRecord(document)));
    }

    private static void sameRecord(JsonObject document) throws ProblemException {
        FormModel form = form(document.text("kind").orElseThrow());
        form.begin(document);

        EntryFilling.Filled filled = form.document();
        assertThat(filled.problems()).isEmpty();
        JsonObject whole =
                filled.document().with("corrects", document.get("corrects")).with("after", document.get("after"));
        assertThat(LabDocuments.entered(whole)).isEqualTo(LabDocuments.entered(document));
        assertThat(form.rows()).isNotEmpty().noneMatch(row -> row.sort() == FormRow.Sort.PROBLEM);
    }

    @TestFactory
    Stream<DynamicTest> whatIsTypedFieldByFieldMakesTheSameRecordToo() {
        return LabDocuments.all().stream()
                .filter(document -> !document.text("kind").orElseThrow().equals("scan"))
                .map(document -> document.text("kind").orElseThrow())
                .distinct()
                .map(kind -> DynamicTest.dynamicTest(kind, () -> typedAnew(LabDocuments.first(kind))));
    }

    /** Takes the texts of the filled form and types each of them into an empty one. */
    private static void typedAnew(JsonObject document) throws ProblemException {
        FormModel filled = form(document.text("kind").orElseThrow());
        filled.begin(document);
        FormModel empty = form(document.text("kind").orElseThrow());
        empty.main(filled.state().main());
        Typing.into(empty, filled.state().typed());

        assertThat(empty.document().problems()).isEmpty();
        assertThat(LabDocuments.entered(empty.document().document())).isEqualTo(LabDocuments.entered(document));
    }

    @Test
    void everyKindThatPeopleEnterHasAFormInWords() {
        TreeSet<String> entered = new TreeSet<>();
        for (RecordKind kind : LabDocuments.KINDS.all()) {
            if (FormWords.of(kind.kind().text()).begun()) {
                entered.add(kind.kind().text());
            }
        }
        assertThat(entered)
                .containsExactly(
                        "batch",
                        "calibration",
                        "compound",
                        "figure",
                        "judgement",
                        "monitor-log",
                        "note",
                        "placement",
                        "quoted",
                        "reading-profile",
                        "selection",
                        "series",
                        "setup",
                        "source-run",
                        "statement",
                        "velocity");
    }

    @TestFactory
    Stream<DynamicTest> theTableOfWordsNamesOnlyWhatTheSchemaHas() {
        return LabDocuments.KINDS.all().stream()
                .filter(kind -> FormWords.of(kind.kind().text()).entered())
                .map(kind -> DynamicTest.dynamicTest(kind.kind().text(), () -> namesAreKnown(new FormKind(kind))));
    }

    private static void namesAreKnown(FormKind kind) {
        for (String key : kind.words().keys()) {
            if (key.endsWith(".order")
                    || key.endsWith(".shown")
                    || key.endsWith(".summary")
                    || key.contains(".case.")) {
                String place = key.replaceAll("\\.(order|shown|summary|case\\..*)$", "");
                Asked asked = kind.at("/" + place.replace('.', '/')).orElseThrow(() -> new AssertionError(key));
                Asked group = asked instanceof Asked.Rows rows ? rows.item() : asked;
                kind.words()
                        .list(key)
                        .forEach(name -> assertThat(((Asked.Group) group).member(name))
                                .as(key + ": " + name)
                                .isPresent());
            } else if (key.startsWith("content.") || key.startsWith("choices.") || key.startsWith("identity.")) {
                String place =
                        key.replaceAll("\\.(label|item|begin|by|hidden|head|named|add|brief|hint|code\\..*)$", "");
                assertThat(kind.at("/" + place.replace('.', '/'))).as(key).isPresent();
            }
        }
    }

    @Test
    void aNewFormAsksFirstWhatMustBeSaid() {
        FormModel form = form("quoted");

        assertThat(form.rows().stream()
                        .filter(row -> row.sort() == FormRow.Sort.FIELD)
                        .map(FormRow::label))
                .containsExactly("compound", "what", "of", "value", "found how", "conditions", "stands where", "words");
        assertThat(form.document().document().get("content")).isEqualTo(Optional.<Json>of(JsonObject.EMPTY));
    }
}
