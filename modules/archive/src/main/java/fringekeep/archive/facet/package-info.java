/** What an input may offer whatever its kind: tables of counts, estimates, distributions, curves, images. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.facet;
