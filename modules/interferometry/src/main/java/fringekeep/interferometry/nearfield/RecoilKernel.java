package fringekeep.interferometry.nearfield;

/**
 * How absorption of photons from a standing light wave acts on the molecule's motion. The two readings give different
 * visibilities; a result names the one that was used.
 */
public enum RecoilKernel {
    /**
     * A photon leaves one standing mode and no record of its direction: the state is multiplied by cos(kx). The density
     * matrix gets exp[-(n0/2)(cos kx - cos kx')&sup2;]. Amplitude propagation with this jump operator confirms it for
     * absorption and dipole force from the same standing wave.
     */
    STANDING_MODE_COHERENT(1.0),
    /**
     * Random walk: each photon kicks by plus or minus one photon momentum at the local absorption rate,
     * exp[-n0 cos&sup2;(kX)(1 - cos &pi;&xi;)] with X the mid-point.
     */
    RANDOM_WALK(-1.0);

    private final double sign;

    RecoilKernel(double sign) {
        this.sign = sign;
    }

    /**
     * Sign of the even amplitude in the grating kernel.
     *
     * @return +1 or -1
     */
    double sign() {
        return sign;
    }
}
