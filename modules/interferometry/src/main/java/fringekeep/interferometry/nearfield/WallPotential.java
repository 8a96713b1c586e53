package fringekeep.interferometry.nearfield;

/**
 * Attraction of a molecule to the two walls of a slit, -C_n/r^n each: n = 3 the van der Waals (non-retarded), n = 4
 * the retarded Casimir-Polder limit.
 *
 * <p>Eikonal phase over the bar thickness b at speed v: (C_n b/&#x127;v)[(w/2-x)^-n + (w/2+x)^-n]. Unbounded at the
 * walls, so molecules closer to a wall than the stated cut-off count as lost. Valid while the transverse displacement
 * inside the slit is small against its width: S. Nimmrichter, K. Hornberger, Phys. Rev. A 78, 023612 (2008).
 *
 * @param coefficient C_n (J m^n), &ge; 0
 * @param exponent    n, 3 or 4
 * @param thickness   bar thickness b along the beam (m), &gt; 0
 * @param cutoff      distance from a wall below which molecules are lost (m), &gt; 0
 */
public record WallPotential(double coefficient, int exponent, double thickness, double cutoff) {
    /** Checks every part. */
    public WallPotential {
        if (!(coefficient >= 0.0 && coefficient < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("the wall coefficient is at least 0 J m^n, not " + coefficient);
        }
        if (exponent != 3 && exponent != 4) {
            throw new IllegalArgumentException(
                    "the wall potential falls as r^-3 or r^-4, not with exponent " + exponent);
        }
        if (!(thickness > 0.0) || !(cutoff > 0.0)) {
            throw new IllegalArgumentException(
                    "thickness and cut-off are positive lengths, not " + thickness + " m and " + cutoff + " m");
        }
    }
}
