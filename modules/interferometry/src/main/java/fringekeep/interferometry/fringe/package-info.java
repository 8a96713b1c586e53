/**
 * Fringe fits: from counts at grating positions to mean, cosine and sine with covariance, and what follows from them.
 *
 * <p>Convention: S(x) = B + N [1 + V cos(2 &pi; x / d + &phi;)]; cosine = N V cos &phi;, sine = &minus;N V sin &phi;.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.fringe;
