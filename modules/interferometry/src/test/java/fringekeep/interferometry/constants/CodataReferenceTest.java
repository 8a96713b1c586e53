package fringekeep.interferometry.constants;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Every constant against the CODATA tables as SciPy keeps them (src/test/reference/codata). */
class CodataReferenceTest {
    @Test
    void everyConstantIsThePublishedOne() throws IOException, ReflectiveOperationException {
        List<String> lines = Files.readAllLines(Path.of("src/test/reference/codata/values.csv"));
        assertThat(lines).hasSize(32);
        for (String line : lines.subList(2, lines.size())) {
            String[] cells = line.split(",");
            Class<?> set = cells[0].equals("2018") ? Codata2018.class : Codata2022.class;
            double value = set.getField(cells[1]).getDouble(null);
            double expected = Double.parseDouble(cells[2]);
            // SciPy's text truncates the exact constants that have no finite decimal form.
            assertThat(value).as(line).isCloseTo(expected, within(1e-9 * expected));
            if (cells[4].equals("False")) {
                assertThat(value).as(line).isEqualTo(expected);
                double uncertainty = set.getField(cells[1] + "_UNCERTAINTY").getDouble(null);
                assertThat(uncertainty).as(line).isCloseTo(Double.parseDouble(cells[3]), within(1e-12 * uncertainty));
            }
        }
    }

    @Test
    void everyPublicConstantIsInTheTable() throws IOException {
        String table = Files.readString(Path.of("src/test/reference/codata/values.csv"));
        for (var field : Codata2018.class.getFields()) {
            if (!field.getName().endsWith("_UNCERTAINTY") && field.getType() == double.class) {
                assertThat(table).contains("2018," + field.getName() + ",");
            }
        }
    }
}
