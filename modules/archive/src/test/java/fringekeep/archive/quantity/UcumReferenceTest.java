package fringekeep.archive.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.InputStream;
import java.math.BigDecimal;
import java.util.Objects;
import org.fhir.ucum.Decimal;
import org.fhir.ucum.UcumEssenceService;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Conversions against an outside UCUM library (org.fhir:ucum 1.0.8 with the UCUM essence file it carries). Units whose
 * value that file takes from other years (eV, u, mol) are judged elsewhere.
 */
class UcumReferenceTest {
    private static UcumEssenceService judge;

    @BeforeAll
    static void load() throws Exception {
        try (InputStream essence =
                Objects.requireNonNull(UcumEssenceService.class.getResourceAsStream("/ucum-essence.xml"))) {
            judge = new UcumEssenceService(essence);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "nm, m",
        "um, m",
        "mm, m",
        "cm, m",
        "pm, m",
        "Ao, m",
        "km, m",
        "ns, s",
        "us, s",
        "ms, s",
        "min, s",
        "h, s",
        "d, s",
        "g, kg",
        "ug, kg",
        "mK, K",
        "Pa, kg.m-1.s-2",
        "hPa, kg.m-1.s-2",
        "mbar, kg.m-1.s-2",
        "bar, kg.m-1.s-2",
        "atm, kg.m-1.s-2",
        "mW, kg.m2.s-3",
        "W, kg.m2.s-3",
        "mJ, kg.m2.s-2",
        "kHz, s-1",
        "MHz, s-1",
        "cm2, m2",
        "nm2, m2",
        "Ao3, m3",
        "cm3, m3",
        "m/s2, m.s-2",
        "km/h, m.s-1",
        "ml, m3",
        "W/cm2, kg.s-3",
        "N/m, kg.s-2",
        "1/s, s-1",
        "/s, s-1",
        "l/min, m3.s-1"
    })
    void aUnitIsWorthWhatTheJudgeSays(String unit, String si) throws Exception {
        double judged =
                Double.parseDouble(judge.convert(new Decimal("1"), unit, si).asDecimal());

        assertThat(Units.of(unit).toSi(BigDecimal.ONE)).isEqualTo(judged, within(1e-14 * judged));
        assertThat(Units.of(unit).sameDimension(Units.of(si))).isTrue();
        assertThat(Units.of(unit).siCode()).isEqualTo(Units.of(si).siCode());
    }

    @ParameterizedTest
    @CsvSource({"m, s", "Pa, N", "W, J", "m2, m3", "kg, m", "Hz, s", "J, K"})
    void whatTheJudgeCannotCompareWeDoNotEither(String one, String other) throws Exception {
        assertThat(judge.isComparable(one, other)).isFalse();
        assertThat(Units.of(one).sameDimension(Units.of(other))).isFalse();
    }

    @Test
    void codesOfOursAreCodesOfUcum() {
        for (String code : new String[] {
            "kV/cm",
            "V/m",
            "C.m2/V",
            "mT",
            "{count}/s",
            "{shot}",
            "%",
            "deg",
            "mrad",
            "Cel",
            "eV",
            "u",
            "g/mol",
            "mbar",
            "[ppm]",
            "uA",
            "nF",
            "kOhm",
            "Ao3",
            "m/s2"
        }) {
            assertThat(judge.validate(code)).as(code).isNull();
            assertThat(Units.of(code).code()).isEqualTo(code);
        }
    }
}
