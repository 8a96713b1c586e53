package fringekeep.interferometry.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Summary statistics against the NIST univariate sets; see src/test/reference/nist-univariate/ORIGIN.txt. */
class NistUnivariateReferenceTest {
    private static final Path SETS = Path.of("src/test/reference/nist-univariate");

    private static double certified(List<String> lines, String names) {
        Pattern pattern = Pattern.compile("^\\s*(?:" + names + ").*?[=:]\\s*(-?[0-9.]+(?:[eE][-+]?[0-9]+)?)\\s*$");
        return lines.stream()
                .map(pattern::matcher)
                .filter(Matcher::find)
                .map(found -> Double.parseDouble(found.group(1)))
                .findFirst()
                .orElseThrow();
    }

    private static double[] values(List<String> lines) {
        int start = 0;
        for (int k = 0; k < lines.size(); k++) {
            String line = lines.get(k).strip();
            start = line.startsWith("Data: Y") || line.equals("# Data") ? k : start;
        }
        return lines.subList(start + 1, lines.size()).stream()
                .map(String::strip)
                .filter(line -> line.matches("-?[0-9.]+"))
                .mapToDouble(Double::parseDouble)
                .toArray();
    }

    private static double digits(double found, double certified) {
        return -StrictMath.log10(Math.max(Math.abs(found / certified - 1), 1e-16));
    }

    /**
     * 15 digits are certified. NumAcc3 and 4 hold 1000000.1 and 10000000.1, which doubles cannot: their own rounding costs the
     * standard deviation 6 and 7 of 16 digits, and that is all it costs.
     */
    @ParameterizedTest
    @CsvSource({
        "Lew, 200, 14",
        "Lottery, 218, 14",
        "Mavro, 50, 12",
        "Michelso, 100, 13",
        "NumAcc1, 3, 15",
        "NumAcc2, 1001, 14",
        "NumAcc3, 1001, 9",
        "NumAcc4, 1001, 8",
        "PiDigits, 5000, 14"
    })
    void meanDeviationAndAutocorrelationAreTheCertifiedOnes(String name, int size, double wanted) throws IOException {
        List<String> lines = Files.readAllLines(SETS.resolve(name + ".txt"));

        SampleSummary summary = SampleSummary.of(values(lines));

        assertThat(summary.size()).isEqualTo(size);
        assertThat(digits(summary.mean(), certified(lines, "mean|Sample Mean"))).isGreaterThan(14);
        assertThat(digits(summary.standardDeviation(), certified(lines, "standardDeviation|Sample Standard Deviation")))
                .isGreaterThan(wanted - 0.5);
        assertThat(digits(
                        summary.autocorrelation(),
                        certified(lines, "autocorrelationCoefficient|Sample Autocorrelation Coefficient")))
                .isGreaterThan(Math.min(wanted, 13) - 0.5);
    }

    @Test
    void equalValuesHaveNoAutocorrelation() {
        SampleSummary summary = SampleSummary.of(new double[] {0.1, 0.1, 0.1});

        assertThat(summary.standardDeviation()).isZero();
        assertThat(summary.autocorrelation()).isNaN();
        assertThat(SampleSummary.of(new double[] {1, 3}).uncertaintyOfMean()).isCloseTo(1, within(1e-15));
    }

    @Test
    void oneValueOrOneThatIsNoNumberIsRefused() {
        assertThatThrownBy(() -> SampleSummary.of(new double[] {1})).hasMessageContaining("at least 2");
        assertThatThrownBy(() -> SampleSummary.of(new double[] {1, Double.NaN})).hasMessageContaining("value 1");
    }
}
