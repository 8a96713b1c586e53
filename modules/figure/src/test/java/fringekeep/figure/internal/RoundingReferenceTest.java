package fringekeep.figure.internal;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonObject;
import java.math.BigDecimal;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Values with their printed forms: CODATA 2018 (E. Tiesinga et al., Rev. Mod. Phys. 93, 025010 (2021), table XXXI) and the
 * example m_S = 100.02147 g, u = 0.35 mg of JCGM 100:2008, 7.2.2.
 */
class RoundingReferenceTest {
    private static JsonObject rule(String sort, int digits) {
        return JsonObject.EMPTY.with("sort", sort).with("digits", digits);
    }

    @ParameterizedTest
    @CsvSource({
        "8.8541878128e-12, 0.0000000013e-12, 8.8541878128(13) \u00d7 10^-12",
        "1.66053906660e-27, 0.00000000050e-27, 1.66053906660(50) \u00d7 10^-27",
        "9.1093837015e-31, 0.0000000028e-31, 9.1093837015(28) \u00d7 10^-31",
        "100.02147, 0.00035, 100.02147(35)",
        "100.02147, 0.00035, 100.02147 \u00b1 0.00035"
    })
    void twoDigitsOfTheUncertaintyGiveThePublishedForm(double value, double u, String printed) {
        Rounding.Printed rounded = Rounding.round(rule("uncertainty-digits", 2), value, OptionalDouble.of(u))
                .orElseThrow();
        Rounding.Printed read = Rounding.read(printed).orElseThrow();

        assertThat(rounded.value()).isEqualByComparingTo(read.value());
        assertThat(rounded.deviation().orElseThrow())
                .isEqualByComparingTo(read.deviation().orElseThrow());
    }

    @Test
    void anUncertaintyThatRoundsUpToATenLosesADecimal() {
        Rounding.Printed rounded = Rounding.round(rule("uncertainty-digits", 2), 12.3456, OptionalDouble.of(0.0996))
                .orElseThrow();

        assertThat(rounded.value()).isEqualByComparingTo("12.35");
        assertThat(rounded.deviation().orElseThrow()).isEqualByComparingTo("0.10");
    }

    @Test
    void decimalsAreHalfToEven() {
        assertThat(Rounding.round(rule("decimals", 1), 0.25, OptionalDouble.empty())
                        .orElseThrow()
                        .value())
                .isEqualByComparingTo("0.2");
        assertThat(Rounding.round(rule("decimals", 1), 0.75, OptionalDouble.empty())
                        .orElseThrow()
                        .value())
                .isEqualByComparingTo("0.8");
    }

    @Test
    void aRuleByUncertaintyNeedsOne() {
        assertThat(Rounding.round(rule("uncertainty-digits", 2), 1, OptionalDouble.empty()))
                .isEmpty();
    }

    @Test
    void readsTrueMinusAndThinSpaces() {
        assertThat(Rounding.read("\u221212\u2009345.6(7)").orElseThrow().value())
                .isEqualByComparingTo(new BigDecimal("-12345.6"));
    }

    @Test
    void wordsAreNoNumber() {
        assertThat(Rounding.read("about 12")).isEmpty();
        assertThat(Rounding.read("")).isEmpty();
    }
}
