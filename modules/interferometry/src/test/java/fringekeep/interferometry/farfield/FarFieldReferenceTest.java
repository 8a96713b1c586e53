package fringekeep.interferometry.farfield;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.judge.ReferenceCase;
import fringekeep.interferometry.nearfield.WeightedNodes;
import fringekeep.interferometry.special.SplitMix64;
import java.io.IOException;
import java.util.Optional;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;
import org.apache.commons.math3.special.BesselJ;
import org.junit.jupiter.api.Test;

/** Section f of src/test/reference/public-checks, and coupled orders against an independent integrator. */
class FarFieldReferenceTest {
    @Test
    void slitPatterns() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("f.farfield.")) {
            double wavelength = Diffraction.wavelength(c.si("mass"), c.si("v"));
            double first = Diffraction.orderPosition(1, wavelength, c.si("d"), c.si("distance"));
            c.agrees("lambda", wavelength);
            c.agrees("first_order_position", first);
            SlitArray grating = new SlitArray(c.si("d"), c.si("slit"), (int) c.si("N"), Optional.empty());
            ScreenAverage screen = new ScreenAverage(
                    c.si("mass"),
                    WeightedNodes.single(c.si("v")),
                    c.si("d"),
                    c.si("distance"),
                    WeightedNodes.single(0.0));
            double[] places = {0.0, 0.25 * first, 0.5 * first, first, 2 * first};
            c.agrees("I_at_0_quarter_half_first_second", screen.intensities(grating::pattern, places));
        }
    }

    @Test
    void patternAveragedOverSpeedsAndWidths() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("f.farfield_avg")) {
            double wavelength = Diffraction.wavelength(c.si("mass"), c.si("v0"));
            double first = Diffraction.orderPosition(1, wavelength, c.si("d"), c.si("distance"));
            SlitArray grating = new SlitArray(c.si("d"), c.si("slit"), (int) c.si("N"), Optional.empty());
            ScreenAverage screen = new ScreenAverage(
                    c.si("mass"),
                    WeightedNodes.normal(c.si("v0"), c.si("sigma_v"), 1.0, 60),
                    c.si("d"),
                    c.si("distance"),
                    offsets81(c.si("W")));
            double[] values = screen.intensities(grating::pattern, new double[] {0.0, first, 0.5 * first});
            c.agrees("ratio_first_order_to_centre", values[1] / values[0]);
            c.agrees("ratio_half_to_centre", values[2] / values[0]);
        }
    }

    /** The file's mean over 81 offsets, ends included: 1/81 wider than the width it names. */
    private static WeightedNodes offsets81(double width) {
        double[] places = new double[81];
        double[] weights = new double[81];
        for (int k = 0; k < 81; k++) {
            places[k] = width * (k / 80.0 - 0.5);
            weights[k] = 1.0;
        }
        return WeightedNodes.of(places, weights);
    }

    @Test
    void braggAngles() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("f.bragg")) {
            double wavelength = Diffraction.wavelength(c.si("mass"), c.si("v"));
            double angle = Diffraction.braggAngle(wavelength, c.si("d"));
            c.agrees("theta_B", angle);
            c.agrees("order_separation", 2 * angle);
            c.agrees("Q", Diffraction.kleinCook(wavelength, c.si("thickness"), c.si("d")));
        }
    }

    @Test
    void thinLightGratings() throws IOException {
        for (ReferenceCase c : ReferenceCase.startingWith("f.raman_nath")) {
            // One nanosecond of light against a Talbot time of a second: nothing moves meanwhile.
            CoupledOrders orders = new CoupledOrders(1.0, 0.0, 20);
            double phase = c.si("phi0");
            double[] populations = orders.populations(t -> phase / 1e-13, 1e-13, 1);
            c.agrees("P_n_from_0", populations[20], populations[21], populations[22], populations[23]);
        }
    }

    @Test
    void thinLimitIsBesselSquared() {
        CoupledOrders orders = new CoupledOrders(1.0, 0.0, 40);
        double[] populations = orders.populations(t -> 13.0 / 1e-13, 1e-13, 1);
        double sum = 0.0;
        for (int n = -40; n <= 40; n++) {
            double bessel = new BesselJ(Math.abs(n)).value(6.5);
            assertThat(populations[n + 40]).isCloseTo(bessel * bessel, within(1e-9));
            sum += populations[n + 40];
        }
        assertThat(sum).isCloseTo(1.0, within(1e-13));
    }

    @Test
    void thickGratingAtBraggIncidenceIsTheTwoLevelFormula() {
        // Light that stays 200 Talbot times: orders other than 0 and 1 are far off resonance.
        CoupledOrders orders = new CoupledOrders(1.0, -0.5, 6);
        for (double phase : new double[] {1.0, Math.PI, 2 * Math.PI, 5.0}) {
            double[] populations = orders.populations(t -> phase / 200.0, 200.0, 1);
            double reflected = Math.pow(Math.sin(phase / 4), 2);
            assertThat(orders.twoLevelReflection(phase, 200.0)).isCloseTo(reflected, within(1e-14));
            assertThat(populations[7]).isCloseTo(reflected, within(2e-3));
            assertThat(populations[6] + populations[7]).isCloseTo(1.0, within(1e-4));
        }
    }

    @Test
    void gaussianLightOfMiddlingThicknessEqualsAnIndependentIntegrator() {
        int highest = 8;
        double phase = 9.0;
        double width = 0.05;
        double duration = 0.5;
        double peak = phase / (width * Math.sqrt(2 * Math.PI));
        CoupledOrders orders = new CoupledOrders(1.0, -0.2, highest);
        double[] ours = orders.populations(t -> peak * Math.exp(-0.5 * Math.pow((t - 0.25) / width, 2)), duration, 400);

        double[] state = new double[2 * (2 * highest + 1)];
        state[2 * highest] = 1.0;
        FirstOrderDifferentialEquations equations = new FirstOrderDifferentialEquations() {
            @Override
            public int getDimension() {
                return state.length;
            }

            @Override
            public void computeDerivatives(double t, double[] y, double[] slope) {
                double rate = peak * Math.exp(-0.5 * Math.pow((t - 0.25) / width, 2));
                for (int n = 0; n <= 2 * highest; n++) {
                    double energy = Math.PI * Math.pow(n - highest - 0.2, 2);
                    double re = energy * y[2 * n] - rate / 4 * (at(y, 2 * n - 2) + at(y, 2 * n + 2));
                    double im = energy * y[2 * n + 1] - rate / 4 * (at(y, 2 * n - 1) + at(y, 2 * n + 3));
                    slope[2 * n] = im;
                    slope[2 * n + 1] = -re;
                }
            }

            private double at(double[] y, int index) {
                return index < 0 || index >= y.length ? 0.0 : y[index];
            }
        };
        new DormandPrince853Integrator(1e-9, 1e-2, 1e-13, 1e-13).integrate(equations, 0, state, duration, state);
        for (int n = 0; n <= 2 * highest; n++) {
            double other = state[2 * n] * state[2 * n] + state[2 * n + 1] * state[2 * n + 1];
            assertThat(ours[n]).isCloseTo(other, within(1e-8));
        }
    }

    @Test
    void fallAndSpeedAreInverse() {
        double fallen = Diffraction.fall(1.5, 200.0, 9.80665);
        assertThat(fallen).isCloseTo(0.5 * 9.80665 * Math.pow(1.5 / 200.0, 2), within(1e-15));
        assertThat(Diffraction.velocityOfFall(1.5, fallen, 9.80665)).isCloseTo(200.0, within(1e-10));
    }

    @Test
    void imageOfKnownOrdersGivesTheirPopulationsBack() {
        double[] truth = {0.1, 0.25, 0.3, 0.25, 0.1};
        SplitMix64 random = new SplitMix64(77L);
        double[][] pixels = new double[40][120];
        for (int row = 0; row < 40; row++) {
            for (int column = 0; column < 120; column++) {
                double tilted = column - 0.15 * (row - 19.5);
                double mean = 50 + 0.2 * row + 0.1 * column;
                for (int order = -2; order <= 2; order++) {
                    mean += row < 6 || row > 33 ? 0 : 900 * truth[order + 2] * shape(order, tilted);
                }
                pixels[row][column] = mean + Math.sqrt(mean + 9) * random.nextGaussian();
            }
        }
        pixels[12][40] += 5000;
        pixels[25][77] += 900;
        CameraImage.Profile profile =
                new CameraImage(pixels).profile(new CameraImage.Reduction(8, 31, 0.15, 8.0, 1.0, 3.0, 5));
        double[] places = new double[120];
        for (int k = 0; k < 120; k++) {
            places[k] = k;
        }
        OrderPopulations.Result result = new OrderPopulations(-2, 2)
                .fit(places, profile.values(), profile.uncertainties(), FarFieldReferenceTest::shape)
                .orElseThrow();

        assertThat(profile.hot()).contains(new CameraImage.Pixel(12, 40), new CameraImage.Pixel(25, 77));
        for (int k = 0; k < 5; k++) {
            double sigma = result.populations()[k].standardUncertainty();
            assertThat(result.populations()[k].value()).isCloseTo(truth[k], within(4 * sigma + 2e-3));
            assertThat(sigma).isBetween(1e-4, 2e-2);
        }
    }

    private static double shape(double order, double place) {
        double distance = (place - 60 - 20 * order) / 3.5;
        return Math.exp(-0.5 * distance * distance);
    }
}
