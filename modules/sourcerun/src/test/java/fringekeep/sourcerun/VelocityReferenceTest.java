package fringekeep.sourcerun;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.archive.facet.CountTable;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Outcome;
import fringekeep.archive.kind.Sensitivity;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.problem.Work;
import fringekeep.instrument.CalibrationFacet;
import fringekeep.instrument.CalibrationModel;
import fringekeep.instrument.CalibrationTarget;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Velocities against traces whose truth is known, and against closed forms. */
class VelocityReferenceTest {
    private final VelocityComputation computation = new VelocityComputation();

    private JsonObject result(JsonObject choices, Inputs inputs) throws ProblemException {
        Outcome outcome = computation.compute(computation.complete(choices, inputs), inputs, Work.QUIET);
        if (outcome instanceof Outcome.NoResult none) {
            throw new AssertionError(none.reasons().toString());
        }
        return ((Outcome.Computed) outcome).result();
    }

    private static Inputs file(String name) throws IOException {
        return Records.inputs(
                List.of(Records.raw("trace", Files.readAllBytes(Path.of("src/test/reference/flights", name)))),
                List.of());
    }

    private static double value(JsonObject result, String name) {
        return result.object(name).orElseThrow().number("value").orElseThrow();
    }

    private static double u(JsonObject result, String name) {
        return result.object(name).orElseThrow().number("u").orElseThrow();
    }

    /** truth.json: the generator of the demo lab, numpy, forward model in fine time steps. */
    @Test
    void findsTheVelocitiesTheGeneratorDrew() throws Exception {
        PublishedSchema schema = new PublishedSchema(VelocityKind.class, "velocity-1.schema.json");
        JsonNode truth =
                new ObjectMapper().readTree(Files.readString(Path.of("src/test/reference/flights/truth.json")));
        int compared = 0;
        for (JsonNode flight : truth.get("flights")) {
            String name = flight.get("file").asText();
            double from = flight.get("from").asDouble();
            double to = flight.get("to").asDouble();
            JsonObject choices = name.contains("single") ? Flights.single(from, to) : Flights.random(from, to);
            for (String background : List.of("outside-window", "fitted")) {
                JsonObject asked = choices.with("background", background);
                JsonObject result = result(asked, file(name));
                double mean = flight.get("mean").asDouble();
                double spread = flight.get("standardDeviation").asDouble();
                assertThat(value(result, "mean"))
                        .as(name + " " + background)
                        .isCloseTo(mean, within(3 * u(result, "mean")));
                assertThat(value(result, "spread"))
                        .as(name + " " + background)
                        .isCloseTo(spread, within(3 * u(result, "spread") + 0.01 * spread));
                assertThat(u(result, "mean")).isBetween(0.0005 * mean, 0.01 * mean);
                assertThat(schema.faults(JsonObject.EMPTY
                                .with("choices", computation.complete(asked, file(name)))
                                .with("result", result)))
                        .isEmpty();
                compared++;
            }
        }
        assertThat(compared).isEqualTo(12);
    }

    /** dv/dL = v/L and dv/dt0 = v²/L (v = L/t); all that shifts nodes together is the root of their squares. */
    @Test
    void distanceAndTimeZeroShiftAllNodes() throws Exception {
        JsonObject choices = Flights.single(55, 150);
        JsonObject result = result(choices, file("tf-1-fan-single.txt"));
        double mean = value(result, "mean");

        List<JsonObject> sources = result.array("sensitivities").objects();
        assertThat(sources).extracting(one -> one.text("parameter").orElse("")).containsExactly("distance", "timeZero");
        assertThat(sources.get(0).array("derivatives").numbers()[0]).isCloseTo(mean / 1.48, within(1e-9 * mean));
        double shift = Math.hypot(
                mean / 1.48 * 0.003, sources.get(1).array("derivatives").numbers()[0] * 0.00002);
        assertThat(result.number("shift").orElseThrow()).isCloseTo(shift, within(1e-9 * shift));
        JsonObject longer = choices.with("distance", Records.json(Flights.quantity(1.483, "m", 0.003)));
        assertThat(value(result(longer, file("tf-1-fan-single.txt")), "mean") - mean)
                .isCloseTo(mean / 1.48 * 0.003, within(0.03));
    }

    @Test
    void aPinnedCalibrationTakesThePlaceOfTheChoiceAndIsNamed() throws Exception {
        Input trace = file("tf-1-fan-single.txt").all().get(0);
        CalibrationFacet metre = new CalibrationFacet(
                CalibrationTarget.FLIGHT_DISTANCE,
                CalibrationModel.VALUE,
                new double[] {1.6},
                new double[] {1e-6},
                Instant.EPOCH,
                Optional.empty(),
                Optional.empty());
        Inputs inputs = Records.inputs(List.of(trace, Records.offering("calibration", 1, metre)), List.of());
        JsonObject choices = Flights.single(55, 170);

        JsonObject complete = computation.complete(choices, inputs);
        Outcome outcome = computation.compute(complete, inputs, Work.QUIET);
        JsonObject result = ((Outcome.Computed) outcome).result();

        double plain = value(result(Flights.single(55, 150), file("tf-1-fan-single.txt")), "mean");
        assertThat(value(result, "mean")).isCloseTo(plain * 1.6 / 1.48, within(0.3));
        List<Sensitivity> shared = computation.sensitivities(complete, inputs, outcome, Work.QUIET);
        assertThat(shared).singleElement().satisfies(one -> {
            assertThat(one.source()).isEqualTo(inputs.all().get(1).target());
            assertThat(one.parameter()).isEqualTo("value");
            assertThat(one.deviation()).isEqualTo(0.001);
        });
    }

    @Test
    void calibrationsOfVelocityMoveNodesMeanAndSpread() throws Exception {
        Input trace = file("tf-1-fan-single.txt").all().get(0);
        CalibrationFacet scale = new CalibrationFacet(
                CalibrationTarget.VELOCITY_SCALE,
                CalibrationModel.OFFSET_SCALE,
                new double[] {2, 1.1},
                new double[] {0.04, 0, 0.0001},
                Instant.EPOCH,
                Optional.empty(),
                Optional.empty());
        Inputs inputs = Records.inputs(List.of(trace, Records.offering("calibration", 1, scale)), List.of());

        JsonObject plain = result(Flights.single(55, 150), file("tf-1-fan-single.txt"));
        JsonObject moved = result(Flights.single(55, 150), inputs);

        double mean = value(plain, "mean");
        assertThat(value(moved, "mean")).isCloseTo(2 + 1.1 * mean, within(1e-9));
        assertThat(value(moved, "spread")).isCloseTo(1.1 * value(plain, "spread"), within(1e-9));
        double shift = plain.number("shift").orElseThrow();
        assertThat(moved.number("shift").orElseThrow())
                .isCloseTo(Math.sqrt(1.21 * shift * shift + 0.04 + 0.0001 * mean * mean), within(1e-9));
    }

    /** A trace of a record counts as well as a raw file. */
    @Test
    void readsARecordWithCountsAgainstTime() throws Exception {
        FlightTrace raw = FlightTrace.of(
                computation.complete(Flights.single(55, 150), file("tf-1-fan-single.txt")),
                file("tf-1-fan-single.txt"));
        double[] times = new double[raw.counts().length];
        java.util.Arrays.setAll(times, i -> raw.first() + i * raw.width());
        CountTable table = new CountTable(
                List.of(new CountTable.Column("time of flight", "s", times)),
                List.of(new CountTable.Column("counts", "1", raw.counts())),
                new double[0],
                new double[0],
                Optional.empty(),
                Optional.empty());
        Inputs inputs = Records.inputs(List.of(Records.offering("trace", 0, table)), List.of());

        JsonObject result = result(Flights.single(55, 150).without("reading"), inputs);

        assertThat(value(result, "mean"))
                .isCloseTo(value(result(Flights.single(55, 150), file("tf-1-fan-single.txt")), "mean"), within(1e-9));
    }

    /** Turning the disc the other way and writing its sequence from behind is the same disc. */
    @Test
    void aDiscTurnedBackwardIsReadFromBehind() throws Exception {
        JsonObject forward = Flights.random(55, 150);
        JsonObject backward = forward.with("direction", "backward")
                .with("sequence", new StringBuilder(Flights.SEQUENCE).reverse().toString());

        assertThat(result(backward, file("tf-1-fan-random.txt")))
                .isEqualTo(result(forward, file("tf-1-fan-random.txt")));
    }

    /** Slits at 0, 1, 2 m, the middle one 0.2 mm up: v = sqrt(g · 1 m · 1 m / (2 · 0.2 mm)) = 156.6 m/s at g = 9.81 m/s². */
    @Test
    void threeSlitsSelectTheSpeedOfTheParabola() throws ProblemException {
        JsonObject result = result(Flights.slits(), Records.NO_INPUTS);
        double v = Math.sqrt(9.81 / 0.0004);

        assertThat(value(result, "mean")).isCloseTo(v, within(0.02 * v));
        double height = Math.sqrt(1.5) * 0.000005;
        double byHeights = v * height / (2 * 0.0002);
        double byGravity = v * 0.01 / (2 * 9.81);
        assertThat(result.number("shift").orElseThrow())
                .isCloseTo(Math.hypot(byHeights, byGravity), within(0.02 * byHeights));
        assertThat(value(result, "spread")).isGreaterThan(1);
        JsonObject narrow = Records.json("{\"x\":"
                        + new String(
                                        fringekeep.archive.json.CanonicalJson.write(Flights.slits()),
                                        java.nio.charset.StandardCharsets.UTF_8)
                                .replaceAll("\"opening\":\\{[^}]*\\{[^}]*}[^}]*},", "")
                        + "}")
                .object("x")
                .orElseThrow();
        assertThat(value(result(narrow, Records.NO_INPUTS), "mean")).isCloseTo(v, within(1e-9));
        assertThat(result(narrow, Records.NO_INPUTS).array("nodes").items()).hasSize(1);
    }
}
