/**
 * Running the source: its settings, and the velocities that come out.
 *
 * <p>Lives here: the kinds source-run and velocity with their rules and facets; velocities from flight traces, from three
 * slits, or quoted. The mathematics is that of {@code fringekeep.interferometry.beam}. Never here: scans, fits, windows. Depends
 * on archive, drawing, interferometry, sample and instrument. Thread rule: everything is immutable. Tested against traces
 * whose velocities are known and the golden run of record format 1.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.sourcerun;
