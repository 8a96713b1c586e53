package fringekeep.interferometry.farfield;

import java.util.function.DoubleUnaryOperator;

/**
 * Diffraction of a molecular beam at a standing light wave of any thickness: the coupled equations of the orders,
 * i da_n/dt = &pi; (n+&kappa;)&sup2;/T_T a_n - (&Omega;(t)/4)(a_(n-1) + a_(n+1)), where &Omega; is the rate of the
 * antinode phase (&int; &Omega; dt = &phi;0), T_T = m d&sup2;/h and &kappa; the incident transverse momentum in h/d
 * (0 at normal, -1/2 at Bragg incidence).
 *
 * <p>Thin gratings give |a_n|&sup2; = J_n&sup2;(&phi;0/2), thick ones at Bragg incidence sin&sup2;(&phi;0/4) in the
 * reflected order. Each time step is a fourth-order commutator-free pair of exponentials of the tridiagonal
 * Hamiltonian, each summed as its Taylor series to rounding; the norm is kept to 1e-13. For a constant rate the
 * result is exact to rounding whatever the steps. Source of the stepping: S. Blanes, P. C. Moan, Appl. Numer. Math.
 * 56, 1519 (2006).
 *
 * <p>Thread rule: immutable.
 *
 * @param talbotTime T_T (s)
 * @param incidence  &kappa; (h/d)
 * @param highest    highest order kept on either side, &ge; 1; populations at the edge tell whether it was enough
 */
public record CoupledOrders(double talbotTime, double incidence, int highest) {
    private static final double FIRST = 0.25 + Math.sqrt(3.0) / 6.0;
    private static final double SECOND = 0.25 - Math.sqrt(3.0) / 6.0;

    /** Checks the numbers. */
    public CoupledOrders {
        if (!(talbotTime > 0.0) || highest < 1 || highest > 1000) {
            throw new IllegalArgumentException("Talbot time " + talbotTime
                    + " s must be positive and the highest order " + highest + " between 1 and 1000");
        }
    }

    /**
     * Populations behind the grating, order 0 being filled before it.
     *
     * @param rate     phase rate &Omega;(t) at the antinode (rad/s) for 0 &le; t &le; duration
     * @param duration time in the light (s), &gt; 0
     * @param steps    equal time steps, &ge; 1; the error falls with the fourth power
     * @return populations of orders -highest &hellip; highest; they sum to one
     */
    public double[] populations(DoubleUnaryOperator rate, double duration, int steps) {
        if (!(duration > 0.0) || steps < 1) {
            throw new IllegalArgumentException("a flight of " + duration + " s in " + steps + " steps goes nowhere");
        }
        State state = new State(2 * highest + 1);
        state.real[highest] = 1.0;
        double step = duration / steps;
        double shift = Math.sqrt(3.0) / 6.0;
        for (int k = 0; k < steps; k++) {
            double early = rate.applyAsDouble((k + 0.5 - shift) * step);
            double late = rate.applyAsDouble((k + 0.5 + shift) * step);
            evolve(state, 0.5 * step, 2.0 * (FIRST * early + SECOND * late));
            evolve(state, 0.5 * step, 2.0 * (SECOND * early + FIRST * late));
        }
        double[] populations = new double[state.real.length];
        for (int n = 0; n < populations.length; n++) {
            populations[n] = state.real[n] * state.real[n] + state.imaginary[n] * state.imaginary[n];
        }
        return populations;
    }

    private static final class State {
        final double[] real;
        final double[] imaginary;

        State(int size) {
            real = new double[size];
            imaginary = new double[size];
        }
    }

    /** exp(-i H t) by its Taylor series on pieces short enough that no term grows. */
    private void evolve(State state, double time, double rate) {
        double edge = highest + Math.abs(incidence);
        double size = Math.PI * edge * edge / talbotTime + 0.5 * Math.abs(rate);
        int pieces = (int) Math.max(1.0, Math.ceil(size * time));
        for (int piece = 0; piece < pieces; piece++) {
            taylor(state, time / pieces, rate);
        }
    }

    private void taylor(State state, double time, double rate) {
        double[] re = state.real.clone();
        double[] im = state.imaginary.clone();
        for (int k = 1; k <= 30; k++) {
            double[] nextRe = new double[re.length];
            double[] nextIm = new double[re.length];
            double largest = 0.0;
            for (int n = 0; n < re.length; n++) {
                // -i H (re + i im) = H im - i H re
                nextRe[n] = time / k * hamiltonian(im, n, rate);
                nextIm[n] = -time / k * hamiltonian(re, n, rate);
                state.real[n] += nextRe[n];
                state.imaginary[n] += nextIm[n];
                largest = Math.max(largest, Math.max(Math.abs(nextRe[n]), Math.abs(nextIm[n])));
            }
            if (largest < 1e-19) {
                return;
            }
            re = nextRe;
            im = nextIm;
        }
    }

    private double hamiltonian(double[] amplitude, int index, double rate) {
        double momentum = index - highest + incidence;
        double below = index > 0 ? amplitude[index - 1] : 0.0;
        double above = index < amplitude.length - 1 ? amplitude[index + 1] : 0.0;
        return Math.PI * momentum * momentum / talbotTime * amplitude[index] - 0.25 * rate * (below + above);
    }

    /**
     * Populations of the two-level Bragg approximation at a detuning.
     *
     * @param phase    antinode phase &phi;0 (rad)
     * @param duration time in the light (s), constant rate
     * @return population of the reflected order: Rabi's formula with coupling &phi;0/2 and the energy difference of
     *     orders 0 and 1
     */
    public double twoLevelReflection(double phase, double duration) {
        double coupling = 0.5 * phase / duration;
        double detuning = Math.PI * (1.0 + 2.0 * incidence) / talbotTime;
        double total = StrictMath.hypot(coupling, detuning);
        if (total == 0.0) {
            return 0.0;
        }
        double sine = StrictMath.sin(0.5 * total * duration);
        double part = coupling / total;
        return part * part * sine * sine;
    }
}
