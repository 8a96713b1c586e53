package fringekeep.interferometry.trace;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.statistics.Estimate;
import fringekeep.interferometry.statistics.SymmetricMatrix;
import java.util.Optional;

/**
 * Frequency, damping and strength of a thermally driven oscillator from its power spectrum by maximum likelihood.
 *
 * <p>Model (one-sided, per Hz): S(f) = A/[(&omega;0&sup2;-&omega;&sup2;)&sup2; + &Gamma;&sup2;&omega;&sup2;] + B with
 * A = 4 c&sup2; kT&Gamma;/m, c the calibration; its integral without B is c&sup2; kT/(m&omega;0&sup2;). Averaged
 * periodograms follow a gamma distribution, whose score equation &Sigma; (P-S)/S&sup2; &part;S = 0 is solved by Fisher
 * scoring: no bias from weighting by the data. The covariance is the inverse expected information, widened by 1.944 for
 * the correlation of neighbouring bins of a Hann window (1 + 2(4/9 + 1/36)).
 *
 * @param angularFrequency &omega;0 (rad/s)
 * @param damping          &Gamma; (rad/s): the energy decays as exp(-&Gamma;t)
 * @param strength         A (U^2/Hz (rad/s)^4)
 * @param floor            B (U^2/Hz)
 * @param covariance       of the four in this order, lower triangle by rows
 */
public record OscillatorFit(
        Estimate angularFrequency, Estimate damping, Estimate strength, Estimate floor, double[] covariance) {
    private static final double NEIGHBOURS = 1.0 + 2.0 * (4.0 / 9.0 + 1.0 / 36.0);
    private static final int MOST_STEPS = 200;

    /**
     * Fits a band of a spectrum.
     *
     * @param spectrum the spectrum
     * @param low      lower end of the band (Hz), &gt; 0
     * @param high     upper end of the band (Hz), with at least 8 bins between
     * @return the fit; empty if the steps come to no end or the band shows no resonance
     */
    public static Optional<OscillatorFit> fit(PowerSpectrum spectrum, double low, double high) {
        int first = (int) Math.max(1.0, Math.ceil(low / spectrum.resolution()));
        int last = (int) Math.min(spectrum.size() - 2.0, Math.floor(high / spectrum.resolution()));
        if (last - first < 7) {
            throw new IllegalArgumentException("a band from " + low + " to " + high + " Hz holds fewer than 8 bins of "
                    + spectrum.resolution() + " Hz");
        }
        return new Scoring(spectrum, first, last).solve();
    }

    /**
     * Mean square of the motion.
     *
     * @return A/(4&Gamma;&omega;0&sup2;) (U^2) with its uncertainty
     */
    public Estimate meanSquare() {
        double frequency = angularFrequency.value();
        double value = strength.value() / (4.0 * damping.value() * frequency * frequency);
        double[] slopes = {-2.0 * value / frequency, -value / damping.value(), value / strength.value(), 0.0};
        return new Estimate(value, Math.sqrt(Math.max(0.0, SymmetricMatrix.form(covariance, slopes))));
    }

    /**
     * Temperature of the centre-of-mass motion.
     *
     * @param mass        mass (kg)
     * @param calibration trace units per metre (U/m)
     * @return m &omega;0&sup2; &lt;x&sup2;&gt;/k = A m/(4 k &Gamma; c&sup2;) (K), mass and calibration taken as exact
     */
    public Estimate temperature(double mass, double calibration) {
        double factor = mass / (4.0 * Codata2018.BOLTZMANN_CONSTANT * calibration * calibration);
        double value = factor * strength.value() / damping.value();
        double[] slopes = {0.0, -value / damping.value(), value / strength.value(), 0.0};
        return new Estimate(value, Math.sqrt(Math.max(0.0, SymmetricMatrix.form(covariance, slopes))));
    }

    /**
     * Calibration from a motion of known temperature.
     *
     * @param mass        mass (kg)
     * @param temperature temperature (K), for example of the gas at a pressure where it damps most
     * @return trace units per metre (U/m), mass and temperature taken as exact
     */
    public Estimate calibration(double mass, double temperature) {
        double square = strength.value() * mass / (4.0 * Codata2018.BOLTZMANN_CONSTANT * temperature * damping.value());
        double value = Math.sqrt(square);
        double[] slopes = {0.0, -0.5 * value / damping.value(), 0.5 * value / strength.value(), 0.0};
        return new Estimate(value, Math.sqrt(Math.max(0.0, SymmetricMatrix.form(covariance, slopes))));
    }

    /** Fisher scoring in (log omega0, log Gamma, log A, B over a unit): the floor may be zero or just below. */
    private static final class Scoring {
        private final PowerSpectrum spectrum;
        private final int first;
        private final int last;
        private final double[] normal = new double[10];
        private final double[] score = new double[4];
        private double floorUnit = 1.0;

        Scoring(PowerSpectrum spectrum, int first, int last) {
            this.spectrum = spectrum;
            this.first = first;
            this.last = last;
        }

        Optional<OscillatorFit> solve() {
            double[] here = start();
            double deviance = evaluate(here);
            double damping = 1e-3;
            for (int step = 0; step < MOST_STEPS && damping < 1e10; step++) {
                double[] move = score.clone();
                double[] factors = normal.clone();
                for (int k = 0; k < 4; k++) {
                    factors[SymmetricMatrix.at(k, k)] *= 1.0 + damping;
                }
                if (!SymmetricMatrix.factor(factors, 4, 1e-14)) {
                    return Optional.empty();
                }
                SymmetricMatrix.solve(factors, 4, move);
                double[] next = here.clone();
                double longest = 0.0;
                for (int k = 0; k < 4; k++) {
                    next[k] += move[k];
                    longest = Math.max(longest, Math.abs(move[k]));
                }
                double trial = evaluate(next);
                boolean better = trial <= deviance + 1e-12 * Math.abs(deviance);
                damping = better ? Math.max(1e-9, 0.1 * damping) : 10.0 * damping;
                if (better) {
                    here = next;
                    deviance = trial;
                } else {
                    evaluate(here);
                }
                if (better && longest < 1e-10) {
                    return finished(here);
                }
            }
            return Optional.empty();
        }

        private double[] start() {
            int peak = first;
            double lowest = Double.POSITIVE_INFINITY;
            for (int k = first; k <= last; k++) {
                peak = spectrum.density(k) > spectrum.density(peak) ? k : peak;
                lowest = Math.min(lowest, spectrum.density(k));
            }
            floorUnit = lowest > 0.0 ? lowest : spectrum.density(peak);
            int above = 0;
            for (int k = first; k <= last; k++) {
                above += spectrum.density(k) > 0.5 * spectrum.density(peak) ? 1 : 0;
            }
            double omega = 2.0 * Math.PI * spectrum.frequency(peak);
            double width = 2.0 * Math.PI * spectrum.resolution() * Math.max(1, above);
            double strength = spectrum.density(peak) * width * width * omega * omega;
            return new double[] {StrictMath.log(omega), StrictMath.log(width), StrictMath.log(strength), 0.5};
        }

        /** Sum of ln S + P/S over the band; fills score and expected information per average. */
        private double evaluate(double[] logs) {
            java.util.Arrays.fill(score, 0.0);
            java.util.Arrays.fill(normal, 0.0);
            double omega0 = StrictMath.exp(logs[0]);
            double gamma = StrictMath.exp(logs[1]);
            double strength = StrictMath.exp(logs[2]);
            double floor = logs[3] * floorUnit;
            double[] slope = new double[4];
            double sum = 0.0;
            for (int k = first; k <= last; k++) {
                double omega = 2.0 * Math.PI * spectrum.frequency(k);
                double off = (omega0 - omega) * (omega0 + omega);
                double denominator = off * off + gamma * gamma * omega * omega;
                double line = strength / denominator;
                double model = line + floor;
                if (!(model > 0.0)) {
                    return Double.POSITIVE_INFINITY;
                }
                slope[0] = -line * 4.0 * off * omega0 * omega0 / denominator / model;
                slope[1] = -line * 2.0 * gamma * gamma * omega * omega / denominator / model;
                slope[2] = line / model;
                slope[3] = floorUnit / model;
                double ratio = spectrum.density(k) / model;
                sum += StrictMath.log(model) + ratio;
                for (int i = 0; i < 4; i++) {
                    score[i] += slope[i] * (ratio - 1.0);
                    for (int j = 0; j <= i; j++) {
                        normal[SymmetricMatrix.at(i, j)] += slope[i] * slope[j];
                    }
                }
            }
            return sum;
        }

        private Optional<OscillatorFit> finished(double[] logs) {
            evaluate(logs);
            double[] factors = normal.clone();
            if (!SymmetricMatrix.factor(factors, 4, 1e-12)) {
                return Optional.empty();
            }
            double[] covariance = SymmetricMatrix.inverse(factors, 4);
            double[] values = {
                StrictMath.exp(logs[0]), StrictMath.exp(logs[1]), StrictMath.exp(logs[2]), logs[3] * floorUnit
            };
            double[] units = {values[0], values[1], values[2], floorUnit};
            double scale = NEIGHBOURS / spectrum.effectiveAverages();
            for (int i = 0; i < 4; i++) {
                for (int j = 0; j <= i; j++) {
                    covariance[SymmetricMatrix.at(i, j)] *= scale * units[i] * units[j];
                }
            }
            Estimate[] estimates = new Estimate[4];
            for (int k = 0; k < 4; k++) {
                estimates[k] = new Estimate(values[k], Math.sqrt(covariance[SymmetricMatrix.at(k, k)]));
            }
            return Optional.of(new OscillatorFit(estimates[0], estimates[1], estimates[2], estimates[3], covariance));
        }
    }
}
