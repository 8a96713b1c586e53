/**
 * Near-field theory of three-grating interferometers for molecular beams and pulsed clouds: Talbot coefficients of
 * every sort of grating, the fringe they make together, averages over the beam, and what reduces the visibility.
 *
 * <p>Conventions: the beam flies along z, gratings vary along x with period d, the coherence separation is given as
 * &xi; = separation/d. A Talbot coefficient is B_n(&xi;) = (1/d) &int; t(x-&xi;d/2) t*(x+&xi;d/2) e^(-2&pi;i n x/d) dx.
 * Gratings here are symmetric about x = 0, so every coefficient is real and B_(-n)(&xi;) = B_n(-&xi;). Light gratings
 * have their antinode at x = 0 and phase +&phi;0 cos&sup2;(&pi;x/d). SI units throughout; angles in radians.
 *
 * <p>Theory: K. Hornberger, J. E. Sipe, M. Arndt, Phys. Rev. A 70, 053608 (2004); K. Hornberger et al., New J. Phys.
 * 11, 043032 (2009); S. Nimmrichter, K. Hornberger, Phys. Rev. A 78, 023612 (2008); all formulas here are checked
 * against direct quadrature and amplitude propagation, which decided the signs where readings of the literature differ.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.nearfield;
