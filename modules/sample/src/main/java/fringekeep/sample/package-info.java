/** Compound and batch. */
@org.jspecify.annotations.NullMarked
package fringekeep.sample;
