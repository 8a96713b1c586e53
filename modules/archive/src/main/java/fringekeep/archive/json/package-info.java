/** JSON values as our own small sealed type, canonical bytes (RFC 8785) and entered documents. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.json;
