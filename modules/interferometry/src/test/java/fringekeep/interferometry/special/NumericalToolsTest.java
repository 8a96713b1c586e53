package fringekeep.interferometry.special;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.math3.analysis.integration.gauss.HermiteRuleFactory;
import org.apache.commons.math3.analysis.integration.gauss.LegendreRuleFactory;
import org.apache.commons.math3.util.Pair;
import org.junit.jupiter.api.Test;

/** Gauss rules, sinc, kernels and the generator against closed forms and other libraries. */
class NumericalToolsTest {
    @Test
    void legendreRulesEqualTheOtherLibrarys() {
        for (int points : new int[] {1, 2, 3, 7, 24, 40}) {
            Pair<double[], double[]> other = new LegendreRuleFactory().getRule(points);
            GaussRule ours = GaussRule.legendre(points);
            assertThat(ours.nodes()).containsExactly(other.getFirst(), within(4e-15));
            assertThat(ours.weights()).containsExactly(other.getSecond(), within(1e-13));
        }
    }

    @Test
    void hermiteRulesEqualTheOtherLibrarys() {
        for (int points : new int[] {1, 2, 5, 16, 30}) {
            Pair<double[], double[]> other = new HermiteRuleFactory().getRule(points);
            GaussRule ours = GaussRule.hermite(points);
            assertThat(ours.nodes()).containsExactly(other.getFirst(), within(1e-12));
            assertThat(ours.weights()).containsExactly(other.getSecond(), within(1e-12));
        }
    }

    @Test
    void largeRulesIntegrateTheGaussianMomentsExactly() {
        GaussRule rule = GaussRule.hermite(200);
        double[] x = rule.nodes();
        double[] w = rule.weights();
        double zeroth = 0.0;
        double fourth = 0.0;
        for (int k = 0; k < x.length; k++) {
            zeroth += w[k];
            fourth += w[k] * x[k] * x[k] * x[k] * x[k];
        }

        assertThat(zeroth).isCloseTo(Math.sqrt(Math.PI), within(1e-13));
        assertThat(fourth).isCloseTo(0.75 * Math.sqrt(Math.PI), within(1e-12));
    }

    @Test
    void integratesACosineAsTheOtherLibraryDoes() {
        double other = new GaussIntegratorFactory().legendre(20, 0.0, 3.0).integrate(Math::cos);
        GaussRule rule = GaussRule.legendre(20);
        double sum = 0.0;
        for (int k = 0; k < 20; k++) {
            sum += 1.5 * rule.weights()[k] * Math.cos(1.5 * (1.0 + rule.nodes()[k]));
        }

        assertThat(sum).isCloseTo(other, within(1e-14)).isCloseTo(Math.sin(3.0), within(1e-14));
    }

    @Test
    void sincAndItsDerivativeMatchTheDefinition() {
        for (double x = 0.05; x < 40.0; x += 0.0371) {
            assertThat(Sinc.of(x)).isCloseTo(Math.sin(x) / x, within(3e-16));
            double direct = Math.cos(x) / x - Math.sin(x) / (x * x);
            assertThat(Sinc.derivative(x)).isCloseTo(direct, within(1e-13));
        }
        assertThat(Sinc.of(0.0)).isEqualTo(1.0);
        assertThat(Sinc.of(1e-3)).isCloseTo(1.0 - 1e-6 / 6.0 + 1e-12 / 120.0, within(1e-16));
        assertThat(Sinc.derivative(0.3)).isCloseTo(-0.3 / 3.0 + 0.027 / 30.0 + seriesTail(0.3), within(1e-15));
        assertThat(Sinc.ofHalfTurns(7.0)).isEqualTo(0.0);
    }

    /** Terms of sum (-1)^k 2k x^(2k-1)/(2k+1)! from the third on. */
    private static double seriesTail(double x) {
        return -6 * Math.pow(x, 5) / 5040
                + 8 * Math.pow(x, 7) / 362880
                - 10 * Math.pow(x, 9) / 39916800
                + 12 * Math.pow(x, 11) / 6227020800.0;
    }

    @Test
    void halfTurnsAreExactAtTheirZeros() {
        assertThat(HalfTurn.sin(12345.0)).isZero();
        assertThat(HalfTurn.cos(1234.5)).isZero();
        assertThat(HalfTurn.sin(2.0 + 1e-9)).isCloseTo(Math.PI * ((2.0 + 1e-9) - 2.0), within(1e-24));
        for (double x = -3.0; x < 3.0; x += 0.0173) {
            assertThat(HalfTurn.sin(x)).isCloseTo(Math.sin(Math.PI * x), within(1.5e-15));
            assertThat(HalfTurn.cos(x)).isCloseTo(Math.cos(Math.PI * x), within(1.5e-15));
        }
    }

    @Test
    void lightGratingKernelEqualsItsFourierIntegral() {
        double[] amplitudes = {-6.0, -1.3, -0.4, 0.0, 0.4, 1.3, 6.0};
        for (double a : amplitudes) {
            for (double c : amplitudes) {
                for (int n = -3; n <= 3; n++) {
                    double direct = fourier(n, a, c, -Math.abs(a));
                    assertThat(CosineSineKernel.coefficient(n, a, c, -Math.abs(a)))
                            .as("n=%d a=%s c=%s", n, a, c)
                            .isCloseTo(direct, within(1e-14));
                }
            }
        }
    }

    /** Periodic trapezoid rule, exact to rounding for entire periodic integrands. */
    private static double fourier(int n, double a, double c, double scale) {
        int points = 256;
        double sum = 0.0;
        for (int k = 0; k < points; k++) {
            double angle = 2.0 * Math.PI * k / points;
            sum += Math.exp(a * Math.cos(angle) + scale) * Math.cos(c * Math.sin(angle) - n * angle);
        }
        return sum / points;
    }

    @Test
    void kernelDerivativesEqualDifferences() {
        double step = 1e-5;
        for (int n = -2; n <= 2; n++) {
            double byOdd = (CosineSineKernel.coefficient(n, 0.7, 1.9 + step, -0.7)
                            - CosineSineKernel.coefficient(n, 0.7, 1.9 - step, -0.7))
                    / (2 * step);
            double byEven = (CosineSineKernel.coefficient(n, 0.7 + step, 1.9, -0.7)
                            - CosineSineKernel.coefficient(n, 0.7 - step, 1.9, -0.7))
                    / (2 * step);
            assertThat(CosineSineKernel.derivativeByOdd(n, 0.7, 1.9, -0.7)).isCloseTo(byOdd, within(1e-9));
            assertThat(CosineSineKernel.derivativeByEven(n, 0.7, 1.9, -0.7)).isCloseTo(byEven, within(1e-9));
        }
    }

    @Test
    void largeAbsorptionNeitherOverflowsNorLosesDigits() {
        // DLMF 10.40.1: e^-z I_1(z) -> (1 - 3/(8z) - 15/(128 z^2)) / sqrt(2 pi z).
        double z = 5000.0;
        double expected = (1 - 3 / (8 * z) - 15 / (128 * z * z)) / Math.sqrt(2 * Math.PI * z);
        assertThat(CosineSineKernel.coefficient(1, -z, 0.0, -z)).isCloseTo(-expected, within(1e-12 * expected));
    }

    @Test
    void generatorGivesTheSequenceOfThePlatformsImplementationOfTheSameAlgorithm() {
        SplittableRandom other = new SplittableRandom(1234567L);
        SplitMix64 ours = new SplitMix64(1234567L);
        for (int k = 0; k < 1000; k++) {
            assertThat(ours.nextLong()).isEqualTo(other.nextLong());
        }
    }

    @Test
    void normalDeviatesHaveTheirMoments() {
        SplitMix64 random = new SplitMix64(7L);
        int count = 200_000;
        double mean = 0.0;
        double square = 0.0;
        double fourth = 0.0;
        for (int k = 0; k < count; k++) {
            double x = random.nextGaussian();
            mean += x / count;
            square += x * x / count;
            fourth += x * x * x * x / count;
        }

        assertThat(mean).isCloseTo(0.0, within(4.0 / Math.sqrt(count)));
        assertThat(square).isCloseTo(1.0, within(4.0 * Math.sqrt(2.0 / count)));
        assertThat(fourth).isCloseTo(3.0, within(4.0 * Math.sqrt(96.0 / count)));
    }

    @Test
    void refusesArgumentsOutsideItsDomain() {
        assertThatThrownBy(() -> Bessel.j(0, Double.NaN)).hasMessageContaining("finite");
        assertThatThrownBy(() -> EntireBessel.value(-1, 1.0)).hasMessageContaining("-1");
        assertThatThrownBy(() -> GaussRule.legendre(0)).hasMessageContaining("1 to 200");
        PiecewisePolynomial table = PiecewisePolynomial.of(Math::cos, 0.0, 0.5, 4);
        assertThatThrownBy(() -> table.value(2.1)).hasMessageContaining("outside");
        assertThat(table.value(1.3)).isCloseTo(Math.cos(1.3), within(2e-15));
        assertThat(table.derivative(1.3)).isCloseTo(-Math.sin(1.3), within(1e-12));
    }
}
