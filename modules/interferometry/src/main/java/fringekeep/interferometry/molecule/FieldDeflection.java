package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.special.HalfTurn;

/**
 * Deflection of a fringe by a static electric or magnetic field that acts along part of the flight.
 *
 * <p>A transverse force F on [z_a, z_a + l] (from the first grating at z = 0; gratings at 0, L, 2L) moves the fringe
 * coordinate x1 - 2 x2 + x3 by &Delta;x = F K/(m v&sup2;), K = &int; w(z) dz with w = z before the second grating and
 * 2L - z behind it: l(z_a + l/2) between the first two gratings, L&sup2; for the whole length. Derived, and checked
 * against ballistic trajectories.
 *
 * @param separation distance L between neighbouring gratings (m)
 * @param start      beginning z_a of the field (m), may lie before the first grating
 * @param length     length l of the field (m), &ge; 0
 * @param period     grating period d (m)
 */
public record FieldDeflection(double separation, double start, double length, double period) {
    /** Checks the lengths. */
    public FieldDeflection {
        if (!(separation > 0.0) || !(length >= 0.0) || !(period > 0.0) || !Double.isFinite(start)) {
            throw new IllegalArgumentException("separation " + separation + " m, field from " + start + " m over "
                    + length + " m and period " + period + " m must be positive lengths");
        }
    }

    /**
     * The geometry factor.
     *
     * @return K (m^2)
     */
    public double geometryFactor() {
        double end = start + length;
        double rising =
                half(Math.max(0.0, Math.min(end, separation))) - half(Math.max(0.0, Math.min(start, separation)));
        double low = Math.max(separation, Math.min(2.0 * separation, start));
        double high = Math.max(separation, Math.min(2.0 * separation, end));
        double falling = half(2.0 * separation - low) - half(2.0 * separation - high);
        return rising + falling;
    }

    private static double half(double z) {
        return 0.5 * z * z;
    }

    /**
     * Displacement of the fringe.
     *
     * @param susceptibility electric susceptibility &chi; = &alpha; + &lt;d&sup2;&gt;/(3kT) (C m^2/V) with the field
     *     term (E.grad)E, or magnetic susceptibility (J/T^2) with (B.grad)B
     * @param fieldTerm      (E.grad)E (V^2/m^3) or (B.grad)B (T^2/m)
     * @param mass           mass (kg)
     * @param velocity       speed (m/s)
     * @return &Delta;x (m)
     */
    public double shift(double susceptibility, double fieldTerm, double mass, double velocity) {
        return susceptibility * fieldTerm * geometryFactor() / (mass * velocity * velocity);
    }

    /**
     * Phase of a displacement.
     *
     * @param shift &Delta;x (m)
     * @return 2&pi;&Delta;x/d (rad)
     */
    public double phase(double shift) {
        return 2.0 * Math.PI * shift / period;
    }

    /**
     * Susceptibility from a displacement.
     *
     * @param shift     &Delta;x (m)
     * @param fieldTerm (E.grad)E (V^2/m^3) or (B.grad)B (T^2/m), not zero
     * @param mass      mass (kg)
     * @param velocity  speed (m/s)
     * @return &chi; (C m^2/V or J/T^2)
     */
    public double susceptibility(double shift, double fieldTerm, double mass, double velocity) {
        return shift * mass * velocity * velocity / (fieldTerm * geometryFactor());
    }

    /**
     * Electric susceptibility of a molecule with thermally averaged moments.
     *
     * @param polarizability       static polarizability (C m^2/V)
     * @param squaredDipoleMoment  thermal mean of the squared dipole moment, vibrations included (C^2 m^2)
     * @param temperature          temperature (K)
     * @return &alpha; + &lt;d&sup2;&gt;/(3kT) (C m^2/V)
     */
    public static double electricSusceptibility(double polarizability, double squaredDipoleMoment, double temperature) {
        return polarizability + squaredDipoleMoment / (3.0 * Codata2018.BOLTZMANN_CONSTANT * temperature);
    }

    /**
     * Magnetic susceptibility by Curie's law.
     *
     * @param factor      Land&eacute; factor g
     * @param spin        angular momentum J (units of &#x127;)
     * @param temperature temperature (K)
     * @return g&sup2; &mu;_B&sup2; J(J+1)/(3kT) (J/T^2)
     */
    public static double curieSusceptibility(double factor, double spin, double temperature) {
        double moment = factor * Codata2018.BOHR_MAGNETON;
        return moment * moment * spin * (spin + 1.0) / (3.0 * Codata2018.BOLTZMANN_CONSTANT * temperature);
    }

    /**
     * Fringe phase per unit of the magnetic quantum number in a gradient.
     *
     * @param factor   Land&eacute; factor g
     * @param gradient dB/dx (T/m)
     * @param mass     mass (kg)
     * @param velocity speed (m/s)
     * @return phase (rad)
     */
    public double phasePerMagneticNumber(double factor, double gradient, double mass, double velocity) {
        double force = factor * Codata2018.BOHR_MAGNETON * gradient;
        return phase(force * geometryFactor() / (mass * velocity * velocity));
    }

    /**
     * Visibility left by moments that point everywhere and are not averaged thermally: all m_J equally likely.
     *
     * @param phasePerNumber phase b per unit of m_J (rad)
     * @param spin           angular momentum J, a multiple of one half
     * @return |sin((2J+1)b/2)/((2J+1) sin(b/2))|
     */
    public static double unresolvedMoments(double phasePerNumber, double spin) {
        double states = 2.0 * spin + 1.0;
        if (!(spin >= 0.0) || states != Math.rint(states)) {
            throw new IllegalArgumentException("an angular momentum is a multiple of one half from 0, not " + spin);
        }
        double halfTurns = phasePerNumber / (2.0 * Math.PI);
        double denominator = states * HalfTurn.sin(halfTurns);
        return denominator == 0.0 ? 1.0 : Math.abs(HalfTurn.sin(states * halfTurns) / denominator);
    }
}
