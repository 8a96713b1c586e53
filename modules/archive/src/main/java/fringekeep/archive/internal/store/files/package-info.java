/**
 * The archive's folder: its parts, its lock, where it may lie, and files named by their hash. Knows no database.
 *
 * <p>Thread rule: stateless, or safe for several threads where a class says so.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store.files;
