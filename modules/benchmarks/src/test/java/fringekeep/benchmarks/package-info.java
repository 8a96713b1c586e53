/**
 * Ratios of our times to those of other programs on the same data in the same run; both sides alternate, CPU time of one thread
 * counts, results are compared before times. No time is asserted.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.benchmarks;
