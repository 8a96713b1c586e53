/** A closed set of records with everything they rest on, seen from an archive or a bundle's folder, and its PROV form. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.lineage;
