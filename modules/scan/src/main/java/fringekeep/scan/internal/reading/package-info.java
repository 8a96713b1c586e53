/**
 * Reads text files by a reading profile: bytes to lines, lines to sections, header values and rows, rows to a table in SI with
 * findings. Knows no record and stores nothing. Pure; tested with whole files, mutated files and the golden vector.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.scan.internal.reading;
