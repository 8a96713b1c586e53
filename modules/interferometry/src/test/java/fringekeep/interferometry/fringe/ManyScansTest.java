package fringekeep.interferometry.fringe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.statistics.Estimate;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

class ManyScansTest {
    private static final FringeOptions OPTIONS = FringeOptions.atPeriod(1);

    private static FringeFit fit(FringeData data) {
        return FringeFitter.fit(data, OPTIONS).orThrow();
    }

    @Test
    void plainSumOfEqualScansIsOneScanOfLongerExposure() {
        FringeData one =
                SimulatedScans.scan(new Random(1), 20, 30, 0.5, 1, 0, 0).exposure(2);
        ScanSum sum = ScanSum.plain(List.of(one, one, one)).sumOrThrow();

        FringeFit single = fit(one);
        FringeFit summed = fit(sum.data());

        assertThat(sum.data().exposures()[0]).isEqualTo(6);
        assertThat(summed.mean().value()).isCloseTo(single.mean().value(), within(1e-9));
        assertThat(summed.covariance()[2]).isCloseTo(single.covariance()[2] / 3, within(1e-9));
    }

    @Test
    void maskedPointOfOneScanShortensTheExposureThere() {
        FringeData one = SimulatedScans.scan(new Random(2), 12, 30, 0.5, 1, 0, 0);
        boolean[] masked = new boolean[12];
        masked[4] = true;

        FringeData sum =
                ScanSum.plain(List.of(one, one.masked(masked))).sumOrThrow().data();

        assertThat(sum.exposures()[4]).isEqualTo(1);
        assertThat(sum.exposures()[5]).isEqualTo(2);
        assertThat(sum.counts()[4]).isEqualTo(one.counts()[4]);
    }

    @Test
    void scansOverOtherPositionsAreNotAdded() {
        FringeData one = SimulatedScans.scan(new Random(3), 12, 30, 0.5, 1, 0, 0);
        FringeData other = SimulatedScans.scan(new Random(3), 13, 30, 0.5, 1, 0, 0);

        assertThat(((FringeFailure) ScanSum.plain(List.of(one, other))).reason())
                .isEqualTo(FringeFailure.Reason.SCANS_DIFFER);
    }

    @Test
    void sumAfterReferencePhasesKeepsTheVisibilityThatAPlainSumLoses() {
        Random random = new Random(4);
        List<FringeData> scans = new ArrayList<>();
        List<Estimate> phases = new ArrayList<>();
        for (int k = 0; k < 40; k++) {
            double phase = 6.28 * random.nextDouble();
            scans.add(SimulatedScans.scan(random, 16, 20 + k, 0.4, phase, 0, 0));
            phases.add(new Estimate(phase, 0.1));
        }

        ScanSum aligned = ScanSum.afterPhase(scans, phases, 1).sumOrThrow();
        FringeFit fitted = fit(aligned.data());
        Estimate visibility = fitted.visibility().orElseThrow();

        assertThat(visibility.value()).isCloseTo(0.4, within(3 * visibility.standardUncertainty()));
        assertThat(fitted.phase().orElseThrow().value()).isCloseTo(0, within(0.1));
        assertThat(aligned.jitterFactor()).isCloseTo(Math.exp(-0.005), within(1e-12));
        assertThat(fitted.goodness().pValue()).isBetween(0.001, 0.999);
    }

    @Test
    void alignmentByOwnPhasesIsBiasedUpwardsForWeakScansAndTheJointFitIsNot() {
        Random random = new Random(5);
        List<FringeData> scans = new ArrayList<>();
        for (int k = 0; k < 150; k++) {
            scans.add(SimulatedScans.scan(random, 12, 5, 0.2, 6.28 * random.nextDouble(), 0, 0));
        }

        double own = fit(ScanSum.afterOwnPhase(scans, OPTIONS).sumOrThrow().data())
                .visibility()
                .orElseThrow()
                .value();
        JointFit joint = JointFit.of(scans, OPTIONS).jointOrThrow();

        assertThat(own).isGreaterThan(0.25);
        assertThat(joint.visibility().value())
                .isCloseTo(0.2, within(3 * joint.visibility().standardUncertainty()));
        assertThat(joint.interval(0.9545).contains(joint.visibility().value())).isTrue();
        assertThat(joint.sameVisibilityPValue()).isGreaterThan(0.01);
    }

    @Test
    void jointFitOfStrongScansIsTheWeightedMean() {
        Random random = new Random(6);
        List<FringeData> scans = new ArrayList<>();
        double weights = 0;
        double sum = 0;
        for (int k = 0; k < 6; k++) {
            FringeData scan = SimulatedScans.scan(random, 24, 200 + 100 * k, 0.35, k, 0, 0);
            scans.add(scan);
            Estimate visibility = fit(scan).visibility().orElseThrow();
            double weight = 1 / (visibility.standardUncertainty() * visibility.standardUncertainty());
            weights += weight;
            sum += weight * visibility.value();
        }

        JointFit joint = JointFit.of(scans, OPTIONS).jointOrThrow();

        double sigma = 1 / Math.sqrt(weights);
        assertThat(joint.visibility().value()).isCloseTo(sum / weights, within(0.15 * sigma));
        assertThat(joint.visibility().standardUncertainty()).isCloseTo(sigma, within(0.03 * sigma));
        assertThat(joint.scans()).hasSize(6);
    }

    @Test
    void jointFitSeesThatVisibilitiesDiffer() {
        Random random = new Random(7);
        List<FringeData> scans = List.of(
                SimulatedScans.scan(random, 24, 400, 0.2, 0, 0, 0), SimulatedScans.scan(random, 24, 400, 0.5, 0, 0, 0));

        assertThat(JointFit.of(scans, OPTIONS).jointOrThrow().sameVisibilityPValue())
                .isLessThan(1e-6);
    }

    @Test
    void referencesBeforeAndAfterCancelADrift() {
        double[] covariance = {1, 0, 2, 0, 0, 2};
        HarmonicEstimate before = at(100, 0.40, 3.0, covariance);
        HarmonicEstimate after = at(120, 0.44, -3.0, covariance);
        HarmonicEstimate signal = at(110, 0.21, -2.6416, covariance);

        ReferencedFringe result =
                ReferencedFringe.between(signal, before, after, 0.5).orElseThrow();

        assertThat(result.visibilityRatio().value()).isCloseTo(0.5, within(1e-12));
        assertThat(result.meanRatio().value()).isCloseTo(1, within(1e-12));
        assertThat(result.phaseDifference().value()).isCloseTo(2 * Math.PI - 2.6416 - Math.PI, within(1e-12));
        assertThat(result.referencesAgree()).isLessThan(0.01);
        assertThat(ReferencedFringe.against(signal, before)
                        .orElseThrow()
                        .visibilityRatio()
                        .value())
                .isCloseTo(0.525, within(1e-12));
    }

    private static HarmonicEstimate at(double mean, double visibility, double phase, double[] covariance) {
        return new HarmonicEstimate(
                mean, mean * visibility * Math.cos(phase), -mean * visibility * Math.sin(phase), covariance);
    }

    @Test
    void uncertaintyOfTheReferencedVisibilityIsThatOfManySimulatedOnes() {
        Random random = new Random(8);
        double sum = 0;
        double squares = 0;
        double stated = 0;
        int runs = 1000;
        for (int k = 0; k < runs; k++) {
            HarmonicEstimate before =
                    fit(SimulatedScans.scan(random, 16, 200, 0.4, 1, 0, 0)).harmonic();
            HarmonicEstimate signal =
                    fit(SimulatedScans.scan(random, 16, 100, 0.2, 0.5, 0, 0)).harmonic();
            HarmonicEstimate after =
                    fit(SimulatedScans.scan(random, 16, 200, 0.4, 1, 0, 0)).harmonic();
            ReferencedFringe result =
                    ReferencedFringe.between(signal, before, after, 0.5).orElseThrow();
            sum += result.visibilityRatio().value() / runs;
            squares +=
                    result.visibilityRatio().value() * result.visibilityRatio().value() / runs;
            stated += result.visibilityRatio().standardUncertainty() / runs;
        }
        double scatter = Math.sqrt(squares - sum * sum);
        assertThat(stated).isCloseTo(scatter, within(0.1 * scatter));
    }

    @Test
    void outlierIsNamedAndTheRestFitsAgain() {
        FringeData data = SimulatedScans.scan(new Random(9), 30, 100, 0.4, 1, 0, 0);
        double[] counts = data.counts();
        counts[11] += 120;
        FringeData spoiled = FringeData.of(data.positions(), counts);

        RobustFit robust = ((RobustOutcome.Found) RobustFit.of(spoiled, OPTIONS, 0.01)).value();

        assertThat(robust.outliers()).hasSize(1);
        assertThat(robust.outliers().get(0).point()).isEqualTo(11);
        assertThat(robust.outliers().get(0).pValue()).isLessThan(1e-6);
        assertThat(robust.fit().visibility().orElseThrow().value()).isCloseTo(0.4, within(0.1));
    }

    @Test
    void cleanScansLoseAPointNoMoreOftenThanAsked() {
        Random random = new Random(10);
        int named = 0;
        for (int k = 0; k < 400; k++) {
            FringeData data = SimulatedScans.scan(random, 24, 40, 0.4, k, 0, 0);
            named += ((RobustOutcome.Found) RobustFit.of(data, OPTIONS, 0.05))
                            .value()
                            .outliers()
                            .isEmpty()
                    ? 0
                    : 1;
        }
        // 5 % asked; three binomial standard errors of 400 are 3.3 %.
        assertThat(named / 400.0).isLessThan(0.083);
    }

    @Test
    void periodOfAnUnknownFringeIsFound() {
        Random random = new Random(11);
        double[] positions = new double[60];
        double[] counts = new double[60];
        for (int i = 0; i < 60; i++) {
            positions[i] = i * 0.07;
            double shape = 1 + 0.35 * StrictMath.cos(2 * Math.PI * positions[i] / 0.83 + 1);
            counts[i] = SimulatedScans.poisson(random, 100 * shape);
        }
        PeriodSearch search =
                PeriodSearch.over(FringeData.of(positions, counts), 0.2, 3).orElseThrow();

        Estimate refined = search.refined().orElseThrow();
        assertThat(search.falseAlarm()).isLessThan(1e-8);
        assertThat(refined.value()).isCloseTo(0.83, within(4 * refined.standardUncertainty()));
        assertThat(search.period()).isCloseTo(0.83, within(0.02));
    }

    @Test
    void falseAlarmsOfThePeriodSearchAreNoMoreOftenThanStated() {
        Random random = new Random(12);
        int alarms = 0;
        for (int k = 0; k < 300; k++) {
            FringeData data = SimulatedScans.scan(random, 24, 50, 0, 0, 0, 0);
            alarms += PeriodSearch.over(data, 0.1, 1).orElseThrow().falseAlarm() < 0.1 ? 1 : 0;
        }
        assertThat(alarms / 300.0).isBetween(0.03, 0.152);
    }

    @Test
    void differenceSignalHasTheScatterItStates() {
        Random random = new Random(13);
        int runs = 2000;
        double[] sums = new double[6];
        for (int k = 0; k < runs; k++) {
            double resonant = SimulatedScans.poisson(random, 600);
            double off = SimulatedScans.poisson(random, 1000);
            Estimate relative =
                    DifferenceSignal.relative(resonant, 500, off, 1000, 1).orElseThrow();
            Estimate symmetric =
                    DifferenceSignal.symmetric(resonant, 500, off, 1000, 1).orElseThrow();
            sums[0] += relative.value() / runs;
            sums[1] += relative.value() * relative.value() / runs;
            sums[2] += relative.standardUncertainty() / runs;
            sums[3] += symmetric.value() / runs;
            sums[4] += symmetric.value() * symmetric.value() / runs;
            sums[5] += symmetric.standardUncertainty() / runs;
        }
        double scatter = Math.sqrt(sums[1] - sums[0] * sums[0]);
        double symmetricScatter = Math.sqrt(sums[4] - sums[3] * sums[3]);
        assertThat(sums[0]).isCloseTo(0.2, within(0.005));
        assertThat(sums[2]).isCloseTo(scatter, within(0.06 * scatter));
        assertThat(sums[3]).isCloseTo(0.2 / 2.2, within(0.002));
        assertThat(sums[5]).isCloseTo(symmetricScatter, within(0.06 * symmetricScatter));
        assertThat(DifferenceSignal.relative(5, 10, 0, 10, 1)).isEmpty();
    }
}
