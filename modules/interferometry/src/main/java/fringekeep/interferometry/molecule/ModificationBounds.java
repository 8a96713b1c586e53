package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.nearfield.Standing;
import fringekeep.interferometry.special.GaussRule;
import java.util.function.DoubleUnaryOperator;

/**
 * What a visibility that agrees with quantum theory excludes of a modification that would localise massive particles.
 *
 * <p>A modification that acts at rate &Gamma; and resolves separations s by 1 - g(s) leaves
 * V/V0 = exp{-&Gamma; &int; [1 - g(s(t))] dt} of a near-field fringe, s(t) rising to s_max = h T/(m d) at the second
 * grating and falling again. Two families, each with two parameters, for a particle small against the length scale:
 * <ul>
 *   <li>momentum kicks of width &sigma;_q at coherence time &tau;: &Gamma; = (m/m_e)&sup2;/&tau;,
 *       g = exp[-(&sigma;_q s/&#x127;)&sup2;/2];
 *   <li>spontaneous localisation of length r_c at rate &lambda; for one atomic mass unit: &Gamma; = &lambda;
 *       (m/u)&sup2;, g = exp[-s&sup2;/(4 r_c&sup2;)].
 * </ul>
 * Written from memory of the literature ({@link #STANDING}).
 *
 * @param mass   mass (kg)
 * @param time   flight time T between neighbouring gratings (s)
 * @param period grating period d (m)
 */
public record ModificationBounds(double mass, double time, double period) {
    /** How well these formulas are established here. */
    public static final Standing STANDING = Standing.FROM_MEMORY;

    private static final GaussRule RULE = GaussRule.legendre(48);

    /** Checks the numbers. */
    public ModificationBounds {
        if (!(mass > 0.0 && time > 0.0 && period > 0.0)) {
            throw new IllegalArgumentException(
                    "mass " + mass + " kg, time " + time + " s and period " + period + " m must be positive");
        }
    }

    /**
     * Largest separation of the interfering paths.
     *
     * @return h T/(m d) (m)
     */
    public double largestSeparation() {
        return Codata2018.PLANCK_CONSTANT * time / (mass * period);
    }

    /**
     * Smallest coherence time allowed for momentum kicks of a width.
     *
     * @param confirmed     fraction of the expected visibility that was confirmed, between 0 and 1
     * @param momentumWidth width &sigma;_q of the kicks (kg m/s), &gt; 0
     * @return &tau; (s); shorter ones are excluded
     */
    public double coherenceTime(double confirmed, double momentumWidth) {
        double ratio = mass / Codata2018.ELECTRON_MASS;
        double scale = momentumWidth / Codata2018.REDUCED_PLANCK_CONSTANT;
        return ratio * ratio * resolvedTime(s -> -0.5 * scale * scale * s * s) / exponent(confirmed);
    }

    /**
     * Largest localisation rate allowed for a length.
     *
     * @param confirmed fraction of the expected visibility that was confirmed, between 0 and 1
     * @param length    localisation length r_c (m), &gt; 0
     * @return &lambda; for one atomic mass unit (1/s); larger ones are excluded
     */
    public double localisationRate(double confirmed, double length) {
        double ratio = mass / Codata2018.ATOMIC_MASS_CONSTANT;
        double resolved = resolvedTime(s -> -s * s / (4.0 * length * length));
        return exponent(confirmed) / (ratio * ratio * resolved);
    }

    private static double exponent(double confirmed) {
        if (!(confirmed > 0.0 && confirmed < 1.0)) {
            throw new IllegalArgumentException("the confirmed fraction lies between 0 and 1, not " + confirmed);
        }
        return -StrictMath.log(confirmed);
    }

    /** Twice the integral over one arm of the triangle of 1 - g, cut into panels so that narrow g is resolved. */
    private double resolvedTime(DoubleUnaryOperator logarithm) {
        double[] nodes = RULE.nodes();
        double[] weights = RULE.weights();
        double sum = 0.0;
        double low = 0.0;
        for (double high : new double[] {1e-6, 1e-5, 1e-4, 1e-3, 1e-2, 1e-1, 1.0}) {
            double half = 0.5 * (high - low);
            for (int k = 0; k < nodes.length; k++) {
                double part = low + half * (1.0 + nodes[k]);
                sum -= half * weights[k] * StrictMath.expm1(logarithm.applyAsDouble(part * largestSeparation()));
            }
            low = high;
        }
        return 2.0 * time * sum;
    }
}
