/** Tests of the beams. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.beam;
