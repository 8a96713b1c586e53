/**
 * Questions and insertions, one class per group of tables (record format 1, section 12). Every question to an insert-only
 * table carries the watermark.
 *
 * <p>Thread rule: stateless; the connection is the caller's.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store.tables;
