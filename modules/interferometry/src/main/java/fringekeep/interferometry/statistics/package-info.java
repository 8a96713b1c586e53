/**
 * Statistics the fits stand on: small linear algebra in a fixed order, distributions, general least squares, the
 * Poisson likelihood, the Rice law of an amplitude.
 *
 * <p>Everything here is pure and stateless. Sums run in index order and transcendental functions are pure Java, so the
 * same input gives the same bits on every machine.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.statistics;
