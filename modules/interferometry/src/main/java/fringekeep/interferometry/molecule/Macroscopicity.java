package fringekeep.interferometry.molecule;

import fringekeep.interferometry.constants.Codata2018;

/**
 * Size of a quantum superposition on a logarithmic scale, always with the name of its definition.
 *
 * <p>Only the estimate for interferometers of S. Nimmrichter, K. Hornberger, Phys. Rev. Lett. 110, 160403 (2013) is
 * computed: &mu; = log10[ |1/ln f| (M/m_e)&sup2; (t/1 s) ], written from memory. Later definitions, by falsification of
 * a hypothesis on the data (B. Schrinski et al., arXiv:1902.11092), give other numbers for the same experiment.
 *
 * @param value      &mu;
 * @param definition which definition it follows
 */
public record Macroscopicity(double value, Definition definition) {
    /** Definitions. */
    public enum Definition {
        /** The estimate for interferometers of 2013. */
        INTERFEROMETER_ESTIMATE_2013
    }

    /**
     * The estimate for interferometers.
     *
     * @param confirmed fraction f of the expected visibility that was confirmed, between 0 and 1
     * @param mass      total mass (kg), &gt; 0
     * @param time      coherence time t (s), &gt; 0
     * @return &mu; with its definition
     */
    public static Macroscopicity interferometerEstimate(double confirmed, double mass, double time) {
        if (!(confirmed > 0.0 && confirmed < 1.0) || !(mass > 0.0) || !(time > 0.0)) {
            throw new IllegalArgumentException(
                    "the confirmed fraction lies between 0 and 1, mass and time are positive, not " + confirmed + ", "
                            + mass + " kg, " + time + " s");
        }
        double ratio = mass / Codata2018.ELECTRON_MASS;
        double excluded = ratio * ratio * time / -StrictMath.log(confirmed);
        return new Macroscopicity(StrictMath.log10(excluded), Definition.INTERFEROMETER_ESTIMATE_2013);
    }
}
