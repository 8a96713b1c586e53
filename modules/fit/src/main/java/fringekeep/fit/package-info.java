/** Fringe fits of one or many scans. */
@org.jspecify.annotations.NullMarked
package fringekeep.fit;
