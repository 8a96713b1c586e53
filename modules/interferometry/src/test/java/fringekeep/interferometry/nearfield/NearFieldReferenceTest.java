package fringekeep.interferometry.nearfield;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.judge.ReferenceCase;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Section c, d and the strengths of e in src/test/reference/public-checks: direct quadrature and plane-wave sums. */
class NearFieldReferenceTest {
    private static final double MASS = 1e-24;

    private static int order(ReferenceCase c) {
        return (int) c.si("n");
    }

    @Test
    void phaseGratings() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.B_phase")) {
            LightKernel kernel = LightKernel.ofPhase(c.si("phi0"));
            c.agrees("B", kernel.quantum(order(c), c.si("xi")));
            c.agrees("B_classical", kernel.classical(order(c), c.si("xi")));
        }
    }

    @Test
    void absorbingGratingsInBothReadings() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.B_absorb")) {
            assertBothKernels(c);
        }
        for (ReferenceCase c : ReferenceCase.startingWith("c.B_degenerate")) {
            assertBothKernels(c);
        }
    }

    private static void assertBothKernels(ReferenceCase c) {
        double phase = c.si("phi0");
        double photons = c.si("n0_antinode");
        LightKernel coherent = new LightKernel(phase, photons, RecoilKernel.STANDING_MODE_COHERENT);
        LightKernel walk = new LightKernel(phase, photons, RecoilKernel.RANDOM_WALK);
        c.agrees("B_standing_mode_coherent", coherent.quantum(order(c), c.si("xi")));
        c.agrees("B_poisson_random_walk", walk.quantum(order(c), c.si("xi")));
    }

    @Test
    void depletionGratings() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.B_deplete")) {
            DepletionKernel kernel = new DepletionKernel(c.si("phi0"), c.si("n0_antinode"));
            c.agrees("B", kernel.quantum(order(c), c.si("xi")));
            c.agrees("B_classical", kernel.classical(order(c), c.si("xi")));
        }
    }

    /** A passage whose flight time is the given number of Talbot times for period d. */
    private static Passage passage(double talbotTimes, double period) {
        double talbotTime = MASS * period * period / Codata2018.PLANCK_CONSTANT;
        return Passage.ofPulses(talbotTimes * talbotTime, MASS);
    }

    private static double visibility(Description description, double talbot, TalbotKernel... gratings) {
        ThreeGratingFringe fringe = new ThreeGratingFringe(TrainGeometry.equal(266e-9), description, 1);
        return fringe.series(gratings[0], gratings[1], gratings[2], passage(talbot, 266e-9))
                .sinusoidalVisibility();
    }

    @Test
    void threeSlitGratings() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.TLI_slits")) {
            SlitKernel first = new SlitKernel(c.si("f1"));
            SlitKernel second = new SlitKernel(c.si("f2"));
            SlitKernel third = new SlitKernel(c.si("f3"));
            double talbot = c.si("L_over_LT");
            c.agrees("V_quantum", visibility(Description.QUANTUM, talbot, first, second, third));
            c.agrees("V_classical", visibility(Description.CLASSICAL, talbot, first, second, third));
        }
    }

    @Test
    void slitLightSlit() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.KDTL.")) {
            SlitKernel outer = new SlitKernel(c.si("f"));
            LightKernel light = LightKernel.ofPhase(c.si("phi0"));
            double talbot = c.si("L_over_LT");
            c.agrees("V_quantum", visibility(Description.QUANTUM, talbot, outer, light, outer));
            c.agrees("V_classical", visibility(Description.CLASSICAL, talbot, outer, light, outer));
        }
    }

    @Test
    void slitAbsorbingLightSlit() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.KDTL_absorbing")) {
            SlitKernel outer = new SlitKernel(c.si("f"));
            double photons = c.si("n0_antinode");
            double talbot = c.si("L_over_LT");
            LightKernel coherent = new LightKernel(c.si("phi0"), photons, RecoilKernel.STANDING_MODE_COHERENT);
            LightKernel walk = new LightKernel(c.si("phi0"), photons, RecoilKernel.RANDOM_WALK);
            c.agrees("V_standing_mode_coherent", visibility(Description.QUANTUM, talbot, outer, coherent, outer));
            c.agrees("V_poisson_random_walk", visibility(Description.QUANTUM, talbot, outer, walk, outer));
        }
    }

    @Test
    void threeDepletingPulses() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.three_pulse.")) {
            // The outer gratings' phase has no effect with equal separations.
            DepletionKernel first = new DepletionKernel(c.si("phi2"), c.si("n1"));
            DepletionKernel second = new DepletionKernel(c.si("phi2"), c.si("n2"));
            DepletionKernel third = new DepletionKernel(c.si("phi2"), c.si("n3"));
            double talbot = c.si("T_over_TT");
            c.agrees("V_quantum", visibility(Description.QUANTUM, talbot, first, second, third));
            c.agrees("V_classical", visibility(Description.CLASSICAL, talbot, first, second, third));
            c.agrees("mean_transmission_product", first.transmission() * second.transmission() * third.transmission());
        }
    }

    @Test
    void unequalPulseSeparations() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.three_pulse_unequal")) {
            double period = 80e-9;
            double talbotTime = MASS * period * period / Codata2018.PLANCK_CONSTANT;
            double spread = c.si("sigma_p_over_h_per_d") * Codata2018.PLANCK_CONSTANT / (period * MASS);
            Passage passage =
                    new Passage(c.si("T1_over_TT") * talbotTime, c.si("T2_over_TT") * talbotTime, MASS, spread);
            FringeSeries series = new ThreeGratingFringe(TrainGeometry.equal(period), Description.QUANTUM, 1)
                    .series(
                            new DepletionKernel(c.si("phi1"), c.si("n1")),
                            new DepletionKernel(c.si("phi2"), c.si("n2")),
                            new DepletionKernel(c.si("phi3"), c.si("n3")),
                            passage);
            c.agrees("V", series.sinusoidalVisibility());
            c.agrees("mean_transmission", series.coefficient(0));
        }
    }

    @Test
    void wallPotentialOfTheSecondGrating() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.TLI_vdW")) {
            double slit = c.si("slit_w");
            double period = c.si("period");
            TalbotKernel outer = new SlitKernel(slit / period);
            WallPotential wall = new WallPotential(c.si("C3") * 1e-27, 3, c.si("thickness_b"), c.si("cutoff_xc"));
            EikonalSlitKernel second = new EikonalSlitKernel(period, slit, wall, c.si("velocity"));
            double talbot = c.si("L_over_LT");
            c.agrees("V_quantum", visibility(Description.QUANTUM, talbot, outer, second, outer));
            c.agrees("transmission_g2", second.transmission());
            WallPotential none = new WallPotential(0.0, 3, c.si("thickness_b"), c.si("cutoff_xc"));
            EikonalSlitKernel bare = new EikonalSlitKernel(period, slit, none, c.si("velocity"));
            c.agrees("V_quantum_C3_zero_same_cutoff", visibility(Description.QUANTUM, talbot, outer, bare, outer));
        }
    }

    @Test
    void orderWeightsBehindOneGratingWithWalls() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("f.vdw_orders")) {
            int exponent = order(c);
            double coefficient = c.si("C_n") * Math.pow(1e-9, exponent);
            WallPotential wall = new WallPotential(coefficient, exponent, c.si("thickness_b"), c.si("cutoff_xc"));
            EikonalSlitKernel grating = new EikonalSlitKernel(c.si("period"), c.si("slit_w"), wall, c.si("v"));
            double[] weights = new double[c.expected("P0_to_P3").length];
            for (int n = 0; n < weights.length; n++) {
                double[] amplitude = grating.orderAmplitude(n);
                weights[n] = amplitude[0] * amplitude[0] + amplitude[1] * amplitude[1];
            }
            c.agrees("P0_to_P3", weights);
        }
    }

    @Test
    void averageOverVelocityAndHeight() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("d.average")) {
            double mean = c.si("v_mean");
            double deviation = c.si("v_sigma");
            WeightedNodes one = WeightedNodes.single(mean);
            WeightedNodes flux = WeightedNodes.ofDensity(
                    v -> v * v * v * Math.exp(-(v - mean) * (v - mean) / (2 * deviation * deviation)),
                    mean - 6 * deviation,
                    mean + 6 * deviation,
                    40);
            WeightedNodes gaussian = WeightedNodes.normal(mean, deviation, 1.0);
            WeightedNodes axis = WeightedNodes.single(0.0);
            double half = 0.5 * c.si("beam_height");
            c.agrees("V_monochromatic", powerVisibility(c, one, axis));
            c.agrees("V_gaussian_velocity", powerVisibility(c, gaussian, axis));
            c.agrees("V_v3_shifted_maxwell_vw_sqrt2_sigma", powerVisibility(c, flux, axis));
            c.agrees(
                    "V_height_averaged_monochromatic", powerVisibility(c, one, WeightedNodes.uniform(-half, half, 12)));
        }
    }

    private static double powerVisibility(ReferenceCase c, WeightedNodes velocities, WeightedNodes heights) {
        return model(c, velocities, heights, Description.QUANTUM)
                .visibility(c.si("P"), new OpticalResponse(c.si("alpha_vol"), 0.0));
    }

    private static VisibilityAgainstPower model(
            ReferenceCase c, WeightedNodes velocities, WeightedNodes heights, Description description) {
        PowerSeriesSetup setup = PowerSeriesSetup.symmetric(
                c.si("d"), c.si("f"), c.si("L"), LaserBeam.ideal(2 * c.si("d"), c.si("w_y")));
        BeamEnsemble beam = new BeamEnsemble(velocities, WeightedNodes.single(c.si("mass")), heights);
        return new VisibilityAgainstPower(setup, beam, description);
    }

    @Test
    void visibilityAgainstPowerOverABroadSlowBeam() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("d.VP_curve")) {
            // The file's values are Simpson sums on 1501 speeds, which are 4e-4 from the limit; so the same sum here.
            WeightedNodes flux = simpson(c.si("v0"), c.si("vw"), 8.0, 1501);
            double half = 0.5 * c.si("beam_height");
            WeightedNodes heights = WeightedNodes.uniform(-half, half, 12);
            OpticalResponse response = new OpticalResponse(c.si("alpha_vol"), 0.0);
            VisibilityAgainstPower model = model(c, flux, heights, Description.QUANTUM);
            double[] curve = c.list("P");
            for (int k = 0; k < curve.length; k++) {
                curve[k] = model.visibility(curve[k], response);
            }
            c.agrees("V_quantum", curve);
        }
    }

    @Test
    void visibilityAgainstPowerConvergesInBothDescriptions() throws IOException {
        ReferenceCase c = ReferenceCase.startingWith("d.VP_curve").get(0);
        WeightedNodes flux = WeightedNodes.shiftedFlux(c.si("v0"), c.si("vw"), 8.0, 1000);
        WeightedNodes heights = WeightedNodes.uniform(-0.5 * c.si("beam_height"), 0.5 * c.si("beam_height"), 8);
        VisibilityAgainstPower quantum = model(c, flux, heights, Description.QUANTUM);
        VisibilityAgainstPower classical = model(c, flux, heights, Description.CLASSICAL);
        OpticalResponse response = new OpticalResponse(c.si("alpha_vol"), 0.0);

        for (String line : Files.readAllLines(Path.of("src/test/reference/visibility-power/curve.csv"))
                .subList(2, 8)) {
            String[] cells = line.split(",");
            double power = Double.parseDouble(cells[0]);
            double expected = Double.parseDouble(cells[1]);
            assertThat(quantum.visibility(power, response)).isCloseTo(expected, within(2e-6 + 2e-5 * expected));
            expected = Double.parseDouble(cells[2]);
            assertThat(classical.visibility(power, response)).isCloseTo(expected, within(2e-6 + 2e-5 * expected));
        }
    }

    private static WeightedNodes simpson(double shift, double width, double low, int points) {
        double[] speeds = new double[points];
        double[] weights = new double[points];
        for (int k = 0; k < points; k++) {
            double v = low + (shift + 6 * width - low) * k / (points - 1);
            boolean end = k == 0 || k == points - 1;
            double factor = end ? 1.0 : k % 2 == 1 ? 4.0 : 2.0;
            speeds[k] = v;
            weights[k] = factor * v * v * v * Math.exp(-(v - shift) * (v - shift) / (width * width));
        }
        return WeightedNodes.of(speeds, weights);
    }

    @Test
    void strengthsOfAStandingWave() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.phi0")) {
            c.agrees("phi0", LightStrength.beamPhase(c.si("alpha_vol"), c.si("P"), c.si("w_y"), c.si("v")));
            c.agrees(
                    "n0_antinode",
                    LightStrength.beamPhotons(
                            c.si("sigma_abs"), c.si("laser_wavelength"), c.si("P"), c.si("w_y"), c.si("v")));
        }
    }

    @Test
    void eikonalWithoutForceEqualsTheBareSlitOfTheSameOpening() {
        WallPotential none = new WallPotential(0.0, 4, 1e-7, 5e-9);
        MaterialGrating grating = new MaterialGrating(2.66e-7, 0.42, Optional.of(none));
        SlitKernel bare = new SlitKernel(0.42 - 1e-8 / 2.66e-7);
        for (double xi = -2.3; xi < 2.4; xi += 0.0971) {
            for (int n = -3; n <= 3; n++) {
                assertThat(grating.at(150.0).quantum(n, xi)).isCloseTo(bare.quantum(n, xi), within(1e-14));
                assertThat(grating.at(150.0).classical(n, xi)).isCloseTo(bare.classical(n, xi), within(1e-14));
            }
        }
    }
}
