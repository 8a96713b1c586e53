package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.special.Bessel;
import fringekeep.interferometry.special.CosineSineKernel;
import fringekeep.interferometry.special.HalfTurn;

/**
 * A standing light wave whose antinodes remove molecules, by ionisation, dissociation or neutralisation:
 * t(x) = exp[(i&phi;0 - n0/2) cos&sup2;(&pi;x/d)].
 *
 * <p>Quantum: B_n = e^(-n0/2) (c+a)^n G_n(c&sup2;-a&sup2;) with c = &phi;0 sin &pi;&xi;, a = -(n0/2) cos &pi;&xi;.
 * Classical: c = &phi;0 &pi;&xi;, a = -n0/2. Large n0 is evaluated in scaled form. One event removes the molecule.
 * Accuracy: absolute 5e-14 of the transmission for phases up to 40 rad and 60 photons.
 *
 * @param phase   peak phase &phi;0 at the antinode (rad)
 * @param photons mean number n0 of removing events at the antinode, &ge; 0
 */
public record DepletionKernel(double phase, double photons) implements TalbotKernel {
    /** Checks the strengths. */
    public DepletionKernel {
        if (!Double.isFinite(phase) || !(photons >= 0.0 && photons < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException(
                    "a depletion grating needs a finite phase and a photon number from 0, not " + phase + " rad, "
                            + photons);
        }
    }

    @Override
    public double quantum(int order, double xi) {
        double even = -0.5 * photons * HalfTurn.cos(xi);
        return CosineSineKernel.coefficient(order, even, phase * HalfTurn.sin(xi), -0.5 * photons);
    }

    @Override
    public double classical(int order, double xi) {
        double even = -0.5 * photons;
        return CosineSineKernel.coefficient(order, even, phase * Math.PI * xi, even);
    }

    @Override
    public double transmission() {
        return Bessel.scaledI(0, 0.5 * photons);
    }
}
