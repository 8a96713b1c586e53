package fringekeep.drawing;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NumberTextTest {
    // Concise form with the uncertainty in brackets: JCGM 100:2008 (GUM), 7.2.2; two digits are our house rule.
    @ParameterizedTest
    @CsvSource({
        "0.21134, 0.00921, 0.2113(92)",
        "769.41, 5.08, 769.4(5.1)",
        "-95.62, 7.13, \u221295.6(7.1)",
        "842, 15, 842(15)",
        "2.1e-6, 2.1e-7, 2.10(21) \u00D7 10\u207B\u2076",
        "4500, 23, 4500(23)",
        "7.3, 0, 7.3",
        "12345678, 120, 1.234568(12) \u00D7 10\u2077",
        "0, 0.0102, 0.000(10)",
        "10234.5, 99.6, 10\u2009230(100)"
    })
    void writesTwoDigitsOfUncertainty(double value, double deviation, String text) {
        assertThat(NumberText.measured(value, deviation)).isEqualTo(text);
    }

    @Test
    void fullDigitsReadBackAsTheSameDouble() {
        double[] hard = {1e23, 0.1, 2.0 / 3, 4.9e-324, 1.7976931348623157e308, -2.5e-7, 123456789.125};
        for (double value : hard) {
            assertThat(Double.parseDouble(NumberText.full(value))).isEqualTo(value);
        }
        // 1E+23 is the shortest decimal of that double; JDK 17's own writer gives 9.999999999999999E22.
        assertThat(NumberText.full(1e23)).isEqualTo("1E+23");
    }

    @Test
    void groupsThousandsByThinSpacesFromFiveDigitsOn() {
        assertThat(NumberText.count(1181204)).isEqualTo("1\u2009181\u2009204");
        assertThat(NumberText.count(4500)).isEqualTo("4500");
    }
}
