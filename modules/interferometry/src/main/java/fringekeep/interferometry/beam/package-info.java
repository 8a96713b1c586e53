/** Beams: wavelengths, velocity distributions and how they are measured, sources and vacuum. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.beam;
