/** Stored forms of heads and parts: values to bytes and back (record format 1, sections 2 to 4). */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.internal.records;
