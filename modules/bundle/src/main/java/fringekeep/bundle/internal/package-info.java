/** How a bundle is laid out: the bag, the crate's metadata, tables, provenance and pictures. */
@org.jspecify.annotations.NullMarked
package fringekeep.bundle.internal;
