package fringekeep.interferometry.molecule;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.statistics.Estimate;
import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Fits of visibility against power against SciPy's fits of the same files (src/test/reference/power-curves). */
class PowerCurveReferenceTest {
    private static final double CUBIC_ANGSTROM = 1e-30;
    // SciPy's tolerances on the cost leave about 1e-4 of a standard uncertainty.
    private static final double OF_A_SIGMA = 2e-3;

    /** Light of the third file is absorbed with n0/phi0 = 0.33, which fixes sigma = 4 pi^2 alpha 0.33/lambda. */
    private static double crossSectionPerVolume(PowerCurveFixture file, double ratio) {
        return 4 * Math.PI * Math.PI * ratio / (file.number("laser_nm") * 1e-9);
    }

    @ParameterizedTest
    @ValueSource(strings = {"vp_01", "vp_02"})
    void polarizabilityAndFactorEqualTheOtherPrograms(String name) throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read(name);
        JsonNode expected = file.expected().get("alpha_scale_free_nr_fixed");
        PropertyFit fit = file.fitter(PowerCurveChoices.polarizabilityOnly().withFreeFactor())
                .fit(file.data(), Description.QUANTUM)
                .orThrow();

        Estimate alpha = fit.estimate(Parameter.POLARIZABILITY_VOLUME);
        double sigma = expected.get("sigma_alpha_A3").asDouble();
        assertThat(alpha.value() / CUBIC_ANGSTROM)
                .isCloseTo(expected.get("alpha_A3").asDouble(), within(OF_A_SIGMA * sigma));
        assertThat(alpha.standardUncertainty() / CUBIC_ANGSTROM).isCloseTo(sigma, within(1e-3 * sigma));
        Estimate factor = fit.estimate(Parameter.VISIBILITY_FACTOR);
        double sigmaScale = expected.get("sigma_scale").asDouble();
        assertThat(factor.value()).isCloseTo(expected.get("scale").asDouble(), within(OF_A_SIGMA * sigmaScale));
        assertThat(factor.standardUncertainty()).isCloseTo(sigmaScale, within(1e-3 * sigmaScale));
        assertThat(fit.correlation(Parameter.POLARIZABILITY_VOLUME, Parameter.VISIBILITY_FACTOR))
                .isCloseTo(expected.get("correlation").asDouble(), within(1e-3));
        assertThat(fit.chiSquare()).isCloseTo(expected.get("chi2").asDouble(), within(1e-5));
        assertThat(fit.degreesOfFreedom()).isEqualTo(expected.get("dof").asInt());
    }

    @ParameterizedTest
    @ValueSource(strings = {"vp_01", "vp_02"})
    void polarizabilityAloneEqualsTheOtherPrograms(String name) throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read(name);
        JsonNode expected = file.expected().get("alpha_only_scale_1");
        PropertyFit fit = file.fitter(PowerCurveChoices.polarizabilityOnly())
                .fit(file.data(), Description.QUANTUM)
                .orThrow();

        double sigma = expected.get("sigma_alpha_A3").asDouble();
        Estimate alpha = fit.estimate(Parameter.POLARIZABILITY_VOLUME);
        assertThat(alpha.value() / CUBIC_ANGSTROM)
                .isCloseTo(expected.get("alpha_A3").asDouble(), within(OF_A_SIGMA * sigma));
        assertThat(alpha.standardUncertainty() / CUBIC_ANGSTROM).isCloseTo(sigma, within(1e-3 * sigma));
        assertThat(fit.chiSquare()).isCloseTo(expected.get("chi2").asDouble(), within(1e-4));
    }

    @Test
    void absorptionCrossSectionEqualsTheOtherPrograms() throws IOException {
        PowerCurveFixture file = PowerCurveFixture.read("vp_03");
        JsonNode expected = file.expected().get("alpha_nr_free_scale_true");
        PropertyFit fit = file.fitter(PowerCurveChoices.polarizabilityOnly().withFreeCrossSection())
                .fit(file.data(), Description.QUANTUM)
                .orThrow();

        double sigma = expected.get("sigma_alpha_A3").asDouble();
        Estimate alpha = fit.estimate(Parameter.POLARIZABILITY_VOLUME);
        assertThat(alpha.value() / CUBIC_ANGSTROM)
                .isCloseTo(expected.get("alpha_A3").asDouble(), within(OF_A_SIGMA * sigma));
        assertThat(alpha.standardUncertainty() / CUBIC_ANGSTROM).isCloseTo(sigma, within(3e-3 * sigma));
        double ratio = expected.get("nr").asDouble();
        double crossSection =
                crossSectionPerVolume(file, ratio) * expected.get("alpha_A3").asDouble() * CUBIC_ANGSTROM;
        assertThat(crossSection).isCloseTo(expected.get("sigma_abs_m2").asDouble(), within(1e-4 * crossSection));
        assertThat(fit.estimate(Parameter.ABSORPTION_CROSS_SECTION).value())
                .isCloseTo(crossSection, within(1e-3 * crossSection));
        assertThat(fit.chiSquare()).isCloseTo(expected.get("chi2").asDouble(), within(1e-5));
    }

    @Test
    void fitsBracketTheTruthTheFilesWereMadeFrom() throws IOException {
        for (String name : new String[] {"vp_01", "vp_02", "vp_03"}) {
            PowerCurveFixture file = PowerCurveFixture.read(name);
            PowerCurveChoices choices = PowerCurveChoices.polarizabilityOnly().withFreeFactor();
            PowerCurveChoices asked = name.equals("vp_03") ? choices.withFreeCrossSection() : choices;
            Estimate alpha = file.fitter(asked)
                    .fit(file.data(), Description.QUANTUM)
                    .orThrow()
                    .estimate(Parameter.POLARIZABILITY_VOLUME);
            double truth = file.truth().get("alpha").asDouble() * CUBIC_ANGSTROM;
            assertThat(Math.abs(alpha.value() - truth)).isLessThan(3 * alpha.standardUncertainty());
        }
    }
}
