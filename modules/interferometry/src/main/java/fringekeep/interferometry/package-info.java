/** Physics and statistics: pure functions on numbers. */
@org.jspecify.annotations.NullMarked
package fringekeep.interferometry;
