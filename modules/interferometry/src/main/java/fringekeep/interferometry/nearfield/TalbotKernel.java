package fringekeep.interferometry.nearfield;

/**
 * A grating of known strength, seen through its Talbot coefficients.
 *
 * <p>The convention is that of the package. Implementations are immutable and pure.
 */
public interface TalbotKernel {
    /**
     * Talbot coefficient for matter waves.
     *
     * @param order Fourier order n, any sign
     * @param xi    coherence separation over the grating period, finite, any sign
     * @return B_n(&xi;), real
     */
    double quantum(int order, double xi);

    /**
     * The coefficient that replaces it for classical particles: transmission and local deflection only.
     *
     * @param order Fourier order n, any sign
     * @param xi    what the coherence separation over the period would be (it scales the deflection), finite
     * @return the classical coefficient, real
     */
    double classical(int order, double xi);

    /**
     * Coefficient in a chosen description.
     *
     * @param description quantum or classical
     * @param order       Fourier order n
     * @param xi          coherence separation over the period
     * @return {@link #quantum} or {@link #classical}
     */
    default double coefficient(Description description, int order, double xi) {
        return description == Description.QUANTUM ? quantum(order, xi) : classical(order, xi);
    }

    /**
     * Mean transmission of the grating, its coefficient of order zero without separation.
     *
     * @return a number from 0 to 1
     */
    default double transmission() {
        return quantum(0, 0.0);
    }
}
