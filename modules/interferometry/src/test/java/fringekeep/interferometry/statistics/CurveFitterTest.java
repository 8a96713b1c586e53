package fringekeep.interferometry.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class CurveFitterTest {
    /** y = a (1 - exp(-b x)) at x = 1 to n. */
    private record Saturation(int points) implements ParametricModel {
        @Override
        public int parameters() {
            return 2;
        }

        @Override
        public boolean evaluate(double[] theta, double[] values, double[] slopes) {
            for (int i = 0; i < points; i++) {
                double decayed = StrictMath.exp(-theta[1] * (i + 1));
                values[i] = theta[0] * (1 - decayed);
                slopes[2 * i] = 1 - decayed;
                slopes[2 * i + 1] = theta[0] * (i + 1) * decayed;
            }
            return Double.isFinite(values[points - 1]);
        }
    }

    @Test
    void refusesAPlateauWhereAParameterNoLongerMatters() {
        double[] constant = {5, 5, 5, 5, 5, 5};

        CurveFitOutcome outcome =
                CurveFitter.squares(new Saturation(6), constant, new double[] {1, 1, 1, 1, 1, 1}, new double[] {4, 1});

        assertThat(outcome).isInstanceOf(CurveFitOutcome.Failure.class);
    }

    @Test
    void refusesFewerPointsThanParameters() {
        CurveFitOutcome outcome =
                CurveFitter.squares(new Saturation(1), new double[] {5}, new double[] {1}, new double[] {4, 1});

        assertThat(((CurveFitOutcome.Failure) outcome).reason()).isEqualTo(CurveFitOutcome.Reason.TOO_FEW_POINTS);
    }

    @Test
    void refusesAStartWithoutMeaning() {
        CurveFitOutcome outcome = CurveFitter.squares(
                new Saturation(3), new double[] {1, 2, 3}, new double[] {1, 1, 1}, new double[] {4, Double.NaN});

        assertThat(((CurveFitOutcome.Failure) outcome).reason()).isEqualTo(CurveFitOutcome.Reason.BAD_START);
    }

    @Test
    void poissonFitMeetsItsOwnScoreEquations() {
        double[] counts = {40, 66, 70, 92, 88, 97, 95, 101};
        Saturation model = new Saturation(8);

        CurveFit fit =
                CurveFitter.poisson(model, counts, new double[] {90, 0.5}).orThrow();

        double[] values = new double[8];
        double[] slopes = new double[16];
        model.evaluate(fit.values(), values, slopes);
        for (int j = 0; j < 2; j++) {
            double score = 0;
            for (int i = 0; i < 8; i++) {
                score += (counts[i] / values[i] - 1) * slopes[2 * i + j];
            }
            assertThat(score * fit.estimate(j).standardUncertainty()).isCloseTo(0, within(1e-9));
        }
    }

    @Test
    void weightsScaleTheCovarianceAndNotTheValues() {
        double[] y = {40, 66, 70, 92, 88, 97};
        CurveFit one = CurveFitter.squares(
                        new Saturation(6), y, new double[] {1, 1, 1, 1, 1, 1}, new double[] {90, 0.5})
                .orThrow();
        CurveFit two = CurveFitter.squares(
                        new Saturation(6), y, new double[] {2, 2, 2, 2, 2, 2}, new double[] {90, 0.5})
                .orThrow();

        assertThat(two.values()[0]).isCloseTo(one.values()[0], within(1e-9));
        assertThat(two.covariance()[0]).isCloseTo(4 * one.covariance()[0], within(1e-7));
        assertThat(two.scaledDeviation(0)).isCloseTo(one.scaledDeviation(0), within(1e-9));
    }
}
