package fringekeep.interferometry.nearfield;

import fringekeep.interferometry.constants.Codata2018;

/**
 * The fringe of any three gratings in a row, with equal or unequal separations, in flight or in time.
 *
 * <p>An incoherent source of Gaussian transverse velocity spread &sigma;_v is followed in the coherence representation:
 * each grating multiplies by its Talbot kernel, free flight T moves the separation of the component with wave number q
 * by &#x127;qT/m. Harmonic l with orders n_i = l h_i needs the kernels at
 * <pre>
 *   s1 = (h/m)(n1 T1/d1 - n3 T2/d3),  s2 = -(h/m) n3 T2/d3,  s3 = 0
 *   S_l = exp[-(m s1 &sigma;_v/&#x127;)&sup2;/2] B1_n1(s1/d1) B2_n2(s2/d2) B3_n3(0)
 * </pre>
 * which for equal periods is B1_1(-l&tau;/T_T) B2_2(l T2/T_T) B3_1(0) with &tau; = T2-T1 and T_T = m d&sup2;/h. Only
 * the first grating sees the sign of &tau;. Checked against amplitude propagation (plane waves through three
 * operators).
 *
 * <p>Thread rule: immutable.
 *
 * @param geometry    periods and orders
 * @param description quantum or classical
 * @param highest     highest harmonic to compute, &ge; 1
 */
public record ThreeGratingFringe(TrainGeometry geometry, Description description, int highest) {
    /** Checks the highest harmonic. */
    public ThreeGratingFringe {
        if (highest < 1) {
            throw new IllegalArgumentException("the highest harmonic is at least 1, not " + highest);
        }
    }

    /**
     * Fourier series of the fringe behind the third grating.
     *
     * @param first   first grating
     * @param second  second grating
     * @param third   third grating
     * @param passage times, mass and source divergence
     * @return S_0 &hellip; S_highest, S_0 being the mean transmission of the train
     */
    public FringeSeries series(TalbotKernel first, TalbotKernel second, TalbotKernel third, Passage passage) {
        double[] coefficients = new double[highest + 1];
        for (int l = 0; l <= highest; l++) {
            int n1 = l * geometry.harmonic1();
            int n2 = l * geometry.harmonic2();
            int n3 = l * geometry.harmonic3();
            double s1 = firstSeparation(l, passage);
            double s2 = secondSeparation(l, passage);
            coefficients[l] = sourceCoherence(s1, l, passage)
                    * first.coefficient(description, n1, s1 / geometry.period1())
                    * second.coefficient(description, n2, s2 / geometry.period2())
                    * third.coefficient(description, n3, 0.0);
        }
        return new FringeSeries(coefficients);
    }

    /**
     * Coherence separation at which the first grating acts for one harmonic.
     *
     * @param harmonic l
     * @param passage  times and mass
     * @return s1 (m), zero for matched separations
     */
    public double firstSeparation(int harmonic, Passage passage) {
        double forward = geometry.harmonic1() * passage.firstTime() / geometry.period1();
        double back = geometry.harmonic3() * passage.secondTime() / geometry.period3();
        return harmonic * Codata2018.PLANCK_CONSTANT / passage.mass() * (forward - back);
    }

    /**
     * Coherence separation at which the second grating acts for one harmonic.
     *
     * @param harmonic l
     * @param passage  times and mass
     * @return s2 (m)
     */
    public double secondSeparation(int harmonic, Passage passage) {
        double back = geometry.harmonic3() * passage.secondTime() / geometry.period3();
        return -harmonic * Codata2018.PLANCK_CONSTANT / passage.mass() * back;
    }

    /** Fourier transform of the source's Gaussian momentum distribution; one where the separation vanishes. */
    private double sourceCoherence(double separation, int harmonic, Passage passage) {
        double scale = Math.abs(secondSeparation(harmonic, passage));
        if (Math.abs(separation) <= 1e-14 * scale) {
            return 1.0;
        }
        double exponent =
                separation * passage.mass() * passage.transverseVelocitySpread() / Codata2018.REDUCED_PLANCK_CONSTANT;
        return StrictMath.exp(-0.5 * exponent * exponent);
    }
}
