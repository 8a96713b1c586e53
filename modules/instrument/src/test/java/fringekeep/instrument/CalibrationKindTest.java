package fringekeep.instrument;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.Problem;
import fringekeep.archive.record.PartName;
import java.io.IOException;
import java.time.Instant;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class CalibrationKindTest {
    static final String POWER = """
            {"what":"power-scale","model":"calibration.scale/1","label":"power meter",
            "parameters":[{"name":"scale","value":0.98,"unit":"1"}],"covariance":[0.000064],
            "valid":{"from":"2031-09-01T06:00:00Z","to":"2031-10-21T10:00:00Z"}}""";
    static final String LINE = """
            {"what":"temperature-scale","model":"calibration.offset-scale/1","subject":"oven",
            "parameters":[{"name":"offset","value":-0.1712,"unit":"K"},{"name":"scale","value":1.00218,"unit":"1"}],
            "covariance":[0.00000841,-0.00000178292,0.0000004489],
            "valid":{"from":"2031-09-01T06:00:00Z"}}""";
    private final CalibrationKind kind = new CalibrationKind();

    private List<Problem> examine(String content) {
        return kind.examine(Records.parts(PartName.CONTENT, Records.json(content)), Records.NO_INPUTS);
    }

    private CalibrationFacet facet(String content) {
        return kind.facet(
                        CalibrationFacet.class,
                        Records.record("calibration", Records.parts(PartName.CONTENT, Records.json(content))),
                        Records.NO_INPUTS)
                .orElseThrow();
    }

    @Test
    void acceptsWhatTheSchemaAccepts() throws IOException {
        PublishedSchema schema = new PublishedSchema(CalibrationKind.class, "calibration-1.schema.json");
        for (String content : List.of(POWER, LINE)) {
            assertThat(schema.faults(JsonObject.EMPTY.with("content", Records.json(content))))
                    .isEmpty();
            assertThat(examine(content)).isEmpty();
        }
    }

    @Test
    void appliesAScaleWithItsDerivativeAndUncertainty() {
        CalibrationFacet.Calibrated power = facet(POWER).apply(7.3);

        assertThat(power.value()).isCloseTo(7.154, within(1e-12));
        assertThat(power.slope()).isEqualTo(0.98);
        assertThat(power.gradient()).containsExactly(7.3);
        assertThat(power.deviation()).isCloseTo(7.3 * 0.008, within(1e-12));
    }

    /**
     * JCGM 100:2008 (GUM), annex H.3, calibration of a thermometer: b(t) = y1 + y2 (t - t0), y1 = -0.1712 degrees Celsius,
     * u = 0.0029; y2 = 0.00218, u = 0.00067; r = -0.930; t0 = 20; at t = 30: b = -0.1494, u = 0.0041 (H.3.4). Here the
     * reading is t - t0, and the calibrated value b + (t - t0).
     */
    @Test
    void carriesCorrelatedParametersAsTheGuideToUncertaintyDoes() {
        String line = LINE.replace("-0.00000178292", Double.toString(-0.930 * 0.0029 * 0.00067));

        CalibrationFacet.Calibrated at30 = facet(line).apply(10);

        assertThat(at30.value() - 10).isCloseTo(-0.1494, within(5e-5));
        assertThat(at30.deviation()).isCloseTo(0.0041, within(5e-5));
    }

    @Test
    void derivativesAreThoseOfTheFunction() {
        Random random = new Random(3);
        for (CalibrationModel model : CalibrationModel.values()) {
            double[] p = random.doubles(model.parameters().size(), 0.5, 2).toArray();
            double x = 1.7;
            double h = 1e-6;
            assertThat(model.slope(p, x))
                    .isCloseTo((model.value(p, x + h) - model.value(p, x - h)) / (2 * h), within(1e-8));
            for (int i = 0; i < p.length; i++) {
                double[] up = p.clone();
                double[] down = p.clone();
                up[i] += h;
                down[i] -= h;
                assertThat(model.gradient(x)[i])
                        .isCloseTo((model.value(up, x) - model.value(down, x)) / (2 * h), within(1e-8));
            }
        }
    }

    @Test
    void holdsFromItsBeginningToBeforeItsEnd() {
        CalibrationFacet power = facet(POWER);

        assertThat(power.holds(Instant.parse("2031-09-01T05:59:59Z"))).isFalse();
        assertThat(power.holds(Instant.parse("2031-09-01T06:00:00Z"))).isTrue();
        assertThat(power.holds(Instant.parse("2031-10-21T09:59:59Z"))).isTrue();
        assertThat(power.holds(Instant.parse("2031-10-21T10:00:00Z"))).isFalse();
    }

    @Test
    void saysWhatIsWrong() {
        assertThat(examine(POWER.replace("power-scale", "dead-time")))
                .extracting(Problem::code)
                .contains("instrument.model-of-what");
        assertThat(examine(POWER.replace("\"unit\":\"1\"", "\"unit\":\"mW\"")))
                .extracting(Problem::where)
                .containsExactly("/content/parameters/0/unit");
        assertThat(examine(POWER.replace("0.98", "-0.98")))
                .extracting(Problem::where)
                .containsExactly("/content/parameters/0/value");
        assertThat(examine(POWER.replace("[0.000064]", "[-0.000064]")))
                .extracting(Problem::code)
                .containsExactly("instrument.covariance-negative");
        assertThat(examine(LINE.replace("-0.00000178292", "-0.1")))
                .extracting(Problem::code)
                .containsExactly("instrument.covariance-negative");
        assertThat(examine(LINE.replace("-0.00000178292,", "")))
                .extracting(Problem::code)
                .containsExactly("instrument.covariance-length");
        assertThat(examine(POWER.replace("2031-10-21", "2031-08-21")))
                .extracting(Problem::code)
                .containsExactly("instrument.valid-order");
    }

    @Test
    void everyTargetOfTheSchemaIsKnownAndTheOtherWay() {
        JsonObject content = kind.jsonSchema(1)
                .object("properties")
                .orElseThrow()
                .object("content")
                .orElseThrow()
                .object("properties")
                .orElseThrow();
        assertThat(content.object("what").orElseThrow().array("enum").texts())
                .containsExactlyInAnyOrderElementsOf(List.of(CalibrationTarget.values()).stream()
                        .map(CalibrationTarget::code)
                        .toList());
        assertThat(content.object("model").orElseThrow().array("enum").texts())
                .containsExactlyInAnyOrderElementsOf(List.of(CalibrationModel.values()).stream()
                        .map(CalibrationModel::method)
                        .toList());
    }

    @Test
    void mayContinue() {
        assertThat(kind.mayContinue()).isTrue();
    }
}
