package fringekeep.interferometry.trace;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import fringekeep.interferometry.special.SplitMix64;
import fringekeep.interferometry.statistics.Estimate;
import org.junit.jupiter.api.Test;

/** Spectra and oscillator fits against exact simulations of the same oscillator. */
class ParticleTraceTest {
    private static final double BOLTZMANN = 1.380649e-23;
    private static final double OMEGA = 2 * Math.PI * 60e3;
    private static final double GAMMA = 2 * Math.PI * 1.5e3;
    private static final double MASS = 3e-18;
    private static final double INTERVAL = 1e-6;

    /**
     * Thermal oscillator by its exact discrete propagator: a damped rotation and the noise covariance that keeps the
     * equilibrium, Sigma - F Sigma F^T.
     */
    private static double[] trace(int length, double temperature, long seed) {
        double decay = Math.exp(-0.5 * GAMMA * INTERVAL);
        double omega = Math.sqrt(OMEGA * OMEGA - 0.25 * GAMMA * GAMMA);
        double c = decay * Math.cos(omega * INTERVAL);
        double s = decay * Math.sin(omega * INTERVAL) / omega;
        double[][] f = {{c + 0.5 * GAMMA * s, s}, {-OMEGA * OMEGA * s, c - 0.5 * GAMMA * s}};
        double xx = BOLTZMANN * temperature / (MASS * OMEGA * OMEGA);
        double vv = BOLTZMANN * temperature / MASS;
        double qxx = xx - f[0][0] * f[0][0] * xx - f[0][1] * f[0][1] * vv;
        double qxv = -f[0][0] * f[1][0] * xx - f[0][1] * f[1][1] * vv;
        double qvv = vv - f[1][0] * f[1][0] * xx - f[1][1] * f[1][1] * vv;
        double l11 = Math.sqrt(qxx);
        double l21 = qxv / l11;
        double l22 = Math.sqrt(qvv - l21 * l21);
        SplitMix64 random = new SplitMix64(seed);
        double x = Math.sqrt(xx) * random.nextGaussian();
        double v = Math.sqrt(vv) * random.nextGaussian();
        double[] trace = new double[length];
        for (int k = 0; k < length; k++) {
            trace[k] = x;
            double a = random.nextGaussian();
            double b = random.nextGaussian();
            double next = f[0][0] * x + f[0][1] * v + l11 * a;
            v = f[1][0] * x + f[1][1] * v + l21 * a + l22 * b;
            x = next;
        }
        return trace;
    }

    @Test
    void spectrumOfWhiteNoiseIntegratesToItsVariance() {
        SplitMix64 random = new SplitMix64(5L);
        double[] white = new double[1 << 16];
        double square = 0.0;
        for (int k = 0; k < white.length; k++) {
            white[k] = 2.5 * random.nextGaussian();
            square += white[k] * white[k] / white.length;
        }
        PowerSpectrum spectrum = PowerSpectrum.of(white, 1e-4, 1024);
        double integral = 0.0;
        for (int k = 0; k < spectrum.size(); k++) {
            integral += spectrum.density(k) * spectrum.resolution();
        }

        assertThat(integral).isCloseTo(square, within(0.01 * square));
        assertThat(spectrum.segments()).isEqualTo(127);
        // Two-sided 6.25 U^2 over 10 kHz: one-sided 2 * 6.25e-4 U^2/Hz.
        assertThat(spectrum.density(100)).isCloseTo(2 * 6.25e-4, within(5 * 1.25e-3 / Math.sqrt(120)));
    }

    @Test
    void spectrumOfASinusoidIsConcentratedAtItsFrequency() {
        double[] sine = new double[8192];
        for (int k = 0; k < sine.length; k++) {
            sine[k] = 3.0 * Math.sin(2 * Math.PI * 64 * k / 1024.0);
        }
        PowerSpectrum spectrum = PowerSpectrum.of(sine, 1.0, 1024);
        // Hann: the power 9/2 lies in three bins, two thirds of it in the middle one.
        assertThat(spectrum.density(64) * spectrum.resolution()).isCloseTo(4.5 * 2 / 3, within(1e-9));
        assertThat(spectrum.density(63) * spectrum.resolution()).isCloseTo(4.5 / 6, within(1e-9));
        assertThat(spectrum.density(80)).isLessThan(1e-20);
    }

    @Test
    void oscillatorParametersCoverTheTruth() {
        int trials = 40;
        double[] pulls = new double[3];
        for (int t = 0; t < trials; t++) {
            double[] trace = trace(1 << 16, 300.0, 100L + t);
            OscillatorFit fit = OscillatorFit.fit(PowerSpectrum.of(trace, INTERVAL, 4096), 20e3, 100e3)
                    .orElseThrow();
            pulls[0] += square(fit.angularFrequency(), OMEGA);
            pulls[1] += square(fit.damping(), GAMMA);
            pulls[2] += square(fit.temperature(MASS, 1.0), 300.0);
        }
        // Mean squared pulls of one; the spectral window widens the line slightly, so the damping gets some room.
        for (double pull : pulls) {
            assertThat(pull / trials).isBetween(0.45, 2.2);
        }
    }

    private static double square(Estimate estimate, double truth) {
        double pull = (estimate.value() - truth) / estimate.standardUncertainty();
        return pull * pull;
    }

    @Test
    void calibrationAndTemperatureAreInverse() {
        double[] trace = trace(1 << 16, 300.0, 9L);
        for (int k = 0; k < trace.length; k++) {
            trace[k] *= 4e6;
        }
        OscillatorFit fit = OscillatorFit.fit(PowerSpectrum.of(trace, INTERVAL, 4096), 20e3, 100e3)
                .orElseThrow();
        Estimate calibration = fit.calibration(MASS, 300.0);

        assertThat(calibration.value()).isCloseTo(4e6, within(4 * calibration.standardUncertainty()));
        assertThat(fit.temperature(MASS, calibration.value()).value()).isCloseTo(300.0, within(1e-9));
        double expected = 16e12 * BOLTZMANN * 300.0 / (MASS * OMEGA * OMEGA);
        assertThat(fit.meanSquare().value()).isCloseTo(expected, within(0.3 * expected));
    }

    @Test
    void ringDownGivesItsRateBack() {
        SplitMix64 random = new SplitMix64(21L);
        double[] times = new double[60];
        double[] energies = new double[60];
        double[] uncertainties = new double[60];
        for (int k = 0; k < 60; k++) {
            times[k] = 1e-3 * k;
            uncertainties[k] = 0.05;
            energies[k] = 0.4 + 2.6 * Math.exp(-120.0 * times[k]) + 0.05 * random.nextGaussian();
        }
        RingDown fit = RingDown.fit(times, energies, uncertainties).orElseThrow();

        assertThat(fit.rate().value()).isCloseTo(120.0, within(3 * fit.rate().standardUncertainty()));
        assertThat(fit.end().value()).isCloseTo(0.4, within(3 * fit.end().standardUncertainty()));
        assertThat(fit.start().value()).isCloseTo(3.0, within(3 * fit.start().standardUncertainty()));
        assertThat(fit.pValue()).isGreaterThan(1e-3);
        double[] flat = new double[60];
        assertThat(RingDown.fit(times, flat, uncertainties)).isEmpty();
    }

    @Test
    void exactRingDownIsFittedExactly() {
        double[] times = {0.0, 1.0, 2.0, 3.0, 5.0};
        double[] energies = new double[5];
        for (int k = 0; k < 5; k++) {
            energies[k] = 1.0 + 3.0 * Math.exp(-0.7 * times[k]);
        }
        RingDown fit = RingDown.fit(times, energies, new double[] {0.1, 0.1, 0.1, 0.1, 0.1})
                .orElseThrow();

        assertThat(fit.rate().value()).isCloseTo(0.7, within(1e-12));
        assertThat(fit.chiSquare()).isLessThan(1e-24);
    }

    @Test
    void massFromDampingIsItsInverse() {
        GasDamping gas = new GasDamping(10.0, 295.0, 28.9647 * 1.66053906660e-27, GasDamping.DIFFUSE);
        double damping = gas.damping(75e-9, 1850.0);
        Estimate mass = gas.mass(new Estimate(damping, 0.02 * damping), 1850.0);

        double expected = 4.0 / 3.0 * Math.PI * Math.pow(75e-9, 3) * 1850.0;
        assertThat(mass.value()).isCloseTo(expected, within(1e-12 * expected));
        assertThat(mass.standardUncertainty()).isCloseTo(0.06 * expected, within(1e-12 * expected));
        assertThatThrownBy(() -> new GasDamping(10.0, 295.0, 1e-26, 2.0)).hasMessageContaining("accommodation");
    }
}
