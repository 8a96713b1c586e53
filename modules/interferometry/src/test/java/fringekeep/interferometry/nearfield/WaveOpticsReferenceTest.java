package fringekeep.interferometry.nearfield;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.judge.WaveTrain;
import org.junit.jupiter.api.Test;

/**
 * Closed forms against amplitude propagation through three gratings.
 *
 * <p>An incoherent source is a sum over plane waves. For equal flights of a/b Talbot times momenta spread evenly over b
 * units of h/d average out exactly what an unlimited divergence averages out; otherwise the Gaussian is summed finely.
 */
class WaveOpticsReferenceTest {
    private static final double PERIOD = 266e-9;
    private static final double MASS = 1e-24;
    private static final double TALBOT_TIME = MASS * PERIOD * PERIOD / Codata2018.PLANCK_CONSTANT;

    /** 215 of 512 points of a period open: the edges lie between grid points. */
    private static final int POINTS = 1024;

    private static final double OPEN = 215.0 / 512.0;

    private static double[] slits(double x) {
        return new double[] {Math.abs(x - Math.rint(x)) < 0.5 * OPEN ? 1.0 : 0.0, 0.0};
    }

    private static double[] lightPhase(double phase, double x) {
        double cosine = Math.cos(Math.PI * x);
        return new double[] {Math.cos(phase * cosine * cosine), Math.sin(phase * cosine * cosine)};
    }

    /** Operator of k absorbed photons: sqrt(n0^k/k!) cos^k(pi x) exp(-n0 cos^2/2), times the phase. */
    private static double[] absorbed(int k, double photons, double phase, double x) {
        double cosine = Math.cos(Math.PI * x);
        double size = Math.exp(-0.5 * photons * cosine * cosine);
        for (int i = 1; i <= k; i++) {
            size *= cosine * Math.sqrt(photons / i);
        }
        double[] t = lightPhase(phase, x);
        return new double[] {size * t[0], size * t[1]};
    }

    private static double slitLightSlit(double phase, double photons, int numerator, int denominator, int mostPhotons) {
        double[][] outer = WaveTrain.sample(WaveOpticsReferenceTest::slits, POINTS);
        double[][][] light = new double[mostPhotons + 1][][];
        for (int k = 0; k <= mostPhotons; k++) {
            int count = k;
            light[k] = WaveTrain.sample(x -> absorbed(count, photons, phase, x), POINTS);
        }
        double[] density = new double[POINTS];
        double time = numerator / (double) denominator;
        int samples = denominator * 1031;
        for (int i = 0; i < samples; i++) {
            WaveTrain wave = new WaveTrain(POINTS, denominator * (i + 0.37) / samples)
                    .pass(outer)
                    .fly(time);
            for (double[][] branch : light) {
                wave.copy().pass(branch).fly(time).addDensity(1.0, density);
            }
        }
        return WaveTrain.meanAndSignedVisibility(density, outer)[1];
    }

    private static double closedForm(TalbotKernel light, double time) {
        SlitKernel outer = new SlitKernel(OPEN);
        return new ThreeGratingFringe(TrainGeometry.equal(PERIOD), Description.QUANTUM, 1)
                .series(outer, light, outer, Passage.ofPulses(time * TALBOT_TIME, MASS))
                .signedVisibility();
    }

    @Test
    void slitsAndAPhaseGrating() {
        for (double phase : new double[] {1.2, 3.0, 5.5}) {
            double wave = slitLightSlit(phase, 0.0, 1, 2, 0);
            // Orders beyond 256 of the slits are folded on the grid: about 1e-3 of the visibility.
            assertThat(wave).isCloseTo(closedForm(LightKernel.ofPhase(phase), 0.5), within(1.5e-3));
        }
    }

    @Test
    void absorptionFromTheSameStandingWaveIsTheCoherentKernel() {
        double wave = slitLightSlit(3.0, 1.0, 1, 2, 8);
        double coherent = closedForm(new LightKernel(3.0, 1.0, RecoilKernel.STANDING_MODE_COHERENT), 0.5);
        double walk = closedForm(new LightKernel(3.0, 1.0, RecoilKernel.RANDOM_WALK), 0.5);

        assertThat(wave).isCloseTo(coherent, within(1.5e-3));
        assertThat(Math.abs(wave - walk)).isGreaterThan(0.1);
    }

    private static double[] depletion(double phase, double photons, double x) {
        double cosine = Math.cos(Math.PI * x);
        double[] t = lightPhase(phase, x);
        double size = Math.exp(-0.5 * photons * cosine * cosine);
        return new double[] {size * t[0], size * t[1]};
    }

    @Test
    void threeDepletionPulsesWithUnequalSeparations() {
        double[][] strengths = {{2.0, 5.0}, {1.5, 4.0}, {0.7, 6.0}};
        double[] separations = {0.8, 0.806};
        double spread = 9.0;
        int points = 128;
        double[][][] gratings = new double[3][][];
        DepletionKernel[] kernels = new DepletionKernel[3];
        for (int g = 0; g < 3; g++) {
            double phase = strengths[g][0];
            double photons = strengths[g][1];
            gratings[g] = WaveTrain.sample(x -> depletion(phase, photons, x), points);
            kernels[g] = new DepletionKernel(phase, photons);
        }
        double[] density = new double[points];
        double total = 0.0;
        double step = 0.006;
        for (double kappa = -6 * spread; kappa <= 6 * spread; kappa += step) {
            double weight = Math.exp(-0.5 * kappa * kappa / (spread * spread));
            total += weight;
            new WaveTrain(points, kappa)
                    .pass(gratings[0])
                    .fly(separations[0])
                    .pass(gratings[1])
                    .fly(separations[1])
                    .addDensity(weight, density);
        }
        double[] wave = WaveTrain.meanAndSignedVisibility(density, gratings[2]);

        double velocity = spread * Codata2018.PLANCK_CONSTANT / (PERIOD * MASS);
        Passage passage = new Passage(separations[0] * TALBOT_TIME, separations[1] * TALBOT_TIME, MASS, velocity);
        FringeSeries series = new ThreeGratingFringe(TrainGeometry.equal(PERIOD), Description.QUANTUM, 1)
                .series(kernels[0], kernels[1], kernels[2], passage);
        assertThat(series.signedVisibility()).isCloseTo(wave[1], within(1e-7));
        assertThat(series.coefficient(0)).isCloseTo(wave[0] / total, within(1e-7 * series.coefficient(0)));
    }

    @Test
    void fullFringeOfThreeDepletionPulsesHasAllHarmonics() {
        double[] strengths = {16.0, 18.0, 14.0};
        int points = 128;
        double time = 1.0;
        double[][][] gratings = new double[3][][];
        DepletionKernel[] kernels = new DepletionKernel[3];
        for (int g = 0; g < 3; g++) {
            double photons = strengths[g];
            gratings[g] = WaveTrain.sample(x -> depletion(1.1, photons, x), points);
            kernels[g] = new DepletionKernel(1.1, photons);
        }
        double[] density = new double[points];
        int samples = 4 * 257;
        for (int i = 0; i < samples; i++) {
            new WaveTrain(points, 4.0 * (i + 0.37) / samples)
                    .pass(gratings[0])
                    .fly(time)
                    .pass(gratings[1])
                    .fly(time)
                    .addDensity(1.0 / samples, density);
        }
        FringeSeries series = new ThreeGratingFringe(TrainGeometry.equal(PERIOD), Description.QUANTUM, 12)
                .series(kernels[0], kernels[1], kernels[2], Passage.ofPulses(time * TALBOT_TIME, MASS));

        double largest = 0.0;
        double smallest = Double.POSITIVE_INFINITY;
        for (int shift = 0; shift < points / 2; shift++) {
            double wave = WaveTrain.signal(density, gratings[2], shift);
            double angle = 2 * Math.PI * WaveTrain.place(shift, points);
            assertThat(series.signal(angle)).isCloseTo(wave, within(1e-9));
            largest = Math.max(largest, wave);
            smallest = Math.min(smallest, wave);
        }
        double visibility = (largest - smallest) / (largest + smallest);
        assertThat(series.fullVisibility()).isCloseTo(visibility, within(2e-3));
        assertThat(series.fullVisibility()).isNotCloseTo(series.sinusoidalVisibility(), within(1e-3));
    }

    @Test
    void magnifyingTrainWithThreePeriodsAndUnequalSeparations() {
        // n1/d1 + n2/d2 + n3/d3 = 0 and n1 T1/d1 = n3 T2/d3 hold for periods d/2, 2d/3, d and T2 = 2 T1.
        double[] periods = {0.5, 2.0 / 3.0, 1.0};
        double[] strengths = {5.0, 6.0, 4.0};
        double time = 0.31;
        double spread = 5.0;
        int points = 192 * 4 / 3;
        double[][][] gratings = new double[3][][];
        DepletionKernel[] kernels = new DepletionKernel[3];
        for (int g = 0; g < 3; g++) {
            double photons = strengths[g];
            double period = periods[g];
            gratings[g] = WaveTrain.sample(x -> depletion(1.7, photons, x / period), points);
            kernels[g] = new DepletionKernel(1.7, photons);
        }
        double[] density = new double[points];
        double total = 0.0;
        for (double kappa = -6 * spread; kappa <= 6 * spread; kappa += 0.005) {
            double weight = Math.exp(-0.5 * kappa * kappa / (spread * spread));
            total += weight;
            new WaveTrain(points, kappa)
                    .pass(gratings[0])
                    .fly(time)
                    .pass(gratings[1])
                    .fly(2 * time)
                    .addDensity(weight, density);
        }
        double[] wave = WaveTrain.meanAndSignedVisibility(density, gratings[2]);

        TrainGeometry geometry = new TrainGeometry(PERIOD / 2, 2 * PERIOD / 3, PERIOD, 1, -2, 1);
        double velocity = spread * Codata2018.PLANCK_CONSTANT / (PERIOD * MASS);
        Passage passage = new Passage(time * TALBOT_TIME, 2 * time * TALBOT_TIME, MASS, velocity);
        FringeSeries series = new ThreeGratingFringe(geometry, Description.QUANTUM, 1)
                .series(kernels[0], kernels[1], kernels[2], passage);
        assertThat(series.coefficient(0)).isCloseTo(wave[0] / total, within(1e-7 * series.coefficient(0)));
        assertThat(series.signedVisibility()).isCloseTo(wave[1], within(1e-6));
        assertThat(Math.abs(wave[1])).isGreaterThan(0.05);
    }
}
