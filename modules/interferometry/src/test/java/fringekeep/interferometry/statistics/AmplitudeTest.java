package fringekeep.interferometry.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class AmplitudeTest {
    /** The Rice density by its definition, with the Bessel function from Bessel's integral. */
    private static double density(double r, double v) {
        double integral =
                GaussLegendre.integrate(t -> Math.exp(r * v * Math.cos(t) - 0.5 * (r * r + v * v)), 0, Math.PI, 12)
                        / Math.PI;
        return r * integral;
    }

    @Test
    void distributionFunctionIsTheIntegralOfTheDensity() {
        for (double v : new double[] {0, 0.3, 1, 2.5, 6, 12}) {
            for (double r : new double[] {0.1, 0.8, 2, 4, 7, 13}) {
                double integral = GaussLegendre.integrate(x -> density(x, v), 0, r, 40);
                assertThat(RiceDistribution.cumulative(r, v)).as(r + ", " + v).isCloseTo(integral, within(1e-12));
            }
        }
    }

    @Test
    void meanIsTheIntegralOverTheDensityAtSmallAndLargeValues() {
        for (double v : new double[] {0, 0.5, 3, 10.9, 11, 12}) {
            double integral = GaussLegendre.integrate(x -> x * density(x, v), Math.max(0, v - 14), v + 14, 60);
            assertThat(RiceDistribution.mean(v)).as("v " + v).isCloseTo(integral, within(1e-11 * integral));
        }
    }

    @Test
    void largeArgumentsJoinTheNormalLaw() {
        assertThat(RiceDistribution.cumulative(9999.5, 9999))
                .isCloseTo(Distributions.normal(0.5 - 0.5 / 9999), within(1e-7));
        assertThat(RiceDistribution.cumulative(20001, 20000)).isCloseTo(Distributions.normal(1), within(1e-5));
        assertThat(RiceDistribution.cumulative(200, 1)).isEqualTo(1);
    }

    @Test
    void quantileInvertsTheDistribution() {
        for (double v : new double[] {0, 0.4, 2, 9}) {
            for (double p : new double[] {0.01, 0.3, 0.6827, 0.95}) {
                assertThat(RiceDistribution.cumulative(RiceDistribution.quantile(p, v), v))
                        .isCloseTo(p, within(1e-11));
            }
        }
    }

    @Test
    void unifiedIntervalCoversAtZeroAndEverywhere() {
        Random random = new Random(3);
        for (double v : new double[] {0, 0.5, 1, 1.5, 2.5, 5, 20}) {
            int covered = 0;
            int scans = 4000;
            for (int k = 0; k < scans; k++) {
                double x = v + random.nextGaussian();
                double y = random.nextGaussian();
                double r = Math.sqrt(x * x + y * y);
                covered +=
                        AmplitudeLimits.acceptedLow(v, 0.9) <= r && r <= AmplitudeLimits.acceptedHigh(v, 0.9) ? 1 : 0;
            }
            assertThat(covered / (double) scans).as("v " + v).isBetween(0.9 - 0.0145, 0.9 + 0.0145);
        }
    }

    @Test
    void unifiedIntervalIsWhereItsBandsAcceptTheLength() {
        for (double r : new double[] {0.2, 1, 2, 3, 8}) {
            Interval interval = AmplitudeLimits.unifiedInterval(0.1 * r, 0.1, 0.9);
            double high = interval.high() / 0.1;
            assertThat(AmplitudeLimits.acceptedLow(high - 1e-6, 0.9)).isLessThanOrEqualTo(r + 1e-9);
            assertThat(AmplitudeLimits.acceptedLow(high + 0.05, 0.9)).isGreaterThan(r);
            if (interval.low() > 0) {
                assertThat(AmplitudeLimits.acceptedHigh(interval.low() / 0.1, 0.9))
                        .isCloseTo(r, within(1e-7));
            }
        }
    }

    @Test
    void bandsJoinSmoothlyFarFromZero() {
        assertThat(AmplitudeLimits.acceptedLow(11.99, 0.6827))
                .isCloseTo(AmplitudeLimits.acceptedLow(12.0, 0.6827) - 0.01, within(2e-3));
        assertThat(AmplitudeLimits.acceptedHigh(11.99, 0.9545))
                .isCloseTo(AmplitudeLimits.acceptedHigh(12.0, 0.9545) - 0.01, within(4e-3));
    }

    @Test
    void impossibleQuestionsAreRefused() {
        assertThatThrownBy(() -> AmplitudeLimits.threshold(0, 0.95)).isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> AmplitudeLimits.classicalUpperLimit(0.1, 0.1, 1))
                .isInstanceOf(IllegalArgumentException.class);
    }
}
