package fringekeep.archive.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Conversions against published values and against the JDK's correctly rounding reader of decimals. */
class ConversionReferenceTest {
    /** SI Brochure, 9th edition (BIPM 2019), tables 4 to 8; CODATA 2018 for eV and u; degree: pi/180 rounded to a double. */
    @ParameterizedTest
    @CsvSource({
        "eV, 1.602176634e-19",
        "u, 1.66053906660e-27",
        "bar, 1e5",
        "mbar, 100",
        "hPa, 100",
        "atm, 101325",
        "Ao, 1e-10",
        "min, 60",
        "h, 3600",
        "d, 86400",
        "deg, 0.017453292519943295",
        "mT, 0.001",
        "kV/cm, 100000",
        "cm2, 0.0001",
        "nm2, 1e-18",
        "Ao3, 1e-30",
        "g/mol, 0.001",
        "kg, 1",
        "MHz, 1e6",
        "meV, 1.602176634e-22"
    })
    void oneOfAUnitInSi(String unit, double si) {
        assertThat(Units.of(unit).toSi(BigDecimal.ONE)).isEqualTo(si);
    }

    /** Triple point of water, 0.01 °C = 273.16 K by the definition in force until 2019. */
    @Test
    void degreesCelsiusHaveTheirOffset() {
        assertThat(Units.of("Cel").toSi(new BigDecimal("0.01"))).isEqualTo(273.16);
        assertThat(Units.of("Cel").toSi(new BigDecimal("-273.15"))).isZero();
        assertThat(Units.of("Cel").fromSi(293.25 + 1.0 / 64)).isEqualTo(20.1 + 1.0 / 64, within(1e-13));
    }

    /** Record format 1, section 1: the 9,000 values 100.0 to 999.9 nm, each to be the nearest double. */
    @Test
    void everyTenthOfANanometreIsTheNearestDouble() {
        Unit nanometre = Units.of("nm");
        int productsThatDiffer = 0;
        for (int tenths = 1000; tenths <= 9999; tenths++) {
            String text = tenths / 10 + "." + tenths % 10;
            double nearest = Double.parseDouble(text + "e-9");
            assertThat(nanometre.toSi(new BigDecimal(text))).isEqualTo(nearest);
            productsThatDiffer += Double.parseDouble(text) * 1e-9 == nearest ? 0 : 1;
        }

        assertThat(productsThatDiffer).isEqualTo(3_843);
    }

    /** {@code Double.parseDouble} rounds correctly; fractions over powers of ten must agree with it, subnormals too. */
    @Test
    void fractionsAreRoundedAsTheJdkReadsDecimals() {
        Random random = new Random(20_310_514);
        for (int i = 0; i < 200_000; i++) {
            String text = (random.nextBoolean() ? "-" : "") + random.nextLong(1, Long.MAX_VALUE) + "e"
                    + random.nextInt(-345, 290);
            assertThat(Rational.of(new BigDecimal(text)).toDouble()).as(text).isEqualTo(Double.parseDouble(text) + 0.0);
        }
    }

    @Test
    void tiesGoToTheEvenNeighbourAlsoBelowTheNormalRange() {
        assertThat(Rational.of("9007199254740993").toDouble()).isEqualTo(9007199254740992.0);
        assertThat(Rational.of("9007199254740995").toDouble()).isEqualTo(9007199254740996.0);
        assertThat(Rational.of(new BigDecimal(Double.MIN_VALUE).divide(BigDecimal.valueOf(2)))
                        .toDouble())
                .isZero();
        assertThat(Rational.of(new BigDecimal(Double.MIN_VALUE).multiply(new BigDecimal("1.5")))
                        .toDouble())
                .isEqualTo(2 * Double.MIN_VALUE);
    }
}
