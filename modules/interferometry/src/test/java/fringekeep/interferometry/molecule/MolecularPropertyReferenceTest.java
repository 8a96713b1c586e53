package fringekeep.interferometry.molecule;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import fringekeep.interferometry.judge.ReferenceCase;
import fringekeep.interferometry.nearfield.BeamEnsemble;
import fringekeep.interferometry.nearfield.Description;
import fringekeep.interferometry.nearfield.LaserBeam;
import fringekeep.interferometry.nearfield.LightStrength;
import fringekeep.interferometry.nearfield.PowerSeriesSetup;
import fringekeep.interferometry.statistics.Estimate;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Section e of src/test/reference/public-checks, the deflection and pressure files, published polarizabilities. */
class MolecularPropertyReferenceTest {
    private static final Path REFERENCE = Path.of("src/test/reference");

    @Test
    void polarizabilityUnits() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.phi0")) {
            c.agrees("alpha_SI", Polarizability.siFromVolume(c.si("alpha_vol")));
            c.agrees("alpha_au", Polarizability.atomicUnitsFromVolume(c.si("alpha_vol")));
        }
    }

    @Test
    void publishedPairsOfCubicAngstromAndAtomicUnits() throws IOException {
        // Ground-state polarizabilities of Cs, Rb, K: arXiv:1509.07091, abstract (src/test/reference/published-values).
        double[][] pairs = {{59.45, 401.2, 0.11}, {47.44, 320.1, 0.09}, {42.97, 290.0, 0.08}};
        for (double[] pair : pairs) {
            double volume = Polarizability.volumeFromCubicAngstroms(pair[0]);
            assertThat(Polarizability.atomicUnitsFromVolume(volume)).isCloseTo(pair[1], within(0.06));
            double back = Polarizability.cubicAngstromsFromVolume(Polarizability.volumeFromAtomicUnits(pair[1]));
            assertThat(back).isCloseTo(pair[0], within(pair[2]));
        }
        String text = Files.readString(REFERENCE.resolve("published-values/values.json"));
        assertThat(text).contains("59.45", "401.2", "47.44", "42.97", "290.0");
    }

    @Test
    void polarizabilityFromOneVisibility() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.alpha_from_V")) {
            PowerSeriesSetup setup = PowerSeriesSetup.symmetric(
                    c.si("d"), c.si("f"), c.si("L"), LaserBeam.ideal(2 * c.si("d"), c.si("w_y")));
            BeamEnsemble beam = BeamEnsemble.single(c.si("v"), c.si("mass"));
            // The first rising branch ends where the argument of J_2 reaches 3.054.
            double first = c.expected("alpha_vol")[0] * 1.3;
            PowerCurveChoices choices = PowerCurveChoices.polarizabilityOnly().withSearch(1e-30, first);
            MeasuredCurve data = new MeasuredCurve(
                    new double[] {c.si("P")}, new double[] {c.si("V")}, new double[] {c.si("sigma_V")});
            Estimate alpha = new PowerCurveFitter(setup, beam, choices)
                    .fit(data, Description.QUANTUM)
                    .orThrow()
                    .estimate(Parameter.POLARIZABILITY_VOLUME);
            c.agrees("alpha_vol", alpha.value());
            c.agrees("sigma_alpha", alpha.standardUncertainty());
            c.agrees("phi0", LightStrength.beamPhase(alpha.value(), c.si("P"), c.si("w_y"), c.si("v")));
        }
    }

    @Test
    void recoilOfASeparateBeam() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.recoil")) {
            RecoilBeam laser = new RecoilBeam(c.si("laser_wavelength"), c.si("w_y"), c.si("D"), c.si("d"));
            double photons = LightStrength.runningPhotons(
                    c.si("sigma_abs"), c.si("laser_wavelength"), c.si("P"), c.si("w_y"), c.si("v"));
            RecoilBeam.Effect effect = laser.effect(photons, c.si("mass"), c.si("v"));
            c.agrees("nbar", photons);
            c.agrees("phase_per_photon", laser.phasePerPhoton(c.si("mass"), c.si("v")));
            c.agrees("V_over_V0", effect.visibilityRatio());
            c.agrees("fringe_shift_phase", effect.phaseShift());
            BeamEnsemble beam = BeamEnsemble.single(c.si("v"), c.si("mass"));
            RecoilBeam.Effect averaged = laser.effect(c.si("sigma_abs"), c.si("P"), beam);
            c.agrees("V_over_V0", averaged.visibilityRatio());
            c.agrees("fringe_shift_phase", averaged.phaseShift());
        }
    }

    @Test
    void crossSectionFromRecoilGivesBackWhatMadeTheVisibilities() throws IOException {
        ReferenceCase c = ReferenceCase.startingWith("e.recoil").get(0);
        RecoilBeam laser = new RecoilBeam(c.si("laser_wavelength"), c.si("w_y"), c.si("D"), c.si("d"));
        double ratio = c.expected("V_over_V0")[0];
        Estimate with = new Estimate(0.25 * ratio, 0.001);
        Estimate without = new Estimate(0.25, 0.001);
        Estimate cross = laser.crossSection(with, without, c.si("P"), c.si("mass"), c.si("v"))
                .orElseThrow();
        double loss = 1 - Math.cos(c.expected("phase_per_photon")[0]);
        double photons = c.expected("nbar")[0];

        assertThat(cross.value()).isCloseTo(c.si("sigma_abs"), within(1e-6 * c.si("sigma_abs")));
        double relative = Math.hypot(0.001 / with.value(), 0.001 / 0.25) / (loss * photons);
        assertThat(cross.standardUncertainty()).isCloseTo(relative * cross.value(), within(1e-6 * cross.value()));

        double[] powers = {0.0, 0.4, 0.8, 1.2, 2.0};
        double[] values = new double[5];
        double[] uncertainties = new double[5];
        BeamEnsemble beam = BeamEnsemble.single(c.si("v"), c.si("mass"));
        for (int k = 0; k < 5; k++) {
            values[k] = 0.25 * laser.effect(c.si("sigma_abs"), powers[k], beam).visibilityRatio();
            uncertainties[k] = 0.002;
        }
        PropertyFit fit = laser.fit(new MeasuredCurve(powers, values, uncertainties), beam)
                .orThrow();
        assertThat(fit.estimate(Parameter.ABSORPTION_CROSS_SECTION).value())
                .isCloseTo(c.si("sigma_abs"), within(1e-9 * c.si("sigma_abs")));
        assertThat(fit.estimate(Parameter.UNDISTURBED_VISIBILITY).value()).isCloseTo(0.25, within(1e-12));
    }

    @Test
    void starkDeflection() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.stark")) {
            double dipole = c.si("dipole_rms");
            double chi = FieldDeflection.electricSusceptibility(
                    Polarizability.siFromVolume(c.si("alpha_vol")), dipole * dipole, c.si("T"));
            FieldDeflection field = new FieldDeflection(c.si("L"), c.si("z_a"), c.si("length"), c.si("d"));
            double shift = field.shift(chi, c.si("E_gradE"), c.si("mass"), c.si("v"));
            c.agrees("chi", chi);
            c.agrees("fringe_shift", shift);
            c.agrees("fringe_phase", field.phase(shift));
            assertThat(field.susceptibility(shift, c.si("E_gradE"), c.si("mass"), c.si("v")))
                    .isCloseTo(chi, within(1e-14 * chi));
        }
    }

    @Test
    void magneticDeflection() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.magnetic")) {
            double chi = FieldDeflection.curieSusceptibility(c.si("g_J"), c.si("J"), c.si("T"));
            FieldDeflection field = new FieldDeflection(c.si("L"), c.si("z_a"), c.si("length"), c.si("d"));
            c.agrees("chi_m", chi);
            c.agrees("fringe_shift_paramagnetic", field.shift(chi, c.si("B_gradB"), c.si("mass"), c.si("v")));
            double perNumber = field.phasePerMagneticNumber(c.si("g_J"), 1.0, c.si("mass"), c.si("v"));
            c.agrees("V_factor_mJ", FieldDeflection.unresolvedMoments(perNumber, c.si("J")));
        }
    }

    @Test
    void collisionCrossSections() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.collision")) {
            double path = 2 * c.si("L");
            double coefficient = GasCollisions.coefficientFromAtomicUnits(c.si("C6"));
            double predicted =
                    GasCollisions.effectiveCrossSection(coefficient, c.si("v"), c.si("T_gas"), c.si("gas_mass"));
            c.agrees(
                    "sigma_eff_from_p0",
                    GasCollisions.crossSection(new Estimate(c.si("p0"), 0), c.si("T_gas"), path)
                            .value());
            c.agrees("sigma_eff_C6", predicted);
            c.agrees("p0_C6", GasCollisions.decayPressure(predicted, c.si("T_gas"), path));
        }
    }

    @Test
    void macroscopicity() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.macroscopicity")) {
            c.agrees(
                    "mu",
                    Macroscopicity.interferometerEstimate(c.si("f"), c.si("mass"), c.si("time"))
                            .value());
        }
    }

    @Test
    void wideKicksExcludeWhatTheEstimateSays() {
        // For kicks that resolve every separation the bound is (M/m_e)^2 2T/|ln f|, the estimate with t = 2T.
        ModificationBounds bounds = new ModificationBounds(1.68e-23, 1e-3, 266e-9);
        double time = bounds.coherenceTime(0.5, 1e-20);
        double mu = Macroscopicity.interferometerEstimate(0.5, 1.68e-23, 2e-3).value();
        assertThat(Math.log10(time)).isCloseTo(mu, within(1e-3));
        // For narrow kicks 1 - g = (sigma s/hbar)^2/2, whose time integral over the triangle is 2T (sigma
        // s_max/hbar)^2/6.
        double width = 1e-4 * 1.054571817e-34 / bounds.largestSeparation();
        assertThat(bounds.coherenceTime(0.5, width) / time).isCloseTo(1e-8 / 6, within(1e-12));
    }

    private static MeasuredCurve file(String path, double placeFactor) throws IOException {
        List<double[]> rows = Files.readAllLines(REFERENCE.resolve(path)).stream()
                .filter(line -> !line.startsWith("#") && Character.isDigit(line.charAt(0)))
                .map(line -> List.of(line.split(",")).stream()
                        .mapToDouble(Double::parseDouble)
                        .toArray())
                .toList();
        double[] places = rows.stream().mapToDouble(row -> row[0] * placeFactor).toArray();
        double[] values = rows.stream().mapToDouble(row -> row[1]).toArray();
        double[] uncertainties = rows.stream().mapToDouble(row -> row[2]).toArray();
        return new MeasuredCurve(places, values, uncertainties);
    }

    private static JsonNode expected(String folder, String name) throws IOException {
        Path path = REFERENCE.resolve(folder).resolve("expected.json");
        return new ObjectMapper().readTree(path.toFile()).get("fits").get(name);
    }

    @Test
    void deflectionFileIsUnwrappedAndFittedAsByTheOtherProgram() throws IOException {
        MeasuredCurve wrapped = file("deflection/deflection_01.csv", 1e3);
        double[] squares = new double[wrapped.size()];
        double[] values = new double[wrapped.size()];
        double[] uncertainties = new double[wrapped.size()];
        for (int k = 0; k < squares.length; k++) {
            squares[k] = wrapped.place(k) * wrapped.place(k);
            values[k] = wrapped.value(k);
            uncertainties[k] = wrapped.uncertainty(k);
        }
        JsonNode expected = expected("deflection", "deflection_01");
        double mass = 842.9 * PowerCurveFixture.ATOMIC_MASS;
        FieldDeflection field = new FieldDeflection(0.105, 0.021, 0.05, 2.66e-7);
        assertThat(field.geometryFactor()).isCloseTo(expected.get("K_m2").asDouble(), within(1e-12));
        double factor = field.phase(field.shift(1.0, 2.6e6, mass, 148.0));
        double unit = Polarizability.siFromVolume(1e-30);
        DeflectionFit.Result result =
                new DeflectionFit(factor, 0.0, 300 * unit).fit(new MeasuredCurve(squares, values, uncertainties));

        PropertyFit fit = result.outcome().orThrow();
        Estimate chi = fit.estimate(Parameter.ELECTRIC_SUSCEPTIBILITY);
        assertThat(chi.value() / unit).isCloseTo(expected.get("alpha_A3").asDouble(), within(1e-4));
        assertThat(chi.standardUncertainty() / unit)
                .isCloseTo(expected.get("sigma_alpha_A3").asDouble(), within(1e-5));
        Estimate offset = fit.estimate(Parameter.UNDISTURBED_PHASE);
        assertThat(offset.value()).isCloseTo(expected.get("phi0").asDouble(), within(1e-6));
        assertThat(offset.standardUncertainty())
                .isCloseTo(expected.get("sigma_phi0").asDouble(), within(1e-6));
        assertThat(fit.chiSquare()).isCloseTo(expected.get("chi2").asDouble(), within(1e-6));
        PropertyFit magnetic = new DeflectionFit(factor, 0.0, 300 * unit, Parameter.MAGNETIC_SUSCEPTIBILITY)
                .fit(new MeasuredCurve(squares, values, uncertainties))
                .outcome()
                .orThrow();
        assertThat(magnetic.parameters()).contains(Parameter.MAGNETIC_SUSCEPTIBILITY);
        assertThat(magnetic.estimate(Parameter.MAGNETIC_SUSCEPTIBILITY)).isEqualTo(chi);
        for (int k = 0; k < values.length; k++) {
            assertThat(result.unwrapped()[k])
                    .isCloseTo(expected.get("unwrapped_phase").get(k).asDouble(), within(1e-9));
        }
    }

    @Test
    void pressureFileIsFittedAsByTheOtherProgram() throws IOException {
        MeasuredCurve data = file("pressure/pressure_01.csv", 1.0);
        JsonNode expected = expected("pressure", "pressure_01");
        PropertyFit fit = GasCollisions.fit(data).orThrow();

        Estimate p0 = fit.estimate(Parameter.DECAY_PRESSURE);
        double sigma = expected.get("sigma_p0_Pa").asDouble();
        assertThat(p0.value()).isCloseTo(expected.get("p0_Pa").asDouble(), within(1e-3 * sigma));
        assertThat(p0.standardUncertainty()).isCloseTo(sigma, within(2e-4 * sigma));
        Estimate v0 = fit.estimate(Parameter.UNDISTURBED_VISIBILITY);
        assertThat(v0.value()).isCloseTo(expected.get("V0").asDouble(), within(1e-5));
        assertThat(v0.standardUncertainty()).isCloseTo(expected.get("sigma_V0").asDouble(), within(1e-6));
        assertThat(fit.correlation(Parameter.DECAY_PRESSURE, Parameter.UNDISTURBED_VISIBILITY))
                .isCloseTo(expected.get("correlation").asDouble(), within(1e-4));
        assertThat(fit.chiSquare()).isCloseTo(expected.get("chi2").asDouble(), within(1e-6));
        Estimate cross = GasCollisions.crossSection(p0, 297.0, 0.21);
        assertThat(cross.value()).isCloseTo(expected.get("sigma_eff_m2").asDouble(), within(1e-20));
        assertThat(cross.standardUncertainty())
                .isCloseTo(expected.get("sigma_of_sigma_eff_m2").asDouble(), within(1e-20));
    }
}
