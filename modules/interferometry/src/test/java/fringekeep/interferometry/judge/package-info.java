/** Judges from outside: readers of reference values, and amplitude propagation that knows no Talbot coefficient. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.judge;
