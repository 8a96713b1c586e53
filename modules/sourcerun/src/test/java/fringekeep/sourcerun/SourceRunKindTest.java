package fringekeep.sourcerun;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.facet.TimeSpan;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.PartName;
import fringekeep.instrument.CautionRules;
import fringekeep.sample.Caution;
import java.io.IOException;
import java.time.Instant;
import java.util.List;
import java.util.ResourceBundle;
import java.util.ServiceLoader;
import org.junit.jupiter.api.Test;

class SourceRunKindTest {
    static final String RUN = """
            {"label":"fan, day 1","source":"effusive","cautions":["oven","vacuum"],"acknowledged":true,
            "settings":[{"name":"oven temperature","quantity":{"si":742,"text":"742","unit":"K",
            "uncertainty":{"sort":"stated","si":5,"text":"5"}}},
            {"name":"gas pressure","quantity":{"si":200000,"text":"2","unit":"bar","uncertainty":{"sort":"unstated"}}}],
            "words":[{"name":"crucible","text":"new"}],
            "started":{"at":"2031-10-14T16:50:00Z","offset":"+02:00","zone":"Etc/GMT-2"},
            "ended":{"at":"2031-10-14T23:38:53Z","offset":"+02:00"}}""";
    private final SourceRunKind kind = new SourceRunKind();

    private static RecordView run(JsonObject content) {
        return Records.record("source-run", Records.parts(PartName.CONTENT, content));
    }

    private List<Problem> examine(String content) {
        return kind.examine(Records.parts(PartName.CONTENT, Records.json(content)), Records.NO_INPUTS);
    }

    @Test
    void isAnnounced() {
        assertThat(ServiceLoader.load(RecordKind.class).stream().map(ServiceLoader.Provider::type))
                .map(Class::getSimpleName)
                .contains("SourceRunKind", "VelocityKind");
    }

    @Test
    void acceptsTheGoldenRecordAndAFullOne() throws IOException {
        PublishedSchema schema = new PublishedSchema(SourceRunKind.class, "source-run-1.schema.json");
        for (JsonObject content : List.of(Records.golden("source-run-content"), Records.json(RUN))) {
            assertThat(schema.faults(JsonObject.EMPTY.with("content", content))).isEmpty();
            assertThat(kind.examine(Records.parts(PartName.CONTENT, content), Records.NO_INPUTS))
                    .isEmpty();
        }
    }

    @Test
    void offersSettingsAndTime() {
        SourceRunFacet run = kind.facet(SourceRunFacet.class, run(Records.json(RUN)), Records.NO_INPUTS)
                .orElseThrow();

        assertThat(run.setting("oven temperature").orElseThrow().value().deviation())
                .hasValue(5);
        assertThat(run.setting("gas pressure").orElseThrow().unit()).isEqualTo("m-1.kg.s-2");
        TimeSpan time = kind.facet(TimeSpan.class, run(Records.json(RUN)), Records.NO_INPUTS)
                .orElseThrow();
        assertThat(time.start().at()).isEqualTo(Instant.parse("2031-10-14T16:50:00Z"));
    }

    @Test
    void listsSettingsAsTypedAndTheTemperatureInSi() throws IOException {
        RecordView golden = run(Records.golden("source-run-content"));

        assertThat(kind.rows(kind.projections().get(0), golden, Records.NO_INPUTS)
                        .findFirst()
                        .orElseThrow()
                        .values())
                .containsEntry("settings", "oven temperature 900 K")
                .containsEntry("temperature_k", 900.0)
                .containsEntry("temperature_u_k", 5.0);
        assertThat(kind.title(golden, Records.NO_INPUTS).text()).isEqualTo("oven temperature 900 K");
    }

    @Test
    void showsTheUsualCautionsAndDefersToLocalRules() {
        assertThat(kind.tables(run(Records.json(RUN)), Records.NO_INPUTS)).anySatisfy(table -> {
            assertThat(table.name()).isEqualTo("cautions");
            assertThat(table.rows()).hasSize(2);
            assertThat(table.rows().get(0).get(1).orElseThrow().toString()).contains("Local rules");
        });
    }

    @Test
    void reportsAllProblemsAtOnceEachWithItsPlace() {
        String bad = RUN.replace("\"gas pressure\"", "\"crucible\"")
                .replace("\"oven\"", "\"light-sensitive\"")
                .replace("2031-10-14T23:38:53Z", "2031-10-14T13:38:53Z")
                .replace("\"si\":742,", "");
        assertThat(examine(bad))
                .extracting(Problem::where)
                .containsExactlyInAnyOrder(
                        "/content/words/0/name",
                        "/content/settings/0/quantity",
                        "/content/ended",
                        "/content/cautions/0");
        assertThat(examine(RUN.replace("\"at\":\"2031-10-14T16:50:00Z\"", "\"at\":\"yesterday\"")))
                .extracting(Problem::where)
                .contains("/content/started");
    }

    @Test
    void schemaAndRulesKnowTheSameHazards() {
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
                .containsExactlyInAnyOrderElementsOf(
                        CautionRules.WORK.stream().map(Caution::code).toList());
    }

    @Test
    void everyProblemHasBothTexts() {
        ResourceBundle words = ResourceBundle.getBundle("fringekeep.sourcerun.Problems", java.util.Locale.ROOT);
        assertThat(words.keySet()).allSatisfy(key -> {
            String code = key.substring(0, key.lastIndexOf('.'));
            assertThat(words.getString(code + ".what")).isNotBlank();
            assertThat(words.getString(code + ".mend")).contains("Nothing was stored.");
        });
    }
}
