package fringekeep.interferometry.judge;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** One case of src/test/reference/public-checks/checks.json: inputs with units, expected values, tolerance. */
public record ReferenceCase(JsonNode node) {
    private static final Path FILE = Path.of("src/test/reference/public-checks/checks.json");

    /** All cases whose identifier starts with the given words; there is at least one. */
    public static List<ReferenceCase> startingWith(String prefix) throws IOException {
        List<ReferenceCase> found = new ArrayList<>();
        for (JsonNode node : new ObjectMapper().readTree(FILE.toFile()).get("cases")) {
            if (node.get("id").asText().startsWith(prefix)) {
                found.add(new ReferenceCase(node));
            }
        }
        assertThat(found).as("cases %s", prefix).isNotEmpty();
        return found;
    }

    /** An input in the SI unit of its kind. */
    public double si(String name) {
        JsonNode input = node.get("inputs").get(name);
        return input.get("value").asDouble() * factor(input.get("unit").asText());
    }

    /** A list of inputs in SI. */
    public double[] list(String name) {
        JsonNode input = node.get("inputs").get(name);
        double factor = factor(input.get("unit").asText());
        double[] values = new double[input.get("value").size()];
        for (int k = 0; k < values.length; k++) {
            values[k] = input.get("value").get(k).asDouble() * factor;
        }
        return values;
    }

    /** Expected value or list, in the unit the file gives it in, turned to SI. */
    public double[] expected(String name) {
        JsonNode value = node.get("expected").get(name).get("value");
        double factor = factor(node.get("expected").get(name).get("unit").asText());
        double[] values = new double[value.isArray() ? value.size() : 1];
        for (int k = 0; k < values.length; k++) {
            values[k] = (value.isArray() ? value.get(k) : value).asDouble() * factor;
        }
        return values;
    }

    /** Compares within the tolerance that the case states; `scale` is 1 for a bare number. */
    public void agrees(String name, double... actual) {
        double[] expected = expected(name);
        double unit = factor(node.get("expected").get(name).get("unit").asText());
        JsonNode tolerance = node.get("tolerance");
        assertThat(actual).as("%s %s", node.get("id").asText(), name).hasSameSizeAs(expected);
        for (int k = 0; k < expected.length; k++) {
            double allowed = tolerance.get("absolute").asDouble() * unit
                    + tolerance.get("relative").asDouble() * Math.abs(expected[k]);
            assertThat(actual[k])
                    .as("%s %s[%d]", node.get("id").asText(), name, k)
                    .isCloseTo(expected[k], within(allowed + 1e-300));
        }
    }

    private static double factor(String unit) {
        return switch (unit) {
            case "u" -> 1.66053906660e-27;
            case "angstrom^3" -> 1e-30;
            case "debye" -> 1e-21 / 299792458.0;
            case "meV nm^3", "meV nm^n" -> 1.602176634e-22;
            default -> 1.0;
        };
    }
}
