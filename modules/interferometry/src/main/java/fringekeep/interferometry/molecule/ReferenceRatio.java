package fringekeep.interferometry.molecule;

import fringekeep.interferometry.statistics.Estimate;

/**
 * Susceptibility of one species by that of another measured in the same field and geometry, which then cancel:
 * &chi;1/&chi;2 = (&Delta;x1 m1 v1&sup2;)/(&Delta;x2 m2 v2&sup2;).
 */
public final class ReferenceRatio {
    private ReferenceRatio() {}

    /**
     * One species' deflection.
     *
     * @param shift    displacement of the fringe, or its phase in the same units for both (m or rad), not zero
     * @param mass     mass (kg), taken as exact
     * @param velocity speed (m/s)
     */
    public record Deflected(Estimate shift, double mass, Estimate velocity) {}

    /**
     * Ratio of susceptibilities, the four measured quantities being independent.
     *
     * <p>A relative error of the velocity scale that both share (a length of flight) cancels: leave it out of both.
     *
     * @param species   the species
     * @param reference the reference
     * @return ratio with its standard uncertainty (law of propagation, relative parts u(&Delta;x) and 2 u(v))
     */
    public static Estimate of(Deflected species, Deflected reference) {
        double ratio = strength(species) / strength(reference);
        double square = square(species) + square(reference);
        return new Estimate(ratio, Math.abs(ratio) * Math.sqrt(square));
    }

    private static double strength(Deflected one) {
        return one.shift.value() * one.mass * one.velocity.value() * one.velocity.value();
    }

    private static double square(Deflected one) {
        double shift = one.shift.standardUncertainty() / one.shift.value();
        double speed = 2.0 * one.velocity.standardUncertainty() / one.velocity.value();
        return shift * shift + speed * speed;
    }
}
