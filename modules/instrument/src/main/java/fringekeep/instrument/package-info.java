/** Setup, calibration and monitor log. */
@org.jspecify.annotations.NullMarked
package fringekeep.instrument;
