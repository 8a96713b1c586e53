package fringekeep.interferometry.nearfield;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Optional;
import org.junit.jupiter.api.Test;

/** Whole interferometers: agreement of the two ways to a visibility, limits, orders of magnitude of the trade. */
class BeamInterferometerTest {
    private static final double ATOMIC_MASS = 1.66053906660e-27;
    private static final LaserBeam LASER = LaserBeam.ideal(532e-9, 0.9e-3);

    private static BeamEnsemble beam() {
        return new BeamEnsemble(
                WeightedNodes.gaussHermite(120.0, 10.0, 12, 5.0),
                WeightedNodes.of(new double[] {1500 * ATOMIC_MASS, 1600 * ATOMIC_MASS}, new double[] {2.0, 1.0}),
                WeightedNodes.uniform(-2e-4, 2e-4, 4));
    }

    @Test
    void wholeInterferometerAndPowerCurveAgree() {
        MaterialGrating walled =
                new MaterialGrating(266e-9, 0.42, Optional.of(new WallPotential(1e-49, 3, 1.6e-7, 6e-9)));
        for (double cross : new double[] {0.0, 2e-21}) {
            for (Description description : Description.values()) {
                OpticalResponse response = new OpticalResponse(1.6e-28, cross);
                StandingLightGrating light = new StandingLightGrating(266e-9, LASER, 5.0, response);
                double whole = new BeamInterferometer(walled, light, walled, 0.1, 0.1, Double.POSITIVE_INFINITY)
                        .fringe(beam(), description, 1)
                        .signedVisibility();
                PowerSeriesSetup setup = new PowerSeriesSetup(
                        TrainGeometry.equal(266e-9), walled, walled, 0.1, 0.1, Double.POSITIVE_INFINITY, LASER);
                double curve = new VisibilityAgainstPower(setup, beam(), description).signedVisibility(5.0, response);
                assertThat(whole).isCloseTo(curve, within(1e-13));
            }
        }
    }

    @Test
    void unequalSeparationsNeedACollimatedBeam() {
        StandingLightGrating light = new StandingLightGrating(266e-9, LASER, 5.0, new OpticalResponse(1.6e-28, 0.0));
        MaterialGrating outer = MaterialGrating.bare(266e-9, 0.42);
        double equal = visibility(outer, light, 0.1, 0.1, 1e-3);
        double collimated = visibility(outer, light, 0.1, 0.1001, 1e-4);
        double divergent = visibility(outer, light, 0.1, 0.1001, 1e-2);

        assertThat(collimated).isCloseTo(equal, within(0.1 * equal));
        assertThat(divergent).isLessThan(0.01 * equal);
    }

    private static double visibility(BeamGrating outer, BeamGrating light, double l1, double l2, double divergence) {
        return new BeamInterferometer(outer, light, outer, l1, l2, divergence)
                .fringe(beam(), Description.QUANTUM, 1)
                .sinusoidalVisibility();
    }

    @Test
    void anImperfectMirrorWeakensAPhaseGratingBySquareRootOfItsReflectivity() {
        OpticalResponse response = new OpticalResponse(1.6e-28, 0.0);
        LaserBeam half = new LaserBeam(532e-9, 0.9e-3, 0.25, RecoilKernel.STANDING_MODE_COHERENT);
        TalbotKernel weak = new StandingLightGrating(266e-9, half, 5.0, response).at(120.0, 0.0);
        TalbotKernel full = new StandingLightGrating(266e-9, LASER, 2.5, response).at(120.0, 0.0);

        assertThat(weak.quantum(2, 0.4)).isCloseTo(full.quantum(2, 0.4), within(1e-15));
        assertThatThrownBy(() -> new StandingLightGrating(266e-9, half, 5.0, new OpticalResponse(1e-28, 1e-21)))
                .hasMessageContaining("perfect mirror");
    }

    @Test
    void anImperfectMirrorDimsADepletionGratingEverywhere() {
        OpticalResponse response = new OpticalResponse(0.0, 1e-20);
        LaserBeam imperfect = new LaserBeam(157e-9, 0.9e-3, 0.64, RecoilKernel.STANDING_MODE_COHERENT);
        TalbotKernel kernel = new DepletionLightGrating(78.5e-9, imperfect, 3.0, response).at(120.0, 0.0);
        double photons = LightStrength.beamPhotons(1e-20, 157e-9, 3.0, 0.9e-3, 120.0);

        // Mean of exp(-n(x)), n(x) = n0 [0.8 cos^2 + (1-0.8)^2/4].
        double sum = 0.0;
        for (int k = 0; k < 256; k++) {
            double cosine = Math.cos(Math.PI * k / 256);
            sum += Math.exp(-photons * (0.8 * cosine * cosine + 0.01)) / 256;
        }
        assertThat(kernel.transmission()).isCloseTo(sum, within(1e-14));
    }

    @Test
    void gratingsAMetreApartWorkAtTensOfFemtometres() {
        // Common practice, no source: about 1 m apart, 25,000 u, de Broglie wavelengths of some tens of femtometres.
        double velocity = 300.0;
        double mass = 25_000 * ATOMIC_MASS;
        double deBroglie = 6.62607015e-34 / (mass * velocity);
        assertThat(deBroglie).isBetween(2e-14, 1e-13);
        double talbotLengths = 1.0 * deBroglie / (266e-9 * 266e-9);
        assertThat(talbotLengths).isBetween(0.3, 3.0);
        // The period of a pulsed depletion grating from 157 nm light is half that: 78.5 nm.
        assertThat(0.5 * 157e-9).isCloseTo(78.5e-9, within(1e-15));
    }
}
