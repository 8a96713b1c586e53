package fringekeep.instrument;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Parts;
import fringekeep.archive.kind.RecordKind;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.StoppedException;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.PartName;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Documents and files changed at random are accepted or refused with problems, never more. */
class DocumentsTest {
    private static final String LOG = "time,p,q,t\n2031-10-14T12:02:18,1,2,3\n2031-10-14T12:03:18,3,,4\n";

    @Test
    void setupsNeverCrash() {
        entered(new SetupKind(), Records.json(SetupKindTest.BENCH), 1);
    }

    @Test
    void calibrationsNeverCrash() {
        entered(new CalibrationKind(), Records.json(CalibrationKindTest.POWER), 2);
        entered(new CalibrationKind(), Records.json(CalibrationKindTest.LINE), 3);
    }

    private static void entered(RecordKind kind, JsonObject document, long seed) {
        Mutations mutations = new Mutations(seed);
        int accepted = 0;
        for (int i = 0; i < 3_000; i++) {
            Parts parts = Records.parts(PartName.CONTENT, mutations.of(document));
            List<Problem> problems = kind.examine(parts, Records.NO_INPUTS);
            problems(problems);
            accepted += problems.isEmpty() ? 1 : 0;
            looked(kind, Records.record(kind.kind().text(), parts));
        }
        assertThat(accepted).isLessThan(2_900);
    }

    @Test
    void logsNeverCrash() throws StoppedException {
        MonitorLogKind kind = new MonitorLogKind();
        Mutations mutations = new Mutations(4);
        Random random = new Random(5);
        int computed = 0;
        for (int i = 0; i < 3_000; i++) {
            byte[] bytes = LOG.getBytes(StandardCharsets.UTF_8);
            JsonObject choices = Records.json(MonitorLogKindTest.DEMO);
            if (i % 2 == 0) {
                bytes[random.nextInt(bytes.length)] = (byte) random.nextInt();
            } else {
                choices = mutations.of(choices);
            }
            Inputs inputs = Records.inputs(List.of(Records.raw("raw", bytes)), List.of());
            problems(kind.examine(Records.parts(PartName.CHOICES, choices), inputs));
            try {
                JsonObject complete = kind.computation().orElseThrow().complete(choices, inputs);
                Outcome outcome = kind.computation().orElseThrow().compute(complete, inputs, Work.QUIET);
                if (outcome instanceof Outcome.Computed done) {
                    computed++;
                    Parts parts =
                            Records.parts(PartName.CHOICES, complete, PartName.RESULT, mutations.of(done.result()));
                    looked(kind, Records.record("monitor-log", parts, done.payloads()));
                } else {
                    assertThat(((Outcome.NoResult) outcome).reasons())
                            .isNotEmpty()
                            .allSatisfy(problem -> assertThat(problem.mend()).isNotBlank());
                }
            } catch (ProblemException e) {
                problems(e.problems());
            }
        }
        assertThat(computed).isBetween(300, 2_900);
    }

    private static void problems(List<Problem> problems) {
        assertThat(problems).allSatisfy(problem -> {
            assertThat(problem.where()).startsWith("/");
            assertThat(problem.what()).isNotBlank();
            assertThat(problem.mend()).isNotBlank();
        });
    }

    private static void looked(RecordKind kind, RecordView record) {
        assertThat(kind.title(record, Records.NO_INPUTS)).isNotNull();
        assertThat(kind.rows(kind.projections().get(0), record, Records.NO_INPUTS))
                .isNotEmpty();
        assertThat(kind.words(record).toList()).isNotNull();
        assertThat(kind.tables(record, Records.NO_INPUTS)).isNotNull();
        assertThat(kind.drawings(record, Records.NO_INPUTS)).isNotNull();
        kind.facet(SetupFacet.class, record, Records.NO_INPUTS);
        kind.facet(CalibrationFacet.class, record, Records.NO_INPUTS);
        kind.facet(MonitorLog.class, record, Records.NO_INPUTS);
    }
}
