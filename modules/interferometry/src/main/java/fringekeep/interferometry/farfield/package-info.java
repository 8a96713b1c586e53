/**
 * Far-field diffraction of a molecular beam at material and optical gratings: patterns, thick light gratings, and the
 * way from a camera image to order populations.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.farfield;
