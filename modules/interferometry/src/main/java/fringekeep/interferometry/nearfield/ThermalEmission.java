package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.special.GaussRule;
import fringekeep.interferometry.special.Sinc;
import java.util.function.DoubleUnaryOperator;

/**
 * Loss of visibility by thermal emission of light from a hot molecule that cools on its way.
 *
 * <p>V/V0 = exp{-&int; dt &int; d&omega; R(&omega;,T)[1 - sinc(&omega; s(t)/c)]} with s(t) the separation of the
 * interfering paths, rising to h T/(m d) at the second grating and falling again, and
 * R = (&omega;/&pi;c)&sup2; &sigma;(&omega;) exp[-x - x&sup2; k/(2C)], x = &#x127;&omega;/kT, the emission rate of a
 * particle without heat bath and heat capacity C. Standing: {@link Standing#FROM_MEMORY}; effect: L. Hackermueller et
 * al., Nature 427, 711 (2004).
 *
 * @param crossSection absorption cross section (m^2) as a function of angular frequency (rad/s), at the frequencies of
 *     thermal light
 * @param heatCapacity heat capacity C of one molecule (J/K), &gt; 0
 */
public record ThermalEmission(DoubleUnaryOperator crossSection, double heatCapacity) {
    private static final GaussRule RULE = GaussRule.legendre(64);
    private static final double LARGEST_RATIO = 60.0;
    private static final int STEPS = 200;

    /** Checks the heat capacity. */
    public ThermalEmission {
        if (!(heatCapacity > 0.0)) {
            throw new IllegalArgumentException("the heat capacity is positive, not " + heatCapacity + " J/K");
        }
    }

    /** How well the formula is established. */
    public static final Standing STANDING = Standing.FROM_MEMORY;

    /**
     * Photons emitted in unit time.
     *
     * @param temperature internal temperature (K)
     * @return rate (1/s)
     */
    public double rate(double temperature) {
        return integral(temperature, omega -> 1.0);
    }

    /**
     * Power emitted.
     *
     * @param temperature internal temperature (K)
     * @return power (W)
     */
    public double power(double temperature) {
        return integral(temperature, omega -> Codata2018.REDUCED_PLANCK_CONSTANT * omega);
    }

    /**
     * Remaining visibility between the first and the third grating.
     *
     * @param temperature internal temperature at the first grating (K)
     * @param time        flight time T between neighbouring gratings (s)
     * @param mass        mass (kg)
     * @param period      grating period (m)
     * @return factor, 0 to 1; cooling followed in 400 steps of Heun's rule, about 1e-5 of the exponent
     */
    public double factor(double temperature, double time, double mass, double period) {
        double largest = Codata2018.PLANCK_CONSTANT * time / (mass * period);
        double step = time / STEPS;
        double here = temperature;
        double exponent = 0.0;
        for (int k = 0; k < 2 * STEPS; k++) {
            double slope = -power(here) / heatCapacity;
            double next = Math.max(1.0, here + step * slope);
            next = Math.max(1.0, here + 0.5 * step * (slope - power(next) / heatCapacity));
            double middle = 0.5 * (here + next);
            double place = (k + 0.5) / STEPS;
            exponent += step * decoherence(middle, largest * (place < 1.0 ? place : 2.0 - place));
            here = next;
        }
        return StrictMath.exp(-exponent);
    }

    /**
     * Rate at which emission resolves two paths.
     *
     * @param temperature internal temperature (K)
     * @param separation  separation of the paths (m)
     * @return rate (1/s), at most {@link #rate}
     */
    public double decoherence(double temperature, double separation) {
        double perFrequency = separation / Codata2018.SPEED_OF_LIGHT;
        return integral(temperature, omega -> 1.0 - Sinc.of(omega * perFrequency));
    }

    private double integral(double temperature, DoubleUnaryOperator weight) {
        double unit = Codata2018.BOLTZMANN_CONSTANT * temperature / Codata2018.REDUCED_PLANCK_CONSTANT;
        double[] nodes = RULE.nodes();
        double[] weights = RULE.weights();
        double sum = 0.0;
        for (int k = 0; k < nodes.length; k++) {
            double ratio = 0.5 * LARGEST_RATIO * (1.0 + nodes[k]);
            double omega = ratio * unit;
            double finite = 0.5 * ratio * ratio * Codata2018.BOLTZMANN_CONSTANT / heatCapacity;
            double factor = omega / (Math.PI * Codata2018.SPEED_OF_LIGHT);
            double rate = factor * factor * crossSection.applyAsDouble(omega) * StrictMath.exp(-ratio - finite);
            sum += weights[k] * rate * weight.applyAsDouble(omega);
        }
        return sum * 0.5 * LARGEST_RATIO * unit;
    }
}
