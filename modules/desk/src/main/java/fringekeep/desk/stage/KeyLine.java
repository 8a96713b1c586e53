package fringekeep.desk.stage;

/**
 * A line of the sheet of keys.
 *
 * @param key such as {@code Ctrl Enter}; empty for the head of a group
 * @param words what it does, or the group's name
 */
public record KeyLine(String key, String words) {}
