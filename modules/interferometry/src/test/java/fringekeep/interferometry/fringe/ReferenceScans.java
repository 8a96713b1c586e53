package fringekeep.interferometry.fringe;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Reads the reference scans and what other programs made of them. */
final class ReferenceScans {
    static final Path FOLDER = Path.of("src/test/reference/fringe-fits");

    private ReferenceScans() {}

    static FringeData scan(int number) throws IOException {
        List<double[]> rows = new ArrayList<>();
        for (String line : Files.readAllLines(FOLDER.resolve("fringe_0" + number + ".csv"))) {
            if (!line.isEmpty() && Character.isDigit(line.charAt(0))) {
                rows.add(java.util.Arrays.stream(line.split(",", -1))
                        .mapToDouble(Double::parseDouble)
                        .toArray());
            }
        }
        double[][] columns = new double[7][rows.size()];
        for (int i = 0; i < rows.size(); i++) {
            for (int c = 0; c < 7; c++) {
                columns[c][i] = rows.get(i)[c] * (c == 2 ? 1e-9 : 1);
            }
        }
        return FringeData.of(columns[2], columns[3])
                .times(columns[1])
                .exposures(columns[4])
                .dark(columns[5], columns[6]);
    }

    static JsonNode fits(int number) throws IOException {
        return new ObjectMapper()
                .readTree(FOLDER.resolve("reference-fits.json").toFile())
                .get("fits")
                .get("fringe_0" + number);
    }

    static JsonNode checks() throws IOException {
        return new ObjectMapper()
                .readTree(Path.of("src/test/reference/beam-and-fringe-checks/checks.json")
                        .toFile())
                .get("cases");
    }
}
