package fringekeep.sample;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.PartName;
import java.io.IOException;
import java.util.List;
import java.util.ResourceBundle;
import org.junit.jupiter.api.Test;

class BatchKindTest {
    private final BatchKind kind = new BatchKind();

    private List<Problem> examine(String content) {
        return kind.examine(Records.parts(PartName.CONTENT, Records.json(content)), Records.NO_INPUTS);
    }

    @Test
    void acceptsTheGoldenRecord() throws IOException {
        JsonObject content = Records.golden("batch-content");

        assertThat(new PublishedSchema(BatchKind.class, "batch-1.schema.json")
                        .faults(JsonObject.EMPTY.with("content", content)))
                .isEmpty();
        assertThat(kind.examine(Records.parts(PartName.CONTENT, content), Records.NO_INPUTS))
                .isEmpty();
    }

    @Test
    void mayContinueAndIsAboutCompounds() {
        assertThat(kind.mayContinue()).isTrue();
        assertThat(kind.aboutRoles())
                .singleElement()
                .satisfies(role -> assertThat(role.least()).isEqualTo(1));
    }

    @Test
    void showsTheUsualCautionAndDefersToLocalRules() throws IOException {
        RecordView record = Records.record("batch", Records.parts(PartName.CONTENT, Records.golden("batch-content")));

        assertThat(kind.tables(record, Records.NO_INPUTS))
                .singleElement()
                .satisfies(table -> assertThat(
                                table.rows().get(0).get(1).orElseThrow().toString())
                        .contains("airborne")
                        .contains("Local rules"));
        assertThat(kind.rows(kind.projections().get(0), record, Records.NO_INPUTS)
                        .findFirst()
                        .orElseThrow()
                        .values())
                .containsEntry("label", "DC-1")
                .containsEntry("cautions", "Nanoparticle or fine dust");
    }

    @Test
    void refusesUnknownHazardsAndAmountsThatAreNone() {
        assertThat(examine("""
                {"label":" ","cautions":["dust","dust","smell","oven"],
                "amount":{"si":1,"text":"1","unit":"s","uncertainty":{"sort":"exact"}},
                "purity":{"si":1.5,"text":"1.5","unit":"1","uncertainty":{"sort":"exact"}}}"""))
                .extracting(Problem::where)
                .containsExactlyInAnyOrder(
                        "/content/label",
                        "/content/cautions/1",
                        "/content/cautions/2",
                        "/content/cautions/3",
                        "/content/amount",
                        "/content/purity");
    }

    @Test
    void everyCautionHasWordsAndStandsInASchema() {
        for (Caution caution : Caution.values()) {
            assertThat(caution.title()).isNotBlank();
            assertThat(caution.advice()).isNotBlank();
            assertThat(Caution.of(caution.code())).contains(caution);
        }
        assertThat(Caution.localRules()).isNotBlank();
        List<String> listed = kind.jsonSchema(1)
                .object("properties")
                .orElseThrow()
                .object("content")
                .orElseThrow()
                .object("properties")
                .orElseThrow()
                .object("cautions")
                .orElseThrow()
                .object("items")
                .orElseThrow()
                .array("enum")
                .texts();
        assertThat(listed)
                .containsExactlyElementsOf(
                        BatchRules.CAUTIONS.stream().map(Caution::code).toList());
    }

    @Test
    void everyProblemHasBothTexts() {
        ResourceBundle words = ResourceBundle.getBundle("fringekeep.sample.Problems", java.util.Locale.ROOT);
        assertThat(words.keySet()).allSatisfy(key -> {
            String code = key.substring(0, key.lastIndexOf('.'));
            assertThat(words.getString(code + ".what")).isNotBlank();
            assertThat(words.getString(code + ".mend")).contains("Nothing was stored.");
        });
    }
}
