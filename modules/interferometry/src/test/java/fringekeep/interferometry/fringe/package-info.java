/** Tests of the fringe fits. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.fringe;
