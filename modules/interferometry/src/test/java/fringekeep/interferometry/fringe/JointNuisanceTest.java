package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Joint fits with drift and background fitted anew at every visibility, and what becomes of hopeless data. */
class JointNuisanceTest {
    private static final FringeOptions DRIFTING = FringeOptions.atPeriod(1).driftOrder(1);

    private static FringeData drifting(Random random, double visibility, double dark) {
        FringeData scan = SimulatedScans.scan(random, 16, 40, visibility, 6.28 * random.nextDouble(), dark, 0.3);
        return dark > 0 ? scan.dark(new double[] {SimulatedScans.poisson(random, 4 * dark)}, new double[] {4}) : scan;
    }

    @Test
    void oneStrongScanGivesTheErrorOfItsOwnFitWithTheDriftsShare() {
        FringeData scan = SimulatedScans.scan(new Random(11), 13, 3000, 0.6, 0.8, 0, 0.4);
        Estimate own = FringeFitter.fit(scan, DRIFTING).orThrow().visibility().orElseThrow();

        Estimate free = JointFit.of(List.of(scan), DRIFTING, JointFit.Nuisances.FREE)
                .jointOrThrow()
                .visibility();

        assertThat(free.value()).isCloseTo(own.value(), within(0.1 * own.standardUncertainty()));
        assertThat(free.standardUncertainty())
                .isCloseTo(own.standardUncertainty(), within(0.02 * own.standardUncertainty()));
    }

    @Test
    void intervalsWithFreeDriftAndJointDarkCountsCoverAsStated() {
        Random random = new Random(12);
        FringeOptions options = DRIFTING.background(Background.ESTIMATED);
        int covered = 0;
        int wide = 0;
        int rounds = 40;
        for (int k = 0; k < rounds; k++) {
            List<FringeData> scans = new ArrayList<>();
            for (int s = 0; s < 2; s++) {
                scans.add(drifting(random, 0.5, 20));
            }
            JointFit fit = JointFit.of(scans, options, JointFit.Nuisances.FREE).jointOrThrow();
            covered += fit.interval(0.6826894921370859).contains(0.5) ? 1 : 0;
            wide += fit.interval(0.9544997361036416).contains(0.5) ? 1 : 0;
        }

        double error = Math.sqrt(0.6827 * 0.3173 / rounds);
        assertThat((double) covered / rounds).isBetween(0.6827 - 3 * error, 0.6827 + 3 * error);
        assertThat(wide).isGreaterThanOrEqualTo(rounds - 6);
    }

    @Test
    void heldBackgroundsUnderstateTheErrorThatFreeOnesGive() {
        Random random = new Random(13);
        List<FringeData> scans = new ArrayList<>();
        for (int s = 0; s < 5; s++) {
            scans.add(drifting(random, 0.6, 80));
        }
        FringeOptions options = FringeOptions.atPeriod(1).driftOrder(1).background(Background.JOINT);

        double held = JointFit.of(scans, options).jointOrThrow().visibility().standardUncertainty();
        double free = JointFit.of(scans, options, JointFit.Nuisances.FREE)
                .jointOrThrow()
                .visibility()
                .standardUncertainty();

        assertThat(free).isGreaterThan(1.02 * held);
    }

    @Test
    void theUncertaintyOfAKnownBackgroundIsCommonToAllScans() {
        Random random = new Random(14);
        List<FringeData> scans = new ArrayList<>();
        for (int s = 0; s < 10; s++) {
            scans.add(SimulatedScans.scan(random, 16, 100, 0.5, s, 50, 0));
        }

        Estimate exact = JointFit.of(
                        scans, FringeOptions.atPeriod(1).background(Background.known(50, 0)), JointFit.Nuisances.FREE)
                .jointOrThrow()
                .visibility();
        Estimate uncertain = JointFit.of(
                        scans, FringeOptions.atPeriod(1).background(Background.known(50, 5)), JointFit.Nuisances.FREE)
                .jointOrThrow()
                .visibility();

        // V is amplitude over (all counts - background): dV/dB = V/N, here 0.5/100 for each count.
        double common = 5 * exact.value() / 100;
        assertThat(uncertain.standardUncertainty())
                .isCloseTo(Math.hypot(exact.standardUncertainty(), common), within(0.05 * common));
    }

    @Test
    void aScanWithoutSignalAboveItsDarkCountsGivesAReason() {
        FringeData empty = FringeData.of(new double[] {0, 0.2, 0.4, 0.6, 0.8}, new double[] {1, 0, 0, 1, 0})
                .dark(new double[] {400}, new double[] {10});

        JointOutcome outcome = JointFit.of(
                List.of(empty), FringeOptions.atPeriod(1).background(Background.ESTIMATED), JointFit.Nuisances.FREE);

        assertThat(outcome).isInstanceOf(FringeFailure.class);
        assertThat(((FringeFailure) outcome).words()).contains("Scan 0");
    }

    @Test
    void randomWeakScansGiveAFitOrAReasonInBothWays() {
        Random random = new Random(15);
        for (int k = 0; k < 20; k++) {
            List<FringeData> scans = new ArrayList<>();
            for (int s = 0; s < 2; s++) {
                scans.add(SimulatedScans.scan(random, 8, 0.5 + k / 5.0, 0.9, 6.28 * random.nextDouble(), 0, 0.5));
            }
            for (JointFit.Nuisances nuisances : JointFit.Nuisances.values()) {
                JointOutcome outcome = JointFit.of(scans, DRIFTING, nuisances);
                if (outcome instanceof JointFit fit) {
                    assertThat(fit.visibility().value()).isBetween(0.0, 1.0);
                    assertThat(fit.interval(0.95).high())
                            .isBetween(fit.visibility().value(), 1.0);
                }
            }
        }
    }

    @Test
    void aProfileOnASingularCovarianceGivesAReasonAndNoNumber() {
        FringeFit fit = FringeFitter.fit(
                        FringeData.of(new double[] {0, 0.25, 0.5, 0.75}, new double[] {0, 5, 0, 0}),
                        FringeOptions.atPeriod(1)
                                .estimator(Estimator.UNWEIGHTED)
                                .covariance(CovarianceSort.OBSERVED))
                .orThrow();

        FringeProfile profile = FringeProfile.of(fit);

        assertThat(profile.undetermined()).isPresent();
        assertThat(profile.undetermined().orElseThrow().words()).contains("singular");
        assertThat(profile.visibilityDeviate(0.3)).isNaN();
        assertThat(profile.phaseDeviate(0.3)).isNaN();
        assertThat(profile.acceptsVisibility(0.3, 0.95)).isFalse();
        assertThat(fit.visibilityInterval(0.95)).isEmpty();
        assertThat(fit.phaseInterval(0.95)).isEmpty();
    }
}
