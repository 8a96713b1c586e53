package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.special.CosineSineKernel;
import fringekeep.interferometry.special.HalfTurn;

/**
 * A standing-light-wave phase grating, with recoil from absorbed photons if there are any.
 *
 * <p>Quantum: B_n = e^(-z) (c+a)^n G_n(c&sup2;-a&sup2;), c = &phi;0 sin &pi;&xi;, z = n0 sin&sup2;(&pi;&xi;/2), a = +z
 * or -z by the recoil kernel. Classical: c = &phi;0 &pi;&xi; and z = n0 (&pi;&xi;/2)&sup2;, the leading order of both
 * in the photon momentum (deflection by the local force, diffusion by recoil). All molecules pass: B_0(0) = 1.
 * Accuracy: absolute 5e-14 of the transmission for phases up to 40 rad and 60 photons.
 *
 * @param phase   peak phase &phi;0 at the antinode (rad), positive for a polarizability that attracts to light
 * @param photons mean number n0 of photons absorbed at the antinode, &ge; 0
 * @param recoil  how absorption acts; without photons it has no effect
 */
public record LightKernel(double phase, double photons, RecoilKernel recoil) implements TalbotKernel {
    /** Checks the strengths. */
    public LightKernel {
        if (!Double.isFinite(phase) || !(photons >= 0.0 && photons < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("a light grating needs a finite phase and a photon number from 0, not "
                    + phase + " rad, " + photons);
        }
    }

    /**
     * A grating that absorbs nothing.
     *
     * @param phase peak phase (rad)
     * @return the pure phase grating
     */
    public static LightKernel ofPhase(double phase) {
        return new LightKernel(phase, 0.0, RecoilKernel.STANDING_MODE_COHERENT);
    }

    @Override
    public double quantum(int order, double xi) {
        double half = HalfTurn.sin(0.5 * xi);
        return coefficient(order, phase * HalfTurn.sin(xi), photons * half * half);
    }

    @Override
    public double classical(int order, double xi) {
        double half = 0.5 * Math.PI * xi;
        return coefficient(order, phase * Math.PI * xi, photons * half * half);
    }

    private double coefficient(int order, double odd, double diffusion) {
        return CosineSineKernel.coefficient(order, recoil.sign() * diffusion, odd, -diffusion);
    }
}
