/** Source run and velocity. */
@org.jspecify.annotations.NullMarked
package fringekeep.sourcerun;
