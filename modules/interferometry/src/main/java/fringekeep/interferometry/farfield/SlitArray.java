package fringekeep.interferometry.farfield;

import fringekeep.interferometry.nearfield.EikonalSlitKernel;
import fringekeep.interferometry.nearfield.WallPotential;
import fringekeep.interferometry.special.HalfTurn;
import fringekeep.interferometry.special.Sinc;
import java.util.Optional;

/**
 * A material grating of which N slits are lit coherently, seen in the far field.
 *
 * <p>Intensity = |b(&nu;)/b(0)|&sup2; [sin(N&pi;&nu;)/(N sin &pi;&nu;)]&sup2;, &nu; = d sin(&theta;)/&lambda;, b the
 * amplitude of one slit: sinc(&pi; a &nu;/d) without wall forces, the eikonal integral with them. One at the centre
 * without wall forces; at whole orders the second factor is one. Accuracy: absolute 1e-14 (N up to 1e4).
 *
 * @param period    grating period d (m)
 * @param slitWidth geometric slit width a (m), below d
 * @param slits     number N of slits lit coherently, &ge; 1
 * @param wall      attraction of the walls, if it is taken into account
 */
public record SlitArray(double period, double slitWidth, int slits, Optional<WallPotential> wall) {
    /** Checks the grating. */
    public SlitArray {
        if (!(slitWidth > 0.0 && slitWidth < period) || slits < 1) {
            throw new IllegalArgumentException("slits of " + slitWidth + " m in a period of " + period + " m, " + slits
                    + " of them, are no grating");
        }
    }

    /** Relative intensity against the sine of the angle in orders. */
    @FunctionalInterface
    public interface Pattern {
        /**
         * Relative intensity.
         *
         * @param orders d sin(&theta;)/&lambda;, need not be whole
         * @return intensity
         */
        double at(double orders);
    }

    /**
     * Pattern for one speed.
     *
     * @param velocity speed (m/s); matters only for the walls
     * @return relative intensity against orders; with walls it is divided by the intensity at the centre
     */
    public Pattern pattern(double velocity) {
        if (wall.isEmpty()) {
            return orders -> {
                double envelope = Sinc.ofHalfTurns(slitWidth / period * orders);
                return envelope * envelope * comb(orders);
            };
        }
        EikonalSlitKernel slit = new EikonalSlitKernel(period, slitWidth, wall.get(), velocity);
        double centre = square(slit.orderAmplitude(0.0));
        return orders -> square(slit.orderAmplitude(orders)) / centre * comb(orders);
    }

    private static double square(double[] amplitude) {
        return amplitude[0] * amplitude[0] + amplitude[1] * amplitude[1];
    }

    /** Interference of N equal slits, one at whole orders. */
    private double comb(double orders) {
        double rest = orders - Math.rint(orders);
        if (Math.abs(rest) * slits < 1e-9) {
            return 1.0;
        }
        double value = HalfTurn.sin(slits * rest) / (slits * HalfTurn.sin(rest));
        return value * value;
    }
}
