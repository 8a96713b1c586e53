package fringekeep.interferometry.molecule;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.molecule.PowerCurveComparison.Verdict;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.OpticalResponse;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.nearfield.VisibilityAgainstPower;
import fringekeep.interferometry.nearfield.WeightedNodes;
import fringekeep.interferometry.special.SplitMix64;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.Interval;
import java.io.IOException;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Behaviour of the fit of visibility against power: warnings, comparison, intervals, shared inputs. */
class PowerCurveTest {
    private static final double VOLUME = 200e-30;

    private static PowerSeriesSetup setup() {
        return PowerSeriesSetup.symmetric(266e-9, 0.42, 0.105, LaserBeam.ideal(532e-9, 0.9e-3));
    }

    private static BeamEnsemble beam(double deviation) {
        return new BeamEnsemble(
                WeightedNodes.normal(110.0, deviation, 5.0),
                WeightedNodes.single(1500 * PowerCurveFixture.ATOMIC_MASS),
                WeightedNodes.uniform(-1e-4, 1e-4, 4));
    }

    /** Few nodes: enough where data and fit share them. */
    private static BeamEnsemble coarseBeam() {
        return new BeamEnsemble(
                WeightedNodes.gaussHermite(110.0, 12.0, 16, 5.0),
                WeightedNodes.single(1500 * PowerCurveFixture.ATOMIC_MASS),
                WeightedNodes.single(0.0));
    }

    private static MeasuredCurve simulated(BeamEnsemble beam, double crossSection, double highestPower, long seed) {
        VisibilityAgainstPower model = new VisibilityAgainstPower(setup(), beam, Description.QUANTUM);
        SplitMix64 random = new SplitMix64(seed);
        double[] powers = new double[12];
        double[] values = new double[12];
        double[] uncertainties = new double[12];
        for (int k = 0; k < 12; k++) {
            powers[k] = highestPower * (k + 1) / 12.0;
            uncertainties[k] = 0.008;
            values[k] = model.visibility(powers[k], new OpticalResponse(VOLUME, crossSection))
                    + uncertainties[k] * random.nextGaussian();
        }
        return new MeasuredCurve(powers, values, uncertainties);
    }

    private static PowerCurveFitter fitter(BeamEnsemble beam, PowerCurveChoices choices) {
        return new PowerCurveFitter(setup(), beam, choices);
    }

    @Test
    void tableEqualsTheSum() {
        for (Description description : Description.values()) {
            VisibilityAgainstPower model = new VisibilityAgainstPower(setup(), beam(12.0), description);
            VisibilityAgainstPower table = model.tabulated(12.0 * VOLUME);
            for (double power = 0.0; power < 12.0; power += 0.137) {
                VisibilityAgainstPower.Point direct = model.phaseOnlyPoint(power, VOLUME);
                VisibilityAgainstPower.Point fast = table.phaseOnlyPoint(power, VOLUME);
                assertThat(fast.signed()).isCloseTo(direct.signed(), within(1e-14));
                assertThat(fast.byPolarizability()).isCloseTo(direct.byPolarizability(), within(1e-11 / VOLUME));
            }
        }
    }

    @Test
    void derivativesEqualDifferences() {
        VisibilityAgainstPower model = new VisibilityAgainstPower(setup(), beam(12.0), Description.QUANTUM);
        double volumeStep = 1e-5 * VOLUME;
        double crossStep = 1e-26;
        for (double cross : new double[] {0.0, 2e-21}) {
            VisibilityAgainstPower.Point point = model.point(3.3, new OpticalResponse(VOLUME, cross));
            double byVolume = (model.signedVisibility(3.3, new OpticalResponse(VOLUME + volumeStep, cross))
                            - model.signedVisibility(3.3, new OpticalResponse(VOLUME - volumeStep, cross)))
                    / (2 * volumeStep);
            double byCross = (model.signedVisibility(3.3, new OpticalResponse(VOLUME, cross + crossStep))
                            - model.signedVisibility(3.3, new OpticalResponse(VOLUME, cross - crossStep)))
                    / (2 * crossStep);
            assertThat(point.byPolarizability()).isCloseTo(byVolume, within(1e-6 * Math.abs(byVolume)));
            assertThat(point.byCrossSection()).isCloseTo(byCross, within(1e-5 * Math.abs(byCross)));
        }
    }

    @Test
    void warnsThatFactorAndPolarizabilityAreDegenerateBeforeTheFirstMaximum() throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read("vp_01");
        PropertyFit fit = file.fitter(PowerCurveChoices.polarizabilityOnly().withFreeFactor())
                .fit(file.data(), Description.QUANTUM)
                .orThrow();

        assertThat(fit.warnings())
                .extracting(FitWarning::sort)
                .contains(FitWarning.Sort.FACTOR_AND_POLARIZABILITY_DEGENERATE);
    }

    @Test
    void warnsThatAbsorptionAndFactorAreDegenerateInAWeakCurve() {
        // Up to the first maximum absorption only lowers the curve, as a smaller factor does.
        MeasuredCurve data = simulated(coarseBeam(), 1.5e-21, 2.5, 16L);
        PropertyFit fit = fitter(
                        coarseBeam(),
                        PowerCurveChoices.polarizabilityOnly().withFreeFactor().withFreeCrossSection())
                .fit(data, Description.QUANTUM)
                .orThrow();

        assertThat(fit.warnings()).extracting(FitWarning::sort).contains(FitWarning.Sort.PARAMETERS_DEGENERATE);
    }

    @Test
    void oneSpeedCannotTellQuantumFromClassical() throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read("vp_01");
        PowerCurveComparison comparison =
                PowerCurveComparison.of(file.fitter(PowerCurveChoices.polarizabilityOnly()), file.data());

        assertThat(comparison.verdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(comparison.expectedIfQuantum()).isLessThan(1e-9);
        assertThat(comparison.logLikelihoodRatio()).isCloseTo(0.0, within(1e-9));
        assertThat(comparison.reason()).startsWith("these data cannot tell");
        double ratio = comparison.classical().orThrow().values()[0]
                / comparison.quantum().orThrow().values()[0];
        double talbotLength = 1178.4 * PowerCurveFixture.ATOMIC_MASS * 121.0 * 266e-9 * 266e-9 / 6.62607015e-34;
        double r = 0.105 / talbotLength;
        assertThat(ratio).isCloseTo(Math.abs(Math.sin(Math.PI * r)) / (Math.PI * r), within(1e-7));
    }

    @Test
    void aKnownPolarizabilityLetsOneSpeedTell() throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read("vp_01");
        PowerCurveChoices known = PowerCurveChoices.polarizabilityOnly().withKnown(new Estimate(148e-30, 6e-30));
        PowerCurveComparison comparison = PowerCurveComparison.of(file.fitter(known), file.data());

        assertThat(comparison.verdict()).isEqualTo(Verdict.QUANTUM);
    }

    @Test
    void aBroadBeamPrefersMatterWaves() {
        MeasuredCurve data = simulated(beam(20.0), 0.0, 9.0, 11L);
        PowerCurveComparison comparison =
                PowerCurveComparison.of(fitter(beam(20.0), PowerCurveChoices.polarizabilityOnly()), data);

        assertThat(comparison.verdict()).isEqualTo(Verdict.QUANTUM);
        assertThat(comparison.logLikelihoodRatio()).isGreaterThan(PowerCurveChoices.ODDS_OF_A_HUNDRED);
    }

    @Test
    void dataThatFollowNeitherCurveAreNotJudged() {
        MeasuredCurve data = simulated(beam(20.0), 0.0, 9.0, 12L);
        double[] flat = new double[data.size()];
        java.util.Arrays.fill(flat, 0.6);
        PowerCurveComparison comparison = PowerCurveComparison.of(
                fitter(beam(20.0), PowerCurveChoices.polarizabilityOnly()), data.withValues(flat));

        assertThat(comparison.verdict()).isEqualTo(Verdict.NEITHER_FITS);
    }

    @Test
    void oneVisibilityBeyondTheMaximumHasSeveralPolarizabilities() {
        MeasuredCurve one = new MeasuredCurve(new double[] {4.0}, new double[] {0.2}, new double[] {0.01});
        PropertyFit fit = fitter(beam(0.0), PowerCurveChoices.polarizabilityOnly())
                .fit(one, Description.QUANTUM)
                .orThrow();

        assertThat(fit.warnings()).extracting(FitWarning::sort).contains(FitWarning.Sort.SEVERAL_MINIMA);
    }

    @Test
    void refusesMoreParametersThanPoints() {
        MeasuredCurve one = new MeasuredCurve(new double[] {4.0}, new double[] {0.2}, new double[] {0.01});
        FitOutcome outcome = fitter(
                        beam(0.0), PowerCurveChoices.polarizabilityOnly().withFreeFactor())
                .fit(one, Description.QUANTUM);

        assertThat(outcome).isInstanceOf(FitRefused.class);
        assertThat(((FitRefused) outcome).reason()).isEqualTo(FitRefused.Reason.TOO_FEW_POINTS);
        assertThatThrownBy(outcome::orThrow).hasMessageContaining("TOO_FEW_POINTS");
    }

    @Test
    void refusesAWholeNumberOfTalbotLengthsAndLaserOff() {
        MeasuredCurve dark = new MeasuredCurve(new double[] {0.0}, new double[] {0.2}, new double[] {0.01});
        FitOutcome outcome =
                fitter(beam(0.0), PowerCurveChoices.polarizabilityOnly()).fit(dark, Description.QUANTUM);

        assertThat(outcome).isInstanceOf(FitRefused.class);
        assertThat(((FitRefused) outcome).words()).contains("no power above 0 W");
    }

    @Test
    void powerCalibrationActsInverselyOnThePolarizability() {
        MeasuredCurve data = simulated(beam(12.0), 0.0, 9.0, 13L);
        PowerCurveFitter fitter =
                fitter(beam(12.0), PowerCurveChoices.polarizabilityOnly().withFreeFactor());
        PropertyFit fit = fitter.fit(data, Description.QUANTUM).orThrow();
        SharedInputs shared = new SharedInputs(fitter, data, Description.QUANTUM, fit);

        double volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value();
        assertThat(shared.sensitivities(SharedInput.POWER).orElseThrow()[0]).isCloseTo(-volume, within(1e-6 * volume));
        assertThat(shared.sensitivities(SharedInput.POWER).orElseThrow()[1]).isCloseTo(0.0, within(1e-7));
        SharedInputs.Budget budget = shared.budget(
                Parameter.POLARIZABILITY_VOLUME,
                List.of(
                        new SharedInputs.Uncertain(SharedInput.POWER, 0.03),
                        new SharedInputs.Uncertain(SharedInput.VELOCITY, 0.01)));
        double part = budget.contributions().get(1).contribution();
        assertThat(budget.contributions().get(0).contribution()).isCloseTo(0.03 * volume, within(1e-6 * volume));
        assertThat(budget.shared()).isCloseTo(Math.hypot(0.03 * volume, part), within(1e-6 * volume));
        assertThat(budget.combined()).isCloseTo(Math.hypot(budget.shared(), budget.statistical()), within(1e-40));
    }

    @Test
    void openFractionIsTakenUpByTheFactor() {
        MeasuredCurve data = simulated(beam(12.0), 0.0, 9.0, 14L);
        PowerCurveFitter fitter =
                fitter(beam(12.0), PowerCurveChoices.polarizabilityOnly().withFreeFactor());
        PropertyFit fit = fitter.fit(data, Description.QUANTUM).orThrow();
        SharedInputs shared = new SharedInputs(fitter, data, Description.QUANTUM, fit);

        double volume = fit.estimate(Parameter.POLARIZABILITY_VOLUME).value();
        assertThat(shared.sensitivities(SharedInput.OPEN_FRACTION).orElseThrow()[0])
                .isCloseTo(0.0, within(1e-6 * volume));
    }

    @Test
    void profileAndBootstrapAgreeWithTheCovarianceWhereTheCurveIsNearlyLinear() {
        MeasuredCurve data = simulated(coarseBeam(), 1.5e-21, 9.0, 15L);
        PowerCurveChoices choices =
                PowerCurveChoices.polarizabilityOnly().withFreeFactor().withFreeCrossSection();
        PowerCurveFitter fitter = fitter(coarseBeam(), choices);
        PropertyFit fit = fitter.fit(data, Description.QUANTUM).orThrow();
        PowerCurveIntervals intervals = new PowerCurveIntervals(fitter, data, Description.QUANTUM, fit);

        Estimate alpha = fit.estimate(Parameter.POLARIZABILITY_VOLUME);
        Interval profile = intervals.profile(Parameter.POLARIZABILITY_VOLUME, 0.6827);
        double halfWidth = 0.5 * (profile.high() - profile.low());
        assertThat(halfWidth).isCloseTo(alpha.standardUncertainty(), within(0.15 * alpha.standardUncertainty()));
        PowerCurveIntervals.Bootstrap bootstrap = intervals.bootstrap(20310514L, 400);
        assertThat(bootstrap.failed()).isZero();
        assertThat(bootstrap.deviation()[0])
                .isCloseTo(alpha.standardUncertainty(), within(0.2 * alpha.standardUncertainty()));
        assertThat(bootstrap.generator()).contains("SplitMix64");
        assertThat(intervals.bootstrap(20310514L, 400).mean()).containsExactly(bootstrap.mean());
    }

    @Test
    void profileIntervalOfADegenerateFitIsLopsided() throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read("vp_01");
        PowerCurveFitter fitter =
                file.fitter(PowerCurveChoices.polarizabilityOnly().withFreeFactor());
        PropertyFit fit = fitter.fit(file.data(), Description.QUANTUM).orThrow();
        Interval interval = new PowerCurveIntervals(fitter, file.data(), Description.QUANTUM, fit)
                .profile(Parameter.POLARIZABILITY_VOLUME, 0.9545);

        double value = fit.values()[0];
        assertThat(interval.contains(value)).isTrue();
        assertThat(interval.high() - value).isNotCloseTo(value - interval.low(), within(0.01 * value));
    }

    @Test
    void oneSigmaIntervalsCoverTheTruth() {
        int trials = 300;
        int covered = 0;
        BeamEnsemble coarse = coarseBeam();
        PowerCurveFitter fitter =
                fitter(coarse, PowerCurveChoices.polarizabilityOnly().withFreeFactor());
        for (int k = 0; k < trials; k++) {
            Estimate alpha = fitter.fit(simulated(coarse, 0.0, 9.0, 1000L + k), Description.QUANTUM)
                    .orThrow()
                    .estimate(Parameter.POLARIZABILITY_VOLUME);
            covered += Math.abs(alpha.value() - VOLUME) < alpha.standardUncertainty() ? 1 : 0;
        }

        // Three binomial standard errors about 68.27 %.
        assertThat(covered / (double) trials).isCloseTo(0.6827, within(3 * Math.sqrt(0.6827 * 0.3173 / trials)));
    }
}
