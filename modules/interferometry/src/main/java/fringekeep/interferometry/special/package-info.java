/**
 * Special functions and small numerical tools with a stated accuracy: Bessel functions, entire kernels of grating
 * theory, sinc, Gauss rules, piecewise polynomials, a bit-stable random generator.
 *
 * <p>Everything is pure and gives the same bits on every machine: {@link java.lang.StrictMath} for transcendental
 * functions, exactly rounded operations elsewhere, sums in a fixed order.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.special;
