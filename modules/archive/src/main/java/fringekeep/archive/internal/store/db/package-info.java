/**
 * The embedded database: starting and stopping it, connections, transactions, migrations. Knows no record.
 *
 * <p>Thread rule: a connection never leaves the thread or the method that asked for it.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.store.db;
