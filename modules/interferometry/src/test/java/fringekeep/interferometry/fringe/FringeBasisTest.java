package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.junit.jupiter.api.Test;

class FringeBasisTest {
    private static void agree(double[] fast, FringeFit full) {
        double[] covariance = full.covariance();
        for (int j = 0; j < 3; j++) {
            double sigma = Math.sqrt(covariance[j * (j + 1) / 2 + j]);
            assertThat(fast[j]).isCloseTo(full.values()[j], within(1e-9 * sigma));
        }
        for (int k = 0; k < 6; k++) {
            assertThat(fast[3 + k]).isCloseTo(covariance[k], within(1e-8 * covariance[0]));
        }
    }

    @Test
    void agreesWithTheGeneralFitter() {
        Random random = new Random(1);
        double[] result = new double[FringeBasis.RESULT_LENGTH];
        int settled = 0;
        for (int k = 0; k < 1000; k++) {
            FringeData data = SimulatedScans.scan(random, 40, 50, 0.4, k, 5, 0);
            FringeBasis basis = FringeBasis.of(data.positions(), 1);
            FringeOptions options = FringeOptions.atPeriod(1);

            basis.unweighted(data.counts(), result);
            agree(
                    result,
                    FringeFitter.fit(data, options.estimator(Estimator.UNWEIGHTED))
                            .orThrow());

            settled += basis.poisson(data.counts(), 5, result) ? 1 : 0;
            agree(
                    result,
                    FringeFitter.fit(data, options.background(Background.known(5, 0)))
                            .orThrow());
        }
        assertThat(settled).isEqualTo(1000);
    }

    @Test
    void goldenFourStepScanToTheLastBit() {
        double[] result = new double[FringeBasis.RESULT_LENGTH];

        FringeBasis.of(new double[] {0, 6.65e-8, 1.33e-7, 1.995e-7}, 2.66e-7)
                .unweighted(new double[] {120, 100, 80, 100}, result);

        assertThat(result).containsExactly(100, 20, 0, 25, 5, 50, 0, 0, 50);
        assertThat(FringeBasis.visibility(result)).isEqualTo(0.2);
    }

    @Test
    void refusesFewerThanThreePhases() {
        assertThatThrownBy(() -> FringeBasis.of(new double[] {0, 0.5, 1, 1.5, 2}, 1))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("three different phases");
    }

    @Test
    void saysSoWhereScoringCannotSettle() {
        double[] result = new double[FringeBasis.RESULT_LENGTH];
        FringeBasis basis = FringeBasis.of(new double[] {0, 0.25, 0.5, 0.75}, 1);

        assertThat(basis.poisson(new double[] {9, 0, 0, 0}, 0, result)).isFalse();
        assertThat(basis.poisson(new double[] {0, 0, 0, 0}, 0, result)).isFalse();
    }

    @Test
    void freePeriodAgreesWithTheGeneralFitter() {
        Random random = new Random(2);
        for (boolean drift : new boolean[] {false, true}) {
            double[] positions = new double[40];
            for (int i = 0; i < 40; i++) {
                positions[i] = 0.3 + 0.05 * i;
            }
            FreePeriodScan fast = new FreePeriodScan(positions, 1.03, drift);
            double[] result = new double[fast.resultLength()];
            int compared = 0;
            for (int k = 0; k < 300; k++) {
                double[] counts = new double[40];
                for (int i = 0; i < 40; i++) {
                    double shape = 1 + 0.5 * StrictMath.cos(2 * Math.PI * positions[i] + k);
                    counts[i] = SimulatedScans.poisson(random, 200 * shape);
                }
                FringeOutcome full = FringeFitter.fit(
                        FringeData.of(positions, counts),
                        FringeOptions.atPeriod(1.03)
                                .estimator(Estimator.UNWEIGHTED)
                                .periodFree(true)
                                .driftOrder(drift ? 1 : 0));
                if (fast.fit(counts, result) && full instanceof FringeFit fit) {
                    compared++;
                    for (int j = 0; j < fit.values().length; j++) {
                        double sigma = Math.sqrt(fit.covariance()[j * (j + 1) / 2 + j]);
                        assertThat(result[j]).isCloseTo(fit.values()[j], within(1e-7 * sigma));
                    }
                    assertThat(result[fit.values().length]).isCloseTo(fit.covariance()[0], within(1e-6 * result[0]));
                }
            }
            assertThat(compared).isGreaterThanOrEqualTo(295);
        }
    }

    @Test
    void cosinesInTurnsKeepTheirDigits() {
        double[] both = new double[2];
        for (int k = -4000; k < 4000; k++) {
            double turns = k / 1234.5;
            double angle = 2 * Math.PI * (turns - Math.rint(turns));
            Turns.both(turns, both, 0);
            assertThat(Turns.cos(turns)).isCloseTo(StrictMath.cos(angle), within(1.5e-15));
            assertThat(Turns.sin(turns)).isCloseTo(StrictMath.sin(angle), within(1.5e-15));
            assertThat(both[0]).isEqualTo(Turns.cos(turns) + 0.0);
            assertThat(both[1]).isEqualTo(Turns.sin(turns) + 0.0);
            assertThat(both[0] * both[0] + both[1] * both[1]).isCloseTo(1, within(5e-16));
        }
    }
}
