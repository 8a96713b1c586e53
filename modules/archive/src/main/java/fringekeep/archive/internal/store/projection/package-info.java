/**
 * Declared tables: made, filled, rebuilt and queried. The only place that turns a declaration into statements; names are
 * checked and quoted, values always bound.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store.projection;
