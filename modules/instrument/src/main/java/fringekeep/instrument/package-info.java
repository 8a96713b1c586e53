/**
 * What stands on the bench: setups, calibrations and monitor logs.
 *
 * <p>Lives here: the kinds setup, calibration and monitor-log with their rules and facets; applying a calibration to a
 * reading; reading slow logs. Never here: scans, fits, windows. Depends on archive, drawing and sample. Thread rule:
 * everything is immutable. Tested against the golden setup of record format 1 and published formulas.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.instrument;
