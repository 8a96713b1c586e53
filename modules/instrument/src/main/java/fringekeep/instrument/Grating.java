package fringekeep.instrument;

import fringekeep.sample.Entered;
import java.util.Optional;

/**
 * A grating; all SI.
 *
 * @param sort what it is
 * @param name what people call it, may be empty
 * @param period period (m): as entered, or half the wavelength of a grating of light
 * @param openFraction slit opening over period (1), material gratings
 * @param thickness thickness of the membrane (m), material gratings
 * @param wall attraction to the walls, material gratings
 * @param laser the laser, gratings of light
 * @param position distance from the first grating (m), where entered
 */
public record Grating(
        GratingSort sort,
        String name,
        Optional<Entered> period,
        Optional<Entered> openFraction,
        Optional<Entered> thickness,
        Optional<WallPotential> wall,
        Optional<Laser> laser,
        Optional<Entered> position) {
    /**
     * Attraction to the walls, -C/r^exponent.
     *
     * @param exponent 3 (van der Waals) or 4 (retarded)
     * @param coefficient C (J m^exponent)
     * @param cutoff distance from the wall below which particles are lost (m)
     */
    public record WallPotential(int exponent, Entered coefficient, Optional<Entered> cutoff) {}
}
