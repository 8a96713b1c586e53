/** Records, fingerprints, journal, raw files, lineage, the embedded database. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive;
