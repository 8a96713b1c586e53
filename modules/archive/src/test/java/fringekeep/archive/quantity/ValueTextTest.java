package fringekeep.archive.quantity;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ValueTextTest {
    /**
     * First line: JCGM 100:2008, 7.2.2, example 2. Second: CODATA 2018, Newtonian constant of gravitation. The others follow
     * the rule of two digits by hand.
     */
    @ParameterizedTest
    @CsvSource({
        "100.02147, 0.00035, 100.02147(35)",
        "6.67430e-11, 0.00015e-11, 6.67430(15)×10⁻¹¹",
        "0.21134, 0.0092, 0.2113(92)",
        "-0.21134, 0.0092, −0.2113(92)",
        "12.345, 1.06, 12.3(1.1)",
        "1234567.8, 450, 1234570(450)",
        "8.7e-40, 1.2e-41, 8.70(12)×10⁻⁴⁰",
        "0.5, 3, 0.5(3.0)",
        "5, 0.0995, 5.00(10)",
        "100, 12, 100(12)"
    })
    void twoDigitsOfTheUncertaintyStandInBrackets(double value, double deviation, String text) {
        assertThat(ValueText.estimate(value, deviation).replace("\u2009", "")).isEqualTo(text);
    }

    @Test
    void exactAndNotStatedStandInThePlaceOfTheUncertainty() {
        assertThat(ValueText.estimate(0.25, 0)).isEqualTo("0.25 exact");
        assertThat(ValueText.estimate(0.25, Double.NaN)).isEqualTo("0.25 not stated");
        assertThat(ValueText.below(2.14)).isEqualTo("< 2.1");
        assertThat(ValueText.below(0)).isEqualTo("< 0.0");
    }

    @Test
    void thousandsAreKeptApartByThinSpaces() {
        assertThat(ValueText.count(1234567)).isEqualTo("1\u2009234\u2009567");
        assertThat(ValueText.count(-12345)).isEqualTo("−12\u2009345");
        assertThat(ValueText.count(1234)).isEqualTo("1234");
    }

    @Test
    void estimatesAreShownInAnotherUnit() {
        assertThat(ValueText.estimate(2.66e-7, 1e-10, Units.of("nm"))).isEqualTo("266.00(10)");
    }

    @Test
    void enteredQuantitiesAreShownAsTyped() throws Exception {
        assertThat(ValueText.entered(QuantityText.parse("10,50(5) mm"))).isEqualTo("10.50(5) mm");
        assertThat(ValueText.entered(QuantityText.parse("-5 ± 0.25 um"))).isEqualTo("−5 ± 0.25 µm");
        assertThat(ValueText.entered(QuantityText.parse("1 s exact"))).isEqualTo("1 s exact");
        assertThat(ValueText.entered(QuantityText.parse("3 Ao3"))).isEqualTo("3 Å³ not stated");
    }

    @Test
    void numbersWithoutUncertaintyHaveSixDigitsAtMost() {
        assertThat(ValueText.number(0)).isEqualTo("0");
        assertThat(ValueText.number(1.0 / 3)).isEqualTo("0.333333");
        assertThat(ValueText.number(-1234.5)).isEqualTo("−1234.5");
        assertThat(ValueText.number(1.5e-9)).isEqualTo("1.5×10⁻⁹");
        assertThat(ValueText.number(1e22)).isEqualTo("1×10²²");
    }

    @Test
    void thePlaceOfTheDecimalSignIsTold() {
        assertThat(ValueText.pointPlace("−12.5(3)")).isEqualTo(3);
        assertThat(ValueText.pointPlace("12(3)")).isEqualTo(2);
    }
}
