package fringekeep.drawing;

import static org.assertj.core.api.Assertions.assertThat;

import net.jqwik.api.Assume;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.junit.jupiter.api.Test;

class TicksTest {
    private static double room(String label) {
        return Lettering.width(label, Measures.SCREEN.smallFont()) + 10;
    }

    @Property(tries = 300)
    void labelsNeverOverlapAndTicksLieOnTheAxis(
            @ForAll @DoubleRange(min = -1e6, max = 1e6) double from,
            @ForAll @DoubleRange(min = -9, max = 7) double decades,
            @ForAll @DoubleRange(min = 40, max = 1500) double length) {
        double span = StrictMath.pow(10, decades);
        Assume.that(from + span > from + 1e-3 * span);
        Scale scale = new Scale(from, from + span, false, 0, length);
        Ticks ticks = Ticks.of(scale, TicksTest::room);

        for (int i = 0; i + 1 < ticks.values().length; i++) {
            double apart = scale.place(ticks.values()[i + 1]) - scale.place(ticks.values()[i]);
            double half = (Lettering.width(ticks.labels().get(i), Measures.SCREEN.smallFont())
                            + Lettering.width(ticks.labels().get(i + 1), Measures.SCREEN.smallFont()))
                    / 2;
            assertThat(apart).isGreaterThanOrEqualTo(half);
        }
        assertThat(ticks.labels()).doesNotHaveDuplicates();
    }

    @Test
    void stepsAreRoundNumbersWithATrueMinus() {
        Ticks ticks = Ticks.of(new Scale(-1, 1, false, 0, 300), TicksTest::room);

        assertThat(ticks.labels()).contains("\u22120.5", "0.0", "0.5").doesNotContain("-0.5");
    }

    @Test
    void smallNumbersShareOnePowerOfTen() {
        Ticks ticks = Ticks.of(new Scale(0, 8e-7, false, 0, 400), TicksTest::room);

        assertThat(ticks.exponent()).isEqualTo(-9);
        assertThat(ticks.labels()).contains("0", "200", "400");
    }
}
