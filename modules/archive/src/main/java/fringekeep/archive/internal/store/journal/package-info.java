/** Entries of the journal as values and as canonical bytes (record format 1, section 11). Stateless. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store.journal;
