package fringekeep.sourcerun;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.facet.Distribution;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.problem.Work;
import fringekeep.archive.record.PartName;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.ResourceBundle;
import org.junit.jupiter.api.Test;

class VelocityKindTest {
    static final String QUOTED =
            "{\"label\":\"pulsed beam\",\"origin\":\"entered by hand\",\"shape\":\"normal\",\"mean\":"
                    + Flights.quantity(612, "m/s", 6) + ",\"spread\":" + Flights.quantity(18, "m/s", 2) + "}";
    private final VelocityKind kind = new VelocityKind();

    private static RecordView quoted(String content) {
        return Records.record("velocity", Records.parts(PartName.CONTENT, Records.json(content)));
    }

    private List<Problem> examine(String content) {
        return kind.examine(Records.parts(PartName.CONTENT, Records.json(content)), Records.NO_INPUTS);
    }

    private List<Problem> refused(JsonObject choices, String trace) throws Exception {
        Inputs inputs =
                Records.inputs(List.of(Records.raw("trace", trace.getBytes(StandardCharsets.UTF_8))), List.of());
        JsonObject complete = kind.computation().orElseThrow().complete(choices, inputs);
        Outcome outcome = kind.computation().orElseThrow().compute(complete, inputs, Work.QUIET);
        assertThat(outcome).isInstanceOf(Outcome.NoResult.class);
        return ((Outcome.NoResult) outcome).reasons();
    }

    private static String trace() throws IOException {
        return Files.readString(Path.of("src/test/reference/flights/tf-1-fan-single.txt"));
    }

    @Test
    void quotesANormalDistribution() throws IOException {
        Distribution velocities = kind.facet(Distribution.class, quoted(QUOTED), Records.NO_INPUTS)
                .orElseThrow();

        assertThat(new PublishedSchema(VelocityKind.class, "velocity-1.schema.json")
                        .faults(JsonObject.EMPTY.with("content", Records.json(QUOTED))))
                .isEmpty();
        assertThat(examine(QUOTED)).isEmpty();
        assertThat(velocities.mean()).isEqualTo(612);
        assertThat(velocities.meanDeviation()).isEqualTo(6);
        assertThat(velocities.spread()).isEqualTo(18);
        double sum = 0;
        for (double weight : velocities.weights()) {
            sum += weight;
        }
        assertThat(sum).isCloseTo(1, within(1e-12));
    }

    @Test
    void quotesASingleVelocityAndNodes() {
        String single = QUOTED.replace("\"normal\"", "\"single\"");
        assertThat(kind.facet(Distribution.class, quoted(single), Records.NO_INPUTS)
                        .orElseThrow()
                        .nodes())
                .containsExactly(612);
        String nodes = QUOTED.replace("\"normal\"", "\"nodes\",\"nodes\":[600,620],\"weights\":[0.25,0.75]");
        assertThat(examine(nodes)).isEmpty();
        assertThat(kind.facet(Distribution.class, quoted(nodes), Records.NO_INPUTS)
                        .orElseThrow()
                        .weights())
                .containsExactly(0.25, 0.75);
    }

    @Test
    void refusesQuotedNonsenseWithPlaces() {
        assertThat(examine(QUOTED.replace("\"entered by hand\"", "\" \"")
                        .replace(
                                "\"spread\":" + Flights.quantity(18, "m/s", 2),
                                "\"spread\":" + Flights.quantity(500, "m/s", 2))))
                .extracting(Problem::where)
                .containsExactly("/content/origin", "/content/spread");
        assertThat(examine(QUOTED.replace("\"normal\"", "\"nodes\",\"nodes\":[620,600],\"weights\":[0.25,0.75]")))
                .extracting(Problem::where)
                .containsExactly("/content/nodes/1");
        assertThat(examine(QUOTED.replace("\"normal\"", "\"nodes\",\"nodes\":[600,620],\"weights\":[0.25,0.25]")))
                .extracting(Problem::code)
                .containsExactly("sourcerun.sum");
        assertThat(kind.examine(Records.parts(), Records.NO_INPUTS))
                .extracting(Problem::code)
                .containsExactly("sourcerun.quoted-or-computed");
    }

    @Test
    void listsMeanAndUncertainty() {
        assertThat(kind.rows(kind.projections().get(0), quoted(QUOTED), Records.NO_INPUTS)
                        .findFirst()
                        .orElseThrow()
                        .values())
                .containsEntry("label", "pulsed beam")
                .containsEntry("method", "quoted")
                .containsEntry("mean_m_per_s", 612.0)
                .containsEntry("mean_u_m_per_s", 6.0)
                .containsEntry("spread_m_per_s", 18.0);
        assertThat(kind.drawings(quoted(QUOTED), Records.NO_INPUTS)).hasSize(1);
        assertThat(kind.tables(quoted(QUOTED), Records.NO_INPUTS)).hasSize(1);
    }

    @Test
    void refusesTracesThatCannotBeUsed() throws Exception {
        JsonObject choices = Flights.single(55, 150);
        assertThat(refused(choices, trace().replace("\n0.5000\t4\n", "\n0.5000\tx\n0.7\t\n")))
                .extracting(Problem::where)
                .contains("line 8, column 2", "line 9, column 2");
        assertThat(refused(choices, trace().replace("\n0.5000\t4\n", "\n0.5000\t4.5\n")))
                .extracting(Problem::code)
                .containsExactly("sourcerun.trace-counts");
        assertThat(refused(choices, trace().replace("\n0.5000\t4\n", "\n0.5700\t4\n")))
                .extracting(Problem::code)
                .containsExactly("sourcerun.trace-uneven");
        assertThat(refused(choices, "a\nb\n"))
                .extracting(Problem::mend)
                .allSatisfy(mend -> assertThat(mend).contains("Nothing was stored."));
        assertThat(refused(Flights.single(5000, 6000), trace()))
                .extracting(Problem::code)
                .containsExactly("sourcerun.window-empty");
        assertThat(refused(Flights.random(55, 150), trace()))
                .extracting(Problem::code)
                .containsExactly("sourcerun.sequence-length");
    }

    @Test
    void namesASequenceWithOpenAndClosedExchanged() throws Exception {
        JsonObject choices = Flights.random(55, 150);
        String exchanged = Flights.SEQUENCE.replace('0', 'x').replace('1', '0').replace('x', '1');
        List<Problem> problems = VelocityRules.choices(choices.without("reading")
                .with("sequence", exchanged)
                .with("shape", "as-measured")
                .with("detector", "flux")
                .with("direction", "forward"));

        assertThat(problems).extracting(Problem::where).containsExactly("/choices/sequence");
        assertThat(problems.get(0).what()).contains("polarity");
    }

    @Test
    void everyFindingOfTheSchemaHasWords() {
        ResourceBundle words = ResourceBundle.getBundle("fringekeep.sourcerun.Findings", Locale.ROOT);
        List<String> codes = kind.jsonSchema(1)
                .object("properties")
                .orElseThrow()
                .object("result")
                .orElseThrow()
                .object("properties")
                .orElseThrow()
                .object("findings")
                .orElseThrow()
                .object("items")
                .orElseThrow()
                .object("properties")
                .orElseThrow()
                .object("code")
                .orElseThrow()
                .array("enum")
                .texts();
        assertThat(words.keySet()).containsExactlyInAnyOrderElementsOf(codes);
    }
}
