package fringekeep.commandline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Uncertainties of inputs arrive at results as the law of propagation has it (JCGM 100:2008, 5.1.2). */
class ComputePropagationTest {
    private final ByteArrayOutputStream data = new ByteArrayOutputStream();
    private final ByteArrayOutputStream words = new ByteArrayOutputStream();

    @TempDir
    Path folder;

    private int run(String method, String document) throws IOException {
        data.reset();
        words.reset();
        Path file = Files.writeString(folder.resolve("inputs.json"), document);
        return Main.run(ComputeReferenceTest.console(data, words), "compute", method, file.toString(), "--json");
    }

    private JsonNode computed(String method, String document) throws IOException {
        int code = run(method, document);
        assertThat(words.toString(StandardCharsets.UTF_8)).isEmpty();
        assertThat(code).isEqualTo(Exit.DONE);
        return new ObjectMapper().readTree(data.toByteArray());
    }

    private static double relative(JsonNode result) {
        return result.get("u").doubleValue() / Math.abs(result.get("value").doubleValue());
    }

    @Test
    void everyResultOfAProductOfPowersGetsItsShareOfEveryInput() throws IOException {
        JsonNode all = computed(
                "de-broglie",
                "{\"mass\":\"720.642(30) u\",\"velocity\":\"200.0(5) m/s\",\"period\":\"266.38(13) nm\"}");
        JsonNode results = all.get("results");
        double mass = 0.030 / 720.642;
        double velocity = 0.5 / 200;
        double period = 0.13 / 266.38;

        assertThat(relative(results.get("wavelength"))).isCloseTo(Math.hypot(mass, velocity), within(1e-7));
        assertThat(relative(results.get("talbotLength")))
                .isCloseTo(Math.sqrt(mass * mass + velocity * velocity + 4 * period * period), within(1e-8));
        assertThat(relative(results.get("talbotTime"))).isCloseTo(Math.hypot(mass, 2 * period), within(1e-8));
        assertThat(all.get("budget")).hasSize(7);
    }

    @Test
    void theBudgetAddsUpToTheUncertainty() throws IOException {
        JsonNode all = computed(
                "susceptibility-from-shift",
                "{\"shift\":\"178.4(2.1) nm\",\"fieldTerm\":{\"value\":1.2e14,\"u\":2e12,\"unit\":\"V2/m3\"},"
                        + "\"mass\":\"720.642 u\",\"velocity\":\"170.0(8) m/s\",\"separation\":\"0.38 m\","
                        + "\"fieldStart\":\"80.0(5) mm\",\"fieldLength\":\"47.0(3) mm\",\"period\":\"991 nm\"}");
        double sum = 0;
        for (JsonNode line : all.get("budget")) {
            sum += line.get("u").doubleValue() * line.get("u").doubleValue();
        }
        JsonNode chi = all.get("results").get("susceptibility");

        // chi = dx m v^2 / (F l (z + l/2)); d ln chi / dl = -1/l - 1/(2 z + l).
        double length = 0.3 * (1 / 47.0 + 1 / (160.0 + 47.0));
        double start = 0.5 * 2 / (160.0 + 47.0);
        double expected = Math.sqrt(Math.pow(2.1 / 178.4, 2)
                + Math.pow(2 / 120.0, 2)
                + Math.pow(2 * 0.8 / 170, 2)
                + length * length
                + start * start);
        assertThat(relative(chi)).isCloseTo(expected, within(1e-5));
        assertThat(Math.sqrt(sum))
                .isCloseTo(
                        chi.get("u").doubleValue(), within(1e-12 * chi.get("u").doubleValue()));
    }

    @Test
    void aFitsOwnUncertaintyAndThatOfItsSharedInputsAreCombined() throws IOException {
        String form = "{\"pressures\":{\"value\":[1e-6,2e-5,5e-5,1e-4],\"unit\":\"Pa\"},\"visibilities\":{\"value\":"
                + "[0.301,0.243,0.174,0.098],\"u\":0.006},\"temperature\":\"%s\",\"pathLength\":\"%s\"}";
        JsonNode exact = computed("pressure-fit", form.formatted("300 K", "440 mm"))
                .get("results")
                .get("crossSection");
        JsonNode shared = computed("pressure-fit", form.formatted("300(6) K", "440(4) mm"))
                .get("results")
                .get("crossSection");

        assertThat(shared.get("value").doubleValue())
                .isEqualTo(exact.get("value").doubleValue());
        assertThat(relative(shared))
                .isCloseTo(Math.sqrt(Math.pow(relative(exact), 2) + 4e-4 + Math.pow(4 / 440.0, 2)), within(1e-5));
    }

    @Test
    void uncertaintiesThatWeighAFitAreNotCountedTwice() throws IOException {
        JsonNode all = computed(
                "moment-fit",
                "{\"temperatures\":{\"value\":[300,500,700],\"unit\":\"K\"},\"susceptibilities\":{\"value\":"
                        + "[1.472e-38,1.149e-38,1.011e-38],\"u\":1.2e-40,\"unit\":\"C.m2/V\"}}");

        assertThat(all.get("budget")).isEmpty();
        assertThat(all.get("results").get("squaredDipoleMoment").get("u").doubleValue())
                .isPositive();
    }

    @Test
    void inputsOfGroupsAndRowsAreCarriedOneByOne() throws IOException {
        JsonNode all = computed(
                "three-grating-fringe",
                "{\"first\":{\"openFraction\":\"0.42(1)\"},\"second\":{\"sort\":\"light\",\"phase\":\"2.7(2) rad\"},"
                        + "\"third\":{\"openFraction\":\"0.42(1)\"},\"firstTalbotTimes\":0.5}");
        double first = 0;
        double third = 0;
        for (JsonNode line : all.get("budget")) {
            if (line.get("result").textValue().equals("quantumVisibility")) {
                first += line.get("input").textValue().equals("first.openFraction")
                        ? line.get("u").doubleValue()
                        : 0;
                third += line.get("input").textValue().equals("third.openFraction")
                        ? line.get("u").doubleValue()
                        : 0;
            }
        }

        // V is proportional to sinc(pi f1) sinc(pi f3); d ln sinc(pi f)/df = pi cot(pi f) - 1/f.
        double slope = Math.abs(Math.PI / Math.tan(Math.PI * 0.42) - 1 / 0.42);
        double v = all.get("results").get("quantumVisibility").get("value").doubleValue();
        assertThat(first / v).isCloseTo(0.01 * slope, within(2e-4 * slope * 0.01 + 1e-6));
        assertThat(third).isCloseTo(first, within(1e-12));
    }

    @Test
    void phasesAreComparedTheShortWayRound() throws IOException {
        String form = "{\"positions\":{\"value\":[0,66.5,133,199.5],\"unit\":\"nm\"},\"counts\":[60,%d,140,%d],"
                + "\"period\":\"%s\"}";
        double own = computed("fringe-fit", form.formatted(101, 99, "266 nm"))
                .get("results")
                .get("phase")
                .get("u")
                .doubleValue();
        double with = computed("fringe-fit", form.formatted(101, 99, "266.0(1) nm"))
                .get("results")
                .get("phase")
                .get("u")
                .doubleValue();

        assertThat(with).isBetween(own, 1.1 * own);
    }

    @Test
    void anUncertaintyTheMethodCannotBeMovedByIsRefusedWithItsPlace() throws IOException {
        int code = run(
                "fringe-fit",
                "{\"positions\":{\"value\":[0,66.5,133,199.5],\"unit\":\"nm\"},\"counts\":{\"value\":[60,101,140,99],"
                        + "\"u\":8.5},\"period\":\"266 nm\"}");

        assertThat(code).isEqualTo(Exit.COULD_NOT);
        assertThat(words.toString(StandardCharsets.UTF_8)).contains("counts[0]", "cannot be carried", "mend:");
        assertThat(data.toString(StandardCharsets.UTF_8)).isEmpty();
    }

    @Test
    void whatIsCountedHasNoUncertainty() throws IOException {
        int code = run("talbot-coefficient", "{\"order\":{\"value\":2,\"u\":1},\"separation\":0.3,\"sort\":\"light\"}");

        assertThat(code).isEqualTo(Exit.COULD_NOT);
        assertThat(words.toString(StandardCharsets.UTF_8)).contains("order is counted and has no uncertainty");
    }

    @Test
    void resultsToWhichNothingIsCarriedStayWithout() throws IOException {
        JsonNode results = computed(
                        "vibration-reduction",
                        "{\"amplitudes\":\"20 nm\",\"frequency\":\"180 Hz\",\"separation\":\"105 mm\","
                                + "\"velocity\":\"120 m/s\",\"period\":\"266 nm\"}")
                .get("results");

        assertThat(results.get("commonMode").has("u")).isFalse();
    }
}
