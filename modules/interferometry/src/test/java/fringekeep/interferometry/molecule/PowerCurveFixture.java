package fringekeep.interferometry.molecule;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.WeightedNodes;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** A file of src/test/reference/power-curves with its set-up, and what other programs made of it. */
record PowerCurveFixture(String name, Map<String, String> header, MeasuredCurve data) {
    private static final Path FOLDER = Path.of("src/test/reference/power-curves");
    static final double ATOMIC_MASS = 1.66053906660e-27;

    static PowerCurveFixture read(String name) throws IOException {
        List<String> lines = Files.readAllLines(FOLDER.resolve(name + ".csv"));
        Map<String, String> header = new HashMap<>();
        List<String[]> rows = lines.stream()
                .filter(line -> !line.startsWith("#"))
                .skip(1)
                .map(line -> line.split(","))
                .toList();
        lines.stream()
                .filter(line -> line.startsWith("#"))
                .map(line -> line.substring(1).split(":", 2))
                .forEach(pair -> header.put(pair[0].trim(), pair[1].trim()));
        return new PowerCurveFixture(
                name, header, new MeasuredCurve(column(rows, 0), column(rows, 1), column(rows, 2)));
    }

    private static double[] column(List<String[]> rows, int index) {
        return rows.stream().mapToDouble(row -> Double.parseDouble(row[index])).toArray();
    }

    double number(String key) {
        return Double.parseDouble(header.get(key));
    }

    PowerSeriesSetup setup() {
        LaserBeam laser = LaserBeam.ideal(number("laser_nm") * 1e-9, number("w_y_m"));
        return PowerSeriesSetup.symmetric(number("d_m"), number("open_fraction"), number("L_m"), laser);
    }

    /** The velocity average as the other programs took it. */
    BeamEnsemble ensemble() {
        double deviation = number("v_sigma_m_s");
        double mean = number("v_mean_m_s");
        WeightedNodes speeds =
                deviation == 0.0 ? WeightedNodes.single(mean) : WeightedNodes.gaussHermite(mean, deviation, 60, 5.0);
        return new BeamEnsemble(
                speeds, WeightedNodes.single(number("mass_u") * ATOMIC_MASS), WeightedNodes.single(0.0));
    }

    PowerCurveFitter fitter(PowerCurveChoices choices) {
        return new PowerCurveFitter(setup(), ensemble(), choices);
    }

    JsonNode expected() {
        return tree().get("fits").get(name);
    }

    JsonNode truth() {
        return tree().get("truth").get(name);
    }

    private static JsonNode tree() {
        try {
            return new ObjectMapper().readTree(FOLDER.resolve("expected.json").toFile());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
