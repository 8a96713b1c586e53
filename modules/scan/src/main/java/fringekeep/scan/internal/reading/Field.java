package fringekeep.scan.internal.reading;

/**
 * One field of a line.
 *
 * @param text without the blanks and quotes around it
 * @param column where it begins in the line, from 1
 */
record Field(String text, int column) {}
