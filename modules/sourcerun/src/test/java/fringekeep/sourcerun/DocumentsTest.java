package fringekeep.sourcerun;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.facet.Distribution;
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
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Documents and traces changed at random are accepted or refused with problems, never more. */
class DocumentsTest {
    @Test
    void runsNeverCrash() {
        entered(new SourceRunKind(), Records.json(SourceRunKindTest.RUN), 1);
    }

    @Test
    void quotedVelocitiesNeverCrash() {
        entered(new VelocityKind(), Records.json(VelocityKindTest.QUOTED), 2);
        entered(
                new VelocityKind(),
                Records.json(VelocityKindTest.QUOTED.replace(
                        "\"normal\"", "\"nodes\",\"nodes\":[600,620],\"weights\":[0.25,0.75]")),
                3);
    }

    private static void entered(RecordKind kind, JsonObject document, long seed) {
        Mutations mutations = new Mutations(seed);
        int accepted = 0;
        for (int i = 0; i < 2_000; i++) {
            Parts parts = Records.parts(PartName.CONTENT, mutations.of(document));
            List<Problem> problems = kind.examine(parts, Records.NO_INPUTS);
            problems(problems);
            accepted += problems.isEmpty() ? 1 : 0;
            looked(kind, Records.record(kind.kind().text(), parts));
        }
        assertThat(accepted).isLessThan(1_950);
    }

    @Test
    void computedVelocitiesNeverCrash() throws IOException, StoppedException {
        VelocityKind kind = new VelocityKind();
        Mutations mutations = new Mutations(4);
        Random random = new Random(5);
        byte[] single = Files.readAllBytes(Path.of("src/test/reference/flights/tf-1-fan-single.txt"));
        byte[] decoded = Files.readAllBytes(Path.of("src/test/reference/flights/tf-1-fan-random.txt"));
        List<JsonObject> choices = List.of(Flights.single(55, 150), Flights.random(55, 150), Flights.slits());
        int computed = 0;
        for (int i = 0; i < 1_500; i++) {
            byte[] bytes = (i % 3 == 1 ? decoded : single).clone();
            if (i % 2 == 0) {
                bytes[random.nextInt(bytes.length)] = (byte) random.nextInt();
            }
            JsonObject asked = i % 4 == 0 ? choices.get(i % 3) : mutations.of(choices.get(i % 3));
            computed +=
                    computed(kind, asked, Records.inputs(List.of(Records.raw("trace", bytes)), List.of()), mutations);
        }
        assertThat(computed).isBetween(200, 1_400);
    }

    private static int computed(VelocityKind kind, JsonObject choices, Inputs inputs, Mutations mutations)
            throws StoppedException {
        problems(kind.examine(Records.parts(PartName.CHOICES, choices), inputs));
        try {
            JsonObject complete = kind.computation().orElseThrow().complete(choices, inputs);
            Outcome outcome = kind.computation().orElseThrow().compute(complete, inputs, Work.QUIET);
            if (outcome instanceof Outcome.Computed done) {
                looked(
                        kind,
                        Records.record(
                                "velocity", Records.parts(PartName.CHOICES, complete, PartName.RESULT, done.result())));
                looked(
                        kind,
                        Records.record(
                                "velocity",
                                Records.parts(
                                        PartName.CHOICES, complete, PartName.RESULT, mutations.of(done.result()))));
                return 1;
            }
            assertThat(((Outcome.NoResult) outcome).reasons())
                    .isNotEmpty()
                    .allSatisfy(problem -> assertThat(problem.mend()).isNotBlank());
        } catch (ProblemException e) {
            problems(e.problems());
        }
        return 0;
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
        kind.facet(Distribution.class, record, Records.NO_INPUTS);
        kind.facet(SourceRunFacet.class, record, Records.NO_INPUTS);
    }
}
