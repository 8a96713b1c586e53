package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.statistics.Interval;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class FringeFitterTest {
    private static final double[] FOUR_STEPS = {0, 6.65e-8, 1.33e-7, 1.995e-7};
    private static final FringeOptions OPTIONS = FringeOptions.atPeriod(1);

    private static FringeFailure.Reason reason(FringeOutcome outcome) {
        return ((FringeFailure) outcome).reason();
    }

    private static double[] steps(int n, double width) {
        double[] steps = new double[n];
        for (int i = 0; i < n; i++) {
            steps[i] = i * width;
        }
        return steps;
    }

    private static double[] exact(double[] positions, double mean, double visibility, double phase) {
        double[] counts = new double[positions.length];
        for (int i = 0; i < counts.length; i++) {
            counts[i] = Math.rint(mean * (1 + visibility * Math.cos(2 * Math.PI * positions[i] + phase)));
        }
        return counts;
    }

    @Test
    void fourStepScanGivesTheRecordedGoldenNumbersToTheLastBit() {
        FringeData data = FringeData.of(FOUR_STEPS, new double[] {120, 100, 80, 100});

        FringeFit fit = FringeFitter.fit(data, FringeOptions.atPeriod(2.66e-7).estimator(Estimator.UNWEIGHTED))
                .orThrow();

        assertThat(fit.names()).isEqualTo(List.of("mean", "cosine", "sine"));
        assertThat(fit.values()).containsExactly(100, 20, 0);
        assertThat(fit.covariance()).containsExactly(25, 5, 50, 0, 0, 50);
        assertThat(fit.degreesOfFreedom()).isEqualTo(1);
        assertThat(fit.visibility().orElseThrow().value()).isEqualTo(0.2);
        assertThat(fit.phase().orElseThrow().value()).isEqualTo(0);
    }

    @ParameterizedTest
    @EnumSource(Estimator.class)
    void signOfTheSineFollowsTheConvention(Estimator estimator) {
        double[] positions = steps(20, 0.05);
        FringeData data = FringeData.of(positions, exact(positions, 1e9, 0.4, 0.7));

        FringeFit fit = FringeFitter.fit(data, OPTIONS.estimator(estimator)).orThrow();

        assertThat(fit.cosine().value()).isCloseTo(1e9 * 0.4 * Math.cos(0.7), within(5.0));
        assertThat(fit.sine().value()).isCloseTo(-1e9 * 0.4 * Math.sin(0.7), within(5.0));
        assertThat(fit.phase().orElseThrow().value()).isCloseTo(0.7, within(1e-8));
        assertThat(fit.visibility().orElseThrow().value()).isCloseTo(0.4, within(1e-8));
    }

    @ParameterizedTest
    @EnumSource(Estimator.class)
    void partOfAPeriodIsFittedWithoutBias(Estimator estimator) {
        double[] positions = steps(12, 0.06);
        FringeData data = FringeData.of(positions, exact(positions, 1e9, 0.3, -2));

        FringeFit fit = FringeFitter.fit(data, OPTIONS.estimator(estimator)).orThrow();

        assertThat(fit.mean().value()).isCloseTo(1e9, within(20.0));
        assertThat(fit.visibility().orElseThrow().value()).isCloseTo(0.3, within(1e-7));
    }

    @Test
    void everyTermOfTheModelIsRecovered() {
        int n = 80;
        double[] positions = steps(n, 0.04);
        double[] counts = new double[n];
        double period = 1.02;
        for (int i = 0; i < n; i++) {
            double t = i / (n - 1.0) - 0.5;
            double angle = 2 * Math.PI * positions[i] / period;
            double drift = 1 + 0.3 * t - 0.2 * (t * t - 1.0 / 12) + 0.5 * (t * t * t - 0.15 * t);
            double shape = 1 + 0.4 * Math.cos(angle + 0.5) + 0.1 * Math.cos(2 * angle - 1);
            counts[i] = Math.rint(3 * (1e10 * drift * shape + 2e9));
        }
        FringeData data =
                FringeData.of(positions, counts).exposure(3).dark(new double[] {8e9, 8e9}, new double[] {4, 4});
        FringeOptions options =
                OPTIONS.periodFree(true).driftOrder(3).secondHarmonic(true).background(Background.JOINT);

        FringeFit fit = FringeFitter.fit(data, options).orThrow();

        assertThat(fit.names())
                .containsExactly(
                        "mean",
                        "cosine",
                        "sine",
                        "cosine2",
                        "sine2",
                        "drift1",
                        "drift2",
                        "drift3",
                        "period",
                        "background");
        double[] truth = {
            1e10,
            0.4e10 * Math.cos(0.5),
            -0.4e10 * Math.sin(0.5),
            0.1e10 * Math.cos(1),
            0.1e10 * Math.sin(1),
            0.3,
            -0.2,
            0.5,
            1.02,
            2e9
        };
        for (int j = 0; j < truth.length; j++) {
            double sigma = fit.estimate(fit.names().get(j)).orElseThrow().standardUncertainty();
            assertThat(fit.values()[j]).as(fit.names().get(j)).isCloseTo(truth[j], within(0.01 * sigma));
        }
        assertThat(fit.deviance()).isLessThan(1e-6);
    }

    @Test
    void phaseDriftIsTheChangeOverTheScan() {
        int n = 60;
        double[] positions = steps(n, 1.0 / 30);
        double[] counts = new double[n];
        for (int i = 0; i < n; i++) {
            double t = i / (n - 1.0) - 0.5;
            counts[i] = Math.rint(1e9 * (1 + 0.5 * Math.cos(2 * Math.PI * positions[i] + 0.3 + 0.8 * t)));
        }

        FringeFit fit = FringeFitter.fit(FringeData.of(positions, counts), OPTIONS.phaseDrift(true))
                .orThrow();

        assertThat(fit.estimate("phaseDrift").orElseThrow().value()).isCloseTo(0.8, within(1e-6));
        assertThat(fit.phase().orElseThrow().value()).isCloseTo(0.3, within(1e-6));
    }

    @ParameterizedTest
    @EnumSource(
            value = DeadTime.Sort.class,
            names = {"NON_PARALYSABLE", "PARALYSABLE"})
    void deadTimeIsUndoneInTheModel(DeadTime.Sort sort) {
        DeadTime dead = new DeadTime(sort, 1e-6);
        double[] positions = steps(24, 1.0 / 24);
        double[] counts = new double[24];
        for (int i = 0; i < 24; i++) {
            double arrivals = 2e9 * (1e5 / 2e5) * (1 + 0.6 * Math.cos(2 * Math.PI * positions[i])) / 1e4;
            counts[i] = Math.rint(dead.recorded(arrivals * 1e5, 1e5));
        }
        FringeData data = FringeData.of(positions, counts).exposure(1e5);

        FringeFit with = FringeFitter.fit(data.deadTime(dead), OPTIONS).orThrow();
        FringeFit without = FringeFitter.fit(data, OPTIONS).orThrow();

        assertThat(with.visibility().orElseThrow().value()).isCloseTo(0.6, within(1e-8));
        assertThat(with.mean().value()).isCloseTo(1e5, within(1e-3));
        assertThat(without.visibility().orElseThrow().value()).isLessThan(0.57);
    }

    @Test
    void moreCountsThanTheDeadTimeAllowsAreRefused() {
        FringeData data = FringeData.of(steps(4, 0.25), new double[] {50, 40, 101, 60})
                .deadTime(new DeadTime(DeadTime.Sort.NON_PARALYSABLE, 0.01));

        assertThat(reason(FringeFitter.fit(data, OPTIONS))).isEqualTo(FringeFailure.Reason.SATURATED);
    }

    @Test
    void monitorScalesTheSignalAndNotTheBackground() {
        double[] positions = steps(30, 1.0 / 15);
        double[] monitor = new double[30];
        double[] counts = new double[30];
        for (int i = 0; i < 30; i++) {
            monitor[i] = 5 + i % 7;
            counts[i] = Math.rint(monitor[i] * 1e8 * (1 + 0.3 * Math.cos(2 * Math.PI * positions[i] - 1)) + 4e8);
        }
        FringeData data = FringeData.of(positions, counts).monitor(monitor);

        FringeFit fit = FringeFitter.fit(data, OPTIONS.background(Background.known(4e8, 0)))
                .orThrow();

        assertThat(fit.visibility().orElseThrow().value()).isCloseTo(0.3, within(1e-7));
        assertThat(fit.mean().value())
                .isCloseTo(1e8 * Arrays.stream(monitor).average().orElseThrow(), within(10.0));
    }

    @Test
    void maskedPointsDoNotMatter() {
        Random random = new Random(5);
        FringeData data = SimulatedScans.scan(random, 16, 100, 0.4, 1, 0, 0);
        boolean[] masked = new boolean[16];
        masked[3] = true;
        double[] changed = data.counts();
        changed[3] = 9999;

        FringeFit one = FringeFitter.fit(data.masked(masked), OPTIONS).orThrow();
        FringeFit two = FringeFitter.fit(
                        FringeData.of(data.positions(), changed).masked(masked), OPTIONS)
                .orThrow();

        assertThat(two.values()).isEqualTo(one.values());
        assertThat(one.degreesOfFreedom()).isEqualTo(12);
        assertThat(one.expectedCounts()).hasSize(15);
    }

    @Test
    void weightedFitSolvesTheLikelihoodEquationsAtManyCounts() {
        FringeData data = SimulatedScans.scan(new Random(6), 20, 400, 0.5, 1, 0, 0);

        FringeFit weighted =
                FringeFitter.fit(data, OPTIONS.estimator(Estimator.WEIGHTED)).orThrow();
        FringeFit likelihood = FringeFitter.fit(data, OPTIONS).orThrow();

        for (int j = 0; j < 3; j++) {
            assertThat(weighted.values()[j]).isCloseTo(likelihood.values()[j], within(1e-8));
        }
        assertThat(weighted.covariance()[2]).isCloseTo(likelihood.covariance()[2], within(1e-6));
    }

    @Test
    void uncertaintyOfTheBackgroundIsPropagated() {
        // sigma_V^2 grows by V^2 u(B)^2 / N^2 at whole periods.
        FringeData data = SimulatedScans.scan(new Random(7), 24, 100, 0.5, 0.3, 20, 0);
        FringeOptions squares = OPTIONS.estimator(Estimator.UNWEIGHTED);

        FringeFit exact = FringeFitter.fit(data, squares.background(Background.known(20, 0)))
                .orThrow();
        FringeFit uncertain = FringeFitter.fit(data, squares.background(Background.known(20, 4)))
                .orThrow();

        double visibility = exact.visibility().orElseThrow().value();
        double added = visibility * 4 / exact.mean().value();
        double before = exact.visibility().orElseThrow().standardUncertainty();
        assertThat(uncertain.visibility().orElseThrow().standardUncertainty())
                .isCloseTo(Math.sqrt(before * before + added * added), within(1e-12));
        assertThat(width(uncertain.visibilityInterval(0.6827).orElseThrow()))
                .isGreaterThan(width(exact.visibilityInterval(0.6827).orElseThrow()));
    }

    private static double width(Interval interval) {
        return interval.high() - interval.low();
    }

    @Test
    void overDispersionWidensOnlyWhereAsked() {
        FringeData data = SimulatedScans.scan(new Random(8), 30, 100, 0.3, 0.3, 0, 0);
        double[] pulsed = data.counts();
        for (int i = 0; i < 30; i++) {
            pulsed[i] *= 4;
        }
        FringeData scattered = FringeData.of(data.positions(), pulsed);

        FringeFit plain = FringeFitter.fit(scattered, OPTIONS).orThrow();
        FringeFit scaled =
                FringeFitter.fit(scattered, OPTIONS.scaleByDispersion(true)).orThrow();

        double dispersion = plain.goodness().dispersion();
        assertThat(dispersion).isBetween(2.0, 7.0);
        assertThat(scaled.covariance()[2]).isCloseTo(dispersion * plain.covariance()[2], within(1e-9));
        assertThat(plain.goodness().pValue()).isLessThan(1e-4);
    }

    @Test
    void emptyPointsAreFittedOnTheEdgeOfTheDomain() {
        FringeData data = FringeData.of(steps(8, 0.125), new double[] {7, 5, 2, 0, 0, 0, 1, 6});

        FringeFit fit = FringeFitter.fit(data, OPTIONS).orThrow();

        assertThat(fit.findings()).contains(FringeFit.Finding.ON_EDGE);
        for (double expected : fit.expectedCounts()) {
            assertThat(expected).isGreaterThanOrEqualTo(-1e-12);
        }
        double best = fit.deviance();
        for (double[] move : new double[][] {{0.1, 0, 0}, {-0.1, 0, 0}, {0, 0.1, 0}, {0, -0.1, 0}, {0, 0, 0.1}}) {
            assertThat(deviance(data, fit, move)).isGreaterThanOrEqualTo(best);
        }
        Interval interval = fit.visibilityInterval(0.9545).orElseThrow();
        assertThat(interval.low()).isBetween(0.3, 0.9);
        assertThat(interval.high()).isGreaterThan(0.95);
    }

    private static double deviance(FringeData data, FringeFit fit, double[] move) {
        double[] values = fit.values();
        double sum = 0;
        for (int i = 0; i < data.size(); i++) {
            double turn = data.positions()[i];
            double mu = values[0]
                    + move[0]
                    + (values[1] + move[1]) * Math.cos(2 * Math.PI * turn)
                    + (values[2] + move[2]) * Math.sin(2 * Math.PI * turn);
            sum += mu < -1e-9
                    ? Double.POSITIVE_INFINITY
                    : fringekeep.interferometry.statistics.PoissonDeviance.term(data.counts()[i], Math.max(mu, 0));
        }
        return sum;
    }

    @Test
    void allEmptyPointsGiveAReason() {
        FringeData data = FringeData.of(steps(8, 0.125), new double[8]);

        assertThat(reason(FringeFitter.fit(data, OPTIONS))).isEqualTo(FringeFailure.Reason.NO_COUNTS);
    }

    @Test
    void singleCountIsFittedAndShowsNoFringe() {
        FringeData data = FringeData.of(steps(8, 0.125), new double[] {0, 0, 1, 0, 0, 0, 0, 0});

        FringeOutcome outcome = FringeFitter.fit(data, OPTIONS);

        assertThat(outcome).isInstanceOf(FringeFit.class);
        FringeFit fit = outcome.orThrow();
        assertThat(fit.mean().value()).isCloseTo(0.125, within(1e-9));
        assertThat(fit.visibilityInterval(0.9545).orElseThrow().low()).isZero();
    }

    @Test
    void tooFewPointsOrPhasesGiveAReason() {
        FringeData two = FringeData.of(steps(2, 0.25), new double[] {5, 6});
        FringeData alike = FringeData.of(steps(6, 0.5), new double[] {5, 6, 7, 8, 9, 10});
        FringeData three = FringeData.of(steps(3, 0.3), new double[] {5, 6, 7});

        assertThat(reason(FringeFitter.fit(two, OPTIONS))).isEqualTo(FringeFailure.Reason.TOO_FEW_POINTS);
        assertThat(reason(FringeFitter.fit(alike, OPTIONS))).isEqualTo(FringeFailure.Reason.NOT_DETERMINED);
        assertThat(FringeFitter.fit(three, OPTIONS).orThrow().findings())
                .contains(FringeFit.Finding.NO_DEGREE_OF_FREEDOM);
        assertThat(reason(FringeFitter.fit(
                        three, OPTIONS.estimator(Estimator.UNWEIGHTED).covariance(CovarianceSort.RESIDUAL_SCATTER))))
                .isEqualTo(FringeFailure.Reason.TOO_FEW_POINTS);
    }

    @Test
    void missingDarkCountsGiveAReason() {
        FringeData data = FringeData.of(steps(8, 0.125), new double[] {5, 6, 7, 8, 9, 8, 7, 6});

        assertThat(reason(FringeFitter.fit(data, OPTIONS.background(Background.JOINT))))
                .isEqualTo(FringeFailure.Reason.NO_DARK_COUNTS);
        assertThat(reason(FringeFitter.fit(data, OPTIONS.background(Background.ESTIMATED))))
                .isEqualTo(FringeFailure.Reason.NO_DARK_COUNTS);
    }

    @Test
    void darkCountsOfZeroLeaveTheBackgroundOnItsEdge() {
        FringeData data =
                SimulatedScans.scan(new Random(9), 16, 50, 0.3, 0, 0, 0).dark(new double[4], new double[] {1, 1, 1, 1});

        FringeFit fit =
                FringeFitter.fit(data, OPTIONS.background(Background.JOINT)).orThrow();

        assertThat(fit.estimate("background").orElseThrow().value()).isCloseTo(0, within(1e-9));
    }

    @Test
    void moreBackgroundThanCountsLeavesNoVisibility() {
        FringeData data = FringeData.of(steps(8, 0.125), new double[] {5, 6, 7, 8, 9, 8, 7, 6});

        FringeFit fit = FringeFitter.fit(data, OPTIONS.background(Background.known(20, 0)))
                .orThrow();

        assertThat(fit.findings()).contains(FringeFit.Finding.NO_SIGNAL);
        assertThat(fit.visibility()).isEmpty();
        assertThat(fit.visibilityInterval(0.68)).isEmpty();
        assertThat(fit.phase()).isEmpty();
    }

    @Test
    void unmodulatedCountsHaveNoPhaseAndNoSignificance() {
        double[] level = new double[12];
        Arrays.fill(level, 100);

        FringeFit fit = FringeFitter.fit(FringeData.of(steps(12, 1.0 / 12), level), OPTIONS)
                .orThrow();

        assertThat(fit.visibility().orElseThrow().value()).isCloseTo(0, within(1e-12));
        assertThat(fit.significance().orElseThrow().pValue()).isGreaterThan(0.99);
        assertThat(fit.visibilityInterval(0.95).orElseThrow().low()).isZero();
        assertThat(fit.goodness().pValue()).isGreaterThan(0.99);
    }

    @Test
    void intervalsSurroundTheEstimateAndNest() {
        for (Estimator estimator : Estimator.values()) {
            FringeData data = SimulatedScans.scan(new Random(10), 24, 50, 0.4, 2.8, 0, 0);
            FringeFit fit = FringeFitter.fit(data, OPTIONS.estimator(estimator)).orThrow();
            double visibility = fit.visibility().orElseThrow().value();
            double sigma = fit.visibility().orElseThrow().standardUncertainty();
            Interval one = fit.visibilityInterval(0.6827).orElseThrow();
            Interval two = fit.visibilityInterval(0.9545).orElseThrow();
            Interval phase = fit.phaseInterval(0.6827).orElseThrow();

            assertThat(one.contains(visibility)).isTrue();
            assertThat(two.low()).isLessThan(one.low());
            assertThat(two.high()).isGreaterThan(one.high());
            assertThat(width(one)).isCloseTo(2 * sigma, within(0.2 * sigma));
            assertThat(width(two)).isCloseTo(4 * sigma, within(0.4 * sigma));
            assertThat(phase.contains(fit.phase().orElseThrow().value())).isTrue();
            assertThat(width(phase)).isCloseTo(2 * fit.phase().orElseThrow().standardUncertainty(), within(0.05));
        }
    }

    @Test
    void shiftingThePositionsTurnsThePhaseOnly() {
        FringeData data = SimulatedScans.scan(new Random(11), 20, 80, 0.5, 0.4, 0, 0);
        double[] shifted = data.positions();
        for (int i = 0; i < shifted.length; i++) {
            shifted[i] += 0.1;
        }

        FringeFit one = FringeFitter.fit(data, OPTIONS).orThrow();
        FringeFit two =
                FringeFitter.fit(FringeData.of(shifted, data.counts()), OPTIONS).orThrow();

        assertThat(two.visibility().orElseThrow().value())
                .isCloseTo(one.visibility().orElseThrow().value(), within(1e-11));
        assertThat(two.phase().orElseThrow().value())
                .isCloseTo(one.phase().orElseThrow().value() - 0.2 * Math.PI, within(1e-10));
    }

    @Test
    void lostPeriodGivesAReason() {
        FringeData data = SimulatedScans.scan(new Random(12), 40, 200, 0.8, 0.4, 0, 0);
        FringeData short_ = FringeData.of(steps(8, 0.05), new double[] {9, 8, 7, 6, 5, 4, 5, 6});

        FringeOutcome outcome = FringeFitter.fit(data, OPTIONS.period(0.21).periodFree(true));

        assertThat(outcome instanceof FringeFit fit
                        && Math.abs(fit.estimate("period").orElseThrow().value() - 0.21) > 0.1)
                .isFalse();
        assertThat(reason(FringeFitter.fit(short_, OPTIONS.periodFree(true))))
                .isEqualTo(FringeFailure.Reason.NOT_DETERMINED);
    }

    @Test
    void badInputNamesThePoint() {
        assertThatThrownBy(() -> FringeData.of(new double[] {0, 1}, new double[] {3, -1}))
                .hasMessage("counts of point 1 must be whole and not negative, is -1.0");
        assertThatThrownBy(() -> FringeData.of(new double[] {0, Double.NaN}, new double[] {3, 1}))
                .hasMessage("position of point 1 is NaN");
        assertThatThrownBy(() -> FringeData.of(new double[] {0}, new double[] {3, 1}))
                .hasMessage("counts: 2 values for 1 points");
        assertThatThrownBy(
                        () -> FringeData.of(new double[] {0}, new double[] {3}).exposure(0))
                .hasMessageContaining("exposure of point 0 must be positive");
        assertThatThrownBy(() -> OPTIONS.driftOrder(4)).hasMessageContaining("0 to 3");
    }
}
