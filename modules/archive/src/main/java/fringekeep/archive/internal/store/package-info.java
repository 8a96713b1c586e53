/**
 * The archive in a folder: embedded database, raw files and payloads beside it, one writer thread, readers on a committed
 * watermark. The only place that knows how records are kept.
 *
 * <p>May never change what was recorded. Depends on the records' forms, not on any stage. Thread rule: what is public is
 * thread-safe; {@link fringekeep.archive.internal.store.Progress} and all that takes a connection stay on the writer thread.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store;
