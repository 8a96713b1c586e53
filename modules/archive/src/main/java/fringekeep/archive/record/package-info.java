/** Heads, parts, ids and fingerprints as record format 1 has them. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.record;
