/**
 * How records come about and how they are seen: stored bytes resolved to what a kind sees, new records examined, computed and
 * turned into bytes. Works on any {@link fringekeep.archive.record.RecordSource}; knows no database.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.making;
