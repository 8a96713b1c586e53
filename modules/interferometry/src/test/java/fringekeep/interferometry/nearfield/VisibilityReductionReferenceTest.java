package fringekeep.interferometry.nearfield;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.judge.ReferenceCase;
import java.io.IOException;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Reductions of section c and e in src/test/reference/public-checks, and the budget. */
class VisibilityReductionReferenceTest {
    @Test
    void pulseMismatch() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("c.detuned")) {
            // Gratings that only transmit and a source of Gaussian spread: the factor is the source's coherence alone.
            double sigma = 2 * Math.PI * c.si("sigma_v") * c.si("tau") / c.si("d");
            c.agrees("factor", VisibilityReduction.phaseJitter(sigma));
        }
    }

    @Test
    void dephasingByASpreadOfSpeeds() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.dephasing")) {
            WeightedNodes speeds = WeightedNodes.normal(c.si("v0"), c.si("sigma_v"), 1.0, 120);
            VisibilityReduction.Dephasing left =
                    VisibilityReduction.dephasing(c.si("phi_ref"), c.si("v0"), c.si("p"), speeds);
            if (c.si("v0") > 6 * c.si("sigma_v")) {
                c.agrees("V_factor", left.factor());
                c.agrees("mean_phase", left.phase());
            } else {
                // The file integrates through v = 0, where the phase has no limit; ours leaves out v < 1 m/s.
                assertThat(left.factor()).isCloseTo(c.expected("V_factor")[0], within(1e-6));
                assertThat(left.phase()).isCloseTo(c.expected("mean_phase")[0], within(1e-6));
            }
        }
    }

    @Test
    void inertialPhases() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.inertial")) {
            double time = c.si("L") / c.si("v");
            c.agrees("phase_gravity", VisibilityReduction.accelerationPhase(c.si("g"), time, c.si("d")));
            c.agrees(
                    "phase_coriolis_magnitude",
                    VisibilityReduction.rotationPhase(c.si("Omega_perp"), c.si("L"), c.si("v"), c.si("d")));
        }
    }

    @Test
    void vibration() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.vibration")) {
            double a = c.si("A");
            double d = c.si("d");
            double time = c.si("L") / c.si("v");
            c.agrees("common_mode", VisibilityReduction.commonVibration(a, c.si("frequency"), time, d));
            c.agrees("independent_product", VisibilityReduction.independentVibration(a, a, a, d));
            c.agrees("second_grating_only", VisibilityReduction.independentVibration(0, a, 0, d));
        }
    }

    @Test
    void alignment() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("e.alignment")) {
            double d = c.si("d");
            c.agrees("roll_outer", VisibilityReduction.outerRoll(c.si("roll"), c.si("beam_height"), d));
            c.agrees("roll_centre", VisibilityReduction.centreRoll(c.si("roll"), c.si("beam_height"), d));
            c.agrees("period_outer", VisibilityReduction.periodMismatch(d, d, d + c.si("delta_d"), c.si("beam_width")));
        }
    }

    @Test
    void periodsMustMatchToATenthOfANanometreOverAMillimetre() {
        // Common practice, no source: optical and mechanical gratings must match to about 0.1 nm over the beam's width.
        assertThat(VisibilityReduction.periodMismatch(266e-9, 266e-9, 266.01e-9, 1e-3))
                .isGreaterThan(0.95);
        assertThat(VisibilityReduction.periodMismatch(266e-9, 266e-9, 266.1e-9, 1e-3))
                .isLessThan(0.3);
    }

    @Test
    void budgetNamesWhatDominates() {
        VisibilityBudget budget = new VisibilityBudget(
                0.4,
                List.of(
                        new VisibilityBudget.Entry("vibration", 0.9, Standing.DERIVED),
                        new VisibilityBudget.Entry("collisions", 0.5, Standing.PUBLISHED),
                        new VisibilityBudget.Entry("alignment", 1.0, Standing.DERIVED)));

        assertThat(budget.expected()).isCloseTo(0.18, within(1e-15));
        assertThat(budget.byShare().get(0).entry().cause()).isEqualTo("collisions");
        double sum = budget.byShare().stream()
                .mapToDouble(VisibilityBudget.Share::share)
                .sum();
        assertThat(sum).isCloseTo(1.0, within(1e-15));
    }

    @Test
    void thermalEmissionOfAColdOrSlowlySeparatedMoleculeIsHarmless() {
        // A constant cross section far below the molecule's size; the rate then is a known integral.
        double area = 1e-24;
        ThermalEmission molecule = new ThermalEmission(omega -> area, 1e-18);
        double temperature = 2000.0;
        double unit = 1.380649e-23 * temperature / 1.054571817646156e-34;
        double light = Math.PI * 299792458.0;
        double expected = area * unit * unit * unit * 2.0 / (light * light);

        // Heat capacity so large that its term vanishes: integral of x^2 e^-x is 2.
        assertThat(molecule.rate(temperature)).isCloseTo(expected, within(1e-4 * expected));
        assertThat(molecule.decoherence(temperature, 0.0)).isZero();
        assertThat(molecule.decoherence(temperature, 1.0)).isCloseTo(expected, within(2e-2 * expected));
        assertThat(molecule.factor(temperature, 1e-3, 1e-24, 266e-9)).isBetween(0.0, 1.0);
        assertThat(molecule.factor(300.0, 1e-3, 1e-24, 266e-9))
                .isGreaterThan(molecule.factor(temperature, 1e-3, 1e-24, 266e-9));
    }
}
