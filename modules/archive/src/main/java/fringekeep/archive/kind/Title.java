package fringekeep.archive.kind;

/**
 * What a record is called.
 *
 * @param text such as "demo cage" or "signal at 7.30 W"
 * @param detail a second line with what tells it from its like, may be empty
 */
public record Title(String text, String detail) {}
