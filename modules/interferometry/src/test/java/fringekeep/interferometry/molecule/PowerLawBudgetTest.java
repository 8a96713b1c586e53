package fringekeep.interferometry.molecule;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.statistics.Estimate;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The relative law of propagation, and moments from temperature. */
class PowerLawBudgetTest {
    @Test
    void relativePartsAddInQuadrature() {
        PowerLawBudget budget = PowerLawBudget.of(
                new Estimate(100.0, 1.5),
                List.of(new PowerLawBudget.Input("speed", 2.0, 0.01), new PowerLawBudget.Input("field", -2.0, 0.005)));

        assertThat(budget.parts().get(0).contribution()).isCloseTo(2.0, within(1e-12));
        assertThat(budget.parts().get(1).contribution()).isCloseTo(1.0, within(1e-12));
        assertThat(budget.shared()).isCloseTo(Math.sqrt(5.0), within(1e-12));
        assertThat(budget.combined()).isCloseTo(Math.sqrt(5.0 + 2.25), within(1e-12));
    }

    @Test
    void recordedWordsReadTheSameOnEveryRelease() {
        assertThat(Rounded.words("from {3} to {4} in {} steps", 1.23456e-28, 2.0e-3, 7))
                .isEqualTo("from 1.23E-28 to 0.002000 in 7 steps");
        assertThat(Rounded.to(3, Double.POSITIVE_INFINITY)).isEqualTo("infinite");
    }

    @Test
    void momentAndPolarizabilityFollowFromTwoTemperatures() {
        double alpha = Polarizability.siFromVolume(90e-30);
        double moment = Math.pow(2.0 * 1e-21 / 299792458.0, 2);
        double[] temperatures = {400.0, 600.0, 900.0};
        double[] values = new double[3];
        double[] uncertainties = new double[3];
        for (int k = 0; k < 3; k++) {
            values[k] = FieldDeflection.electricSusceptibility(alpha, moment, temperatures[k]);
            uncertainties[k] = 0.02 * alpha;
        }
        PropertyFit fit = MomentFit.fit(new MeasuredCurve(temperatures, values, uncertainties))
                .orThrow();

        assertThat(fit.estimate(Parameter.POLARIZABILITY).value()).isCloseTo(alpha, within(1e-10 * alpha));
        assertThat(fit.estimate(Parameter.SQUARED_DIPOLE_MOMENT).value()).isCloseTo(moment, within(1e-10 * moment));
        assertThat(MomentFit.fit(new MeasuredCurve(
                        new double[] {500.0, 500.0}, new double[] {alpha, alpha}, new double[] {1e-40, 1e-40})))
                .isInstanceOf(FitRefused.class);
    }

    @Test
    void ratioToAReferenceNeedsNoGeometry() {
        ReferenceRatio.Deflected species =
                new ReferenceRatio.Deflected(new Estimate(1.1e-7, 2e-9), 1000.0, new Estimate(150.0, 1.5));
        ReferenceRatio.Deflected reference =
                new ReferenceRatio.Deflected(new Estimate(1.6e-7, 1e-9), 720.0, new Estimate(170.0, 0.0));
        Estimate ratio = ReferenceRatio.of(species, reference);

        double expected = 1.1e-7 * 1000 * 150 * 150 / (1.6e-7 * 720 * 170 * 170);
        assertThat(ratio.value()).isCloseTo(expected, within(1e-14));
        double relative = Math.sqrt(Math.pow(2 / 110.0, 2) + Math.pow(0.02, 2) + Math.pow(1 / 160.0, 2));
        assertThat(ratio.standardUncertainty()).isCloseTo(relative * expected, within(1e-14));
    }

    @Test
    void wrappedPhasesWithAWideGapAreCalledAmbiguous() {
        // Two field strengths only: every turn more of the slope fits as well.
        MeasuredCurve data =
                new MeasuredCurve(new double[] {0.0, 10.0}, new double[] {0.1, 0.4}, new double[] {0.02, 0.02});
        DeflectionFit.Result result = new DeflectionFit(1.0, -1.0, 2.0).fit(data);

        assertThat(result.outcome().orThrow().warnings())
                .extracting(FitWarning::sort)
                .contains(FitWarning.Sort.AMBIGUOUS_PHASE);
    }

    @Test
    void depletionCrossSectionFollowsFromTransmission() {
        double wavelength = 266e-9;
        double perArea = wavelength / (6.62607015e-34 * 299792458.0);
        double[] fluences = {0.0, 100.0, 200.0, 400.0};
        double[] values = new double[4];
        for (int k = 0; k < 4; k++) {
            values[k] = 0.9 * Math.exp(-3e-21 * perArea * fluences[k]);
        }
        PropertyFit fit = PhotoDepletion.fitFluence(
                        new MeasuredCurve(fluences, values, new double[] {0.01, 0.01, 0.01, 0.01}), wavelength)
                .orThrow();

        assertThat(fit.estimate(Parameter.DEPLETION_CROSS_SECTION).value()).isCloseTo(3e-21, within(1e-30));
        assertThat(fit.estimate(Parameter.UNDISTURBED_TRANSMISSION).value()).isCloseTo(0.9, within(1e-10));
    }
}
