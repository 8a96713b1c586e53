/** Declared tables over records, and pages of them by key. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.listing;
