package fringekeep.interferometry.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** Values from Abramowitz and Stegun, Handbook of Mathematical Functions, tables 26.1 and 26.8, and closed forms. */
class DistributionsReferenceTest {
    @Test
    void normalLaw() {
        assertThat(Distributions.normal(1)).isCloseTo(0.841344746068543, within(1e-15));
        assertThat(Distributions.normal(-2)).isCloseTo(0.022750131948179, within(1e-15));
        assertThat(Distributions.normalQuantile(0.975)).isCloseTo(1.959963984540054, within(1e-12));
        assertThat(Distributions.twoSidedDeviate(0.6826894921370859)).isCloseTo(1, within(1e-12));
        assertThat(Distributions.twoSidedDeviate(0.9544997361036416)).isCloseTo(2, within(1e-12));
        // Abramowitz and Stegun, table 26.6: Q(x) = 10^-m.
        assertThat(-Distributions.normalQuantile(1e-10)).isCloseTo(6.36134, within(1e-5));
        assertThat(-Distributions.normalQuantile(1e-100)).isCloseTo(21.27345, within(1e-5));
        assertThatThrownBy(() -> Distributions.normalQuantile(1)).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void chiSquare() {
        // Table 26.8: the 5 % points of 1, 10 and 30 degrees of freedom.
        assertThat(Distributions.chiSquareUpper(3.84146, 1)).isCloseTo(0.05, within(1e-6));
        assertThat(Distributions.chiSquareUpper(18.3070, 10)).isCloseTo(0.05, within(1e-6));
        assertThat(Distributions.chiSquareUpper(43.7729, 30)).isCloseTo(0.05, within(1e-6));
        assertThat(Distributions.chiSquareUpper(7, 2)).isCloseTo(Math.exp(-3.5), within(1e-15));
        assertThat(Distributions.chiSquareUpper(0, 3)).isEqualTo(1);
    }

    @Test
    void poissonTailsAreSumsOfTerms() {
        double term = Math.exp(-3.7);
        double sum = 0;
        for (int n = 0; n < 12; n++) {
            sum += term;
            assertThat(Distributions.poissonAtMost(3.7, n)).isCloseTo(sum, within(1e-14));
            assertThat(Distributions.poissonAbove(3.7, n)).isCloseTo(1 - sum, within(1e-14));
            term *= 3.7 / (n + 1);
        }
        assertThat(Distributions.poissonAbove(0, 0)).isZero();
    }

    @Test
    void devianceMomentsJoinTheirSeries() {
        double[] below = PoissonDeviance.moments(149.9);
        double[] above = PoissonDeviance.moments(150.1);
        assertThat(below[0]).isCloseTo(above[0], within(2e-5));
        assertThat(below[1]).isCloseTo(above[1], within(2e-4));
        assertThat(below[2]).isCloseTo(above[2], within(1e-4));
        double[] small = PoissonDeviance.moments(0.01);
        // To first order in the mean: no count leaves 2 mu, one count leaves -2 ln mu - 2 with probability mu.
        double one = 2 * (0.01 - 1 - Math.log(0.01));
        assertThat(small[0]).isCloseTo(Math.exp(-0.01) * (0.02 + 0.01 * one), within(1e-3));
    }

    @Test
    void devianceKeepsItsDigitsNearZero() {
        // d = (n - mu)^2 / mu to first order; the closed form in plain logarithms would lose all digits here.
        double count = 1e12;
        double mean = 1e12 + 1000;
        assertThat(PoissonDeviance.term(count, mean)).isCloseTo(1e-6, within(1e-11));
        assertThat(PoissonDeviance.term(0, 3)).isEqualTo(6);
        assertThat(PoissonDeviance.term(2, 0)).isEqualTo(Double.POSITIVE_INFINITY);
    }

    @Test
    void runsAreCountedByEnumeration() {
        double[] values = {1, 1, -1, -1, -1, 1, -1};
        RunsTest test = RunsTest.of(values);
        // All 35 orders of 3 and 4 signs, those with at most 4 runs counted by hand-written enumeration.
        int atMost = 0;
        for (int mask = 0; mask < 128; mask++) {
            if (Integer.bitCount(mask) == 3) {
                int runs = 1 + Integer.bitCount((mask ^ mask >> 1) & 63);
                atMost += runs <= test.runs() ? 1 : 0;
            }
        }
        assertThat(test.runs()).isEqualTo(4);
        assertThat(test.pValue()).isCloseTo(atMost / 35.0, within(1e-12));
        assertThat(RunsTest.of(new double[] {1, 2, 3}).pValue()).isEqualTo(1);
    }

    @Test
    void smallMatrices() {
        double[] hilbert = {1, 1 / 2.0, 1 / 3.0, 1 / 3.0, 1 / 4.0, 1 / 5.0};
        assertThat(SymmetricMatrix.factor(hilbert, 3, 1e-14)).isTrue();
        double[] inverse = SymmetricMatrix.inverse(hilbert, 3);
        // Known integer inverse of the Hilbert matrix of order 3.
        assertThat(inverse).containsExactly(new double[] {9, -36, 192, 30, -180, 180}, within(1e-10));
        double[] singular = {1, 2, 4};
        assertThat(SymmetricMatrix.factor(singular, 2, 1e-14)).isFalse();
    }

    @Test
    void rootsAndMinima() {
        assertThat(ScalarSearch.root(x -> x * x * x - 2, 0, 2, 1e-14)).isCloseTo(Math.cbrt(2), within(1e-13));
        assertThat(ScalarSearch.root(x -> Math.exp(50 * x) - 1e9, -1, 2, 1e-14))
                .isCloseTo(Math.log(1e9) / 50, within(1e-12));
        assertThat(ScalarSearch.minimum(x -> (x - 0.3) * (x - 0.3), -1, 2, 1e-9))
                .isCloseTo(0.3, within(1e-7));
        assertThatThrownBy(() -> ScalarSearch.root(x -> 1, 0, 1, 1e-9)).isInstanceOf(IllegalArgumentException.class);
    }
}
