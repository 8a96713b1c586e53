package fringekeep.archive.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import fringekeep.archive.problem.ProblemException;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class QuantityTextTest {
    @Test
    void figuresInBracketsCountInTheLastDigits() throws Exception {
        Quantity period = QuantityText.parse("266.0(1) nm");

        assertThat(period).isEqualTo(new Quantity("266.0", "nm", 2.66e-7, new Uncertainty.Stated("0.1", 1e-10)));
    }

    @Test
    void aDecimalCommaIsUnderstood() throws Exception {
        Quantity length = QuantityText.parse("10,50(5) mm");

        assertThat(length).isEqualTo(new Quantity("10.50", "mm", 0.0105, new Uncertainty.Stated("0.05", 5e-5)));
    }

    @Test
    void plusMinusGivesTheUncertaintyInTheSameUnit() throws Exception {
        assertThat(QuantityText.parse("5 ± 0.1 V"))
                .isEqualTo(new Quantity("5", "V", 5, new Uncertainty.Stated("0.1", 0.1)));
        assertThat(QuantityText.parse("(5,0 +/- 0,1) kV"))
                .isEqualTo(new Quantity("5.0", "kV", 5000, new Uncertainty.Stated("0.1", 100)));
    }

    @Test
    void aPowerOfTenCountsForValueAndBrackets() throws Exception {
        Quantity expected = new Quantity("1.50e-3", "T", 0.0015, new Uncertainty.Stated("0.05e-3", 5e-5));

        assertThat(QuantityText.parse("1.50(5)e-3 T")).isEqualTo(expected);
        assertThat(QuantityText.parse("1,50(5)×10⁻³ T")).isEqualTo(expected);
    }

    @Test
    void exactAndNotStatedAreToldApart() throws Exception {
        assertThat(QuantityText.parse("1 s exact").uncertainty()).isEqualTo(new Uncertainty.Exact());
        assertThat(QuantityText.parse("900 K").uncertainty()).isEqualTo(new Uncertainty.Unstated());
    }

    @Test
    void bracketsWithTwoDotsGiveBounds() throws Exception {
        assertThat(QuantityText.parse("20 [18..25] °C"))
                .isEqualTo(new Quantity(
                        "20",
                        "Cel",
                        293.15,
                        new Uncertainty.Bounds(OptionalDouble.of(291.15), OptionalDouble.of(298.15))));
        assertThat(QuantityText.parse("3 [..4] mbar").uncertainty())
                .isEqualTo(new Uncertainty.Bounds(OptionalDouble.empty(), OptionalDouble.of(400)));
    }

    @Test
    void anUncertaintyInDegreesCelsiusHasNoOffset() throws Exception {
        assertThat(QuantityText.parse("20.0(5) Cel").uncertainty()).isEqualTo(new Uncertainty.Stated("0.5", 0.5));
    }

    @Test
    void aNumberWithoutUnitIsPure() throws Exception {
        assertThat(QuantityText.parse("0.35(2)"))
                .isEqualTo(new Quantity("0.35", "1", 0.35, new Uncertainty.Stated("0.02", 0.02)));
    }

    @ParameterizedTest
    @CsvSource({
        "532 nm, nm, 5.32e-7",
        "1064 µm, um, 0.001064",
        "3.5 Å, Ao, 3.5e-10",
        "7.3 W, W, 7.3",
        "12 %, %, 0.12",
        "100 counts/s, {count}/s, 100",
        "4 kV/cm, kV/cm, 400000",
        "720.66 g/mol, g/mol, 0.72066",
        "9.80665 m/s², m/s2, 9.80665",
        "1e-8 mbar, mbar, 1e-6",
        "-3.0 mrad, mrad, -0.003",
        "−3.0 mrad, mrad, -0.003",
        "1.5 h, h, 5400",
        "2 [ppm], [ppm], 0.000002",
        "8.854e-40 C.m2/V, C.m2/V, 8.854e-40",
        "90 Å³, Ao3, 9e-29"
    })
    void everydayWritingOfUnitsBecomesCodes(String typed, String unit, double si) throws Exception {
        Quantity quantity = QuantityText.parse(typed);

        assertThat(quantity.unit()).isEqualTo(unit);
        assertThat(quantity.si()).isEqualTo(si);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "", "nm", "5 furlong", "1.2.3 m", "5 ± V", "5(0) m", "5 ± 0 m", "5 m exact exact", "5(1) m exact",
                        "(5 m",
                "1e999 m", "5 m ± 1 m", "5 Cel/s", "NaN m", "--5 m", "5 [] m", "0x10 m", "5 V ± 1", "5 m/", "5 m//s",
                "5(1) [4..6] m", "1e3(1)e3 m"
            })
    void whatCannotBeReadIsRefusedWithAWayToMendIt(String typed) {
        assertThatThrownBy(() -> QuantityText.parse(typed))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).mend()).isNotBlank());
    }

    @Test
    void aCommaThatMayMeanAThousandIsAskedBack() {
        assertThatThrownBy(() -> QuantityText.parse("1,000 W"))
                .isInstanceOfSatisfying(
                        ProblemException.class,
                        e -> assertThat(e.problems().get(0).code()).isEqualTo("quantity.ambiguous"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {"10.50(5) mm", "900 K", "1 s exact", "5 ± 0.1 V", "1.50(5)e-3 T", "20 [18..25] Cel", "0.35"})
    void whatIsWrittenReadsBackEqual(String typed) throws Exception {
        Quantity quantity = QuantityText.parse(typed);

        assertThat(QuantityText.parse(QuantityText.write(quantity))).isEqualTo(quantity);
        assertThat(QuantityJson.read(QuantityJson.write(quantity))).isEqualTo(quantity);
    }

    @Test
    void aWrongSiValueAndAWrongDimensionAreFound() throws Exception {
        Quantity wrong = new Quantity("5", "mm", 5, new Uncertainty.Unstated());
        Quantity pressure = QuantityText.of("5", "Pa", Optional.of("1"));

        assertThat(QuantityJson.examine(wrong, Optional.of("m"), "/a"))
                .extracting(problem -> problem.code() + " " + problem.where())
                .containsExactly("quantity.si /a/si");
        assertThat(QuantityJson.examine(pressure, Optional.of("m"), "/a"))
                .extracting(problem -> problem.code() + " " + problem.where())
                .containsExactly("quantity.dimension /a/unit");
        assertThat(QuantityJson.examine(pressure, Optional.of("N/m2"), "/a")).isEmpty();
    }
}
