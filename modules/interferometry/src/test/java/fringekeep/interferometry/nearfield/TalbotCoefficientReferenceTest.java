package fringekeep.interferometry.nearfield;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Error map of the light gratings against their definition, summed at 30 digits (src/test/reference/talbot). */
class TalbotCoefficientReferenceTest {
    @Test
    void closedFormsEqualTheDefinitionOverTheDomain() throws IOException {
        List<String> lines = Files.readAllLines(Path.of("src/test/reference/talbot/values.csv"));
        assertThat(lines).hasSize(302);
        for (String line : lines.subList(2, lines.size())) {
            String[] cells = line.split(",");
            double xi = Double.parseDouble(cells[2]);
            double photons = Double.parseDouble(cells[4]);
            TalbotKernel kernel = kernel(cells[0], Double.parseDouble(cells[3]), photons);
            double expected = Double.parseDouble(cells[5]);
            // Rounding of xi moves the argument by one unit in the last place of phi0, which sets the floor.
            double size = cells[0].equals("depletion") ? kernel.transmission() : 1.0;
            assertThat(kernel.quantum(Integer.parseInt(cells[1]), xi))
                    .as(line)
                    .isCloseTo(expected, within(5e-14 * size));
        }
    }

    @Test
    void attractingWallsEqualTheDefinition() throws IOException {
        List<String> lines = Files.readAllLines(Path.of("src/test/reference/talbot/walls.csv"));
        assertThat(lines).hasSize(18);
        for (String line : lines.subList(2, lines.size())) {
            String[] cells = line.split(",");
            double coefficient = Double.parseDouble(cells[2]);
            double cutoff = Double.parseDouble(cells[5]);
            WallPotential wall = new WallPotential(coefficient, Integer.parseInt(cells[3]), 1.6e-7, cutoff);
            EikonalSlitKernel kernel =
                    new EikonalSlitKernel(2.66e-7, Double.parseDouble(cells[4]), wall, Double.parseDouble(cells[6]));
            assertThat(kernel.quantum(Integer.parseInt(cells[0]), Double.parseDouble(cells[1])))
                    .as(line)
                    .isCloseTo(Double.parseDouble(cells[7]), within(1e-12 * kernel.transmission()));
        }
    }

    private static TalbotKernel kernel(String sort, double phase, double photons) {
        return switch (sort) {
            case "phase" -> LightKernel.ofPhase(phase);
            case "coherent" -> new LightKernel(phase, photons, RecoilKernel.STANDING_MODE_COHERENT);
            case "walk" -> new LightKernel(phase, photons, RecoilKernel.RANDOM_WALK);
            default -> new DepletionKernel(phase, photons);
        };
    }
}
