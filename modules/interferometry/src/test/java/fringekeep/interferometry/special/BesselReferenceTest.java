package fringekeep.interferometry.special;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.apache.commons.math3.special.BesselJ;
import org.junit.jupiter.api.Test;

/** Bessel functions against mpmath at 40 digits (src/test/reference/bessel) and against Commons Math over a grid. */
class BesselReferenceTest {
    private static final Path VALUES = Path.of("src/test/reference/bessel/values.csv");

    private record Case(String function, int order, double argument, double expected) {
        static Case of(String line) {
            String[] cells = line.split(",");
            return new Case(
                    cells[0], Integer.parseInt(cells[1]), Double.parseDouble(cells[2]), Double.parseDouble(cells[3]));
        }
    }

    private static List<Case> cases(String function) throws IOException {
        List<Case> cases = Files.readAllLines(VALUES).stream()
                .filter(line -> line.startsWith(function + ","))
                .map(Case::of)
                .toList();
        assertThat(cases).hasSizeGreaterThan(200);
        return cases;
    }

    @Test
    void firstKindAgreesWithFortyDigits() throws IOException {
        for (Case c : cases("J")) {
            double value = Bessel.j(c.order, c.argument);
            boolean nearZero = c.argument * c.argument < 2.0 * (c.order + 1);
            double tolerance = nearZero ? 1e-14 * Math.abs(c.expected) : 4e-15;
            assertThat(value).as("%s", c).isCloseTo(c.expected, within(tolerance + Double.MIN_NORMAL));
        }
    }

    @Test
    void scaledModifiedAgreesWithFortyDigits() throws IOException {
        for (Case c : cases("I")) {
            double tolerance = 1e-14 * Math.abs(c.expected) + Double.MIN_NORMAL;
            assertThat(Bessel.scaledI(c.order, c.argument)).as("%s", c).isCloseTo(c.expected, within(tolerance));
        }
    }

    @Test
    void entireKernelAgreesWithFortyDigits() throws IOException {
        for (Case c : cases("G")) {
            double envelope = Math.pow(Math.max(1.0, Math.abs(c.argument)), -0.5 * c.order);
            double relative = c.argument < 2.0 * (c.order + 1) ? 2e-14 * Math.abs(c.expected) : 4e-15 * envelope;
            assertThat(EntireBessel.scaled(c.order, c.argument)).as("%s", c).isCloseTo(c.expected, within(relative));
        }
    }

    @Test
    void errorMapAgainstCommonsMathStaysUnderTheStatedBound() {
        double worst = 0.0;
        for (int order = 0; order <= 8; order++) {
            BesselJ other = new BesselJ(order);
            for (double x = 0.003; x < 130.0; x += 0.0173) {
                worst = Math.max(worst, Math.abs(Bessel.j(order, x) - other.value(x)));
            }
        }
        assertThat(worst).isLessThan(5e-15);
    }

    @Test
    void paritiesAreThoseOfTheDefinition() {
        assertThat(Bessel.j(-3, 2.5)).isEqualTo(-Bessel.j(3, 2.5));
        assertThat(Bessel.j(3, -2.5)).isEqualTo(-Bessel.j(3, 2.5));
        assertThat(Bessel.j(-3, -2.5)).isEqualTo(Bessel.j(3, 2.5));
        assertThat(Bessel.scaledI(-3, 2.5)).isEqualTo(Bessel.scaledI(3, 2.5));
        assertThat(Bessel.scaledI(3, -2.5)).isEqualTo(-Bessel.scaledI(3, 2.5));
    }

    @Test
    void neighbouringCellsMeet() {
        for (int order = 0; order <= Bessel.TABLE_ORDER; order++) {
            for (double edge = 0.5; edge <= Bessel.TABLE_END; edge += 0.5) {
                double below = Bessel.j(order, Math.nextDown(edge));
                assertThat(Bessel.j(order, edge)).isCloseTo(below, within(4e-15));
            }
        }
    }
}
