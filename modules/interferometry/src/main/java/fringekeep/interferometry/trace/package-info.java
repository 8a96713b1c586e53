/** Position traces of trapped nanoparticles: spectra, oscillator parameters, temperature, cooling, mass. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.trace;
