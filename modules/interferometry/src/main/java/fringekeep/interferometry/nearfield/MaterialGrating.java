package fringekeep.interferometry.nearfield;

import java.util.Optional;

/**
 * A material grating as built: its kernel may depend on the molecule's speed through the attraction of its walls.
 *
 * @param period       grating period (m)
 * @param openFraction slit width over period, 0 &lt; f &lt; 1
 * @param wall         attraction of the walls, if it is taken into account
 */
public record MaterialGrating(double period, double openFraction, Optional<WallPotential> wall) implements BeamGrating {
    /** Checks period and open fraction. */
    public MaterialGrating {
        if (!(period > 0.0) || !(openFraction > 0.0 && openFraction < 1.0)) {
            throw new IllegalArgumentException(
                    "a grating needs a positive period and an open fraction between 0 and 1, not " + period + " m and "
                            + openFraction);
        }
    }

    /**
     * A grating without wall forces.
     *
     * @param period       period (m)
     * @param openFraction slit width over period
     * @return the grating
     */
    public static MaterialGrating bare(double period, double openFraction) {
        return new MaterialGrating(period, openFraction, Optional.empty());
    }

    /**
     * Its kernel for one speed.
     *
     * @param velocity speed (m/s)
     * @return the Talbot kernel
     */
    public TalbotKernel at(double velocity) {
        return wall.<TalbotKernel>map(w -> new EikonalSlitKernel(period, openFraction * period, w, velocity))
                .orElseGet(() -> new SlitKernel(openFraction));
    }

    @Override
    public TalbotKernel at(double velocity, double height) {
        return at(velocity);
    }
}
