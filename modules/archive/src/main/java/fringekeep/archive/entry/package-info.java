/** Entry documents: what a script or a form gives for a new record, read with all that is wrong and where. */
@org.jspecify.annotations.NullMarked
package fringekeep.archive.entry;
