/** Reading profile, scan, series and placement. */
@org.jspecify.annotations.NullMarked
package fringekeep.scan;
