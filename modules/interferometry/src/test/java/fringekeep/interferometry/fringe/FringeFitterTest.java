package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class FringeFitterTest {
    private static final double[] FOUR_STEPS = {0, 6.65e-8, 1.33e-7, 1.995e-7};

    @Test
    void fourStepScanGivesTheRecordedGoldenNumbersToTheLastBit() {
        FringeData data = FringeData.of(FOUR_STEPS, new double[] {120, 100, 80, 100});

        FringeFit fit = FringeFitter.fit(data, FringeOptions.atPeriod(2.66e-7).estimator(Estimator.UNWEIGHTED))
                .orThrow();

        assertThat(fit.names()).isEqualTo(List.of("mean", "cosine", "sine"));
        assertThat(fit.values()).containsExactly(100, 20, 0);
        assertThat(fit.covariance()).containsExactly(25, 5, 50, 0, 0, 50);
        assertThat(fit.degreesOfFreedom()).isEqualTo(1);
    }

    @Test
    void likelihoodOfFourStepScan() {
        FringeData data = FringeData.of(FOUR_STEPS, new double[] {120, 100, 80, 100});
        FringeFit fit = FringeFitter.fit(data, FringeOptions.atPeriod(2.66e-7)).orThrow();
        assertThat(fit.values()[0]).isEqualTo(100);
    }
}
