package fringekeep.sample;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.PartName;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Documents changed at random are accepted or refused with problems, never more. */
class DocumentsTest {
    private static final String RADIUS = """
            {"si":5e-8,"text":"50","unit":"nm","uncertainty":{"sort":"bounds","lower":4e-8,"upper":6e-8}}""";
    private static final String MASS = """
            {"si":1e-24,"text":"1e-24","unit":"kg","uncertainty":{"sort":"unstated"}}""";

    static List<JsonObject> compounds() {
        return List.of(
                choices("{\"sort\":\"formula\",\"formula\":\"(C8F17CH2CH2)4[13C]20H10N4\"}"),
                choices("{\"sort\":\"cluster\",\"unit\":\"C60\",\"sizes\":{\"sort\":\"list\",\"shares\":"
                        + "[{\"size\":1,\"share\":3},{\"size\":2,\"share\":1}]}}"),
                choices(
                        "{\"sort\":\"cluster\",\"unit\":\"Na\",\"sizes\":{\"sort\":\"lognormal\",\"mean\":50,\"spread\":9},"
                                + "\"window\":{\"from\":" + MASS + ",\"to\":" + MASS.replace("1e-24", "3e-24") + "}}"),
                choices("{\"sort\":\"particle\",\"material\":\"silica\",\"radius\":" + RADIUS + ",\"radiusSpread\":"
                        + RADIUS.replace("5e-8", "2e-9") + ",\"density\":" + MASS.replace("1e-24", "2000") + "}"),
                choices("{\"sort\":\"masses\",\"masses\":[{\"mass\":" + MASS + ",\"share\":1},{\"mass\":"
                        + MASS.replace("1e-24", "2e-24") + ",\"share\":0.5}]}"));
    }

    private static JsonObject choices(String composition) {
        return Records.json(
                "{\"charge\":1,\"constants\":\"CODATA 2018\",\"method\":\"compound.mass/1\",\"composition\":"
                        + composition + "}");
    }

    @Test
    void compoundsNeverCrash() throws Exception {
        CompoundKind kind = new CompoundKind();
        Mutations mutations = new Mutations(1);
        int computed = 0;
        for (int i = 0; i < 4_000; i++) {
            JsonObject choices = mutations.of(compounds().get(i % compounds().size()));
            problems(kind.examine(Records.parts(PartName.CHOICES, choices), Records.NO_INPUTS));
            try {
                JsonObject complete = kind.computation().orElseThrow().complete(choices, Records.NO_INPUTS);
                Outcome outcome = kind.computation().orElseThrow().compute(complete, Records.NO_INPUTS, Work.QUIET);
                if (outcome instanceof Outcome.Computed done) {
                    computed++;
                    looked(kind, Records.parts(PartName.CHOICES, complete, PartName.RESULT, done.result()));
                    looked(
                            kind,
                            Records.parts(PartName.CHOICES, complete, PartName.RESULT, mutations.of(done.result())));
                }
            } catch (ProblemException e) {
                problems(e.problems());
            }
        }
        assertThat(computed).isBetween(300, 3_700);
    }

    @Test
    void batchesNeverCrash() {
        BatchKind kind = new BatchKind();
        Mutations mutations = new Mutations(2);
        JsonObject batch = Records.json("{\"label\":\"DC-1\",\"cautions\":[\"dust\",\"toxic\"],\"acknowledged\":true,"
                + "\"amount\":" + MASS + ",\"received\":{\"at\":\"2031-05-14T09:03:11Z\",\"offset\":\"+02:00\"}}");
        for (int i = 0; i < 2_000; i++) {
            Parts parts = Records.parts(PartName.CONTENT, mutations.of(batch));
            problems(kind.examine(parts, Records.NO_INPUTS));
            looked(kind, parts);
        }
    }

    private static void problems(List<Problem> problems) {
        assertThat(problems).allSatisfy(problem -> {
            assertThat(problem.where()).startsWith("/");
            assertThat(problem.what()).isNotBlank();
            assertThat(problem.mend()).isNotBlank();
        });
    }

    private static void looked(RecordKind kind, Parts parts) {
        RecordView record = Records.record(kind.kind().text(), parts);
        assertThat(kind.title(record, Records.NO_INPUTS)).isNotNull();
        assertThat(kind.rows(kind.projections().get(0), record, Records.NO_INPUTS))
                .isNotEmpty();
        assertThat(kind.words(record).toList()).isNotNull();
        assertThat(kind.tables(record, Records.NO_INPUTS)).isNotNull();
        assertThat(kind.drawings(record, Records.NO_INPUTS)).isNotNull();
        kind.facet(MassFacet.class, record, Records.NO_INPUTS);
    }
}
