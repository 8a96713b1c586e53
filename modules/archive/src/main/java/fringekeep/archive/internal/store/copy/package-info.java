/**
 * The plain copy: an archive as text lines and files (record format 1, section 13), written and read without any database.
 *
 * <p>Thread rule: each object is for one thread.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store.copy;
