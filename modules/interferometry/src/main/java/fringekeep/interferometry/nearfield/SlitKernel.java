package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.special.Sinc;

/**
 * A material grating of slits without wall forces: transmission one over a fraction of the period, zero elsewhere.
 *
 * <p>Exact overlap of the two shifted slits: with m a whole number next to &xi; and &delta; = |&xi; - m|,
 * B_n = &Sigma;_m (-1)^(nm) (f-&delta;)_+ sinc(&pi; n (f-&delta;)). Classical: f sinc(&pi; n f). Accuracy: relative
 * 1e-14 of f. A slit centre lies at x = 0.
 *
 * @param openFraction slit width over period f, 0 &lt; f &lt; 1
 */
public record SlitKernel(double openFraction) implements TalbotKernel {
    /** Checks the open fraction. */
    public SlitKernel {
        if (!(openFraction > 0.0 && openFraction < 1.0)) {
            throw new IllegalArgumentException("the open fraction lies between 0 and 1, not " + openFraction);
        }
    }

    @Override
    public double quantum(int order, double xi) {
        double lower = Math.floor(xi);
        return overlap(order, xi, lower) + overlap(order, xi, lower + 1.0);
    }

    private double overlap(int order, double xi, double whole) {
        double width = openFraction - Math.abs(xi - whole);
        if (width <= 0.0) {
            return 0.0;
        }
        double value = width * Sinc.ofHalfTurns(order * width);
        return order % 2 != 0 && Math.abs(whole % 2.0) == 1.0 ? -value : value;
    }

    @Override
    public double classical(int order, double xi) {
        return openFraction * Sinc.ofHalfTurns(order * openFraction);
    }
}
