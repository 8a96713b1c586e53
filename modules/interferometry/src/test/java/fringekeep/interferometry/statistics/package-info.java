/** Tests of the statistics. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry.statistics;
